package org.hingeline.web.view;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.time.format.DateTimeFormatter;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * The intake over the hours that end now, as a drawing: the tide as its outline where levels were read, hatched by how the water
 * stood. Places along it are percent of its width as SVG wants them.
 *
 * @param title what the strip shows, as a sentence start: "Intake, last 24 h"
 * @param summary the same in words, for those who do not see the drawing
 * @param spans how the water stood, oldest first, without overlap
 * @param sky outline of what lies above the water as SVG path data in a box 1000 wide and 100 high
 * @param surface the water's surface in the same box
 * @param tide whether the surface is the level read; otherwise it is flat and says nothing
 * @param ticks times along the foot
 */
public record TideStrip(
        String title, String summary, List<Span> spans, String sky, String surface, boolean tide, List<Tick> ticks) {

    /** A stretch of time in which the water stood the same. Numbers are percent of the width. */
    public record Span(String x, String width, Standing standing, String words, boolean roomy) {}

    /** A time along the foot, in the site's zone; {@code major} ones are shown on a narrow screen too. */
    public record Tick(String x, String label, boolean major) {}

    /** How the intake stood from one moment to another. */
    public record Stretch(Instant from, Instant to, Standing standing) {}

    /** The water's level as read, in metres above any fixed datum. */
    public record Level(Instant at, double metres) {}

    private static final DateTimeFormatter CLOCK = DateTimeFormatter.ofPattern("HH:mm", Locale.ENGLISH);
    /** What lasted shorter in all is too small to see in the drawing and not worth a word, unless it is how things stand now. */
    private static final Duration WORTH_TELLING = Duration.ofMinutes(10);

    private static final int HIGH_WATER = 10;
    private static final int LOW_WATER = 62;
    private static final int NO_TIDE = 24;

    public TideStrip {
        spans = List.copyOf(spans);
        ticks = List.copyOf(ticks);
    }

    /**
     * Draws the strip.
     *
     * @param title what it shows
     * @param from its left edge
     * @param now its right edge
     * @param zone of the times along the foot
     * @param stretches how the water stood; what no stretch covers is drawn as not known
     * @param levels levels read in this time, in order; with fewer than two the surface is flat
     */
    public static TideStrip draw(
            String title, Instant from, Instant now, ZoneId zone, List<Stretch> stretches, List<Level> levels) {
        List<Stretch> whole = withoutHoles(from, now, stretches);
        String surface = surface(from, now, levels);
        return new TideStrip(
                title,
                summary(title, whole),
                whole.stream().map(s -> span(from, now, s)).toList(),
                surface + "L1000 0L0 0Z",
                surface,
                levels.size() > 1,
                ticks(from, now, zone));
    }

    private static List<Stretch> withoutHoles(Instant from, Instant now, List<Stretch> stretches) {
        List<Stretch> whole = new ArrayList<>();
        Instant done = from;
        for (Stretch s : stretches) {
            Instant start = s.from().isBefore(done) ? done : s.from();
            Instant end = s.to().isAfter(now) ? now : s.to();
            if (!start.isBefore(end)) {
                continue;
            }
            if (done.isBefore(start)) {
                add(whole, new Stretch(done, start, Standing.UNKNOWN));
            }
            add(whole, new Stretch(start, end, s.standing()));
            done = end;
        }
        if (done.isBefore(now)) {
            add(whole, new Stretch(done, now, Standing.UNKNOWN));
        }
        return whole;
    }

    private static void add(List<Stretch> whole, Stretch next) {
        int last = whole.size() - 1;
        if (last >= 0 && whole.get(last).standing() == next.standing()) {
            whole.set(last, new Stretch(whole.get(last).from(), next.to(), next.standing()));
        } else {
            whole.add(next);
        }
    }

    private static Span span(Instant from, Instant now, Stretch s) {
        double left = share(from, now, s.from());
        double width = share(from, now, s.to()) - left;
        return new Span(
                percent(left), percent(width), s.standing(), s.standing().word(), width >= 0.17);
    }

    private static String summary(String title, List<Stretch> whole) {
        Map<Standing, Duration> sums = new EnumMap<>(Standing.class);
        for (Stretch s : whole) {
            sums.merge(s.standing(), Duration.between(s.from(), s.to()), Duration::plus);
        }
        Standing now = whole.get(whole.size() - 1).standing();
        boolean justNow = sums.getOrDefault(now, Duration.ZERO).compareTo(WORTH_TELLING) < 0;
        sums.values().removeIf(length -> length.compareTo(WORTH_TELLING) < 0);
        String told = sums.size() == 1
                ? sums.keySet().iterator().next().word() + " throughout"
                : sums.entrySet().stream()
                        .map(e -> e.getKey().word() + " " + Moment.span(e.getValue()))
                        .collect(Collectors.joining(", "));
        return title + ": " + told + (justNow ? ", " + now.word() + " just now" : "") + ".";
    }

    private static String surface(Instant from, Instant now, List<Level> levels) {
        if (levels.size() < 2) {
            return "M0 " + NO_TIDE + "L1000 " + NO_TIDE;
        }
        double low = levels.stream().mapToDouble(Level::metres).min().orElse(0);
        double high = levels.stream().mapToDouble(Level::metres).max().orElse(0);
        double range = high - low < 1e-9 ? 1 : high - low;
        StringBuilder path = new StringBuilder();
        double y = NO_TIDE;
        for (Level level : levels) {
            y = LOW_WATER - (level.metres() - low) / range * (LOW_WATER - HIGH_WATER);
            double x = Math.min(1, Math.max(0, share(from, now, level.at()))) * 1000;
            if (path.isEmpty()) {
                path.append(String.format(Locale.ROOT, "M0 %.1f", y));
            }
            path.append(String.format(Locale.ROOT, "L%.1f %.1f", x, y));
        }
        return path.append(String.format(Locale.ROOT, "L1000 %.1f", y)).toString();
    }

    private static List<Tick> ticks(Instant from, Instant now, ZoneId zone) {
        List<Tick> ticks = new ArrayList<>();
        ZonedDateTime hour = from.atZone(zone).truncatedTo(ChronoUnit.HOURS).plusHours(1);
        for (; hour.toInstant().isBefore(now); hour = hour.plusHours(1)) {
            double x = share(from, now, hour.toInstant());
            if (hour.getHour() % 3 == 0 && x > 0.04 && x < 0.9) {
                ticks.add(new Tick(percent(x), CLOCK.format(hour), hour.getHour() % 6 == 0));
            }
        }
        return ticks;
    }

    private static double share(Instant from, Instant now, Instant at) {
        return (double) Duration.between(from, at).toMillis()
                / Duration.between(from, now).toMillis();
    }

    private static String percent(double share) {
        return String.format(Locale.ROOT, "%.3f%%", share * 100);
    }
}
