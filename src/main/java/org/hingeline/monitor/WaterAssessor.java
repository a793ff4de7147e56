package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.PhScale;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.seawater.Uncertainty;
import org.jspecify.annotations.Nullable;

/** From the freshest inputs at a moment to the water state, with the account of what was used and what was missing. */
final class WaterAssessor {
    private final WaterRules rules;
    private final InputChoice choice;

    WaterAssessor(WaterRules rules) {
        this.rules = rules;
        this.choice = new InputChoice(rules.ageLimits());
    }

    WaterState assess(long pointId, Instant at, PointInputs inputs) {
        Map<String, Sensor> sensors = new HashMap<>();
        List<InputUsed> used = new ArrayList<>(AgeLimits.NEEDED.size());
        List<MissingInput> missing = new ArrayList<>();
        List<Note> notes = new ArrayList<>();
        for (Quantity quantity : AgeLimits.NEEDED) {
            InputChoice.Picked picked = choice.pick(quantity, at, inputs);
            notes.addAll(picked.notes());
            InputUsed input = picked.used();
            Sensor sensor = picked.sensor();
            if (input != null && sensor != null) {
                used.add(input);
                sensors.put(sensor.code(), sensor);
            } else {
                missing.add(new MissingInput(
                        quantity, picked.newestAt(), rules.ageLimits().of(quantity)));
            }
        }
        if (!missing.isEmpty()) {
            return new WaterState(pointId, at, used, missing, null, notes);
        }
        InputChoice.Picked calcium = choice.pick(Quantity.CALCIUM, at, inputs);
        InputUsed measured = calcium.used();
        Sensor calciumSensor = calcium.sensor();
        if (measured != null && calciumSensor != null) {
            used.add(measured);
            sensors.put(calciumSensor.code(), calciumSensor);
        }
        return compute(new WaterState(pointId, at, used, List.of(), null, notes), sensors);
    }

    /** How far back a state looks: twice the allowed age, so that it can say how old a value it did not use was. */
    static Duration remembered(Duration allowedAge) {
        return allowedAge.multipliedBy(2);
    }

    private WaterState compute(WaterState bare, Map<String, Sensor> sensors) {
        Inputs inputs = Inputs.of(bare, sensors);
        List<Note> cautions = new ArrayList<>(bare.cautions());
        if (bare.suspect()) {
            cautions.add(
                    new Note("suspect-input", "an input is marked suspect, and so is everything computed from it"));
        }
        CarbonateResult result = inputs.solve(rules);
        if (result instanceof Unsolvable refusal) {
            cautions.add(new Note(refusal.reason().code(), refusal.detail()));
            return new WaterState(bare.pointId(), bare.at(), bare.inputs(), List.of(), null, cautions);
        }
        CarbonateState state = ((Solved) result).state();
        state.cautions().forEach(caution -> cautions.add(new Note(caution.code(), caution.detail())));
        StateUncertainty uncertainty = Uncertainty.of(state, inputs.uncertainty());
        return new WaterState(
                bare.pointId(), bare.at(), bare.inputs(), List.of(), numbers(state, uncertainty), cautions);
    }

