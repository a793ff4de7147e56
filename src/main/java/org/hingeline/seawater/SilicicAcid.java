package org.hingeline.seawater;

/**
 * Dissociation of silicic acid: Millero, F. J. (1995), Geochimica et Cosmochimica Acta 59, 661–677, on the total scale
 * as given in Dickson, Sabine and Christian (2007), PICES Special Publication 3, chapter 5. mol/kg-seawater.
 */
final class SilicicAcid {
    static final FitRange RANGE = new FitRange("KSi of Millero 1995", 0, 45, 0, 45);

    private SilicicAcid() {}

    /** ln KSi, total scale; t in K, s practical salinity. */
    static double lnK(double t, double s) {
        double i = SeaSalt.ionicStrength(s);
        return -8904.2 / t
                + 117.385
                - 19.334 * Math.log(t)
                + (-458.79 / t + 3.5913) * Math.sqrt(i)
                + (188.74 / t - 1.5998) * i
                + (-12.1652 / t + 0.07871) * i * i
                + Math.log(SeaSalt.waterShare(s));
    }
}
