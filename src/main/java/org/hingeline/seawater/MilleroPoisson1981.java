package org.hingeline.seawater;

/**
 * Density of seawater at 1 atm: Millero, F. J. and Poisson, A. (1981), International one-atmosphere equation of state
 * of seawater, Deep-Sea Research 28A, 625–629; UNESCO Technical Papers in Marine Science 36 and 44.
 *
 * <p>The equation is in IPTS-68. The ITS-90 temperature goes in as it is: the two differ by 0.024 %, which moves the
 * density by at most 0.004 kg/m³.
 */
public final class MilleroPoisson1981 {
    /** Where the equation of state holds. */
    public static final FitRange RANGE = new FitRange("Density of Millero & Poisson 1981", 0, 42, -2, 40);

    private MilleroPoisson1981() {}

    /**
     * Density of seawater at 1 atm.
     *
     * @param temperatureC temperature, °C
     * @param salinity practical salinity
     * @return kg/m³
     */
    public static double densityKgM3(double temperatureC, double salinity) {
        double t = temperatureC;
        double s = salinity;
        double water = 999.842594
                + t * (6.793952e-2 + t * (-9.095290e-3 + t * (1.001685e-4 + t * (-1.120083e-6 + t * 6.536332e-9))));
        double a = 8.24493e-1 + t * (-4.0899e-3 + t * (7.6438e-5 + t * (-8.2467e-7 + t * 5.3875e-9)));
        double b = -5.72466e-3 + t * (1.0227e-4 + t * -1.6546e-6);
        double c = 4.8314e-4;
        return water + a * s + b * s * Math.sqrt(s) + c * s * s;
    }
}
