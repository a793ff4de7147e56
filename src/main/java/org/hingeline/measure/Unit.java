package org.hingeline.measure;

/** The canonical units, one per kind of quantity, with their UCUM code and the way they are written for people. */
public enum Unit {
    /** No unit: practical salinity, saturation states. */
    ONE("1", ""),
    PH("[pH]", ""),
    CELSIUS("Cel", "\u00b0C"),
    MILLISIEMENS_PER_CM("mS/cm", "mS/cm"),
    UMOL_PER_KG("umol/kg", "\u00b5mol/kg"),
    MMOL_PER_KG("mmol/kg", "mmol/kg"),
    UATM("uatm", "\u00b5atm"),
    MG_PER_L("mg/L", "mg/L"),
    L_PER_MIN("L/min", "L/min"),
    METRE("m", "m"),
    MINUTE("min", "min");

    private final String ucum;
    private final String symbol;

    Unit(String ucum, String symbol) {
        this.ucum = ucum;
        this.symbol = symbol;
    }

    /** The code on the wire. */
    public String ucum() {
        return ucum;
    }

    /** As written for people; empty where the quantity's name says it all. */
    public String symbol() {
        return symbol;
    }
}
