package org.hingeline.seawater;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Optional;

/** The salinity and temperature over which the authors of a published fit say it holds. Immutable. */
public final class FitRange {
    /** The code of the caution that this range gives. */
    public static final String CAUTION_CODE = "outside-fit-range";

    private static final MathContext FOUR_DIGITS = new MathContext(4);

    private final double salinityMin;
    private final double salinityMax;
    private final double temperatureMinC;
    private final double temperatureMaxC;
    private final String words;

    /**
     * @param fit what the fit gives and who published it, as it should read in a sentence
     * @param salinityMin lowest practical salinity
     * @param salinityMax highest practical salinity
     * @param temperatureMinC lowest temperature, °C
     * @param temperatureMaxC highest temperature, °C
     */
    FitRange(String fit, double salinityMin, double salinityMax, double temperatureMinC, double temperatureMaxC) {
        if (!(salinityMin <= salinityMax) || !(temperatureMinC <= temperatureMaxC)) {
            throw new IllegalArgumentException("a range must not be empty: salinity " + salinityMin + " to "
                    + salinityMax + ", temperature " + temperatureMinC + " to " + temperatureMaxC + " °C");
        }
        this.salinityMin = salinityMin;
        this.salinityMax = salinityMax;
        this.temperatureMinC = temperatureMinC;
        this.temperatureMaxC = temperatureMaxC;
        this.words = fit + " is published for salinity " + plain(salinityMin) + " to " + plain(salinityMax) + " and "
                + plain(temperatureMinC) + " to " + plain(temperatureMaxC) + " °C; this water is at salinity ";
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
        return covers(temperatureC, salinity) ? Optional.empty() : Optional.of(outside(place(temperatureC, salinity)));
    }

    /** The caution for a water outside, told by its {@link #place}. */
    Caution outside(String place) {
        return new Caution(CAUTION_CODE, words + place);
    }

    /** The end of the sentence, the same for every fit. */
    static String place(double temperatureC, double salinity) {
        return plain(salinity) + ", " + plain(temperatureC) + " °C.";
    }

    private static String plain(double value) {
        return value == Math.rint(value) && Math.abs(value) < 1e15
                ? Long.toString((long) value)
                : new BigDecimal(value).round(FOUR_DIGITS).toPlainString();
    }
}
