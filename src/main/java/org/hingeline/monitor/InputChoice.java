package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PointInputs.Candidate;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.quality.Flag;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.Figure;
import org.jspecify.annotations.Nullable;

/**
 * Picks the input of a quantity at a moment: the freshest reading, if it is fresh enough. A salinity that was not read, or
 * not lately, is computed from the freshest conductivity and the temperature of <em>its</em> time: 1 °C is 2 % of a
 * conductivity, so the temperature of another hour will not do.
 */
final class InputChoice {

    /**
     * What was picked.
     *
     * @param used absent when there is nothing fresh enough
     * @param sensor the sensor named in {@code used}
     * @param newestAt without a value: when it was last measured, if that is not long ago
     * @param notes what to know of it
     */
    record Picked(
            @Nullable InputUsed used,
            @Nullable Sensor sensor,
            @Nullable Instant newestAt,
            List<Note> notes) {
        Picked {
            notes = List.copyOf(notes);
        }

        private static Picked of(InputUsed used, Sensor sensor, List<Note> notes) {
            return new Picked(used, sensor, null, notes);
        }

        private static Picked nothing(@Nullable Instant newestAt, List<Note> notes) {
            return new Picked(null, null, newestAt, notes);
        }
    }

    private final AgeLimits ageLimits;

    InputChoice(AgeLimits ageLimits) {
        this.ageLimits = ageLimits;
    }

    Picked pick(Quantity quantity, Instant at, PointInputs inputs) {
        Picked read = asRead(quantity, at, inputs);
        if (quantity != Quantity.SALINITY || read.used() != null) {
            return read;
        }
        return fromConductivity(read, at, inputs);
    }

    private Picked asRead(Quantity quantity, Instant at, PointInputs inputs) {
        Candidate freshest = remembered(quantity, at, inputs).orElse(null);
        if (freshest == null) {
            return Picked.nothing(null, List.of());
        }
        if (!fresh(freshest, at)) {
            return Picked.nothing(freshest.reading().at(), List.of());
        }
        return Picked.of(
                new InputUsed(
                        quantity,
                        freshest.reading().value(),
                        freshest.reading().at(),
                        InputUsed.FROM_SENSOR,
                        freshest.sensor().code(),
                        freshest.reading().flag()),
                freshest.sensor(),
                List.of());
    }

    private Picked fromConductivity(Picked stale, Instant at, PointInputs inputs) {
        Candidate conductivity = remembered(Quantity.CONDUCTIVITY, at, inputs).orElse(null);
        if (conductivity == null) {
            return stale;
        }
        Instant measured = conductivity.reading().at();
        Instant newest = stale.newestAt() == null || measured.isAfter(stale.newestAt()) ? measured : stale.newestAt();
        if (!fresh(conductivity, at)) {
            return Picked.nothing(newest, List.of());
        }
        Candidate temperature = inputs.freshest(Quantity.TEMPERATURE, measured)
                .filter(candidate -> fresh(candidate, measured))
                .orElse(null);
        if (temperature == null) {
            return Picked.nothing(
                    stale.newestAt(),
                    List.of(new Note(
                            "conductivity-without-temperature",
                            "the conductivity of " + measured + " gives no salinity: no temperature was read in the "
                                    + ageLimits.of(Quantity.TEMPERATURE).toMinutes() + " min before it")));
        }
        Figure salinity = ConductivitySalinity.salinity(
                conductivity.reading().value(), temperature.reading().value());
        if (salinity instanceof Figure.Known known) {
            boolean suspect = conductivity.reading().flag() == Flag.SUSPECT
                    || temperature.reading().flag() == Flag.SUSPECT;
            return Picked.of(
                    new InputUsed(
                            Quantity.SALINITY,
                            known.value(),
                            measured,
                            InputUsed.FROM_CONDUCTIVITY,
                            conductivity.sensor().code(),
                            suspect ? Flag.SUSPECT : conductivity.reading().flag()),
                    conductivity.sensor(),
                    known.cautions().stream()
                            .map(caution -> new Note(caution.code(), caution.detail()))
                            .toList());
        }
        Figure.Refused refused = (Figure.Refused) salinity;
        return Picked.nothing(
                stale.newestAt(),
                List.of(new Note(refused.code(), "no salinity from conductivity: " + refused.detail())));
    }

    /** The newest usable value that is not so old that it is not even named. */
    private Optional<Candidate> remembered(Quantity quantity, Instant at, PointInputs inputs) {
        Duration remembered = WaterAssessor.remembered(ageLimits.of(quantity));
        return inputs.freshest(quantity, at)
                .filter(c -> Duration.between(c.reading().at(), at).compareTo(remembered) <= 0);
    }

    private boolean fresh(Candidate candidate, Instant at) {
        return Duration.between(candidate.reading().at(), at)
                        .compareTo(ageLimits.of(candidate.sensor().quantity()))
                <= 0;
    }
}
