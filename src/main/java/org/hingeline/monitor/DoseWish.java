package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/**
 * A dose plan as a person or a script asks for it; what is absent takes the point's value or the site's default.
 *
 * @param point code of the tank whose water is meant; either this or {@code water}
 * @param water a water given by its numbers, without wishes about what it becomes
 * @param volumeL of the tank, L; of the point where absent
 * @param stockTemperatureC of the stock, °C; of the water where absent
 * @param larvaeInWater whether larvae are in the water that is dosed; where absent, so it is in a larval tank and where a
 *     batch is
 */
public record DoseWish(
        @Nullable String point,
        @Nullable WaterWish water,
        @Nullable Double volumeL,
        @Nullable Target target,
        @Nullable Agent agent,
        @Nullable Bounds bounds,
        @Nullable Double stockGramsPerLitre,
        @Nullable Double stockTemperatureC,
        @Nullable Double aerateToUatm,
        @Nullable Boolean larvaeInWater) {

    /** A wish for a tank that says nothing more. */
    public DoseWish(
            @Nullable String point,
            @Nullable WaterWish water,
            @Nullable Double volumeL,
            @Nullable Target target,
            @Nullable Agent agent,
            @Nullable Bounds bounds,
            @Nullable Double stockGramsPerLitre,
            @Nullable Double aerateToUatm) {
        this(point, water, volumeL, target, agent, bounds, stockGramsPerLitre, null, aerateToUatm, null);
    }

    /** Exactly one of them. */
    public record Target(
            @Nullable Double omegaAragonite,
            @Nullable Double phTotal,
            @Nullable Double totalAlkalinityUmolKg) {}

    public record Agent(
            @Nullable String code,
            @Nullable String hydration,
            @Nullable Double assayPercent) {}

    public record Bounds(
            @Nullable Double phTotalMax,
            @Nullable Double omegaAragoniteMax,
            @Nullable Double phPerHourMax) {}
}
