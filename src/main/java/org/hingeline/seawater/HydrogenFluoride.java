package org.hingeline.seawater;

/**
 * Dissociation of hydrogen fluoride: Perez, F. F. and Fraga, F. (1987), Association constant of fluoride and hydrogen
 * ions in seawater, Marine Chemistry 21, 161–168. Total scale, mol/kg-seawater.
 */
final class HydrogenFluoride {
    static final FitRange RANGE = new FitRange("KF of Perez & Fraga 1987", 10, 40, 9, 33);

    private HydrogenFluoride() {}

    /** ln KF, total scale; t in K, s practical salinity. */
    static double lnK(double t, double s) {
        return 874 / t - 9.68 + 0.111 * Math.sqrt(s);
    }
}
