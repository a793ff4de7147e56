package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;

/** What was put in goes on record over HTTP: once, checked, undone or corrected, never gone. */
class DosesTest {
    private static final Instant NOW = Instant.parse("2026-05-14T12:00:00Z");
    private static final Description DESCRIPTION = new Description();

    @TempDir
    private Path data;

    private SettableClock clock;
    private RunningService service;
    private String operator;
    private String viewer;
    private int keys;

    @BeforeEach
    void start() {
        clock = new SettableClock(NOW);
        service = RunningService.start(data, clock);
        operator = service.token(Role.OPERATOR);
        viewer = service.token(Role.VIEWER);
        assertThat(service.postReadings(Rows.batch(Rows.water("larval-3", 7.7, NOW)))
                        .statusCode())
                .isEqualTo(200);
    }

    @AfterEach
    void stop() {
        service.close();
    }

    @Test
    void a_dose_is_recorded_with_what_it_is_to_make_of_the_water_and_listed() {
        JsonNode dose = post("/api/v1/doses", operator, entry("larval-3", 50), 201);

        assertThat(dose.get("state").asString()).isEqualTo("recorded");
        assertThat(dose.get("by").asString()).isEqualTo("token test operator");
        assertThat(dose.get("at").asString()).isEqualTo("2026-05-14T12:00:00Z");
        JsonNode foretold = dose.get("foretold");
        double litres = foretold.get("volumeL").asDouble();
        double added = foretold.at("/after/totalAlkalinityUmolKg").asDouble()
                - foretold.at("/before/totalAlkalinityUmolKg").asDouble();
        // 2 mol of alkalinity in 105.99 g, in a sea water of about 1.02 kg/L
        assertThat(added).isCloseTo(50 * 2 / 105.99 / (litres * 1.02) * 1e6, within(0.01 * added));
        assertThat(foretold.at("/after/phTotal").asDouble())
                .isGreaterThan(foretold.at("/before/phTotal").asDouble());
        assertThat(dose.at("/outcome/verdict").asString()).isEqualTo("not-yet");

        JsonNode listed = get("/api/v1/points/larval-3/doses", viewer, 200);
        assertThat(listed.get("doses")).hasSize(1);
        assertThat(listed.at("/doses/0/id").asLong()).isEqualTo(dose.get("id").asLong());
        assertThat(listed.get("volume").isNull()).isTrue();
        assertThat(get("/api/v1/points/larval-3/doses?to=2026-05-14T11:00:00Z", viewer, 200)
                        .get("doses"))
                .isEmpty();
        assertThat(get("/api/v1/points/larval-2/doses", viewer, 200).get("doses"))
                .isEmpty();
    }

    @Test
    void a_doubled_tap_records_once() {
        String entry = entry("larval-3", 50);
        long first = post("/api/v1/doses", operator, entry, 201).get("id").asLong();

        clock.set(NOW.plusSeconds(1));
        assertThat(post("/api/v1/doses", operator, entry, 200).get("id").asLong())
                .isEqualTo(first);
        assertThat(get("/api/v1/points/larval-3/doses", viewer, 200).get("doses"))
                .hasSize(1);
        assertThat(post("/api/v1/doses", operator, entry.replace("50.0", "51.0"), 422)
                        .get("detail")
                        .asString())
                .contains("another dose");
    }

    @Test
    void two_taps_at_the_same_moment_record_once() {
        String entry = entry("larval-3", 50);

        List<Integer> answers = IntStream.range(0, 6)
                .parallel()
                .mapToObj(i ->
                        service.send("POST", "/api/v1/doses", operator, entry).statusCode())
                .sorted()
                .toList();

        assertThat(answers).containsExactly(200, 200, 200, 200, 200, 201);
        assertThat(get("/api/v1/points/larval-3/doses", viewer, 200).get("doses"))
                .hasSize(1);
    }

