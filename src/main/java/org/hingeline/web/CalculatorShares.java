package org.hingeline.web;

import java.util.List;
import java.util.Map;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.seawater.Origin;
import org.hingeline.seawater.StandardUncertainty;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.web.view.CalculatorView.Share;

/** Where the ± of a calculated water comes from. */
final class CalculatorShares {
    private CalculatorShares() {}

    /** What brings how much of the ± of Ω of aragonite, the largest first. */
    static List<String> ofOmega(CalculatedWater water) {
        return water.omegaAragoniteByOrigin().entrySet().stream()
                .sorted(Map.Entry.<Origin, Double>comparingByValue().reversed())
                .map(each -> words(each.getKey()) + " \u00b1" + Rounded.small(each.getValue()))
                .toList();
    }

    /** The shares of the constants and of the inputs in the ± of a quantity. */
    static Share of(CalculatorResult.Part part, StateUncertainty uncertainty) {
        StandardUncertainty u = part.uncertainty().apply(uncertainty);
        double scale = part.scale();
        return new Share(
                part.unit().isEmpty() ? part.name() : part.name() + ", " + part.unit(),
                Rounded.small(u.total() * scale),
                Rounded.small(u.fromConstants() * scale),
                Rounded.small(u.fromInputs() * scale));
    }

    private static String words(Origin origin) {
        return switch (origin) {
            case CONSTANTS -> "equilibrium constants";
            case PH -> "pH";
            case TOTAL_ALKALINITY -> "alkalinity";
            case DIC -> "inorganic carbon";
            case PCO2 -> "pCO\u2082";
            case TEMPERATURE -> "temperature";
            case SALINITY -> "salinity";
            case CALCIUM -> "calcium";
            case TEMPERATURE_AT_PH -> "temperature where the pH was read";
        };
    }
}
