package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.monitor.AlertsTest.minutes;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.monitor.AlertBook.Alert;
import org.junit.jupiter.api.Test;

class SilenceTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void a_point_is_silent_when_what_its_limit_watches_is_unknown_although_other_sensors_talk() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 7, T0);

        hatchery.readUntil(minutes(15), "t-1", 22);
        assertThat(hatchery.open()).isEmpty();
        hatchery.readUntil(minutes(16), "t-1", 22);

        assertThat(hatchery.open()).extracting(Alert::limitName).containsExactly("silence");
        assertThat(hatchery.open().get(0).since()).isEqualTo(T0);
        assertThat(hatchery.subjects()).hasSize(1);
    }

    @Test
    void a_point_whose_alkalinity_ran_out_is_silent_for_a_limit_on_the_saturation_state() {
        hatchery.limit("omega", "omegaAragonite", 1, 0);
        hatchery.read("ta-1", 2078, T0.minus(Duration.ofDays(3)));
        hatchery.take(row(0, "s-1", 30, T0), row(1, "t-1", 22, T0), row(2, "ph-1", 8, T0));
        assertThat(hatchery.newestState().numbers()).isNotNull();

        hatchery.readUntil(minutes(16), "ph-1", 8);

        assertThat(hatchery.open()).extracting(Alert::limitName).containsExactly("silence");
        assertThat(hatchery.subjects().get(0)).contains("no Ω");
    }

    @Test
    void without_a_limit_no_silence_is_told() {
        hatchery.read("o2-1", 7, T0);

        hatchery.watchUntil(minutes(20));

        assertThat(hatchery.open()).isEmpty();
    }

    @Test
    void the_alert_ends_when_the_quantity_is_heard_again() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.watchUntil(minutes(16));
        hatchery.alerts.acknowledge(hatchery.site.id(), hatchery.open().get(0).id(), "Ana", null);

        hatchery.read("o2-1", 7, minutes(16));

        assertThat(hatchery.open()).isEmpty();
        assertThat(hatchery.subjects().get(1)).startsWith("Back to normal").contains("heard again");
    }

    @Test
    void a_sensor_never_heard_is_silent_one_gap_after_the_limit_was_made() {
        hatchery.watchUntil(minutes(10));
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);

        hatchery.watchUntil(minutes(25));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(25.5));

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(minutes(10));
    }

    @Test
    void a_limit_put_back_long_after_its_making_has_time_from_its_putting_back() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.limits.retire(hatchery.tank(), "oxygen", "bo");
        hatchery.watchUntil(minutes(20));
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);

        hatchery.watchUntil(minutes(35));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(35.5));

        assertThat(hatchery.open()).hasSize(1);
    }

    @Test
    void a_limit_set_on_another_quantity_has_time_from_then() {
        hatchery.limit("low", "dissolvedOxygen", 6, 0);
        hatchery.readUntil(minutes(5), "o2-1", 7);
        hatchery.limit("low", "ph", 7, 0);

        hatchery.watchUntil(minutes(20));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(20.5));

        assertThat(hatchery.open()).extracting(Alert::limitName).containsExactly("silence");
    }

    @Test
    void after_a_restart_gateways_have_five_minutes_to_deliver_before_anything_is_called_silent() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.readUntil(minutes(5), "o2-1", 7);

        hatchery.restart();
        hatchery.clock.set(minutes(180));
        hatchery.housekeeping.watchLimits();
        hatchery.watchUntil(minutes(184.5));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(185));

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(minutes(5));
    }

    @Test
    void a_machine_that_slept_gives_the_same_time() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.readUntil(minutes(7), "o2-1", 7);

        hatchery.clock.set(minutes(180));
        hatchery.housekeeping.watchLimits();
        hatchery.watchUntil(minutes(184));
        assertThat(hatchery.open()).isEmpty();

        hatchery.watchUntil(minutes(186));
        assertThat(hatchery.open()).hasSize(1);
    }

    @Test
    void the_first_part_of_a_backlog_calls_nothing_silent() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.start(hatchery.database, 10);
        hatchery.clock.set(minutes(180));
        List<IncomingReading> rows = new ArrayList<>();
        for (int i = 0; i <= 180; i++) {
            rows.add(row(i, "o2-1", 7, minutes(i)));
        }

        hatchery.take(rows.toArray(IncomingReading[]::new));
        hatchery.watchUntil(minutes(187));

        assertThat(hatchery.open()).isEmpty();
        assertThat(hatchery.subjects()).isEmpty();
    }

    @Test
    void the_pause_between_two_titrations_is_no_silence_but_three_days_are() {
        hatchery.limit("alkalinity", "totalAlkalinity", 1500, 0);
        hatchery.read("ta-1", 2078, T0);
        hatchery.watchUntil(minutes(20));
        assertThat(hatchery.open()).isEmpty();

        hatchery.clock.set(T0.plus(Duration.ofDays(3)).minusSeconds(600));
        hatchery.watchUntil(T0.plus(Duration.ofDays(3)));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(T0.plus(Duration.ofDays(3)).plusSeconds(30));

        assertThat(hatchery.open()).extracting(Alert::limitName).containsExactly("silence");
    }

    @Test
    void beside_a_titrated_quantity_a_sensor_that_falls_silent_is_still_told() {
        hatchery.limit("alkalinity", "totalAlkalinity", 1500, 0);
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.take(row(0, "ta-1", 2078, T0), row(1, "o2-1", 7, T0));

        hatchery.watchUntil(minutes(15.5));

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(T0);
    }

    @Test
    void a_longer_gap_set_for_the_point_holds_at_once_and_ends_the_alert() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.watchUntil(minutes(16));
        hatchery.alerts.acknowledge(hatchery.site.id(), hatchery.open().get(0).id(), "Ana", null);

        hatchery.place.savePoint(hatchery.site, Hatchery.tankPlan(Duration.ofMinutes(30)), "bo");
        hatchery.watchUntil(minutes(30));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(30.5));

        assertThat(hatchery.open()).hasSize(1);
    }

    @Test
    void a_shorter_gap_holds_too() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.watchUntil(minutes(10));

        hatchery.place.savePoint(hatchery.site, Hatchery.tankPlan(Duration.ofMinutes(5)), "bo");
        hatchery.watchUntil(minutes(10.5));

        assertThat(hatchery.open()).hasSize(1);
    }

    @Test
    void with_the_last_limit_the_silence_ends_too() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.watchUntil(minutes(16));
        assertThat(hatchery.open()).hasSize(1);

        hatchery.limits.retire(hatchery.tank(), "oxygen", "bo");
        hatchery.watchUntil(minutes(20));

        assertThat(hatchery.open()).isEmpty();
    }
}
