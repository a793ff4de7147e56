package org.hingeline.seawater;

/**
 * How each quantity of a water moves with ln [H], with inorganic carbon, and at fixed [H] and carbon with each constant,
 * temperature, salinity and measured calcium.
 *
 * <p>Slopes with [H], carbon, the constants and calcium are closed forms. Those with temperature and salinity pass
 * through every fit at once and are differences of smooth functions over a step so small that curvature leaves about
 * six correct digits, and so large that rounding does. Next to salinity 0, where the fits go with its square root, no
 * slope holds for long, and the step is that of a good salinometer.
 */
final class Sensitivity {
    // quantities, the rows
    static final int PH = 0;
    static final int TA = 1;
    static final int DIC = 2;
    static final int CO2 = 3;
    static final int BICARBONATE = 4;
    static final int CARBONATE = 5;
    static final int FCO2 = 6;
    static final int PCO2 = 7;
    static final int OMEGA_ARAGONITE = 8;
    static final int OMEGA_CALCITE = 9;
    static final int QUANTITIES = 10;

    // what they move with: logarithms of the constants first, then temperature, salinity and measured calcium
    private static final int K0 = 0;
    private static final int K1 = 1;
    private static final int K2 = 2;
    private static final int KB = 3;
    private static final int KW = 4;
    private static final int KSP_ARAGONITE = 5;
    private static final int KSP_CALCITE = 6;
    private static final int BORON = 7;
    static final int CONSTANTS = 8;
    static final int TEMPERATURE = 8;
    static final int SALINITY = 9;
    static final int CALCIUM = 10;
    static final int PARAMETERS = 11;

    private static final double STEP_C = 1e-5;
    private static final double STEP_S = 1e-5;
    private static final double NEARLY_FRESH = 1;
    private static final double STEP_S_NEARLY_FRESH = 0.01;

    /** d quantity / d ln [H]. */
    final double[] withLnH = new double[QUANTITIES];
    /** d quantity / d DIC. */
    final double[] withDic = new double[QUANTITIES];
    /** d quantity / d parameter at fixed [H] and DIC. */
    final double[][] with = new double[PARAMETERS][QUANTITIES];
    /** d (what turns pH on the scale looked at into pH on the total scale) / d temperature. */
    final double scaleWithTemperature;
    /** The same / d salinity. */
    final double scaleWithSalinity;

    private final SeawaterConstants k;
    private final Conditions conditions;
    private final Speciation s;

    /**
     * @param scale the scale on which pH is looked at: between the scales lies a step that moves with the water
     */
    Sensitivity(SeawaterConstants constants, Conditions conditions, double h, double dic, PhScale scale) {
        this.k = constants;
        this.conditions = conditions;
        this.s = Speciation.of(k, conditions, h, dic);
        double d = h * h + k.k1 * h + k.k1 * k.k2;
        double[] share = {h * h / d, k.k1 * h / d, k.k1 * k.k2 / d};
        withHydrogenIon(share);
        withCarbon(share);
        withConstants(share);
        withCalcium();
        SeawaterConstants warmer = k.near(k.temperatureC + STEP_C, k.salinity);
        difference(with[TEMPERATURE], warmer, STEP_C);
        scaleWithTemperature = scaleStep(warmer, scale) / STEP_C;
        double stepS = k.salinity < NEARLY_FRESH ? STEP_S_NEARLY_FRESH : STEP_S;
        SeawaterConstants saltier = k.near(k.temperatureC, k.salinity + stepS);
        difference(with[SALINITY], saltier, stepS);
        scaleWithSalinity = scaleStep(saltier, scale) / stepS;
    }

    private void withHydrogenIon(double[] share) {
        double bound = 2 * share[0] + share[1];
        withLnH[PH] = -1 / SeawaterConstants.LN_10;
        withLnH[TA] =
                Alkalinity.slopeOfCarbon(k, s.h(), s.dic()) + Alkalinity.slopeWithoutCarbonate(k, conditions, s.h());
        carbonSpecies(withLnH, 2 - bound, 1 - bound, -bound);
    }

