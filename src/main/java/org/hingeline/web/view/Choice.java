package org.hingeline.web.view;

import java.util.List;

/** One choice of a list: what is sent and what is read. */
public record Choice(String value, String label) {
    private static final List<Choice> QUANTITIES = List.of(
            new Choice("omegaAragonite", "Ω aragonite"),
            new Choice("phTotal", "pH (total scale)"),
            new Choice("temperatureC", "temperature, °C"),
            new Choice("salinity", "salinity"),
            new Choice("carbonateUmolKg", "carbonate, µmol/kg"),
            new Choice("totalAlkalinityUmolKg", "total alkalinity, µmol/kg"),
            new Choice("pco2Uatm", "pCO₂, µatm"));

    private static final List<Choice> PRIORITIES =
            List.of(new Choice("high", "high"), new Choice("medium", "medium"), new Choice("low", "low"));

    /** What a limit can be set on. */
    public static List<Choice> quantities() {
        return QUANTITIES;
    }

    /** How urgent a limit can be. */
    public static List<Choice> priorities() {
        return PRIORITIES;
    }
}
