package org.hingeline.seawater;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/**
 * A value from elsewhere beside ours.
 *
 * @param table where it stands under {@code src/test/resources/reference}
 * @param source who gives it
 * @param what the quantity, its unit where it has one, and the water
 * @param published as written in the table, to its digits
 * @param tolerance the most by which ours may differ
 * @param ours as computed
 */
record PublishedValue(String table, String source, String what, String published, double tolerance, double ours) {
    double difference() {
        return ours - Double.parseDouble(published);
    }

    boolean agrees() {
        return Math.abs(difference()) <= tolerance;
    }

    /** A line of a Markdown table; ours with two digits more than were published, a difference of rounding as 0. */
    String row() {
        int scale = new BigDecimal(published).scale();
        boolean tiny = Math.abs(ours) < 1e-3 && ours != 0;
        String shown = tiny
                ? new BigDecimal(ours)
                        .round(new MathContext(new BigDecimal(published).precision() + 2))
                        .toString()
                : new BigDecimal(ours)
                        .setScale(Math.max(0, scale) + 2, RoundingMode.HALF_EVEN)
                        .toPlainString();
        boolean rounding = Math.abs(difference()) <= 1e-12 * Math.abs(ours);
        return "| " + what + " | " + published + " | " + shown + " | "
                + (rounding ? "0" : String.format(Locale.ROOT, "%.1e", difference())) + " | "
                + String.format(Locale.ROOT, "%.1e", tolerance) + " | " + source + " |";
    }
}
