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
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
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

    /** 22 °C, salinity 30, TA 2078 µmol/kg, pCO2 900 µatm, in a volume that the balance hardly rounds. */
    private static String worked(String agent, String target) {
        return """
                {"water":{"temperatureC":22,"salinity":30,"pco2Uatm":900,"totalAlkalinityUmolKg":2078},
                 "volumeL":290000,"target":%s,"agent":{"code":"%s","hydration":"anhydrous"},
                 "bounds":{"phTotalMax":9,"omegaAragoniteMax":7}}""".formatted(target, agent);
    }

    @ParameterizedTest
    @CsvSource({"sodium-carbonate, 7.845, 1.830", "sodium-bicarbonate, 7.706, 1.379", "sodium-hydroxide, 7.965, 2.317"})
    void a_hundred_umol_kg_of_each_agent_lead_where_the_worked_case_says(String agent, double ph, double omega) {
        JsonNode plan = plan(worked(agent, "{\"totalAlkalinityUmolKg\":2178}"), 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        assertThat(plan.at("/before/phTotal").asDouble()).isCloseTo(7.7144, within(0.00005));
        assertThat(plan.at("/before/dicUmolKg").asDouble()).isCloseTo(1983.4, within(0.05));
        assertThat(plan.at("/before/omegaAragonite").asDouble()).isCloseTo(1.336, within(0.0005));
        // half a unit of the last digit, and the balance: 1 g is 0.05 µmol/kg of alkalinity
        assertThat(plan.at("/after/phTotal").asDouble()).isCloseTo(ph, within(0.0006));
        assertThat(plan.at("/after/omegaAragonite").asDouble()).isCloseTo(omega, within(0.0008));
        assertThat(plan.at("/remedies/0/reaches/phTotal").asDouble()).isCloseTo(8.006, within(0.0005));
        assertThat(plan.at("/remedies/0/reaches/omegaAragonite").asDouble()).isCloseTo(2.388, within(0.0005));
    }

    @ParameterizedTest
    @CsvSource({"sodium-carbonate, 312.3, 8.050, 430", "sodium-hydroxide, 163.6, 8.086, 365"})
    void omega_three_takes_what_the_worked_case_says(String agent, double added, double ph, double pco2) {
        JsonNode plan = plan(worked(agent, "{\"omegaAragonite\":3.0}"), 200);
        assertThat(plan.at("/after/totalAlkalinityUmolKg").asDouble() - 2078).isCloseTo(added, within(0.1));
        assertThat(plan.at("/after/phTotal").asDouble()).isCloseTo(ph, within(0.0006));
        assertThat(plan.at("/after/pco2Uatm").asDouble()).isCloseTo(pco2, within(0.8));
    }

    @Test
    void bicarbonate_for_omega_three_is_refused_with_what_it_would_take() {
        JsonNode plan = plan(worked("sodium-bicarbonate", "{\"omegaAragonite\":3.0}"), 200);
        assertRefused(plan, "agent-cannot-reach");
        assertThat(plan.at("/reasons/0/detail").asString()).contains("4143 µmol/kg", "pH 7.57", "3871 µatm");
    }

    @Test
    void no_corrosive_agent_is_planned_for_a_larval_tank_unless_somebody_says_that_it_is_empty() {
        water(7.8);
        String caustic = OF_A_POINT.replace("sodium-carbonate", "sodium-hydroxide");
        assertRefused(plan(caustic, 200), "corrosive-with-larvae");
        JsonNode empty = plan(caustic.replace("{\"point\"", "{\"larvaeInWater\":false,\"point\""), 200);
        assertThat(empty.get("outcome").asString()).isEqualTo("plan");
    }

    @Test
    void lime_without_a_stock_given_is_made_up_as_strong_as_it_dissolves() {
        JsonNode plan = plan(
                OF_A_WATER.replace(
                        "{\"hydration\":\"anhydrous\"}", "{\"code\":\"calcium-hydroxide\"},\"stockTemperatureC\":20"),
                200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        assertThat(plan.at("/stock/gramsPerLitre").asDouble()).isCloseTo(1.318, within(0.001));
        assertThat(plan.at("/stock/litres").asDouble())
                .isCloseTo(plan.get("massG").asDouble() / 1.318, within(0.05));
    }

    @Test
    void a_flow_is_dosed_by_steady_injection() {
        JsonNode plan = plan(OF_A_WATER.replace("\"volumeL\":4000", "\"flowLMin\":60"), 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        assertThat(plan.get("massG").isNull()).isTrue();
        double gramsPerHour = plan.get("gramsPerHour").asDouble();
        double kgPerHour = 3600 * plan.at("/before/densityKgM3").asDouble() / 1000;
        assertThat(plan.at("/after/totalAlkalinityUmolKg").asDouble()
                        - plan.at("/before/totalAlkalinityUmolKg").asDouble())
                .isCloseTo(2e6 * gramsPerHour / 105.99 / kgPerHour, within(1e-6));
        assertThat(plan.get("gramsPerHourLow").asDouble()).isLessThan(gramsPerHour);
        assertThat(plan.get("gramsPerHourHigh").asDouble()).isGreaterThan(gramsPerHour);
        assertThat(plan.get("stockMlPerMinute").asDouble()).isCloseTo(gramsPerHour / 50 * 1000 / 60, within(1e-9));
        assertThat(plan.at("/steps/0/massG").isNull()).isTrue();
        assertThat(plan.at("/steps/0/stockMlPerMinute").asDouble()).isPositive();
    }

    @Test
    void a_tank_with_a_flow_through_it_gets_a_first_charge_and_make_up() {
        water(7.8);
        JsonNode plan = plan(OF_A_POINT.replace("{\"point\"", "{\"flowLMin\":200,\"point\""), 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        assertThat(plan.get("gramsPerHour").asDouble())
                .as("the tank's 20 000 L change 0.6 times an hour")
                .isCloseTo(plan.get("massG").asDouble() * 0.6, within(1e-6));
        assertThat(plan.get("cautions").valueStream().map(c -> c.get("code").asString()))
                .contains("flow-interlock", "washout");
    }

    @Test
    void two_agents_hold_a_ceiling_of_ph() {
        JsonNode plan = plan(OF_A_WATER.replace("\"volumeL\"", "\"hold\":{\"phTotalMax\":7.9},\"volumeL\""), 200);
        assertThat(plan.get("outcome").asString()).isEqualTo("plan");
        assertThat(plan.at("/second/agent").asString()).isEqualTo("sodium-bicarbonate");
        assertThat(plan.at("/second/massG").asDouble()).isPositive();
        assertThat(plan.at("/steps/0/second/massG").asDouble()).isPositive();
        assertThat(plan.at("/after/phTotal").asDouble())
                .isCloseTo(7.9, within(0.002))
                .isLessThanOrEqualTo(7.9);
        assertThat(plan.at("/after/omegaAragonite").asDouble()).isCloseTo(2.5, within(0.01));
    }

    @Test
    void a_hold_must_be_one_thing_and_a_second_agent_must_be_for_something() {
        assertThat(plan(
                                OF_A_WATER.replace(
                                        "\"volumeL\"",
                                        "\"hold\":{\"phTotalMax\":7.9,\"pco2Uatm\":500},\"flowLMin\":1e999,\"volumeL\""),
                                422)
                        .get("errors")
                        .valueStream()
                        .map(e -> e.get("pointer").asString()))
                .containsExactlyInAnyOrder("/hold", "/flowLMin");
        assertThat(plan(OF_A_WATER.replace("\"volumeL\"", "\"secondAgent\":{\"code\":\"chalk\"},\"volumeL\""), 422)
                        .get("errors")
                        .valueStream()
                        .map(e -> e.get("pointer").asString()))
                .containsExactlyInAnyOrder("/hold", "/secondAgent/code");
        assertRefused(
                plan(OF_A_WATER.replace("\"volumeL\"", "\"hold\":{\"pco2Uatm\":200},\"volumeL\""), 200),
                "two-agents-cannot");
    }

    private static JsonNode remedy(JsonNode plan, String code) {
        return plan.get("remedies")
                .valueStream()
                .filter(r -> r.get("code").asString().equals(code))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void remedies_draw_on_the_fresh_waters_of_other_points() {
        water(7.8);
        service.postReadings(Rows.batch(Rows.water("storage", 8.1, CLOCK.instant())));
        service.postReadings(Rows.batch(Rows.water("intake", 7.6, CLOCK.instant())));
        JsonNode plan = plan(OF_A_POINT, 200);
        assertThat(plan.at("/remedies/0/code").asString()).isEqualTo("hold");
        assertThat(plan.at("/remedies/0/fromPoint").asString()).isEqualTo("storage");
        assertThat(plan.at("/remedies/0/reaches/phTotal").asDouble()).isCloseTo(8.1, within(1e-6));
        JsonNode blend = remedy(plan, "blend");
        assertThat(blend.get("reachesTarget").asBoolean()).isTrue();
        assertThat(blend.get("massShare").asDouble()).isBetween(0.3, 0.95);
        assertThat(blend.at("/reaches/omegaAragonite").asDouble()).isCloseTo(2.5, within(1e-6));
        assertThat(blend.at("/standardUncertainty/omegaAragonite").asDouble()).isPositive();
        assertThat(blend.get("whyNot").isNull()).isTrue();
    }

    @Test
    void a_stale_water_of_another_point_is_not_drawn_on() {
        service.postReadings(Rows.batch(Rows.water("storage", 8.1, CLOCK.instant())));
        CLOCK.pass(Duration.ofMinutes(30));
        water(7.8);
        JsonNode blend = remedy(plan(OF_A_POINT, 200), "blend");
        assertThat(blend.get("reaches").isNull()).isTrue();
        assertThat(blend.get("whyNot").asString()).contains("known at present");
    }

    @Test
    void a_water_given_by_its_numbers_can_only_be_aerated() {
        assertThat(plan(OF_A_WATER, 200)
                        .get("remedies")
                        .valueStream()
                        .map(r -> r.get("code").asString()))
                .containsExactly("aerate");
    }

    @Test
    void ammonia_is_held_against_the_criteria_when_it_is_known_and_asked_for_when_not() {
        JsonNode known = plan(OF_A_WATER.replace("\"volumeL\"", "\"ammoniaMgL\":1,\"volumeL\""), 200);
        assertThat(known.at("/ammonia/unionisedAfterMgL").asDouble())
                .isGreaterThan(known.at("/ammonia/unionisedBeforeMgL").asDouble())
                .isGreaterThan(0.035);
        assertThat(known.at("/ammonia/chronicCriterionMgL").asDouble()).isEqualTo(0.035);
        assertThat(known.at("/ammonia/acuteCriterionMgL").asDouble()).isEqualTo(0.233);
        assertThat(known.get("cautions").valueStream().map(c -> c.get("code").asString()))
                .contains("ammonia-above-criterion");
        JsonNode unknown = plan(OF_A_WATER, 200);
        assertThat(unknown.get("ammonia").isNull()).isTrue();
        assertThat(unknown.get("cautions").valueStream().map(c -> c.get("code").asString()))
                .contains("ammonia-unknown");
        assertThat(plan(OF_A_WATER.replace("\"volumeL\"", "\"ammoniaMgL\":-1,\"volumeL\""), 422)
                        .at("/errors/0/pointer")
                        .asString())
                .isEqualTo("/ammoniaMgL");
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
