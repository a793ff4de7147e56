package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.URLEncoder;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The calculator page through HTTP: what is typed, what comes of it, what is refused, and where a point's water came from. */
class CalculatorPageTest {
    private static final Instant T0 = Instant.parse("2026-05-14T12:00:00Z");
    private static final SettableClock CLOCK = new SettableClock(T0);

    @TempDir
    static Path data;

    private static RunningService service;
    private static String viewer;
    private static String stranger;

    @BeforeAll
    static void start() {
        service = RunningService.start(data, CLOCK);
        viewer = service.token(Role.VIEWER);
        Site other = service.addPlace("""
                site: {code: alder-slough, name: Alder Slough Clams, zone: America/Vancouver}
                points:
                  - {code: pond, name: Nursery pond, kind: storage, position: 1}
                sensors:
                  - {point: pond, code: ph-p, quantity: ph, unit: "[pH]", phScale: nbs, standardUncertainty: 0.03}
                  - {point: pond, code: temp-p, quantity: temperature, unit: "[degF]", standardUncertainty: 0.2}
                  - {point: pond, code: cond-p, quantity: conductivity, unit: mS/cm, standardUncertainty: 0.2}
                  - {point: pond, code: ta-p, quantity: totalAlkalinity, unit: meq/L, standardUncertainty: 12}
                  - {point: pond, code: ca-p, quantity: calcium, unit: mmol/kg, standardUncertainty: 0.05}
                """);
        stranger = service.token(other, Role.MANAGER);
        String pond = row("pond", "temperature", 61.7, T0) + "," + row("pond", "conductivity", 33.3, T0) + ","
                + row("pond", "ph", 8.1, T0) + "," + row("pond", "totalAlkalinity", 2.05, T0) + ","
                + row("pond", "calcium", 9.1, T0);
        assertThat(service.send("POST", "/api/v1/readings", service.gatewayKey(other), "{\"readings\":[" + pond + "]}")
                        .body())
                .contains("\"stored\":5");
        post("larval-3", 7.93, T0.minus(Duration.ofMinutes(40)));
        post("larval-3", 7.71, T0.minus(Duration.ofMinutes(5)));
        assertThat(service.postReadings("{\"readings\":[" + row("larval-4", "ph", 7.9, T0) + ","
                                + row("larval-4", "temperature", 20, T0) + "]}")
                        .statusCode())
                .isEqualTo(200);
    }

    @AfterAll
    static void stop() {
        if (service != null) {
            service.close();
        }
    }

    @Test
    void asks_before_anything_is_typed_and_stands_in_the_navigation() {
        String page = page("/calculator", 200);

        assertThat(page)
                .contains("<a href=\"/calculator\" aria-current=\"page\">Calculator</a>")
                .contains("Work it out", "name=\"ph\"", "name=\"ta\"", "name=\"dic\"", "name=\"pco2\"")
                .doesNotContain("id=\"state\"", "aria-invalid");
        assertThat(value(page, "tempPm")).isEqualTo("0.1");
        assertThat(value(page, "taPm")).isEqualTo("10");
    }

