package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;

/** Dose plans asked for through HTTP. */
class DosePlanTest {
    private static final Description DESCRIPTION = new Description();
    private static final String OF_A_POINT = """
            {"point":"larval-3","target":{"omegaAragonite":2.5},
             "agent":{"code":"sodium-carbonate","hydration":"anhydrous","assayPercent":100}}""";
    private static final String OF_A_WATER = """
            {"water":{"temperatureC":22,"salinity":30,"ph":7.8,"phScale":"total","totalAlkalinityUmolKg":2078},
             "volumeL":4000,"target":{"omegaAragonite":2.5},"agent":{"hydration":"anhydrous"}}""";

    private static final SettableClock CLOCK = new SettableClock(Instant.parse("2026-05-14T12:00:00Z"));

    @TempDir
    private static Path data;

    private static RunningService service;
    private static String viewer;

    @BeforeAll
    static void start() {
        service = RunningService.start(data, CLOCK);
        viewer = service.token(Role.VIEWER);
    }

    @AfterAll
    static void stop() {
        service.close();
    }

    /** So that the readings of one test are too old for the next; alkalinity may be three days old. */
    @BeforeEach
    void a_week_later() {
        CLOCK.pass(Duration.ofDays(7));
    }

    private JsonNode plan(String wish, int status) {
        HttpResponse<String> answer = service.send("POST", "/api/v1/dose-plans", viewer, wish);
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        return DESCRIPTION.check("POST /api/v1/dose-plans", answer);
    }

    private void water(double ph) {
        assertThat(service.postReadings(Rows.batch(Rows.water("larval-3", ph, CLOCK.instant())))
                        .statusCode())
                .isEqualTo(200);
    }

    private static void assertRefused(JsonNode plan, String... codes) {
        assertThat(plan.get("outcome").asString()).isEqualTo("refused");
        assertThat(plan.get("reasons")
                        .valueStream()
                        .map(reason -> reason.get("code").asString()))
                .contains(codes);
        assertThat(plan.get("massG").isNull()).isTrue();
        assertThat(plan.get("steps")).isEmpty();
    }

