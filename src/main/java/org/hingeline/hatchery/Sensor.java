package org.hingeline.hatchery;

import org.hingeline.measure.Quantity;
import org.hingeline.measure.Units;
import org.hingeline.seawater.PhScale;
import org.jspecify.annotations.Nullable;

/**
 * What measures one quantity at a point.
 *
 * @param unit UCUM code of the unit it reports in, used when a reading names none; it may be one per litre
 * @param phScale the scale a pH sensor is calibrated on; required for pH, absent for all else
 * @param standardUncertainty of one value, in the quantity's canonical unit, above 0
 */
public record Sensor(
        long id,
        long pointId,
        String code,
        Quantity quantity,
        String unit,
        @Nullable PhScale phScale,
        double standardUncertainty,
        @Nullable String serial) {

    public Sensor {
        Codes.check("sensor code", code);
        if (!quantity.measured()) {
            throw new IllegalArgumentException(
                    "quantity \"" + quantity.code() + "\" is computed; a sensor measures " + Quantity.measuredCodes());
        }
        if (Units.find(quantity, unit).isEmpty()) {
            throw new IllegalArgumentException(
                    "unit \"" + unit + "\" of " + quantity.code() + " must be one of " + Units.codes(quantity));
        }
        if ((quantity == Quantity.PH) != (phScale != null)) {
            throw new IllegalArgumentException(
                    quantity == Quantity.PH
                            ? "phScale is missing: a pH sensor must say its scale (total, seawater, free or nbs)"
                            : "phScale " + phScale + " makes no sense for " + quantity.code());
        }
        if (!(standardUncertainty > 0 && Double.isFinite(standardUncertainty))) {
            throw new IllegalArgumentException("standardUncertainty " + standardUncertainty + " must be above 0");
        }
    }
}
