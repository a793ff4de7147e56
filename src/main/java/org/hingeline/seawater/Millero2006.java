package org.hingeline.seawater;

/**
 * First and second dissociation constants of carbonic acid down to estuarine salinity: Millero, F. J., Graham, T. B.,
 * Huang, F., Bustos-Serrano, H. and Pierrot, D. (2006), Dissociation constants of carbonic acid in seawater as a
 * function of salinity and temperature, Marine Chemistry 100, 80–94. Seawater scale, mol/kg-seawater.
 *
 * <p>pK(water) of {@link CarbonicAcidInWater} plus {@link SalinityTerms}.
 */
final class Millero2006 {
    static final FitRange RANGE = new FitRange("K1, K2 of Millero et al. 2006", 1, 50, 0, 50);

    private static final SalinityTerms PK1 = new SalinityTerms(13.4191, 0.0331, -5.33e-5, -530.123, -6.103, -2.06950);
    private static final SalinityTerms PK2 = new SalinityTerms(21.0894, 0.1248, -3.687e-4, -772.483, -20.051, -3.3336);

    private Millero2006() {}

    /** pK1, seawater scale; t in K, s practical salinity. */
    static double pK1(double t, double s) {
        return CarbonicAcidInWater.pK1(t) + PK1.at(t, s);
    }

    /** pK2, seawater scale; t in K, s practical salinity. */
    static double pK2(double t, double s) {
        return CarbonicAcidInWater.pK2(t) + PK2.at(t, s);
    }
}
