package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.dosing.DoseEffect;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.jspecify.annotations.Nullable;

/** Reckons what a dose was to make of the water, from the state of its point just before and the mass given. */
final class DoseForetelling {
    private static final int MOST_STATES = 10_000;

    private final WaterRules rules;
    private final Duration mixing;

    DoseForetelling(WaterRules rules, Duration mixing) {
        this.rules = rules;
        this.mixing = mixing;
    }

    /**
     * @param without a record that does not count any more, because this one takes its place
     * @return nothing when the water just before is not known well enough
     */
    Dose.@Nullable Foretold of(Books books, Point point, Instant at, DoseEffect.Given given, @Nullable Long without) {
        Optional<WaterState> before = stateBefore(books, point, at);
        if (before.isEmpty() || given.massG() == 0) {
            return null;
        }
        WaterState state = before.get();
        Map<String, Sensor> sensors = WaterAssessor.Inputs.sensors(books, point.id());
        if (!state.inputs().stream().allMatch(input -> sensors.containsKey(input.sensor()))) {
            return null;
        }
        WaterAssessor.Inputs inputs = WaterAssessor.Inputs.of(state, sensors);
        if (!(inputs.solve(rules) instanceof Solved solved)) {
            return null;
        }
        double addedSince = books.doses().between(point.id(), measured(state, Quantity.TOTAL_ALKALINITY), at).stream()
                .filter(dose -> dose.standing() == Dose.Standing.RECORDED)
                .filter(dose -> without == null || dose.id() != without)
                .map(Dose::foretold)
                .mapToDouble(foretold -> foretold == null ? 0 : foretold.addedAlkalinityUmolKg() * 1e-6)
                .sum();
        return DoseEffect.of(solved.state(), inputs.uncertainty(), addedSince, given)
                .map(effect -> new Dose.Foretold(
                        state.at(),
                        given.volumeL(),
                        effect.before().conditions().temperatureC(),
                        effect.before().conditions().salinity(),
                        (int) mixing.toMinutes(),
                        water(effect.before()),
                        water(effect.after()),
                        effect.ofChange().phTotal().fromInputs(),
                        effect.ofChange().omegaAragonite().fromInputs(),
                        inputs.uncertainty().totalAlkalinity() * 1e6))
                .orElse(null);
    }

    private Optional<WaterState> stateBefore(Books books, Point point, Instant at) {
        Duration back = rules.ageLimits().of(Quantity.PH);
        List<WaterState> states = books.water().between(point.id(), at.minus(back), at, MOST_STATES);
        return states.stream()
                .filter(state -> state.numbers() != null && !state.suspect())
                .filter(state -> !measured(state, Quantity.PH).isBefore(at.minus(back)))
                .reduce((earlier, later) -> later);
    }

    static Instant measured(WaterState state, Quantity quantity) {
        return state.inputs().stream()
                .filter(input -> input.quantity() == quantity)
                .map(InputUsed::at)
                .findFirst()
                .orElse(Instant.EPOCH);
    }

    private static Dose.Water water(CarbonateState state) {
        return new Dose.Water(
                state.phTotal(), state.omegaAragonite(), state.totalAlkalinity() * 1e6, state.dic() * 1e6);
    }
}
