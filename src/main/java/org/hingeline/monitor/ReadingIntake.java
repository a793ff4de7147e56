package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.monitor.KeyBook.GatewayKey;
import org.hingeline.monitor.ReadingBook.RefusedRow;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.monitor.ReadingCheck.Row;

/**
 * Takes in readings. Readings, water states, alerts and messages of a batch are one transaction; when {@link #take}
 * returns, all of it is on disk.
 *
 * <p>A batch larger than {@code rowsPerTransaction} is taken in several transactions, oldest rows first. If one fails,
 * those before it stay; the gateway sends the batch again and they are recognised as duplicates.
 */
public final class ReadingIntake {

    /** A row that was not taken. */
    public record Refusal(int index, String detail) {}

    /** What became of a batch. */
    public record Answer(int stored, int duplicates, List<Refusal> refused) {
        public Answer {
            refused = List.copyOf(refused);
        }
    }

    /** How rows are taken. */
    public record Rules(Duration futureTolerance, int rowsPerTransaction) {}

    private static final double DENSITY_LEEWAY = 0.002;

    private static final class Tally {
        final List<StoredReading> fresh = new ArrayList<>();
        final Map<Integer, String> refused = new TreeMap<>();
        int duplicates;
    }

    private final Storage storage;
    private final InstantSource clock;
    private final Rules rules;
    private final WaterLedger ledger;
    private final LitreReadings litres;
    private final AlertWatch watch;
    private final Signals signals;

    public ReadingIntake(
            Storage storage, InstantSource clock, Rules rules, WaterRules water, AlertWatch watch, Signals signals) {
        this.storage = storage;
        this.clock = clock;
        this.rules = rules;
        this.ledger = new WaterLedger(water);
        this.litres = new LitreReadings(water.ageLimits());
        this.watch = watch;
        this.signals = signals;
    }

    public Answer take(GatewayKey gateway, List<IncomingReading> batch) {
        Instant now = clock.instant();
        ReadingCheck check = storage.read(books -> new ReadingCheck(
                books.place().points(gateway.siteId()),
                books.place().sensors(gateway.siteId()),
                now,
                rules.futureTolerance()));
        ReadingCheck.Sorted sorted = check.sort(batch);
        Map<Integer, String> refused = sorted.refused();
        List<Row> rows = sorted.rows();
        if (!sorted.perLitre().isEmpty()) {
            List<StoredReading> others = rows.stream().map(Row::reading).toList();
            rows.addAll(storage.read(books -> litres.convert(books, sorted.perLitre(), others, refused)));
        }
        rows.sort(Comparator.comparing(row -> row.reading().at()));
        int stored = 0;
        int duplicates = 0;
        for (int from = 0; from < rows.size(); from += rules.rowsPerTransaction()) {
            List<Row> part = rows.subList(from, Math.min(rows.size(), from + rules.rowsPerTransaction()));
            Tally tally = storage.write(books -> store(books, gateway, part, now));
            stored += tally.fresh.size();
            duplicates += tally.duplicates;
            refused.putAll(tally.refused);
        }
        keepRefused(gateway, batch, refused, now);
        signals.siteChanged(gateway.siteId());
        return new Answer(
                stored,
                duplicates,
                refused.entrySet().stream()
                        .map(entry -> new Refusal(entry.getKey(), entry.getValue()))
                        .toList());
    }

    private Tally store(Books books, GatewayKey gateway, List<Row> rows, Instant now) {
        Map<Long, Sensor> sensors = books.place().sensors(gateway.siteId()).stream()
                .collect(Collectors.toMap(Sensor::id, Function.identity()));
        books.place()
                .lockPoints(rows.stream()
                        .map(row -> pointOf(sensors, row.reading()))
                        .distinct()
                        .toList());
        Tally tally = new Tally();
        sift(books, rows, tally);
        books.readings().insert(tally.fresh, gateway.id(), now);
        books.keys().gatewayHeard(gateway.id(), now);
        assess(books, gateway.siteId(), sensors, tally.fresh, now);
        return tally;
    }

