package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.Role;
import org.hingeline.seawater.PhScale;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;

/** Every route's real answers are what the description says, and each caller gets what is theirs and no more. */
class AnswersTest {
    private static final Instant NOW = Instant.parse("2026-05-14T12:00:00Z");
    private static final String LIMIT = """
            {"quantity":"omegaAragonite","below":1.2,"deadband":0.05,"onDelayMin":0,"offDelayMin":0,"priority":"high",
             "action":"Close the valve."}""";

    private static final Description DESCRIPTION = new Description();

    @TempDir
    private static Path data;

    private static RunningService service;
    private static Site other;
    private static String otherKey;
    private static String viewer;
    private static String operator;
    private static String otherOperator;

    @BeforeAll
    static void start() {
        service = RunningService.start(data, new SettableClock(NOW));
        viewer = service.token(Role.VIEWER);
        operator = service.token(Role.OPERATOR);
        other = service.addPlace(otherPlace());
        otherKey = service.gatewayKey(other);
        otherOperator = service.token(other, Role.OPERATOR);
        List<String> rows = new ArrayList<>();
        for (int minutes = 30; minutes >= 0; minutes -= 10) {
            rows.addAll(Rows.water("larval-3", 8.05, NOW.minus(Duration.ofMinutes(minutes))));
        }
        rows.add(Rows.row("intake", "ph", 8.0, NOW));
        assertThat(service.postReadings(Rows.batch(rows)).statusCode()).isEqualTo(200);
    }

    @AfterAll
    static void stop() {
        service.close();
    }

    /** A place with a point of the same code as one of the first. */
    private static PlacePlan otherPlace() {
        return new PlacePlan(
                new PlacePlan.SitePlan("far-point", "Far Point", ZoneId.of("UTC")),
                List.of(new PlacePlan.PointPlan(
                        "larval-3", "A tank elsewhere", PointKind.LARVAL, 1, null, null, Duration.ofMinutes(30))),
                List.of(new PlacePlan.SensorPlan(
                        "larval-3", "ph-elsewhere", Quantity.PH, "[pH]", PhScale.TOTAL, 0.02, null)),
                List.of(),
                List.of(),
                List.of());
    }

    private static JsonNode get(String route, String path, String token, int status) {
        HttpResponse<String> answer = service.get(path, token);
        assertThat(answer.statusCode()).as("%s: %s", path, answer.body()).isEqualTo(status);
        return DESCRIPTION.check("GET " + route, answer);
    }

    private static JsonNode send(String route, String path, String bearer, String body, int status) {
        HttpResponse<String> answer = service.send(route.split(" ")[0], path, bearer, body);
        assertThat(answer.statusCode())
                .as("%s %s: %s", path, body, answer.body())
                .isEqualTo(status);
        return DESCRIPTION.check(route, answer);
    }

    @Test
    void readings_are_answered_row_by_row() {
        String route = "POST /api/v1/readings";
        String good = Rows.row("storage", "ph", 8.0, NOW.minusSeconds(60));
        String bad = Rows.row("nowhere", "ph", 8.0, NOW);
        String path = "/api/v1/readings";
        String key = service.gatewayKey();

        JsonNode first = send(route, path, key, Rows.batch(good), 200);
        assertThat(first.get("stored").asInt()).isOne();
        JsonNode again = send(route, path, key, Rows.batch(good, good), 200);
        assertThat(again.get("stored").asInt()).isZero();
        assertThat(again.get("duplicates").asInt()).isEqualTo(2);
        JsonNode mixed = send(route, path, key, Rows.batch(bad, good), 207);
        assertThat(mixed.at("/refused/0/index").asInt()).isZero();
        assertThat(mixed.at("/refused/0/detail").asString()).contains("nowhere", "larval-1", "storage");
        send(route, path, key, Rows.batch(bad), 422);
        send(route, path, key, Rows.batch(), 422);
        send(route, path, key, "{", 400);
        send(route, path, "hgk_wrong", Rows.batch(good), 401);
        send(route, path, operator, Rows.batch(good), 401);
    }