    /** Relative moves of CO2, bicarbonate and carbonate carried to all that is proportional to them. */
    private void carbonSpecies(double[] row, double ofCo2, double ofBicarbonate, double ofCarbonate) {
        row[CO2] = s.co2() * ofCo2;
        row[FCO2] = s.fco2Atm() * ofCo2;
        row[PCO2] = s.pco2Atm() * ofCo2;
        row[BICARBONATE] = s.bicarbonate() * ofBicarbonate;
        row[CARBONATE] = s.carbonate() * ofCarbonate;
        row[OMEGA_ARAGONITE] = s.omegaAragonite() * ofCarbonate;
        row[OMEGA_CALCITE] = s.omegaCalcite() * ofCarbonate;
    }

    private void withCarbon(double[] share) {
        withDic[TA] = share[1] + 2 * share[2];
        withDic[DIC] = 1;
        withDic[CO2] = share[0];
        withDic[BICARBONATE] = share[1];
        withDic[CARBONATE] = share[2];
        withDic[FCO2] = share[0] / k.k0;
        withDic[PCO2] = share[0] / (k.k0 * k.fugacityFactor);
        double calcium = k.calcium(conditions);
        withDic[OMEGA_ARAGONITE] = share[2] * calcium / k.kspAragonite;
        withDic[OMEGA_CALCITE] = share[2] * calcium / k.kspCalcite;
    }

    private void withConstants(double[] share) {
        with[K0][FCO2] = -s.fco2Atm();
        with[K0][PCO2] = -s.pco2Atm();
        carbonSpecies(with[K1], share[0] - 1, share[0], share[0]);
        with[K1][TA] = with[K1][BICARBONATE] + 2 * with[K1][CARBONATE];
        carbonSpecies(with[K2], -share[2], -share[2], 1 - share[2]);
        with[K2][TA] = with[K2][BICARBONATE] + 2 * with[K2][CARBONATE];
        double borate = k.boron * k.kb / (k.kb + s.h());
        with[KB][TA] = borate * s.h() / (k.kb + s.h());
        with[KW][TA] = k.kw / s.h();
        with[KSP_ARAGONITE][OMEGA_ARAGONITE] = -s.omegaAragonite();
        with[KSP_CALCITE][OMEGA_CALCITE] = -s.omegaCalcite();
        with[BORON][TA] = borate;
    }

    private void withCalcium() {
        if (conditions.calcium() != null) {
            with[CALCIUM][OMEGA_ARAGONITE] = s.carbonate() / k.kspAragonite;
            with[CALCIUM][OMEGA_CALCITE] = s.carbonate() / k.kspCalcite;
        }
    }

    private void difference(double[] row, SeawaterConstants near, double step) {
        Speciation moved = Speciation.of(near, conditions, s.h(), s.dic());
        row[TA] = (alkalinity(near) - alkalinity(k)) / step;
        row[CO2] = (moved.co2() - s.co2()) / step;
        row[BICARBONATE] = (moved.bicarbonate() - s.bicarbonate()) / step;
        row[CARBONATE] = (moved.carbonate() - s.carbonate()) / step;
        row[FCO2] = (moved.fco2Atm() - s.fco2Atm()) / step;
        row[PCO2] = (moved.pco2Atm() - s.pco2Atm()) / step;
        row[OMEGA_ARAGONITE] = (moved.omegaAragonite() - s.omegaAragonite()) / step;
        row[OMEGA_CALCITE] = (moved.omegaCalcite() - s.omegaCalcite()) / step;
    }

    private double alkalinity(SeawaterConstants near) {
        return Alkalinity.ofCarbon(near, s.h(), s.dic()) + Alkalinity.withoutCarbonate(near, conditions, s.h());
    }

    private double scaleStep(SeawaterConstants near, PhScale scale) {
        return scale == PhScale.TOTAL ? 0 : near.scales.offsetToTotal(scale) - k.scales.offsetToTotal(scale);
    }
}
