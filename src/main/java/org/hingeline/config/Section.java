package org.hingeline.config;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.function.DoublePredicate;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;

/** One level of the settings, read key by key; what is wrong is noted and the default stands in, so that all is seen. */
final class Section {
    private final String path;
    private final @Nullable JsonNode node;
    private final List<String> problems;
    private final Set<String> known = new LinkedHashSet<>();

    private Section(String path, @Nullable JsonNode node, List<String> problems) {
        this.path = path;
        this.node = node;
        this.problems = problems;
    }

    static Section root(JsonNode document, List<String> problems) {
        return new Section("", mapping("the file", document, problems), problems);
    }

    Section section(String key) {
        JsonNode child = value(key);
        return new Section(at(key) + ".", child == null ? null : mapping(at(key), child, problems), problems);
    }

    /** The entries of a list, each a section of its own; none when the key is absent. */
    List<Section> entries(String key) {
        JsonNode value = value(key);
        if (value == null) {
            return List.of();
        }
        if (!value.isArray()) {
            bad(key, value, "a list, one \"- \" an entry");
            return List.of();
        }
        List<Section> entries = new ArrayList<>();
        for (int i = 0; i < value.size(); i++) {
            String where = at(key) + "[" + i + "]";
            entries.add(new Section(where + ".", mapping(where, value.get(i), problems), problems));
        }
        return entries;
    }

    int whole(String key, int standard, int least, int most) {
        JsonNode value = value(key);
        return value == null ? standard : whole(at(key), value, standard, least, most);
    }

    List<Integer> wholes(String key, List<Integer> standard, int least, int most) {
        JsonNode value = value(key);
        if (value == null) {
            return standard;
        }
        if (!value.isArray() || value.isEmpty()) {
            bad(key, value, "a list of one or more whole numbers");
            return standard;
        }
        List<Integer> numbers = new ArrayList<>();
        for (int i = 0; i < value.size(); i++) {
            numbers.add(whole(at(key) + "[" + i + "]", value.get(i), least, least, most));
        }
        return numbers;
    }

    double number(String key, double standard, double least, double most) {
        JsonNode value = value(key);
        if (value == null) {
            return standard;
        }
        // a number as NaN or infinity is no number here
        if (value.isNumber() && value.asDouble() >= least && value.asDouble() <= most) {
            return value.asDouble();
        }
        bad(key, value, "a number from " + plain(least) + " to " + plain(most));
        return standard;
    }

    /** @return nothing when the key is absent, or what it holds is no number above least and up to most */
    @Nullable
    Double numberAbove(String key, double least, double most) {
        return number(
                key,
                number -> number > least && number <= most,
                "a number above " + plain(least) + ", at most " + plain(most));
    }

    /** @return nothing when the key is absent, or what it holds is no number from least to most */
    @Nullable
    Double numberWithin(String key, double least, double most) {
        return number(
                key,
                number -> number >= least && number <= most,
                "a number from " + plain(least) + " to " + plain(most));
    }

    /** @return nothing when the key is absent, or what it holds is no finite number */
    @Nullable
    Double number(String key) {
        return number(key, Double::isFinite, "a number");
    }

    private @Nullable Double number(String key, DoublePredicate accepts, String accepted) {
        JsonNode value = value(key);
        if (value == null) {
            return null;
        }
        if (value.isNumber() && accepts.test(value.asDouble())) {
            return value.asDouble();
        }
        bad(key, value, accepted);
        return null;
    }

    /**
     * A text that something else can be made of.
     *
     * @param make empty when it cannot
     * @return nothing when the key is absent, or what it holds will not do
     */
    <T> @Nullable T made(String key, Function<String, Optional<T>> make, String accepted) {
        String text = text(key);
        if (text == null) {
            return null;
        }
        Optional<T> made = make.apply(text);
        if (made.isEmpty()) {
            problem(key, "\"" + text + "\" is not accepted; give " + accepted);
        }
        return made.orElse(null);
    }

