package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.monitor.AlertsTest.minutes;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.monitor.PointStatus.Verdict;
import org.junit.jupiter.api.Test;

class StatusBoardTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void known_water_without_a_limit_is_called_neither_fit_nor_unfit() {
        water(7.9, T0);

        assertThat(verdict()).isEqualTo(Verdict.NO_LIMIT);
    }

    @Test
    void water_within_every_limit_is_fit_until_it_is_older_than_the_longest_gap() {
        hatchery.limit("omega", "omegaAragonite", 1, 0);
        water(7.9, T0);
        hatchery.clock.set(minutes(15));
        assertThat(verdict()).isEqualTo(Verdict.FIT);

        hatchery.clock.pass(Duration.ofMillis(1));
        assertThat(verdict()).isEqualTo(Verdict.UNKNOWN);
    }

    @Test
    void water_past_a_limit_is_out_before_any_delay() {
        hatchery.limit("omega", "omegaAragonite", 3, 30);
        water(7.9, T0);

        assertThat(verdict()).isEqualTo(Verdict.OUT);
        assertThat(hatchery.open()).isEmpty();
    }

    @Test
    void a_measured_value_past_its_limit_is_out_even_where_the_rest_is_unknown() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 5, T0);

        assertThat(verdict()).isEqualTo(Verdict.OUT);
    }

    @Test
    void water_is_unknown_when_an_input_is_missing_or_a_limited_quantity_is_not_read() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 7, T0);
        assertThat(verdict()).as("no pH").isEqualTo(Verdict.UNKNOWN);

        water(7.9, T0);
        assertThat(verdict()).isEqualTo(Verdict.FIT);

        hatchery.clock.set(minutes(16));
        water(7.9, minutes(16));
        assertThat(verdict()).as("oxygen of 16 minutes ago").isEqualTo(Verdict.UNKNOWN);
    }

    @Test
    void a_titrated_quantity_with_a_limit_is_known_for_days() {
        hatchery.limit("alkalinity", "totalAlkalinity", 1500, 0);
        water(7.9, T0);
        hatchery.clock.set(minutes(300));
        hatchery.take(row(0, "ph-1", 7.9, minutes(300)), row(1, "t-1", 22, minutes(300)));

        assertThat(verdict()).isEqualTo(Verdict.FIT);
    }

    @Test
    void a_thinned_history_keeps_the_newest_state_of_each_step() {
        hatchery.clock.set(minutes(60));
        for (int second : new int[] {0, 30, 599, 600, 1300, 1301}) {
            hatchery.read("t-1", 22, T0.plusSeconds(second));
        }

        assertThat(times(Duration.ofMinutes(10)))
                .containsExactly(T0.plusSeconds(599), T0.plusSeconds(600), T0.plusSeconds(1301));
        assertThat(times(Duration.ZERO)).hasSize(6);
        assertThat(hatchery.board.history(hatchery.tank(), T0.plusSeconds(30), T0.plusSeconds(600), Duration.ZERO))
                .as("both ends belong to it")
                .hasSize(3);
    }

    private List<Instant> times(Duration step) {
        return hatchery.board.history(hatchery.tank(), T0, minutes(60), step).stream()
                .map(WaterState::at)
                .toList();
    }

    private void water(double ph, Instant at) {
        hatchery.readAllButPh(at);
        hatchery.read("ph-1", ph, at);
    }

    private Verdict verdict() {
        return hatchery.board.point(hatchery.site, "tank").orElseThrow().verdict();
    }
}
