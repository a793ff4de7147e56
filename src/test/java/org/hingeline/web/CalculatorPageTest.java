package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.web.CalculatorReader.digits;
import static org.hingeline.web.CalculatorReader.fields;
import static org.hingeline.web.CalculatorReader.form;
import static org.hingeline.web.CalculatorReader.query;
import static org.hingeline.web.CalculatorReader.value;
import static org.hingeline.web.CalculatorReader.words;

import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Instant;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The calculator page through HTTP: what is typed, what comes of it, what is refused. */
class CalculatorPageTest {
    private static final Instant T0 = Instant.parse("2026-05-14T12:00:00Z");
    private static final SettableClock CLOCK = new SettableClock(T0);

    @TempDir
    static Path data;

    private static RunningService service;
    private static String viewer;

    @BeforeAll
    static void start() {
        service = RunningService.start(data, CLOCK);
        viewer = service.token(Role.VIEWER);
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
                .containsPattern(
                        "of Ω aragonite: equilibrium constants ±0\\.\\d+, pH ±0\\.\\d+, alkalinity ±0\\.\\d+, temperature")
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
        HttpResponse<String> answer = answer(path);
        assertThat(answer.statusCode()).as(() -> words(answer.body())).isEqualTo(status);
        return answer.body();
    }

    private static HttpResponse<String> answer(String path) {
        return service.send(HttpRequest.newBuilder(service.address().resolve(path))
                .header("Authorization", "Bearer " + viewer)
                .header("Accept", "text/html")
                .build());
    }
}
