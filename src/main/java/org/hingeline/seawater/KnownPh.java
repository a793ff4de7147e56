package org.hingeline.seawater;

import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * A pH as it was read.
 *
 * @param value pH on {@code scale}, 2 to 13
 * @param scale the scale of {@code value}
 * @param readAtC temperature of the sample when the pH was read, °C, −2 to 45; null when it was the water's own
 */
public record KnownPh(double value, PhScale scale, @Nullable Double readAtC) {
    public KnownPh {
        Objects.requireNonNull(scale, "scale");
    }

    /** Read at the water's own temperature. */
    public static KnownPh on(PhScale scale, double value) {
        return new KnownPh(value, scale, null);
    }

    /** Read at the water's own temperature on the total scale. */
    public static KnownPh total(double value) {
        return on(PhScale.TOTAL, value);
    }

    /** The same pH, read in a sample at that temperature, °C. */
    public KnownPh readAt(double temperatureC) {
        return new KnownPh(value, scale, temperatureC);
    }

    /** The temperature at which it was read, in a water of that temperature, °C. */
    double readAtC(double waterTemperatureC) {
        return readAtC == null ? waterTemperatureC : readAtC;
    }

    @Override
    public String toString() {
        return "pH " + value + " (" + scale.wireName() + (readAtC == null ? "" : ", read at " + readAtC + " °C") + ")";
    }
}
