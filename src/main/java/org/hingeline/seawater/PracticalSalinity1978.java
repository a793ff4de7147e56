package org.hingeline.seawater;

/**
 * The Practical Salinity Scale 1978: Perkin, R. G. and Lewis, E. L. (1980), The practical salinity scale 1978: fitting
 * the data, IEEE Journal of Oceanic Engineering OE-5, 9–16; equations as in UNESCO Technical Papers in Marine Science
 * 44, eq. 1 to 6. Below a salinity of 2 the extension of {@link HillDauphineeWoods1986} takes over.
 *
 * <p>Temperatures of this class are IPTS-68, in °C; {@link ConductivitySalinity} is the edge to ITS-90. The conductivity
 * ratio R is C(S, t, p) over that of standard seawater at S 35, 15 °C (IPTS-68) and 0 dbar; Rt is C(S, t, 0) over C(35,
 * t, 0). Pressures are sea pressures in dbar.
 */
final class PracticalSalinity1978 {
    static final FitRange RANGE = new FitRange(
            "The Practical Salinity Scale 1978 with the extension of Hill, Dauphinee & Woods 1986", 0, 42, -2, 35);

    /** C(35, 15, 0), mS/cm: the value in use for turning a conductivity into a ratio (Culkin and Smith 1980). */
    static final double STANDARD_MS_CM = 42.914;

    /** IPTS-68 over ITS-90, °C: Saunders, P. M. (1990), WOCE Newsletter 10. */
    static final double T68_OVER_T90 = 1.00024;

    private static final double A0 = 0.0080;
    private static final double A1 = -0.1692;
    private static final double A2 = 25.3851;
    private static final double A3 = 14.0941;
    private static final double A4 = -7.0261;
    private static final double A5 = 2.7081;
    private static final double B0 = 0.0005;
    private static final double B1 = -0.0056;
    private static final double B2 = -0.0066;
    private static final double B3 = -0.0375;
    private static final double B4 = 0.0636;
    private static final double B5 = -0.0144;
    private static final double K = 0.0162;

    private static final double C0 = 0.6766097;
    private static final double C1 = 2.00564e-2;
    private static final double C2 = 1.104259e-4;
    private static final double C3 = -6.9698e-7;
    private static final double C4 = 1.0031e-9;

    private static final double D1 = 3.426e-2;
    private static final double D2 = 4.464e-4;
    private static final double D3 = 4.215e-1;
    private static final double D4 = -3.107e-3;
    private static final double E1 = 2.070e-5;
    private static final double E2 = -6.370e-10;
    private static final double E3 = 3.989e-15;

    private PracticalSalinity1978() {}

    /** Practical salinity of a conductivity ratio, at least 0. */
    static double salinity(double ratio, double t68, double pressureDbar) {
        return Math.max(0, unclamped(Math.sqrt(ratioAtSurface(ratio, t68, pressureDbar)), t68));
    }

    /**
     * Salinity of √Rt, PSS-78 above 2 and its extension below. Of water with less than about 1 µS/cm it is negative by
     * up to 0.0003; from where it is 0 it rises strictly.
     */
    static double unclamped(double rootRt, double t68) {
        double s = ofRootRatio(rootRt, t68);
        return s < HillDauphineeWoods1986.BELOW ? HillDauphineeWoods1986.salinity(s, rootRt, t68) : s;
    }

    /** Eq. 1 and 2, without the extension; the argument is √Rt. */
    static double ofRootRatio(double x, double t68) {
        double a = A0 + x * (A1 + x * (A2 + x * (A3 + x * (A4 + x * A5))));
        double b = B0 + x * (B1 + x * (B2 + x * (B3 + x * (B4 + x * B5))));
        return a + temperatureFactor(t68) * b;
    }

    /** (t − 15)/(1 + k(t − 15)). */
    static double temperatureFactor(double t68) {
        return (t68 - 15) / (1 + K * (t68 - 15));
    }

    /** Rt of R: eq. 3 and 4, Rt = R/(Rp · rt). */
    private static double ratioAtSurface(double ratio, double t68, double p) {
        double pressureTerm = pressure(p) / (stiffness(t68) + slope(t68) * ratio);
        return ratio / (rt(t68) * (1 + pressureTerm));
    }

    /** R of Rt: the positive root of the quadratic that eq. 4 becomes. */
    static double ratio(double ratioAtSurface, double t68, double p) {
        double unpressed = rt(t68) * ratioAtSurface;
        double b = slope(t68);
        double a = stiffness(t68);
        double linear = a - unpressed * b;
        double constant = unpressed * (a + pressure(p));
        // the form that does not cancel for either sign of the linear term
        double root = Math.sqrt(linear * linear + 4 * b * constant);
        return linear >= 0 ? 2 * constant / (linear + root) : (root - linear) / (2 * b);
    }

    /** rt = C(35, t, 0)/C(35, 15, 0), eq. 3. */
    private static double rt(double t) {
        return C0 + t * (C1 + t * (C2 + t * (C3 + t * C4)));
    }

    private static double pressure(double p) {
        return p * (E1 + p * (E2 + p * E3));
    }

    private static double stiffness(double t) {
        return 1 + t * (D1 + t * D2);
    }

    private static double slope(double t) {
        return D3 + D4 * t;
    }
}
