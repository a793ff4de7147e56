package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.awaitility.Awaitility.await;

import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** Readings that come late, out of order, twice or with another value. */
class LateReadingsTest {
    private static final Instant NOW = Instant.parse("2026-05-14T12:00:00Z");
    private static final JsonMapper JSON = new JsonMapper();

    /** Six and a half hours of a tank: pH every minute, alkalinity once at the beginning; oldest first. */
    private static List<String> readings() {
        List<String> rows = new ArrayList<>();
        for (int minute = 390; minute > 0; minute--) {
            Instant at = NOW.minus(Duration.ofMinutes(minute));
            double swing = Math.sin(minute / 60.0);
            rows.add(Rows.row("larval-1", "ph", round(7.95 + 0.12 * swing), at));
            if (minute % 13 == 0) {
                rows.add(Rows.row("larval-1", "temperature", round(22 + swing), at));
            }
            if (minute % 65 == 0) {
                rows.add(Rows.row("larval-1", "salinity", round(30 + swing), at));
            }
            if (minute == 390) {
                rows.add(Rows.row("larval-1", "totalAlkalinity", 2078, at));
            }
        }
        return rows;
    }

    private static double round(double value) {
        return Math.round(value * 1000) / 1000.0;
    }

    private static JsonNode history(RunningService service, String token) {
        return JSON.readTree(service.get("/api/v1/points/larval-1/water?from=2026-05-14T00:00:00Z", token)
                .body());
    }

    @Test
    void end_in_the_same_water_states_as_readings_in_order(@TempDir Path ordered, @TempDir Path shuffled) {
        List<String> rows = readings();
        assertThat(rows).hasSize(427);
        try (RunningService first = RunningService.start(ordered, new SettableClock(NOW));
                RunningService second = RunningService.start(shuffled, new SettableClock(NOW))) {
            for (int from = 0; from < rows.size(); from += 50) {
                post(first, rows.subList(from, Math.min(rows.size(), from + 50)));
            }
            JsonNode expected = history(first, first.token(Role.VIEWER));
            assertThat(expected.get("states")).hasSize(390);
            assertThat(expected.get("states").valueStream().filter(state -> state.has("omegaAragonite")))
                    .hasSize(390);

            // what every state leans on comes last, so that more of them are out of date than are done on the spot
            List<String> mixed = new ArrayList<>(rows.stream()
                    .filter(row -> !row.contains("totalAlkalinity"))
                    .toList());
            Collections.shuffle(mixed, new Random(20260514));
            for (int from = 0; from < mixed.size(); from += 36) {
                post(second, mixed.subList(from, Math.min(mixed.size(), from + 36)));
            }
            String token = second.token(Role.VIEWER);
            assertThat(history(second, token).get("states").valueStream().filter(state -> state.has("omegaAragonite")))
                    .as("without alkalinity")
                    .isEmpty();
            post(
                    second,
                    rows.stream().filter(row -> row.contains("totalAlkalinity")).toList());
            await().atMost(Duration.ofSeconds(30))
                    .untilAsserted(() -> assertThat(history(second, token)).isEqualTo(expected));
        }
    }

    private static void post(RunningService service, List<String> rows) {
        HttpResponse<String> answer = service.postReadings(Rows.batch(rows));
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
        assertThat(JSON.readTree(answer.body()).get("stored").asInt()).isEqualTo(rows.size());
    }

    @Test
    void are_counted_once_and_the_first_value_stands(@TempDir Path data) {
        try (RunningService service = RunningService.start(data, new SettableClock(NOW))) {
            String row = Rows.row("larval-1", "ph", 7.9, NOW);
            String sameTimeElsewhere = row.replace("12:00:00Z", "14:00:00+02:00");
            String inAnotherUnit = row.replace("}", ",\"unit\":\"1\"}");
            String otherwise = row.replace("7.9", "7.8");
            String token = service.token(Role.VIEWER);

            JsonNode within = JSON.readTree(
                    service.postReadings(Rows.batch(row, row, sameTimeElsewhere, inAnotherUnit, otherwise))
                            .body());
            assertThat(within.get("stored").asInt()).isEqualTo(1);
            assertThat(within.get("duplicates").asInt()).isEqualTo(3);
            assertThat(within.at("/refused/0/index").asInt()).isEqualTo(4);

            JsonNode later = JSON.readTree(
                    service.postReadings(Rows.batch(row, otherwise)).body());
            assertThat(later.get("stored").asInt()).isZero();
            assertThat(later.get("duplicates").asInt()).isEqualTo(1);
            assertThat(later.at("/refused/0/detail").asString())
                    .isEqualTo("value 7.8 contradicts 7.9, which this sensor already reported for " + NOW);

            JsonNode stored = JSON.readTree(
                    service.get("/api/v1/points/larval-1/readings?quantity=ph&to=2026-05-15T00:00:00Z", token)
                            .body());
            assertThat(stored.get("readings")).hasSize(1);
            assertThat(stored.at("/readings/0/value").asDouble()).isEqualTo(7.9);
            assertThat(service.refusedRows(service.site()))
                    .hasSize(2)
                    .allSatisfy(refused -> assertThat(refused.row()).isEqualTo(otherwise));
        }
    }
}
