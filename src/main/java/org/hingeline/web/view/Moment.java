package org.hingeline.web.view;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.time.format.DateTimeFormatter;
import java.util.Locale;

/**
 * A moment as people read it: the clock of the site and the age in words. The page's script lets the age tick on from
 * {@code iso}.
 *
 * @param iso ISO 8601 in UTC, or empty when there was no such moment
 * @param clock time in the site's zone: {@code 03:12} on the same day, {@code 13 May, 03:12} otherwise; {@code never} if none
 * @param age how long ago in words: {@code 2 min ago}; empty if none
 */
public record Moment(String iso, String clock, String age) {
    private static final DateTimeFormatter SAME_DAY = DateTimeFormatter.ofPattern("HH:mm", Locale.ENGLISH);
    private static final DateTimeFormatter SAME_YEAR = DateTimeFormatter.ofPattern("d MMM, HH:mm", Locale.ENGLISH);
    private static final DateTimeFormatter OTHER_YEAR =
            DateTimeFormatter.ofPattern("d MMM yyyy, HH:mm", Locale.ENGLISH);

    /** No moment at all: nothing was ever measured, sent or done. */
    public static Moment never() {
        return new Moment("", "never", "");
    }

    /** The moment {@code at} as seen at {@code now} on the clock of {@code zone}. */
    public static Moment of(Instant at, Instant now, ZoneId zone) {
        ZonedDateTime then = at.atZone(zone);
        ZonedDateTime today = now.atZone(zone);
        DateTimeFormatter clock = then.toLocalDate().equals(today.toLocalDate())
                ? SAME_DAY
                : then.getYear() == today.getYear() ? SAME_YEAR : OTHER_YEAR;
        return new Moment(at.toString(), clock.format(then), age(Duration.between(at, now)));
    }

    /** Whether there was such a moment. */
    public boolean known() {
        return !iso.isEmpty();
    }

    /**
     * A span of time as the age of something: {@code just now}, {@code 2 min ago}, {@code 3 h 5 min ago}, {@code 4 days ago}. A
     * negative span (clocks that disagree) reads {@code just now}.
     */
    public static String age(Duration past) {
        return past.toSeconds() < 60 ? "just now" : span(past) + " ago";
    }

    /** A span of time in words, to the minute below a day, to the hour below three days: {@code 12 min}, {@code 18 h 20 min}. */
    public static String span(Duration length) {
        long minutes = length.toMinutes();
        if (minutes == 0) {
            return "less than a minute";
        }
        if (minutes < 60) {
            return minutes + " min";
        }
        if (minutes < 24 * 60) {
            return minutes % 60 == 0 ? minutes / 60 + " h" : minutes / 60 + " h " + minutes % 60 + " min";
        }
        return minutes < 72 * 60 ? minutes / 60 + " h" : minutes / (24 * 60) + " days";
    }
}
