package org.hingeline.seawater;

/**
 * The factor between an NBS-buffered glass electrode and the seawater scale: Takahashi, T., Williams, R. T. and Bos, D.
 * L. (1982), Carbonate chemistry, in: GEOSECS Pacific Expedition, volume 3, 77–83. a(H, NBS) = f_H · [H, seawater].
 *
 * <p>Liquid junctions differ from electrode to electrode: the conversion carries at least 0.05 pH.
 */
final class Takahashi1982 {
    static final Caution CAUTION = new Caution(
            "nbs-scale",
            "pH on NBS buffers was converted with f_H of Takahashi et al. 1982: allow at least 0.05 pH, or calibrate on"
                    + " a seawater buffer.");

    private Takahashi1982() {}

    /** f_H; t in K, s practical salinity. */
    static double activityCoefficient(double t, double s) {
        return 1.2948 - 0.002036 * t + (0.0004607 - 0.000001475 * t) * s * s;
    }
}
