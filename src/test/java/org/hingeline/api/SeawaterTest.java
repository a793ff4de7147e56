package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.util.List;
import java.util.Locale;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;

/** Waters computed through HTTP. */
class SeawaterTest extends AskedByViewer {
    private static final String STATE = "/api/v1/seawater/state";
    private static final Description DESCRIPTION = new Description();

    private static JsonNode state(String water, Object... values) {
        HttpResponse<String> answer =
                service.send("POST", STATE, viewer, "{" + String.format(Locale.ROOT, water, values) + "}");
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
        return DESCRIPTION.check("POST " + STATE, answer);
    }

    private static void assertValue(JsonNode state, String name, double value, double tolerance) {
        assertThat(state.get(name).asDouble()).as(name).isCloseTo(value, within(tolerance));
    }

    private static List<String> cautions(JsonNode state) {
        return state.get("cautions")
                .valueStream()
                .map(caution -> caution.get("code").asString())
                .toList();
    }

    /** Lueker, Lee 2010, Mucci; recomputed independently from the published equations. */
    @Test
    void the_check_water_comes_out_to_the_printed_digits() {
        JsonNode state = state("\"temperatureC\":25,\"salinity\":35,\"totalAlkalinityUmolKg\":2300,\"ph\":8.1");
        assertValue(state, "dicUmolKg", 1963.436, 5e-4);
        assertValue(state, "co2UmolKg", 9.60727, 5e-6);
        assertValue(state, "bicarbonateUmolKg", 1719.678, 5e-4);
        assertValue(state, "carbonateUmolKg", 234.1508, 1e-4);
        assertValue(state, "pco2Uatm", 339.464, 5e-4);
        assertValue(state, "omegaAragonite", 3.71526, 5e-6);
        assertValue(state, "omegaCalcite", 5.63657, 5e-6);
        assertValue(state, "densityKgM3", 1023.34306, 5e-6);
        assertValue(state, "totalAlkalinityUmolKg", 2300, 0);
        assertValue(state, "phTotal", 8.1, 0);
        assertThat(state.get("fco2Uatm").asDouble()).isBetween(335.0, 339.4);
        assertThat(state.get("cautions")).isEmpty();
        assertThat(state.at("/method/constants").asString()).contains("Lueker, Dickson & Keeling 2000");
        assertThat(state.at("/method/boron").asString()).contains("Lee et al. 2010");
        assertThat(state.at("/method/phScale").asString()).isEqualTo("total");
        assertThat(state.at("/method").has("phConversion")).isFalse();
    }

    /** Gattuso & Lavigne 2009, quoted from memory; digits as printed, pH to one in the last place. */
    @Test
    void published_waters_come_out_with_the_fits_of_their_time() {
        String water =
                "\"temperatureC\":18.9,\"salinity\":34.9,\"totalAlkalinityUmolKg\":2325,\"boron\":\"uppstrom1974\",";
        JsonNode now = state(water + "\"pco2Uatm\":384");
        assertValue(now, "phTotal", 8.065, 1e-3);
        assertValue(now, "dicUmolKg", 2065, 0.5);
        assertValue(now, "omegaAragonite", 2.891, 5e-4);
        JsonNode later = state(water + "\"pco2Uatm\":793");
        assertValue(later, "phTotal", 7.793, 5e-4);
        assertValue(later, "dicUmolKg", 2191, 0.5);
        assertThat(later.at("/method/boron").asString()).contains("Uppström 1974");
    }

