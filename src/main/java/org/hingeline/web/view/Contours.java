package org.hingeline.web.view;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Lines of equal value over a grid: marching squares with straight interpolation along the edges of the cells. Where a cell
 * could be cut in two ways, the mean of its corners decides. Cells with an unknown corner (not a number) are left out.
 */
final class Contours {
    /** A place on the grid, counted in columns and rows. */
    record Spot(double column, double row) {}

    private final double[][] values;
    private final double level;
    private final int columns;
    private final int rows;
    /** Where the line crosses an edge, by the edge's number. */
    private final Map<Integer, Spot> crossings = new HashMap<>();
    /** The edges that the line goes on to from an edge: at most two. */
    private final Map<Integer, List<Integer>> onward = new LinkedHashMap<>();

    private Contours(double[][] values, double level) {
        this.values = values;
        this.level = level;
        this.rows = values.length;
        this.columns = values[0].length;
    }

    /**
     * The lines on which the grid has that value, each from end to end; a closed one ends where it begins.
     *
     * @param values by row, then column; at least 2 by 2
     */
    static List<List<Spot>> at(double level, double[][] values) {
        Contours contours = new Contours(values, level);
        for (int row = 0; row + 1 < contours.rows; row++) {
            for (int column = 0; column + 1 < contours.columns; column++) {
                contours.cut(column, row);
            }
        }
        return contours.joined();
    }

    private void cut(int column, int row) {
        double a = values[row][column];
        double b = values[row][column + 1];
        double c = values[row + 1][column + 1];
        double d = values[row + 1][column];
        if (Double.isNaN(a + b + c + d)) {
            return;
        }
        List<Integer> cut = new ArrayList<>(4);
        cross(cut, a, b, alongRow(column, row), new Spot(column + share(a, b), row));
        cross(cut, b, c, alongColumn(column + 1, row), new Spot(column + 1, row + share(b, c)));
        cross(cut, d, c, alongRow(column, row + 1), new Spot(column + share(d, c), row + 1));
        cross(cut, a, d, alongColumn(column, row), new Spot(column, row + share(a, d)));
        if (cut.size() == 2) {
            join(cut.get(0), cut.get(1));
        } else if (cut.size() == 4) {
            boolean middleLikeA = above((a + b + c + d) / 4) == above(a);
            join(cut.get(0), cut.get(middleLikeA ? 1 : 3));
            join(cut.get(2), cut.get(middleLikeA ? 3 : 1));
        }
    }

    private void cross(List<Integer> cut, double from, double to, int edge, Spot spot) {
        if (above(from) != above(to)) {
            cut.add(edge);
            crossings.putIfAbsent(edge, spot);
        }
    }

    private boolean above(double value) {
        return value >= level;
    }

    private double share(double from, double to) {
        return (level - from) / (to - from);
    }

    private int alongRow(int column, int row) {
        return 2 * (row * columns + column);
    }

    private int alongColumn(int column, int row) {
        return alongRow(column, row) + 1;
    }

    private void join(int one, int other) {
        onward.computeIfAbsent(one, edge -> new ArrayList<>(2)).add(other);
        onward.computeIfAbsent(other, edge -> new ArrayList<>(2)).add(one);
    }

    private List<List<Spot>> joined() {
        List<List<Spot>> lines = new ArrayList<>();
        Set<Integer> done = new HashSet<>();
        onward.forEach((edge, next) -> {
            if (next.size() == 1) {
                follow(edge, done, lines);
            }
        });
        onward.keySet().forEach(edge -> follow(edge, done, lines));
        return lines;
    }

    private void follow(int start, Set<Integer> done, List<List<Spot>> lines) {
        if (!done.add(start)) {
            return;
        }
        List<Spot> line = new ArrayList<>();
        Deque<Integer> ahead = new ArrayDeque<>(List.of(start));
        int last = start;
        while (!ahead.isEmpty()) {
            last = ahead.pop();
            line.add(spot(last));
            next(last).stream().filter(done::add).findFirst().ifPresent(ahead::push);
        }
        if (line.size() > 2 && next(last).contains(start)) {
            line.add(spot(start));
        }
        lines.add(line);
    }

    private List<Integer> next(int edge) {
        return onward.getOrDefault(edge, List.of());
    }

    private Spot spot(int edge) {
        Spot spot = crossings.get(edge);
        if (spot == null) {
            throw new IllegalStateException("edge " + edge + " is not crossed");
        }
        return spot;
    }
}
