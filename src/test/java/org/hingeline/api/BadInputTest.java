package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.api.Rows.batch;
import static org.hingeline.api.Rows.row;

import java.io.ByteArrayInputStream;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublisher;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.monitor.ReadingBook.RefusedRow;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** Whatever is sent, the answer says what is wrong with it, and nothing of it is stored. */
class BadInputTest {
    private static final Instant NOW = Instant.parse("2026-05-14T12:00:00Z");
    private static final int TWENTY_MB = 20_000_000;

    /** Words of a program's inside that mean nothing to a gateway's author. */
    private static final Pattern INSIDE = Pattern.compile(
            "java|jackson|jetty|javalin|hingeline\\.|Exception|deserializ|coerc|Coercion|StreamRead|`|JsonToken|"
                    + "constructor|Creator|line -1|SQL|null\"",
            Pattern.CASE_INSENSITIVE);

    private static final Description DESCRIPTION = new Description();

    @TempDir
    private static Path data;

    private static RunningService service;
    private static String operator;

    private List<StoredReading> before;

    @BeforeAll
    static void start() {
        service = RunningService.start(data, new SettableClock(NOW));
        operator = service.token(Role.OPERATOR);
        assertThat(service.postReadings(batch(row("larval-3", "ph", 7.9, NOW))).statusCode())
                .isEqualTo(200);
    }

    @AfterAll
    static void stop() {
        service.close();
    }

    @BeforeEach
    void look() {
        before = service.allReadings(service.site());
    }

    @AfterEach
    void nothing_was_stored() {
        assertThat(service.allReadings(service.site())).isEqualTo(before);
    }

    /** Posts one row in which a field has another value; the answer must say so of row 0. */
    private static String refusal(String field, String json) {
        Map<String, String> fields = new LinkedHashMap<>(Map.of(
                "point", "\"larval-3\"", "quantity", "\"ph\"", "value", "7.5", "at", "\"2026-05-14T11:00:00Z\""));
        fields.put(field, json);
        String sent = "{"
                + String.join(
                        ",",
                        fields.entrySet().stream()
                                .filter(each -> !each.getValue().isEmpty())
                                .map(each -> "\"" + each.getKey() + "\":" + each.getValue())
                                .toList())
                + "}";
        HttpResponse<String> answer = service.postReadings("{\"readings\":[" + sent + "]}");
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(422);
        JsonNode body = DESCRIPTION.check("POST /api/v1/readings", answer);
        assertThat(body.get("refused")).hasSize(1);
        String detail = body.at("/refused/0/detail").asString();
        assertThat(detail).doesNotContainPattern(INSIDE);
        RefusedRow kept = service.refusedRows(service.site()).get(0);
        assertThat(kept.detail()).as("kept for review").isEqualTo(detail);
        assertThat(kept.row())
                .as("kept as it was sent")
                .isEqualTo(sent.length() <= 2000 ? sent : sent.substring(0, 1999) + "…");
        assertThat(kept.gateway()).isEqualTo("pump house");
        return detail;
    }

    @Test
    void a_point_that_is_not_known() {
        assertThat(refusal("point", "\"larval-9\"")).contains("point \"larval-9\"", "larval-4", "storage");
        assertThat(refusal("point", "\"Larval-3\"")).contains("\"Larval-3\"");
        assertThat(refusal("point", "\"\"")).isEqualTo("point is missing");
        assertThat(refusal("point", "")).isEqualTo("point is missing");
        assertThat(refusal("point", "null")).isEqualTo("point is missing");
    }

    @Test
    void a_quantity_that_cannot_be_posted() {
        assertThat(refusal("quantity", "\"colour\"")).contains("\"colour\"", "temperature");
        assertThat(refusal("quantity", "\"omegaAragonite\"")).contains("\"omegaAragonite\"", "accepted: ph");
        assertThat(refusal("quantity", "\"level\"")).contains("no sensor for level", "ph-3 (ph)");
    }

    @Test
    void a_unit_that_is_not_known() {
        assertThat(refusal("unit", "\"furlong\"")).contains("unit \"furlong\"", "ph", "[pH]");
        assertThat(refusal("unit", "\"Cel\"")).contains("unit \"Cel\"", "[pH]");
    }