    @Test
    void every_pair_gives_the_same_water() {
        String water = "\"temperatureC\":22,\"salinity\":30,";
        JsonNode first = state(water + "\"ph\":7.9,\"totalAlkalinityUmolKg\":2078");
        List<String> names = List.of("phTotal", "totalAlkalinityUmolKg", "dicUmolKg", "pco2Uatm");
        List<String> asked = List.of("ph", "totalAlkalinityUmolKg", "dicUmolKg", "pco2Uatm");
        for (int i = 0; i < 4; i++) {
            for (int j = i + 1; j < 4; j++) {
                JsonNode same = state(
                        water + "\"%s\":%s,\"%s\":%s",
                        asked.get(i),
                        first.get(names.get(i)),
                        asked.get(j),
                        first.get(names.get(j)));
                String pair = asked.get(i) + " with " + asked.get(j);
                for (String name : List.of("phTotal", "omegaAragonite", "carbonateUmolKg", "dicUmolKg", "pco2Uatm")) {
                    double value = first.get(name).asDouble();
                    assertThat(same.get(name).asDouble())
                            .as("%s of %s", name, pair)
                            .isCloseTo(value, within(1e-7 * value));
                }
                assertThat(same.at("/standardUncertainty/omegaAragonite/total").asDouble())
                        .as(pair)
                        .isPositive();
            }
        }
    }

    /** Offsets at salinity 35, 25 °C, recomputed independently: free 0.1077 above total, seawater 0.0129 below, NBS 0.134 above. */
    @ParameterizedTest
    @CsvSource({"total, 0, 1e-9", "free, 0.1077, 5e-5", "seawater, -0.0129, 5e-5", "nbs, 0.134, 5e-4"})
    void a_ph_may_be_on_any_scale(String scale, double above, double tolerance) {
        JsonNode state = state(
                "\"temperatureC\":25,\"salinity\":35,\"totalAlkalinityUmolKg\":2300,\"ph\":%s,\"phScale\":\"%s\"",
                8.1 + above, scale);
        assertValue(state, "phTotal", 8.1, tolerance);
        assertThat(cautions(state).contains("nbs-scale")).isEqualTo(scale.equals("nbs"));
        assertThat(state.at("/method").has("phConversion")).isEqualTo(!scale.equals("total"));
        assertThat(state.at("/standardUncertainty/phTotal/fromInputs").asDouble())
                .isCloseTo(scale.equals("nbs") ? 0.05 : 0.02, within(1e-3));
    }

    @Test
    void a_ph_read_in_the_laboratory_is_carried_to_the_water() {
        String lab = "\"salinity\":30,\"ph\":7.9,\"totalAlkalinityUmolKg\":2078,";
        JsonNode there = state(lab + "\"temperatureC\":25,\"warmToC\":14");
        JsonNode here = state(lab + "\"temperatureC\":14,\"phTemperatureC\":25");
        assertThat(here.get("phTotal").asDouble()).isGreaterThan(8.0);
        assertValue(here, "phTotal", there.at("/warmed/phTotal").asDouble(), 1e-9);
        assertValue(here, "dicUmolKg", there.get("dicUmolKg").asDouble(), 1e-6);
        assertThat(here.at("/method/phConversion").asString()).contains("phTemperatureC");
        assertThat(state(lab + "\"temperatureC\":14,\"phTemperatureC\":14")
                        .at("/method")
                        .has("phConversion"))
                .isFalse();
    }

    /** Aerated as worked independently: pCO2 900 to 420 µatm, pH 7.7144 to 8.006, Ω 1.336 to 2.388. */
    @Test
    void tells_what_the_water_becomes() {
        JsonNode state = state("""
                "temperatureC":22,"salinity":30,"totalAlkalinityUmolKg":2078,"pco2Uatm":900,
                "warmToC":25,"equilibrateToUatm":420,
                "blendWith":{"water":{"temperatureC":22,"salinity":34,"dicUmolKg":2000,"totalAlkalinityUmolKg":2278},
                             "massShare":0.25}""");
        assertValue(state, "phTotal", 7.7144, 5e-5);
        assertValue(state, "omegaAragonite", 1.336, 5e-4);
        JsonNode aerated = state.get("equilibrated");
        assertValue(aerated, "phTotal", 8.006, 5e-4);
        assertValue(aerated, "omegaAragonite", 2.388, 5e-4);
        assertValue(aerated, "pco2Uatm", 420, 0);
        assertThat(aerated.at("/standardUncertainty/pco2Uatm/total").asDouble()).isZero();
        assertThat(aerated.at("/standardUncertainty/omegaAragonite/total").asDouble())
                .isPositive();
        JsonNode warmed = state.get("warmed");
        assertValue(warmed, "temperatureC", 25, 0);
        assertValue(warmed, "dicUmolKg", state.get("dicUmolKg").asDouble(), 1e-6);
        assertThat(warmed.get("pco2Uatm").asDouble())
                .as("warm water holds less")
                .isGreaterThan(1000);
        JsonNode blended = state.get("blended");
        assertValue(blended, "salinity", 31, 1e-9);
        assertValue(blended, "totalAlkalinityUmolKg", 2128, 1e-6);
        assertValue(blended, "dicUmolKg", 0.75 * state.get("dicUmolKg").asDouble() + 500, 1e-6);
        assertThat(blended.at("/standardUncertainty/totalAlkalinityUmolKg/total")
                        .asDouble())
                .as("two measured alkalinities, 10 each")
                .isCloseTo(10 * Math.hypot(0.75, 0.25), within(0.01));
    }

