package org.hingeline.measure;

import java.util.Arrays;
import java.util.Optional;

/**
 * What can be measured at a point, or computed from what was measured there.
 *
 * <p>Every value of a quantity inside the program is in the quantity's canonical {@link Unit}. The sensor range is what
 * an instrument of the trade can show at all (starting values, common practice, no source); a value outside it is a
 * fault of the instrument or the wire, not a state of the water.
 */
public enum Quantity {
    /** Acidity as the sensor reads it, on the scale the sensor is registered with. */
    PH("ph", "pH", Unit.PH, 2, 12, true),
    /** Water temperature, ITS-90. */
    TEMPERATURE("temperature", "temperature", Unit.CELSIUS, -5, 45, true),
    /** Practical salinity, PSS-78. */
    SALINITY("salinity", "salinity", Unit.ONE, 0, 42, true),
    CONDUCTIVITY("conductivity", "conductivity", Unit.MILLISIEMENS_PER_CM, 0, 80, true),
    /** Total alkalinity, Dickson 1981. */
    TOTAL_ALKALINITY("totalAlkalinity", "total alkalinity", Unit.UMOL_PER_KG, 0, 6000, true),
    /** Dissolved inorganic carbon. */
    DIC("dic", "dissolved inorganic carbon", Unit.UMOL_PER_KG, 0, 8000, true),
    /** Partial pressure of CO2 in air in balance with the water. */
    PCO2("pco2", "pCO2", Unit.UATM, 0, 20000, true),
    CALCIUM("calcium", "calcium", Unit.MMOL_PER_KG, 0, 40, true),
    DISSOLVED_OXYGEN("dissolvedOxygen", "dissolved oxygen", Unit.MG_PER_L, 0, 40, true),
    FLOW("flow", "flow", Unit.L_PER_MIN, 0, 1_000_000, true),
    LEVEL("level", "water level", Unit.METRE, -20, 20, true),
    /** Total ammonia, as nitrogen. */
    AMMONIA("ammonia", "total ammonia nitrogen", Unit.MG_PER_L, 0, 100, true),

    /** Aragonite saturation state, computed. */
    OMEGA_ARAGONITE("omegaAragonite", "\u03a9", Unit.ONE, 0, 100, false),
    /** Calcite saturation state, computed. */
    OMEGA_CALCITE("omegaCalcite", "\u03a9 calcite", Unit.ONE, 0, 100, false),
    /** pH on the total scale at the water's temperature, computed from the sensor's reading. */
    PH_TOTAL("phTotal", "pH (total scale)", Unit.PH, 0, 14, false),
    /** Time since a point last gave a usable value of what its limits watch. */
    SILENCE("silence", "silence", Unit.MINUTE, 0, 1_000_000, false);

    private final String code;
    private final String words;
    private final Unit unit;
    private final double sensorMin;
    private final double sensorMax;
    private final boolean measured;

    Quantity(String code, String words, Unit unit, double sensorMin, double sensorMax, boolean measured) {
        this.code = code;
        this.words = words;
        this.unit = unit;
        this.sensorMin = sensorMin;
        this.sensorMax = sensorMax;
        this.measured = measured;
    }

    /** The name on the wire, for example {@code totalAlkalinity}. */
    public String code() {
        return code;
    }

    /** The name in a sentence, for example {@code total alkalinity}. */
    public String words() {
        return words;
    }

    /** The unit every value of this quantity has inside the program. */
    public Unit unit() {
        return unit;
    }

    /** Least value a sound instrument can show, canonical unit. */
    public double sensorMin() {
        return sensorMin;
    }

    /** Greatest value a sound instrument can show, canonical unit. */
    public double sensorMax() {
        return sensorMax;
    }

    /** Whether sensors report it; otherwise it is computed and no reading of it is accepted. */
    public boolean measured() {
        return measured;
    }

    public static Optional<Quantity> ofCode(String code) {
        return Arrays.stream(values()).filter(q -> q.code.equals(code)).findFirst();
    }

    /** The codes a reading may carry, as one comma-separated list for error texts. */
    public static String measuredCodes() {
        return String.join(
                ", ",
                Arrays.stream(values())
                        .filter(Quantity::measured)
                        .map(Quantity::code)
                        .toList());
    }

    /** The codes an operator may set a limit on, as one comma-separated list for error texts. */
    public static String limitCodes() {
        return String.join(
                ", ",
                Arrays.stream(values())
                        .filter(q -> q != SILENCE)
                        .map(Quantity::code)
                        .toList());
    }
}
