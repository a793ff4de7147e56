package org.hingeline.monitor;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.PhScale;
import org.jspecify.annotations.Nullable;

/** A stored water state as the wish that gives it again: its inputs, what its sensors are registered with, and the fits in use. */
public final class StateWishes {
    private final Storage storage;
    private final WaterRules rules;

    public StateWishes(Storage storage, WaterRules rules) {
        this.storage = storage;
        this.rules = rules;
    }

    /** The fits that water states are computed with. */
    public WaterRules rules() {
        return rules;
    }

    /** As far as the state has inputs and their sensors are registered still; what is not known is absent. */
    public WaterWish of(WaterState state) {
        Map<String, Sensor> sensors = storage.read(books -> WaterAssessor.Inputs.sensors(books, state.pointId()));
        return WaterWish.builder()
                .temperatureC(value(state, Quantity.TEMPERATURE))
                .salinity(value(state, Quantity.SALINITY))
                .ph(value(state, Quantity.PH))
                .phScale(scale(state, sensors))
                .totalAlkalinityUmolKg(value(state, Quantity.TOTAL_ALKALINITY))
                .calciumMmolKg(value(state, Quantity.CALCIUM))
                .constants(rules.constants().wireName())
                .boron(rules.boron().wireName())
                .uncertainty(uncertainty(state, sensors))
                .build();
    }

    private static @Nullable Double value(WaterState state, Quantity quantity) {
        return input(state, quantity).map(InputUsed::value).orElse(null);
    }

    private static Optional<InputUsed> input(WaterState state, Quantity quantity) {
        return state.inputs().stream()
                .filter(input -> input.quantity() == quantity)
                .findFirst();
    }

    private static @Nullable String scale(WaterState state, Map<String, Sensor> sensors) {
        Optional<PhScale> scale = input(state, Quantity.PH)
                .map(input -> sensors.get(input.sensor()))
                .map(Sensor::phScale);
        return scale.map(PhScale::wireName).orElse(null);
    }

    private static WaterWish.Uncertainty uncertainty(WaterState state, Map<String, Sensor> sensors) {
        boolean whole = state.missing().isEmpty()
                && state.inputs().stream().allMatch(input -> sensors.containsKey(input.sensor()));
        if (whole) {
            InputUncertainty u = WaterAssessor.Inputs.of(state, sensors).uncertainty();
            return new WaterWish.Uncertainty(
                    u.ph(),
                    u.totalAlkalinity() * 1e6,
                    null,
                    null,
                    u.temperatureC(),
                    u.salinityInAll(), // a wish has no word for a salinity that moves with the thermometer
                    null,
                    input(state, Quantity.CALCIUM).isPresent() ? (Double) (u.calcium() * 1e3) : null);
        }
        return new WaterWish.Uncertainty(
                registered(state, Quantity.PH, sensors),
                registered(state, Quantity.TOTAL_ALKALINITY, sensors),
                null,
                null,
                registered(state, Quantity.TEMPERATURE, sensors),
                registered(state, Quantity.SALINITY, sensors),
                null,
                registered(state, Quantity.CALCIUM, sensors));
    }

    /** None for a value that was computed: its sensor's is that of another quantity. */
    private static @Nullable Double registered(WaterState state, Quantity quantity, Map<String, Sensor> sensors) {
        return input(state, quantity)
                .filter(input -> input.origin().equals(InputUsed.FROM_SENSOR))
                .map(input -> sensors.get(input.sensor()))
                .map(Sensor::standardUncertainty)
                .orElse(null);
    }

    /** The inputs whose sensors are not registered any more, so that nothing but their value is known. */
    public List<InputUsed> orphans(WaterState state) {
        List<String> known = storage.read(books -> books.place().sensorsOf(state.pointId())).stream()
                .map(Sensor::code)
                .toList();
        return state.inputs().stream()
                .filter(input -> !known.contains(input.sensor()))
                .toList();
    }
}
