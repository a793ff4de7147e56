package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedList;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.ReadingBook.StoredReading;

/** What the pages and the API show of the water: how each point stands now, and its history. */
public final class StatusBoard {
    /** Rows answered to one question for history. */
    private static final int MOST_STATES = 10_000;

    private static final Duration SHORTEST_LOOK_BACK = Duration.ofHours(3);

    private final Storage storage;
    private final InstantSource clock;

    public StatusBoard(Storage storage, InstantSource clock) {
        this.storage = storage;
        this.clock = clock;
    }

    /** Every point of the site in the order of the water's path. */
    public List<PointStatus> points(Site site) {
        Instant now = clock.instant();
        return storage.read(books -> {
            List<Alert> alerts = books.alerts().openAlerts(site.id());
            List<Batch> batches = books.place().batchesNow(site.id(), now);
            return books.place().points(site.id()).stream()
                    .map(point -> status(books, point, alerts, batches, now))
                    .toList();
        });
    }

    public Optional<PointStatus> point(Site site, String code) {
        Instant now = clock.instant();
        return storage.read(books -> books.place()
                .point(site.id(), code)
                .map(point -> status(
                        books,
                        point,
                        books.alerts().openAlerts(site.id()),
                        books.place().batchesNow(site.id(), now),
                        now)));
    }

    /** The newest water state of a point at or before a moment, if there was one in the hours before it. */
    public Optional<WaterState> stateAt(Point point, Instant at) {
        Duration back = point.maxGap().compareTo(SHORTEST_LOOK_BACK) < 0 ? SHORTEST_LOOK_BACK : point.maxGap();
        return storage.read(books -> books.water().newestOfEach(point.id(), at.minus(back), at, back)).stream()
                .reduce((earlier, later) -> later);
    }

    private static PointStatus status(Books books, Point point, List<Alert> alerts, List<Batch> batches, Instant now) {
        List<Limit> limits = books.limits().limits(point.id());
        return new PointStatus(
                point,
                books.water().newest(point.id()).orElse(null),
                limits,
                alerts.stream()
                        .filter(alert -> alert.pointId() == point.id())
                        .sorted(Comparator.comparing(Alert::priority).reversed())
                        .toList(),
                batches.stream().filter(b -> b.pointId() == point.id()).reduce((earlier, later) -> later),
                newestReadings(books, point, limits, now),
                now);
    }

    private static List<PointStatus.Known> newestReadings(Books books, Point point, List<Limit> limits, Instant now) {
        List<PointStatus.Known> known = new ArrayList<>();
        for (Sensor sensor : books.place().sensorsOf(point.id())) {
            if (limits.stream().anyMatch(limit -> limit.quantity() == sensor.quantity())) {
                newest(books, sensor, Freshness.of(sensor.quantity(), point), now)
                        .ifPresent(reading -> known.add(new PointStatus.Known(sensor.quantity(), reading)));
            }
        }
        known.sort(
                Comparator.comparing((PointStatus.Known k) -> k.reading().at()).reversed());
        return known;
    }

    private static Optional<StoredReading> newest(Books books, Sensor sensor, Duration gap, Instant now) {
        return books.readings().newestBefore(sensor.id(), now.minus(gap), now.plus(gap));
    }

    /**
     * Water states of a time span, oldest first; of each step only the newest.
     *
     * @param step zero for every state
     * @throws FieldFaultsException when that would be more than one answer can hold
     */
    public List<WaterState> history(Point point, Instant from, Instant to, Duration step) {
        requireFew(from, to, step);
        List<WaterState> states = storage.read(books -> step.isZero()
                ? books.water().between(point.id(), from, to, MOST_STATES + 1)
                : books.water().newestOfEach(point.id(), from, to, step));
        if (states.size() > MOST_STATES) {
            throw tooMany("states");
        }
        return states;
    }

    /**
     * Readings of one quantity at a point, by sensor, oldest first; of each step only the newest usable one.
     *
     * @param step zero for every reading, usable or not
     * @throws FieldFaultsException when that would be more than one answer can hold
     */
    public List<SensorReadings> readings(Point point, Quantity quantity, Instant from, Instant to, Duration step) {
        requireFew(from, to, step);
        return storage.read(books -> books.place().sensorsOf(point.id()).stream()
                .filter(sensor -> sensor.quantity() == quantity)
                .map(sensor -> new SensorReadings(sensor, readings(books, sensor, from, to, step)))
                .toList());
    }

    private static List<StoredReading> readings(Books books, Sensor sensor, Instant from, Instant to, Duration step) {
        if (step.isZero()) {
            List<StoredReading> all = books.readings().between(sensor.id(), from, to, MOST_STATES + 1);
            if (all.size() > MOST_STATES) {
                throw tooMany("readings");
            }
            return all;
        }
        LinkedList<StoredReading> newest = new LinkedList<>();
        Instant before = to.plusMillis(1);
        Optional<StoredReading> next = books.readings().newestBefore(sensor.id(), from, before);
        while (next.isPresent()) {
            newest.addFirst(next.get());
            long slot = Math.floorDiv(next.get().at().toEpochMilli(), step.toMillis());
            next = books.readings().newestBefore(sensor.id(), from, Instant.ofEpochMilli(slot * step.toMillis()));
        }
        return newest;
    }

    private static void requireFew(Instant from, Instant to, Duration step) {
        if (!step.isZero() && Duration.between(from, to).dividedBy(step) > MOST_STATES) {
            throw new FieldFaultsException(
                    "step",
                    "step " + step + " makes more than " + MOST_STATES + " rows; take a longer step or a shorter span");
        }
    }

    private static FieldFaultsException tooMany(String what) {
        return new FieldFaultsException(
                "step", "the span holds more than " + MOST_STATES + " " + what + "; add step, for example step=PT10M");
    }

    /** Readings of one sensor. */
    public record SensorReadings(Sensor sensor, List<StoredReading> readings) {}

    /** Closed alerts, newest first. */
    public List<Alert> closedAlerts(Site site, int most) {
        return storage.read(books -> books.alerts().closedAlerts(site.id(), most));
    }

    public Optional<Alert> alert(Site site, long id) {
        return storage.read(books -> books.alerts().alert(site.id(), id));
    }

    /** Who was told of an alert. */
    public List<OutboxBook.Message> messagesOf(Alert alert) {
        return storage.read(books -> books.outbox().messagesOf(alert.id()));
    }

    /** What was sent, newest first. */
    public List<OutboxBook.Message> messages(Site site, int most) {
        return storage.read(books -> books.outbox().messages(site.id(), most));
    }
}
