package org.hingeline.seawater;

/**
 * The pure-water part that {@link Millero2006} and {@link Waters2014} share, as printed in Millero et al. (2006),
 * Marine Chemistry 100, 80–94 (after Harned and co-workers).
 */
final class CarbonicAcidInWater {
    private CarbonicAcidInWater() {}

    /** pK1 at infinite dilution; t in K. */
    static double pK1(double t) {
        return -126.34048 + 6320.813 / t + 19.568224 * Math.log(t);
    }

    /** pK2 at infinite dilution; t in K. */
    static double pK2(double t) {
        return -90.18333 + 5143.692 / t + 14.613358 * Math.log(t);
    }
}
