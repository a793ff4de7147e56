package org.hingeline.kill;

import java.time.Instant;
import java.util.List;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/**
 * A row of a batch.
 *
 * @param refusal why it must be refused, if it must
 * @param repeat whether it was stored before
 */
record ReadingRow(
        Place.Sensor sensor,
        long atMillis,
        double value,
        boolean repeat,
        @Nullable String refusal) {

    /** A reading of the invented water; the same sensor and time always give the same value. */
    static ReadingRow of(Place.Sensor sensor, long atMillis) {
        return new ReadingRow(sensor, atMillis, valueOf(sensor, atMillis), false, null);
    }

    ReadingRow again() {
        return new ReadingRow(sensor, atMillis, value, true, null);
    }

    ReadingRow contradicted() {
        return new ReadingRow(sensor, atMillis, value + 0.125, true, "contradicts");
    }

    /** A pH that passes its limits and comes back within seconds, a temperature that does in a minute. */
    private static double valueOf(Place.Sensor sensor, long atMillis) {
        double phase = sensor.point().hashCode() % 7;
        double value = switch (sensor.quantity()) {
            case PH -> 7.75 + 0.35 * Math.sin(atMillis / 700.0 + phase);
            case TEMPERATURE -> 15 + 2 * Math.sin(atMillis / 9000.0 + phase);
            case SALINITY -> 30 + 0.5 * Math.sin(atMillis / 50_000.0);
            default -> 2050 + 30 * Math.sin(atMillis / 70_000.0);
        };
        return Math.round(value * 10_000) / 10_000.0;
    }

    Promises.Key key() {
        return new Promises.Key(sensor.code(), atMillis);
    }

    static String json(List<ReadingRow> rows) {
        return rows.stream()
                .map(row -> "{\"point\":\"" + row.sensor().point() + "\",\"quantity\":\""
                        + row.sensor().quantity().code() + "\",\"value\":" + row.value() + ",\"at\":\""
                        + Instant.ofEpochMilli(row.atMillis()) + "\",\"sensor\":\""
                        + row.sensor().code() + "\"}")
                .collect(Collectors.joining(",", "{\"readings\":[", "]}"));
    }
}
