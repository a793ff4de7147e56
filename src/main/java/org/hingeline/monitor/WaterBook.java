package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;

/** Water states, and the spans of them that late readings have made out of date. */
public interface WaterBook {

    /** States of the point in (after, to] are to be computed again. */
    record Span(long id, long pointId, Instant after, Instant to) {}

    /** Times of the states of a point at or after a time, oldest first. */
    List<Instant> timesFrom(long pointId, Instant from, int most);

    /** Saves each state, in place of one of the same point and time. */
    void save(List<WaterState> states);

    Optional<WaterState> newest(long pointId);

    /** The newest state with numbers. */
    Optional<WaterState> newestComplete(long pointId);

    /** States with from ≤ at ≤ to, oldest first. */
    List<WaterState> between(long pointId, Instant from, Instant to, int most);

    /** Of each step between from and to (steps count from the epoch) the newest state, oldest first. */
    List<WaterState> newestOfEach(long pointId, Instant from, Instant to, Duration step);

    void addSpan(long pointId, Instant after, Instant to);

    Optional<Span> nextSpan();

    /** Shortens the span to begin later. */
    void moveSpan(long spanId, Instant after);

    void removeSpan(long spanId);
}
