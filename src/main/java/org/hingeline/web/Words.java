package org.hingeline.web;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.Locale;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Batch;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.web.view.Moment;

/** Numbers and records as a person reads them on a page. */
final class Words {
    private static final String NO_BREAK_SPACE = "\u00a0";

    private Words() {}

    /** A value with the digits its quantity deserves, thousands set apart, without unit. */
    static String number(Quantity quantity, double value) {
        return number(value, digits(quantity));
    }

    static String number(double value, int digits) {
        String text = String.format(Locale.ROOT, "%,." + digits + "f", value);
        // a minus sign, and a narrow gap instead of the comma that half the world reads as a decimal point
        return text.replace(",", NO_BREAK_SPACE).replace('-', '\u2212');
    }

    static String withUnit(Quantity quantity, double value) {
        String symbol = quantity.unit().symbol();
        return number(quantity, value) + (symbol.isEmpty() ? "" : NO_BREAK_SPACE + symbol);
    }

    private static int digits(Quantity quantity) {
        return switch (quantity) {
            case PH, PH_TOTAL, OMEGA_ARAGONITE, OMEGA_CALCITE, LEVEL, AMMONIA -> 2;
            case TEMPERATURE, SALINITY, CONDUCTIVITY, CALCIUM, DISSOLVED_OXYGEN -> 1;
            case TOTAL_ALKALINITY, DIC, PCO2, FLOW, SILENCE -> 0;
        };
    }

    /** A plain number for a form field or the chart: no padding, no thousands. */
    static String plain(double value) {
        return value == Math.rint(value) && Math.abs(value) < 1e9
                ? String.valueOf((long) value)
                : String.valueOf(value);
    }

    /** "Ω below 1.80 for 10 min; ends at 1.85 or above for 10 min". */
    static String rule(Limit limit) {
        if (limit.onSilence()) {
            return "Nothing usable heard for " + Moment.span(Duration.ofMinutes(Math.round(limit.threshold())));
        }
        double back = limit.side() == Side.BELOW
                ? limit.threshold() + limit.deadband()
                : limit.threshold() - limit.deadband();
        return sentence(limit.quantity().words()) + " " + limit.side().code() + " "
                + withUnit(limit.quantity(), limit.threshold()) + delay(limit.onDelay()) + "; ends at "
                + number(limit.quantity(), back) + " or " + (limit.side() == Side.BELOW ? "above" : "below")
                + delay(limit.offDelay());
    }

    /** With a capital first letter, except where that would change what it says: pH, pCO2. */
    static String sentence(String words) {
        return words.length() > 1 && Character.isUpperCase(words.charAt(1))
                ? words
                : words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1);
    }

    private static String delay(Duration delay) {
        if (delay.isZero()) {
            return "";
        }
        return " for " + (delay.toSeconds() % 60 == 0 ? Moment.span(delay) : delay.toSeconds() + " s");
    }

    /** "Ω 1.62 ±0.11, under your 1.80 since 03:00"; "no usable value from 01:10 to 01:40". */
    static String alert(Alert alert, Instant now, ZoneId zone) {
        Instant until = alert.returnedAt() != null ? alert.returnedAt() : alert.closedAt();
        String from = Moment.of(alert.since(), now, zone).clock();
        String when = until == null
                ? "since " + from
                : "from " + from + " to " + Moment.of(until, now, zone).clock();
        if (alert.quantity() == Quantity.SILENCE) {
            return "no usable value " + when;
        }
        String uncertainty = alert.uncertainty() > 0 ? " \u00b1" + number(alert.quantity(), alert.uncertainty()) : "";
        return alert.quantity().words() + " " + number(alert.quantity(), alert.value()) + uncertainty + ", "
                + alert.side().word() + " your " + withUnit(alert.quantity(), alert.threshold()) + " " + when;
    }

    /** "alkalinity 80 h old, older than the 72 h allowed"; "pH not read in the last 30 min". */
    static String missing(MissingInput missing, Instant now) {
        Instant newest = missing.newestAt();
        String allowed = Moment.span(missing.allowedAge());
        return newest == null
                ? sentence(missing.quantity().words()) + " was not read in the last " + allowed
                : sentence(missing.quantity().words()) + " is " + Moment.span(Duration.between(newest, now))
                        + " old; at most " + allowed + " is allowed";
    }

    /** "Crassostrea gigas, 31 h after spawn: building the first shell". */
    static String batch(Batch batch, Instant now) {
        Duration age = batch.age(now);
        String since =
                age.toHours() < 72 ? age.toHours() + NO_BREAK_SPACE + "h" : age.toDays() + NO_BREAK_SPACE + "days";
        return batch.species() + ", " + since + " after spawn"
                + (batch.buildsFirstShell(now) ? ": building the first shell" : "");
    }
}
