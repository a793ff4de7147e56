package org.hingeline.web;

import io.javalin.http.Context;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.web.view.Form;
import org.jspecify.annotations.Nullable;

/** Reading forms, and showing them again with what is wrong. */
final class Forms {
    /** Never sent back to the browser. */
    private static final Set<String> SECRET = Set.of("csrf", "password");

    private static final Pattern FIELD_NAME = Pattern.compile(
            "^(?:(?:point|sensor|subscriber) )?(?:[a-zA-Z]+/)*([a-z][a-zA-Z]*) (?=\"|\u2212|-?\\d|is |must )");
    private static final Pattern DECIMAL = Pattern.compile("(?<![\\w.])-?\\d+\\.\\d+(?:E\\d+)?(?![\\w.]\\d)");

    private Forms() {}

    /** The field's text without blanks around it, empty when absent. */
    static String text(Context ctx, String field) {
        String text = ctx.formParam(field);
        return text == null ? "" : text.strip();
    }

    /** The field's number as {@link Typed} reads it, absent when empty. */
    static @Nullable Double number(Context ctx, String field, FieldFaults faults) {
        String text = text(ctx, field);
        if (text.isEmpty()) {
            return null;
        }
        Double number = Typed.parsed(text);
        if (number == null) {
            faults.add(field, Typed.refusal(text));
        }
        return number;
    }

    /** The form as it was sent, each fault beside its field. */
    static Form refused(Context ctx, FieldFaultsException e) {
        Map<String, String> values = new LinkedHashMap<>();
        ctx.formParamMap().forEach((field, sent) -> {
            if (!SECRET.contains(field) && !sent.isEmpty()) {
                values.put(field, sent.get(0));
            }
        });
        return new Form(
                values,
                e.faults().stream()
                        .collect(Collectors.toMap(
                                FieldFaults.Fault::field, fault -> plainly(fault.detail()), (a, b) -> a + "; " + b)));
    }

    /** A refusal that begins with the name of a field of this form, told beside that field; else of the form as a whole. */
    static FieldFaultsException ofField(Context ctx, IllegalArgumentException e) {
        String detail = String.valueOf(e.getMessage());
        Matcher name = FIELD_NAME.matcher(detail);
        String field = name.find() && ctx.formParam(name.group(1)) != null ? name.group(1) : "";
        return new FieldFaultsException(field, detail);
    }

    /** Beside its field a sentence needs no field name, and nobody writes 5.0 for 5. */
    static String plainly(String detail) {
        String rest = FIELD_NAME.matcher(detail).replaceFirst("");
        boolean verb = !rest.equals(detail) && rest.matches("(?s)(?:is|must) .*");
        String quoted = (verb ? "it " + rest : rest).replaceAll("\"([^\"]*)\"", "\u201c$1\u201d");
        return DECIMAL.matcher(quoted).replaceAll(number -> Words.plain(Double.parseDouble(number.group())));
    }
}
