package org.hingeline.seawater;

import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/**
 * Amounts per volume into amounts per mass and back, with the density of {@link MilleroPoisson1981} at the temperature
 * and salinity at which the <em>volume</em> was measured: a pipette fills in the laboratory, not in the tank. 10 °C make
 * about 0.2 %.
 *
 * <p>Salinity 0 to 50, −2 to 45 °C; outside 0 to 42 and −2 to 40 the answer carries a caution.
 */
public final class VolumeAmount {
    /** The code of a refused amount. */
    public static final String AMOUNT_CODE = "amount-out-of-range";

    private static final double LITRES_PER_M3 = 1000;

    private VolumeAmount() {}

    /**
     * mol/kg-seawater of mol/L.
     *
     * @param molPerLitre mol/L; alkalinities may be negative
     * @param temperatureC temperature of the volume, °C (ITS-90)
     * @param salinity practical salinity of the volume
     * @return mol/kg-seawater, or a refusal
     */
    public static Figure perKilogram(double molPerLitre, double temperatureC, double salinity) {
        return convert(molPerLitre, " mol/L", temperatureC, salinity, d -> molPerLitre * LITRES_PER_M3 / d);
    }

    /**
     * mol/L of mol/kg-seawater.
     *
     * @param molPerKilogram mol/kg-seawater; alkalinities may be negative
     * @param temperatureC temperature of the volume, °C (ITS-90)
     * @param salinity practical salinity of the volume
     * @return mol/L, or a refusal
     */
    public static Figure perLitre(double molPerKilogram, double temperatureC, double salinity) {
        return convert(molPerKilogram, " mol/kg", temperatureC, salinity, d -> molPerKilogram * d / LITRES_PER_M3);
    }

    private static Figure convert(
            double amount, String unit, double temperatureC, double salinity, DoubleUnaryOperator withDensity) {
        Optional<Figure.Refused> refused = FigureCheck.water(temperatureC, salinity);
        if (refused.isPresent()) {
            return refused.get();
        }
        double converted = withDensity.applyAsDouble(MilleroPoisson1981.densityKgM3(temperatureC, salinity));
        if (!Double.isFinite(converted)) {
            return new Figure.Refused(AMOUNT_CODE, "the amount " + amount + unit + " is not a finite number");
        }
        return new Figure.Known(converted, FigureCheck.cautions(temperatureC, salinity, MilleroPoisson1981.RANGE));
    }
}
