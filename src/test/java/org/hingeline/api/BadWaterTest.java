package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.util.List;
import java.util.Random;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;

/** A water that cannot be taken is told with the field, its value and what would be accepted; never with a failure. */
class BadWaterTest extends AskedByViewer {
    private static final String STATE = "/api/v1/seawater/state";
    private static final Description DESCRIPTION = new Description();

    /** Words of a program's inside, and the core's own units. */
    private static final Pattern INSIDE = Pattern.compile(
            "java|jackson|javalin|Exception|coerc|JsonToken|line -1| mol/kg| [0-9] atm", Pattern.CASE_INSENSITIVE);

    private static JsonNode refused(String body, int status) {
        HttpResponse<String> answer = service.send("POST", STATE, viewer, body);
        assertThat(answer.statusCode()).as(body + answer.body()).isEqualTo(status);
        JsonNode problem = DESCRIPTION.check("POST " + STATE, answer);
        assertThat(problem.get("detail").asString()).doesNotContainPattern(INSIDE);
        return problem;
    }

    private static void assertError(JsonNode problem, String pointer, String... words) {
        assertThat(problem.get("errors")).as(problem.toString()).isNotNull();
        assertThat(problem.get("errors")).anySatisfy(error -> {
            assertThat(error.get("pointer").asString()).isEqualTo(pointer);
            assertThat(error.get("detail").asString()).contains(words);
        });
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "`\"ph\":79`|/ph|ph 79 cannot be: 2 to 13 is accepted",
                "`\"ph\":1e999`|/ph|ph Infinity must be a finite number; 2 to 13 is accepted",
                "`\"ph\":-1e999`|/ph|ph -Infinity must be a finite number",
                "`\"totalAlkalinityUmolKg\":2e6`|/totalAlkalinityUmolKg|totalAlkalinityUmolKg 2000000 cannot be: -10000 to 100000 µmol/kg is accepted",
                "`\"temperatureC\":60`|/temperatureC|temperatureC 60 cannot be: -2 to 45 °C is accepted",
                "`\"temperatureC\":null`|/temperatureC|temperatureC is missing; -2 to 45 °C is accepted",
                "`\"salinity\":-1`|/salinity|salinity -1 cannot be: 0 to 50 is accepted",
                "`\"salinity\":null`|/salinity|salinity is missing; 0 to 50 is accepted, or conductivityMsCm in its place",
                "`\"conductivityMsCm\":45`|/conductivityMsCm|only one of salinity and conductivityMsCm is accepted, got 30 and 45",
                "`\"salinity\":null,\"conductivityMsCm\":999`|/conductivityMsCm|conductivityMsCm 999 cannot be: 0 to 200 mS/cm is accepted",
                "`\"salinity\":null,\"conductivityMsCm\":120`|/conductivityMsCm|conductivityMsCm 120 at 22 °C is beyond a salinity of 50",
                "`\"dicUmolKg\":1900`|``|exactly two of ph, totalAlkalinityUmolKg, dicUmolKg, pco2Uatm are needed, got ph 7.9, totalAlkalinityUmolKg 2078, dicUmolKg 1900",
                "`\"ph\":null`|``|are needed, got totalAlkalinityUmolKg 2078",
                "`\"ph\":null,\"totalAlkalinityUmolKg\":null`|``|are needed, got none",
                "`\"ph\":null,\"dicUmolKg\":-5`|/dicUmolKg|dicUmolKg -5 cannot be: 0 to 100000 µmol/kg is accepted",
                "`\"ph\":null,\"pco2Uatm\":0`|/pco2Uatm|pco2Uatm 0 cannot be: above 0 to 1000000 µatm is accepted",
                "`\"ph\":9.5,\"totalAlkalinityUmolKg\":100`|/ph|ph 9.5 and totalAlkalinityUmolKg 100 contradict each other",
                "`\"ph\":9.5,\"totalAlkalinityUmolKg\":100`|/totalAlkalinityUmolKg|a higher one is accepted",
                "`\"ph\":null,\"totalAlkalinityUmolKg\":null,\"dicUmolKg\":1,\"pco2Uatm\":9000`|/pco2Uatm|a lower one is accepted",
                "`\"phScale\":\"sws\"`|/phScale|phScale \"sws\" is not known; accepted: total, seawater, free, nbs",
                "`\"ph\":null,\"dicUmolKg\":1900,\"phScale\":\"nbs\"`|/phScale|phScale \"nbs\" says how ph was read, and there is no ph",
                "`\"ph\":null,\"dicUmolKg\":1900,\"phTemperatureC\":25`|/phTemperatureC|phTemperatureC 25 says how ph was read, and there is no ph",
                "`\"phTemperatureC\":77`|/phTemperatureC|phTemperatureC 77 cannot be: -2 to 45 °C is accepted",
                "`\"constants\":\"lueker\"`|/constants|constants \"lueker\" is not known; accepted: lueker2000, millero2006, waters2014",
                "`\"boron\":\"\"`|/boron|boron \"\" is not known; accepted: lee2010, uppstrom1974",
                "`\"phosphateUmolKg\":-1`|/phosphateUmolKg|phosphateUmolKg -1 cannot be: 0 to 1000 µmol/kg is accepted",
                "`\"silicateUmolKg\":1e5`|/silicateUmolKg|silicateUmolKg 100000 cannot be: 0 to 10000 µmol/kg is accepted",
                "`\"calciumMmolKg\":10280`|/calciumMmolKg|calciumMmolKg 10280 cannot be: 0 to 100 mmol/kg is accepted",
                "`\"uncertainty\":{\"ph\":-0.02}`|/uncertainty/ph|uncertainty/ph -0.02 cannot be: 0 to 1 is accepted",
                "`\"uncertainty\":{\"salinity\":1e999}`|/uncertainty/salinity|uncertainty/salinity Infinity must be a finite number",
                "`\"uncertainty\":{\"conductivityMsCm\":0.1}`|/uncertainty/conductivityMsCm|is not used: the water is given by its salinity",
                "`\"warmToC\":60`|/warmToC|warmToC 60 cannot be: -2 to 45 °C is accepted",
                "`\"equilibrateToUatm\":-420`|/equilibrateToUatm|equilibrateToUatm -420 cannot be: above 0 to 1000000 µatm is accepted",
                "`\"ammoniaMgL\":5000`|/ammoniaMgL|ammoniaMgL 5000 cannot be: 0 to 1000 mg/L as N is accepted",
                "`\"blendWith\":{}`|/blendWith/water|blendWith/water is missing",
                "`\"blendWith\":{\"massShare\":2,\"water\":{}}`|/blendWith/massShare|blendWith/massShare 2 cannot be: 0 to 1 is accepted",
                "`\"blendWith\":{\"massShare\":0.5,\"water\":{\"ph\":7}}`|/blendWith/water|got ph 7",
                "`\"blendWith\":{\"massShare\":0.5,\"water\":{\"blendWith\":{}}}`|/blendWith/water/blendWith|is not taken here"
            })
    void a_number_that_cannot_be(String field, String pointer, String detail) {
        assertError(refused(with(field), 422), pointer, detail);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "`\"ph\":\"7.9\"`|/ph|ph \"7.9\" must be a number",
                "`\"ph\":\"NaN\"`|/ph|ph \"NaN\" must be a number",
                "`\"ph\":true`|/ph|ph true must be a number",
                "`\"ph\":[7.9]`|/ph|ph […] must be a number",
                "`\"ph\":{\"value\":7.9}`|/ph|ph {…} must be a number",
                "`\"phScale\":1`|/phScale|phScale 1 must be a string",
                "`\"uncertainty\":0.1`|/uncertainty|uncertainty 0.1 must be a JSON object",
                "`\"uncertainty\":{\"ph\":\"x\"}`|/uncertainty/ph|uncertainty/ph \"x\" must be a number",
                "`\"uncertainty\":{\"omega\":1}`|/uncertainty/omega|field \"uncertainty/omega\" is not known here; accepted: calciumMmolKg",
                "`\"blendWith\":[]`|/blendWith|blendWith […] must be a JSON object",
                "`\"blendWith\":{\"share\":1}`|/blendWith/share|accepted: massShare, water",
                "`\"blendWith\":{\"water\":5}`|/blendWith/water|blendWith/water 5 must be a JSON object",
                "`\"withUncertainty\":\"yes\"`|/withUncertainty|withUncertainty \"yes\" must be true or false",
                "`\"pH\":7.9`|/pH|field \"pH\" is not known here; accepted: ammoniaMgL, blendWith",
                "`\"a/b~c\":{\"d\":[1]}`|/a~1b~0c|field \"a/b~c\" is not known here"
            })
    void a_field_of_a_wrong_kind(String field, String pointer, String detail) {
        assertError(refused(with(field), 400), pointer, detail);
    }

    @Test
    void everything_is_told_at_once() {
        assertThat(refused(with("\"ph\":79,\"temperatureC\":60,\"constants\":\"x\",\"warmToC\":70"), 422)
                        .get("errors"))
                .hasSize(4);
        assertThat(refused(with("\"ph\":\"x\",\"salinity\":\"y\",\"z\":1"), 400).get("errors"))
                .hasSize(3);
    }

    /** The good water with one field changed: the last of two fields of a name would be refused, so it is replaced. */
    private static String with(String fields) {
        StringBuilder body = new StringBuilder("{").append(fields);
        for (String good :
                List.of("\"temperatureC\":22", "\"salinity\":30", "\"ph\":7.9", "\"totalAlkalinityUmolKg\":2078")) {
            String name = good.split(":")[0] + ":";
            if (!fields.startsWith(name) && !fields.contains("," + name)) {
                body.append(',').append(good);
            }
        }
        return body.append('}').toString();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "null",
                "[]",
                "5",
                "\"x\"",
                "{",
                "{\"ph\"",
                "{\"ph\":",
                "{\"ph\":7.9,}",
                "{} {}",
                "{\"ph\":1,\"ph\":2}",
                "{\"ph\":NaN}",
                "{\"ph\":+1}",
                "{\"ph\":.5}",
                "{\"uncertainty\":{",
                "\u0000",
                "{\"ph\":7,9}"
            })
    void what_is_no_object(String body) {
        refused(body, 400);
        HttpResponse<String> list = service.send("POST", STATE + "s", viewer, body);
        assertThat(list.statusCode()).as(body).isEqualTo(400);
        DESCRIPTION.check("POST " + STATE + "s", list);
        HttpResponse<String> inList = service.send("POST", STATE + "s", viewer, "{\"waters\":[" + body + "]");
        assertThat(inList.statusCode()).as(body).isEqualTo(400);
        DESCRIPTION.check("POST " + STATE + "s", inList);
    }

    @Test
    void another_format_is_refused() {
        HttpResponse<String> answer =
                service.send(HttpRequest.newBuilder(service.address().resolve(STATE))
                        .header("Authorization", "Bearer " + viewer)
                        .header("Content-Type", "text/csv")
                        .POST(BodyPublishers.ofString("ph,7.9"))
                        .build());
        assertThat(answer.statusCode()).isEqualTo(415);
        DESCRIPTION.check("POST " + STATE, answer);
    }

    @Test
    void extremes_are_answered_or_refused_but_never_fail() {
        Random random = new Random(11);
        List<String> names = List.of(
                "ph",
                "totalAlkalinityUmolKg",
                "dicUmolKg",
                "pco2Uatm",
                "temperatureC",
                "salinity",
                "conductivityMsCm",
                "phTemperatureC",
                "phosphateUmolKg",
                "silicateUmolKg",
                "calciumMmolKg",
                "warmToC",
                "equilibrateToUatm",
                "ammoniaMgL");
        List<String> values = List.of(
                "0", "-0.0", "1e-300", "5e-324", "-1e-300", "1e300", "2", "13", "7.9", "45", "-2", "50", "100000",
                "1e6", "0.1", "-10000", "12.9", "1e-7");
        int answered = 0;
        for (int i = 0; i < 3000; i++) {
            StringBuilder body = new StringBuilder("{\"temperatureX\":0");
            body.setLength(1);
            int start = random.nextInt(names.size());
            for (int n = 0; n < names.size(); n++) {
                if (random.nextInt(3) == 0 || n < 2) {
                    body.append(body.length() == 1 ? "" : ",")
                            .append('"')
                            .append(names.get((start + n) % names.size()))
                            .append("\":")
                            .append(values.get(random.nextInt(values.size())));
                }
            }
            HttpResponse<String> answer =
                    service.send("POST", STATE, viewer, body.append('}').toString());
            assertThat(answer.statusCode()).as(body + " " + answer.body()).isIn(200, 422);
            assertThat(answer.body()).as(body.toString()).doesNotContain("NaN", " mol/kg");
            if (answer.statusCode() == 200) {
                answered++;
                DESCRIPTION.check("POST " + STATE, answer);
            }
        }
        assertThat(answered).isPositive();
    }
}
