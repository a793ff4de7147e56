package org.hingeline.alert;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.alert.Transition.Effect;
import org.hingeline.measure.Quantity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Limit below 1.80, deadband 0.05: 1.70 is out, 1.82 is in the deadband, 1.90 is back. */
class AlertMachineTest {
    private static final Instant START = Instant.parse("2026-05-14T01:00:00Z");
    private static final Duration FRESH_FOR = Duration.ofMinutes(15);

    private Limit limit = limit(0, 0);
    private AlertState state = AlertState.INITIAL;

    @ParameterizedTest(name = "{0} + {1} -> {2}, {3}")
    @CsvSource({
        "NORMAL, out, UNACKNOWLEDGED, RAISE",
        "NORMAL, deadband, NORMAL, NOTHING",
        "NORMAL, back, NORMAL, NOTHING",
        "NORMAL, late, NORMAL, NOTHING",
        "NORMAL, tick, NORMAL, NOTHING",
        "NORMAL, acknowledge, NORMAL, NOTHING",
        "NORMAL, retire, NORMAL, NOTHING",
        "UNACKNOWLEDGED, out, UNACKNOWLEDGED, NOTHING",
        "UNACKNOWLEDGED, deadband, UNACKNOWLEDGED, NOTHING",
        "UNACKNOWLEDGED, back, RETURNED_UNACKNOWLEDGED, RETURN",
        "UNACKNOWLEDGED, late, UNACKNOWLEDGED, NOTHING",
        "UNACKNOWLEDGED, tick, UNACKNOWLEDGED, NOTHING",
        "UNACKNOWLEDGED, acknowledge, ACKNOWLEDGED, ACKNOWLEDGE",
        "UNACKNOWLEDGED, retire, NORMAL, CLOSE",
        "ACKNOWLEDGED, out, ACKNOWLEDGED, NOTHING",
        "ACKNOWLEDGED, deadband, ACKNOWLEDGED, NOTHING",
        "ACKNOWLEDGED, back, NORMAL, CLOSE",
        "ACKNOWLEDGED, late, ACKNOWLEDGED, NOTHING",
        "ACKNOWLEDGED, tick, ACKNOWLEDGED, NOTHING",
        "ACKNOWLEDGED, acknowledge, ACKNOWLEDGED, NOTHING",
        "ACKNOWLEDGED, retire, NORMAL, CLOSE",
        "RETURNED_UNACKNOWLEDGED, out, UNACKNOWLEDGED, RAISE_AGAIN",
        "RETURNED_UNACKNOWLEDGED, deadband, RETURNED_UNACKNOWLEDGED, NOTHING",
        "RETURNED_UNACKNOWLEDGED, back, RETURNED_UNACKNOWLEDGED, NOTHING",
        "RETURNED_UNACKNOWLEDGED, late, RETURNED_UNACKNOWLEDGED, NOTHING",
        "RETURNED_UNACKNOWLEDGED, tick, RETURNED_UNACKNOWLEDGED, NOTHING",
        "RETURNED_UNACKNOWLEDGED, acknowledge, NORMAL, CLOSE",
        "RETURNED_UNACKNOWLEDGED, retire, NORMAL, CLOSE",
    })
    void every_phase_answers_every_event(Phase from, String event, Phase to, Effect effect) {
        bring(from);
        assertThat(state.phase()).isEqualTo(from);

        Transition next = switch (event) {
            case "out" -> observed(60, 1.70);
            case "deadband" -> observed(60, 1.82);
            case "back" -> observed(60, 1.90);
            case "late" -> observed(-60, from == Phase.RETURNED_UNACKNOWLEDGED ? 1.70 : 1.90);
            case "tick" -> tick(60);
            case "acknowledge" -> event(new Event.Acknowledged(), 60);
            case "retire" -> event(new Event.Retired(), 60);
            default -> throw new IllegalArgumentException(event);
        };

        assertThat(next.state().phase()).isEqualTo(to);
        assertThat(next.effect()).isEqualTo(effect);
    }

    @Test
    void raises_once_when_the_water_stays_below_the_limit() {
        limit = limit(10, 10);

        assertThat(effects(1.70, 1.69, 1.68, 1.67, 1.66, 1.65))
                .containsExactly(
                        Effect.NOTHING, Effect.NOTHING, Effect.RAISE, Effect.NOTHING, Effect.NOTHING, Effect.NOTHING);
        assertThat(state.outSince()).isEqualTo(START);
    }

    @Test
    void a_brief_crossing_raises_nothing() {
        limit = limit(10, 10);

        assertThat(effects(1.70, 1.69, 1.90, 1.70, 1.69, 1.81)).containsOnly(Effect.NOTHING);
        assertThat(state.outSince()).isNull();
    }

