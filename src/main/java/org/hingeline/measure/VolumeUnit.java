package org.hingeline.measure;

import java.util.Arrays;
import java.util.Optional;

/** Units of the volume of a tank. */
public enum VolumeUnit {
    LITRE("L", "L", 1),
    CUBIC_METRE("m3", "m\u00b3", 1000),
    /** 231 cubic inches: NIST Special Publication 811 (2008), appendix B. */
    US_GALLON("[gal_us]", "US gal", 3.785411784);

    private final String ucum;
    private final String label;
    private final double litres;

    VolumeUnit(String ucum, String label, double litres) {
        this.ucum = ucum;
        this.label = label;
        this.litres = litres;
    }

    /** The code on the wire. */
    public String ucum() {
        return ucum;
    }

    /** As written for people. */
    public String label() {
        return label;
    }

    /** L in one of it. */
    public double litres() {
        return litres;
    }

    /** L of a volume in this unit. */
    public double toLitres(double volume) {
        return volume * litres;
    }

    /** A volume in L as one in this unit. */
    public double fromLitres(double volumeL) {
        return volumeL / litres;
    }

    /** The unit of that UCUM code, if there is one. */
    public static Optional<VolumeUnit> ofUcum(String ucum) {
        return Arrays.stream(values()).filter(unit -> unit.ucum.equals(ucum)).findFirst();
    }
}