    @Test
    void points_are_listed_and_found() {
        JsonNode points = get("/api/v1/points", "/api/v1/points", viewer, 200).get("points");
        assertThat(points.valueStream().map(point -> point.get("code").asString()))
                .containsExactly("intake", "storage", "larval-1", "larval-2", "larval-3", "larval-4");

        JsonNode tank = get("/api/v1/points/{code}", "/api/v1/points/larval-3", viewer, 200);
        assertThat(tank.get("verdict").asString()).isEqualTo("fit");
        assertThat(tank.get("volumeL").asDouble()).isEqualTo(20000);
        assertThat(tank.at("/batch/code").asString()).isEqualTo("cg-118");
        get("/api/v1/points/{code}", "/api/v1/points/larval-9", viewer, 404);
    }

    @Test
    void water_now_tells_what_was_used() {
        JsonNode water = get("/api/v1/points/{code}/water", "/api/v1/points/larval-3/water", viewer, 200);
        assertThat(water.get("at").asString()).isEqualTo(NOW.toString());
        assertThat(water.get("omegaAragonite").asDouble()).isBetween(2.3, 2.7);
        assertThat(water.get("inputs")).hasSize(4);
        assertThat(water.get("missing")).isEmpty();
        assertThat(water.at("/standardUncertainty/omegaAragonite/total").asDouble())
                .isPositive();
    }

    @Test
    void water_now_tells_what_is_missing() {
        JsonNode partly = get("/api/v1/points/{code}/water", "/api/v1/points/intake/water", viewer, 200);
        assertThat(partly.get("verdict").asString()).isEqualTo("unknown");
        assertThat(partly.get("missing")
                        .valueStream()
                        .map(m -> m.get("quantity").asString()))
                .containsExactly("temperature", "salinity", "totalAlkalinity");
        assertThat(partly.has("omegaAragonite")).isFalse();

        JsonNode never = get("/api/v1/points/{code}/water", "/api/v1/points/larval-2/water", viewer, 200);
        assertThat(never.get("at").isNull()).isTrue();
    }

    @Test
    void water_has_a_history_that_can_be_thinned() {
        String route = "/api/v1/points/{code}/water";
        String path = "/api/v1/points/larval-3/water";
        assertThat(get(route, path + "?from=2026-05-14T11:00:00Z", viewer, 200).get("states"))
                .hasSize(4);
        assertThat(get(route, path + "?from=2026-05-14T13:35:00%2B02:00&to=2026-05-14T11:55:00Z", viewer, 200)
                        .get("states"))
                .as("11:40 and 11:50")
                .hasSize(2);
        JsonNode hourly = get(route, path + "?step=PT1H", viewer, 200).get("states");
        assertThat(hourly.valueStream().map(state -> state.get("at").asString()))
                .containsExactly("2026-05-14T11:50:00Z", "2026-05-14T12:00:00Z");
        get(route, path + "?from=yesterday", viewer, 400);
        get(route, path + "?from=2026-05-14T11:00:00", viewer, 400);
        get(route, path + "?from=2026-05-14T13:00:00Z", viewer, 400);
        get(route, path + "?step=PT0S", viewer, 400);
        get(route, path + "?step=often", viewer, 400);
        get(route, path + "?from=-999999999-01-01T00:00:00Z&to=%2B999999999-12-31T23:59:59Z", viewer, 200);
        get(route, "/api/v1/points/larval-9/water", viewer, 404);
    }

