package org.hingeline.seawater;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/**
 * A value from elsewhere beside ours.
 *
 * @param table where it stands under {@code src/test/resources/reference}
 * @param source who gives it, in a word or two
 * @param sourceWords the same in full
 * @param what the quantity, its unit where it has one, and the water
 * @param published as written in the table, to its digits
 * @param tolerance the most by which ours may differ
 * @param ours as computed
 */
record PublishedValue(
        String table, String source, String sourceWords, String what, String published, double tolerance, double ours) {
    double difference() {
        return ours - Double.parseDouble(published);
    }

    boolean agrees() {
        return Math.abs(difference()) <= tolerance;
    }

    /** Ours with two digits more than were published. */
    String shown() {
        BigDecimal given = new BigDecimal(published);
        BigDecimal exact = new BigDecimal(ours);
        return Math.abs(ours) < 1e-3 && ours != 0
                ? exact.round(new MathContext(given.precision() + 2)).toString()
                : exact.setScale(Math.max(0, given.scale()) + 2, RoundingMode.HALF_EVEN)
                        .toPlainString();
    }

    /** 0 where only arithmetic rounds. */
    String shownDifference() {
        return Math.abs(difference()) <= 1e-12 * Math.abs(ours) ? "0" : twoDigits(difference());
    }

    static String twoDigits(double value) {
        return String.format(Locale.ROOT, "%.1e", value);
    }
}
