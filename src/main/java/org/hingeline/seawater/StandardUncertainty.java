package org.hingeline.seawater;

/**
 * A standard uncertainty (one standard deviation) in the unit of the quantity it belongs to.
 *
 * <p>The share of the constants is common to all readings of a water: it counts when a value is compared with a limit
 * ({@link #total}), and cancels when two values of the same water are compared with each other, in a trend or before and
 * after a dose ({@link #fromInputs}).
 *
 * @param total of both shares, in quadrature
 * @param fromConstants from the equilibrium constants and total boron
 * @param fromInputs from the measured inputs
 */
public record StandardUncertainty(double total, double fromConstants, double fromInputs) {
    static StandardUncertainty ofShares(double fromConstants, double fromInputs) {
        return new StandardUncertainty(Math.hypot(fromConstants, fromInputs), fromConstants, fromInputs);
    }
}
