package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PointInputs.Candidate;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.quality.Flag;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.PhScale;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.seawater.Uncertainty;
import org.jspecify.annotations.Nullable;

/** From the freshest inputs at a moment to the water state, with the account of what was used and what was missing. */
final class WaterAssessor {
    private final AgeLimits ageLimits;

    WaterAssessor(AgeLimits ageLimits) {
        this.ageLimits = ageLimits;
    }

    WaterState assess(long pointId, Instant at, PointInputs inputs) {
        Map<Quantity, Candidate> found = new EnumMap<>(Quantity.class);
        List<InputUsed> used = new ArrayList<>(AgeLimits.NEEDED.size());
        List<MissingInput> missing = new ArrayList<>();
        for (Quantity quantity : AgeLimits.NEEDED) {
            Duration allowed = ageLimits.of(quantity);
            Optional<Candidate> freshest = inputs.freshest(quantity, at);
            if (freshest.isPresent()
                    && Duration.between(freshest.get().reading().at(), at).compareTo(allowed) <= 0) {
                found.put(quantity, freshest.get());
                used.add(inputUsed(quantity, freshest.get()));
            } else {
                missing.add(new MissingInput(
                        quantity, freshest.map(c -> c.reading().at()).orElse(null), allowed));
            }
        }
        if (!missing.isEmpty()) {
            return new WaterState(pointId, at, used, missing, null, List.of());
        }
        return compute(pointId, at, used, found);
    }

    private static InputUsed inputUsed(Quantity quantity, Candidate candidate) {
        return new InputUsed(
                quantity,
                candidate.reading().value(),
                candidate.reading().at(),
                "sensor",
                candidate.sensor().code(),
                candidate.reading().flag());
    }

    private static WaterState compute(long pointId, Instant at, List<InputUsed> used, Map<Quantity, Candidate> found) {
        Candidate ph = need(found, Quantity.PH);
        Candidate temperature = need(found, Quantity.TEMPERATURE);
        Candidate salinity = need(found, Quantity.SALINITY);
        Candidate alkalinity = need(found, Quantity.TOTAL_ALKALINITY);
        PhScale scale = scaleOf(ph);
        CarbonateResult result = CarbonateSystem.solve(
                Conditions.of(temperature.reading().value(), salinity.reading().value()),
                new KnownPair.PhAndAlkalinity(
                        ph.reading().value(), scale, alkalinity.reading().value() * 1e-6));
        List<Note> cautions = new ArrayList<>();
        if (used.stream().anyMatch(input -> input.flag() == Flag.SUSPECT)) {
            cautions.add(
                    new Note("suspect-input", "an input is marked suspect, and so is everything computed from it"));
        }
        if (result instanceof Unsolvable refusal) {
            cautions.add(new Note(refusal.reason().code(), refusal.detail()));
            return new WaterState(pointId, at, used, List.of(), null, cautions);
        }
        CarbonateState state = ((Solved) result).state();
        state.cautions().forEach(caution -> cautions.add(new Note(caution.code(), caution.detail())));
        StateUncertainty uncertainty = Uncertainty.of(
                state,
                InputUncertainty.ofPhAndAlkalinity(
                        phUncertainty(ph, scale),
                        alkalinity.sensor().standardUncertainty() * 1e-6,
                        temperature.sensor().standardUncertainty(),
                        salinity.sensor().standardUncertainty()));
        return new WaterState(pointId, at, used, List.of(), numbers(state, uncertainty), cautions);
    }

    private static double phUncertainty(Candidate ph, PhScale scale) {
        double registered = ph.sensor().standardUncertainty();
        return scale == PhScale.NBS ? Math.max(registered, InputUncertainty.PH_ON_NBS_BUFFERS) : registered;
    }

    private static PhScale scaleOf(Candidate ph) {
        @Nullable PhScale scale = ph.sensor().phScale();
        if (scale == null) {
            throw new IllegalStateException("pH sensor " + ph.sensor().code() + " has no scale");
        }
        return scale;
    }

    private static Candidate need(Map<Quantity, Candidate> found, Quantity quantity) {
        Candidate candidate = found.get(quantity);
        if (candidate == null) {
            throw new IllegalStateException(quantity.code() + " was expected among the inputs");
        }
        return candidate;
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