    @Test
    void a_record_is_undone_within_ten_minutes_by_whoever_made_it_and_stays_in_the_list() {
        long id = post("/api/v1/doses", operator, entry("larval-3", 50), 201)
                .get("id")
                .asLong();
        long late = post("/api/v1/doses", operator, entry("larval-3", 60), 201)
                .get("id")
                .asLong();
        String somebodyElse = service.signIn("ola", List.of(service.site()), Role.OPERATOR);
        assertThat(signed(somebodyElse, "/api/v1/doses/" + id + "/undo", "").statusCode())
                .isEqualTo(403);

        clock.set(NOW.plus(Duration.ofMinutes(10)));
        JsonNode undone = post("/api/v1/doses/" + id + "/undo", operator, "", 200);
        assertThat(undone.get("state").asString()).isEqualTo("undone");
        assertThat(undone.at("/undone/by").asString()).isEqualTo("token test operator");
        post("/api/v1/doses/" + id + "/undo", operator, "", 200);

        clock.set(NOW.plus(Duration.ofMinutes(11)));
        assertThat(post("/api/v1/doses/" + late + "/undo", operator, "", 409)
                        .get("detail")
                        .asString())
                .contains("enter a correction");
        assertThat(get("/api/v1/points/larval-3/doses", viewer, 200).get("doses"))
                .hasSize(2);
    }

    @Test
    void a_correction_takes_the_place_of_an_entry_once() {
        long wrong = post("/api/v1/doses", operator, entry("larval-3", 50), 201)
                .get("id")
                .asLong();
        clock.set(NOW.plus(Duration.ofHours(2)));
        String path = "/api/v1/doses/" + wrong + "/correction";
        String body = entry("larval-3", 5).replace("\"lot\"", "\"note\":\"A slip.\",\"lot\"");

        assertThat(post(path, operator, entry("larval-3", 5), 422).get("detail").asString())
                .contains("note is missing");
        JsonNode right = post(path, operator, body, 201);

        assertThat(right.get("corrects").asLong()).isEqualTo(wrong);
        assertThat(right.get("at").asString()).isEqualTo("2026-05-14T12:00:00Z");
        JsonNode doses = get("/api/v1/points/larval-3/doses", viewer, 200).get("doses");
        assertThat(doses).hasSize(2);
        assertThat(doses.get(1).get("state").asString()).isEqualTo("corrected");
        assertThat(doses.get(1).get("correctedBy").asLong())
                .isEqualTo(right.get("id").asLong());
        post(path, operator, body, 200);
        post(path, operator, entry("larval-3", 6).replace("\"lot\"", "\"note\":\"Again.\",\"lot\""), 409);
        post("/api/v1/doses/999/correction", operator, body.replace("key-", "kex-"), 404);
    }

    @Test
    void a_large_dose_waits_for_a_second_person_who_signed_in() {
        assertThat(post("/api/v1/doses", operator, entry("storage", 501), 422)
                        .get("detail")
                        .asString())
                .contains("two people");
        String mia = service.signIn("mia", List.of(service.site()), Role.OPERATOR);
        String ben = service.signIn("ben", List.of(service.site()), Role.OPERATOR);
        JsonNode pending = checked("POST /api/v1/doses", signed(mia, "/api/v1/doses", entry("storage", 501)));
        assertThat(pending.get("state").asString()).isEqualTo("pending");
        assertThat(pending.get("outcome").isNull()).isTrue();
        String path = "/api/v1/doses/" + pending.get("id").asLong() + "/confirmation";

        assertThat(signed(mia, path, "").body()).contains("somebody else has to confirm");
        assertThat(post(path, operator, "", 403).get("detail").asString()).contains("not by an access token");

        clock.set(NOW.plus(Duration.ofMinutes(4)));
        HttpResponse<String> answer = signed(ben, path, "");
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
        JsonNode confirmed = checked("POST /api/v1/doses/{id}/confirmation", answer);
        assertThat(confirmed.get("state").asString()).isEqualTo("recorded");
        assertThat(confirmed.at("/confirmed/by").asString()).isEqualTo("ben");
        assertThat(confirmed.get("at").asString()).isEqualTo("2026-05-14T12:04:00Z");
    }

    @Test
    void a_tank_gets_no_more_than_its_most_within_a_day() {
        for (int i = 0; i < 4; i++) {
            post("/api/v1/doses", operator, entry("storage", 500), 201);
        }
        assertThat(post("/api/v1/doses", operator, entry("storage", 1), 422)
                        .get("detail")
                        .asString())
                .contains("2000.0 g within 24 hours");
        post("/api/v1/doses", operator, entry("larval-3", 1), 201);
        clock.set(NOW.plus(Duration.ofHours(24)).plusSeconds(1));
        post("/api/v1/doses", operator, entry("storage", 1), 201);
    }

