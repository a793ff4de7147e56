package org.hingeline.seawater;

/**
 * Standard uncertainties of the equilibrium constants, in pK, and of the boron ratio.
 *
 * @param pK0 of the solubility of CO2
 * @param pK1 of carbonic acid
 * @param pK2 of bicarbonate
 * @param pKB of boric acid
 * @param pKW of water
 * @param pKspAragonite of aragonite
 * @param pKspCalcite of calcite
 * @param boronRelative of total boron, as a fraction of it
 */
public record ConstantUncertainty(
        double pK0,
        double pK1,
        double pK2,
        double pKB,
        double pKW,
        double pKspAragonite,
        double pKspCalcite,
        double boronRelative) {
    /**
     * Orr, J. C., Epitalon, J.-M., Dickson, A. G. and Gattuso, J.-P. (2018), Routine uncertainty propagation for the
     * marine carbon dioxide system, Marine Chemistry 207, 84–107 (quoted from memory).
     */
    public static final ConstantUncertainty ORR_2018 =
            new ConstantUncertainty(0.002, 0.0075, 0.015, 0.01, 0.01, 0.02, 0.02, 0.02);

    /** In the order of {@link Sensitivity}: ln K0, K1, K2, KB, KW, Ksp aragonite, Ksp calcite, total boron. */
    double[] asLogarithms() {
        double ln10 = SeawaterConstants.LN_10;
        return new double[] {
            pK0 * ln10,
            pK1 * ln10,
            pK2 * ln10,
            pKB * ln10,
            pKW * ln10,
            pKspAragonite * ln10,
            pKspCalcite * ln10,
            boronRelative
        };
    }
}
