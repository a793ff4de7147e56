package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/**
 * A dose plan as a person or a script asks for it; what is absent takes the point's value or the site's default.
 *
 * @param point code of the tank whose water is meant; either this or {@code water}
 * @param volumeL of the tank, L; of the point where absent
 */
public record DoseWish(
        @Nullable String point,
        @Nullable Water water,
        @Nullable Double volumeL,
        @Nullable Target target,
        @Nullable Agent agent,
        @Nullable Bounds bounds,
        @Nullable Double stockGramsPerLitre,
        @Nullable Double aerateToUatm) {

    /** A water given by its numbers. */
    public record Water(
            @Nullable Double temperatureC,
            @Nullable Double salinity,
            @Nullable Double ph,
            @Nullable String phScale,
            @Nullable Double totalAlkalinityUmolKg,
            @Nullable Uncertainty uncertainty) {}

    /** Standard uncertainties of a water given by its numbers. */
    public record Uncertainty(
            @Nullable Double ph,
            @Nullable Double totalAlkalinityUmolKg,
            @Nullable Double temperatureC,
            @Nullable Double salinity) {}

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
