package org.hingeline.web.view;

import java.util.Map;

/**
 * A form as it is shown: what stands in its fields and what is wrong with them. After a refused post, {@code values} are what
 * was typed, so that nobody types the same thing twice.
 *
 * @param values field name to what stands in it
 * @param errors field name to what is wrong with it; the empty name is for the form as a whole
 */
public record Form(Map<String, String> values, Map<String, String> errors) {
    public Form {
        values = Map.copyOf(values);
        errors = Map.copyOf(errors);
    }

    /** A form with nothing in it. */
    public static Form empty() {
        return new Form(Map.of(), Map.of());
    }

    /** A form filled in, nothing wrong with it. */
    public static Form of(Map<String, String> values) {
        return new Form(values, Map.of());
    }

    /** What stands in the field, empty if nothing. */
    public String value(String field) {
        return values.getOrDefault(field, "");
    }

    /** What is wrong with the field, empty if nothing. */
    public String error(String field) {
        return errors.getOrDefault(field, "");
    }

    /** Whether anything is wrong. */
    public boolean refused() {
        return !errors.isEmpty();
    }
}
