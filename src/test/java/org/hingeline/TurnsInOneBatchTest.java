package org.hingeline;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A gateway that was cut off sends what it kept in one batch; the water may have turned several times in it. */
class TurnsInOneBatchTest {
    private static final Instant NOW = Instant.parse("2026-05-14T03:20:00Z");

    @Test
    void a_batch_in_which_the_water_passes_a_limit_again_and_again_is_taken(@TempDir Path folder) {
        try (RunningService service = RunningService.start(folder, Clock.fixed(NOW, ZoneOffset.UTC))) {
            HttpResponse<String> limit =
                    service.send("PUT", "/api/v1/points/larval-1/limits/too-warm", service.token(Role.OPERATOR), """
                            {"quantity":"temperature","above":25,"deadband":0.1,"onDelayMin":0,"offDelayMin":0,
                             "priority":"high","action":"Turn the heat down."}
                            """);
            assertThat(limit.statusCode()).as(limit.body()).isEqualTo(200);
            List<String> rows = new ArrayList<>();
            for (int i = 0; i < 6; i++) {
                rows.add("{\"point\":\"larval-1\",\"quantity\":\"temperature\",\"value\":" + (i % 2 == 0 ? 26 : 24)
                        + ",\"at\":\"" + NOW.minusSeconds(60 - i) + "\"}");
            }

            HttpResponse<String> answer = service.postReadings("{\"readings\":[" + String.join(",", rows) + "]}");

            assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
            assertThat(answer.body()).contains("\"stored\":6");
            assertThat(service.get("/api/v1/alerts?state=open", service.token(Role.VIEWER))
                            .body())
                    .containsOnlyOnce("\"limit\":\"too-warm\"")
                    .contains("\"state\":\"returned-unacknowledged\"");
        }
    }
}
