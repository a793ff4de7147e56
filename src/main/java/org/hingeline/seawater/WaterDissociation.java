package org.hingeline.seawater;

/**
 * Ion product of water: Millero, F. J. (1995), Thermodynamics of the carbon dioxide system in the oceans, Geochimica et
 * Cosmochimica Acta 59, 661–677, eq. 63, on the total scale as given in Dickson, A. G., Sabine, C. L. and Christian,
 * J. R. (2007), Guide to best practices for ocean CO2 measurements, PICES Special Publication 3, chapter 5.
 */
final class WaterDissociation {
    static final FitRange RANGE = new FitRange("KW of Millero 1995", 0, 45, 0, 45);

    private WaterDissociation() {}

    /** ln KW, total scale, (mol/kg-seawater)²; t in K, s practical salinity. */
    static double lnK(double t, double s) {
        double lnT = Math.log(t);
        return -13847.26 / t
                + 148.9652
                - 23.6521 * lnT
                + (118.67 / t - 5.977 + 1.0495 * lnT) * Math.sqrt(s)
                - 0.01615 * s;
    }
}