    @Test
    void readings_are_listed_by_quantity() {
        String route = "/api/v1/points/{code}/readings";
        String path = "/api/v1/points/larval-3/readings";
        JsonNode readings =
                get(route, path + "?quantity=temperature", viewer, 200).get("readings");
        assertThat(readings).hasSize(4);
        assertThat(readings.get(0).get("unit").asString()).isEqualTo("Cel");
        JsonNode refused = get(route, path, viewer, 400);
        assertThat(refused.get("detail").asString()).startsWith("quantity is missing");
        get(route, path + "?quantity=omegaAragonite", viewer, 400);
        get(route, path + "?quantity=ph&to=never", viewer, 400);
        get(route, "/api/v1/points/larval-9/readings?quantity=ph", viewer, 404);
    }

    @Test
    void limits_are_set_and_taken_away() {
        String put = "PUT /api/v1/points/{code}/limits/{name}";
        String delete = "DELETE /api/v1/points/{code}/limits/{name}";
        String path = "/api/v1/points/storage/limits/low";
        JsonNode limit = send(put, path, operator, LIMIT, 200);
        assertThat(limit.get("below").asDouble()).isEqualTo(1.2);
        send(put, path, operator, LIMIT.replace("1.2", "1.3"), 200);
        JsonNode wrong = send(put, path, operator, "{\"quantity\":\"colour\",\"deadband\":-1}", 422);
        assertThat(wrong.get("errors").valueStream().map(e -> e.get("pointer").asString()))
                .containsExactlyInAnyOrder("/quantity", "/below", "/deadband", "/action");
        send(put, path, operator, "[]", 400);
        send(put, "/api/v1/points/larval-9/limits/low", operator, LIMIT, 404);
        send(put, "/api/v1/points/storage/limits/Low_1", operator, LIMIT, 422);
        send(put, "/api/v1/points/storage/limits/silence", operator, LIMIT, 422);

        send(delete, path, viewer, "", 403);
        send(delete, path, operator, "", 204);
        send(delete, path, operator, "", 404);
        send(delete, "/api/v1/points/storage/limits/silence", operator, "", 422);
    }

    @Test
    void alerts_are_listed_and_acknowledged() {
        String limit = "/api/v1/points/larval-1/limits/too-low";
        String acknowledge = "POST /api/v1/alerts/{id}/acknowledgement";
        send("PUT /api/v1/points/{code}/limits/{name}", limit, operator, LIMIT, 200);
        send(
                "POST /api/v1/readings",
                "/api/v1/readings",
                service.gatewayKey(),
                Rows.batch(Rows.water("larval-1", 7.5, NOW)),
                200);
        JsonNode open =
                get("/api/v1/alerts", "/api/v1/alerts?state=open", viewer, 200).get("alerts");
        JsonNode alert = open.valueStream()
                .filter(each -> each.get("limit").asString().equals("too-low"))
                .findFirst()
                .orElseThrow();
        String path = "/api/v1/alerts/" + alert.get("id").asLong() + "/acknowledgement";
        send(acknowledge, path, viewer, "{}", 403);
        send(acknowledge, path, otherOperator, "{}", 404);
        send(acknowledge, path, operator, "{\"note\":\"" + "n".repeat(501) + "\"}", 422);
        send(acknowledge, path, operator, "{\"remark\":\"x\"}", 400);
        assertThat(get("/api/v1/points/{code}", "/api/v1/points/larval-1", viewer, 200)
                        .at("/openAlerts/0/state")
                        .asString())
                .isEqualTo("unacknowledged");
        JsonNode done = send(acknowledge, path, operator, "", 200);
        assertThat(done.get("state").asString()).isEqualTo("acknowledged");
        assertThat(done.get("acknowledgedBy").asString()).isEqualTo("token test operator");
        send(acknowledge, "/api/v1/alerts/999999/acknowledgement", operator, "{}", 404);
        send(acknowledge, "/api/v1/alerts/first/acknowledgement", operator, "{}", 404);

        send("DELETE /api/v1/points/{code}/limits/{name}", limit, operator, "", 204);
        JsonNode closed = get("/api/v1/alerts", "/api/v1/alerts?state=closed", viewer, 200)
                .get("alerts");
        assertThat(closed.get(0).get("state").asString()).isEqualTo("closed");
        get("/api/v1/alerts", "/api/v1/alerts?state=loud", viewer, 400);
    }

