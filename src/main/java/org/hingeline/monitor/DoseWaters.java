package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.dosing.InputNote;
import org.hingeline.dosing.InputNote.Problem;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.quality.Flag;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.InputUncertainty;
import org.jspecify.annotations.Nullable;

/** The present water of a point as a dose plan needs it, with everything that speaks against trusting it. */
public final class DoseWaters {

    /**
     * A water to be dosed.
     *
     * @param result absent when an input is missing
     * @param notes inputs that are stale, failed, missing or suspect
     * @param cautions about the inputs, which a plan passes on
     */
    record Water(
            @Nullable CarbonateResult result,
            InputUncertainty uncertainty,
            List<InputNote> notes,
            List<Caution> cautions) {
        Water {
            notes = List.copyOf(notes);
            cautions = List.copyOf(cautions);
        }

        Water(@Nullable CarbonateResult result, InputUncertainty uncertainty, List<InputNote> notes) {
            this(result, uncertainty, notes, List.of());
        }
    }

    private final Storage storage;
    private final WaterRules rules;

    public DoseWaters(Storage storage, WaterRules rules) {
        this.storage = storage;
        this.rules = rules;
    }

    Water of(PointStatus status) {
        WaterState state = status.newest();
        if (state == null) {
            return new Water(
                    null,
                    InputUncertainty.DEFAULTS,
                    AgeLimits.NEEDED.stream()
                            .map(q -> new InputNote(
                                    q.code(),
                                    Problem.MISSING,
                                    q.words() + " was never read at "
                                            + status.point().name()))
                            .toList());
        }
        List<InputNote> notes = new ArrayList<>();
        state.missing().forEach(missing -> notes.add(note(missing, status.now())));
        state.inputs().forEach(input -> addNote(input, status.now(), notes));
        if (!state.missing().isEmpty()) {
            return new Water(null, InputUncertainty.DEFAULTS, notes);
        }
        Map<String, Sensor> sensors = storage.read(
                books -> WaterAssessor.Inputs.sensors(books, status.point().id()));
        WaterAssessor.Inputs inputs = WaterAssessor.Inputs.of(state, sensors);
        return new Water(inputs.solve(rules), inputs.uncertainty(), notes);
    }

    /** The newest usable total ammonia of a point, mg/L as N, while it may stand for the present. */
    Optional<Double> ammoniaMgL(PointStatus status) {
        Instant now = status.now();
        Duration age = Freshness.of(Quantity.AMMONIA, status.point());
        return storage.read(books -> books.place().sensorsOf(status.point().id()).stream()
                .filter(sensor -> sensor.quantity() == Quantity.AMMONIA)
                .flatMap(sensor ->
                        books.readings().newestBefore(sensor.id(), now.minus(age), now.plusMillis(1)).stream())
                .max(Comparator.comparing(ReadingBook.StoredReading::at))
                .filter(reading -> reading.flag() != Flag.SUSPECT)
                .map(ReadingBook.StoredReading::value));
    }

    private static InputNote note(MissingInput missing, Instant now) {
        Instant newest = missing.newestAt();
        String words = missing.quantity().words();
        return newest == null
                ? new InputNote(missing.quantity().code(), Problem.MISSING, words + " was not read lately")
                : new InputNote(
                        missing.quantity().code(),
                        Problem.STALE,
                        words + " is " + minutes(Duration.between(newest, now)) + " old; at most "
                                + minutes(missing.allowedAge()) + " is allowed");
    }

    private void addNote(InputUsed input, Instant now, List<InputNote> notes) {
        Quantity quantity = input.quantity();
        Duration age = Duration.between(input.at(), now);
        if (age.compareTo(rules.ageLimits().of(quantity)) > 0) {
            notes.add(new InputNote(
                    quantity.code(),
                    Problem.STALE,
                    quantity.words() + " is " + minutes(age) + " old; at most "
                            + minutes(rules.ageLimits().of(quantity)) + " is allowed"));
        }
        if (input.flag() == Flag.SUSPECT) {
            notes.add(new InputNote(
                    quantity.code(),
                    Problem.SUSPECT,
                    quantity.words() + " from sensor " + input.sensor() + " is marked suspect"));
        }
    }

    private static String minutes(Duration span) {
        long minutes = span.toMinutes();
        return minutes < 180 ? minutes + " min" : minutes / 60 + " h";
    }
}
