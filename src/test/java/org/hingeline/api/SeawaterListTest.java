package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.net.http.HttpResponse;
import java.util.Locale;
import java.util.function.IntFunction;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** Lists of waters through HTTP. */
class SeawaterListTest extends AskedByViewer {
    private static final String STATES = "/api/v1/seawater/states";
    private static final Description DESCRIPTION = new Description();
    private static final String GOOD =
            "{\"temperatureC\":22,\"salinity\":30,\"ph\":7.9,\"totalAlkalinityUmolKg\":2078}";

    /** Every field a water can have, each with more digits than a sensor gives. */
    private static final String FULL = """
            {"temperatureC":21.98765432,"salinity":30.12345678,"ph":7.912345678,"phScale":"seawater",\
            "phTemperatureC":24.98765432,"totalAlkalinityUmolKg":2078.123456,"phosphateUmolKg":0.512345678,\
            "silicateUmolKg":12.34567891,"calciumMmolKg":9.123456789,"constants":"millero2006","boron":"uppstrom1974",\
            "uncertainty":{"ph":0.0212345678,"totalAlkalinityUmolKg":10.12345678,"dicUmolKg":10.12345678,\
            "pco2Uatm":10.12345678,"temperatureC":0.112345678,"salinity":0.112345678,"calciumMmolKg":0.112345678},\
            "warmToC":24.98765432,"equilibrateToUatm":420.1234567,"ammoniaMgL":0.312345678,\
            "blendWith":{"massShare":0.412345678,"water":{"temperatureC":17.98765432,"salinity":33.12345678,\
            "ph":8.112345678,"phScale":"free","phTemperatureC":24.98765432,"totalAlkalinityUmolKg":2230.123456,\
            "phosphateUmolKg":0.512345678,"silicateUmolKg":12.34567891,"calciumMmolKg":10.12345678,\
            "constants":"millero2006","boron":"uppstrom1974","uncertainty":{"ph":0.0212345678,\
            "totalAlkalinityUmolKg":10.12345678,"dicUmolKg":10.12345678,"pco2Uatm":10.12345678,\
            "temperatureC":0.112345678,"salinity":0.112345678,"calciumMmolKg":0.112345678}}}}""";

    private static String list(int count, IntFunction<String> water) {
        return "{\"waters\":[" + IntStream.range(0, count).mapToObj(water).collect(Collectors.joining(",")) + "]}";
    }

    private static JsonNode post(String body, int status) {
        HttpResponse<String> answer = service.send("POST", STATES, viewer, body);
        assertThat(answer.statusCode())
                .as(answer.body().substring(0, Math.min(2000, answer.body().length())))
                .isEqualTo(status);
        return DESCRIPTION.check("POST " + STATES, answer);
    }

    @Test
    void ten_thousand_waters_come_back_in_order_with_a_bad_one_in_its_place() {
        String body = list(
                10_000,
                i -> String.format(
                        Locale.ROOT,
                        "{\"temperatureC\":%.3f,\"salinity\":30,\"ph\":%s,\"totalAlkalinityUmolKg\":2078}",
                        10 + i / 1000.0,
                        i == 5000 ? "79" : "7.9"));
        HttpResponse<String> answer = service.send("POST", STATES, viewer, body);
        assertThat(answer.statusCode()).isEqualTo(200);
        JsonNode states = new JsonMapper().readTree(answer.body()).get("states");
        assertThat(states).hasSize(10_000);
        for (int i = 0; i < 10_000; i++) {
            if (i != 5000) {
                assertThat(states.get(i).get("temperatureC").asDouble()).isCloseTo(10 + i / 1000.0, within(1e-9));
            }
        }
        assertThat(states.at("/5000/status").asInt()).isEqualTo(422);
        assertThat(states.at("/5000/errors/0/pointer").asString()).isEqualTo("/ph");
        assertThat(states.at("/5000/detail").asString()).isEqualTo("ph 79 cannot be: 2 to 13 is accepted");
    }

