package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.monitor.AlertsTest.minutes;
import static org.hingeline.monitor.Hatchery.T0;

import java.util.List;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Phase;
import org.hingeline.monitor.AlertBook.Alert;
import org.junit.jupiter.api.Test;

class LimitChangeTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void a_tighter_limit_judges_the_value_that_is_there() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 6.5, T0);
        assertThat(hatchery.open()).isEmpty();

        hatchery.limit("oxygen", "dissolvedOxygen", 7, 0);
        hatchery.watchUntil(minutes(0.5));

        assertThat(hatchery.open()).extracting(Alert::threshold).containsExactly(7.0);
    }

    @Test
    void a_pending_run_counts_on_against_a_wider_limit_and_begins_anew_against_a_narrower() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.readUntil(minutes(8), "o2-1", 5);
        hatchery.limit("oxygen", "dissolvedOxygen", 5.5, 10);
        hatchery.readUntil(minutes(17), "o2-1", 5);
        assertThat(hatchery.open()).isEmpty();

        hatchery.limit("oxygen", "dissolvedOxygen", 5.8, 10);
        hatchery.readUntil(minutes(18), "o2-1", 5);

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(minutes(8));
    }

    @Test
    void a_standing_alert_keeps_saying_what_it_was_raised_for_and_ends_by_the_new_limit() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 5, T0);

        hatchery.limit("oxygen", "dissolvedOxygen", 4, 0);
        assertThat(hatchery.open()).extracting(Alert::threshold).containsExactly(6.0);
        hatchery.watchUntil(minutes(0.5));

        assertThat(hatchery.open()).extracting(Alert::phase).containsExactly(Phase.RETURNED_UNACKNOWLEDGED);
    }

    @Test
    void on_another_quantity_nothing_is_remembered_and_the_alert_ends() {
        hatchery.limit("low", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 5, T0);
        assertThat(hatchery.open()).hasSize(1);

        hatchery.limit("low", "ph", 7.5, 0);
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(10));

        assertThat(hatchery.open()).as("5 is no pH").isEmpty();
        assertThat(watched().state()).isEqualTo(AlertState.INITIAL);
        hatchery.read("ph-1", 7.2, minutes(10));
        assertThat(hatchery.open()).extracting(Alert::value).containsExactly(7.2);
    }

    @Test
    void on_the_other_side_the_alert_ends_and_the_newest_value_is_judged_anew() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 5, T0);

        hatchery.limits.save(
                hatchery.tank(),
                "oxygen",
                new LimitDesk.Wish("dissolvedOxygen", null, 4.0, 0.0, 0.0, 0.0, "high", "Act."),
                "bo");
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(0.5));

        assertThat(hatchery.open()).extracting(Alert::threshold).containsExactly(4.0);
    }

    @Test
    void a_limit_taken_away_ends_its_alert_and_put_back_begins_anew() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.readUntil(minutes(12), "o2-1", 5);
        assertThat(hatchery.open()).hasSize(1);

        assertThat(hatchery.limits.retire(hatchery.tank(), "oxygen", "bo")).isTrue();
        assertThat(hatchery.open()).isEmpty();
        assertThat(hatchery.limits.retire(hatchery.tank(), "oxygen", "bo")).isFalse();

        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.readUntil(minutes(20), "o2-1", 5);
        assertThat(hatchery.open()).isEmpty();
        hatchery.readUntil(minutes(24), "o2-1", 5);

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(minutes(13));
    }

    @Test
    void every_change_is_journaled_with_what_was_there_before_and_no_change_is_not() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.limit("oxygen", "dissolvedOxygen", 7, 10);

        List<JournalBook.Entry> saved = hatchery.journal().stream()
                .filter(entry -> entry.what().equals("limit-saved"))
                .toList();
        assertThat(saved).hasSize(2);
        assertThat(saved.get(0).who()).isEqualTo("bo");
        assertThat(saved.get(0).subject()).isEqualTo("tank/oxygen");
        assertThat(saved.get(0).detail())
                .contains("before: dissolvedOxygen below 6.0")
                .contains("after: dissolvedOxygen below 7.0");
        assertThat(saved.get(1).detail()).startsWith("before: none");
    }

    @Test
    void every_fault_of_a_limit_is_told_at_once() {
        assertThatThrownBy(() -> hatchery.limits.save(
                        hatchery.tank(),
                        "Low!",
                        new LimitDesk.Wish("salt", 1.0, 2.0, -1.0, 9999.0, Double.NaN, "urgent", " "),
                        "bo"))
                .isInstanceOfSatisfying(
                        FieldFaultsException.class,
                        e -> assertThat(e.faults())
                                .extracting(FieldFaults.Fault::field)
                                .contains(
                                        "name",
                                        "quantity",
                                        "below",
                                        "deadband",
                                        "onDelayMin",
                                        "offDelayMin",
                                        "priority",
                                        "action"));
        assertThat(hatchery.database.<List<org.hingeline.alert.Limit>>read(
                        books -> books.limits().limits(hatchery.tank().id())))
                .extracting(org.hingeline.alert.Limit::name)
                .containsExactly("silence");
    }

    @Test
    void the_watch_over_silence_is_neither_made_nor_taken_away_as_a_limit() {
        assertThatThrownBy(() -> hatchery.limit("silence", "ph", 7, 0)).hasMessageContaining("maxGapMin");
        assertThatThrownBy(() -> hatchery.limits.retire(hatchery.tank(), "silence", "bo"))
                .hasMessageContaining("maxGapMin");
    }

    private LimitBook.Watched watched() {
        long tank = hatchery.tank().id();
        return hatchery.database.write(books -> books.limits().watchedForUpdate(List.of(tank)).stream()
                .filter(w -> w.limit().name().equals("low"))
                .findFirst()
                .orElseThrow());
    }
}
