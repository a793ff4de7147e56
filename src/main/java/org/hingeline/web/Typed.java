package org.hingeline.web;

import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;
import org.hingeline.monitor.FieldFaults;
import org.jspecify.annotations.Nullable;

/** What was typed into a form's fields, and what is wrong with it. */
final class Typed {
    private static final Pattern AMBIGUOUS = Pattern.compile("[-+]?[1-9]\\d{0,2}(?:,\\d{3})+(?:[eE][-+]?\\d{1,3})?");

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
            String refusal = refusal(text(field));
            fault(field, ambiguous(plain(text(field))) ? refusal : refusal + "; " + example + " would be");
        }
        return number;
    }

    /** Told once, however often it is found. */
    void fault(String field, String detail) {
        if (told.add(field + " " + detail)) {
            faults.add(field, detail);
        }
    }

    /**
     * The number a person typed; absent when it is none. A comma is taken for the decimal point, as half the world types it,
     * and a space between thousands is no harm; but "2,350" may be meant either way and is not taken.
     */
    static @Nullable Double parsed(String text) {
        String spaceless = plain(text);
        if (ambiguous(spaceless)) {
            return null;
        }
        String plain = spaceless.replace(',', '.');
        if (!plain.matches("[-+]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][-+]?\\d{1,3})?")) {
            return null;
        }
        double value = Double.parseDouble(plain);
        return Double.isFinite(value) ? (Double) value : null;
    }

    /** Why a text is not taken for a number. */
    static String refusal(String text) {
        String plain = plain(text);
        if (!ambiguous(plain)) {
            return "\u201c" + text + "\u201d is not a number";
        }
        String whole = plain.replace(",", "");
        String told = "\u201c" + text + "\u201d can be read in two ways; write " + whole;
        return plain.indexOf(',') == plain.lastIndexOf(',') ? told + " or " + plain.replace(',', '.') : told;
    }

    private static String plain(String text) {
        return text.replaceAll("[\\s\u00a0\u202f]", "").replace('\u2212', '-');
    }

    /** Thousands set apart by commas, or three decimals behind one; a leading 0 leaves only the latter. */
    private static boolean ambiguous(String plain) {
        return AMBIGUOUS.matcher(plain).matches();
    }
}
