package org.hingeline.web;

import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.hingeline.monitor.FieldFaults;
import org.jspecify.annotations.Nullable;

/** What was typed into a form's fields, and what is wrong with it. */
final class Typed {
    private final Map<String, String> values;
    private final FieldFaults faults;
    private final Set<String> told = new HashSet<>();

    Typed(Map<String, String> values, FieldFaults faults) {
        this.values = Map.copyOf(values);
        this.faults = faults;
    }

    /** Without blanks around it, empty when absent. */
    String text(String field) {
        return values.getOrDefault(field, "").strip();
    }

    boolean empty(String field) {
        return text(field).isEmpty();
    }

    /** The number in a field; absent when empty, or when it is none, which is told. */
    @Nullable
    Double number(String field, String example) {
        if (empty(field)) {
            return null;
        }
        Double number = parsed(text(field));
        if (number == null) {
            fault(field, "\u201c" + text(field) + "\u201d is not a number; " + example + " would be");
        }
        return number;
    }

    /** Told once, however often it is found. */
    void fault(String field, String detail) {
        if (told.add(field + " " + detail)) {
            faults.add(field, detail);
        }
    }

    /** A comma is taken for the decimal point, as half the world types it, and a space between thousands is no harm. */
    static @Nullable Double parsed(String text) {
        String plain =
                text.replaceAll("[\\s\u00a0\u202f]", "").replace(',', '.').replace('\u2212', '-');
        if (!plain.matches("[-+]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][-+]?\\d{1,3})?")) {
            return null;
        }
        double value = Double.parseDouble(plain);
        return Double.isFinite(value) ? (Double) value : null;
    }
}