    @Test
    void exactly_at_the_threshold_is_not_out_and_exactly_at_the_deadband_is_back() {
        assertThat(effects(1.80)).containsExactly(Effect.NOTHING);
        assertThat(effects(Math.nextDown(1.80))).containsExactly(Effect.RAISE);
        assertThat(effects(Math.nextDown(1.80 + 0.05))).containsExactly(Effect.NOTHING);
        assertThat(effects(1.80 + 0.05)).containsExactly(Effect.RETURN);
    }

    @Test
    void an_upper_limit_is_the_mirror_image() {
        limit = new Limit(
                1,
                1,
                "warm",
                Quantity.TEMPERATURE,
                Side.ABOVE,
                26,
                0.5,
                Duration.ZERO,
                Duration.ZERO,
                Priority.LOW,
                "Open the cold line.");

        assertThat(effects(26, 26.1, 25.6, 25.5))
                .containsExactly(Effect.NOTHING, Effect.RAISE, Effect.NOTHING, Effect.RETURN);
    }

    @Test
    void values_inside_the_deadband_neither_raise_nor_return_and_restart_the_off_delay() {
        limit = limit(0, 10);

        assertThat(effects(1.70, 1.90, 1.90, 1.82, 1.90, 1.90, 1.90))
                .containsExactly(
                        Effect.RAISE,
                        Effect.NOTHING,
                        Effect.NOTHING,
                        Effect.NOTHING,
                        Effect.NOTHING,
                        Effect.NOTHING,
                        Effect.RETURN);
    }

    @Test
    void the_on_delay_runs_out_between_values_by_a_tick() {
        limit = limit(10, 0);
        observed(0, 1.70);

        assertThat(tick(599).effect()).isEqualTo(Effect.NOTHING);
        assertThat(tick(600).effect()).isEqualTo(Effect.RAISE);
        assertThat(tick(660).effect()).isEqualTo(Effect.NOTHING);
    }

    @Test
    void the_off_delay_runs_out_between_values_by_a_tick() {
        limit = limit(0, 10);
        observed(0, 1.70);
        observed(60, 1.90);

        assertThat(tick(659).effect()).isEqualTo(Effect.NOTHING);
        assertThat(tick(660).effect()).isEqualTo(Effect.RETURN);
    }

    @Test
    void a_value_that_is_no_longer_fresh_does_not_hold_until_now() {
        limit = limit(20, 0);
        observed(0, 1.70);

        assertThat(tick(1200).effect())
                .as("the only value is 20 min old, and speaks for 15")
                .isEqualTo(Effect.NOTHING);
    }

    @Test
    void an_alert_does_not_return_on_a_value_that_is_no_longer_fresh() {
        limit = limit(0, 20);
        observed(0, 1.70);
        observed(60, 1.90);

        assertThat(tick(1300).effect()).isEqualTo(Effect.NOTHING);
        assertThat(observed(1320, 1.90).effect()).isEqualTo(Effect.RETURN);
    }

    @Test
    void a_late_observation_changes_nothing() {
        limit = limit(10, 10);
        observed(600, 1.90);
        AlertState before = state;

        assertThat(observedAt(0, 1.20, 601)).isEqualTo(new Transition(before, Effect.NOTHING));
        assertThat(observedAt(600, 1.20, 601))
                .as("another value for the same time")
                .isEqualTo(new Transition(before, Effect.NOTHING));
    }

    @Test
    void a_stale_backlog_never_raises() {
        limit = limit(10, 10);
        for (int minute = 0; minute <= 60; minute += 5) {
            assertThat(observedAt(minute * 60, 1.50, 6 * 3600).effect()).isEqualTo(Effect.NOTHING);
            assertThat(tick(6 * 3600).effect()).isEqualTo(Effect.NOTHING);
        }
        assertThat(state.phase()).isEqualTo(Phase.NORMAL);
    }

    @Test
    void a_backlog_that_reaches_into_the_present_raises_with_its_own_beginning() {
        limit = limit(10, 10);
        int now = 3600;
        for (int minute = 0; minute < 45; minute += 5) {
            assertThat(observedAt(minute * 60, 1.50, now).effect()).isEqualTo(Effect.NOTHING);
        }

        assertThat(observedAt(45 * 60, 1.50, now).effect()).isEqualTo(Effect.RAISE);
        assertThat(state.outSince()).isEqualTo(START);
    }

    @Test
    void a_brief_crossing_that_comes_late_in_one_batch_raises_nothing() {
        limit = limit(5, 5);

        assertThat(observedAt(0, 1.70, 420).effect()).isEqualTo(Effect.NOTHING);
        assertThat(observedAt(120, 1.90, 420).effect()).isEqualTo(Effect.NOTHING);
        assertThat(tick(420).effect()).isEqualTo(Effect.NOTHING);
        assertThat(state.phase()).isEqualTo(Phase.NORMAL);
    }

