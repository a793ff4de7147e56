package org.hingeline.monitor;

import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.ReadingBook.StoredReading;

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
    private final InputLoader loader;

    WaterLedger(WaterRules rules) {
        this.ageLimits = rules.ageLimits();
        this.assessor = new WaterAssessor(rules);
        this.loader = new InputLoader(ageLimits);
    }

    /**
     * To be called after the readings are stored, in the same transaction.
     *
     * @param sensors of the point
     * @param fresh readings of these sensors just stored, of any quantity
     * @return the states at the times of fresh readings that enter a state, and those after them that had to be computed
     *     again, the newest state of the point among them if it had; oldest first
     */
    List<WaterState> assess(Books books, long pointId, List<Sensor> sensors, List<StoredReading> fresh) {
        List<Sensor> entering = sensors.stream()
                .filter(sensor -> AgeLimits.ENTERING.contains(sensor.quantity()))
                .toList();
        Map<Long, Quantity> quantities = entering.stream().collect(Collectors.toMap(Sensor::id, Sensor::quantity));
        NavigableSet<Instant> times = new TreeSet<>();
        Map<Quantity, Instant> latest = new EnumMap<>(Quantity.class);
        for (StoredReading reading : fresh) {
            Quantity quantity = quantities.get(reading.sensorId());
            if (quantity != null) {
                times.add(reading.at());
                if (reading.flag().usable()) {
                    latest.merge(quantity, reading.at(), (a, b) -> a.isAfter(b) ? a : b);
                }
            }
        }
        if (times.isEmpty()) {
            return List.of();
        }
        List<Instant> standing = books.water().timesFrom(pointId, times.first(), ON_THE_SPOT + 1);
        NavigableSet<Instant> all = new TreeSet<>(times);
        if (!times.containsAll(standing)) {
            Instant reach = reach(books, entering, latest, times.first());
            standing.stream()
                    .limit(ON_THE_SPOT)
                    .filter(at -> !at.isAfter(reach))
                    .forEach(all::add);
            if (standing.size() > ON_THE_SPOT && !standing.get(ON_THE_SPOT).isAfter(reach)) {
                books.water().addSpan(pointId, standing.get(ON_THE_SPOT - 1), reach);
                // the newest state speaks for the present: it does not wait
                books.water()
                        .newest(pointId)
                        .map(WaterState::at)
                        .filter(at -> !at.isAfter(reach))
                        .ifPresent(all::add);
            }
        }
        List<WaterState> states = compute(books, pointId, entering, all);
        books.water().save(states);
        return states;
    }

    /**
     * Up to when states can differ because of fresh readings: until each quantity is read again, or its last fresh value
     * is too old even to be named as missing. A temperature also speaks through the conductivities that are read while it
     * is the newest, for as long as the last of these does.
     */
    private Instant reach(Books books, List<Sensor> entering, Map<Quantity, Instant> latest, Instant none) {
        Instant reach = none;
        for (Map.Entry<Quantity, Instant> entry : latest.entrySet()) {
            Quantity quantity = entry.getKey();
            Instant end = untilReadAgain(books, entering, quantity, entry.getValue());
            boolean throughConductivity = quantity == Quantity.TEMPERATURE
                    && entering.stream().anyMatch(sensor -> sensor.quantity() == Quantity.CONDUCTIVITY);
            if (throughConductivity) {
                end = untilReadAgain(books, entering, Quantity.CONDUCTIVITY, end);
            }
            reach = end.isAfter(reach) ? end : reach;
        }
        return reach;
    }

    private Instant untilReadAgain(Books books, List<Sensor> entering, Quantity quantity, Instant last) {
        Instant end = last.plus(WaterAssessor.remembered(ageLimits.of(quantity)));
        for (Sensor sensor : entering) {
            if (sensor.quantity() == quantity) {
                end = books.readings().firstAfter(sensor.id(), last, end).orElse(end);
            }
        }
        return end;
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
        List<WaterState> states = new ArrayList<>(times.size());
        for (NavigableSet<Instant> spell : Spells.of(times)) {
            PointInputs inputs = loader.load(books, sensors, spell.first(), spell.last());
            for (Instant at : spell) {
                states.add(assessor.assess(pointId, at, inputs));
            }
        }
        return states;
    }
}
