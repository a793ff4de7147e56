package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.net.http.HttpResponse;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ObjectNode;

/** The examples of waters in the README and in the description are what the service answers. */
class DocumentedWatersTest extends AskedByViewer {
    private static final JsonMapper JSON = new JsonMapper();

    private static JsonNode answer(String path, String body) {
        HttpResponse<String> answer =
                body.isEmpty() ? service.get(path, viewer) : service.send("POST", path, viewer, body);
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(200);
        return JSON.readTree(answer.body());
    }

    @Test
    void the_description_shows_real_answers() {
        Description description = new Description();
        int compared = 0;
        for (String path : List.of("/api/v1/seawater/state", "/api/v1/seawater/states")) {
            JsonNode post = description.document().get("paths").get(path).get("post");
            JsonNode asked = post.at("/requestBody/content/application~1json/examples");
            JsonNode shown = post.at("/responses/200/content/application~1json/examples");
            assertThat(shown.propertyNames()).isEqualTo(asked.propertyNames());
            for (String name : asked.propertyNames()) {
                JsonNode real = answer(path, asked.get(name).get("value").toString());
                assertSame(name, shown.get(name).get("value"), real);
                compared++;
            }
        }
        JsonNode tris =
                description.document().get("paths").get("/api/v1/seawater/tris").get("get");
        String query =
                "?temperatureC=" + tris.at("/parameters/1/example") + "&salinity=" + tris.at("/parameters/2/example");
        assertSame(
                "tris",
                tris.at("/responses/200/content/application~1json/example"),
                answer("/api/v1/seawater/tris" + query, ""));
        assertThat(compared).isGreaterThanOrEqualTo(5);
    }

    @Test
    void the_readme_shows_real_answers() throws IOException {
        String section = Files.readString(Path.of("README.md"))
                .replaceAll("(?s).*\n## Ask for the state of a water\n(.*?)\n## .*", "$1");
        List<MatchResult> calls = Pattern.compile("(?m)^    state '(.*)'\n((?:    # .*\n)?)")
                .matcher(section)
                .results()
                .toList();
        assertThat(calls).hasSize(7);

        String whole = section.substring(section.indexOf("\n    {") + 1);
        whole = whole.substring(0, whole.indexOf("}\n\n") + 1);
        ObjectNode real =
                (ObjectNode) answer("/api/v1/seawater/state", calls.get(0).group(1));
        assertThat(real.remove("method")).isNotNull();
        assertSame("the first", JSON.readTree(whole), real);

        List<String> pairs = new ArrayList<>();
        for (MatchResult call : calls.subList(1, 7)) {
            JsonNode state = answer("/api/v1/seawater/state", call.group(1));
            List<MatchResult> numbers = Pattern.compile("([a-zA-Z0-9]+) ([0-9.]+)")
                    .matcher(call.group(2))
                    .results()
                    .toList();
            assertThat(numbers).as(call.group()).hasSize(5);
            for (MatchResult number : numbers) {
                int decimals = number.group(2).length() - number.group(2).indexOf('.') - 1;
                assertThat(Double.parseDouble(number.group(2)))
                        .as("%s of %s", number.group(1), call.group(1))
                        .isCloseTo(state.get(number.group(1)).asDouble(), within(0.5001 * Math.pow(10, -decimals)));
            }
            pairs.add(String.join("+", JSON.readTree(call.group(1)).propertyNames()));
        }
        assertThat(pairs.subList(0, 5)).as("each pair once").doesNotHaveDuplicates();
    }

    /** The same fields in the same shape, numbers to nine digits: the last one may differ between processors. */
    private static void assertSame(String where, JsonNode shown, JsonNode real) {
        if (shown.isNumber()) {
            assertThat(shown.asDouble()).as(where).isCloseTo(real.asDouble(), within(1e-9 * Math.abs(real.asDouble())));
        } else if (shown.isObject()) {
            assertThat(shown.propertyNames()).as(where).isEqualTo(real.propertyNames());
            shown.properties()
                    .forEach(each -> assertSame(where + "/" + each.getKey(), each.getValue(), real.get(each.getKey())));
        } else if (shown.isArray()) {
            assertThat(shown.size()).as(where).isEqualTo(real.size());
            for (int i = 0; i < shown.size(); i++) {
                assertSame(where + "/" + i, shown.get(i), real.get(i));
            }
        } else {
            assertThat(shown).as(where).isEqualTo(real);
        }
    }
}
