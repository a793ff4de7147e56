package org.hingeline.web.view;

import java.util.function.DoubleUnaryOperator;
import java.util.function.ToDoubleFunction;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.hingeline.seawater.KnownPh;

/**
 * Ω aragonite of one water when its two known quantities were others and all else stayed. Values are in the units of
 * {@link Quantity}: pH on the scale and at the temperature it was read, µmol/kg, µatm.
 */
final class OmegaField {
    private static final double MICRO = 1e-6;

    private final CarbonateState state;

    OmegaField(CarbonateState state) {
        this.state = state;
    }

    /** The first known quantity: left to right. */
    Quantity first() {
        KnownPair known = state.known();
        return known.ph() != null
                ? Quantity.PH
                : known instanceof DicAndPco2 ? Quantity.DIC : Quantity.TOTAL_ALKALINITY;
    }

    /** The second: upwards. */
    Quantity second() {
        KnownPair known = state.known();
        if (known instanceof PhAndAlkalinity) {
            return Quantity.TOTAL_ALKALINITY;
        }
        return known instanceof PhAndDic || known instanceof AlkalinityAndDic ? Quantity.DIC : Quantity.PCO2;
    }

    /** The value of the first as it was given. */
    double firstValue() {
        return value(first());
    }

    /** The value of the second as it was given. */
    double secondValue() {
        return value(second());
    }

    private double value(Quantity quantity) {
        KnownPh ph = state.known().ph();
        if (quantity == Quantity.PH && ph != null) {
            return ph.value();
        }
        ToDoubleFunction<CarbonateState> of = quantity == Quantity.TOTAL_ALKALINITY
                ? CarbonateState::totalAlkalinity
                : quantity == Quantity.DIC ? CarbonateState::dic : CarbonateState::pco2Atm;
        return of.applyAsDouble(state) / MICRO;
    }

    /** Ω aragonite with these two; not a number where there is no such water. */
    double at(double first, double second) {
        return CarbonateSystem.solve(state.constants(), state.conditions(), pair(first, second))
                        instanceof Solved solved
                ? solved.state().omegaAragonite()
                : Double.NaN;
    }

    private KnownPair pair(double first, double second) {
        KnownPair known = state.known();
        KnownPh was = known.ph();
        double one = first * MICRO;
        double other = second * MICRO;
        if (was == null) {
            return known instanceof AlkalinityAndDic
                    ? new AlkalinityAndDic(one, other)
                    : known instanceof AlkalinityAndPco2
                            ? new AlkalinityAndPco2(one, other)
                            : new DicAndPco2(one, other);
        }
        KnownPh ph = new KnownPh(first, was.scale(), was.readAtC());
        return known instanceof PhAndAlkalinity
                ? new PhAndAlkalinity(ph, other)
                : known instanceof PhAndDic ? new PhAndDic(ph, other) : new PhAndPco2(ph, other);
    }

    /** Ω over a rectangle, by row from the bottom, then column from the left, the edges included. */
    double[][] grid(Range across, Range up, int columns, int rows) {
        double[][] values = new double[rows][columns];
        for (int row = 0; row < rows; row++) {
            for (int column = 0; column < columns; column++) {
                values[row][column] = at(across.at((double) column / (columns - 1)), up.at((double) row / (rows - 1)));
            }
        }
        return values;
    }

    /** From low to high. */
    record Range(double low, double high) {
        Range {
            if (!(low < high)) {
                throw new IllegalArgumentException("a range from " + low + " to " + high + " is empty");
            }
        }

        double at(double share) {
            return low + share * (high - low);
        }

        double share(double value) {
            return (value - low) / (high - low);
        }

        boolean holds(double value) {
            return value >= low && value <= high;
        }
    }

    /** Where along the first quantity Ω is {@code omega}, the second as given; not a number when not within the range. */
    double firstFor(double omega, Range across) {
        double second = secondValue();
        return crossing(omega, across, first -> at(first, second));
    }

    /** Where along the second quantity Ω is {@code omega}, the first as given; not a number when not within the range. */
    double secondFor(double omega, Range up) {
        double first = firstValue();
        return crossing(omega, up, second -> at(first, second));
    }

    /** By halving: Ω rises or falls all the way along any one of the four quantities. */
    private static double crossing(double omega, Range range, DoubleUnaryOperator along) {
        double low = range.low();
        double high = range.high();
        double atLow = along.applyAsDouble(low);
        double atHigh = along.applyAsDouble(high);
        if (!((atLow - omega) * (atHigh - omega) <= 0)) {
            return Double.NaN;
        }
        for (int halving = 0; halving < 60; halving++) {
            double middle = (low + high) / 2;
            boolean likeLow = along.applyAsDouble(middle) < omega == atLow < omega;
            low = likeLow ? middle : low;
            high = likeLow ? high : middle;
        }
        return (low + high) / 2;
    }
}
