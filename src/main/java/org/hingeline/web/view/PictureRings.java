package org.hingeline.web.view;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.DoubleStream;
import org.hingeline.web.view.Contours.Spot;
import org.hingeline.web.view.OmegaPicture.Ring;
import org.jspecify.annotations.Nullable;

/** Which lines of equal Ω are drawn, and where their labels find room. */
final class PictureRings {
    private static final double[] STEPS = {0.05, 0.1, 0.25, 0.5, 1, 2, 5, 10};
    private static final int MOST = 7;
    private static final double MARGIN = 0.07;
    private static final double MARGIN_OF_WORDS = 0.24;
    /** With less a value stands unlabelled: its neighbours tell it. */
    private static final double LEAST_ROOM = 0.1;
    /** Labels are wider than high: a step down counts for more than one across. */
    private static final double DOWN_COUNTS = 1.6;

    private record Taken(double x, double y) {}

    private final List<Taken> taken = new ArrayList<>();
    private final List<Ring> rings = new ArrayList<>();

    private PictureRings(double x, double y) {
        taken.add(new Taken(x, y));
    }

    /**
     * The rings over a grid.
     *
     * @param x where the water itself lies, which no label may cover, as a share from the left
     * @param y the same from the top
     */
    static List<Ring> of(double[][] grid, @Nullable Double limit, double x, double y) {
        PictureRings made = new PictureRings(x, y);
        if (limit != null) {
            made.add(grid, limit, "limit", "your limit " + AxisTicks.label(limit, 2), MARGIN_OF_WORDS);
        }
        for (double level : levels(grid)) {
            if (limit == null || Math.abs(level - limit) > 0.02 * limit) {
                boolean one = level == 1;
                made.add(grid, level, one ? "one" : "ring", AxisTicks.label(level, level % 0.5 == 0 ? 1 : 2), MARGIN);
            }
        }
        return made.rings;
    }

    private static double[] levels(double[][] grid) {
        DoubleStream known = DoubleStream.of();
        for (double[] row : grid) {
            known = DoubleStream.concat(known, DoubleStream.of(row).filter(Double::isFinite));
        }
        var span = known.summaryStatistics();
        if (span.getCount() == 0) {
            return new double[0];
        }
        double step = STEPS[STEPS.length - 1];
        for (double candidate : STEPS) {
            if ((span.getMax() - span.getMin()) / candidate <= MOST) {
                step = candidate;
                break;
            }
        }
        double chosen = step;
        double least = span.getMin();
        DoubleStream round = DoubleStream.iterate(
                (Math.floor(least / chosen) + 1) * chosen, level -> level < span.getMax(), level -> level + chosen);
        return DoubleStream.concat(round, DoubleStream.of(1))
                .filter(level -> level > span.getMin() && level < span.getMax())
                .map(level -> Math.rint(level * 100) / 100)
                .distinct()
                .sorted()
                .toArray();
    }

    private void add(double[][] grid, double level, String css, String label, double margin) {
        for (List<Spot> line : Contours.at(level, grid)) {
            Spot place = line.stream()
                    .max(Comparator.comparingDouble(spot -> room(spot, margin)))
                    .orElseThrow();
            boolean fits = room(place, margin) > LEAST_ROOM;
            if (fits) {
                take(OmegaPicture.shareAcross(place), OmegaPicture.shareDown(place), margin);
            }
            rings.add(new Ring(
                    css,
                    OmegaPicture.path(line),
                    fits ? label : "",
                    OmegaPicture.percent(OmegaPicture.shareAcross(place)),
                    OmegaPicture.percent(OmegaPicture.shareDown(place))));
        }
    }

    /** A label of words is three times as wide as one of a number. */
    private void take(double x, double y, double margin) {
        taken.add(new Taken(x, y));
        if (margin == MARGIN_OF_WORDS) {
            taken.add(new Taken(x - MARGIN_OF_WORDS / 2, y));
            taken.add(new Taken(x + MARGIN_OF_WORDS / 2, y));
        }
    }

    /** How far a label there would be from all others; negative where it would run over the edge. */
    private double room(Spot spot, double margin) {
        double x = OmegaPicture.shareAcross(spot);
        double y = OmegaPicture.shareDown(spot);
        double inside = Math.min(Math.min(x, 1 - x) - margin, Math.min(y, 1 - y) - MARGIN);
        if (inside < 0) {
            return inside;
        }
        double nearest = taken.stream()
                .mapToDouble(other -> Math.hypot(x - other.x(), DOWN_COUNTS * (y - other.y())))
                .min()
                .orElse(1);
        return Math.min(nearest, 0.35) + 0.1 * Math.min(inside, 0.2);
    }
}
