package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/**
 * A dose plan as a person or a script asks for it; what is absent takes the point's value or the site's default.
 *
 * @param point code of the tank whose water is meant; either this or {@code water}
 * @param water a water given by its numbers, without wishes about what it becomes
 * @param volumeL of the tank, L; of the point where absent
 * @param flowLMin what flows, L/min: with a volume through the tank, without one past the injection
 * @param secondAgent to hold pH or pCO2 with; sodium bicarbonate where a hold is given and this is absent
 * @param stockTemperatureC of the stock, °C; of the water where absent
 * @param ammoniaMgL total ammonia in the water, mg/L as N; where absent, a fresh reading of the point
 * @param larvaeInWater whether larvae are in the water that is dosed; where absent, so it is in a larval tank and where a
 *     batch is
 */
public record DoseWish(
        @Nullable String point,
        @Nullable WaterWish water,
        @Nullable Double volumeL,
        @Nullable Double flowLMin,
        @Nullable Target target,
        @Nullable Agent agent,
        @Nullable Agent secondAgent,
        @Nullable Hold hold,
        @Nullable Bounds bounds,
        @Nullable Double stockGramsPerLitre,
        @Nullable Double stockTemperatureC,
        @Nullable Double aerateToUatm,
        @Nullable Double ammoniaMgL,
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
        this(
                point,
                water,
                volumeL,
                null,
                target,
                agent,
                null,
                null,
                bounds,
                stockGramsPerLitre,
                null,
                aerateToUatm,
                null,
                null);
    }

    /** Exactly one of them. */
    public record Target(
            @Nullable Double omegaAragonite,
            @Nullable Double phTotal,
            @Nullable Double totalAlkalinityUmolKg) {}

    /**
     * What is in the bag.
     *
     * @param stockGramsPerLitre of a second agent; the first has it beside the other wishes
     */
    public record Agent(
            @Nullable String code,
            @Nullable String hydration,
            @Nullable Double assayPercent,
            @Nullable Double stockGramsPerLitre) {
        public Agent(@Nullable String code, @Nullable String hydration, @Nullable Double assayPercent) {
            this(code, hydration, assayPercent, null);
        }
    }

    /** Exactly one of them. */
    public record Hold(
            @Nullable Double phTotalMax, @Nullable Double pco2Uatm) {}

    public record Bounds(
            @Nullable Double phTotalMax,
            @Nullable Double omegaAragoniteMax,
            @Nullable Double phPerHourMax) {}
}
