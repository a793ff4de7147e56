package org.hingeline.web;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.monitor.IncomingReading;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;

/**
 * Reads {@code {"readings":[…]}} row by row. What is wrong with one row is told of that row and the others are still
 * taken; what is wrong with the whole is a problem.
 */
final class ReadingsJson {
    private static final String FIELDS = "point, quantity, value, at, unit, sensor";

    private final byte[] body;
    private final int mostRows;
    private final List<IncomingReading> rows = new ArrayList<>();

    private ReadingsJson(byte[] body, int mostRows) {
        this.body = body;
        this.mostRows = mostRows;
    }

    /** @throws ProblemException when the body as a whole cannot be taken */
    static List<IncomingReading> parse(byte[] body, int mostRows) {
        if (body.length == 0) {
            throw new ProblemException(400, "No body", "the request has no body; a JSON object is needed");
        }
        Json.requireUtf8(body);
        try (JsonParser parser = Json.MAPPER.createParser(body)) {
            return new ReadingsJson(body, mostRows).whole(parser);
        } catch (JacksonException e) {
            throw new ProblemException(JsonFaults.problem(e));
        }
    }

    private List<IncomingReading> whole(JsonParser parser) {
        if (parser.nextToken() != JsonToken.START_OBJECT) {
            throw shape("the body must be a JSON object with the field \"readings\"");
        }
        boolean seen = false;
        while (parser.nextToken() == JsonToken.PROPERTY_NAME) {
            if (!parser.currentName().equals("readings")) {
                throw shape(
                        "field " + JsonFaults.quoted(parser.currentName()) + " is not known here; accepted: readings");
            }
            seen = true;
            if (parser.nextToken() != JsonToken.START_ARRAY) {
                throw shape("readings must be an array of objects");
            }
            while (parser.nextToken() != JsonToken.END_ARRAY) {
                row(parser);
            }
        }
        if (!seen) {
            throw shape("field \"readings\" is missing");
        }
        if (parser.nextToken() != null) {
            throw shape("something follows after the end of the JSON object");
        }
        return rows;
    }

    private void row(JsonParser parser) {
        if (rows.size() == mostRows) {
            throw new ProblemException(
                    413,
                    "Too many readings",
                    "one request may carry " + mostRows + " readings; send the rest in another");
        }
        int index = rows.size();
        long from = parser.currentTokenLocation().getByteOffset();
        if (parser.currentToken() != JsonToken.START_OBJECT) {
            parser.skipChildren();
            parser.finishToken();
            rows.add(faulty(index, "a reading must be an object with the fields " + FIELDS, text(parser, from)));
            return;
        }
        String point = null;
        String quantity = null;
        Double value = null;
        String at = null;
        String unit = null;
        String sensor = null;
        String fault = null;
        while (parser.nextToken() == JsonToken.PROPERTY_NAME) {
            String name = parser.currentName();
            JsonToken token = parser.nextToken();
            String wrong = null;
            switch (name) {
                case "point" -> point = string(parser, token);
                case "quantity" -> quantity = string(parser, token);
                case "at" -> at = string(parser, token);
                case "unit" -> unit = string(parser, token);
                case "sensor" -> sensor = string(parser, token);
                case "value" -> {
                    double number = token.isNumeric() ? parser.getDoubleValue() : Double.NaN;
                    value = Double.isFinite(number) ? (Double) number : null;
                    wrong = value != null || token == JsonToken.VALUE_NULL
                            ? null
                            : "value " + shown(parser, token) + " is not a finite number";
                }
                default -> wrong = "field " + JsonFaults.quoted(name) + " is not known; accepted: " + FIELDS;
            }
            if (wrong == null
                    && !name.equals("value")
                    && token != JsonToken.VALUE_STRING
                    && token != JsonToken.VALUE_NULL) {
                wrong = name + " " + shown(parser, token) + " is not a string";
            }
            if (token.isStructStart()) {
                parser.skipChildren();
            }
            fault = fault == null ? wrong : fault;
        }
        rows.add(new IncomingReading(index, point, quantity, value, at, unit, sensor, fault, text(parser, from)));
    }

    private static @Nullable String string(JsonParser parser, JsonToken token) {
        return token == JsonToken.VALUE_STRING ? parser.getString() : null;
    }

    private static String shown(JsonParser parser, JsonToken token) {
        if (token.isStructStart()) {
            return token == JsonToken.START_ARRAY ? "[…]" : "{…}";
        }
        String text = String.valueOf(parser.getString());
        return token == JsonToken.VALUE_STRING ? JsonFaults.quoted(text) : JsonFaults.cut(text);
    }

    /** The row as it was sent. */
    private String text(JsonParser parser, long from) {
        int end = (int) parser.currentLocation().getByteOffset();
        return new String(body, (int) from, Math.max(0, end - (int) from), StandardCharsets.UTF_8);
    }

    private static IncomingReading faulty(int index, String fault, String text) {
        return new IncomingReading(index, null, null, null, null, null, null, fault, text);
    }

    private static ProblemException shape(String detail) {
        return new ProblemException(400, "Not a batch of readings", detail);
    }
}
