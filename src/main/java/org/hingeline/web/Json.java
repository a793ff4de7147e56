package org.hingeline.web;

import io.javalin.http.Context;
import java.util.List;
import java.util.stream.Collectors;
import org.hingeline.web.Problem.FieldError;
import tools.jackson.core.JacksonException;
import tools.jackson.core.StreamReadFeature;
import tools.jackson.core.json.JsonFactory;
import tools.jackson.databind.DatabindException;
import tools.jackson.databind.DeserializationFeature;
import tools.jackson.databind.MapperFeature;
import tools.jackson.databind.exc.UnrecognizedPropertyException;
import tools.jackson.databind.json.JsonMapper;

/** JSON in and out: strict in what it takes, and every refusal names the field. */
final class Json {
    static final JsonFactory FACTORY = JsonFactory.builder()
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .build();

    static final JsonMapper MAPPER = JsonMapper.builder(FACTORY)
            .enable(DeserializationFeature.FAIL_ON_UNKNOWN_PROPERTIES)
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .disable(DeserializationFeature.ACCEPT_FLOAT_AS_INT)
            .disable(MapperFeature.ALLOW_COERCION_OF_SCALARS)
            .build();

    private Json() {}

    /** The request's body as a record; a bad one ends the request with 400 and names the field. */
    static <T> T body(Context ctx, Class<T> type) {
        byte[] bytes = ctx.bodyAsBytes();
        if (bytes.length == 0) {
            throw new ProblemException(400, "No body", "the request has no body; a JSON object is needed");
        }
        try {
            T value = MAPPER.readValue(bytes, type);
            if (value == null) {
                throw new ProblemException(400, "No object", "the body is null; a JSON object is needed");
            }
            return value;
        } catch (JacksonException e) {
            throw new ProblemException(problem(e));
        }
    }

    static void answer(Context ctx, int status, Object body) {
        ctx.status(status).contentType("application/json").result(MAPPER.writeValueAsBytes(body));
    }

    static void answer(Context ctx, Problem problem) {
        ctx.status(problem.status()).contentType("application/problem+json").result(MAPPER.writeValueAsBytes(problem));
    }

    /** What is wrong with a body, without words of the program's inside. */
    static Problem problem(JacksonException e) {
        String where = e.getLocation() == null
                ? ""
                : " (line " + e.getLocation().getLineNr() + ", column "
                        + e.getLocation().getColumnNr() + ")";
        if (e instanceof UnrecognizedPropertyException unknown) {
            String known = unknown.getKnownPropertyIds() == null
                    ? ""
                    : "; accepted: "
                            + unknown.getKnownPropertyIds().stream()
                                    .map(String::valueOf)
                                    .sorted()
                                    .collect(Collectors.joining(", "));
            String detail = "field \"" + unknown.getPropertyName() + "\" is not known here" + known;
            return Problem.ofFields(
                    400, "Unknown field", detail + where, List.of(new FieldError(pointer(unknown), detail)));
        }
        if (e instanceof DatabindException wrong && !wrong.getPath().isEmpty()) {
            String detail = firstLine(e.getOriginalMessage());
            return Problem.ofFields(
                    400, "Wrong field", detail + where, List.of(new FieldError(pointer(wrong), detail)));
        }
        return Problem.of(400, "Broken JSON", firstLine(e.getOriginalMessage()) + where);
    }

    private static String pointer(DatabindException e) {
        return e.getPath().stream()
                .map(step -> step.getPropertyName() != null
                        ? step.getPropertyName().replace("~", "~0").replace("/", "~1")
                        : String.valueOf(step.getIndex()))
                .collect(Collectors.joining("/", "/", ""));
    }

    /** The library's words without class names and source snippets. */
    private static String firstLine(String message) {
        String line = message.lines().findFirst().orElse("the JSON cannot be read");
        return line.replaceAll("`?(?:java|org\\.hingeline|tools)\\.[\\w.$`\\[\\]]+", "value")
                .replaceAll("\\(for value[^)]*\\)", "")
                .replaceAll(": enable `[^`]*` to allow", " is not JSON")
                .strip();
    }
}
