package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.DoseComparison;
import org.hingeline.dosing.DoseOutcome;
import org.hingeline.dosing.DoseOutcome.Seen;
import org.hingeline.dosing.DoseOutcome.Verdict;
import org.hingeline.dosing.TankVolume;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Standing;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.jspecify.annotations.Nullable;

/**
 * The doses of a tank and how they came out. The verdict is worked out on reading and never stored: late readings and
 * corrections change the states it rests on, and it then says what they say.
 */
public final class DoseHistory {
    /** How long after mixing readings tell of a dose, before the tank has changed by itself. */
    private static final Duration SETTLED = Duration.ofMinutes(30);

    /** How far back doses tell of a tank's volume, and how many. */
    private static final Duration FOR_VOLUME = Duration.ofDays(60);

    private static final int MOST_FOR_VOLUME = 12;
    private static final int MOST_ROWS = 5000;

    /** @param outcome null unless the record stands */
    public record Entry(Dose dose, @Nullable DoseOutcome outcome) {}

    private final Storage storage;
    private final InstantSource clock;
    private final WaterRules rules;

    public DoseHistory(Storage storage, InstantSource clock, WaterRules rules) {
        this.storage = storage;
        this.clock = clock;
        this.rules = rules;
    }

    /** Every record with from ≤ at ≤ to, newest first. */
    public List<Entry> of(Point point, Instant from, Instant to) {
        Instant now = clock.instant();
        return storage.read(books -> entries(books, point, from, to, now));
    }

    public Optional<Entry> one(long siteId, long id) {
        Instant now = clock.instant();
        return storage.read(books -> books.doses()
                .dose(siteId, id)
                .flatMap(dose -> books.place().pointById(dose.pointId()).stream()
                        .flatMap(point -> entries(books, point, dose.at(), dose.at(), now).stream())
                        .filter(entry -> entry.dose().id() == id)
                        .findFirst()));
    }

    /** What the tank seems to hold, when its doses came out short again and again. */
    public Optional<TankVolume> volume(Point point) {
        Double volumeL = point.volumeL();
        if (volumeL == null) {
            return Optional.empty();
        }
        Instant now = clock.instant();
        List<TankVolume.Sample> samples = of(point, now.minus(FOR_VOLUME), now).stream()
                .flatMap(entry -> sample(entry).stream())
                .limit(MOST_FOR_VOLUME)
                .toList();
        return TankVolume.of(samples, volumeL);
    }

    private static Optional<TankVolume.Sample> sample(Entry entry) {
        DoseOutcome outcome = entry.outcome();
        Dose.Foretold foretold = entry.dose().foretold();
        Seen seen = outcome == null ? null : outcome.seen();
        return outcome == null || seen == null || foretold == null
                ? Optional.empty()
                : Optional.of(new TankVolume.Sample(
                        foretold.volumeL(),
                        seen.expectedAlkalinity(),
                        seen.arrivedAlkalinity(),
                        seen.standardUncertainty(),
                        outcome.verdict() == Verdict.LESS));
    }

    private List<Entry> entries(Books books, Point point, Instant from, Instant to, Instant now) {
        // neighbours beyond the span bear on the doses at its ends
        List<Dose> around =
                books.doses().between(point.id(), from.minus(Duration.ofDays(1)), to.plus(Duration.ofDays(1)));
        List<Entry> entries = new ArrayList<>();
        for (Dose dose : around) {
            if (!dose.at().isBefore(from) && !dose.at().isAfter(to)) {
                DoseOutcome outcome =
                        dose.standing() == Standing.RECORDED ? outcome(books, point, dose, around, now) : null;
                entries.add(new Entry(dose, outcome));
            }
        }
        entries.sort(Comparator.comparing((Entry entry) -> entry.dose().at())
                .thenComparing(entry -> entry.dose().id())
                .reversed());
        return entries;
    }

    private DoseOutcome outcome(Books books, Point point, Dose dose, List<Dose> around, Instant now) {
        Dose.Foretold foretold = dose.foretold();
        Optional<Agent> agent = Agent.ofCode(dose.given().agent());
        if (dose.given().massG() == 0) {
            return cannotTell("Nothing was put in.");
        }
        if (foretold == null || agent.isEmpty()) {
            return cannotTell("Nothing was foretold: the water before it, or the volume, was not known.");
        }
        Duration mixing = Duration.ofMinutes(foretold.mixingMin());
        List<Dose> others = around.stream()
                .filter(other -> other.id() != dose.id() && other.standing() == Standing.RECORDED)
                .filter(other -> other.given().massG() > 0)
                .toList();
        if (others.stream()
                .anyMatch(other -> !other.at().isAfter(dose.at())
                        && other.at().plus(mixing).isAfter(dose.at()))) {
            return cannotTell("The dose before it was not mixed yet.");
        }
        Instant mixedAt = dose.at().plus(mixing);
        Instant until = others.stream()
                .map(Dose::at)
                .filter(at -> at.isAfter(dose.at()))
                .min(Comparator.naturalOrder())
                .filter(at -> at.isBefore(mixedAt.plus(SETTLED)))
                .orElse(mixedAt.plus(SETTLED));
        DoseComparison.Dosed dosed = new DoseComparison.Dosed(
                agent.get(),
                foretold.before().totalAlkalinityUmolKg() * 1e-6,
                foretold.before().dicUmolKg() * 1e-6,
                foretold.salinity(),
                foretold.addedAlkalinityUmolKg() * 1e-6,
                foretold.phChangeUncertainty(),
                foretold.alkalinityUncertaintyUmolKg() * 1e-6,
                mixedAt,
                until);
        List<DoseComparison.After> states = books.water().between(point.id(), mixedAt, until, MOST_ROWS).stream()
                .filter(state -> !state.suspect())
                .flatMap(state -> after(state).stream())
                .toList();
        return DoseComparison.compare(dosed, states, flowing(books, point, dose.at(), until), now);
    }

    private Optional<DoseComparison.After> after(WaterState state) {
        WaterNumbers numbers = state.numbers();
        if (numbers == null) {
            return Optional.empty();
        }
        Double calcium = state.inputs().stream()
                .filter(input -> input.quantity() == Quantity.CALCIUM)
                .map(InputUsed::value)
                .findFirst()
                .orElse(null);
        return Optional.of(new DoseComparison.After(
                DoseForetelling.measured(state, Quantity.PH),
                numbers.phTotal(),
                rules.conditions(numbers.temperatureC(), numbers.salinity(), calcium),
                DoseForetelling.measured(state, Quantity.TOTAL_ALKALINITY),
                numbers.totalAlkalinityUmolKg() * 1e-6));
    }

    private static boolean flowing(Books books, Point point, Instant from, Instant to) {
        return books.place().sensorsOf(point.id()).stream()
                .filter(sensor -> sensor.quantity() == Quantity.FLOW)
                .flatMap(sensor -> books.readings().between(sensor.id(), from, to, MOST_ROWS).stream())
                .anyMatch(reading -> reading.flag().usable() && reading.value() > 0);
    }

    private static DoseOutcome cannotTell(String detail) {
        return new DoseOutcome(Verdict.CANNOT_TELL, detail, null);
    }
}
