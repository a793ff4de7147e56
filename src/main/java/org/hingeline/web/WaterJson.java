package org.hingeline.web;

import java.util.ArrayList;
import java.util.List;
import org.hingeline.monitor.WaterWish;
import org.hingeline.monitor.WaterWishBuilder;
import org.hingeline.web.Problem.FieldError;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;

/**
 * Reads waters out of JSON field by field, without a tree in between: a water whose fields are of a wrong kind is told as a
 * problem, and the next ones are read all the same.
 */
final class WaterJson {
    static final int MOST_WATERS = 10_000;

    private static final String FIELDS = "ammoniaMgL, blendWith, boron, calciumMmolKg, conductivityMsCm, constants,"
            + " dicUmolKg, equilibrateToUatm, pco2Uatm, ph, phScale, phTemperatureC, phosphateUmolKg, salinity,"
            + " silicateUmolKg, temperatureC, totalAlkalinityUmolKg, uncertainty, warmToC";
    private static final String UNCERTAINTY_FIELDS =
            "calciumMmolKg, conductivityMsCm, dicUmolKg, pco2Uatm, ph, salinity,"
                    + " temperatureC, totalAlkalinityUmolKg";
    private static final String BLEND_FIELDS = "massShare, water";
    private static final String STATES_FIELDS = "waters, withUncertainty";

    /** A list of waters: each a wish, or the problem that its fields are of a wrong kind. */
    record Waters(List<Object> each, boolean withUncertainty) {}

    /** One water. */
    record Water(WaterWish wish, boolean withUncertainty) {}

    private final JsonParser parser;
    private List<FieldError> errors = new ArrayList<>();
    private boolean withUncertainty = true;

    private WaterJson(JsonParser parser) {
        this.parser = parser;
    }

    /** @throws ProblemException when the body is not a water */
    static Water one(byte[] body) {
        try (JsonParser parser = Json.MAPPER.createParser(body)) {
            return new WaterJson(parser).single();
        } catch (JacksonException e) {
            throw new ProblemException(JsonFaults.problem(e));
        }
    }

    /** @throws ProblemException when the body as a whole is not a list of waters */
    static Waters list(byte[] body) {
        try (JsonParser parser = Json.MAPPER.createParser(body)) {
            return new WaterJson(parser).states();
        } catch (JacksonException e) {
            throw new ProblemException(JsonFaults.problem(e));
        }
    }

    private Water single() {
        if (parser.nextToken() != JsonToken.START_OBJECT) {
            throw new ProblemException(400, "No object", "the body must be a JSON object that describes a water");
        }
        WaterWish wish = water("", true);
        requireEnd();
        if (!errors.isEmpty()) {
            throw new ProblemException(problem());
        }
        return new Water(wish, withUncertainty);
    }

    private Waters states() {
        if (parser.nextToken() != JsonToken.START_OBJECT) {
            throw new ProblemException(
                    400, "No object", "the body must be a JSON object with the field \"waters\", a list of waters");
        }
        List<Object> each = null;
        while (parser.nextToken() == JsonToken.PROPERTY_NAME) {
            String name = parser.currentName();
            JsonToken token = parser.nextToken();
            if (name.equals("waters")) {
                each = waters(token);
            } else if (name.equals("withUncertainty")) {
                withUncertainty(token, "");
            } else {
                unknown("", name, token, STATES_FIELDS);
            }
        }
        requireEnd();
        if (!errors.isEmpty()) {
            throw new ProblemException(problem());
        }
        if (each == null || each.isEmpty()) {
            String detail = each == null
                    ? "waters is missing; a list of 1 to " + MOST_WATERS + " waters is needed"
                    : "waters is empty; 1 to " + MOST_WATERS + " are accepted";
            throw new ProblemException(
                    Problem.ofFields(422, "No waters", detail, List.of(new FieldError("/waters", detail))));
        }
        return new Waters(each, withUncertainty);
    }

    private @Nullable List<Object> waters(JsonToken token) {
        if (token != JsonToken.START_ARRAY) {
            wrong("", "waters", token, "a list of waters");
            return null;
        }
        List<FieldError> ofTheWhole = errors;
        List<Object> each = new ArrayList<>();
        for (JsonToken next = parser.nextToken(); next != JsonToken.END_ARRAY; next = parser.nextToken()) {
            if (each.size() == MOST_WATERS) {
                throw new ProblemException(
                        413,
                        "Too many waters",
                        "one request may carry " + MOST_WATERS + " waters; send the rest in another");
            }
            each.add(element(next));
        }
        errors = ofTheWhole;
        return each;
    }

    private Object element(JsonToken token) {
        if (token != JsonToken.START_OBJECT) {
            String given = given(token);
            parser.skipChildren();
            return Problem.of(400, "No object", "a water must be a JSON object, got " + given);
        }
        errors = new ArrayList<>(0);
        WaterWish wish = water("", false);
        return errors.isEmpty() ? wish : problem();
    }

    private Problem problem() {
        return Problem.ofFields(
                400,
                "Wrong field",
                String.join("; ", errors.stream().map(FieldError::detail).toList()),
                errors);
    }

    private void requireEnd() {
        if (parser.nextToken() != null) {
            throw new ProblemException(400, "Broken JSON", "something follows after the end of the JSON object");
        }
    }

