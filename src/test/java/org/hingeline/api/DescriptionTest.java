package org.hingeline.api;

import static org.assertj.core.api.Assertions.assertThat;

import io.swagger.v3.parser.OpenAPIV3Parser;
import io.swagger.v3.parser.core.models.ParseOptions;
import io.swagger.v3.parser.core.models.SwaggerParseResult;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;

/** The description of the API as a document, and whether it speaks of the routes that are there. */
class DescriptionTest {
    private final Description description = new Description();

    @Test
    void is_sound_openapi() {
        ParseOptions options = new ParseOptions();
        options.setResolve(true);
        options.setResolveFully(true);
        SwaggerParseResult result = new OpenAPIV3Parser().readContents(description.text(), null, options);
        assertThat(result.getMessages()).isEmpty();
        assertThat(result.getOpenAPI().getOpenapi()).startsWith("3.1");
        assertThat(result.getOpenAPI().getPaths())
                .hasSameSizeAs(description.document().get("paths").propertyNames());
    }

    @Test
    void describes_the_routes_that_are_served_and_no_others(@TempDir Path data) {
        try (RunningService service =
                RunningService.start(data, new SettableClock(Instant.parse("2026-05-14T12:00:00Z")))) {
            Set<String> served = service.routes().stream()
                    .filter(route ->
                            route.contains(" /api/") || route.contains(" /health/") || route.endsWith(" /metrics"))
                    .collect(Collectors.toSet());
            assertThat(description.routes()).containsExactlyInAnyOrderElementsOf(served);
        }
    }

    @Test
    void has_examples_that_are_what_its_schemas_say() {
        List<String> checked = new ArrayList<>();
        walk(description.document(), "", checked);
        assertThat(checked).as("places with examples").hasSizeGreaterThan(12);
    }

    private void walk(JsonNode node, String at, List<String> checked) {
        if (node.isObject() && node.has("schema")) {
            if (node.has("example")) {
                check(at, node.get("example"), checked);
            }
            if (node.has("examples")) {
                node.get("examples").values().forEach(each -> check(at, each.get("value"), checked));
            }
        }
        if (node.isObject()) {
            node.properties().forEach(each -> walk(each.getValue(), at + Description.pointer(each.getKey()), checked));
        }
        for (int i = 0; node.isArray() && i < node.size(); i++) {
            walk(node.get(i), at + "/" + i, checked);
        }
    }

    private void check(String at, JsonNode example, List<String> checked) {
        assertThat(description.faults(at + "/schema", example.toString()))
                .as("example at %s: %s", at, example)
                .isEmpty();
        checked.add(at);
    }

    @Test
    void would_notice_a_field_that_is_not_described() {
        String limit = """
                {"name":"omega-low","quantity":"omegaAragonite","below":1.8,"deadband":0.05,"onDelayMin":10.0,
                 "offDelayMin":10.0,"priority":"high","action":"Close the intake valve."%s}""";
        String at = "/components/schemas/Limit";
        assertThat(description.faults(at, limit.formatted(""))).isEmpty();
        assertThat(description.faults(at, limit.formatted(",\"extra\":1"))).isNotEmpty();
        assertThat(description.faults(at, limit.formatted(",\"above\":2"))).isNotEmpty();

        String state = "{\"at\":\"2026-05-14T12:00:00Z\",\"inputs\":[],\"missing\":[],\"cautions\":[]%s}";
        assertThat(description.faults("/components/schemas/WaterState", state.formatted("")))
                .isEmpty();
        assertThat(description.faults("/components/schemas/WaterState", state.formatted(",\"extra\":1")))
                .isNotEmpty();
        assertThat(description.faults("/components/schemas/WaterState", state.formatted(",\"omegaAragonite\":2.0")))
                .as("some numbers without the others")
                .isNotEmpty();
        assertThat(description.faults(
                        "/components/schemas/WaterState", state.formatted("").replace("12:00:00Z", "noon")))
                .as("a time that is none")
                .isNotEmpty();
    }
}
