package org.hingeline.measure;

import java.util.Arrays;
import java.util.Optional;

/** Units of the mass of a chemical. */
public enum MassUnit {
    GRAM("g", "g", 1),
    KILOGRAM("kg", "kg", 1000),
    /** The avoirdupois pound: NIST Special Publication 811 (2008), appendix B. */
    POUND("[lb_av]", "lb", 453.59237);

    private final String ucum;
    private final String label;
    private final double grams;

    MassUnit(String ucum, String label, double grams) {
        this.ucum = ucum;
        this.label = label;
        this.grams = grams;
    }

    /** The code on the wire. */
    public String ucum() {
        return ucum;
    }

    /** As written for people. */
    public String label() {
        return label;
    }

    /** g of a mass in this unit. */
    public double toGrams(double mass) {
        return mass * grams;
    }

    /** A mass in g as one in this unit. */
    public double fromGrams(double massG) {
        return massG / grams;
    }

    /** The unit of that UCUM code, if there is one. */
    public static Optional<MassUnit> ofUcum(String ucum) {
        return Arrays.stream(values()).filter(unit -> unit.ucum.equals(ucum)).findFirst();
    }
}
