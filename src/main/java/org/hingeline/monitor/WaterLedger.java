package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.NavigableSet;
import java.util.TreeSet;
import org.hingeline.hatchery.Sensor;

/**
 * Keeps the water states of a point in step with its readings: computes the states at the times of new readings, and
 * those after them that a late reading has made out of date.
 */
final class WaterLedger {
    /** States computed again on the spot; more than that is left to {@link #workOff}. */
    private static final int ON_THE_SPOT = 300;

    private static final int PER_STEP = 500;

    private final AgeLimits ageLimits;
    private final WaterAssessor assessor;

    WaterLedger(AgeLimits ageLimits) {
        this.ageLimits = ageLimits;
        this.assessor = new WaterAssessor(ageLimits);
    }

    /**
     * To be called after the readings are stored, in the same transaction.
     *
     * @param times when a quantity that enters the state was newly read; not empty
     * @return the states at these times, oldest first
     */
    List<WaterState> assess(Books books, long pointId, List<Sensor> sensors, NavigableSet<Instant> times) {
        List<Instant> standing = books.water().timesFrom(pointId, times.first(), ON_THE_SPOT + 1);
        NavigableSet<Instant> all = new TreeSet<>(times);
        Instant reach = times.last().plus(ageLimits.longestOfAll());
        int again = Math.min(standing.size(), ON_THE_SPOT);
        for (Instant at : standing.subList(0, again)) {
            if (!at.isAfter(reach)) {
                all.add(at);
            }
        }
        if (standing.size() > ON_THE_SPOT && standing.get(again).isBefore(reach)) {
            books.water().addSpan(pointId, standing.get(again - 1), reach);
        }
        List<WaterState> states = compute(books, pointId, sensors, all);
        books.water().save(states);
        return states.stream().filter(state -> times.contains(state.at())).toList();
    }

    /**
     * Does one step of the work that late readings have left.
     *
     * @return whether there was any
     */
    boolean workOff(Books books) {
        WaterBook.Span span = books.water().nextSpan().orElse(null);
        if (span == null) {
            return false;
        }
        List<Instant> times = books
                .water()
                .timesFrom(span.pointId(), span.after().plusMillis(1), PER_STEP)
                .stream()
                .filter(at -> !at.isAfter(span.to()))
                .toList();
        if (times.isEmpty()) {
            books.water().removeSpan(span.id());
            return true;
        }
        books.place().lockPoints(List.of(span.pointId()));
        List<Sensor> sensors = books.place().sensorsOf(span.pointId());
        books.water().save(compute(books, span.pointId(), sensors, new TreeSet<>(times)));
        books.water().moveSpan(span.id(), times.get(times.size() - 1));
        return true;
    }

    private List<WaterState> compute(Books books, long pointId, List<Sensor> sensors, NavigableSet<Instant> times) {
        PointInputs inputs = new PointInputs();
        for (Sensor sensor : sensors) {
            if (!AgeLimits.NEEDED.contains(sensor.quantity())) {
                continue;
            }
            // twice the allowed age, so that a state can say how old a value it did not use was
            Duration back = ageLimits.of(sensor.quantity()).multipliedBy(2);
            books.readings()
                    .newestBefore(sensor.id(), times.first().minus(back), times.first())
                    .ifPresent(reading -> inputs.add(sensor, reading));
            books.readings()
                    .between(sensor.id(), times.first(), times.last())
                    .forEach(reading -> inputs.add(sensor, reading));
        }
        List<WaterState> states = new ArrayList<>(times.size());
        for (Instant at : times) {
            states.add(assessor.assess(pointId, at, inputs));
        }
        return states;
    }
}
