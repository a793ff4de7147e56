package org.hingeline.monitor;

import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.hingeline.measure.Quantity;

/** How old an input may be to still stand for the water, for each quantity a water state needs. */
public record AgeLimits(Map<Quantity, Duration> longest) {

    /** What a water state is computed from, in the order it is shown. */
    public static final List<Quantity> NEEDED =
            List.of(Quantity.PH, Quantity.TEMPERATURE, Quantity.SALINITY, Quantity.TOTAL_ALKALINITY);

    /**
     * Whatever a reading of can change a water state: salinity may come from conductivity, and a measured calcium takes
     * the place of the one that salinity tells.
     */
    public static final List<Quantity> ENTERING = List.of(
            Quantity.PH,
            Quantity.TEMPERATURE,
            Quantity.SALINITY,
            Quantity.TOTAL_ALKALINITY,
            Quantity.CONDUCTIVITY,
            Quantity.CALCIUM);

    public AgeLimits {
        longest = Map.copyOf(longest);
        for (Quantity quantity : NEEDED) {
            Duration age = longest.get(quantity);
            if (age == null || age.isNegative() || age.isZero()) {
                throw new IllegalArgumentException("the age limit of " + quantity.code() + " must be above 0");
            }
        }
    }

    /**
     * The limit of a quantity; that of conductivity is that of the salinity it gives, and calcium, titrated by hand, has
     * that of the alkalinity.
     */
    public Duration of(Quantity quantity) {
        if (quantity == Quantity.CONDUCTIVITY) {
            return of(Quantity.SALINITY);
        }
        if (quantity == Quantity.CALCIUM) {
            return of(Quantity.TOTAL_ALKALINITY);
        }
        return Objects.requireNonNull(longest.get(quantity), () -> quantity.code() + " has no age limit");
    }

    /** The longest of all: a reading older than this changes no state of the present. */
    public Duration longestOfAll() {
        return NEEDED.stream().map(this::of).max(Duration::compareTo).orElseThrow();
    }
}
