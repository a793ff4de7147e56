package org.hingeline.seawater;

import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/**
 * First-order propagation of the standard uncertainties of inputs and constants to every quantity of a solved water
 * (JCGM 100:2008, eq. 10, independent inputs).
 *
 * <p>A water is fixed by ln [H] and inorganic carbon; the two known quantities are functions of these and of the
 * parameters (constants, temperature, salinity). Inverting that two-by-two system tells how [H] and carbon answer to
 * each input and parameter, and the chain rule carries it to all quantities: one way for every pair. It costs five
 * evaluations of the constants.
 */
public final class Uncertainty {
    private static final double[] NO_DIRECT_SLOPE = new double[Sensitivity.QUANTITIES];

    private final Sensitivity slopes;
    private final int first;
    private final int second;
    private final double determinant;

    private Uncertainty(CarbonateState state) {
        KnownPair known = state.known();
        PhScale scale = known instanceof PhAndAlkalinity pair ? pair.scale() : PhScale.TOTAL;
        slopes = new Sensitivity(
                SeawaterConstants.of(state.conditions()),
                state.conditions(),
                Math.pow(10, -state.phTotal()),
                state.dic(),
                scale);
        first = known instanceof PhAndAlkalinity ? Sensitivity.PH : Sensitivity.TA;
        second = known instanceof PhAndAlkalinity
                ? Sensitivity.TA
                : known instanceof AlkalinityAndDic ? Sensitivity.DIC : Sensitivity.PCO2;
        determinant = slopes.withLnH[first] * slopes.withDic[second] - slopes.withLnH[second] * slopes.withDic[first];
    }

    /** With the uncertainties of the constants of {@link ConstantUncertainty#ORR_2018}. */
    public static StateUncertainty of(CarbonateState state, InputUncertainty inputs) {
        return of(state, inputs, ConstantUncertainty.ORR_2018);
    }

    /**
     * The standard uncertainty of every quantity of a solved water.
     *
     * @param state a water solved by {@link CarbonateSystem}
     * @param inputs of what was measured
     * @param constants of the equilibrium constants and total boron
     */
    public static StateUncertainty of(CarbonateState state, InputUncertainty inputs, ConstantUncertainty constants) {
        return new Uncertainty(state).propagate(inputs, constants.asLogarithms());
    }

    private StateUncertainty propagate(InputUncertainty inputs, double[] ofConstants) {
        double[] variance = new double[Sensitivity.QUANTITIES];
        for (int p = 0; p < Sensitivity.CONSTANTS; p++) {
            addParameter(variance, p, ofConstants[p]);
        }
        double[] fromConstants = variance;
        variance = new double[Sensitivity.QUANTITIES];
        addInput(variance, inputOf(first, inputs), 0);
        addInput(variance, 0, inputOf(second, inputs));
        addParameter(variance, Sensitivity.TEMPERATURE, inputs.temperatureC());
        addParameter(variance, Sensitivity.SALINITY, inputs.salinity());
        return result(fromConstants, variance);
    }

    private static double inputOf(int quantity, InputUncertainty inputs) {
        return switch (quantity) {
            case Sensitivity.PH -> inputs.ph();
            case Sensitivity.TA -> inputs.totalAlkalinity();
            case Sensitivity.DIC -> inputs.dic();
            case Sensitivity.PCO2 -> inputs.pco2Atm();
            default -> throw new IllegalArgumentException("no input is quantity " + quantity);
        };
    }

    /** The known quantities move by these amounts, the parameters stay. */
    private void addInput(double[] variance, double moveOfFirst, double moveOfSecond) {
        add(variance, moveOfFirst, moveOfSecond, NO_DIRECT_SLOPE, 1);
    }

    /** A parameter moves, and [H] and carbon with it so that the known quantities stay. */
    private void addParameter(double[] variance, int parameter, double amount) {
        double[] direct = slopes.with[parameter];
        add(variance, -direct[first], -direct[second], direct, amount);
    }

    private void add(double[] variance, double moveOfFirst, double moveOfSecond, double[] direct, double amount) {
        double lnH = (moveOfFirst * slopes.withDic[second] - moveOfSecond * slopes.withDic[first]) / determinant;
        double dic = (moveOfSecond * slopes.withLnH[first] - moveOfFirst * slopes.withLnH[second]) / determinant;
        for (int q = 0; q < variance.length; q++) {
            // the direct slope of pH is that of the step between scales, no part of the total-scale pH
            double own = q == Sensitivity.PH ? 0 : direct[q];
            double move = (own + slopes.withLnH[q] * lnH + slopes.withDic[q] * dic) * amount;
            variance[q] += move * move;
        }
    }

    private static StateUncertainty result(double[] fromConstants, double[] fromInputs) {
        StandardUncertainty[] u = new StandardUncertainty[fromInputs.length];
        for (int q = 0; q < u.length; q++) {
            u[q] = StandardUncertainty.ofShares(Math.sqrt(fromConstants[q]), Math.sqrt(fromInputs[q]));
        }
        return new StateUncertainty(
                u[Sensitivity.PH],
                u[Sensitivity.TA],
                u[Sensitivity.DIC],
                u[Sensitivity.CO2],
                u[Sensitivity.BICARBONATE],
                u[Sensitivity.CARBONATE],
                u[Sensitivity.FCO2],
                u[Sensitivity.PCO2],
                u[Sensitivity.OMEGA_ARAGONITE],
                u[Sensitivity.OMEGA_CALCITE]);
    }
}
