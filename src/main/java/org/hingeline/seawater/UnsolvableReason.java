package org.hingeline.seawater;

/** Why a water could not be solved. */
public enum UnsolvableReason {
    /** The temperature is not a number or outside −2 to 45 °C. */
    TEMPERATURE_NOT_COVERED("temperature-not-covered"),
    /** The salinity is not a number or outside 0 to 50. */
    SALINITY_NOT_COVERED("salinity-not-covered"),
    /** Phosphate, silicate or calcium is not a number, negative or beyond any natural water. */
    COMPOSITION_OUT_OF_RANGE("composition-out-of-range"),
    /** The pH is not a number or outside 2 to 13. */
    PH_OUT_OF_RANGE("ph-out-of-range"),
    /** The alkalinity is not a number or outside −0.01 to 0.1 mol/kg. */
    ALKALINITY_OUT_OF_RANGE("alkalinity-out-of-range"),
    /** Dissolved inorganic carbon is not a number or outside 0 to 0.1 mol/kg. */
    DIC_OUT_OF_RANGE("dic-out-of-range"),
    /** pCO2 is not a number, not above 0, or above 1 atm. */
    PCO2_OUT_OF_RANGE("pco2-out-of-range"),
    /** The two inputs contradict each other: together they would need a negative amount of carbon. */
    INPUTS_CONTRADICT("inputs-contradict"),
    /** The two inputs would need more inorganic carbon than any water holds, 1 mol/kg. */
    TOO_MUCH_CARBON("too-much-carbon"),
    /** The root finder ran out of steps. */
    NOT_CONVERGED("not-converged");

    private final String code;

    UnsolvableReason(String code) {
        this.code = code;
    }

    /** A stable name for programs. */
    public String code() {
        return code;
    }
}
