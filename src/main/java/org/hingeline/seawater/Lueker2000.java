package org.hingeline.seawater;

/**
 * First and second dissociation constants of carbonic acid: Lueker, T. J., Dickson, A. G. and Keeling, C. D. (2000),
 * Ocean pCO2 calculated from dissolved inorganic carbon, alkalinity, and equations for K1 and K2, Marine Chemistry 70,
 * 105–119. Total scale, mol/kg-seawater.
 */
final class Lueker2000 {
    static final FitRange RANGE = new FitRange("K1, K2 of Lueker, Dickson & Keeling 2000", 19, 43, 2, 35);

    private Lueker2000() {}

    /** pK1, total scale; t in K, s practical salinity. */
    static double pK1(double t, double s) {
        return 3633.86 / t - 61.2172 + 9.67770 * Math.log(t) - 0.011555 * s + 0.0001152 * s * s;
    }

    /** pK2, total scale; t in K, s practical salinity. */
    static double pK2(double t, double s) {
        return 471.78 / t + 25.9290 - 3.16967 * Math.log(t) - 0.01781 * s + 0.0001122 * s * s;
    }
}
