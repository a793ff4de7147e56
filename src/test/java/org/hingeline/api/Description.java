package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.Error;
import com.networknt.schema.ExecutionContext;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaLocation;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.dialect.Dialects;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.dataformat.yaml.YAMLMapper;

/** The OpenAPI document that the service serves, and whether an answer is what it says. */
final class Description {
    private static final String LOCATION = "https://hingeline.example/openapi.json";
    private static final JsonMapper JSON = new JsonMapper();

    private final String text;
    private final JsonNode document;
    private final SchemaRegistry registry;

    Description() {
        try (InputStream in = Description.class.getResourceAsStream("/openapi/hingeline-v1.yaml")) {
            text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        document = new YAMLMapper().readTree(text);
        String json = JSON.writeValueAsString(document);
        registry =
                SchemaRegistry.withDialect(Dialects.getOpenApi31(), builder -> builder.schemas(Map.of(LOCATION, json)));
    }

    String text() {
        return text;
    }

    JsonNode document() {
        return document;
    }

    /** Every route described, as {@code GET /api/v1/points}. */
    Set<String> routes() {
        Set<String> routes = new TreeSet<>();
        document.get("paths")
                .properties()
                .forEach(path -> path.getValue()
                        .propertyNames()
                        .forEach(method -> routes.add(method.toUpperCase(Locale.ROOT) + " " + path.getKey())));
        return routes;
    }

    /**
     * The answer has a status, a content type and a body that the document gives this route.
     *
     * @param route as {@code GET /api/v1/points/{code}}
     * @return the body
     */
    JsonNode check(String route, HttpResponse<String> answer) {
        String[] parts = route.split(" ", 2);
        String status = String.valueOf(answer.statusCode());
        JsonNode responses = document.get("paths")
                .get(parts[1])
                .get(parts[0].toLowerCase(Locale.ROOT))
                .get("responses");
        assertThat(responses.has(status))
                .as("%s is described to answer %s; it said %s", route, status, answer.body())
                .isTrue();
        JsonNode response = responses.get(status);
        String at = pointer("paths", parts[1], parts[0].toLowerCase(Locale.ROOT), "responses", status);
        if (response.has("$ref")) {
            at = response.get("$ref").asString().substring(1);
            response = document.at(at);
        }
        if (!response.has("content")) {
            assertThat(answer.body()).as(route).isEmpty();
            return JSON.missingNode();
        }
        String type = answer.headers().firstValue("Content-Type").orElse("").split(";")[0];
        assertThat(response.get("content").propertyNames())
                .as("types of %s %s", route, status)
                .contains(type);
        if (!type.endsWith("json")) {
            return JSON.missingNode();
        }
        assertThat(faults(at + pointer("content", type, "schema"), answer.body()))
                .as("%s %s: %s", route, status, answer.body())
                .isEmpty();
        return JSON.readTree(answer.body());
    }

    /** What keeps a JSON text from being what the schema at this place of the document says. */
    List<Error> faults(String pointer, String json) {
        Schema schema = registry.getSchema(SchemaLocation.of(LOCATION + "#" + pointer));
        return schema.validate(
                JSON.readTree(json),
                (ExecutionContext context) -> context.executionConfig(config -> config.formatAssertionsEnabled(true)));
    }

    static String pointer(String... steps) {
        StringBuilder pointer = new StringBuilder();
        for (String step : steps) {
            pointer.append('/').append(step.replace("~", "~0").replace("/", "~1"));
        }
        return pointer.toString();
    }
}
