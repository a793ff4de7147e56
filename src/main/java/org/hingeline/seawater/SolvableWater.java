package org.hingeline.seawater;

import java.util.Optional;

/**
 * The widest water any of the fits can be asked about: salinity 0 to 50, −2 to 45 °C. Outside, every fit would be
 * extrapolated at once, and the answer would be a number without a meaning.
 */
final class SolvableWater {
    static final double TEMPERATURE_MIN_C = -2;
    static final double TEMPERATURE_MAX_C = 45;
    static final double SALINITY_MAX = 50;

    private SolvableWater() {}

    static Optional<CarbonateResult.Unsolvable> refusal(double temperatureC, double salinity) {
        if (!(temperatureC >= TEMPERATURE_MIN_C && temperatureC <= TEMPERATURE_MAX_C)) {
            return Optional.of(new CarbonateResult.Unsolvable(
                    UnsolvableReason.TEMPERATURE_NOT_COVERED,
                    "temperature " + temperatureC + " °C: no fit covers it, −2 to 45 °C is accepted"));
        }
        if (!(salinity >= 0 && salinity <= SALINITY_MAX)) {
            return Optional.of(new CarbonateResult.Unsolvable(
                    UnsolvableReason.SALINITY_NOT_COVERED,
                    "salinity " + salinity + ": no fit covers it, 0 to 50 is accepted"));
        }
        return Optional.empty();
    }

    static void require(double temperatureC, double salinity) {
        refusal(temperatureC, salinity).ifPresent(r -> {
            throw new IllegalArgumentException(r.detail());
        });
    }
}
