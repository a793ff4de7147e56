package org.hingeline.seawater;

import java.util.function.DoubleUnaryOperator;

/** Halving of a bracket down to neighbouring doubles: at most about 60 steps from a bracket of order 1. */
final class Bisection {
    private Bisection() {}

    /**
     * The root of a function that rises from below 0 to above 0 over the bracket.
     *
     * @throws IllegalArgumentException when the bracket does not hold a root
     */
    static double root(DoubleUnaryOperator function, double low, double high) {
        if (!(function.applyAsDouble(low) <= 0 && function.applyAsDouble(high) >= 0)) {
            throw new IllegalArgumentException("no root between " + low + " and " + high);
        }
        double below = low;
        double above = high;
        double middle = below + (above - below) / 2;
        while (middle > below && middle < above) {
            if (function.applyAsDouble(middle) < 0) {
                below = middle;
            } else {
                above = middle;
            }
            middle = below + (above - below) / 2;
        }
        return above;
    }
}