    @Test
    void takes_conductivity_for_salinity() {
        String pair = "\"ph\":7.9,\"totalAlkalinityUmolKg\":2078,";
        JsonNode state = state(pair + "\"temperatureC\":14.9964,\"conductivityMsCm\":42.914");
        assertValue(state, "salinity", 35, 2e-3);
        assertThat(state.at("/method/salinity").asString()).contains("PSS-78");
        double usual =
                state.at("/standardUncertainty/totalAlkalinityUmolKg/total").asDouble();
        assertThat(usual).isEqualTo(10);
        JsonNode rough = state(
                pair + "\"temperatureC\":14.9964,\"conductivityMsCm\":42.914,\"uncertainty\":{\"conductivityMsCm\":5}");
        assertThat(rough.at("/standardUncertainty/omegaAragonite/fromInputs").asDouble())
                .isGreaterThan(state.at("/standardUncertainty/omegaAragonite/fromInputs")
                                .asDouble()
                        * 1.05);
        assertThat(cautions(state(pair + "\"temperatureC\":38,\"conductivityMsCm\":60")))
                .contains("outside-fit-range");
    }

    /** Clegg & Whitfield 1995, recomputed independently: 25 °C, salinity 35, pH 8.0 gives 0.0556. */
    @Test
    void tells_the_toxic_share_of_ammonia() {
        JsonNode state = state(
                "\"temperatureC\":25,\"salinity\":35,\"ph\":8.0,\"totalAlkalinityUmolKg\":2300,\"ammoniaMgL\":0.5");
        assertThat(state.at("/ammonia/unionisedShare").asDouble()).isCloseTo(0.0556, within(5e-5));
        assertThat(state.at("/ammonia/unionisedMgL").asDouble()).isCloseTo(0.0278, within(5e-5));
        assertThat(state.at("/ammonia/unionisedNh3MgL").asDouble()).isCloseTo(0.0278 * 17.031 / 14.007, within(5e-5));
    }

    /** After Orr et al. 2018, recomputed independently: constants 5.6 %, pH 4.0 %, alkalinity 0.84 %; 6.9 % together, 11.7 % with pH 0.05. */
    @Test
    void tells_how_sure_it_is_and_why() {
        String water = "\"temperatureC\":22,\"salinity\":30,\"ph\":7.9,\"totalAlkalinityUmolKg\":2078,"
                + "\"uncertainty\":{\"ph\":%s,\"totalAlkalinityUmolKg\":17,\"temperatureC\":0.1,\"salinity\":0.1}";
        JsonNode state = state(water, 0.02);
        double omega = state.get("omegaAragonite").asDouble();
        assertThat(omega).isCloseTo(1.9454, within(5e-5));
        JsonNode u = state.at("/standardUncertainty/omegaAragonite");
        assertThat(u.get("fromConstants").asDouble() / omega).isCloseTo(0.056, within(0.001));
        assertThat(u.get("fromInputs").asDouble() / omega).isCloseTo(Math.hypot(0.040, 0.0094), within(0.001));
        assertThat(u.get("total").asDouble() / omega).isCloseTo(0.069, within(0.001));
        assertThat(state(water, 0.05)
                                .at("/standardUncertainty/omegaAragonite/total")
                                .asDouble()
                        / omega)
                .as("first order leaves out the curvature of a step of 0.05")
                .isCloseTo(0.117, within(0.006));
        assertThat(state.at("/standardUncertainty").has("densityKgM3")).isFalse();
        assertThat(state(water + ",\"withUncertainty\":false", 0.02).has("standardUncertainty"))
                .isFalse();
    }

