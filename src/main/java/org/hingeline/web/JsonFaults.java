package org.hingeline.web;

import java.util.Collection;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.hingeline.web.Problem.FieldError;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;
import tools.jackson.core.TokenStreamLocation;
import tools.jackson.core.exc.StreamConstraintsException;
import tools.jackson.databind.DatabindException;
import tools.jackson.databind.exc.InvalidFormatException;
import tools.jackson.databind.exc.MismatchedInputException;
import tools.jackson.databind.exc.UnrecognizedPropertyException;

/**
 * What is wrong with a body, in our own words. The parser's messages name its classes and its switches, so only the part
 * of them that quotes the sender's text is passed on.
 */
final class JsonFaults {
    private static final int SHOWN = 60;

    private static final Pattern CHARACTER = Pattern.compile("Unexpected character \\('(.+?)' \\(code \\d+");
    private static final Pattern TOKEN = Pattern.compile("(?:Unrecognized|Non-standard) token '([^']*)'");
    private static final Pattern TWICE = Pattern.compile("Duplicate Object property \"(.*)\"");
    private static final Pattern GIVEN = Pattern.compile(" value \\([\"']?(.*?)[\"']?\\)");

    private JsonFaults() {}

    static Problem problem(JacksonException e) {
        if (e instanceof UnrecognizedPropertyException unknown) {
            String detail = "field " + quoted(unknown.getPropertyName()) + " is not known here" + accepted(unknown);
            return Problem.ofFields(
                    400, "Unknown field", detail + where(e), List.of(new FieldError(pointer(unknown), detail)));
        }
        if (e instanceof DatabindException wrong) {
            String path = pointer(wrong);
            String field = path.equals("/") ? "the body" : path.substring(1);
            String detail = field + given(wrong) + " must be " + wanted(wrong);
            return path.equals("/")
                    ? Problem.of(400, "No object", detail + where(e))
                    : Problem.ofFields(400, "Wrong field", detail + where(e), List.of(new FieldError(path, detail)));
        }
        return Problem.of(400, "Broken JSON", syntax(e) + where(e));
    }

    /** A text of the sender's, cut to what an error message can carry. */
    static String quoted(@Nullable String text) {
        return "\"" + cut(String.valueOf(text)) + "\"";
    }

    static String cut(String text) {
        return text.length() > SHOWN ? text.substring(0, SHOWN) + "…" : text;
    }

    private static String where(JacksonException e) {
        TokenStreamLocation at = e.getLocation();
        return at == null || at.getLineNr() < 1
                ? ""
                : " (line " + at.getLineNr() + ", column " + at.getColumnNr() + ")";
    }

    private static String accepted(UnrecognizedPropertyException e) {
        Collection<Object> known = e.getKnownPropertyIds();
        return known == null
                ? ""
                : "; accepted: " + known.stream().map(String::valueOf).sorted().collect(Collectors.joining(", "));
    }

    private static String wanted(DatabindException e) {
        Class<?> type = e instanceof MismatchedInputException mismatched ? mismatched.getTargetType() : null;
        if (type == null) {
            return "of another kind";
        }
        if (type == String.class) {
            return "a string";
        }
        if (type == Double.class) {
            return "a number";
        }
        if (type == Boolean.class) {
            return "true or false";
        }
        return type.isRecord() ? "a JSON object" : "of another kind";
    }

    /** What was given instead, with a space before it; empty when that is not known. */
    private static String given(DatabindException e) {
        if (!(e instanceof MismatchedInputException mismatched) || mismatched.getCurrentToken() == null) {
            return "";
        }
        Matcher quoted = GIVEN.matcher(e.getOriginalMessage());
        Object value = e instanceof InvalidFormatException invalid
                ? invalid.getValue()
                : quoted.find() ? quoted.group(1) : null;
        return switch (mismatched.getCurrentToken()) {
            case START_ARRAY -> " […]";
            case START_OBJECT -> " {…}";
            case VALUE_TRUE -> " true";
            case VALUE_FALSE -> " false";
            case VALUE_STRING -> value == null ? "" : " " + quoted(value.toString());
            case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> value == null ? "" : " " + cut(value.toString());
            default -> "";
        };
    }

    private static String syntax(JacksonException e) {
        if (e instanceof StreamConstraintsException) {
            return "the JSON is nested too deeply, or a number or a name in it is too long";
        }
        String message = e.getOriginalMessage();
        if (message.startsWith("Unexpected end-of-input")) {
            return "the JSON ends too early";
        }
        if (message.startsWith("Invalid UTF-8")) {
            return "the body is not UTF-8";
        }
        Matcher twice = TWICE.matcher(message);
        if (twice.find()) {
            return "field " + quoted(twice.group(1)) + " is there twice";
        }
        Matcher token = TOKEN.matcher(message);
        if (token.find()) {
            return cut(token.group(1)) + " is not JSON";
        }
        Matcher character = CHARACTER.matcher(message);
        return character.find() ? "the character " + character.group(1) + " does not belong there" : "it is not JSON";
    }

    private static String pointer(DatabindException e) {
        return e.getPath().stream()
                .map(step -> step.getPropertyName() != null
                        ? cut(step.getPropertyName()).replace("~", "~0").replace("/", "~1")
                        : String.valueOf(step.getIndex()))
                .collect(Collectors.joining("/", "/", ""));
    }
}
