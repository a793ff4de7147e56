package org.hingeline.monitor;

import java.time.Duration;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.Quantity;

/** How long the newest value of a quantity speaks for the present of a point. */
final class Freshness {
    /**
     * For what is mostly titrated or counted by hand, every day or two (common practice, no source): 3 days let one
     * sample fail, as the standard age limit of alkalinity does. Held to the gap of a sensor that reports every few
     * minutes, a limit on alkalinity would call its point silent all day.
     */
    static final Duration BY_HAND = Duration.ofDays(3);

    private Freshness() {}

    static Duration of(Quantity quantity, Point point) {
        return switch (quantity) {
            case TOTAL_ALKALINITY, DIC, CALCIUM, AMMONIA ->
                point.maxGap().compareTo(BY_HAND) > 0 ? point.maxGap() : BY_HAND;
            default -> point.maxGap();
        };
    }
}
