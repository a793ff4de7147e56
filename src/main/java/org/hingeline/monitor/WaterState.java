package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.measure.Quantity;
import org.hingeline.quality.Flag;
import org.jspecify.annotations.Nullable;

/**
 * The water at one point and moment: the whole carbonate system, with where each input came from, how old it was and
 * what was missing.
 *
 * @param numbers absent when an input was missing or the methods do not cover the water
 */
public record WaterState(
        long pointId,
        Instant at,
        List<InputUsed> inputs,
        List<MissingInput> missing,
        @Nullable WaterNumbers numbers,
        List<Note> cautions) {

    public WaterState {
        inputs = List.copyOf(inputs);
        missing = List.copyOf(missing);
        cautions = List.copyOf(cautions);
    }

    /**
     * An input of the state.
     *
     * @param value canonical unit; pH on the sensor's own scale
     * @param at when it was measured; of a salinity from conductivity, when the conductivity was
     * @param origin how it came: {@link #FROM_SENSOR} or {@link #FROM_CONDUCTIVITY}
     * @param sensor the sensor that measured it, or the conductivity
     */
    public record InputUsed(Quantity quantity, double value, Instant at, String origin, String sensor, Flag flag) {
        /** Read by a sensor of the quantity itself. */
        public static final String FROM_SENSOR = "sensor";

        /** A salinity computed from conductivity and temperature. */
        public static final String FROM_CONDUCTIVITY = "conductivity";

        /** Where it came from, in words: "sensor ph-3", "conductivity sensor c-3". */
        public String source() {
            return (origin.equals(FROM_SENSOR) ? origin : origin + " sensor") + " " + sensor;
        }

        public Duration age(Instant stateAt) {
            return Duration.between(at, stateAt);
        }
    }

    /**
     * An input that could not be had.
     *
     * @param newestAt when it was last measured, if ever
     * @param allowedAge the age up to which it would have been used
     */
    public record MissingInput(Quantity quantity, @Nullable Instant newestAt, Duration allowedAge) {}

    /** A code for programs and a sentence for people. */
    public record Note(String code, String detail) {}

    /** Whether an input is marked suspect, and so everything computed from it. */
    public boolean suspect() {
        return inputs.stream().anyMatch(i -> i.flag() == Flag.SUSPECT);
    }
}
