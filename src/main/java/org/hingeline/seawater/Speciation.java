package org.hingeline.seawater;

/**
 * Everything that follows from [H] and inorganic carbon in a water, without transcendental functions: the step that
 * every pair shares, and that the uncertainty differentiates.
 *
 * @param h [H], total scale, mol/kg-seawater
 */
record Speciation(
        double h,
        double dic,
        double co2,
        double bicarbonate,
        double carbonate,
        double fco2Atm,
        double pco2Atm,
        double omegaAragonite,
        double omegaCalcite) {
    static Speciation of(SeawaterConstants k, Conditions conditions, double h, double dic) {
        double d = h * h + k.k1 * h + k.k1 * k.k2;
        double co2 = dic * h * h / d;
        double bicarbonate = dic * k.k1 * h / d;
        double carbonate = dic * k.k1 * k.k2 / d;
        double fco2 = co2 / k.k0;
        double solid = carbonate * k.calcium(conditions);
        return new Speciation(
                h,
                dic,
                co2,
                bicarbonate,
                carbonate,
                fco2,
                fco2 / k.fugacityFactor,
                solid / k.kspAragonite,
                solid / k.kspCalcite);
    }
}