    @Test
    void the_service_tells_how_it_is() {
        HttpRequest live = HttpRequest.newBuilder(service.address().resolve("/health/live"))
                .build();
        HttpRequest ready = HttpRequest.newBuilder(service.address().resolve("/health/ready"))
                .build();
        DESCRIPTION.check("GET /health/live", service.send(live));
        assertThat(DESCRIPTION.check("GET /health/ready", service.send(ready)).get("parts"))
                .hasSizeGreaterThanOrEqualTo(3);
        get("/metrics", "/metrics", viewer, 200);
        assertThat(service.get("/metrics", viewer).body()).contains("# TYPE");
        get("/api/v1/openapi.yaml", "/api/v1/openapi.yaml", viewer, 200);
        assertThat(service.get("/api/v1/openapi.yaml", viewer).body()).isEqualTo(DESCRIPTION.text());
    }

    @Test
    void nothing_is_told_without_a_token() {
        for (String route : DESCRIPTION.routes()) {
            if (route.contains("/health/")) {
                continue;
            }
            String[] parts = route.split(" ");
            String path = parts[1].replace("{code}", "larval-3")
                    .replace("{name}", "omega-low")
                    .replace("{id}", "1");
            HttpRequest.Builder request = HttpRequest.newBuilder(
                            service.address().resolve(path))
                    .method(parts[0], BodyPublishers.ofString("{}"));
            HttpResponse<String> none = service.send(request.build());
            assertThat(none.statusCode()).as(route).isEqualTo(401);
            assertThat(none.headers().firstValue("WWW-Authenticate")).hasValue("Bearer");
            DESCRIPTION.check(route, none);
            HttpResponse<String> wrong =
                    service.send(request.header("Authorization", "Bearer hat_x").build());
            assertThat(wrong.statusCode()).as(route).isEqualTo(401);
            DESCRIPTION.check(route, wrong);
        }
    }

    @Test
    void a_viewer_changes_nothing() {
        String route = "PUT /api/v1/points/{code}/limits/{name}";
        JsonNode refused = send(route, "/api/v1/points/larval-3/limits/mine", viewer, LIMIT, 403);
        assertThat(refused.get("detail").asString()).contains("operator", "viewer");
        assertThat(service.get("/api/v1/points/larval-3", viewer).body()).doesNotContain("\"mine\"");
    }

    @Test
    void a_token_of_another_site_sees_nothing_of_this_one() {
        JsonNode points =
                get("/api/v1/points", "/api/v1/points", otherOperator, 200).get("points");
        assertThat(points).hasSize(1);
        assertThat(points.get(0).get("name").asString()).isEqualTo("A tank elsewhere");
        assertThat(get("/api/v1/points/{code}/water", "/api/v1/points/larval-3/water", otherOperator, 200)
                        .has("omegaAragonite"))
                .isFalse();
        assertThat(get(
                                "/api/v1/points/{code}/readings",
                                "/api/v1/points/larval-3/readings?quantity=temperature",
                                otherOperator,
                                200)
                        .get("readings"))
                .isEmpty();
        assertThat(get("/api/v1/alerts", "/api/v1/alerts", otherOperator, 200).get("alerts"))
                .isEmpty();
        get("/api/v1/points/{code}", "/api/v1/points/intake", otherOperator, 404);
        for (String path : List.of("/api/v1/points", "/api/v1/alerts")) {
            get(path, path + "?site=" + service.site().code(), otherOperator, 404);
        }
        send(
                "PUT /api/v1/points/{code}/limits/{name}",
                "/api/v1/points/intake/limits/omega-low",
                otherOperator,
                LIMIT,
                404);
    }

