package org.hingeline.alert;

import java.time.Duration;
import org.hingeline.measure.Quantity;

/**
 * An operator's limit on one quantity at one point.
 *
 * @param threshold in the quantity's canonical unit
 * @param deadband how far back inside the value must come before it counts as back, canonical unit, 0 or more
 * @param onDelay how long the value must be out before the alert is raised, 0 to 24 h
 * @param offDelay how long it must be back before the alert returns to normal, 0 to 24 h
 * @param action what a person is to do about it, 1 to 300 characters
 */
public record Limit(
        long id,
        long pointId,
        String name,
        Quantity quantity,
        Side side,
        double threshold,
        double deadband,
        Duration onDelay,
        Duration offDelay,
        Priority priority,
        String action) {

    private static final Duration MAX_DELAY = Duration.ofHours(24);

    public Limit {
        if (!Double.isFinite(threshold)) {
            throw new IllegalArgumentException(side.code() + " " + threshold + " must be a finite number");
        }
        if (!(deadband >= 0 && Double.isFinite(deadband))) {
            throw new IllegalArgumentException("deadband " + deadband + " must be 0 or more");
        }
        checkDelay("onDelayMin", onDelay);
        checkDelay("offDelayMin", offDelay);
        if (action.isBlank() || action.length() > 300) {
            throw new IllegalArgumentException("action must say what to do, in 1 to 300 characters");
        }
    }

    /** Whether this is the watch over the point's silence rather than over its water. */
    public boolean onSilence() {
        return quantity == Quantity.SILENCE;
    }

    /** Whether a value, in the canonical unit, is out of this limit. */
    public boolean isPast(double value) {
        return side.out(value, threshold);
    }

    private static void checkDelay(String field, Duration delay) {
        if (delay.isNegative() || delay.compareTo(MAX_DELAY) > 0) {
            throw new IllegalArgumentException(field + " " + delay.toSeconds() / 60.0 + " must be 0 to 1440");
        }
    }
}
