package org.hingeline.seawater;

/**
 * What sea salt holds in constant proportion to salinity, in mol/kg-seawater, through chlorinity Cl = S/1.80655.
 *
 * <ul>
 *   <li>sulfate: Morris, A. W. and Riley, J. P. (1966), Deep-Sea Research 13, 699–705: 0.1400 g per g of chlorinity
 *   <li>fluoride: Riley, J. P. (1965), Deep-Sea Research 12, 219–220: 6.7e-5 g per g of chlorinity
 *   <li>calcium: Riley, J. P. and Tongudai, M. (1967), Chemical Geology 2, 263–269: 0.02128 g per g of chlorinity
 * </ul>
 *
 * River water breaks the proportion first for calcium, which is why a measured calcium overrides it.
 */
final class SeaSalt {
    private static final double SALINITY_PER_CHLORINITY = 1.80655;
    private static final double SULFATE = 0.1400 / 96.062;
    private static final double FLUORIDE = 6.7e-5 / 18.998;
    private static final double CALCIUM = 0.02128 / 40.087;

    private SeaSalt() {}

    static double chlorinity(double s) {
        return s / SALINITY_PER_CHLORINITY;
    }

    static double sulfate(double s) {
        return SULFATE * chlorinity(s);
    }

    static double fluoride(double s) {
        return FLUORIDE * chlorinity(s);
    }

    static double calcium(double s) {
        return CALCIUM * chlorinity(s);
    }

    /** Ionic strength, mol per kg of water: Dickson, Sabine and Christian (2007), chapter 5, after DOE (1994). */
    static double ionicStrength(double s) {
        return 19.924 * s / (1000 - 1.005 * s);
    }

    /** kg of water in a kg of seawater, which turns mol/kg-water into mol/kg-seawater. */
    static double waterShare(double s) {
        return 1 - 0.001005 * s;
    }
}
