package org.hingeline.web;

import io.javalin.http.Context;
import java.util.regex.Pattern;
import tools.jackson.core.JacksonException;
import tools.jackson.core.StreamReadFeature;
import tools.jackson.core.StreamWriteFeature;
import tools.jackson.core.json.JsonFactory;
import tools.jackson.databind.DeserializationFeature;
import tools.jackson.databind.MapperFeature;
import tools.jackson.databind.cfg.CoercionAction;
import tools.jackson.databind.cfg.CoercionInputShape;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.type.LogicalType;

/** JSON in and out: strict in what it takes, and every refusal names the field. */
final class Json {
    static final JsonFactory FACTORY = JsonFactory.builder()
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER)
            .build();

    static final JsonMapper MAPPER = JsonMapper.builder(FACTORY)
            .enable(DeserializationFeature.FAIL_ON_UNKNOWN_PROPERTIES)
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .disable(DeserializationFeature.ACCEPT_FLOAT_AS_INT)
            .disable(MapperFeature.ALLOW_COERCION_OF_SCALARS)
            .withCoercionConfig(
                    LogicalType.Textual,
                    config -> config.setCoercion(CoercionInputShape.Integer, CoercionAction.Fail)
                            .setCoercion(CoercionInputShape.Float, CoercionAction.Fail)
                            .setCoercion(CoercionInputShape.Boolean, CoercionAction.Fail))
            .build();

    private static final Pattern TYPE = Pattern.compile("application/json\\s*(;.*)?", Pattern.CASE_INSENSITIVE);

    private Json() {}

    /** The request's body as a record; a bad one ends the request with 400 and names the field. */
    static <T> T body(Context ctx, Class<T> type) {
        byte[] bytes = bytes(ctx);
        try {
            T value = MAPPER.readValue(bytes, type);
            if (value == null) {
                throw new ProblemException(400, "No object", "the body is null; a JSON object is needed");
            }
            return value;
        } catch (JacksonException e) {
            throw new ProblemException(JsonFaults.problem(e));
        }
    }

    /** The request's body, which is not empty and says to be JSON in UTF-8, if anything. */
    static byte[] bytes(Context ctx) {
        byte[] bytes = ctx.bodyAsBytes();
        requireType(ctx);
        if (bytes.length == 0) {
            throw new ProblemException(400, "No body", "the request has no body; a JSON object is needed");
        }
        requireUtf8(bytes);
        return bytes;
    }

    static void answer(Context ctx, int status, Object body) {
        ctx.status(status).contentType("application/json").result(MAPPER.writeValueAsBytes(body));
    }

    static void answer(Context ctx, Problem problem) {
        ctx.status(problem.status()).contentType("application/problem+json").result(MAPPER.writeValueAsBytes(problem));
    }

    /** JSON is UTF-8 (RFC 8259, 8.1); the parser would also read UTF-16 and UTF-32, and then lose count of the bytes. */
    static void requireUtf8(byte[] body) {
        for (int i = 0; i < Math.min(4, body.length); i++) {
            int b = body[i] & 0xff;
            if (b == 0 || b == 0xfe || b == 0xff) {
                throw new ProblemException(400, "Broken JSON", "the body is not UTF-8");
            }
        }
    }

    /** Ends the request with 415 when its body says that it is something else. */
    static void requireType(Context ctx) {
        String type = ctx.contentType();
        if (type != null && !TYPE.matcher(type).matches()) {
            throw new ProblemException(
                    415,
                    "Unknown format",
                    "content type " + JsonFaults.quoted(type) + " is not taken here; accepted: application/json");
        }
    }
}