    /** As {@link #made}, and a problem when the key is absent. */
    <T> @Nullable T needed(String key, Function<String, Optional<T>> make, String accepted) {
        if (value(key) == null) {
            missing(key, accepted);
            return null;
        }
        return made(key, make, accepted);
    }

    /** Notes that a key is needed; not when nothing here can be read, which was noted already. */
    void missing(String key, String accepted) {
        if (node != null) {
            problem(key, "is missing; give " + accepted);
        }
    }

    /** Whether something was found wrong with the key already. */
    boolean complainedOf(String key) {
        return problems.stream().anyMatch(problem -> problem.startsWith(at(key) + ": "));
    }

    /** Whether the key holds just this text. */
    boolean holds(String key, String text) {
        JsonNode value = value(key);
        return value != null && value.isString() && value.asString().strip().equals(text);
    }

    boolean has(String key) {
        return value(key) != null;
    }

    String text(String key, String standard) {
        String given = text(key);
        return given == null ? standard : given;
    }

    /** @return nothing when the key is absent, or is there without a value */
    @Nullable
    String text(String key) {
        JsonNode value = value(key);
        if (value == null) {
            return null;
        }
        if (!value.isString()
                || value.asString().isBlank()
                || value.asString().length() > 500
                || value.asString().chars().anyMatch(Character::isISOControl)) {
            bad(key, value, "a text of 1 to 500 characters on one line");
            return null;
        }
        return value.asString().strip();
    }

    <E extends Enum<E>> E choice(String key, E standard) {
        return named(key, standard, standard.getDeclaringClass().getEnumConstants(), Section::word);
    }

    /** One of several, each by its name. */
    <E> E named(String key, E standard, E[] all, Function<E, String> name) {
        JsonNode value = value(key);
        if (value == null) {
            return standard;
        }
        if (value.isString()) {
            for (E one : all) {
                if (name.apply(one).equals(value.asString())) {
                    return one;
                }
            }
        }
        bad(key, value, Arrays.stream(all).map(name).collect(Collectors.joining(" or ")));
        return standard;
    }

    /** Notes a problem that needs more than one setting to see. */
    void problem(String key, String what) {
        problems.add(at(key) + ": " + what);
    }

    void bad(String key, JsonNode value, String accepted) {
        problems.add(complaint(at(key), value, accepted));
    }

    /** To be called when every key has been asked for. What a stray key holds is not repeated: it may be a secret. */
    void refuseOthers() {
        if (node == null) {
            return;
        }
        node.propertyNames().stream()
                .filter(key -> !known.contains(key))
                .forEach(key -> problem(key, "no such setting; known here: " + String.join(", ", known)));
    }

    private @Nullable JsonNode value(String key) {
        known.add(key);
        JsonNode value = node == null ? null : node.get(key);
        return value == null || value.isNull() ? null : value;
    }

    private String at(String key) {
        return path + key;
    }

    private int whole(String where, JsonNode value, int standard, int least, int most) {
        if (value.isIntegralNumber() && value.canConvertToInt() && value.asInt() >= least && value.asInt() <= most) {
            return value.asInt();
        }
        problems.add(complaint(where, value, "a whole number from " + least + " to " + most));
        return standard;
    }

    private static @Nullable JsonNode mapping(String where, JsonNode node, List<String> problems) {
        if (node.isObject()) {
            return node;
        }
        problems.add(complaint(where, node, "settings, one \"key: value\" a line"));
        return null;
    }

    private static String complaint(String where, JsonNode value, String accepted) {
        String shown = value.toString();
        return where + ": " + (shown.length() > 80 ? shown.substring(0, 80) + "\u2026" : shown)
                + " is not accepted; give " + accepted;
    }

    private static String word(Enum<?> choice) {
        return choice.name().toLowerCase(Locale.ROOT);
    }

    private static String plain(double number) {
        return number == Math.rint(number) ? Long.toString((long) number) : Double.toString(number);
    }
}
