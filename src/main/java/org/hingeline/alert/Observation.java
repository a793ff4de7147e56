package org.hingeline.alert;

import java.time.Instant;

/**
 * One value of a limit's quantity.
 *
 * @param at when the water was like this
 * @param value canonical unit, finite
 * @param standardUncertainty of the value, same unit, 0 or more
 */
public record Observation(Instant at, double value, double standardUncertainty) {
    public Observation {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("observed value " + value + " must be finite");
        }
        if (!(standardUncertainty >= 0)) {
            throw new IllegalArgumentException("standard uncertainty " + standardUncertainty + " must be 0 or more");
        }
    }
}
