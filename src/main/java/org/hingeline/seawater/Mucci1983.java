package org.hingeline.seawater;

/**
 * Solubility products of aragonite and calcite: Mucci, A. (1983), The solubility of calcite and aragonite in seawater
 * at various salinities, temperatures, and one atmosphere total pressure, American Journal of Science 283, 780–799.
 * (mol/kg-seawater)².
 */
final class Mucci1983 {
    static final FitRange RANGE = new FitRange("Ksp of aragonite and calcite of Mucci 1983", 5, 44, 5, 40);

    private Mucci1983() {}

    /** log10 Ksp of aragonite; t in K, s practical salinity. */
    static double log10Aragonite(double t, double s) {
        double root = Math.sqrt(s);
        return -171.945
                - 0.077993 * t
                + 2903.293 / t
                + 71.595 * Math.log10(t)
                + (-0.068393 + 0.0017276 * t + 88.135 / t) * root
                - 0.10018 * s
                + 0.0059415 * s * root;
    }

    /** log10 Ksp of calcite; t in K, s practical salinity. */
    static double log10Calcite(double t, double s) {
        double root = Math.sqrt(s);
        return -171.9065
                - 0.077993 * t
                + 2839.319 / t
                + 71.595 * Math.log10(t)
                + (-0.77712 + 0.0028426 * t + 178.34 / t) * root
                - 0.07711 * s
                + 0.0041249 * s * root;
    }
}
