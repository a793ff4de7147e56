package org.hingeline.monitor;

/**
 * The carbonate system in the units people use.
 *
 * @param phTotal total scale, at the water's temperature
 * @param temperatureC ITS-90
 * @param salinity PSS-78
 * @param omegaAragoniteUncertainty standard uncertainty of Ω aragonite, in all
 * @param omegaAragoniteFromConstants its share from the equilibrium constants
 * @param omegaAragoniteFromInputs its share from the measured inputs
 * @param phTotalUncertainty standard uncertainty of pH
 */
public record WaterNumbers(
        double phTotal,
        double temperatureC,
        double salinity,
        double totalAlkalinityUmolKg,
        double dicUmolKg,
        double pco2Uatm,
        double fco2Uatm,
        double co2UmolKg,
        double bicarbonateUmolKg,
        double carbonateUmolKg,
        double omegaAragonite,
        double omegaCalcite,
        double densityKgM3,
        double omegaAragoniteUncertainty,
        double omegaAragoniteFromConstants,
        double omegaAragoniteFromInputs,
        double phTotalUncertainty) {}
