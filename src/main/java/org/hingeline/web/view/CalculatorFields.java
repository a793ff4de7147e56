package org.hingeline.web.view;

import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.UnitConversion;
import org.hingeline.measure.Units;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.hingeline.seawater.PhScale;

/** What the calculator's form asks, and what can be chosen. */
public final class CalculatorFields {
    /** Units that are accepted on the wire, but that nobody reads off an instrument. */
    private static final Set<String> NOT_OFFERED = Set.of("K", "mol/kg", "mol/L", "uS/cm");

    private CalculatorFields() {}

    /**
     * A unit to choose.
     *
     * @param value UCUM code
     * @param label as read
     * @param factor of a difference into the canonical unit, in ordinary seawater
     */
    public record UnitOption(String value, String label, double factor) {}

    /** Units of temperature. */
    public static List<UnitOption> temperatures() {
        return options(Quantity.TEMPERATURE);
    }

    /** Salinity as such, or the conductivity it is worked out from: the unit says which. */
    public static List<UnitOption> salinities() {
        return Stream.concat(options(Quantity.SALINITY).stream(), options(Quantity.CONDUCTIVITY).stream())
                .toList();
    }

    /** Units of total alkalinity. */
    public static List<UnitOption> alkalinities() {
        return options(Quantity.TOTAL_ALKALINITY);
    }

    /** Units of dissolved inorganic carbon. */
    public static List<UnitOption> carbons() {
        return options(Quantity.DIC);
    }

    /** Units of pCO2. */
    public static List<UnitOption> pressures() {
        return options(Quantity.PCO2);
    }

    /** Units of measured calcium. */
    public static List<UnitOption> calciums() {
        return options(Quantity.CALCIUM);
    }

    /** Units of total ammonia nitrogen. */
    public static List<UnitOption> ammonias() {
        return options(Quantity.AMMONIA);
    }

    private static List<UnitOption> options(Quantity quantity) {
        return Units.of(quantity).stream()
                .filter(choice -> !NOT_OFFERED.contains(choice.ucum()))
                .map(CalculatorFields::option)
                .toList();
    }

    private static UnitOption option(UnitChoice choice) {
        UnitConversion conversion = choice.conversion(UnitChoice.TYPICAL_DENSITY_KG_M3);
        return new UnitOption(choice.ucum(), choice.label(), conversion.factor());
    }

    /** The pairs that fix a water. */
    public static List<Choice> pairs() {
        return List.of(
                new Choice("ph-ta", "pH and alkalinity"),
                new Choice("ph-dic", "pH and DIC"),
                new Choice("ph-pco2", "pH and pCO₂"),
                new Choice("ta-dic", "alkalinity and DIC"),
                new Choice("ta-pco2", "alkalinity and pCO₂"),
                new Choice("dic-pco2", "DIC and pCO₂"));
    }

    /** The scales a pH can be on. */
    public static List<UnitOption> scales() {
        return Stream.of(PhScale.values())
                .map(scale -> new UnitOption(scale.wireName(), scaleLabel(scale), 1))
                .toList();
    }

    /** "total scale". */
    public static String scaleLabel(PhScale scale) {
        return (scale == PhScale.NBS ? "NBS" : scale.wireName()) + " scale";
    }

    /** The fits of K1 and K2. */
    public static List<Choice> constants() {
        return Stream.of(CarbonicAcidFit.values())
                .map(fit -> new Choice(
                        fit.wireName(),
                        switch (fit) {
                            case LUEKER_2000 -> "Lueker et al. 2000: sea water, salinity 19 to 43";
                            case MILLERO_2006 -> "Millero et al. 2006: estuaries, salinity 1 to 50";
                            case WATERS_2014 -> "Waters et al. 2014: salinity 1 to 50";
                        }))
                .toList();
    }

    /** The ratios of boron to salinity. */
    public static List<Choice> borons() {
        return Stream.of(BoronRatio.values())
                .map(ratio -> new Choice(ratio.wireName(), ratio.title()))
                .toList();
    }
}
