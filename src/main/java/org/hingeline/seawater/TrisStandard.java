package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The tris check standard: a bottle of synthetic seawater whose pH is known to about 0.002, against which a sensor is
 * held. Fit of {@link DelVallsDickson1998}, salinity 20 to 40, 0 to 45 °C; outside, the answer carries a caution.
 */
public final class TrisStandard {
    private TrisStandard() {}

    /**
     * The pH of the standard.
     *
     * @param temperatureC temperature of the standard, °C (ITS-90), −2 to 45
     * @param salinity practical salinity of the synthetic seawater it was made in, 0 to 50
     * @return pH, total scale, or a refusal
     */
    public static Figure ph(double temperatureC, double salinity) {
        Optional<Figure.Refused> refused = FigureCheck.water(temperatureC, salinity);
        if (refused.isPresent()) {
            return refused.get();
        }
        return new Figure.Known(
                DelVallsDickson1998.ph(Kelvin.of(temperatureC), salinity),
                FigureCheck.cautions(temperatureC, salinity, DelVallsDickson1998.RANGE));
    }

    /**
     * How far a sensor standing in the standard reads from it: positive when the sensor reads too high.
     *
     * @param reading what the sensor shows, pH 2 to 13
     * @param scale the scale of the reading; one on NBS buffers carries a caution
     * @param temperatureC temperature of the standard, °C (ITS-90)
     * @param salinity practical salinity of the standard
     * @return difference in pH, the same on every scale, or a refusal
     */
    public static Figure deviation(double reading, PhScale scale, double temperatureC, double salinity) {
        Optional<Figure.Refused> refused = FigureCheck.ph(reading);
        if (refused.isPresent()) {
            return refused.get();
        }
        if (!(ph(temperatureC, salinity) instanceof Figure.Known standard)) {
            return ph(temperatureC, salinity);
        }
        List<Caution> cautions = new ArrayList<>(standard.cautions());
        if (scale == PhScale.NBS) {
            cautions.add(Takahashi1982.CAUTION);
        }
        return new Figure.Known(scale.toTotal(reading, temperatureC, salinity) - standard.value(), cautions);
    }
}
