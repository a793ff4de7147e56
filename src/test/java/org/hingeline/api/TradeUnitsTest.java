package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.URLEncoder;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.hingeline.seawater.ConductivitySalinity;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;

/** The units and the instruments that hatcheries have, through HTTP. */
class TradeUnitsTest {
    private static final Instant NOW = Instant.parse("2026-05-14T12:00:00Z");
    private static final Description DESCRIPTION = new Description();

    /** A tank with conductivity and no salinity. */
    private static final String PLACE = """
            site: {code: rock-inlet, name: Rock Inlet, zone: America/Los_Angeles}
            points:
              - {code: tank, name: Tank, kind: larval, volumeL: 4000, maxGapMin: 15}
            sensors:
              - {point: tank, code: ph-1, quantity: ph, unit: "[pH]", phScale: total, standardUncertainty: 0.02}
              - {point: tank, code: t-1, quantity: temperature, unit: "[degF]", standardUncertainty: 0.1}
              - {point: tank, code: c-1, quantity: conductivity, unit: S/m, standardUncertainty: 0.2}
              - {point: tank, code: ta-1, quantity: totalAlkalinity, unit: "{dKH}", standardUncertainty: 10}
            """;

    @TempDir
    private Path data;

    private RunningService service;
    private Site site;
    private String key;
    private String viewer;

    @BeforeEach
    void start() {
        service = RunningService.start(data, new SettableClock(NOW));
        site = service.addPlace(PLACE);
        key = service.gatewayKey(site);
        viewer = service.token(site, Role.VIEWER);
    }

    @AfterEach
    void stop() {
        service.close();
    }

    @Test
    void a_tank_read_in_fahrenheit_siemens_per_metre_and_degrees_of_hardness_has_a_whole_water_state() {
        double siemensPerMetre = ConductivitySalinity.conductivity(35, 25).orElseThrow() / 10;
        JsonNode answer = post(
                Rows.batch(
                        row("totalAlkalinity", 6.4, ""),
                        row("temperature", 77, ""),
                        row("conductivity", siemensPerMetre, ""),
                        row("ph", 8.0, "")),
                200);
        assertThat(answer.get("stored").asInt()).isEqualTo(4);

        HttpResponse<String> water = service.get("/api/v1/points/tank/water?from=2026-05-14T00:00:00Z", viewer);
        JsonNode state = DESCRIPTION
                .check("GET /api/v1/points/{code}/water", water)
                .get("states")
                .get(0);
        assertThat(state.get("salinity").asDouble()).isCloseTo(35, within(1e-6));
        assertThat(state.get("temperatureC").asDouble()).isCloseTo(25, within(1e-9));
        // 6.4 dKH are 6.4/2.804 meq/L, each of them 977.19 µmol/kg at salinity 35 and 25 °C
        assertThat(state.get("totalAlkalinityUmolKg").asDouble()).isCloseTo(6.4 / 2.804 * 977.19, within(0.2));
        JsonNode salinity = state.at("/inputs/2");
        assertThat(salinity.get("quantity").asString()).isEqualTo("salinity");
        assertThat(salinity.get("origin").asString()).isEqualTo("conductivity");
        assertThat(salinity.get("sensor").asString()).isEqualTo("c-1");
        assertThat(salinity.get("unit").asString()).isEqualTo("1");
        assertThat(salinity.get("at").asString()).isEqualTo(NOW.toString());
        assertThat(state.at("/inputs/3/origin").asString()).isEqualTo("sensor");
    }

    @Test
    void a_row_per_litre_without_a_density_is_refused_alone_and_says_what_to_send_instead() {
        JsonNode answer = post(Rows.batch(row("totalAlkalinity", 2.3, "meq/L"), row("ph", 8.0, "")), 207);

        assertThat(answer.get("stored").asInt()).isEqualTo(1);
        assertThat(answer.at("/refused/0/index").asInt()).isZero();
        assertThat(answer.at("/refused/0/detail").asString())
                .contains("2.3 meq/L", "per litre", "density", "no temperature of the last 60 min", "umol/kg");
        assertThat(service.refusedRows(site)).hasSize(1);
    }

    @Test
    void a_unit_that_is_not_known_is_refused_with_those_that_are() {
        JsonNode answer = post(Rows.batch(row("totalAlkalinity", 8, "dH")), 422);

        assertThat(answer.at("/refused/0/detail").asString()).contains("\"dH\"", "meq/L", "mg/L", "{dKH}", "umol/kg");
    }

