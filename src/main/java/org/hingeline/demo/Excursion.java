package org.hingeline.demo;

import java.time.Duration;
import java.time.Instant;

/**
 * Low-pH water that comes soon after a start and again every 45 minutes, so that whoever looks on sees an alert come and
 * go. It comes far faster than in any bay: the demonstration is for people with minutes.
 *
 * @param start before which there is none
 */
record Excursion(Instant start) {
    static final Duration EVERY = Duration.ofMinutes(45);

    private static final double RISE_S = 16;
    private static final double HOLD_S = 360;
    private static final double FALL_S = 60;

    /**
     * How much of it is there, 0 to 1.
     *
     * @param arrival how long after the start it reaches the place
     */
    double at(Instant time, Duration arrival) {
        double since = Duration.between(start.plus(arrival), time).toMillis() / 1000.0;
        if (since <= 0) {
            return 0;
        }
        double into = since % EVERY.toSeconds();
        return BayWater.smooth(into / RISE_S) * (1 - BayWater.smooth((into - RISE_S - HOLD_S) / FALL_S));
    }
}
