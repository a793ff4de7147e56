package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.web.CalculatorReader.digits;
import static org.hingeline.web.CalculatorReader.plusMinus;
import static org.hingeline.web.CalculatorReader.query;
import static org.hingeline.web.CalculatorReader.sent;
import static org.hingeline.web.CalculatorReader.value;
import static org.hingeline.web.CalculatorReader.words;

import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.Map;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** How a point's water was computed, through HTTP: its stored numbers, where each came from, and who may see them. */
class PointWaterPageTest {
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
        assertThat(plusMinus(words, "omegaAragonite"))
                .as(
                        "the form has one number for the salinity, where the state knows that its thermometer is that of the water")
                .isCloseTo(u, within(5e-3 * u));
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
                        "At the time Ω [12]\\.\\d+ was computed; with the sensors as they are registered .* now it is 1\\.\\d+\\.");
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
    void numbers_tried_on_a_points_water_that_are_refused_lead_to_the_refusal() {
        String page = page("/calculator?point=larval-3&temp=22&salt=30&ph=14&ta=2080", 422);

        assertThat(page.split("id=\"state\"", -1)).hasSize(2);
        assertThat(page).contains("role=\"alert\" id=\"state\" tabindex=\"-1\"", "Where each input came from");
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
