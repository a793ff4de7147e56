package org.hingeline.seawater;

/**
 * First and second dissociation constants of carbonic acid down to estuarine salinity: Millero, F. J., Graham, T. B.,
 * Huang, F., Bustos-Serrano, H. and Pierrot, D. (2006), Dissociation constants of carbonic acid in seawater as a
 * function of salinity and temperature, Marine Chemistry 100, 80–94. Seawater scale, mol/kg-seawater.
 *
 * <p>pK = pK(water) + A + B/T + C ln T.
 */
final class Millero2006 {
    static final FitRange RANGE = new FitRange("K1, K2 of Millero et al. 2006", 1, 50, 0, 50);

    private Millero2006() {}

    /** pK1, seawater scale; t in K, s practical salinity. */
    static double pK1(double t, double s) {
        double root = Math.sqrt(s);
        double a = 13.4191 * root + 0.0331 * s - 5.33e-5 * s * s;
        double b = -530.123 * root - 6.103 * s;
        double c = -2.06950 * root;
        return CarbonicAcidInWater.pK1(t) + a + b / t + c * Math.log(t);
    }

    /** pK2, seawater scale; t in K, s practical salinity. */
    static double pK2(double t, double s) {
        double root = Math.sqrt(s);
        double a = 21.0894 * root + 0.1248 * s - 3.687e-4 * s * s;
        double b = -772.483 * root - 20.051 * s;
        double c = -3.3336 * root;
        return CarbonicAcidInWater.pK2(t) + a + b / t + c * Math.log(t);
    }
}
