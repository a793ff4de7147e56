package org.hingeline.web;

import java.time.ZoneId;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.WaterState;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.seawater.PhScale;
import org.hingeline.web.view.CalculatorFields;
import org.hingeline.web.view.CalculatorView.Origin;
import org.hingeline.web.view.CalculatorView.Source;
import org.hingeline.web.view.Moment;
import org.jspecify.annotations.Nullable;

/** The water state of a point as the calculator takes it up: its inputs as a filled-in form, and where each came from. */
final class CalculatorSource {
    private static final Map<Quantity, String> FIELDS = fields();

    private final PointStatus point;
    private final WaterState state;
    private final Map<String, Sensor> sensors;

    CalculatorSource(PointStatus point, WaterState state, List<Sensor> sensors) {
        this.point = point;
        this.state = state;
        this.sensors = sensors.stream().collect(Collectors.toMap(Sensor::code, Function.identity()));
    }

    private static Map<Quantity, String> fields() {
        Map<Quantity, String> fields = new LinkedHashMap<>();
        fields.put(Quantity.PH, "ph");
        fields.put(Quantity.TEMPERATURE, "temp");
        fields.put(Quantity.SALINITY, "salt");
        fields.put(Quantity.TOTAL_ALKALINITY, "ta");
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
        for (InputUsed input : state.inputs()) {
            String field = FIELDS.get(input.quantity());
            if (field == null) {
                continue;
            }
            form.put(field, Rounded.typed(input.value()));
            if (input.quantity() == Quantity.PH) {
                form.put("phUnit", scale(input).wireName());
            }
            Sensor sensor = sensors.get(input.sensor());
            if (sensor != null) {
                form.put(field + "Pm", Rounded.typed(sensor.standardUncertainty()));
            }
        }
        limit().ifPresent(limit -> form.put("limit", Rounded.typed(limit.threshold())));
        return form;
    }

    private Optional<Limit> limit() {
        return point.watching().stream()
                .filter(limit -> limit.quantity() == Quantity.OMEGA_ARAGONITE && limit.side() == Side.BELOW)
                .max(Comparator.comparingDouble(Limit::threshold));
    }

    private PhScale scale(InputUsed input) {
        Sensor sensor = sensors.get(input.sensor());
        PhScale scale = sensor == null ? null : sensor.phScale();
        return scale == null ? PhScale.TOTAL : scale;
    }

    /** @param typed what a person has made of it; null when it is shown as it was */
    Source shown(@Nullable Map<String, String> typed, ZoneId zone) {
        return new Source(
                point.point().code(),
                point.point().name(),
                Moment.of(state.at(), point.now(), zone),
                state.inputs().stream().map(input -> origin(input, zone)).toList(),
                state.missing().stream()
                        .map(missing -> Words.missing(missing, state.at()))
                        .toList(),
                state.cautions().stream()
                        .map(Note::detail)
                        .map(CalculatorResult::whole)
                        .toList(),
                typed == null ? "" : changed(typed),
                Optional.ofNullable(state.numbers())
                        .map(numbers -> Rounded.of(numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty(), 2))
                        .map(omega -> omega.value() + " \u00b1" + omega.plusMinus())
                        .orElse(""));
    }

    private Origin origin(InputUsed input, ZoneId zone) {
        Sensor sensor = sensors.get(input.sensor());
        return new Origin(
                input.quantity().words(),
                Rounded.typed(input.value()),
                sensor == null ? "" : Rounded.typed(sensor.standardUncertainty()),
                input.quantity() == Quantity.PH
                        ? CalculatorFields.scaleLabel(scale(input))
                        : input.quantity().unit().symbol(),
                input.origin() + " " + input.sensor() + (sensor == null ? " (not registered any more)" : ""),
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
            boolean same = List.of(field, field + "Unit", field + "Pm").stream()
                    .allMatch(name -> was.getOrDefault(name, "")
                            .equals(typed.getOrDefault(name, was.getOrDefault(name, ""))
                                    .strip()));
            if (!same) {
                changed.add(quantity.words());
            }
        });
        for (String other : List.of("phTemp", "phosphate", "silicate", "calcium")) {
            if (!typed.getOrDefault(other, "").isBlank()) {
                changed.add(other.equals("phTemp") ? "where pH was read" : other);
            }
        }
        if (!typed.getOrDefault("constants", "lueker2000").equals("lueker2000")
                || !typed.getOrDefault("boron", "lee2010").equals("lee2010")) {
            changed.add("the constants");
        }
        return changed.isEmpty() ? "" : "You changed " + listed(changed) + ".";
    }

    private static String listed(List<String> words) {
        int last = words.size() - 1;
        return last == 0 ? words.get(0) : String.join(", ", words.subList(0, last)) + " and " + words.get(last);
    }
}
