package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Objects;
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
import org.hingeline.monitor.AlertBook.Watched;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.jspecify.annotations.Nullable;

/**
 * Holds what became known against the limits, and lets time pass over them: runs the alert machine, keeps its memory,
 * and hands what it decides to the {@link AlertDesk}. All inside the caller's transaction.
 */
public final class AlertWatch {

    /** What became known of a point: new readings, its sensors, and the water states they led to. */
    record News(Point point, List<StoredReading> readings, List<Sensor> sensors, List<WaterState> states) {}

    private final AlertDesk desk;

    public AlertWatch(AlertDesk desk) {
        this.desk = desk;
    }

    /** Holds new readings and states against the limits of their points. */
    void observe(Books books, long siteId, List<News> news, Instant now) {
        Map<Long, News> byPoint =
                news.stream().collect(Collectors.toMap(n -> n.point().id(), Function.identity()));
        Map<Long, List<Watched>> watched = books.alerts().watchedForUpdate(byPoint.keySet()).stream()
                .collect(Collectors.groupingBy(w -> w.limit().pointId()));
        watched.forEach((pointId, limits) -> {
            News here = Objects.requireNonNull(byPoint.get(pointId));
            run(books, siteId, here.point(), limits, limit -> observations(limit, here), now);
        });
    }

    /** Lets time pass over every limit: delays run out, points fall silent. */
    public void tick(Books books, Instant now) {
        Map<Long, List<Watched>> watched = books
                .alerts()
                .watchedForUpdate(books.alerts().pointsWithLimits())
                .stream()
                .collect(Collectors.groupingBy(w -> w.limit().pointId()));
        watched.forEach((pointId, limits) -> {
            Point point = books.place().pointById(pointId).orElseThrow();
            run(books, point.siteId(), point, limits, limit -> List.of(), now);
        });
    }

    /** Runs the machine over the limits of one point, silence last. */
    private void run(
            Books books,
            long siteId,
            Point point,
            List<Watched> limits,
            Function<Limit, List<Observation>> observationsOf,
            Instant now) {
        Instant oldest = null;
        for (Watched watched : limits) {
            if (watched.limit().onSilence()) {
                continue;
            }
            AlertState after =
                    step(books, siteId, point, watched, observationsOf.apply(watched.limit()), now, point.maxGap());
            Instant last = lastKnown(after, watched);
            oldest = oldest == null || last.isBefore(oldest) ? last : oldest;
        }
        for (Watched watched : limits) {
            if (watched.limit().onSilence() && oldest != null) {
                silence(books, siteId, point, watched, oldest, now);
            }
        }
    }

    /** Since when the limit's quantity is unknown; a new limit is given time from its making. */
    private static Instant lastKnown(AlertState state, Watched watched) {
        Observation latest = state.latest();
        return latest == null ? watched.createdAt() : latest.at();
    }

    private void silence(Books books, long siteId, Point point, Watched watched, Instant oldest, Instant now) {
        double minutes = Math.max(0, Duration.between(oldest, now).toMillis() / 60_000.0);
        boolean worthARow = watched.state().phase().open()
                || watched.state().outSince() != null
                || minutes > watched.limit().threshold();
        if (worthARow) {
            step(books, siteId, point, watched, List.of(new Observation(now, minutes, 0)), now, Duration.ofDays(1));
        }
    }

    private AlertState step(
            Books books,
            long siteId,
            Point point,
            Watched watched,
            List<Observation> observations,
            Instant now,
            Duration freshFor) {
        Limit limit = watched.limit();
        AlertState state = watched.state();
        Long alertId = watched.alertId();
        List<Event> events = new ArrayList<>(observations.size() + 1);
        observations.forEach(observation -> events.add(new Event.Observed(observation)));
        events.add(new Event.Tick());
        for (Event event : events) {
            Transition transition = AlertMachine.next(limit, freshFor, state, event, now);
            state = transition.state();
            alertId = desk.carryOut(books, siteId, point, limit, transition, alertId, now);
        }
        if (!state.equals(watched.state()) || !Objects.equals(alertId, watched.alertId())) {
            books.alerts().saveState(limit.id(), state, alertId);
        }
        return state;
    }

    private static List<Observation> observations(Limit limit, News news) {
        List<Observation> observations = new ArrayList<>();
        if (limit.quantity().measured()) {
            Map<Long, Sensor> sensors = news.sensors().stream()
                    .filter(sensor -> sensor.quantity() == limit.quantity())
                    .collect(Collectors.toMap(Sensor::id, Function.identity()));
            for (StoredReading reading : news.readings()) {
                @Nullable Sensor sensor = sensors.get(reading.sensorId());
                if (sensor != null && reading.flag().usable()) {
                    observations.add(new Observation(reading.at(), reading.value(), sensor.standardUncertainty()));
                }
            }
        } else {
            for (WaterState state : news.states()) {
                @Nullable WaterNumbers numbers = state.numbers();
                if (numbers != null) {
                    observations.add(observation(limit.quantity(), state.at(), numbers));
                }
            }
        }
        observations.sort(Comparator.comparing(Observation::at));
        return observations;
    }

    static Observation observation(Quantity quantity, Instant at, WaterNumbers numbers) {
        return switch (quantity) {
            case OMEGA_ARAGONITE -> new Observation(at, numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty());
            case OMEGA_CALCITE ->
                // the two minerals share all but their solubility product, so the relative uncertainty is the same
                new Observation(
                        at,
                        numbers.omegaCalcite(),
                        numbers.omegaCalcite() * numbers.omegaAragoniteUncertainty() / numbers.omegaAragonite());
            case PH_TOTAL -> new Observation(at, numbers.phTotal(), numbers.phTotalUncertainty());
            default -> throw new IllegalArgumentException(quantity.code() + " is not part of a water state");
        };
    }
}