    @Test
    void nutrients_calcium_and_fits_take_part() {
        String water = "\"temperatureC\":12,\"salinity\":28,\"totalAlkalinityUmolKg\":2000,\"dicUmolKg\":1850";
        double plain = state(water).get("omegaAragonite").asDouble();
        for (String with : List.of(
                "\"phosphateUmolKg\":5",
                "\"silicateUmolKg\":100",
                "\"calciumMmolKg\":9.5",
                "\"constants\":\"millero2006\"",
                "\"constants\":\"waters2014\"",
                "\"boron\":\"uppstrom1974\"")) {
            assertThat(state(water + "," + with).get("omegaAragonite").asDouble())
                    .as(with)
                    .isNotEqualTo(plain)
                    .isCloseTo(plain, within(plain * 0.2));
        }
        assertThat(state(water + ",\"ph\":null,\"phScale\":null,\"uncertainty\":null,\"blendWith\":null")
                        .get("omegaAragonite")
                        .asDouble())
                .as("a null is an absent field")
                .isEqualTo(plain);
    }

    @Test
    void cautions_where_a_fit_does_not_reach() {
        JsonNode brackish = state("\"temperatureC\":12,\"salinity\":8,\"totalAlkalinityUmolKg\":1200,\"ph\":7.8");
        assertThat(brackish.get("cautions")
                        .valueStream()
                        .map(caution -> caution.get("detail").asString()))
                .anySatisfy(detail -> assertThat(detail).contains("Lueker", "19 to 43", "salinity 8"));
        JsonNode cold =
                state("\"temperatureC\":12,\"salinity\":30,\"totalAlkalinityUmolKg\":2000,\"ph\":7.8,\"warmToC\":1");
        assertThat(cautions(cold)).isEmpty();
        assertThat(cautions(cold.get("warmed"))).contains("outside-fit-range");
    }

    @Test
    void a_dose_plan_takes_the_same_water() {
        String wish = "{\"water\":{\"temperatureC\":22,\"salinity\":30,%s},\"volumeL\":4000,"
                + "\"target\":{\"omegaAragonite\":2.5},\"agent\":{\"hydration\":\"anhydrous\"}}";
        JsonNode water = state("\"temperatureC\":22,\"salinity\":30,\"ph\":7.8,\"totalAlkalinityUmolKg\":2078");
        double first = massG(wish.formatted("\"ph\":7.8,\"totalAlkalinityUmolKg\":2078"), 200);
        double second = massG(
                wish.formatted("\"dicUmolKg\":" + water.get("dicUmolKg") + ",\"pco2Uatm\":" + water.get("pco2Uatm")),
                200);
        assertThat(second).isCloseTo(first, within(1e-4));
        HttpResponse<String> wrong =
                service.send("POST", "/api/v1/dose-plans", viewer, wish.formatted("\"ph\":7.8,\"warmToC\":25"));
        assertThat(wrong.statusCode()).isEqualTo(422);
        assertThat(DESCRIPTION
                        .check("POST /api/v1/dose-plans", wrong)
                        .get("errors")
                        .valueStream()
                        .map(error -> error.get("pointer").asString()))
                .containsExactlyInAnyOrder("/water", "/water/warmToC");
        HttpResponse<String> none = service.send(
                "POST", "/api/v1/dose-plans", viewer, wish.formatted("\"ph\":9.5,\"totalAlkalinityUmolKg\":100"));
        assertThat(DESCRIPTION
                        .check("POST /api/v1/dose-plans", none)
                        .at("/reasons/0/detail")
                        .asString())
                .contains("inputs-contradict", "water/totalAlkalinityUmolKg 100")
                .doesNotContain(" mol/kg");
    }

