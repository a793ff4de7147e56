package org.hingeline.web.view;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The setup page.
 *
 * @param sections points, sensors, keys, tokens, people, subscribers; {@link SetupSections} makes them
 * @param shownOnce a secret just made, shown this one time; null for none
 */
public record SetupView(List<Section> sections, @Nullable ShownOnce shownOnce) {

    /** A secret shown once: the section it was made in, what it is ("Gateway key “pump house”") and itself. */
    public record ShownOnce(String section, String what, String secret) {}

    /**
     * A list with a form to add to it.
     *
     * @param id anchor of the section and last part of its path: the form posts to {@code /setup/{id}}
     * @param title heading
     * @param explanation what this is, in a sentence
     * @param rows what there is
     * @param fields the form's fields
     * @param button what the form's button says
     * @param form what stands in the fields and what is wrong
     */
    public record Section(
            String id, String title, String explanation, List<Row> rows, List<Field> fields, String button, Form form) {
        public Section {
            rows = List.copyOf(rows);
            fields = List.copyOf(fields);
        }
    }

    /**
     * One thing set up.
     *
     * @param name what it is called
     * @param detail the rest in words
     * @param key its key in {@code POST /setup/{section}/{key}/removal}; empty when it cannot be removed here
     * @param removal what the removing button says: "Withdraw"; empty when it cannot be removed here
     */
    public record Row(String name, String detail, String key, String removal) {}

    /** A field of a form: type is text, number, password, email, time or select; with choices for a select. */
    public record Field(String name, String label, String type, String hint, boolean required, List<Choice> choices) {
        public Field {
            choices = List.copyOf(choices);
        }
    }

    public SetupView {
        sections = List.copyOf(sections);
    }
}
