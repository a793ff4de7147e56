package org.hingeline.web;

import java.util.List;
import java.util.Optional;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.UnitConversion;
import org.hingeline.measure.Units;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.MilleroPoisson1981;
import org.jspecify.annotations.Nullable;

/**
 * The units chosen in the calculator's form for a water, with the density of that water for those per litre. A unit that is
 * not known counts as the canonical one, and is told.
 */
final class CalculatorUnits {
    private static final double LEAST_C = -2;
    private static final double MOST_C = 45;
    private static final double MOST_SALINITY = 50;

    final UnitConversion temperature;
    /** Whether the salinity field holds a conductivity. */
    final boolean conductivity;

    final UnitConversion salinity;
    private final Typed typed;
    private final String temperatureField;
    private final String salinityField;
    private final double densityKgM3;

    private CalculatorUnits(Typed typed, String temperatureField, String salinityField) {
        this.typed = typed;
        this.temperatureField = temperatureField;
        this.salinityField = salinityField;
        temperature = choice(temperatureField, Quantity.TEMPERATURE).conversion();
        String ofSalinity = typed.text(salinityField + "Unit");
        conductivity = Units.find(Quantity.SALINITY, ofSalinity).isEmpty()
                && Units.find(Quantity.CONDUCTIVITY, ofSalinity).isPresent();
        salinity = choice(salinityField, salinityQuantity()).conversion();
        densityKgM3 = density();
    }

    /** Those of the water that is asked about. */
    static CalculatorUnits of(Typed typed) {
        return new CalculatorUnits(typed, "temp", "salt");
    }

    /** Those of the other water of a blend. */
    static CalculatorUnits ofBlend(Typed typed) {
        return new CalculatorUnits(typed, "blendTemp", "blendSalt");
    }

    Quantity salinityQuantity() {
        return conductivity ? Quantity.CONDUCTIVITY : Quantity.SALINITY;
    }

    /** The unit chosen beside a field. */
    UnitChoice choice(String field, Quantity quantity) {
        return find(quantity, field + "Unit").orElse(Units.of(quantity).get(0));
    }

    private Optional<UnitChoice> find(Quantity quantity, String unitField) {
        Optional<UnitChoice> choice = Units.find(quantity, typed.text(unitField));
        if (choice.isEmpty() && !typed.empty(unitField)) {
            String field = unitField.substring(0, unitField.length() - "Unit".length());
            typed.fault(
                    field,
                    "unit \u201c" + typed.text(unitField) + "\u201d is not known; accepted: " + Units.codes(quantity));
        }
        return choice;
    }

    /** The conversion of a field, in this water. */
    UnitConversion of(String field, Quantity quantity) {
        return choice(field, quantity).conversion(densityKgM3);
    }

    /** The value of a field, canonical. */
    @Nullable
    Double canonical(String field, Quantity quantity, String example) {
        Double value = typed.number(field, example);
        return value == null ? null : (Double) of(field, quantity).toCanonical(value);
    }

    /** The ± beside a field, canonical; absent when empty. It counts in the unit it stands in, which the form sends along. */
    @Nullable
    Double plusMinus(String field, Quantity quantity) {
        Double value = typed.number(field + "Pm", "0.02");
        if (value == null) {
            return null;
        }
        UnitChoice standsIn = Units.find(quantity, typed.text(field + "PmIn")).orElse(choice(field, quantity));
        return standsIn.conversion(densityKgM3).uncertaintyToCanonical(value);
    }

    /**
     * The ± of the salinity field, canonical; absent when empty. One that stood there for the other of salinity and
     * conductivity keeps its number, as it does on the page.
     */
    @Nullable
    Double salinityPlusMinus() {
        Double value = typed.number(salinityField + "Pm", "0.1");
        return value == null
                ? null
                : (Double) ofSalinity(typed.text(salinityField + "PmIn"))
                        .orElse(choice(salinityField, salinityQuantity()))
                        .conversion()
                        .uncertaintyToCanonical(value);
    }

    /** A unit of salinity or of conductivity. */
    static Optional<UnitChoice> ofSalinity(String ucum) {
        return Units.find(Quantity.SALINITY, ucum).or(() -> Units.find(Quantity.CONDUCTIVITY, ucum));
    }

    /** Of the water at its own temperature; of ordinary seawater as long as temperature and salinity are not known. */
    private double density() {
        Double t = Typed.parsed(typed.text(temperatureField));
        Double s = Typed.parsed(typed.text(salinityField));
        if (t == null || s == null) {
            return UnitChoice.TYPICAL_DENSITY_KG_M3;
        }
        double temperatureC = temperature.toCanonical(t);
        double given = salinity.toCanonical(s);
        Figure practical =
                conductivity ? ConductivitySalinity.salinity(given, temperatureC) : new Figure.Known(given, List.of());
        return practical instanceof Figure.Known known
                        && known.value() >= 0
                        && known.value() <= MOST_SALINITY
                        && temperatureC >= LEAST_C
                        && temperatureC <= MOST_C
                ? MilleroPoisson1981.densityKgM3(temperatureC, known.value())
                : UnitChoice.TYPICAL_DENSITY_KG_M3;
    }
}