    @Test
    void a_list_has_the_same_states_as_single_waters() {
        JsonNode answer = post("{\"waters\":[" + GOOD + "," + FULL + "]}", 200);
        for (int i = 0; i < 2; i++) {
            HttpResponse<String> single = service.send("POST", "/api/v1/seawater/state", viewer, i == 0 ? GOOD : FULL);
            JsonNode alone = DESCRIPTION.check("POST /api/v1/seawater/state", single);
            JsonNode listed = answer.at("/states/" + i);
            assertThat(answer.get("methods").get(listed.get("methodIndex").asInt()))
                    .isEqualTo(alone.get("method"));
            alone.properties().stream()
                    .filter(field -> !field.getKey().equals("method"))
                    .forEach(field -> assertThat(listed.get(field.getKey()))
                            .as(field.getKey())
                            .isEqualTo(field.getValue()));
            assertThat(listed.size()).isEqualTo(alone.size());
        }
        assertThat(answer.get("methods")).hasSize(2);
        assertThat(post("{\"waters\":[" + GOOD + "," + GOOD + "]}", 200).get("methods"))
                .as("said once")
                .hasSize(1);
    }

    @Test
    void uncertainty_is_answered_unless_it_is_not_wanted() {
        assertThat(post("{\"waters\":[" + GOOD + "]}", 200).at("/states/0").has("standardUncertainty"))
                .isTrue();
        assertThat(post("{\"waters\":[" + GOOD + "],\"withUncertainty\":false}", 200)
                        .at("/states/0")
                        .has("standardUncertainty"))
                .isFalse();
        assertThat(post("{\"withUncertainty\":false,\"waters\":[" + GOOD + "]}", 200)
                        .at("/states/0")
                        .has("standardUncertainty"))
                .isFalse();
    }

    @Test
    void waters_of_wrong_kinds_stand_in_their_places_too() {
        JsonNode states = post(
                        "{\"waters\":[5,null,[[1]],{\"ph\":\"x\",\"deep\":{\"er\":[{}]}},{}," + GOOD + ",\"x\"]}", 200)
                .get("states");
        assertThat(states).hasSize(7);
        assertThat(states.at("/0/detail").asString()).isEqualTo("a water must be a JSON object, got 5");
        assertThat(states.at("/1/detail").asString()).contains("null");
        assertThat(states.at("/2/detail").asString()).contains("[…]");
        assertThat(states.at("/3/errors/0/pointer").asString()).isEqualTo("/ph");
        assertThat(states.at("/3/errors/1/pointer").asString()).isEqualTo("/deep");
        assertThat(states.at("/4/status").asInt()).isEqualTo(422);
        assertThat(states.at("/5/omegaAragonite").asDouble()).isCloseTo(1.9454, within(5e-5));
        assertThat(states.at("/6/status").asInt()).isEqualTo(400);
    }

    @Test
    void more_than_ten_thousand_are_refused() {
        JsonNode refused = post(list(10_001, i -> GOOD), 413);
        assertThat(refused.get("title").asString()).isEqualTo("Too many waters");
        assertThat(refused.get("detail").asString()).contains("10000");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "`{\"waters\":[]}`|422|waters is empty; 1 to 10000 are accepted",
                "`{}`|422|waters is missing",
                "`{\"withUncertainty\":true}`|422|waters is missing",
                "`{\"waters\":{}}`|400|waters {…} must be a list of waters",
                "`{\"waters\":5}`|400|waters 5 must be a list of waters",
                "`{\"waters\":null}`|400|waters null must be a list of waters",
                "`{\"waters\":[{}],\"states\":[]}`|400|field \"states\" is not known here; accepted: waters, withUncertainty",
                "`{\"waters\":[{}],\"withUncertainty\":1}`|400|withUncertainty 1 must be true or false",
                "`{\"waters\":[{}],\"waters\":[{}]}`|400|field \"waters\" is there twice",
                "`{\"waters\":[{\"ph\":1,\"ph\":2}]}`|400|field \"ph\" is there twice",
                "`{\"waters\":[{}]} x`|400|x is not JSON",
                "`{\"waters\":[{}]`|400|the JSON ends too early",
                "`{\"waters\":[{]}`|400|it is not JSON"
            })
    void a_body_that_is_no_list_of_waters(String body, int status, String detail) {
        assertThat(post(body, status).get("detail").asString()).contains(detail);
    }

    @Test
    void ten_thousand_waters_with_every_field_fit() {
        String body = list(10_000, i -> FULL);
        assertThat(body.length()).isGreaterThan(10_000_000);
        HttpResponse<String> answer = service.send("POST", STATES, viewer, body);
        assertThat(answer.statusCode()).as(answer.body().substring(0, 200)).isEqualTo(200);
        assertThat(answer.body()).endsWith("}]}").doesNotContain("\"status\":");
    }
}