    @Test
    void a_sensor_that_is_not_there() {
        assertThat(refusal("sensor", "\"ph-9\"")).contains("sensor \"ph-9\"", "ph-3 (ph)");
        assertThat(refusal("sensor", "\"temp-3\"")).contains("measures temperature, not ph");
        assertThat(refusal("sensor", "\"ph-1\"")).as("at another point").contains("sensor \"ph-1\"");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "\"NaN\"|value \"NaN\" is not a finite number",
                "\"Infinity\"|value \"Infinity\" is not a finite number",
                "\"7.5\"|value \"7.5\" is not a finite number",
                "1e999|value 1e999 is not a finite number",
                "-1e999|value -1e999 is not a finite number",
                "null|value is missing",
                "true|value true is not a finite number",
                "[7.5]|value […] is not a finite number",
                "{\"v\":7.5}|value {…} is not a finite number"
            })
    void a_value_that_is_no_number(String json, String detail) {
        assertThat(refusal("value", json)).startsWith(detail);
    }

    @Test
    void a_value_that_its_unit_makes_infinite() {
        String sent = batch("""
                {"point":"larval-3","quantity":"totalAlkalinity","value":1e305,"unit":"mol/kg","at":"%s"}""".formatted(NOW));
        HttpResponse<String> answer = service.postReadings(sent);
        assertThat(answer.statusCode()).isEqualTo(422);
        assertThat(answer.body()).contains("1.0E305 mol/kg is too large");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "2026-05-14T11:00:00",
                "2026-05-14 11:00:00Z",
                "2026-05-14",
                "2026-02-30T11:00:00Z",
                "11:00",
                "1778756400",
                "now"
            })
    void a_time_that_is_none_or_has_no_offset(String text) {
        assertThat(refusal("at", "\"" + text + "\""))
                .isEqualTo("at \"" + text + "\" is not an ISO 8601 time with offset such as 2026-05-14T03:20:00Z");
    }

    @Test
    void a_time_that_is_not_text() {
        assertThat(refusal("at", "1778756400")).contains("at 1778756400 is not a string");
        assertThat(refusal("at", "")).isEqualTo("at is missing");
    }

    @Test
    void a_time_in_the_future() {
        assertThat(refusal("at", "\"2026-05-14T12:02:01Z\""))
                .contains("2026-05-14T12:02:01Z", "is in the future", "accepted up to 120 s", "2026-05-14T12:02:00Z");
        assertThat(refusal("at", "\"2026-05-14T12:30:00+00:00\"")).contains("future");
        assertThat(refusal("at", "\"+999999999-12-31T23:59:59Z\"")).contains("future");
    }

    @Test
    void a_time_of_a_clock_that_was_never_set() {
        assertThat(refusal("at", "\"1970-01-01T00:00:00Z\"")).contains("before 2000-01-01", "gateway's clock");
        assertThat(refusal("at", "\"-999999999-01-01T00:00:00Z\"")).contains("before");
    }

    @Test
    void a_field_that_is_not_known() {
        assertThat(refusal("colour", "\"green\""))
                .isEqualTo("field \"colour\" is not known; accepted: point, quantity, value, at, unit, sensor");
        assertThat(refusal("unit", "[\"Cel\"]")).isEqualTo("unit […] is not a string");
    }

    @Test
    void a_text_without_end_is_not_repeated_in_full() {
        assertThat(refusal("point", "\"" + "p".repeat(300_000) + "\"")).hasSizeLessThan(300);
        assertThat(refusal("p".repeat(3000), "1")).hasSizeLessThan(300);
        assertThat(refusal("value", "\"" + "9".repeat(300_000) + "\"")).hasSizeLessThan(300);
    }

    @Test
    void a_text_that_no_table_can_store() {
        assertThat(refusal("point", "\"larval-3\\u0000\"")).contains("larval-3\ufffd");
        assertThat(refusal("unit", "\"\\ud800\"")).contains("\"\ufffd\"");
    }

    @Test
    void rows_that_are_no_objects() {
        HttpResponse<String> answer = service.postReadings("{\"readings\":[null,7,\"ph\",[],[[1]],true]}");
        assertThat(answer.statusCode()).isEqualTo(422);
        assertThat(DESCRIPTION.check("POST /api/v1/readings", answer).get("refused"))
                .hasSize(6)
                .allSatisfy(refused -> assertThat(refused.get("detail").asString())
                        .startsWith("a reading must be an object with the fields point, quantity, value"));
        assertThat(service.refusedRows(service.site()).stream().limit(6).map(RefusedRow::row))
                .containsExactly("true", "[[1]]", "[]", "\"ph\"", "7", "null");
    }

    @Test
    void a_value_that_contradicts_what_was_told_before() {
        HttpResponse<String> answer = service.postReadings(batch(row("larval-3", "ph", 7.1, NOW)));
        assertThat(answer.statusCode()).isEqualTo(422);
        assertThat(answer.body()).contains("value 7.1 contradicts 7.9", NOW.toString());
        assertThat(service.refusedRows(service.site()).get(0).row()).contains("7.1");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "null",
                "[]",
                "\"readings\"",
                "17",
                "{}",
                "{\"readings\":null}",
                "{\"readings\":{}}",
                "{\"readings\":\"none\"}",
                "{\"rows\":[]}",
                "{\"readings\":[]",
                "{\"readings\":[",
                "{\"readings\":[{\"point\":",
                "{\"readings\":[{\"point\":}]}",
                "{\"readings\":[{\"point\" \"larval-3\"}]}",
                "{\"readings\":[{\"value\":NaN}]}",
                "{\"readings\":[{\"value\":-Infinity}]}",
                "{\"readings\":[{\"value\":07.5}]}",
                "{\"readings\":[{\"value\":+7.5}]}",
                "{\"readings\":[{\"point\":\"a\",\"point\":\"b\"}]}",
                "{\"readings\":[],\"readings\":[]}",
                "{\"readings\":[]} and more",
                "{\"readings\":[]}{}",
                "{'readings':[]}",
                "{\"readings\":[],}",
                "readings=7",
                "<readings/>"
            })
    void a_body_that_is_no_batch(String body) {
        problem(service.postReadings(body), 400);
    }

    @Test
    void a_good_row_before_the_break_is_not_stored() {
        problem(
                service.postReadings("{\"readings\":[" + row("larval-3", "ph", 7.5, NOW.minusSeconds(5)) + ",{]}"),
                400);
    }

    @Test
    void a_batch_of_nothing() {
        assertThat(problem(service.postReadings("{\"readings\":[]}"), 422)).contains("at least one");
    }

    @Test
    void nesting_without_end() {
        problem(service.postReadings("[".repeat(100_000)), 400);
        problem(service.postReadings("{\"readings\":" + "[".repeat(5000) + "]".repeat(5000) + "}"), 400);
        problem(service.postReadings("{\"readings\":[{\"point\":" + "{\"a\":".repeat(5000)), 400);
        problem(service.send("PUT", "/api/v1/points/larval-3/limits/x", operator, "{\"a\":".repeat(5000)), 400);
    }

    @Test
    void a_number_without_end() {
        problem(service.postReadings("{\"readings\":[{\"value\":" + "9".repeat(5000) + "}]}"), 400);
    }

    @ParameterizedTest
    @ValueSource(strings = {"UTF-16", "UTF-16LE", "UTF-16BE", "UTF-32", "UTF-32LE"})
    void a_body_that_is_not_utf_8(String charset) {
        byte[] body = batch(row("larval-3", "ph", 7.5, NOW.minusSeconds(7))).getBytes(Charset.forName(charset));
        assertThat(problem(post(BodyPublishers.ofByteArray(body), "application/json"), 400))
                .contains("not UTF-8");
    }

    @Test
    void bytes_that_are_no_text() {
        byte[] body = batch(row("larval-3", "ph", 7.5, NOW.minusSeconds(7))).getBytes(StandardCharsets.ISO_8859_1);
        body[25] = (byte) 0xff;
        assertThat(problem(post(BodyPublishers.ofByteArray(body), "application/json"), 400))
                .contains("not UTF-8");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {"text/csv", "text/plain", "application/x-www-form-urlencoded", "application/jsonlines", "*/*"})
    void a_content_type_that_is_not_json(String type) {
        String body = batch(row("larval-3", "ph", 7.5, NOW.minusSeconds(7)));
        assertThat(problem(post(BodyPublishers.ofString(body), type), 415)).contains(type, "application/json");
    }

    @Test
    void too_many_rows() {
        List<String> rows = new ArrayList<>();
        for (int i = 0; i < 10_001; i++) {
            rows.add(row("larval-3", "ph", 7.5, NOW.minus(Duration.ofSeconds(i + 1L))));
        }
        assertThat(problem(service.postReadings(batch(rows)), 413)).contains("10000");
    }

    @Test
    void a_body_of_20_mb() {
        byte[] body = Collections.nCopies(TWENTY_MB / 10, "{\"readings").stream()
                .collect(Collectors.joining())
                .getBytes(StandardCharsets.UTF_8);
        assertThat(problem(post(BodyPublishers.ofByteArray(body), "application/json"), 413))
                .contains("larger");
        BodyPublisher chunked = BodyPublishers.ofInputStream(() -> new ByteArrayInputStream(body));
        assertThat(chunked.contentLength()).as("no Content-Length").isNegative();
        assertThat(problem(post(chunked, "application/json"), 413)).contains("larger");
    }

    @Test
    void no_key_or_a_wrong_one() {
        String body = batch(row("larval-3", "ph", 7.5, NOW.minusSeconds(7)));
        HttpRequest.Builder request = HttpRequest.newBuilder(service.address().resolve("/api/v1/readings"))
                .header("Content-Type", "application/json")
                .POST(BodyPublishers.ofString(body));
        assertThat(problem(service.send(request.copy().build()), 401)).contains("gateway key is missing");
        for (String key : List.of("Bearer", "Bearer ", "Basic YTpi", "Bearer hgk_wrong", "Bearer \u00e9", "hgk_x")) {
            problem(service.send(request.copy().header("Authorization", key).build()), 401);
        }
        problem(service.send("POST", "/api/v1/readings", operator, body), 401);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "`{\"quantity\":5,\"below\":1,\"action\":\"x\"}`|/quantity|quantity 5 must be a string",
                "`{\"quantity\":\"ph\",\"below\":1,\"action\":7.5}`|/action|action 7.5 must be a string",
                "`{\"quantity\":\"ph\",\"below\":1,\"action\":true}`|/action|action true must be a string",
                "`{\"quantity\":\"ph\",\"below\":1,\"action\":[\"x\"]}`|/action|action […] must be a string",
                "`{\"quantity\":{\"a\":1},\"below\":1,\"action\":\"x\"}`|/quantity|quantity {…} must be a string",
                "`{\"quantity\":\"ph\",\"below\":\"7.5\",\"action\":\"x\"}`|/below|below \"7.5\" must be a number",
                "`{\"quantity\":\"ph\",\"below\":\"\",\"action\":\"x\"}`|/below|below \"\" must be a number",
                "`{\"quantity\":\"ph\",\"below\":false,\"action\":\"x\"}`|/below|below false must be a number",
                "`{\"quantity\":\"ph\",\"below\":[7],\"action\":\"x\"}`|/below|below […] must be a number",
                "`{\"quantity\":\"ph\",\"beneath\":7}`|/beneath|field \"beneath\" is not known here; accepted: above, action"
            })
    void a_limit_of_wrong_kinds(String body, String pointer, String detail) {
        HttpResponse<String> answer = service.send("PUT", "/api/v1/points/larval-3/limits/bad", operator, body);
        assertThat(problem(answer, 400)).startsWith(detail);
        assertThat(answer.body()).contains("\"pointer\":\"" + pointer + "\"");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "`{\"quantity\":\"ph\",\"below\":1e999,\"action\":\"x\"}`|below Infinity must be a finite number",
                "`{\"quantity\":\"ph\",\"below\":\"NaN\",\"action\":\"x\"}`|below NaN must be a finite number",
                "`{\"quantity\":\"ph\",\"below\":7,\"above\":8,\"action\":\"x\"}`|exactly one of below and above is needed, got both",
                "`{\"quantity\":\"ph\",\"below\":7,\"deadband\":-1,\"action\":\"x\"}`|deadband -1.0 must be 0 to 1000",
                "`{\"quantity\":\"ph\",\"below\":7,\"onDelayMin\":1441,\"action\":\"x\"}`|onDelayMin 1441.0 must be 0 to 1440",
                "`{\"quantity\":\"ph\",\"below\":7,\"priority\":\"urgent\",\"action\":\"x\"}`|priority \"urgent\" is not one of low, medium, high",
                "`{\"quantity\":\"silence\",\"below\":7,\"action\":\"x\"}`|quantity \"silence\" cannot have a limit",
                "`{\"quantity\":\"ph\",\"below\":7,\"action\":\"a\\u0000b\"}`|action has a control character",
                "`{\"quantity\":\"ph\",\"below\":7,\"action\":\" \"}`|action must say what to do"
            })
    void a_limit_that_cannot_be(String body, String detail) {
        HttpResponse<String> answer = service.send("PUT", "/api/v1/points/larval-3/limits/bad", operator, body);
        assertThat(problem(answer, 422)).startsWith(detail);
        assertThat(answer.body()).contains("\"pointer\":");
        assertThat(service.get("/api/v1/points/larval-3", operator).body()).doesNotContain("\"bad\"");
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "null", "[]", "5", "\"x\"", "{", "{\"quantity\":\"ph\"", "{} {}", "{\"a\":1,\"a\":2}"})
    void a_limit_that_is_no_object(String body) {
        problem(service.send("PUT", "/api/v1/points/larval-3/limits/bad", operator, body), 400);
        problem(service.send("POST", "/api/v1/dose-plans", operator, body), 400);
    }

    private static HttpResponse<String> post(BodyPublisher body, String type) {
        return service.send(HttpRequest.newBuilder(service.address().resolve("/api/v1/readings"))
                .header("Authorization", "Bearer " + service.gatewayKey())
                .header("Content-Type", type)
                .POST(body)
                .build());
    }

    /** The answer is a problem of that status in words a gateway's author can use; its detail. */
    private static String problem(HttpResponse<String> answer, int status) {
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        assertThat(answer.headers().firstValue("Content-Type")).hasValue("application/problem+json");
        assertThat(DESCRIPTION.faults("/components/schemas/Problem", answer.body()))
                .as(answer.body())
                .isEmpty();
        String detail = new JsonMapper().readTree(answer.body()).get("detail").asString();
        assertThat(detail).doesNotContainPattern(INSIDE).hasSizeLessThan(600);
        return detail;
    }
}
