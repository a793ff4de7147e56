package org.hingeline;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A salinity probe held under the tap reads 0: no carbonate mineral can form, and nothing must fail for it. */
class RinsedProbeTest {
    @Test
    void readings_are_taken_and_pages_shown_while_salinity_is_nought(@TempDir Path data) {
        try (RunningService service = RunningService.start(data, Clock.systemUTC())) {
            String token = service.token(Role.MANAGER);
            assertThat(service.send(
                                    "PUT",
                                    "/api/v1/points/larval-1/limits/calcite-low",
                                    token,
                                    "{\"quantity\":\"omegaCalcite\",\"below\":2,\"action\":\"Look.\"}")
                            .statusCode())
                    .isEqualTo(200);
            Instant at = Clock.systemUTC().instant().truncatedTo(ChronoUnit.SECONDS);

            String answer = service.postReadings(
                            ("{'readings':[" + row("ph", 7.9, at) + "," + row("temperature", 22, at) + ","
                                            + row("salinity", 0, at) + "," + row("totalAlkalinity", 2000, at) + "]}")
                                    .replace('\'', '"'))
                    .body();

            assertThat(answer).isEqualTo("{\"stored\":4,\"duplicates\":0,\"refused\":[]}");
            assertThat(service.get("/api/v1/points/larval-1/water", token).body())
                    .contains("\"omegaCalcite\":0.0", "outside-fit-range");
            assertThat(service.get("/api/v1/points", token).statusCode()).isEqualTo(200);
        }
    }

    private static String row(String quantity, double value, Instant at) {
        return "{'point':'larval-1','quantity':'" + quantity + "','value':" + value + ",'at':'" + at + "'}";
    }
}
