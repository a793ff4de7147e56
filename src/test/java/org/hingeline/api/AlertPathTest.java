package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.awaitility.Awaitility.await;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.http.HttpResponse;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.stream.Stream;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.monitor.JournalBook;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** From a reading that comes in by HTTP to the alert, its mail, its acknowledgement and its end. */
class AlertPathTest {
    private static final JsonMapper JSON = new JsonMapper();
    private static final double FIT = 8.1;
    private static final double LOW = 7.6;

    @TempDir
    private Path data;

    private final SettableClock clock = new SettableClock(Instant.parse("2026-05-14T12:00:00Z"));
    private RunningService service;
    private String operator;

    @BeforeEach
    void start() {
        service = RunningService.start(data, clock);
        operator = service.token(Role.OPERATOR);
    }

    @AfterEach
    void stop() {
        service.close();
    }

    private void limit(String point, String name) {
        HttpResponse<String> answer = service.send("PUT", "/api/v1/points/" + point + "/limits/" + name, operator, """
                {"quantity":"omegaAragonite","below":1.8,"deadband":0.05,"onDelayMin":0,"offDelayMin":0,
                 "priority":"high","action":"Close the valve of the storage tank."}""");
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
    }

    private void water(String point, double ph) {
        water(point, ph, clock.instant());
    }

    private void water(String point, double ph, Instant at) {
        HttpResponse<String> answer = service.postReadings(Rows.batch(Rows.water(point, ph, at)));
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
    }

    private List<JsonNode> alerts(String state, String limit) {
        return JSON.readTree(
                        service.get("/api/v1/alerts?state=" + state, operator).body())
                .get("alerts")
                .valueStream()
                .filter(alert -> alert.get("limit").asString().equals(limit))
                .toList();
    }

    private HttpResponse<String> acknowledge(JsonNode alert, String token, String note) {
        return service.send(
                "POST",
                "/api/v1/alerts/" + alert.get("id").asLong() + "/acknowledgement",
                token,
                "{\"note\":\"" + note + "\"}");
    }

