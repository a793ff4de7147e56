package org.hingeline.measure;

import java.util.List;

/**
 * One unit in which a quantity is accepted and can be shown.
 *
 * @param ucum UCUM code, as on the wire
 * @param label as written for people, for example {@code mg/L as CaCO₃}
 * @param factor of a unit per litre: from the unit to the canonical amount <em>per litre</em>; else to the canonical unit
 * @param offset added after the factor; 0 for a unit per litre
 * @param perLitre whether it counts per litre what the canonical unit counts per kilogram, so that the density is needed
 * @param alsoWritten plain forms that are taken for the code
 */
public record UnitChoice(
        String ucum, String label, double factor, double offset, boolean perLitre, List<String> alsoWritten) {
    /**
     * Density of ordinary seawater, kg/m³: good to 3 % for any water of the trade, so for uncertainties and for nothing
     * else.
     */
    public static final double TYPICAL_DENSITY_KG_M3 = 1025;

    private static final double LITRES_PER_M3 = 1000;

    public UnitChoice {
        if (!(Double.isFinite(factor) && factor > 0 && Double.isFinite(offset))) {
            throw new IllegalArgumentException("unit " + ucum + ": factor " + factor + ", offset " + offset);
        }
        if (perLitre && offset != 0) {
            throw new IllegalArgumentException("unit " + ucum + " per litre: offset " + offset + " must be 0");
        }
        alsoWritten = List.copyOf(alsoWritten);
    }

    /**
     * The conversion of a unit that needs nothing but the value.
     *
     * @throws IllegalStateException for a unit per litre
     */
    public UnitConversion conversion() {
        if (perLitre) {
            throw new IllegalStateException("unit " + ucum + " needs the density of the water");
        }
        return new UnitConversion(ucum, factor, offset);
    }

    /**
     * The conversion in a water of that density; a unit that needs no density does not use it.
     *
     * @param densityKgM3 density at the temperature at which the volume was measured, kg/m³
     * @throws IllegalArgumentException when the density is not above 0
     */
    public UnitConversion conversion(double densityKgM3) {
        if (!(densityKgM3 > 0 && Double.isFinite(densityKgM3))) {
            throw new IllegalArgumentException("density " + densityKgM3 + " kg/m³ must be above 0");
        }
        return perLitre ? new UnitConversion(ucum, factor * LITRES_PER_M3 / densityKgM3, 0) : conversion();
    }

    /** Whether a text names this unit, by its code or a plain form. */
    boolean named(String text) {
        return ucum.equals(text) || alsoWritten.contains(text);
    }
}
