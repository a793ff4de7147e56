package org.hingeline.web.view;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.hingeline.measure.UnitConversion;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.web.view.Contours.Spot;
import org.hingeline.web.view.OmegaField.Range;
import org.jspecify.annotations.Nullable;

/**
 * Ω aragonite around one water, over the two quantities it was worked out from: as a shell grows, ring by ring, with the
 * limit as its lip. Places are percent of the drawing as SVG wants them; paths live in a box 1000 by 1000.
 *
 * @param summary what is shown, in words
 * @param reach where Ω reaches the limit, or 1 when none is set, in words; empty when that lies outside
 * @param first left to right
 * @param second upwards
 * @param rings lines of equal Ω
 * @param limit the label of the limit; empty when none is set
 * @param shortOf outline of what lies under the limit; empty without a limit
 * @param beyond outline of what lies on its other side; empty without a limit
 * @param x where the water lies
 * @param y where the water lies
 * @param box the water with its ± both ways
 */
public record OmegaPicture(
        String summary,
        String reach,
        Scale first,
        Scale second,
        List<Ring> rings,
        String limit,
        String shortOf,
        String beyond,
        String x,
        String y,
        Box box) {
    private static final int COLUMNS = 61;
    private static final int ROWS = 41;
    private static final int TICKS = 6;
    private static final double[] WIDER = {1, 1.6, 2.5};

    /** One axis: its name with the unit, and its round values. */
    public record Scale(String name, List<Tick> ticks) {
        public Scale {
            ticks = List.copyOf(ticks);
        }
    }

    /** A round value on an axis and where it lies. */
    public record Tick(String at, String label) {}

    /**
     * A line of equal Ω.
     *
     * @param css {@code limit}, {@code one} (where aragonite begins to dissolve) or {@code ring}
     * @param path the line
     * @param label the value
     * @param x where the label stands
     * @param y where the label stands
     */
    public record Ring(String css, String path, String label, String x, String y) {}

    /** A rectangle, in percent. */
    public record Box(String x, String y, String width, String height) {}

    /**
     * How a person reads one of the two quantities.
     *
     * @param name as in a sentence: "pH", "alkalinity"
     * @param unit its unit or scale: "total scale", "meq/L"; may be empty
     * @param conversion to the canonical unit
     * @param plusMinus its standard uncertainty, canonical unit
     */
    public record Reading(String name, String unit, UnitConversion conversion, double plusMinus) {
        String titled() {
            return unit.isEmpty() ? name : name + ", " + unit;
        }

        String with(String value) {
            return unit.isEmpty() || unit.endsWith("scale") ? name + " " + value : name + " " + value + "\u00a0" + unit;
        }
    }

    public OmegaPicture {
        rings = List.copyOf(rings);
    }

    /**
     * Draws a water.
     *
     * @param state solved from what was measured
     * @param first how the first of its two quantities is read
     * @param second how the second is read
     * @param limit the least Ω wanted; null for none
     */
    public static OmegaPicture draw(CarbonateState state, Reading first, Reading second, @Nullable Double limit) {
        OmegaField field = new OmegaField(state);
        Range across = around(field, true, 1);
        Range up = around(field, false, 1);
        double[][] grid = field.grid(across, up, COLUMNS, ROWS);
        for (int i = 1; i < WIDER.length && limit != null && !holds(grid, limit); i++) {
            across = around(field, true, WIDER[i]);
            up = around(field, false, WIDER[i]);
            grid = field.grid(across, up, COLUMNS, ROWS);
        }
        double x = across.share(field.firstValue());
        double y = 1 - up.share(field.secondValue());
        boolean shaded = limit != null && holds(grid, limit);
        PictureShade shade = shaded && limit != null ? PictureShade.of(grid, limit) : PictureShade.NONE;
        return new OmegaPicture(
                summary(field, first, second, across, up),
                PictureWords.reach(field, first, second, across, up, limit),
                scale(first, across, false),
                scale(second, up, true),
                PictureRings.of(grid, limit, x, y),
                shaded && limit != null ? AxisTicks.label(limit, 2) : "",
                shade.shortOf(),
                shade.beyond(),
                percent(x),
                percent(y),
                box(first, second, across, up, x, y));
    }

    private static Range around(OmegaField field, boolean first, double wider) {
        double value = first ? field.firstValue() : field.secondValue();
        return switch (first ? field.first() : field.second()) {
            case PH -> new Range(Math.max(2, value - 0.4 * wider), Math.min(13, value + 0.4 * wider));
            case PCO2 ->
                new Range(
                        Math.max(1, value - Math.max(100, 0.6 * value) * wider),
                        value + Math.max(100, 0.6 * value) * wider);
            default ->
                new Range(
                        Math.max(1, value - Math.max(120, 0.12 * Math.abs(value)) * wider),
                        Math.max(1, value) + Math.max(120, 0.12 * Math.abs(value)) * wider);
        };
    }

    private static boolean holds(double[][] grid, double level) {
        boolean under = false;
        boolean over = false;
        for (double[] row : grid) {
            for (double value : row) {
                under |= value < level;
                over |= value > level;
            }
        }
        return under && over;
    }

    private static String summary(OmegaField field, Reading first, Reading second, Range across, Range up) {
        return "\u03a9 aragonite of waters with " + PictureWords.span(first, across) + " and "
                + PictureWords.span(second, up) + ", all else as given. " + PictureWords.slopes(field, first, second);
    }

    private static Scale scale(Reading reading, Range range, boolean upwards) {
        UnitConversion unit = reading.conversion();
        AxisTicks ticks = AxisTicks.between(unit.fromCanonical(range.low()), unit.fromCanonical(range.high()), TICKS);
        List<Tick> placed = new ArrayList<>();
        for (double value : ticks.values()) {
            double share = range.share(unit.toCanonical(value));
            if (share > 0.06 && share < 0.94) {
                placed.add(new Tick(percent(upwards ? 1 - share : share), AxisTicks.label(value, ticks.digits())));
            }
        }
        return new Scale(reading.titled(), placed);
    }

    private static Box box(Reading first, Reading second, Range across, Range up, double x, double y) {
        double halfX = first.plusMinus() / (across.high() - across.low());
        double halfY = second.plusMinus() / (up.high() - up.low());
        return new Box(percent(x - halfX), percent(y - halfY), percent(2 * halfX), percent(2 * halfY));
    }

    /** Path data of a line on the grid. */
    static String path(List<Spot> line) {
        StringBuilder path = new StringBuilder();
        for (Spot spot : line) {
            path.append(path.isEmpty() ? 'M' : 'L')
                    .append(thousand(spot.column() / (COLUMNS - 1)))
                    .append(' ')
                    .append(thousand(1 - spot.row() / (ROWS - 1)));
        }
        return path.toString();
    }

    static double shareAcross(Spot spot) {
        return spot.column() / (COLUMNS - 1);
    }

    static double shareDown(Spot spot) {
        return 1 - spot.row() / (ROWS - 1);
    }

    static String thousand(double share) {
        return String.format(Locale.ROOT, "%.0f", share * 1000);
    }

    static String percent(double share) {
        return String.format(Locale.ROOT, "%.2f%%", share * 100);
    }
}