    /** Tells fresh rows from those already stored, or standing twice in the batch. */
    private static void sift(Books books, List<Row> rows, Tally tally) {
        Map<Long, List<Row>> bySensor =
                rows.stream().collect(Collectors.groupingBy(row -> row.reading().sensorId()));
        bySensor.forEach((sensorId, ofSensor) -> {
            NavigableSet<Instant> times = new TreeSet<>();
            ofSensor.forEach(row -> times.add(row.reading().at()));
            Map<Instant, Double> known = new HashMap<>();
            for (NavigableSet<Instant> spell : Spells.of(times)) {
                books.readings()
                        .between(sensorId, spell.first(), spell.last())
                        .forEach(r -> known.put(r.at(), r.value()));
            }
            for (Row row : ofSensor) {
                StoredReading reading = row.reading();
                Double standing = known.putIfAbsent(reading.at(), reading.value());
                if (standing == null) {
                    tally.fresh.add(reading);
                } else if (same(standing, row)) {
                    tally.duplicates++;
                } else {
                    tally.refused.put(
                            row.incoming().index(),
                            "value " + reading.value() + " contradicts " + standing
                                    + ", which this sensor already reported for " + reading.at());
                }
            }
        });
    }

    /**
     * Whether a value is the standing one again. One per litre, sent again after a late temperature has come, may have
     * found another density: 5 °C or 2 of salinity make 0.15 %. The last digit of a titration is more than that.
     */
    private static boolean same(double standing, Row row) {
        double value = row.reading().value();
        return standing == value
                || (row.unit().perLitre() && Math.abs(value - standing) <= DENSITY_LEEWAY * Math.abs(standing));
    }

    private void assess(Books books, long siteId, Map<Long, Sensor> sensors, List<StoredReading> fresh, Instant now) {
        if (fresh.isEmpty()) {
            return;
        }
        Map<Long, List<StoredReading>> byPoint =
                fresh.stream().collect(Collectors.groupingBy(reading -> pointOf(sensors, reading)));
        Map<Long, Point> points =
                books.place().points(siteId).stream().collect(Collectors.toMap(Point::id, Function.identity()));
        List<AlertWatch.News> news = new ArrayList<>();
        byPoint.forEach((pointId, readings) -> {
            List<Sensor> here = sensors.values().stream()
                    .filter(sensor -> sensor.pointId() == pointId)
                    .toList();
            List<WaterState> states = ledger.assess(books, pointId, here, readings);
            Point point = points.get(pointId);
            if (point == null) {
                throw new IllegalStateException("point " + pointId + " vanished");
            }
            news.add(new AlertWatch.News(point, readings, here, states));
        });
        watch.observe(books, siteId, news, now);
    }

    private void keepRefused(
            GatewayKey gateway, List<IncomingReading> batch, Map<Integer, String> refused, Instant now) {
        if (refused.isEmpty()) {
            return;
        }
        List<RefusedRow> rows = batch.stream()
                .filter(row -> refused.containsKey(row.index()))
                .map(row -> new RefusedRow(
                        gateway.siteId(),
                        gateway.gateway(),
                        now,
                        row.index(),
                        row.text(),
                        refused.getOrDefault(row.index(), "")))
                .toList();
        storage.writeOnly(books -> {
            books.readings().insertRefused(rows);
            books.keys().gatewayHeard(gateway.id(), now);
        });
    }

    private static Sensor sensorOf(Map<Long, Sensor> sensors, StoredReading reading) {
        Sensor sensor = sensors.get(reading.sensorId());
        if (sensor == null) {
            throw new IllegalStateException("sensor " + reading.sensorId() + " vanished");
        }
        return sensor;
    }

    private static long pointOf(Map<Long, Sensor> sensors, StoredReading reading) {
        return sensorOf(sensors, reading).pointId();
    }
}
