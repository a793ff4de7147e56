package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Objects;
import java.util.TreeMap;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.hingeline.alert.AlertMachine;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Event;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Observation;
import org.hingeline.alert.Transition;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.LimitBook.Watched;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * Holds what became known against the limits, and lets time pass over them: runs the alert machine, keeps its memory,
 * and hands what it decides to the {@link AlertDesk}. All inside the caller's transaction.
 */
public final class AlertWatch {

    /** What became known of a point: new readings, its sensors, and the water states they led to. */
    record News(Point point, List<StoredReading> readings, List<Sensor> sensors, List<WaterState> states) {}

    /** Where the age of a value plays no part. */
    static final Duration NO_MATTER = Duration.ofDays(1);

    private static final Logger LOG = LoggerFactory.getLogger(AlertWatch.class);

    private final AlertDesk desk;
    private final Attention attention = new Attention();

    public AlertWatch(AlertDesk desk) {
        this.desk = desk;
    }

    /**
     * Holds new readings and states against the limits of their points. What arrives can end a silence, never begin one:
     * it may be the first part of what a gateway kept.
     */
    void observe(Books books, long siteId, List<News> news, Instant now) {
        Map<Long, News> byPoint =
                news.stream().collect(Collectors.toMap(n -> n.point().id(), Function.identity()));
        Map<Long, List<Watched>> watched = books.limits().watchedForUpdate(byPoint.keySet()).stream()
                .collect(Collectors.groupingBy(w -> w.limit().pointId()));
        watched.forEach((pointId, limits) -> {
            News here = Objects.requireNonNull(byPoint.get(pointId));
            run(new Run(books, siteId, here.point(), now), limits, limit -> observations(limit, here), false);
        });
    }

    /** Lets time pass over every limit: delays run out, points fall silent. To be called every few seconds. */
    public void tick(Storage storage, Instant now) {
        Duration watching = attention.look(now);
        RuntimeException failure = null;
        for (long pointId : storage.read(books -> books.limits().pointsWithLimits())) {
            try {
                // a transaction each, so that trouble at one point leaves the others watched
                storage.writeOnly(books -> tick(books, pointId, watching, now));
            } catch (RuntimeException e) {
                LOG.error("time could not pass over the limits of point {}", pointId, e);
                failure = e;
            }
        }
        if (failure != null) {
            throw failure;
        }
    }

    private void tick(Books books, long pointId, Duration watching, Instant now) {
        books.place().lockPoints(List.of(pointId));
        Point point = books.place().pointById(pointId).orElseThrow();
        run(
                new Run(books, point.siteId(), point, now),
                books.limits().watchedForUpdate(List.of(pointId)),
                limit -> List.of(),
                Attention.suffices(watching, point.maxGap()));
    }

    private record Run(Books books, long siteId, Point point, Instant now) {}

    /** Runs the machine over the limits of one point, silence last. */
    private void run(
            Run run,
            List<Watched> limits,
            Function<Limit, List<Observation>> observationsOf,
            boolean maySayItIsSilent) {
        Instant silentSince = null;
        for (Watched watched : limits) {
            Limit limit = watched.limit();
            if (limit.onSilence()) {
                continue;
            }
            Duration fresh = Freshness.of(limit.quantity(), run.point());
            AlertState after = step(run, watched, observationsOf.apply(limit), fresh);
            Instant known = lastKnown(after, watched);
            boolean inTime = !known.plus(fresh).isBefore(run.now());
            // the pause between two samples taken by hand is no silence
            Instant since = inTime && fresh.compareTo(run.point().maxGap()) > 0 ? run.now() : known;
            silentSince = silentSince == null || since.isBefore(silentSince) ? since : silentSince;
        }
        for (Watched watched : limits) {
            if (watched.limit().onSilence() && silentSince != null) {
                silence(run, watched, silentSince, maySayItIsSilent);
            }
        }
    }

    /** Since when the limit's quantity is unknown; a new limit is given time from its making. */
    private static Instant lastKnown(AlertState state, Watched watched) {
        Observation latest = state.latest();
        return latest == null || latest.at().isBefore(watched.createdAt()) ? watched.createdAt() : latest.at();
    }