    @Test
    void a_brief_return_that_comes_late_in_one_batch_does_not_end_the_alert() {
        limit = limit(0, 5);
        observed(0, 1.70);

        assertThat(observedAt(60, 1.90, 480).effect()).isEqualTo(Effect.NOTHING);
        assertThat(observedAt(120, 1.70, 480).effect()).isEqualTo(Effect.NOTHING);
        assertThat(tick(480).effect()).isEqualTo(Effect.NOTHING);
        assertThat(state.phase()).isEqualTo(Phase.UNACKNOWLEDGED);
    }

    @Test
    void a_tick_after_a_batch_raises_at_once_what_has_been_out_for_long_enough() {
        limit = limit(5, 5);
        observedAt(0, 1.70, 420);

        assertThat(tick(420).effect()).isEqualTo(Effect.RAISE);
    }

    @Test
    void a_returned_alert_that_nobody_acknowledged_is_raised_again_and_not_a_second_one() {
        limit = limit(10, 0);
        effects(1.70, 1.70, 1.70, 1.90);
        assertThat(state.phase()).isEqualTo(Phase.RETURNED_UNACKNOWLEDGED);

        assertThat(observed(1200, 1.70).effect()).as("on-delay again").isEqualTo(Effect.NOTHING);
        assertThat(observed(1800, 1.70).effect()).isEqualTo(Effect.RAISE_AGAIN);
        assertThat(state.outSince()).isEqualTo(START.plusSeconds(1200));
    }

    @Test
    void acknowledging_a_returned_alert_ends_it_and_the_next_crossing_is_a_new_one() {
        effects(1.70, 1.90);
        assertThat(event(new Event.Acknowledged(), 400).effect()).isEqualTo(Effect.CLOSE);

        assertThat(observed(600, 1.70).effect()).isEqualTo(Effect.RAISE);
    }

    @Test
    void retiring_forgets_everything() {
        effects(1.70);
        assertThat(event(new Event.Retired(), 60)).isEqualTo(new Transition(AlertState.INITIAL, Effect.CLOSE));
        assertThat(event(new Event.Retired(), 60)).isEqualTo(new Transition(AlertState.INITIAL, Effect.NOTHING));
    }

    @Test
    void a_limit_that_is_relaxed_before_the_on_delay_ran_out_does_not_raise() {
        limit = limit(10, 0);
        observed(0, 1.70);
        limit = limit(1.5, 10, 0);

        assertThat(tick(600).effect()).isEqualTo(Effect.NOTHING);
    }

    @Test
    void a_limit_that_is_tightened_counts_from_the_latest_value() {
        limit = limit(10, 0);
        observed(0, 1.90);
        limit = limit(2.0, 10, 0);

        assertThat(tick(60).effect()).isEqualTo(Effect.NOTHING);
        assertThat(tick(600).effect()).isEqualTo(Effect.RAISE);
    }

    private void bring(Phase phase) {
        switch (phase) {
            case NORMAL -> observed(0, 1.90);
            case UNACKNOWLEDGED -> observed(0, 1.70);
            case ACKNOWLEDGED -> {
                observed(0, 1.70);
                event(new Event.Acknowledged(), 0);
            }
            case RETURNED_UNACKNOWLEDGED -> {
                observed(-1, 1.70);
                observed(0, 1.90);
            }
        }
    }

    /** One value every five minutes after the latest one, each known at once. */
    private List<Effect> effects(double... values) {
        Observation latest = state.latest();
        long from = latest == null ? 0 : Duration.between(START, latest.at()).toSeconds() + 300;
        return java.util.stream.IntStream.range(0, values.length)
                .mapToObj(i -> observed(from + 300L * i, values[i]).effect())
                .toList();
    }

    private Transition observed(long second, double value) {
        return observedAt(second, value, second);
    }

    private Transition observedAt(long second, double value, long now) {
        return event(new Event.Observed(new Observation(START.plusSeconds(second), value, 0.1)), now);
    }

    private Transition tick(long now) {
        return event(new Event.Tick(), now);
    }

    private Transition event(Event event, long now) {
        Transition next = AlertMachine.next(limit, FRESH_FOR, state, event, START.plusSeconds(now));
        state = next.state();
        return next;
    }

    private static Limit limit(int onDelayMin, int offDelayMin) {
        return limit(1.8, onDelayMin, offDelayMin);
    }

    private static Limit limit(double threshold, int onDelayMin, int offDelayMin) {
        return new Limit(
                1,
                1,
                "omega-low",
                Quantity.OMEGA_ARAGONITE,
                Side.BELOW,
                threshold,
                0.05,
                Duration.ofMinutes(onDelayMin),
                Duration.ofMinutes(offDelayMin),
                Priority.HIGH,
                "Close the intake valve.");
    }
}
