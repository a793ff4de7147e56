package org.hingeline.seawater;

/**
 * Specific heat capacity of seawater at constant pressure, 1 atm: Millero, F. J., Perron, G. and Desnoyers, J. E.
 * (1973), Heat capacity of seawater solutions from 5 to 35 °C and 0.5 to 22 ‰ chlorinity, Journal of Geophysical
 * Research 78, 4499–4507, in the form of UNESCO Technical Papers in Marine Science 44 (eq. 26 to 30). The coefficients
 * are quoted from memory and give the checks of UNESCO 44 in the reference data of the tests.
 *
 * <p>The equation is in IPTS-68; the ITS-90 temperature goes in as it is, which moves the value by less than 0.05
 * J/(kg K). TEOS-10 differs by at most 4.6 J/(kg K), about a thousandth.
 */
public final class MilleroPerronDesnoyers1973 {
    /** Where the fit holds. */
    public static final FitRange RANGE =
            new FitRange("Heat capacity of Millero, Perron & Desnoyers 1973", 0, 40, 0, 35);

    private MilleroPerronDesnoyers1973() {}

    /**
     * Specific heat capacity of seawater at 1 atm.
     *
     * @param temperatureC temperature, °C
     * @param salinity practical salinity
     * @return J/(kg K)
     */
    public static double heatCapacity(double temperatureC, double salinity) {
        double t = temperatureC;
        double s = salinity;
        double water = 4217.4 + t * (-3.720283 + t * (0.1412855 + t * (-2.654387e-3 + t * 2.093236e-5)));
        double a = -7.643575 + t * (0.1072763 + t * -1.38385e-3);
        double b = 0.1770383 + t * (-4.07718e-3 + t * 5.148e-5);
        return water + s * (a + b * Math.sqrt(s));
    }
}
