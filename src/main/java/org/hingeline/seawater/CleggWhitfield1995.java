package org.hingeline.seawater;

/**
 * Dissociation of the ammonium ion: Clegg, S. L. and Whitfield, M. (1995), A chemical model of seawater including
 * dissolved ammonia and the stoichiometric dissociation constant of ammonia in estuarine water and seawater from −2 to
 * 40 °C, Geochimica et Cosmochimica Acta 59, 2403–2421. Total scale. The coefficients are quoted from memory and
 * reproduce the published shares in the reference data of the tests.
 */
public final class CleggWhitfield1995 {
    /** Where the fit holds. */
    public static final FitRange RANGE = new FitRange("Ammonium dissociation of Clegg & Whitfield 1995", 0, 40, -2, 40);

    private CleggWhitfield1995() {}

    /** pK of NH4⁺, total scale; t in K, s practical salinity. */
    static double pK(double t, double s) {
        double rootT = Math.sqrt(t);
        double rootS = Math.sqrt(s);
        return 9.244605
                - 2729.33 * (1 / 298.15 - 1 / t)
                + (0.04203362 - 11.24742 / t) * Math.sqrt(rootS)
                + (-13.6416 + 1.176949 * rootT - 0.02860785 * t + 545.4834 / t) * rootS
                + (-0.1462507 + 0.0090226468 * rootT - 0.0001471361 * t + 10.5425 / t) * s * rootS
                + (0.004669309 - 0.0001691742 * rootT - 0.5677934 / t) * s * s
                + (-2.354039e-5 + 0.009698623 / t) * s * s * rootS;
    }

    /**
     * The share of total ammonia that is un-ionised NH3, the toxic form.
     *
     * @param phTotal pH, total scale
     * @param temperatureC temperature, °C
     * @param salinity practical salinity
     * @return 0 to 1
     */
    public static double unionisedShare(double phTotal, double temperatureC, double salinity) {
        return 1 / (1 + Math.pow(10, pK(Kelvin.of(temperatureC), salinity) - phTotal));
    }
}
