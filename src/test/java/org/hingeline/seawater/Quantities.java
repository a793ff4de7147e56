package org.hingeline.seawater;

/** Quantities of a state by name, in the units people use: µmol/kg, µatm. */
final class Quantities {
    private Quantities() {}

    static double of(CarbonateState state, String name) {
        return switch (name) {
            case "phTotal" -> state.phTotal();
            case "totalAlkalinity" -> state.totalAlkalinity() * 1e6;
            case "dic" -> state.dic() * 1e6;
            case "co2" -> state.co2() * 1e6;
            case "bicarbonate" -> state.bicarbonate() * 1e6;
            case "carbonate" -> state.carbonate() * 1e6;
            case "pco2" -> state.pco2Atm() * 1e6;
            case "fco2" -> state.fco2Atm() * 1e6;
            case "omegaAragonite" -> state.omegaAragonite();
            case "omegaCalcite" -> state.omegaCalcite();
            default -> throw new IllegalArgumentException("no such quantity: " + name);
        };
    }
}
