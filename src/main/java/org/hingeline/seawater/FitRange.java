package org.hingeline.seawater;

import java.util.Locale;
import java.util.Optional;

/**
 * The salinity and temperature over which the authors of a published fit say it holds.
 *
 * @param fit what the fit gives and who published it, as it should read in a sentence
 * @param salinityMin lowest practical salinity
 * @param salinityMax highest practical salinity
 * @param temperatureMinC lowest temperature, °C
 * @param temperatureMaxC highest temperature, °C
 */
public record FitRange(
        String fit, double salinityMin, double salinityMax, double temperatureMinC, double temperatureMaxC) {
    /** The code of the caution that this range gives. */
    public static final String CAUTION_CODE = "outside-fit-range";

    public FitRange {
        if (!(salinityMin <= salinityMax) || !(temperatureMinC <= temperatureMaxC)) {
            throw new IllegalArgumentException("a range must not be empty: salinity " + salinityMin + " to "
                    + salinityMax + ", temperature " + temperatureMinC + " to " + temperatureMaxC + " °C");
        }
    }

    /** Whether the water lies inside, the ends included. */
    public boolean covers(double temperatureC, double salinity) {
        return salinity >= salinityMin
                && salinity <= salinityMax
                && temperatureC >= temperatureMinC
                && temperatureC <= temperatureMaxC;
    }

    /** A caution naming the fit and its range when the water lies outside. */
    public Optional<Caution> caution(double temperatureC, double salinity) {
        if (covers(temperatureC, salinity)) {
            return Optional.empty();
        }
        return Optional.of(new Caution(
                CAUTION_CODE,
                String.format(
                        Locale.ROOT,
                        "%s is published for salinity %s to %s and %s to %s °C; this water is at salinity %s, %s °C.",
                        fit,
                        plain(salinityMin),
                        plain(salinityMax),
                        plain(temperatureMinC),
                        plain(temperatureMaxC),
                        plain(salinity),
                        plain(temperatureC))));
    }

    private static String plain(double value) {
        return value == Math.rint(value)
                ? String.format(Locale.ROOT, "%.0f", value)
                : String.format(Locale.ROOT, "%.4g", value);
    }
}
