package org.hingeline.monitor;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.Unit;

/** Numbers, times and lengths of time the way a message says them. */
final class Wording {
    private static final DateTimeFormatter CLOCK = DateTimeFormatter.ofPattern("HH:mm", Locale.ROOT);
    // the names of the months are English, as the rest of the text
    private static final DateTimeFormatter DAY_AND_CLOCK =
            DateTimeFormatter.ofPattern("d MMM yyyy, HH:mm", Locale.ENGLISH);

    private Wording() {}

    /** Decimals that mean something for a value of the quantity. */
    static int decimals(Quantity quantity) {
        return switch (quantity) {
            case PH, PH_TOTAL, OMEGA_ARAGONITE, OMEGA_CALCITE, CALCIUM, LEVEL, AMMONIA -> 2;
            case TEMPERATURE, SALINITY, CONDUCTIVITY, DISSOLVED_OXYGEN, FLOW -> 1;
            case TOTAL_ALKALINITY, DIC, PCO2, SILENCE -> 0;
        };
    }

    /** Decimals with which the value is still seen to be on its side of the threshold: at most two more than usual. */
    static int decimals(Quantity quantity, double value, double threshold) {
        int usual = decimals(quantity);
        if (value == threshold) {
            return usual;
        }
        for (int decimals = usual; decimals < usual + 2; decimals++) {
            int shown = rounded(value, decimals).compareTo(BigDecimal.valueOf(threshold));
            if (shown != 0 && shown == Double.compare(value, threshold)) {
                return decimals;
            }
        }
        return usual + 2;
    }

    static String number(double value, int decimals) {
        return rounded(value, decimals).toPlainString();
    }

    /** A number somebody set: with all the decimals they gave it. */
    static String asSet(Quantity quantity, double value) {
        BigDecimal exact = BigDecimal.valueOf(value).stripTrailingZeros();
        int decimals = decimals(quantity);
        return (exact.scale() < decimals ? exact.setScale(decimals, RoundingMode.UNNECESSARY) : exact).toPlainString();
    }

    static String withUnit(String number, Unit unit) {
        return unit.symbol().isEmpty() ? number : number + " " + unit.symbol();
    }

    /** "1.62 ±0.11", or the number alone when its uncertainty is not known or does not show. */
    static String withUncertainty(double value, double standardUncertainty, int decimals) {
        if (!Double.isFinite(standardUncertainty)) {
            return number(value, decimals);
        }
        BigDecimal shown = rounded(standardUncertainty, decimals);
        return number(value, decimals) + (shown.signum() > 0 ? " ±" + shown.toPlainString() : "");
    }

    /** "12 min", "3 h 5 min", "2 d 4 h". */
    static String length(Duration length) {
        long minutes = Math.max(0, length.toMinutes());
        if (minutes < 1) {
            return "less than a minute";
        }
        if (minutes < 60) {
            return minutes + " min";
        }
        long hours = minutes / 60;
        return hours < 48 ? joined(hours, "h", minutes % 60, "min") : joined(hours / 24, "d", hours % 24, "h");
    }

    /** The time of day, and the day too when it is not the day of {@code now}. */
    static String time(Instant time, Instant now, ZoneId zone) {
        ZonedDateTime local = time.atZone(zone);
        return local.toLocalDate().equals(now.atZone(zone).toLocalDate())
                ? CLOCK.format(local)
                : DAY_AND_CLOCK.format(local);
    }

    static String dayAndTime(Instant time, ZoneId zone) {
        return DAY_AND_CLOCK.format(time.atZone(zone));
    }

    /** "20 m3", "400 L". */
    static String volume(double litres) {
        BigDecimal shown = litres < 1000 ? BigDecimal.valueOf(litres) : BigDecimal.valueOf(litres / 1000);
        String number =
                shown.setScale(1, RoundingMode.HALF_UP).stripTrailingZeros().toPlainString();
        return number + (litres < 1000 ? " L" : " m3");
    }

    /** Text from people, fit for one line. */
    static String oneLine(String text) {
        return text.codePoints()
                .map(c -> Character.isISOControl(c) || c == 0x2028 || c == 0x2029 ? ' ' : c)
                .collect(StringBuilder::new, StringBuilder::appendCodePoint, StringBuilder::append)
                .toString()
                .strip();
    }

    /** At most so many characters, the cut marked. */
    static String cut(String text, int most) {
        if (text.length() <= most) {
            return text;
        }
        int end = Character.isHighSurrogate(text.charAt(most - 2)) ? most - 2 : most - 1;
        return text.substring(0, end).stripTrailing() + "…";
    }

    private static BigDecimal rounded(double value, int decimals) {
        return BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_EVEN);
    }

    private static String joined(long large, String largeUnit, long small, String smallUnit) {
        return large + " " + largeUnit + (small == 0 ? "" : " " + small + " " + smallUnit);
    }
}
