package org.hingeline.quality;

import org.hingeline.measure.Quantity;

/**
 * The gross range test: a value that the instrument cannot show at all fails.
 *
 * <p>Source: QARTOD manuals, test 4; the thresholds are left to the operator there, the starting ones are
 * {@link Quantity#sensorMin()} and {@link Quantity#sensorMax()}.
 */
public final class GrossRange {
    private GrossRange() {}

    /** @param value in the quantity's canonical unit */
    public static Flag test(Quantity quantity, double value) {
        return value >= quantity.sensorMin() && value <= quantity.sensorMax() ? Flag.PASS : Flag.FAIL;
    }
}