    private static double massG(String wish, int status) {
        HttpResponse<String> answer = service.send("POST", "/api/v1/dose-plans", viewer, wish);
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        return DESCRIPTION.check("POST /api/v1/dose-plans", answer).get("massG").asDouble();
    }

    /** DelValls & Dickson 1998 at salinity 35, recomputed. */
    @ParameterizedTest
    @CsvSource({"25, 8.09355", "20, 8.2517", "15, 8.4141"})
    void tells_the_ph_of_the_tris_standard(double temperatureC, double ph) {
        JsonNode tris = tris("?salinity=35&temperatureC=" + temperatureC, 200);
        assertValue(tris, "phTotal", ph, 1e-4);
        assertThat(tris.get("cautions")).isEmpty();
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "?temperatureC=60&salinity=35|60.0 °C",
                "?temperatureC=25&salinity=-1|salinity -1.0",
                "?temperatureC=25&salinity=1e999|salinity Infinity",
                "?temperatureC=warm&salinity=35|temperatureC \"warm\" must be a number; -2 to 45 °C is accepted",
                "?temperatureC=NaN&salinity=35|temperatureC \"NaN\"",
                "?temperatureC=25|salinity is missing; 0 to 50 is accepted"
            })
    void refuses_a_tris_standard_that_cannot_be(String query, String detail) {
        assertThat(tris(query, 400).get("detail").asString()).contains(detail);
    }

    @Test
    void cautions_for_a_tris_standard_outside_the_fit() {
        assertThat(cautions(tris("?temperatureC=25&salinity=10", 200))).containsExactly("outside-fit-range");
    }

    private static JsonNode tris(String query, int status) {
        HttpResponse<String> answer = service.get("/api/v1/seawater/tris" + query, viewer);
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        return DESCRIPTION.check("GET /api/v1/seawater/tris", answer);
    }

    @Test
    void only_who_is_signed_in_may_ask() {
        String water = "{\"temperatureC\":22,\"salinity\":30,\"ph\":7.9,\"totalAlkalinityUmolKg\":2078}";
        for (String body : List.of(water, "{\"waters\":[" + water + "]}")) {
            String path = body.equals(water) ? STATE : STATE + "s";
            HttpRequest.Builder request = HttpRequest.newBuilder(
                            service.address().resolve(path))
                    .header("Content-Type", "application/json")
                    .POST(BodyPublishers.ofString(body));
            HttpResponse<String> nobody = service.send(request.copy().build());
            assertThat(nobody.statusCode()).isEqualTo(401);
            DESCRIPTION.check("POST " + path, nobody);
            assertThat(service.send("POST", path, service.gatewayKey(), body).statusCode())
                    .as("a gateway's key is not for this")
                    .isEqualTo(401);
            assertThat(service.send("POST", path, service.token(Role.MANAGER), body)
                            .statusCode())
                    .isEqualTo(200);
            String session = service.signIn("vera", List.of(service.site()), Role.VIEWER);
            HttpRequest.Builder browser = request.copy().header("Cookie", "hingeline_session=" + session);
            HttpResponse<String> forged = service.send(browser.copy().build());
            assertThat(forged.statusCode()).isEqualTo(403);
            DESCRIPTION.check("POST " + path, forged);
            String page = service.send(HttpRequest.newBuilder(service.address().resolve("/"))
                            .header("Cookie", "hingeline_session=" + session)
                            .build())
                    .body();
            String csrf = page.replaceAll("(?s).*name=\"csrf\" value=\"([^\"]+)\".*", "$1");
            assertThat(service.send(browser.copy()
                                    .header("X-Hingeline-Csrf", csrf)
                                    .build())
                            .statusCode())
                    .isEqualTo(200);
        }
        assertThat(service.send("GET", "/api/v1/seawater/tris?temperatureC=25&salinity=35", "hga_wrong", "")
                        .statusCode())
                .isEqualTo(401);
    }
}
