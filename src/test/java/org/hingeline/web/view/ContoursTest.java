package org.hingeline.web.view;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.function.DoubleBinaryOperator;
import org.hingeline.web.view.Contours.Spot;
import org.junit.jupiter.api.Test;

class ContoursTest {
    @Test
    void a_slope_has_one_straight_line_from_edge_to_edge() {
        List<List<Spot>> lines = Contours.at(3.25, grid(7, 5, (x, y) -> x));

        assertThat(lines).hasSize(1);
        assertThat(lines.get(0))
                .hasSize(5)
                .allSatisfy(spot -> assertThat(spot.column()).isCloseTo(3.25, within(1e-12)));
        assertThat(lines.get(0).stream().map(Spot::row)).containsExactlyInAnyOrder(0.0, 1.0, 2.0, 3.0, 4.0);
    }

    @Test
    void a_hill_has_a_ring_that_ends_where_it_begins_and_keeps_its_distance() {
        List<List<Spot>> lines = Contours.at(-36, grid(21, 21, (x, y) -> -(x - 10) * (x - 10) - (y - 10) * (y - 10)));

        assertThat(lines).hasSize(1);
        List<Spot> ring = lines.get(0);
        assertThat(ring.get(ring.size() - 1)).isEqualTo(ring.get(0));
        assertThat(ring)
                .hasSizeGreaterThan(30)
                .allSatisfy(spot -> assertThat(Math.hypot(spot.column() - 10, spot.row() - 10))
                        .isCloseTo(6, within(0.03)));
    }

    @Test
    void two_hills_with_a_saddle_between_are_parted_or_joined_by_the_middle() {
        double[][] parted = {{1, 0}, {0, 1}};

        assertThat(Contours.at(0.6, parted)).hasSize(2);
        assertThat(Contours.at(0.6, parted).get(0)).hasSize(2);
        List<List<Spot>> joined = Contours.at(0.4, parted);
        assertThat(joined).hasSize(2);
        assertThat(joined.stream().flatMap(List::stream).map(Spot::row))
                .allSatisfy(row -> assertThat(row).isBetween(0.0, 1.0));
        // above the middle each corner of 1 stands alone; under it each corner of 0 does
        assertThat(Contours.at(0.6, parted).stream().anyMatch(ContoursTest::cutsOffTheOrigin))
                .isTrue();
        assertThat(joined.stream().anyMatch(ContoursTest::cutsOffTheOrigin)).isFalse();
    }

    @Test
    void what_is_not_known_is_left_out() {
        double[][] hole = grid(7, 7, (x, y) -> x);
        hole[3][3] = Double.NaN;

        List<List<Spot>> lines = Contours.at(2.5, hole);

        assertThat(lines).hasSize(2);
        assertThat(lines.stream().flatMap(List::stream).map(Spot::row))
                .allSatisfy(row -> assertThat(row).matches(r -> r <= 2 || r >= 4, "beside the hole"));
    }

    @Test
    void a_value_that_is_nowhere_has_no_line() {
        assertThat(Contours.at(9, grid(4, 4, (x, y) -> x + y))).isEmpty();
    }

    private static boolean cutsOffTheOrigin(List<Spot> line) {
        return line.stream().allMatch(spot -> spot.column() == 0 || spot.row() == 0);
    }

    private static double[][] grid(int columns, int rows, DoubleBinaryOperator of) {
        double[][] values = new double[rows][columns];
        for (int row = 0; row < rows; row++) {
            for (int column = 0; column < columns; column++) {
                values[row][column] = of.applyAsDouble(column, row);
            }
        }
        return values;
    }
}