    @Test
    void a_dose_for_a_tank_in_us_gallons_says_its_mass_in_grams_with_pounds_beside() {
        post(
                Rows.batch(
                        row("temperature", 71.6, ""),
                        row(
                                "conductivity",
                                ConductivitySalinity.conductivity(30, 22).orElseThrow(),
                                "mS/cm"),
                        row("totalAlkalinity", 2078, "umol/kg"),
                        row("ph", 7.6, "")),
                200);
        String session = service.signIn("lin", List.of(site), Role.OPERATOR);

        String inLitres = dose(session, "4000", "L", 200);
        String inGallons = dose(session, "1056.688209", "[gal_us]", 200);
        String inCubicMetres = dose(session, "4", "m3", 200);

        assertThat(inLitres)
                .contains("sodium carbonate in", "in 4\u00a0000\u00a0L.")
                .doesNotContain("\u00a0lb");
        assertThat(inGallons).contains("in 1\u00a0057\u00a0US\u00a0gal (4\u00a0000\u00a0L).");
        assertThat(inCubicMetres)
                .contains("in 4.00\u00a0m\u00b3 (4\u00a0000\u00a0L).")
                .doesNotContain("\u00a0lb");
        String grams = inLitres.replaceAll("(?s).*<p class=\"mass\"><b>([\\d.]+)\u00a0g</b>.*", "$1");
        String both = inGallons.replaceAll("(?s).*<p class=\"mass\"><b>([^<]*)</b>.*", "$1");
        assertThat(both).matches(grams + "\u00a0g \\([\\d.]+\u00a0lb\\)");
        double pounds = Double.parseDouble(both.replaceAll(".*\\(([\\d.]+)\u00a0lb.*", "$1"));
        assertThat(pounds).isCloseTo(Double.parseDouble(grams) / 453.59237, within(0.003));
        assertThat(inCubicMetres).contains(grams + "\u00a0g</b>");
        assertThat(inGallons).contains("<option value=\"[gal_us]\" selected>US gal</option>");
    }

    @Test
    void a_volume_in_a_unit_that_is_not_offered_is_refused_beside_its_field() {
        String session = service.signIn("lin", List.of(site), Role.OPERATOR);

        assertThat(dose(session, "1000", "firkin", 422)).contains("choose L, m\u00b3 or US gal");
        assertThat(dose(session, "much", "L", 422)).contains("d-volume-error", "is not a number");
    }

    @Test
    void a_volume_that_may_be_four_thousand_or_four_litres_is_asked_about() {
        String session = service.signIn("mo", List.of(site), Role.OPERATOR);

        assertThat(dose(session, "4,000", "L", 422))
                .contains("d-volume-error", "can be read in two ways; write 4000 or 4");
        assertThat(dose(session, "4 000,0", "L", 200)).doesNotContain("d-volume-error");
    }

    private String dose(String session, String volume, String unit, int status) {
        HttpRequest.Builder page = HttpRequest.newBuilder(service.address().resolve("/points/tank/dose"))
                .header("Cookie", "hingeline_session=" + session);
        String csrf = service.send(page.copy().GET().build())
                .body()
                .replaceAll("(?s).*name=\"csrf\" value=\"([^\"]+)\".*", "$1");
        String form = Map.of(
                        "csrf", csrf,
                        "targetOmega", "1.6",
                        "volume", volume,
                        "volumeUnit", unit,
                        "hydration", "anhydrous",
                        "assayPercent", "100",
                        "stockGramsPerLitre", "50",
                        "phTotalMax", "8.4",
                        "omegaAragoniteMax", "4.5",
                        "phPerHourMax", "0.15")
                .entrySet()
                .stream()
                .map(field -> field.getKey() + "=" + URLEncoder.encode(field.getValue(), StandardCharsets.UTF_8))
                .collect(Collectors.joining("&"));
        HttpResponse<String> answer = service.send(page.copy()
                .header("Content-Type", "application/x-www-form-urlencoded")
                .POST(BodyPublishers.ofString(form))
                .build());
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        return answer.body();
    }

    private JsonNode post(String batch, int status) {
        HttpResponse<String> answer = service.send("POST", "/api/v1/readings", key, batch);
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
        return DESCRIPTION.check("POST /api/v1/readings", answer);
    }

    /** A row of the tank at noon; in the sensor's own unit where none is said. */
    private static String row(String quantity, double value, String unit) {
        String row = Rows.row("tank", quantity, value, NOW);
        return unit.isEmpty() ? row : row.replace("}", ",\"unit\":\"" + unit + "\"}");
    }
}
