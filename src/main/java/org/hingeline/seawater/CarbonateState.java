package org.hingeline.seawater;

import java.util.List;
import java.util.Objects;

/**
 * The whole carbonate system of one water. Amounts are mol/kg-seawater.
 *
 * @param conditions temperature, salinity, nutrients and fits
 * @param known the two quantities it was solved from
 * @param constants the constants it was solved with
 * @param phTotal pH, total scale
 * @param totalAlkalinity total alkalinity (Dickson 1981)
 * @param dic dissolved inorganic carbon
 * @param co2 dissolved CO2 with carbonic acid
 * @param bicarbonate HCO3⁻
 * @param carbonate CO3²⁻
 * @param fco2Atm fugacity of CO2, atm
 * @param pco2Atm partial pressure of CO2 in air at 1 atm, atm
 * @param omegaAragonite saturation state of aragonite
 * @param omegaCalcite saturation state of calcite
 * @param densityKgM3 density at 1 atm, kg/m³
 * @param cautions fits used outside their published range, and what else to know
 */
public record CarbonateState(
        Conditions conditions,
        KnownPair known,
        SeawaterConstants constants,
        double phTotal,
        double totalAlkalinity,
        double dic,
        double co2,
        double bicarbonate,
        double carbonate,
        double fco2Atm,
        double pco2Atm,
        double omegaAragonite,
        double omegaCalcite,
        double densityKgM3,
        List<Caution> cautions) {
    public CarbonateState {
        Objects.requireNonNull(conditions, "conditions");
        Objects.requireNonNull(known, "known");
        Objects.requireNonNull(constants, "constants");
        cautions = List.copyOf(cautions);
    }

    /** Total calcium, mol/kg-seawater: measured where it was, otherwise from salinity. */
    public double calcium() {
        return constants.calcium(conditions);
    }

    /** The same water, as what follows from that pair, with those cautions. */
    CarbonateState asKnownFrom(KnownPair pair, List<Caution> carried) {
        return new CarbonateState(
                conditions,
                pair,
                constants,
                phTotal,
                totalAlkalinity,
                dic,
                co2,
                bicarbonate,
                carbonate,
                fco2Atm,
                pco2Atm,
                omegaAragonite,
                omegaCalcite,
                densityKgM3,
                carried);
    }
}
