package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.format.DateTimeParseException;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.LitreReadings.PerLitre;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.quality.GrossRange;
import org.jspecify.annotations.Nullable;

/** Judges the rows of one batch against the place as it is registered: which sensor, which unit, which time. */
final class ReadingCheck {
    /** Before this no gateway of this service was running; such a time is a clock that was never set. */
    private static final Instant EARLIEST = Instant.parse("2000-01-01T00:00:00Z");

    private static final int SHOWN = 12;

    /** A row in canonical units; {@code unit} is the one it came in. */
    record Row(IncomingReading incoming, StoredReading reading, UnitChoice unit) {}

    /** The rows that can be stored as they are, those that wait for a density, and why the others are refused, by index. */
    record Sorted(List<Row> rows, List<PerLitre> perLitre, Map<Integer, String> refused) {}

    private final Map<String, Point> points;
    private final Map<Long, List<Sensor>> sensors;
    private final Instant latest;
    private final Duration tolerance;
    private final Map<String, Instant> times = new HashMap<>();

    ReadingCheck(List<Point> points, List<Sensor> sensors, Instant now, Duration futureTolerance) {
        this.points = points.stream().collect(Collectors.toMap(Point::code, p -> p));
        this.sensors = sensors.stream().collect(Collectors.groupingBy(Sensor::pointId));
        this.latest = now.plus(futureTolerance);
        this.tolerance = futureTolerance;
    }

    /** Judges every row; times are cut to whole milliseconds. */
    Sorted sort(List<IncomingReading> batch) {
        Sorted sorted = new Sorted(new ArrayList<>(batch.size()), new ArrayList<>(), new TreeMap<>());
        for (IncomingReading incoming : batch) {
            try {
                check(incoming, sorted);
            } catch (RowRefusedException e) {
                sorted.refused().put(incoming.index(), e.getMessage());
            }
        }
        return sorted;
    }

    private void check(IncomingReading row, Sorted sorted) throws RowRefusedException {
        String fault = row.fault();
        if (fault != null) {
            throw new RowRefusedException(fault);
        }
        String pointCode = required("point", row.point());
        Point point = points.get(pointCode);
        if (point == null) {
            throw new RowRefusedException("point " + Texts.quoted(pointCode) + " is not known at this site; known: "
                    + listed(points.keySet().stream().sorted().toList()));
        }
        String code = required("quantity", row.quantity());
        Quantity quantity = Quantity.ofCode(code)
                .filter(Quantity::measured)
                .orElseThrow(() -> new RowRefusedException(
                        "quantity " + Texts.quoted(code) + " cannot be posted; accepted: " + Quantity.measuredCodes()));
        Sensor sensor = sensorOf(point, quantity, row.sensor());
        String named = row.unit() == null ? sensor.unit() : row.unit();
        UnitChoice unit = Units.find(quantity, named)
                .orElseThrow(() -> new RowRefusedException("unit " + Texts.quoted(named) + " is not accepted for "
                        + code + "; accepted: " + Units.codes(quantity)));
        Double value = row.value();
        if (value == null || !Double.isFinite(value)) {
            throw new RowRefusedException(
                    value == null
                            ? "value is missing; a finite number is needed"
                            : "value " + value + " is not a finite number");
        }
        Instant at = time(required("at", row.at()));
        if (unit.perLitre()) {
            sorted.perLitre().add(new PerLitre(row, point, sensor, at, value, unit));
        } else {
            sorted.rows().add(row(row, sensor, at, unit.conversion().toCanonical(value), unit));
        }
    }

    /** A row once its value is in the canonical unit. */
    static Row row(IncomingReading incoming, Sensor sensor, Instant at, double canonical, UnitChoice unit)
            throws RowRefusedException {
        Quantity quantity = sensor.quantity();
        if (!Double.isFinite(canonical)) {
            throw new RowRefusedException("value " + incoming.value() + " " + unit.ucum()
                    + " is too large to be a number in " + quantity.unit().ucum());
        }
        return new Row(
                incoming, new StoredReading(sensor.id(), at, canonical, GrossRange.test(quantity, canonical)), unit);
    }

    private Sensor sensorOf(Point point, Quantity quantity, @Nullable String code) throws RowRefusedException {
        List<Sensor> here = sensors.getOrDefault(point.id(), List.of());
        if (code != null) {
            Sensor named =
                    here.stream().filter(s -> s.code().equals(code)).findFirst().orElse(null);
            if (named == null) {
                throw new RowRefusedException("sensor " + Texts.quoted(code) + " is not registered at " + point.code()
                        + "; registered: " + codes(here));
            }
            if (named.quantity() != quantity) {
                throw new RowRefusedException("sensor " + Texts.quoted(code) + " measures "
                        + named.quantity().code() + ", not " + quantity.code());
            }
            return named;
        }
        List<Sensor> fitting =
                here.stream().filter(s -> s.quantity() == quantity).toList();
        if (fitting.isEmpty()) {
            throw new RowRefusedException("no sensor for " + quantity.code() + " is registered at " + point.code()
                    + "; registered: " + codes(here));
        }
        if (fitting.size() > 1) {
            throw new RowRefusedException("sensor is missing: " + point.code() + " has several for " + quantity.code()
                    + ": " + codes(fitting));
        }
        return fitting.get(0);
    }

    private Instant time(String text) throws RowRefusedException {
        Instant known = times.get(text);
        if (known != null) {
            return known;
        }
        Instant at;
        try {
            at = OffsetDateTime.parse(text).toInstant().truncatedTo(ChronoUnit.MILLIS);
        } catch (DateTimeParseException e) {
            throw new RowRefusedException(
                    "at " + Texts.quoted(text) + " is not an ISO 8601 time with offset such as 2026-05-14T03:20:00Z");
        }
        if (at.isAfter(latest)) {
            throw new RowRefusedException(
                    "at " + Texts.quoted(text) + " is in the future; accepted up to " + tolerance.toSeconds()
                            + " s ahead of the service's clock, which allows " + latest.truncatedTo(ChronoUnit.SECONDS)
                            + " now. Check the gateway's clock");
        }
        if (at.isBefore(EARLIEST)) {
            throw new RowRefusedException(
                    "at " + Texts.quoted(text) + " is before " + EARLIEST + ". Check the gateway's clock");
        }
        times.put(text, at);
        return at;
    }

    private static String required(String field, @Nullable String value) throws RowRefusedException {
        if (value == null || value.isBlank()) {
            throw new RowRefusedException(field + " is missing");
        }
        return value;
    }

    private static String codes(List<Sensor> sensors) {
        return sensors.isEmpty()
                ? "none"
                : listed(sensors.stream()
                        .map(s -> s.code() + " (" + s.quantity().code() + ")")
                        .toList());
    }

    private static String listed(List<String> names) {
        String shown = names.stream().limit(SHOWN).collect(Collectors.joining(", "));
        return names.size() > SHOWN ? shown + " and " + (names.size() - SHOWN) + " more" : shown;
    }
}
