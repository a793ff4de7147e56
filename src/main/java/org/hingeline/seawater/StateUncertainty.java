package org.hingeline.seawater;

/**
 * The standard uncertainty of each quantity of a {@link CarbonateState}, in that quantity's unit.
 *
 * @param phTotal pH, total scale
 * @param totalAlkalinity mol/kg-seawater
 * @param dic mol/kg-seawater
 * @param co2 mol/kg-seawater
 * @param bicarbonate mol/kg-seawater
 * @param carbonate mol/kg-seawater
 * @param fco2Atm atm
 * @param pco2Atm atm
 * @param omegaAragonite 1
 * @param omegaCalcite 1
 * @param densityKgM3 kg/m³; what temperature and salinity make of it, the equation of state itself counts as exact
 */
public record StateUncertainty(
        StandardUncertainty phTotal,
        StandardUncertainty totalAlkalinity,
        StandardUncertainty dic,
        StandardUncertainty co2,
        StandardUncertainty bicarbonate,
        StandardUncertainty carbonate,
        StandardUncertainty fco2Atm,
        StandardUncertainty pco2Atm,
        StandardUncertainty omegaAragonite,
        StandardUncertainty omegaCalcite,
        StandardUncertainty densityKgM3) {

    /** From the variances of both shares, in the order of {@link Sensitivity}. */
    static StateUncertainty ofVariances(double[] fromConstants, double[] fromInputs) {
        StandardUncertainty[] u = new StandardUncertainty[fromInputs.length];
        for (int q = 0; q < u.length; q++) {
            u[q] = StandardUncertainty.ofShares(Math.sqrt(fromConstants[q]), Math.sqrt(fromInputs[q]));
        }
        return new StateUncertainty(
                u[Sensitivity.PH],
                u[Sensitivity.TA],
                u[Sensitivity.DIC],
                u[Sensitivity.CO2],
                u[Sensitivity.BICARBONATE],
                u[Sensitivity.CARBONATE],
                u[Sensitivity.FCO2],
                u[Sensitivity.PCO2],
                u[Sensitivity.OMEGA_ARAGONITE],
                u[Sensitivity.OMEGA_CALCITE],
                u[Sensitivity.DENSITY]);
    }
}