    /** The inputs of a complete state with what is known of their sensors. */
    record Inputs(
            double ph,
            PhScale scale,
            double temperatureC,
            double salinity,
            double totalAlkalinityUmolKg,
            @Nullable Double calciumMmolKg,
            InputUncertainty uncertainty) {

        /** The sensors of a point, by the code that a state names them by. */
        static Map<String, Sensor> sensors(Books books, long pointId) {
            return books.place().sensorsOf(pointId).stream()
                    .collect(Collectors.toMap(Sensor::code, Function.identity()));
        }

        /** @throws IllegalStateException when the state lacks an input */
        static Inputs of(WaterState state, Map<String, Sensor> sensors) {
            InputUsed ph = input(state, Quantity.PH);
            InputUsed temperature = input(state, Quantity.TEMPERATURE);
            InputUsed salinity = input(state, Quantity.SALINITY);
            InputUsed alkalinity = input(state, Quantity.TOTAL_ALKALINITY);
            PhScale scale = sensor(ph, sensors).phScale();
            if (scale == null) {
                throw new IllegalStateException("pH sensor " + ph.sensor() + " has no scale");
            }
            Optional<InputUsed> calcium = found(state, Quantity.CALCIUM);
            double ofSalinity = sensor(salinity, sensors).standardUncertainty();
            boolean read = !salinity.origin().equals(InputUsed.FROM_CONDUCTIVITY);
            InputUncertainty uncertainty = InputUncertainty.ofPhAndAlkalinity(
                            sensor(ph, sensors).standardUncertainty(),
                            sensor(alkalinity, sensors).standardUncertainty() * 1e-6,
                            sensor(temperature, sensors).standardUncertainty(),
                            read ? ofSalinity : InputUncertainty.DEFAULTS.salinity())
                    .withCalcium(calcium.map(c -> sensor(c, sensors).standardUncertainty() * 1e-3)
                            .orElse(0.0));
            return new Inputs(
                    ph.value(),
                    scale,
                    temperature.value(),
                    salinity.value(),
                    alkalinity.value(),
                    calcium.map(InputUsed::value).orElse(null),
                    read
                            ? uncertainty
                            : withConductivity(uncertainty, salinity.value(), temperature.value(), ofSalinity));
        }

        /**
         * A salinity from conductivity moves with the thermometer too. The slopes are taken at the temperature of the
         * state: between that and the temperature of the conductivity they hardly differ.
         */
        private static InputUncertainty withConductivity(
                InputUncertainty u, double salinity, double temperatureC, double ofConductivity) {
            return ConductivitySalinity.conductivity(salinity, temperatureC) instanceof Figure.Known conductivity
                            && ConductivitySalinity.salinity(conductivity.value(), temperatureC) instanceof Figure.Known
                    ? u.withSalinityFrom(
                            ofConductivity, ConductivitySalinity.slopes(conductivity.value(), temperatureC))
                    : u;
        }

        CarbonateResult solve(WaterRules rules) {
            return CarbonateSystem.solve(
                    rules.conditions(temperatureC, salinity, calciumMmolKg),
                    new KnownPair.PhAndAlkalinity(ph, scale, totalAlkalinityUmolKg * 1e-6));
        }

        private static InputUsed input(WaterState state, Quantity quantity) {
            return found(state, quantity)
                    .orElseThrow(() -> new IllegalStateException(quantity.code() + " is not among the inputs"));
        }

        private static Optional<InputUsed> found(WaterState state, Quantity quantity) {
            return state.inputs().stream()
                    .filter(input -> input.quantity() == quantity)
                    .findFirst();
        }

        private static Sensor sensor(InputUsed input, Map<String, Sensor> sensors) {
            Sensor sensor = sensors.get(input.sensor());
            if (sensor == null) {
                throw new IllegalStateException("sensor " + input.sensor() + " is not registered any more");
            }
            return sensor;
        }
    }

    private static WaterNumbers numbers(CarbonateState state, StateUncertainty uncertainty) {
        return new WaterNumbers(
                state.phTotal(),
                state.conditions().temperatureC(),
                state.conditions().salinity(),
                state.totalAlkalinity() * 1e6,
                state.dic() * 1e6,
                state.pco2Atm() * 1e6,
                state.fco2Atm() * 1e6,
                state.co2() * 1e6,
                state.bicarbonate() * 1e6,
                state.carbonate() * 1e6,
                state.omegaAragonite(),
                state.omegaCalcite(),
                state.densityKgM3(),
                uncertainty.omegaAragonite().total(),
                uncertainty.omegaAragonite().fromConstants(),
                uncertainty.omegaAragonite().fromInputs(),
                uncertainty.phTotal().total());
    }
}
