package org.hingeline.seawater;

/**
 * First and second dissociation constants of carbonic acid: Waters, J., Millero, F. J. and Woosley, R. J. (2014),
 * Corrigendum to "The free proton concentration scale for seawater pH", Marine Chemistry 165, 66–67. Seawater scale,
 * mol/kg-seawater.
 *
 * <p>pK(water) of {@link CarbonicAcidInWater} plus {@link SalinityTerms}. The coefficients are quoted from memory; the tests hold the result against the
 * independent fit of {@link Millero2006}, from which it differs by at most 0.0031 in pK for salinity 1–50, 0–50 °C.
 */
final class Waters2014 {
    static final FitRange RANGE = new FitRange("K1, K2 of Waters, Millero & Woosley 2014", 1, 50, 0, 50);

    private static final SalinityTerms PK1 =
            new SalinityTerms(13.409160, 0.031646, -5.1895e-5, -531.3642, -5.713, -2.0669166);
    private static final SalinityTerms PK2 =
            new SalinityTerms(21.225890, 0.12450870, -3.7243e-4, -779.3444, -19.91739, -3.3534679);

    private Waters2014() {}

    /** pK1, seawater scale; t in K, s practical salinity. */
    static double pK1(double t, double s) {
        return CarbonicAcidInWater.pK1(t) + PK1.at(t, s);
    }

    /** pK2, seawater scale; t in K, s practical salinity. */
    static double pK2(double t, double s) {
        return CarbonicAcidInWater.pK2(t) + PK2.at(t, s);
    }
}
