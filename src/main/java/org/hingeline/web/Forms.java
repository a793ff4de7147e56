package org.hingeline.web;

import io.javalin.http.Context;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.web.view.Form;
import org.jspecify.annotations.Nullable;

/** Reading forms, and showing them again with what is wrong. */
final class Forms {
    /** Never sent back to the browser. */
    private static final Set<String> SECRET = Set.of("csrf", "password");

    private Forms() {}

    /** The field's text without blanks around it, empty when absent. */
    static String text(Context ctx, String field) {
        String text = ctx.formParam(field);
        return text == null ? "" : text.strip();
    }

    /** The field's number, absent when empty; a comma is taken for the decimal point, as half the world types it. */
    static @Nullable Double number(Context ctx, String field, FieldFaults faults) {
        String text = text(ctx, field);
        if (text.isEmpty()) {
            return null;
        }
        try {
            double value = Double.parseDouble(text.replace(',', '.').replace('\u2212', '-'));
            if (Double.isFinite(value)) {
                return value;
            }
        } catch (NumberFormatException e) {
            // told below
        }
        faults.add(field, "\u201c" + text + "\u201d is not a number");
        return null;
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
                                FieldFaults.Fault::field, FieldFaults.Fault::detail, (a, b) -> a + "; " + b)));
    }
}
