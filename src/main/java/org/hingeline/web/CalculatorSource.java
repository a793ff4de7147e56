package org.hingeline.web;

import java.time.ZoneId;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterWish;
import org.hingeline.seawater.PhScale;
import org.hingeline.web.view.CalculatorFields;
import org.hingeline.web.view.CalculatorView.Origin;
import org.hingeline.web.view.CalculatorView.Source;
import org.hingeline.web.view.Moment;
import org.jspecify.annotations.Nullable;

/** The water state of a point as the calculator takes it up: its inputs as a filled-in form, and where each came from. */
final class CalculatorSource {
    private static final Map<Quantity, String> FIELDS = fields();

    private static final double WORTH_A_WORD = 1e-3;

    private final PointStatus point;
    private final WaterState state;
    private final WaterWish wish;
    private final List<InputUsed> orphans;

    /**
     * @param wish what gives the state again
     * @param orphans inputs whose sensors are not registered any more
     */
    CalculatorSource(PointStatus point, WaterState state, WaterWish wish, List<InputUsed> orphans) {
        this.point = point;
        this.state = state;
        this.wish = wish;
        this.orphans = List.copyOf(orphans);
    }

    private static Map<Quantity, String> fields() {
        Map<Quantity, String> fields = new LinkedHashMap<>();
        fields.put(Quantity.PH, "ph");
        fields.put(Quantity.TEMPERATURE, "temp");
        fields.put(Quantity.SALINITY, "salt");
        fields.put(Quantity.TOTAL_ALKALINITY, "ta");
        fields.put(Quantity.CALCIUM, "calcium");
        return fields;
    }

    /** Whether it holds all that a water needs. */
    boolean complete() {
        return state.missing().isEmpty();
    }

    /** The form with the state's inputs, their registered uncertainties and scale, and the point's limit. */
    Map<String, String> form() {
        Map<String, String> form = new LinkedHashMap<>();
        form.put("pair", "ph-ta");
        state.inputs().forEach(input -> put(form, FIELDS.get(input.quantity()), input.value()));
        form.put("phUnit", scale().wireName());
        FIELDS.forEach((quantity, field) -> {
            Double plusMinus = plusMinus(quantity);
            put(form, field + "Pm", plusMinus == null ? null : Rounded.typedPlusMinus(plusMinus));
        });
        put(form, "constants", wish.constants());
        put(form, "boron", wish.boron());
        limit().ifPresent(limit -> form.put("limit", Rounded.typed(limit.threshold())));
        return form;
    }

    private static void put(Map<String, String> form, @Nullable String field, @Nullable Object value) {
        if (field != null && value != null) {
            form.put(field, value instanceof Double number ? Rounded.typed(number) : value.toString());
        }
    }

    /** As it counts in the state. */
    private @Nullable Double plusMinus(Quantity quantity) {
        WaterWish.Uncertainty u = wish.uncertainty();
        if (u == null) {
            return null;
        }
        return switch (quantity) {
            case PH -> u.ph();
            case TEMPERATURE -> u.temperatureC();
            case SALINITY -> u.salinity();
            case TOTAL_ALKALINITY -> u.totalAlkalinityUmolKg();
            case CALCIUM -> u.calciumMmolKg();
            default -> null;
        };
    }

    private PhScale scale() {
        String name = wish.phScale();
        return name == null ? PhScale.TOTAL : PhScale.fromWireName(name).orElse(PhScale.TOTAL);
    }

    private Optional<Limit> limit() {
        return point.watching().stream()
                .filter(limit -> limit.quantity() == Quantity.OMEGA_ARAGONITE && limit.side() == Side.BELOW)
                .max(Comparator.comparingDouble(Limit::threshold));
    }

    /**
     * The account of it.
     *
     * @param typed what a person has made of it; null when it is shown as it was
     * @param omega what was worked out just now; null when nothing was
     */
    Source shown(@Nullable Map<String, String> typed, @Nullable Double omega, ZoneId zone) {
        return new Source(
                point.point().code(),
                point.point().name(),
                Moment.of(state.at(), point.now(), zone),
                state.inputs().stream().map(input -> origin(input, zone)).toList(),
                state.missing().stream()
                        .map(missing -> Words.missing(missing, state.at()))
                        .toList(),
                notes(typed == null ? omega : null),
                typed == null ? "" : changed(typed),
                Optional.ofNullable(state.numbers())
                        .map(numbers -> Rounded.of(numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty(), 2))
                        .map(was -> was.value() + " \u00b1" + was.plusMinus())
                        .orElse(""));
    }

    /** Those of the state, and that it would come out otherwise today. */
    private List<String> notes(@Nullable Double omega) {
        List<String> notes = new ArrayList<>();
        state.cautions().forEach(note -> notes.add(CalculatorResult.whole(note.detail())));
        WaterNumbers stored = state.numbers();
        if (omega != null && stored != null && Math.abs(omega / stored.omegaAragonite() - 1) > WORTH_A_WORD) {
            notes.add("At the time \u03a9 " + Words.number(stored.omegaAragonite(), 3)
                    + " was computed; with the sensors as"
                    + " they are registered and the constants as they are chosen now it is " + Words.number(omega, 3)
                    + ".");
        }
        return notes;
    }

    private Origin origin(InputUsed input, ZoneId zone) {
        Double plusMinus = plusMinus(input.quantity());
        return new Origin(
                input.quantity().words(),
                Rounded.typed(input.value()),
                plusMinus == null ? "" : Rounded.typedShort(plusMinus),
                input.quantity() == Quantity.PH
                        ? CalculatorFields.scaleLabel(scale())
                        : input.quantity().unit().symbol(),
                input.source() + (orphans.contains(input) ? " (not registered any more)" : ""),
                Moment.of(input.at(), point.now(), zone),
                input.age(state.at()).toSeconds() < 60
                        ? "fresh then"
                        : Moment.span(input.age(state.at())) + " old then",
                PointPages.flag(input.flag()));
    }

    private String changed(Map<String, String> typed) {
        Map<String, String> was = new LinkedHashMap<>(CalculatorForm.defaults());
        was.putAll(form());
        List<String> changed = new ArrayList<>();
        if (!typed.getOrDefault("pair", "ph-ta").equals("ph-ta")) {
            changed.add("the pair");
        }
        FIELDS.forEach((quantity, field) -> {
            boolean same = Stream.of(field, field + "Unit", field + "Pm").noneMatch(name -> differs(typed, was, name));
            if (!same) {
                changed.add(quantity.words());
            }
        });
        for (String other : List.of("phTemp", "phosphate", "silicate")) {
            if (!typed.getOrDefault(other, "").isBlank()) {
                changed.add(other.equals("phTemp") ? "where pH was read" : other);
            }
        }
        if (differs(typed, was, "constants") || differs(typed, was, "boron")) {
            changed.add("the constants");
        }
        return changed.isEmpty() ? "" : "You changed " + listed(changed) + ".";
    }

    private static boolean differs(Map<String, String> typed, Map<String, String> was, String field) {
        String before = was.getOrDefault(field, "");
        return !typed.getOrDefault(field, before).strip().equals(before);
    }

    private static String listed(List<String> words) {
        int last = words.size() - 1;
        return last == 0 ? words.get(0) : String.join(", ", words.subList(0, last)) + " and " + words.get(last);
    }
}
