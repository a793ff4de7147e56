package org.hingeline.seawater;

/**
 * First and second dissociation constants of carbonic acid: Waters, J., Millero, F. J. and Woosley, R. J. (2014),
 * Corrigendum to "The free proton concentration scale for seawater pH", Marine Chemistry 165, 66–67. Seawater scale,
 * mol/kg-seawater.
 *
 * <p>pK = pK(water) + A + B/T + C ln T. The coefficients are quoted from memory; the tests hold the result against the
 * independent fit of {@link Millero2006}, from which it differs by at most 0.0031 in pK for salinity 1–50, 0–50 °C.
 */
final class Waters2014 {
    static final FitRange RANGE = new FitRange("K1, K2 of Waters, Millero & Woosley 2014", 1, 50, 0, 50);

    private Waters2014() {}

    /** pK1, seawater scale; t in K, s practical salinity. */
    static double pK1(double t, double s) {
        double root = Math.sqrt(s);
        double a = 13.409160 * root + 0.031646 * s - 5.1895e-5 * s * s;
        double b = -531.3642 * root - 5.713 * s;
        double c = -2.0669166 * root;
        return CarbonicAcidInWater.pK1(t) + a + b / t + c * Math.log(t);
    }

    /** pK2, seawater scale; t in K, s practical salinity. */
    static double pK2(double t, double s) {
        double root = Math.sqrt(s);
        double a = 21.225890 * root + 0.12450870 * s - 3.7243e-4 * s * s;
        double b = -779.3444 * root - 19.91739 * s;
        double c = -3.3534679 * root;
        return CarbonicAcidInWater.pK2(t) + a + b / t + c * Math.log(t);
    }
}
