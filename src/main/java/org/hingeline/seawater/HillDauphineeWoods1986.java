package org.hingeline.seawater;

/**
 * Practical salinity below 2: Hill, K. D., Dauphinee, T. M. and Woods, D. J. (1986), The extension of the Practical
 * Salinity Scale 1978 to low salinities, IEEE Journal of Oceanic Engineering OE-11, 109–112.
 *
 * <p>As published the extension meets PSS-78 at a salinity of 2 with a step of up to 0.0004, in the cold. It is scaled by a
 * factor that depends on the temperature alone, so that there is no step and every salinity has one conductivity: IOC,
 * SCOR and IAPSO (2010), The international thermodynamic equation of seawater – 2010, UNESCO Manuals and Guides 56,
 * appendix E.
 */
final class HillDauphineeWoods1986 {
    /** The salinity below which it is used. */
    static final double BELOW = 2;

    private static final double A0 = 0.008;
    private static final double B0 = 0.0005;

    /** √Rt of a salinity of 2 lies between these at any temperature. */
    private static final double ROOT_RATIO_LOW = 0.2;

    private static final double ROOT_RATIO_HIGH = 0.4;

    private HillDauphineeWoods1986() {}

    /**
     * Salinity below 2, joined to PSS-78 without a step.
     *
     * @param unextended what PSS-78 gives
     * @param rootRt √Rt
     * @param t68 °C, IPTS-68
     */
    static double salinity(double unextended, double rootRt, double t68) {
        return scale(t68) * asPublished(unextended, rootRt, t68);
    }

    /** The extension without the factor. */
    static double asPublished(double unextended, double rootRt, double t68) {
        double x = 400 * rootRt * rootRt;
        double rootY = 10 * rootRt;
        double y = rootY * rootY;
        return unextended
                - A0 / (1 + x * (1.5 + x))
                - B0 * PracticalSalinity1978.temperatureFactor(t68) / (1 + rootY + y + y * rootY);
    }

    /** What makes the extension give 2 where PSS-78 gives 2. */
    static double scale(double t68) {
        double rootRt = Bisection.root(
                root -> PracticalSalinity1978.ofRootRatio(root, t68) - BELOW, ROOT_RATIO_LOW, ROOT_RATIO_HIGH);
        return BELOW / asPublished(BELOW, rootRt, t68);
    }
}