    private void silence(Run run, Watched watched, Instant since, boolean maySayItIsSilent) {
        double minutes = Math.max(0, Duration.between(since, run.now()).toMillis() / 60_000.0);
        boolean silent = minutes > watched.limit().threshold();
        boolean open = watched.state().phase().open();
        if (silent ? maySayItIsSilent : open) {
            step(run, watched, List.of(new Observation(run.now(), minutes, 0)), NO_MATTER);
        }
    }

    private AlertState step(Run run, Watched watched, List<Observation> observations, Duration freshFor) {
        Limit limit = watched.limit();
        AlertState state = corrected(limit, watched.state(), observations);
        List<Event> events = new ArrayList<>(observations.size() + 1);
        observations.forEach(observation -> events.add(new Event.Observed(observation)));
        events.add(new Event.Tick());
        List<Transition> decided = new ArrayList<>();
        for (Event event : events) {
            Transition transition = AlertMachine.next(limit, freshFor, state, event, run.now());
            state = transition.state();
            if (transition.effect() != Transition.Effect.NOTHING) {
                decided.add(transition);
            }
        }
        Long alertId = watched.alertId();
        for (int i = 0; i < decided.size(); i++) {
            // water that went to and fro within one batch: people hear that it began, and how it stands now
            boolean tell = i == decided.size() - 1 || decided.get(i).effect() == Transition.Effect.RAISE;
            alertId = desk.carryOut(
                    run.books(), run.siteId(), run.point(), limit, decided.get(i), alertId, tell, run.now());
        }
        if (!state.equals(watched.state()) || !Objects.equals(alertId, watched.alertId())) {
            run.books().limits().saveState(limit.id(), state, alertId);
        }
        return state;
    }

    /**
     * The memory with its newest value as it is known now: a late input, say an alkalinity titrated this morning, changes
     * what is computed for moments that have passed, and the present is judged by the newest of them.
     */
    private static AlertState corrected(Limit limit, AlertState state, List<Observation> observations) {
        Observation latest = state.latest();
        if (latest == null || limit.quantity().measured()) {
            return state;
        }
        return observations.stream()
                .filter(o -> o.at().equals(latest.at()) && !o.equals(latest))
                .findFirst()
                .map(o -> limit.isPast(o.value())
                        ? new AlertState(state.phase(), orElse(state.outSince(), o.at()), null, o)
                        : new AlertState(state.phase(), null, state.backSince(), o))
                .orElse(state);
    }

    private static Instant orElse(@Nullable Instant first, Instant second) {
        return first != null ? first : second;
    }

    private static List<Observation> observations(Limit limit, News news) {
        NavigableMap<Instant, Observation> observations = new TreeMap<>();
        if (limit.quantity().measured()) {
            Map<Long, Sensor> sensors = news.sensors().stream()
                    .filter(sensor -> sensor.quantity() == limit.quantity())
                    .collect(Collectors.toMap(Sensor::id, Function.identity()));
            for (StoredReading reading : news.readings()) {
                @Nullable Sensor sensor = sensors.get(reading.sensorId());
                if (sensor != null && reading.flag().usable()) {
                    observations.merge(
                            reading.at(),
                            new Observation(reading.at(), reading.value(), sensor.standardUncertainty()),
                            (a, b) -> b.standardUncertainty() < a.standardUncertainty() ? b : a);
                }
            }
        } else {
            for (WaterState state : news.states()) {
                @Nullable WaterNumbers numbers = state.numbers();
                if (numbers != null) {
                    observations.put(state.at(), observation(limit.quantity(), state.at(), numbers));
                }
            }
        }
        return List.copyOf(observations.values());
    }

    static Observation observation(Quantity quantity, Instant at, WaterNumbers numbers) {
        return switch (quantity) {
            case OMEGA_ARAGONITE -> new Observation(at, numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty());
            case OMEGA_CALCITE ->
                // the two minerals share all but their solubility product, so the relative uncertainty is the same
                new Observation(
                        at,
                        numbers.omegaCalcite(),
                        numbers.omegaAragonite() > 0
                                ? numbers.omegaCalcite()
                                        * numbers.omegaAragoniteUncertainty()
                                        / numbers.omegaAragonite()
                                : 0);
            case PH_TOTAL -> new Observation(at, numbers.phTotal(), numbers.phTotalUncertainty());
            default -> throw new IllegalArgumentException(quantity.code() + " is not part of a water state");
        };
    }
}