    /** From its START_OBJECT on to its end. */
    private WaterWish water(String path, boolean alone) {
        WaterWishBuilder wish = WaterWish.builder();
        while (parser.nextToken() == JsonToken.PROPERTY_NAME) {
            String name = parser.currentName();
            JsonToken token = parser.nextToken();
            switch (name) {
                case "temperatureC" -> wish.temperatureC(number(path, name, token));
                case "salinity" -> wish.salinity(number(path, name, token));
                case "conductivityMsCm" -> wish.conductivityMsCm(number(path, name, token));
                case "ph" -> wish.ph(number(path, name, token));
                case "totalAlkalinityUmolKg" -> wish.totalAlkalinityUmolKg(number(path, name, token));
                case "dicUmolKg" -> wish.dicUmolKg(number(path, name, token));
                case "pco2Uatm" -> wish.pco2Uatm(number(path, name, token));
                case "phScale" -> wish.phScale(string(path, name, token));
                case "phTemperatureC" -> wish.phTemperatureC(number(path, name, token));
                case "phosphateUmolKg" -> wish.phosphateUmolKg(number(path, name, token));
                case "silicateUmolKg" -> wish.silicateUmolKg(number(path, name, token));
                case "calciumMmolKg" -> wish.calciumMmolKg(number(path, name, token));
                case "constants" -> wish.constants(string(path, name, token));
                case "boron" -> wish.boron(string(path, name, token));
                case "warmToC" -> wish.warmToC(number(path, name, token));
                case "equilibrateToUatm" -> wish.equilibrateToUatm(number(path, name, token));
                case "ammoniaMgL" -> wish.ammoniaMgL(number(path, name, token));
                case "uncertainty" ->
                    wish.uncertainty(object(path, name, token) ? uncertainty(path + name + "/") : null);
                case "blendWith" -> wish.blendWith(object(path, name, token) ? blend(path + name + "/") : null);
                default -> {
                    if (alone && name.equals("withUncertainty")) {
                        withUncertainty(token, path);
                    } else {
                        unknown(path, name, token, alone ? FIELDS + ", withUncertainty" : FIELDS);
                    }
                }
            }
        }
        return wish.build();
    }

    private WaterWish.Uncertainty uncertainty(String path) {
        Double ph = null;
        Double alkalinity = null;
        Double dic = null;
        Double pco2 = null;
        Double temperature = null;
        Double salinity = null;
        Double conductivity = null;
        Double calcium = null;
        while (parser.nextToken() == JsonToken.PROPERTY_NAME) {
            String name = parser.currentName();
            JsonToken token = parser.nextToken();
            switch (name) {
                case "ph" -> ph = number(path, name, token);
                case "totalAlkalinityUmolKg" -> alkalinity = number(path, name, token);
                case "dicUmolKg" -> dic = number(path, name, token);
                case "pco2Uatm" -> pco2 = number(path, name, token);
                case "temperatureC" -> temperature = number(path, name, token);
                case "salinity" -> salinity = number(path, name, token);
                case "conductivityMsCm" -> conductivity = number(path, name, token);
                case "calciumMmolKg" -> calcium = number(path, name, token);
                default -> unknown(path, name, token, UNCERTAINTY_FIELDS);
            }
        }
        return new WaterWish.Uncertainty(ph, alkalinity, dic, pco2, temperature, salinity, conductivity, calcium);
    }

    private WaterWish.Blend blend(String path) {
        WaterWish water = null;
        Double share = null;
        while (parser.nextToken() == JsonToken.PROPERTY_NAME) {
            String name = parser.currentName();
            JsonToken token = parser.nextToken();
            switch (name) {
                case "water" -> water = object(path, name, token) ? water(path + name + "/", false) : null;
                case "massShare" -> share = number(path, name, token);
                default -> unknown(path, name, token, BLEND_FIELDS);
            }
        }
        return new WaterWish.Blend(water, share);
    }

    private @Nullable Double number(String path, String name, JsonToken token) {
        if (token.isNumeric()) {
            return parser.getDoubleValue();
        }
        if (token != JsonToken.VALUE_NULL) {
            wrong(path, name, token, "a number");
        }
        return null;
    }

    private @Nullable String string(String path, String name, JsonToken token) {
        if (token == JsonToken.VALUE_STRING) {
            return parser.getString();
        }
        if (token != JsonToken.VALUE_NULL) {
            wrong(path, name, token, "a string");
        }
        return null;
    }

    private boolean object(String path, String name, JsonToken token) {
        if (token != JsonToken.START_OBJECT && token != JsonToken.VALUE_NULL) {
            wrong(path, name, token, "a JSON object");
        }
        return token == JsonToken.START_OBJECT;
    }

    private void withUncertainty(JsonToken token, String path) {
        if (token == JsonToken.VALUE_TRUE || token == JsonToken.VALUE_FALSE) {
            withUncertainty = token == JsonToken.VALUE_TRUE;
        } else if (token != JsonToken.VALUE_NULL) {
            wrong(path, "withUncertainty", token, "true or false");
        }
    }

    private void wrong(String path, String name, JsonToken token, String wanted) {
        errors.add(new FieldError("/" + path + name, path + name + " " + given(token) + " must be " + wanted));
        parser.skipChildren();
    }

    private void unknown(String path, String name, JsonToken token, String accepted) {
        errors.add(new FieldError(
                "/" + path + JsonFaults.cut(name).replace("~", "~0").replace("/", "~1"),
                "field " + JsonFaults.quoted(path + name) + " is not known here; accepted: " + accepted));
        if (token.isStructStart()) {
            parser.skipChildren();
        }
    }

    private String given(JsonToken token) {
        return switch (token) {
            case START_ARRAY -> "[…]";
            case START_OBJECT -> "{…}";
            case VALUE_STRING -> JsonFaults.quoted(parser.getString());
            default -> JsonFaults.cut(String.valueOf(parser.getString()));
        };
    }
}
