package org.hingeline.web;

import java.util.List;
import java.util.Optional;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.UnitConversion;
import org.hingeline.measure.Units;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.VolumeAmount;
import org.jspecify.annotations.Nullable;

/**
 * The units chosen in the calculator's form, with the density of its water for those per litre. A unit that is not known
 * counts as the canonical one, and is told.
 */
final class CalculatorUnits {
    private static final double LITRES_PER_M3 = 1000;

    final UnitConversion temperature;
    /** Whether the salinity field holds a conductivity. */
    final boolean conductivity;

    final UnitConversion salinity;
    private final Typed typed;
    private final double densityKgM3;

    CalculatorUnits(Typed typed) {
        this.typed = typed;
        temperature = choice("temp", Quantity.TEMPERATURE).conversion();
        conductivity = Units.find(Quantity.SALINITY, typed.text("saltUnit")).isEmpty()
                && Units.find(Quantity.CONDUCTIVITY, typed.text("saltUnit")).isPresent();
        salinity = choice("salt", salinityQuantity()).conversion();
        densityKgM3 = density();
    }

    private Quantity salinityQuantity() {
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

    /** The ± of the salinity field; none when it was for the other of salinity and conductivity. */
    @Nullable
    Double salinityPlusMinus() {
        boolean sameKind = typed.empty("saltPmIn")
                || Units.find(salinityQuantity(), typed.text("saltPmIn")).isPresent();
        return sameKind ? plusMinus("salt", salinityQuantity()) : null;
    }

    /** Of the water at its own temperature; of ordinary seawater as long as temperature and salinity are not known. */
    private double density() {
        Double t = Typed.parsed(typed.text("temp"));
        Double s = Typed.parsed(typed.text("salt"));
        if (t == null || s == null) {
            return UnitChoice.TYPICAL_DENSITY_KG_M3;
        }
        double temperatureC = temperature.toCanonical(t);
        double given = salinity.toCanonical(s);
        Figure practical =
                conductivity ? ConductivitySalinity.salinity(given, temperatureC) : new Figure.Known(given, List.of());
        return practical instanceof Figure.Known known
                        && VolumeAmount.perLitre(1, temperatureC, known.value()) instanceof Figure.Known perLitre
                ? perLitre.value() * LITRES_PER_M3
                : UnitChoice.TYPICAL_DENSITY_KG_M3;
    }
}