    private List<String> letters() {
        if (!Files.isDirectory(data.resolve("mail"))) {
            return List.of();
        }
        try (Stream<Path> files = Files.list(data.resolve("mail"))) {
            List<String> letters = new ArrayList<>();
            for (Path file : files.filter(f -> f.toString().endsWith(".eml")).toList()) {
                letters.add(Files.readString(file));
            }
            return letters;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    @Test
    void low_water_is_told_once_taken_on_and_ends() {
        limit("storage", "omega-low");
        water("storage", FIT);
        assertThat(alerts("open", "omega-low")).isEmpty();

        clock.pass(Duration.ofMinutes(1));
        Instant since = clock.instant();
        water("storage", LOW);
        List<JsonNode> open = alerts("open", "omega-low");
        assertThat(open).hasSize(1);
        JsonNode alert = open.get(0);
        assertThat(alert.get("point").asString()).isEqualTo("storage");
        assertThat(alert.get("state").asString()).isEqualTo("unacknowledged");
        assertThat(alert.get("value").asDouble()).isBetween(0.8, 1.2);
        assertThat(alert.get("uncertainty").asDouble()).isPositive();
        assertThat(alert.get("since").asString()).isEqualTo(since.toString());
        await("the mail to all three subscribers")
                .atMost(Duration.ofSeconds(20))
                .until(() -> letters().size() == 3);
        assertThat(letters())
                .allSatisfy(letter -> assertThat(letter)
                        .contains("Storage tank", "1.8", "Close the valve of the storage tank.")
                        .containsIgnoringCase("Auto-Submitted: auto-generated"))
                .anySatisfy(letter -> assertThat(letter).contains("desh@ilwen-narrows.example.org"))
                .anySatisfy(letter -> assertThat(letter).contains("tove@ilwen-narrows.example.org"))
                .anySatisfy(letter -> assertThat(letter).contains("ines@ilwen-narrows.example.org"));

        for (int i = 0; i < 3; i++) {
            clock.pass(Duration.ofMinutes(1));
            water("storage", LOW - 0.02 * i);
        }
        assertThat(alerts("open", "omega-low")).as("no second one").isEqualTo(open);

        JsonNode taken =
                JSON.readTree(acknowledge(alert, operator, "Valve closed.").body());
        assertThat(taken.get("state").asString()).isEqualTo("acknowledged");
        assertThat(taken.get("note").asString()).isEqualTo("Valve closed.");

        clock.pass(Duration.ofMinutes(1));
        water("storage", FIT);
        assertThat(alerts("open", "omega-low")).isEmpty();
        List<JsonNode> closed = alerts("closed", "omega-low");
        assertThat(closed).hasSize(1);
        assertThat(closed.get(0).get("id")).isEqualTo(alert.get("id"));
        assertThat(closed.get(0).get("closedAt").asString())
                .isEqualTo(clock.instant().toString());
        await("the mail that it is over")
                .atMost(Duration.ofSeconds(20))
                .until(() -> letters().size() == 6);

        HttpResponse<String> tooLate = acknowledge(alert, operator, "Me too.");
        assertThat(tooLate.statusCode()).isEqualTo(200);
        assertThat(JSON.readTree(tooLate.body()).get("note").asString()).isEqualTo("Valve closed.");
    }

    @Test
    void water_that_came_back_by_itself_waits_for_somebody_to_say_so() {
        limit("storage", "omega-low");
        water("storage", LOW);
        clock.pass(Duration.ofMinutes(1));
        water("storage", FIT);
        List<JsonNode> open = alerts("open", "omega-low");
        assertThat(open).hasSize(1);
        assertThat(open.get(0).get("state").asString()).isEqualTo("returned-unacknowledged");
        acknowledge(open.get(0), operator, "Seen.");
        assertThat(alerts("open", "omega-low")).isEmpty();
        assertThat(alerts("closed", "omega-low")).hasSize(1);
    }

    @Test
    void of_many_who_acknowledge_at_once_one_is_recorded() throws Exception {
        limit("storage", "omega-low");
        water("storage", LOW);
        JsonNode alert = alerts("open", "omega-low").get(0);
        List<Callable<HttpResponse<String>>> calls = new ArrayList<>();
        for (int i = 0; i < 8; i++) {
            String note = "number " + i;
            calls.add(() -> acknowledge(alert, operator, note));
        }
        ExecutorService threads = Executors.newFixedThreadPool(calls.size());
        List<String> notes = new ArrayList<>();
        try {
            for (Future<HttpResponse<String>> each : threads.invokeAll(calls)) {
                assertThat(each.get().statusCode()).isEqualTo(200);
                notes.add(JSON.readTree(each.get().body()).get("note").asString());
            }
        } finally {
            threads.shutdown();
        }
        assertThat(notes).as("everybody is told the same winner").containsOnly(notes.get(0));
        List<String> recorded = service.storage()
                .read(books -> books.journal().entries(service.site().id(), 100).stream()
                        .filter(entry -> entry.what().equals("alert-acknowledged"))
                        .map(JournalBook.Entry::detail)
                        .toList());
        assertThat(recorded).isEqualTo(List.of(notes.get(0)));
    }

    @Test
    void low_water_of_hours_ago_completes_the_record_and_wakes_nobody() {
        limit("storage", "omega-low");
        water("storage", FIT);
        for (int minutes = 300; minutes >= 120; minutes -= 10) {
            water("storage", LOW, clock.instant().minus(Duration.ofMinutes(minutes)));
        }
        JsonNode states = JSON.readTree(service.get("/api/v1/points/storage/water?from=2026-05-14T00:00:00Z", operator)
                        .body())
                .get("states");
        assertThat(states.valueStream().filter(s -> s.get("omegaAragonite").asDouble() < 1.8))
                .hasSize(19);
        // the watch that lets time pass over the limits comes by every 5 s
        await().during(Duration.ofSeconds(7))
                .atMost(Duration.ofSeconds(12))
                .until(() -> alerts("open", "omega-low").stream()
                                .noneMatch(
                                        alert -> alert.get("point").asString().equals("storage"))
                        && alerts("closed", "omega-low").isEmpty());
        assertThat(letters()).isEmpty();
        JsonNode tank =
                JSON.readTree(service.get("/api/v1/points/storage", operator).body());
        assertThat(tank.get("verdict").asString()).isEqualTo("fit");
        assertThat(tank.get("openAlerts")).isEmpty();
    }

    @Test
    void a_backlog_alone_rings_nobody_and_leaves_the_water_unknown() {
        limit("storage", "omega-low");
        water("storage", LOW, clock.instant().minus(Duration.ofHours(3)));
        assertThat(alerts("open", "omega-low")).isEmpty();
        JsonNode tank =
                JSON.readTree(service.get("/api/v1/points/storage", operator).body());
        assertThat(tank.get("verdict").asString()).as("nobody can say").isEqualTo("unknown");
        assertThat(tank.get("openAlerts")).as("more may be on its way").isEmpty();
    }

    @Test
    void a_limit_taken_away_ends_its_alert() {
        limit("storage", "omega-low");
        water("storage", LOW);
        assertThat(alerts("open", "omega-low")).hasSize(1);
        service.send("DELETE", "/api/v1/points/storage/limits/omega-low", operator, "");
        assertThat(alerts("open", "omega-low")).isEmpty();
        assertThat(alerts("closed", "omega-low")).hasSize(1);
    }
}