    @Test
    void works_out_the_published_water_with_its_plus_minus_and_its_shares() {
        String words = words(page(form("temp", "25", "salt", "35", "ph", "8.1", "ta", "2300"), 200));

        assertThat(words)
                .contains("Ω 3.72 ±")
                .contains("inorganic carbon, DIC 1 963 ±")
                .contains("pCO₂ 339 ±");
        assertThat(digits(words, "dicUmolKg")).isCloseTo(1963.436, within(0.002));
        assertThat(digits(words, "omegaAragonite")).isCloseTo(3.71526, within(1e-5));
        assertThat(words)
                .contains("NBS scale 8.2")
                .contains("cancels when two readings are compared")
                .contains("Lueker, Dickson")
                .contains("Mucci 1983");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "temp; 77; tempUnit; [degF]",
                "temp; 25,0; tempUnit; Cel",
                "salt; 35,0; saltUnit; 1",
                "salt; 53,071; saltUnit; mS/cm",
                "salt; 5,3071; saltUnit; S/m",
                "ta; 2,35369; taUnit; meq/L",
                "ta; 2 300; taUnit; umol/kg",
                "ta; 2.3; taUnit; mmol/kg",
                "ta; 117,782; taUnit; mg/L",
                "ta; 6,5996; taUnit; {dKH}",
                "ph; 8,1; phUnit; total",
                "ph; 8.0871; phUnit; seawater",
                "ph; 8.2077; phUnit; free",
                "phTemp; 25; phUnit; total"
            })
    void the_same_water_is_the_same_in_every_unit(String field, String typed, String unitField, String unit) {
        Map<String, String> fields = fields("temp", "25", "salt", "35", "ph", "8.1", "ta", "2300");
        fields.put(field, typed);
        fields.put(unitField, unit);

        String words = words(page(query(fields), 200));

        assertThat(digits(words, "omegaAragonite")).isCloseTo(3.71526, within(0.001));
        assertThat(digits(words, "temperatureC")).isCloseTo(25, within(1e-9));
        assertThat(digits(words, "salinity")).isCloseTo(35, within(0.001));
    }

    @ParameterizedTest
    @CsvSource({
        "ph-ta, ph, 8.1, ta, 2300",
        "ph-dic, ph, 8.1, dic, 1963.436",
        "ph-pco2, ph, 8.1, pco2, 339.464",
        "ta-dic, ta, 2300, dic, 1963.436",
        "ta-pco2, ta, 2300, pco2, 339.464",
        "dic-pco2, dic, 1963.436, pco2, 339.464"
    })
    void every_pair_gives_the_same_water_and_ignores_what_stands_in_the_other_fields(
            String pair, String one, String first, String other, String second) {
        Map<String, String> fields =
                fields("temp", "25", "salt", "35", "ph", "7", "ta", "7", "dic", "7", "pco2", "7", "pair", pair);
        fields.put(one, first);
        fields.put(other, second);

        String page = page(query(fields), 200);

        assertThat(digits(words(page), "omegaAragonite")).isCloseTo(3.71526, within(2e-4));
        assertThat(page).contains("value=\"" + pair + "\" checked");
    }

    @Test
    void a_plus_minus_counts_in_the_unit_it_stood_in_and_is_shown_in_the_one_that_was_chosen() {
        String page = page(
                form(
                        "temp", "25", "salt", "35", "ph", "8.1", "ta", "2,35369", "taUnit", "meq/L", "taPm", "10",
                        "taPmIn", "umol/kg"),
                200);

        assertThat(words(page)).contains("total alkalinity 2 300 ±10 µmol/kg = 2.354 ±0.010 meq/L");
        assertThat(value(page, "taPm")).isEqualTo("0.01");
        assertThat(page).contains("<input type=\"hidden\" name=\"taPmIn\" value=\"meq/L\">");

        String again = page(
                form(
                        "temp", "25", "salt", "35", "ph", "8.1", "ta", "2.35369", "taUnit", "meq/L", "taPm", "0,02",
                        "taPmIn", "meq/L"),
                200);
        assertThat(words(again)).contains("total alkalinity 2 300 ±20 µmol/kg");
    }

    @Test
    void nbs_buffers_count_with_a_twentieth_whatever_is_typed() {
        String words = words(page(form("temp", "25", "salt", "35", "ph", "8.2", "phUnit", "nbs", "ta", "2300"), 200));

        assertThat(words).containsPattern("pH, total scale 8\\.0\\d ±0\\.05");
        assertThat(words).contains("Mind this before relying on it").contains("NBS");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "temp; warm; “warm” is not a number; 18,5 would be",
                "temp; ''; fill in the temperature",
                "temp; 60; 60 cannot be: −2 to 45 °C is accepted",
                "salt; 51; 51 cannot be: 0 to 50 is accepted",
                "salt; -1; −1 cannot be: 0 to 50 is accepted",
                "ph; 14; 14 cannot be: 2 to 13 is accepted",
                "ph; ''; it is empty. Fill it in",
                "phTemp; 99; 99 cannot be: −2 to 45 °C is accepted",
                "ta; 1e6; 1000000 cannot be",
                "ta; 1; too low for pH 8.1: a higher one is accepted",
                "taPm; -3; 0 to 10000 µmol/kg is accepted",
                "warmTo; 80; 80 cannot be: −2 to 45 °C is accepted",
                "airTo; 0; 0 cannot be: above 0 to 1000000 µatm is accepted",
                "limit; 99; 99 cannot be: above 0 to 20 is accepted",
                "phosphate; -1; 0 to 1000 µmol/kg is accepted",
                "calcium; 2000; 0 to 100 mmol/kg is accepted",
                "ammonia; much; “much” is not a number",
                "blendShare; 130; cannot be",
                "blendTemp; 12; ''"
            })
    void a_field_that_cannot_be_is_refused_beside_it_with_what_could(String field, String typed, String why) {
        Map<String, String> fields = fields("temp", "25", "salt", "35", "ph", "8.1", "ta", "2300");
        fields.put(field, typed);

        String page = page(query(fields), 422);

        String id = "c-" + (field.equals("blendTemp") ? "blendShare" : field);
        Matcher error = Pattern.compile("id=\"" + id + "-error\">([^<]*)<").matcher(page);
        assertThat(error.find()).as("an error at " + id + " in " + words(page)).isTrue();
        assertThat(error.group(1).replace("-", "−")).contains(why.replace("-", "−"));
        assertThat(page).contains("Nothing was worked out.").doesNotContain("id=\"state\"");
        assertThat(value(page, field)).isEqualTo(typed);
    }

    @Test
    void everything_wrong_is_told_at_once_and_in_the_persons_unit() {
        String page =
                page(form("temp", "212", "tempUnit", "[degF]", "salt", "99", "ph", "14", "ta", "", "airTo", "x"), 422);

        assertThat(page).contains("212\u00a0°F would be 100\u00a0°C, and that cannot be: −2 to 45 °C is accepted");
        for (String field : new String[] {"temp", "salt", "ph", "ta", "airTo"}) {
            assertThat(page).contains("id=\"c-" + field + "-error\"");
        }
    }

    @Test
    void a_pair_unit_or_scale_nobody_offers_is_refused() {
        assertThat(page(form("temp", "25", "salt", "35", "pair", "ph-ph", "ph", "8"), 422))
                .contains("choose which two");
        assertThat(page(form("temp", "25", "salt", "35", "ph", "8", "ta", "2300", "taUnit", "stone"), 422))
                .contains("unit “stone” is not known; accepted: umol/kg");
        assertThat(page(form("temp", "25", "salt", "35", "ph", "8", "ta", "2300", "phUnit", "sour"), 422))
                .contains("id=\"c-ph-error\"");
    }

    @Test
    void says_what_the_water_becomes_warmed_aerated_and_blended() {
        String words = words(page(
                form(
                        "temp",
                        "15",
                        "salt",
                        "35",
                        "ph",
                        "7.8",
                        "ta",
                        "2300",
                        "warmTo",
                        "25",
                        "airTo",
                        "420",
                        "blendShare",
                        "50",
                        "blendTemp",
                        "15",
                        "blendSalt",
                        "35",
                        "blendPh",
                        "7.8",
                        "blendTa",
                        "2300",
                        "ammonia",
                        "0,5"),
                200));

        Matcher omega = Pattern.compile(
                        "What it becomes Quantity now closed, at 25 °C aerated to 420 µatm with 50 % of the other"
                                + " Ω aragonite ([\\d.]+) ±[\\d.]+ ([\\d.]+) ±[\\d.]+ ([\\d.]+) ±[\\d.]+ ([\\d.]+) ±")
                .matcher(words);
        assertThat(omega.find()).as(words).isTrue();
        assertThat(Double.parseDouble(omega.group(2))).isGreaterThan(Double.parseDouble(omega.group(1)));
        assertThat(Double.parseDouble(omega.group(3))).isGreaterThan(Double.parseDouble(omega.group(2)));
        assertThat(omega.group(4)).isEqualTo(omega.group(1));
        assertThat(words).contains("Un-ionised ammonia").contains("US EPA 1989");
    }

    @Test
    void a_limit_is_drawn_and_held_against_omega() {
        String page = page(form("temp", "25", "salt", "35", "ph", "8.1", "ta", "2300", "limit", "3,7"), 200);

        assertThat(words(page)).contains("Above the limit of 3.70, but by less than its ±.");
        assertThat(page).contains("class=\"line-limit\"", "your limit 3.70").contains("role=\"img\"");
        assertThat(page(form("temp", "25", "salt", "35", "ph", "8.1", "ta", "2300"), 200))
                .doesNotContain("line-limit", "The limit");
    }

    @Test
    void shows_how_the_water_of_a_point_was_computed_with_the_very_numbers_that_are_stored() throws Exception {
        JsonNode stored = new JsonMapper()
                .readTree(service.get("/api/v1/points/larval-3/water", viewer).body());

        String page = page("/calculator?point=larval-3", 200);

        String words = words(page);
        for (String name : new String[] {
            "omegaAragonite", "phTotal", "dicUmolKg", "pco2Uatm", "carbonateUmolKg", "totalAlkalinityUmolKg"
        }) {
            double value = stored.get(name).asDouble();
            assertThat(digits(words, name)).as(name).isCloseTo(value, within(1e-6 * value));
        }
        double u = stored.get("standardUncertainty")
                .get("omegaAragonite")
                .get("total")
                .asDouble();
        assertThat(plusMinus(words, "omegaAragonite")).isCloseTo(u, within(1e-6));
        assertThat(words)
                .contains("How the water at Larval tank 3 was computed")
                .contains("pH 7.71 ±0.02 total scale sensor ph-3 read 04:55 , fresh then; passed the range test")
                .contains("total alkalinity 2080 ±10 µmol/kg sensor ta-3")
                .contains("Under the limit of 2.00, by more than its ±.")
                .doesNotContain("You changed");
        assertThat(value(page, "limit")).isEqualTo("2");
    }

    @Test
    void takes_up_a_salinity_from_conductivity_a_measured_calcium_and_nbs_buffers_as_the_state_did() throws Exception {
        JsonNode stored = new JsonMapper()
                .readTree(service.get("/api/v1/points/pond/water", stranger).body());

        HttpResponse<String> answer = answer("/calculator?point=pond", stranger);

        String words = words(answer.body());
        assertThat(answer.statusCode()).as(words).isEqualTo(200);
        for (String name :
                new String[] {"omegaAragonite", "phTotal", "dicUmolKg", "salinity", "totalAlkalinityUmolKg"}) {
            double value = stored.get(name).asDouble();
            assertThat(digits(words, name)).as(name).isCloseTo(value, within(1e-6 * value));
        }
        double u = stored.get("standardUncertainty")
                .get("omegaAragonite")
                .get("total")
                .asDouble();
        assertThat(plusMinus(words, "omegaAragonite")).isCloseTo(u, within(1e-4 * u));
        assertThat(words)
                .contains("conductivity sensor cond-p")
                .contains("NBS scale sensor ph-p")
                .contains("calcium 9.1 ±0.05 mmol/kg sensor ca-p")
                .doesNotContain("At the time Ω");
        assertThat(value(answer.body(), "calcium")).isEqualTo("9.1");
    }

    @Test
    void says_so_when_a_sensor_is_registered_otherwise_than_when_the_state_was_computed() {
        String place = """
                site: {code: alder-slough, name: Alder Slough Clams, zone: America/Vancouver}
                points:
                  - {code: sump, name: Sump, kind: storage, position: 2}
                sensors:
                  - {point: sump, code: ph-s, quantity: ph, unit: "[pH]", phScale: SCALE, standardUncertainty: 0.03}
                  - {point: sump, code: temp-s, quantity: temperature, unit: Cel, standardUncertainty: 0.2}
                  - {point: sump, code: sal-s, quantity: salinity, unit: "1", standardUncertainty: 0.2}
                  - {point: sump, code: ta-s, quantity: totalAlkalinity, unit: umol/kg, standardUncertainty: 12}
                """;
        Site other = service.addPlace(place.replace("SCALE", "total"));
        String rows = row("sump", "temperature", 17, T0) + "," + row("sump", "salinity", 28, T0) + ","
                + row("sump", "totalAlkalinity", 2000, T0) + "," + row("sump", "ph", 8.0, T0);
        service.send("POST", "/api/v1/readings", service.gatewayKey(other), "{\"readings\":[" + rows + "]}");
        assertThat(words(answer("/calculator?point=sump", stranger).body()))
                .contains("total scale sensor ph-s")
                .doesNotContain("At the time Ω");

        service.addPlace(place.replace("SCALE", "nbs"));

        assertThat(words(answer("/calculator?point=sump", stranger).body()))
                .contains("NBS scale sensor ph-s")
                .containsPattern(
                        "At the time Ω 2\\.\\d+ was computed; with the sensors as they are registered .* now it is 1\\.\\d+\\.");
    }

    @Test
    void shows_a_state_of_the_past_and_what_a_person_changed_of_it() {
        String then = T0.minus(Duration.ofMinutes(40)).toString();
        String page = page("/calculator?point=larval-3&at=" + then, 200);
        assertThat(value(page, "ph")).isEqualTo("7.93");
        assertThat(page).contains("name=\"at\" value=\"" + then + "\"");

        String between = T0.minus(Duration.ofMinutes(20)).toString();
        assertThat(value(page("/calculator?point=larval-3&at=" + between, 200), "ph"))
                .isEqualTo("7.93");

        Map<String, String> same = sent(page);
        assertThat(words(page(query(same), 200))).doesNotContain("You changed");
        same.put("ph", "8,05");
        same.put("ta", "2200");
        String words = words(page(query(same), 200));
        assertThat(words)
                .containsPattern(
                        "You changed pH and total alkalinity\\. At the point it was Ω 2\\.\\d\\d? ±0\\.\\d+\\.")
                .contains("sensor ph-3");
        assertThat(page("/calculator?point=larval-3&at=2020-01-01T00:00:00Z", 404))
                .doesNotContain("Larval tank 3");
        page("/calculator?point=larval-3&at=yesterday", 400);
    }

    @Test
    void says_what_was_missing_where_a_state_could_not_be_computed() {
        String words = words(page("/calculator?point=larval-4", 200));

        assertThat(words)
                .contains("This state has no Ω")
                .contains("Salinity was not read in the last")
                .contains("Total alkalinity was not read in the last")
                .contains("sensor ph-4")
                .doesNotContain("Not taken", "The whole state");
    }

    @Test
    void another_sites_point_is_as_unknown_as_one_that_never_was() {
        assertThat(answer("/calculator?point=larval-3", stranger).statusCode()).isEqualTo(404);
        assertThat(answer("/calculator?point=larval-3", stranger).body()).doesNotContain("Larval");
        assertThat(answer("/calculator?point=larval-3&site=ilwen-narrows", stranger)
                        .statusCode())
                .isEqualTo(404);
        assertThat(answer("/calculator?point=none", viewer).statusCode()).isEqualTo(404);
        assertThat(answer("/calculator", stranger).statusCode()).isEqualTo(200);
    }

    @Test
    void every_water_state_leads_to_how_it_was_computed() {
        String link = "href=\"/calculator?point=larval-3#state\"";
        assertThat(page("/", 200)).contains(link);
        assertThat(page("/points/larval-3", 200))
                .contains(link, "href=\"/calculator?point=larval-3&amp;at=2026-05-14T11%3A55%3A00Z#state\"");
        assertThat(page("/points/larval-3/dose", 200))
                .contains("href=\"/calculator?point=larval-3&amp;at=2026-05-14T11%3A55%3A00Z#state\"");
        assertThat(page("/points/larval-1", 200)).doesNotContain("How was this computed?");
    }

    @Test
    void what_is_typed_stays_words() {
        String page = page(form("temp", "\"><script>alert(1)</script>", "salt", "35", "ph", "8", "ta", "2300"), 422);

        assertThat(page).doesNotContain("<script>alert");
    }

    @Test
    void an_electrode_in_tris_is_told_how_far_it_is_off_and_what_to_do() {
        assertThat(page("/calculator/electrode", 200)).contains("Check a pH electrode in tris");
        assertThat(words(page("/calculator/electrode?temp=25&salt=35&ph=8,10&phUnit=total", 200)))
                .contains("The electrode reads 0.006 too high.")
                .contains("pH 8.094, total scale")
                .contains("Use it as it is")
                .contains("DelValls and Dickson 1998");
        assertThat(words(page("/calculator/electrode?temp=77&tempUnit=%5BdegF%5D&salt=35&ph=8.06&phUnit=total", 200)))
                .contains("The electrode reads 0.034 too low.")
                .contains("Rinse");
        assertThat(words(page("/calculator/electrode?temp=25&salt=35&ph=8.23&phUnit=total", 200)))
                .contains("0.136 too high")
                .contains("Do not trust its readings")
                .contains("calibrated in NBS buffers");
        assertThat(page("/calculator/electrode?temp=warm&salt=&ph=99", 422))
                .contains("“warm” is not a number", "id=\"c-salt-error\"");
    }

    private static String page(String path, int status) {
        HttpResponse<String> answer = answer(path, viewer);
        assertThat(answer.statusCode()).as(() -> words(answer.body())).isEqualTo(status);
        return answer.body();
    }

    private static HttpResponse<String> answer(String path, String token) {
        return service.send(HttpRequest.newBuilder(service.address().resolve(path))
                .header("Authorization", "Bearer " + token)
                .header("Accept", "text/html")
                .build());
    }

    private static Map<String, String> fields(String... namesAndValues) {
        Map<String, String> fields = new LinkedHashMap<>();
        for (int i = 0; i < namesAndValues.length; i += 2) {
            fields.put(namesAndValues[i], namesAndValues[i + 1]);
        }
        return fields;
    }

    private static String form(String... namesAndValues) {
        return query(fields(namesAndValues));
    }

    private static String query(Map<String, String> fields) {
        return "/calculator?"
                + fields.entrySet().stream()
                        .map(field ->
                                field.getKey() + "=" + URLEncoder.encode(field.getValue(), StandardCharsets.UTF_8))
                        .collect(Collectors.joining("&"));
    }

    /** What a browser would send of the form as it came. */
    private static Map<String, String> sent(String page) {
        String form = page.substring(page.indexOf("<form class=\"calc\""), page.indexOf("Work it out"));
        Map<String, String> sent = new LinkedHashMap<>();
        Matcher input = Pattern.compile("<input ([^>]*)>").matcher(form);
        while (input.find()) {
            String tag = input.group(1);
            if (!tag.contains("type=\"radio\"") || tag.contains(" checked")) {
                sent.put(attribute(tag, "name"), attribute(tag, "value"));
            }
        }
        Matcher select = Pattern.compile("(?s)<select ([^>]*)>(.*?)</select>").matcher(form);
        while (select.find()) {
            Matcher option =
                    Pattern.compile("<option value=\"([^\"]*)\"[^>]* selected").matcher(select.group(2));
            sent.put(attribute(select.group(1), "name"), option.find() ? option.group(1) : "");
        }
        return sent;
    }

    private static String attribute(String tag, String name) {
        Matcher matcher = Pattern.compile("\\b" + name + "=\"([^\"]*)\"").matcher(tag);
        return matcher.find() ? matcher.group(1) : "";
    }

    private static String value(String page, String field) {
        Matcher matcher =
                Pattern.compile("<input [^>]*name=\"" + field + "\"[^>]*>").matcher(page);
        assertThat(matcher.find()).as(field).isTrue();
        return attribute(matcher.group(), "value");
    }

    private static String words(String html) {
        return html.replaceAll("<[^>]*>", " ")
                .replaceAll("[ \\n\u00a0]+", " ")
                .replace("&lt;", "<")
                .replace("&amp;", "&");
    }

    /** The value of a quantity among all the digits. */
    private static double digits(String words, String name) {
        return column(words, name, 1);
    }

    private static double plusMinus(String words, String name) {
        return column(words, name, 2);
    }

    private static double column(String words, String name, int column) {
        Matcher row = Pattern.compile(" " + name + " ([\\d.]+)(?: ([\\d.]+))?")
                .matcher(words.substring(words.indexOf("All digits, to copy")));
        assertThat(row.find()).as(name + " in " + words).isTrue();
        return Double.parseDouble(row.group(column));
    }

    private static void post(String point, double ph, Instant at) {
        String rows = row(point, "ph", ph, at) + "," + row(point, "temperature", 21.9, at) + ","
                + row(point, "salinity", 30.1, at) + "," + row(point, "totalAlkalinity", 2080, at);
        assertThat(service.postReadings("{\"readings\":[" + rows + "]}").statusCode())
                .isEqualTo(200);
    }

    private static String row(String point, String quantity, double value, Instant at) {
        return "{\"point\":\"" + point + "\",\"quantity\":\"" + quantity + "\",\"value\":" + value + ",\"at\":\"" + at
                + "\"}";
    }
}
