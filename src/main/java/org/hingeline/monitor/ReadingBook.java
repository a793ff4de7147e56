package org.hingeline.monitor;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.quality.Flag;

/** Readings and refused rows. */
public interface ReadingBook {

    /**
     * A reading as stored.
     *
     * @param value canonical unit of the sensor's quantity
     */
    record StoredReading(long sensorId, Instant at, double value, Flag flag) {}

    /** A row that was not taken, kept for review. */
    record RefusedRow(long siteId, String gateway, Instant receivedAt, int index, String row, String detail) {}

    /** Readings of one sensor with from ≤ at ≤ to, oldest first, at most so many. */
    List<StoredReading> between(long sensorId, Instant from, Instant to, int most);

    /** All readings of one sensor with from ≤ at ≤ to, oldest first. */
    default List<StoredReading> between(long sensorId, Instant from, Instant to) {
        return between(sensorId, from, to, Integer.MAX_VALUE);
    }

    /** The newest usable reading of one sensor with from ≤ at &lt; before. */
    Optional<StoredReading> newestBefore(long sensorId, Instant from, Instant before);

    /** Time of the first usable reading of one sensor with after &lt; at ≤ to. */
    Optional<Instant> firstAfter(long sensorId, Instant after, Instant to);

    /** Time of the newest reading of any sensor of the point. */
    Optional<Instant> newestAt(long pointId);

    void insert(List<StoredReading> readings, long gatewayKeyId, Instant receivedAt);

    void insertRefused(List<RefusedRow> rows);

    /** Newest first. */
    List<RefusedRow> refused(long siteId, int most);

    void removeRefusedBefore(Instant time);
}