    @Test
    void a_plan_adds_the_alkalinity_that_its_mass_holds() {
        water(7.8);
        JsonNode plan = plan(OF_A_POINT, 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        double massG = plan.get("massG").asDouble();
        double kg = 20_000 * plan.at("/before/densityKgM3").asDouble() / 1000;
        double added = plan.at("/after/totalAlkalinityUmolKg").asDouble()
                - plan.at("/before/totalAlkalinityUmolKg").asDouble();
        assertThat(added).as("2 mol of alkalinity in 105.99 g").isCloseTo(2e6 * massG / 105.99 / kg, within(0.5));
        assertThat(plan.at("/before/omegaAragonite").asDouble()).isCloseTo(1.59, within(0.05));
        assertThat(plan.at("/after/omegaAragonite").asDouble()).isCloseTo(2.5, within(0.02));
        assertThat(plan.get("massLowG").asDouble()).isLessThan(massG);
        assertThat(plan.get("massHighG").asDouble()).isGreaterThan(massG);
        assertThat(plan.get("steps")
                        .valueStream()
                        .mapToDouble(s -> s.get("massG").asDouble())
                        .sum())
                .isCloseTo(massG, within(0.1));
        assertThat(plan.get("cautions").valueStream().map(c -> c.get("code").asString()))
                .contains("suggestion", "protection", "safety-data-sheet", "add-slowly");
        assertThat(plan.at("/remedies/0/code").asString()).isEqualTo("aerate");
    }

    @Test
    void a_plan_for_a_water_given_by_its_numbers_needs_no_readings() {
        JsonNode plan = plan(OF_A_WATER, 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        assertThat(plan.get("massG").asDouble()).isCloseTo(37, within(1.0));
    }

    @Test
    void is_refused_when_nothing_was_read() {
        assertRefused(plan(OF_A_POINT.replace("larval-3", "larval-4"), 200), "input-missing");
    }

    @Test
    void is_refused_when_an_input_is_stale() {
        water(7.8);
        CLOCK.pass(Duration.ofMinutes(15));
        assertThat(plan(OF_A_POINT, 200).get("outcome").asString())
                .as("pH may be 15 min old")
                .isEqualTo("plan");
        CLOCK.pass(Duration.ofMinutes(1));
        JsonNode stale = plan(OF_A_POINT, 200);
        assertRefused(stale, "input-stale");
        assertThat(stale.at("/reasons/0/detail").asString()).contains("pH", "16 min old", "15 min");
        assertThat(stale.at("/reasons/0/lift").asString()).isNotBlank();
        water(7.8);
        assertThat(plan(OF_A_POINT, 200).get("outcome").asString()).isEqualTo("plan");
    }

    @Test
    void is_refused_when_a_newer_temperature_hides_no_stale_ph() {
        water(7.8);
        CLOCK.pass(Duration.ofMinutes(20));
        service.postReadings(Rows.batch(Rows.row("larval-3", "temperature", 22.1, CLOCK.instant())));
        assertRefused(plan(OF_A_POINT, 200), "input-stale");
    }

    @Test
    void is_not_needed_when_the_water_is_there_already() {
        water(8.2);
        JsonNode plan = plan(OF_A_POINT, 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("not-needed");
        assertThat(plan.at("/reasons/0/code").asString()).isEqualTo("already-there");
        assertThat(plan.get("massG").isNull()).isTrue();
    }

    @Test
    void is_refused_for_what_no_tank_or_product_has() {
        assertRefused(plan(OF_A_WATER.replace("4000", "-4000"), 200), "volume-implausible");
        assertRefused(plan(OF_A_WATER.replace("4000", "1e300"), 200), "volume-implausible");
        assertRefused(
                plan(OF_A_WATER.replace("\"anhydrous\"", "\"anhydrous\",\"assayPercent\":120"), 200),
                "assay-implausible");
        assertRefused(plan(OF_A_WATER.replace("22,", "500,"), 200), "water-unsolvable");
        assertRefused(plan(OF_A_WATER.replace("\"ph\":7.8", "\"ph\":78"), 200), "water-unsolvable");
        assertRefused(plan(OF_A_WATER.replace("2.5", "4.6"), 200), "target-above-bounds");
        assertRefused(
                plan(OF_A_WATER.replace("\"volumeL\"", "\"stockGramsPerLitre\":900,\"volumeL\""), 200),
                "stock-too-strong");
    }

    @Test
    void tells_every_wrong_field_at_once() {
        JsonNode wrong = plan("{}", 422);
        assertThat(wrong.get("errors").valueStream().map(e -> e.get("pointer").asString()))
                .contains("/point", "/volumeL", "/target", "/agent/hydration");
        JsonNode fields = plan("""
                {"point":"larval-9","water":{"temperatureC":1e999,"phScale":"sws"},"volumeL":1e999,
                 "target":{"omegaAragonite":-1},"agent":{"code":"lye","hydration":"wet"},
                 "bounds":{"phTotalMax":12},"stockGramsPerLitre":"NaN","aerateToUatm":5}""", 422);
        assertThat(fields.get("errors").valueStream().map(e -> e.get("pointer").asString()))
                .contains(
                        "/point",
                        "/volumeL",
                        "/target/omegaAragonite",
                        "/agent/code",
                        "/bounds/phTotalMax",
                        "/stockGramsPerLitre",
                        "/aerateToUatm");
        assertThat(fields.get("detail").asString())
                .contains("larval-9", "volumeL Infinity must be a finite number", "lye", "sodium-carbonate")
                .doesNotContain("volumeL is missing");
    }

    @Test
    void says_what_hydration_is_for() {
        assertThat(plan(OF_A_WATER.replace("{\"hydration\":\"anhydrous\"}", "{}"), 422)
                        .get("detail")
                        .asString())
                .contains("hydration is missing", "anhydrous, monohydrate, decahydrate", "2.7 times");
        assertThat(plan(OF_A_WATER.replace("\"volumeL\"", "\"volumeM3\""), 400)
                        .get("detail")
                        .asString())
                .contains("volumeM3", "volumeL");
    }
}
