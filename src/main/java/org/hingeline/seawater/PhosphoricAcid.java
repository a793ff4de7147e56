package org.hingeline.seawater;

/**
 * Dissociation of phosphoric acid: Millero, F. J. (1995), Geochimica et Cosmochimica Acta 59, 661–677, eq. 65–67, on
 * the total scale as given in Dickson, Sabine and Christian (2007), PICES Special Publication 3, chapter 5.
 * mol/kg-seawater.
 */
final class PhosphoricAcid {
    static final FitRange RANGE = new FitRange("KP1 to KP3 of Millero 1995", 0, 45, 0, 45);

    private PhosphoricAcid() {}

    /** ln KP1, total scale; t in K, s practical salinity. */
    static double lnK1(double t, double s) {
        return -4576.752 / t
                + 115.525
                - 18.453 * Math.log(t)
                + (-106.736 / t + 0.69171) * Math.sqrt(s)
                + (-0.65643 / t - 0.01844) * s;
    }

    /** ln KP2, total scale; t in K, s practical salinity. */
    static double lnK2(double t, double s) {
        return -8814.715 / t
                + 172.0883
                - 27.927 * Math.log(t)
                + (-160.340 / t + 1.3566) * Math.sqrt(s)
                + (0.37335 / t - 0.05778) * s;
    }

    /** ln KP3, total scale; t in K, s practical salinity. */
    static double lnK3(double t, double s) {
        return -3070.75 / t - 18.141 + (17.27039 / t + 2.81197) * Math.sqrt(s) + (-44.99486 / t - 0.09984) * s;
    }
}
