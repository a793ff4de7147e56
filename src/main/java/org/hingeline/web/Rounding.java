package org.hingeline.web;

import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers with as many significant digits as they are worth, so that no binary dust stands behind them. */
final class Rounding {
    private static final double[] POWERS = new double[23];

    static {
        for (int i = 0; i < POWERS.length; i++) {
            // exact up to 10^22
            POWERS[i] = Double.parseDouble("1e" + i);
        }
    }

    private Rounding() {}

    /**
     * The nearest number of that many significant decimal digits.
     *
     * @param digits 1 to 15
     */
    static double to(double value, int digits) {
        if (value == 0 || !Double.isFinite(value)) {
            return value;
        }
        int decimals = digits - 1 - (int) Math.floor(Math.log10(Math.abs(value)));
        return decimals >= 0 && decimals < POWERS.length
                // whole numbers below 10^15 and these powers are exact, so the quotient is the nearest double
                ? Math.rint(value * POWERS[decimals]) / POWERS[decimals]
                : new BigDecimal(value).round(new MathContext(digits)).doubleValue();
    }
}