    @Test
    void a_key_of_another_site_posts_nothing_here() {
        JsonNode answer = send(
                "POST /api/v1/readings",
                "/api/v1/readings",
                otherKey,
                Rows.batch(Rows.row("larval-4", "ph", 7.0, NOW), Rows.row("larval-3", "ph", 7.0, NOW.minusSeconds(1))),
                207);
        assertThat(answer.get("stored").asInt()).as("its own tank of that code").isOne();
        assertThat(answer.at("/refused/0/detail").asString())
                .contains("larval-4", "known: larval-3")
                .doesNotContain("intake");
        assertThat(service.get("/api/v1/points/larval-4/readings?quantity=ph", viewer)
                        .body())
                .isEqualTo("{\"readings\":[]}");
        assertThat(service.get("/api/v1/points/larval-3/readings?quantity=ph", viewer)
                        .body())
                .doesNotContain("ph-elsewhere");
        assertThat(service.refusedRows(other))
                .as("kept with the site whose key it was")
                .anySatisfy(row -> assertThat(row.row()).contains("larval-4"));
    }

    @Test
    void a_person_of_several_sites_says_which() {
        String session = service.signIn("both", List.of(service.site(), other), Role.OPERATOR);
        HttpResponse<String> which = inBrowser("GET", "/api/v1/points", session, null);
        assertThat(which.statusCode()).isEqualTo(400);
        assertThat(which.body()).contains("ilwen-narrows", "far-point");
        DESCRIPTION.check("GET /api/v1/points", which);
        HttpResponse<String> said = inBrowser("GET", "/api/v1/points?site=far-point", session, null);
        assertThat(DESCRIPTION.check("GET /api/v1/points", said).get("points")).hasSize(1);
    }

    @Test
    void a_browser_proves_where_its_change_comes_from() {
        String session = service.signIn("olga", List.of(service.site()), Role.OPERATOR);
        String route = "PUT /api/v1/points/{code}/limits/{name}";
        String path = "/api/v1/points/storage/limits/of-a-browser";
        HttpResponse<String> forged = inBrowser("PUT", path, session, null);
        assertThat(forged.statusCode()).isEqualTo(403);
        DESCRIPTION.check(route, forged);
        assertThat(inBrowser("PUT", path, session, "guessed").statusCode()).isEqualTo(403);
        String page = inBrowser("GET", "/", session, null).body();
        String csrf = page.replaceAll("(?s).*name=\"csrf\" value=\"([^\"]+)\".*", "$1");
        HttpResponse<String> own = inBrowser("PUT", path, session, csrf);
        assertThat(own.statusCode()).as(own.body()).isEqualTo(200);
        DESCRIPTION.check(route, own);
    }

    private static HttpResponse<String> inBrowser(String method, String path, String session, String csrf) {
        HttpRequest.Builder request = HttpRequest.newBuilder(service.address().resolve(path))
                .header("Cookie", "hingeline_session=" + session)
                .header("Content-Type", "application/json")
                .method(method, BodyPublishers.ofString(method.equals("GET") ? "" : LIMIT));
        if (csrf != null) {
            request.header("X-Hingeline-Csrf", csrf);
        }
        return service.send(request.build());
    }

    @Test
    void an_unknown_address_or_method_is_a_problem_too() {
        assertThat(service.get("/api/v1/nothing", viewer).statusCode()).isEqualTo(404);
        assertProblem(service.get("/api/v1/nothing", viewer), 404);
        assertProblem(service.get("/api/v1/readings", viewer), 405);
        assertProblem(service.send("POST", "/api/v1/points", viewer, "{}"), 405);
        assertProblem(service.get("/api/v1/points/%00", viewer), 400);
        assertProblem(service.get("/api/v1/points/x?" + "y".repeat(20_000), viewer), 414);
    }

    private static void assertProblem(HttpResponse<String> answer, int status) {
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        assertThat(answer.headers().firstValue("Content-Type")).hasValue("application/problem+json");
        assertThat(DESCRIPTION.faults("/components/schemas/Problem", answer.body()))
                .as(answer.body())
                .isEmpty();
    }
}
