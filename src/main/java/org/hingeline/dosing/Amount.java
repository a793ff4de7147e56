package org.hingeline.dosing;

/**
 * A number with the range that one standard uncertainty gives it.
 *
 * @param value the number
 * @param low its lower end
 * @param high its upper end
 */
public record Amount(double value, double low, double high) {
    Amount times(double factor) {
        return new Amount(value * factor, low * factor, high * factor);
    }
}
