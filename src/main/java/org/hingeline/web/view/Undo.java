package org.hingeline.web.view;

import java.util.Map;

/**
 * A change that can be put back by one button, which posts {@code values} to the limit of that name.
 *
 * @param sentence what was done: "Limit “first shell” was removed."
 * @param limitName the limit the old values belong to
 * @param values the old values, fields as in {@link LimitRow#form}
 */
public record Undo(String sentence, String limitName, Map<String, String> values) {
    public Undo {
        values = Map.copyOf(values);
    }
}
