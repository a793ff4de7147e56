package org.hingeline.measure;

import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * From the units people and gateways use to the canonical one: {@code canonical = factor * value + offset}.
 *
 * <p>Units are named by their UCUM code. Only conversions that need nothing but the value are here; a unit per litre
 * becomes one per kilogram only with the water's density, which a single reading does not know.
 */
public record UnitConversion(String ucum, double factor, double offset) {

    public UnitConversion {
        if (!(Double.isFinite(factor) && factor > 0 && Double.isFinite(offset))) {
            throw new IllegalArgumentException("conversion of " + ucum + ": factor " + factor + ", offset " + offset);
        }
    }

    /**
     * The conversion for a quantity given in a unit.
     *
     * @return empty when the quantity is not accepted in that unit
     */
    public static Optional<UnitConversion> of(Quantity quantity, String ucum) {
        return accepted(quantity.unit()).stream()
                .filter(conversion -> conversion.ucum.equals(ucum))
                .findFirst();
    }

    /** The UCUM codes accepted for a quantity, as one comma-separated list for error texts. */
    public static String acceptedFor(Quantity quantity) {
        return accepted(quantity.unit()).stream().map(UnitConversion::ucum).collect(Collectors.joining(", "));
    }

    /** The value in the canonical unit. */
    public double toCanonical(double value) {
        return factor * value + offset;
    }

    /** A standard uncertainty (a difference, so without the offset) in the canonical unit. */
    public double uncertaintyToCanonical(double standardUncertainty) {
        return factor * standardUncertainty;
    }

    private static UnitConversion by(String ucum, double factor) {
        return new UnitConversion(ucum, factor, 0);
    }

    /** The canonical unit first. */
    private static List<UnitConversion> accepted(Unit unit) {
        return switch (unit) {
            // practical salinity is often sent as parts per thousand
            case ONE -> List.of(by("1", 1), by("[ppth]", 1));
            case PH -> List.of(by("[pH]", 1), by("1", 1));
            case CELSIUS ->
                List.of(
                        by("Cel", 1),
                        new UnitConversion("K", 1, -273.15),
                        new UnitConversion("[degF]", 5.0 / 9.0, -160.0 / 9.0));
            case MILLISIEMENS_PER_CM -> List.of(by("mS/cm", 1), by("S/m", 10), by("uS/cm", 1e-3));
            case UMOL_PER_KG -> List.of(by("umol/kg", 1), by("mmol/kg", 1e3), by("mol/kg", 1e6));
            case MMOL_PER_KG -> List.of(by("mmol/kg", 1), by("umol/kg", 1e-3), by("mol/kg", 1e3));
            case UATM -> List.of(by("uatm", 1), by("Pa", 1e6 / 101325.0));
            case MG_PER_L -> List.of(by("mg/L", 1), by("ug/L", 1e-3));
            case L_PER_MIN ->
                List.of(
                        by("L/min", 1),
                        by("m3/h", 1000.0 / 60.0),
                        by("L/h", 1.0 / 60.0),
                        by("[gal_us]/min", 3.785411784));
            case METRE -> List.of(by("m", 1), by("cm", 0.01), by("mm", 0.001), by("[ft_i]", 0.3048));
            case MINUTE -> List.of(by("min", 1), by("s", 1.0 / 60.0), by("h", 60));
        };
    }
}
