package org.hingeline.seawater;

/**
 * Dissociation of boric acid: Dickson, A. G. (1990), Thermodynamics of the dissociation of boric acid in synthetic
 * seawater from 273.15 to 318.15 K, Deep-Sea Research 37, 755–766, eq. 23. Total scale, mol/kg-seawater.
 */
final class BoricAcid {
    static final FitRange RANGE = new FitRange("KB of Dickson 1990", 5, 45, 0, 45);

    private BoricAcid() {}

    /** ln KB, total scale; t in K, s practical salinity. */
    static double lnK(double t, double s) {
        double root = Math.sqrt(s);
        return (-8966.90 - 2890.53 * root - 77.942 * s + 1.728 * s * root - 0.0996 * s * s) / t
                + 148.0248
                + 137.1942 * root
                + 1.62142 * s
                - (24.4344 + 25.085 * root + 0.2474 * s) * Math.log(t)
                + 0.053105 * root * t;
    }
}
