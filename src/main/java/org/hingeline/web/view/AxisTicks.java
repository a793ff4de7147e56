package org.hingeline.web.view;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.hingeline.measure.UnitConversion;

/**
 * Round values along an axis, in the unit that a person reads.
 *
 * @param values in the reader's unit, low to high
 * @param digits decimals that tell them apart
 */
record AxisTicks(List<Double> values, int digits) {
    private static final double[] STEPS = {1, 2, 2.5, 5, 10};

    AxisTicks {
        values = List.copyOf(values);
    }

    /** At most {@code most} of them strictly between low and high. */
    static AxisTicks between(double low, double high, int most) {
        double least = (high - low) / most;
        double decade = Math.pow(10, Math.floor(Math.log10(least)));
        double step = 10 * decade;
        for (double candidate : STEPS) {
            if (candidate * decade >= least * (1 - 1e-9)) {
                step = candidate * decade;
                break;
            }
        }
        List<Double> values = new ArrayList<>();
        for (double i = Math.floor(low / step) + 1; i * step < high; i++) {
            values.add(i * step);
        }
        return new AxisTicks(values, digitsOf(step));
    }

    private static int digitsOf(double step) {
        int digits = 0;
        for (double scaled = step; Math.abs(scaled - Math.rint(scaled)) > 1e-6 && digits < 9; scaled *= 10) {
            digits++;
        }
        return digits;
    }

    /** With thousands set apart by a space that does not break. */
    static String label(double value, int digits) {
        return String.format(Locale.ROOT, "%,." + digits + "f", value)
                .replace(",", "\u00a0")
                .replace('-', '\u2212');
    }

    /** A canonical value in the reader's unit, with digits fit for telling thousandths of the range apart. */
    static String reading(double canonical, UnitConversion unit, double canonicalRange) {
        double resolution = unit.uncertaintyFromCanonical(canonicalRange) / 100;
        int digits = (int) Math.max(0, Math.floor(-Math.log10(resolution) + 1e-9));
        return label(unit.fromCanonical(canonical), digits);
    }
}