    @Test
    void a_viewer_records_and_changes_nothing_and_another_site_sees_nothing() {
        long id = post("/api/v1/doses", operator, entry("larval-3", 50), 201)
                .get("id")
                .asLong();
        post("/api/v1/doses", viewer, entry("larval-3", 50), 403);
        post("/api/v1/doses/" + id + "/undo", viewer, "", 403);
        post("/api/v1/doses/" + id + "/confirmation", viewer, "", 403);
        post("/api/v1/doses/" + id + "/correction", viewer, entry("larval-3", 50), 403);
        Site other = service.addPlace("""
                site: {code: alder-slough, name: Alder Slough Clams, zone: America/Vancouver}
                points:
                  - {code: pond, name: Nursery pond, kind: storage, position: 1}
                """);
        String elsewhere = service.token(other, Role.MANAGER);
        post("/api/v1/doses/" + id + "/undo", elsewhere, "", 404);
        post("/api/v1/doses", elsewhere, entry("larval-3", 50), 422);
        post("/api/v1/doses/x/undo", operator, "", 404);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "\"massG\":50.0|\"massG\":0|422|massG 0.0 must be above 0",
                "\"massG\":50.0|\"massG\":-3|422|massG -3.0 must be above 0",
                "\"massG\":50.0|\"massG\":900000|422|give grams",
                "\"massG\":50.0|\"massG\":\"50\"|400|massG \"50\" must be a number",
                "\"massG\":50.0,||422|massG is missing",
                "larval-3|larval-33|422|point \"larval-33\" is not known",
                "larval-3|intake|422|receives no dose",
                "sodium-carbonate|chalk|422|agent \"chalk\" is not known",
                "anhydrous|dry|422|hydration \"dry\" is not known",
                "\"assayPercent\":99.2|\"assayPercent\":0|422|assayPercent 0.0 must be 1 to 100",
                "SA-2291| |422|lot is missing",
                "\"lot\"|\"at\":\"2026-05-14T12:03:00Z\",\"lot\"|422|is in the future",
                "\"lot\"|\"at\":\"2026-05-07T11:59:00Z\",\"lot\"|422|more than 7 days ago",
                "\"lot\"|\"at\":\"yesterday\",\"lot\"|422|not an ISO 8601 time",
                "\"lot\"|\"volumeL\":0,\"lot\"|422|volumeL 0.0 must be above 0",
                "\"lot\"|\"followedPlan\":\"yes\",\"lot\"|400|must be true or false",
                "key-|k!-|422|is not accepted; give 8 to 80 letters",
                "\"lot\"|\"foretold\":{},\"lot\"|400|field \"foretold\" is not known here"
            })
    void what_cannot_be_a_dose_is_refused_and_says_why(String part, String instead, int status, String why) {
        String entry = entry("larval-3", 50).replace(part, instead == null ? "" : instead);

        JsonNode problem = post("/api/v1/doses", operator, entry, status);

        assertThat(problem.get("detail").asString()).contains(why);
        assertThat(get("/api/v1/points/larval-3/doses", viewer, 200).get("doses"))
                .isEmpty();
    }

    private String entry(String point, double massG) {
        return String.format(
                Locale.ROOT,
                "{\"key\":\"key-%06d\",\"point\":\"%s\",\"agent\":{\"code\":\"sodium-carbonate\","
                        + "\"hydration\":\"anhydrous\",\"assayPercent\":99.2},\"massG\":%s,\"lot\":\"SA-2291\"}",
                keys++,
                point,
                massG);
    }

    private JsonNode get(String path, String token, int status) {
        HttpResponse<String> answer = service.get(path, token);
        assertThat(answer.statusCode()).as("%s: %s", path, answer.body()).isEqualTo(status);
        return DESCRIPTION.check("GET /api/v1/points/{code}/doses", answer);
    }

    private JsonNode post(String path, String token, String body, int status) {
        HttpResponse<String> answer = service.send("POST", path, token, body);
        assertThat(answer.statusCode())
                .as("%s %s: %s", path, body, answer.body())
                .isEqualTo(status);
        return checked("POST " + path.replaceAll("/doses/[^/]+/", "/doses/{id}/"), answer);
    }

    private static JsonNode checked(String route, HttpResponse<String> answer) {
        return DESCRIPTION.check(route, answer);
    }

    /** As a page of a signed-in person sends it. */
    private HttpResponse<String> signed(String session, String path, String body) {
        String csrf = service.csrf(session);
        return service.send(HttpRequest.newBuilder(service.address().resolve(path))
                .header("Cookie", "hingeline_session=" + session)
                .header("X-Hingeline-Csrf", csrf)
                .header("Content-Type", "application/json")
                .POST(BodyPublishers.ofString(body))
                .build());
    }
}
