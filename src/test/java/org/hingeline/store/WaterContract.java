package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.store.Samples.T0;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterBook.Span;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.quality.Flag;
import org.junit.jupiter.api.Test;

interface WaterContract extends StoreUnderTest {

    /** Every number another, so that none can stand in another's place. */
    WaterNumbers NUMBERS = new WaterNumbers(1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17);

    @Test
    default void a_complete_state_comes_back_with_every_number_input_and_caution() {
        Point tank = Samples.place(store(), "north").tank();
        WaterState state = new WaterState(
                tank.id(),
                T0,
                List.of(
                        new InputUsed(Quantity.PH, 7.71, T0.minusMillis(1), "sensor", "ph-3", Flag.SUSPECT),
                        new InputUsed(Quantity.SALINITY, 30.25, T0.minusSeconds(600), "sensor", "s-3", Flag.PASS)),
                List.of(),
                NUMBERS,
                List.of(new Note(
                        "salinity-low", "Below the range of the fit: \u03a9 \u201cmay\u201d be off; \\ ' \"")));

        save(state);

        assertThat(seen().water().newest(tank.id())).contains(state);
        assertThat(seen().water().newestComplete(tank.id())).contains(state);
        assertThat(between(tank, T0, T0)).containsExactly(state);
    }

    @Test
    default void of_each_step_the_newest_state_comes_back_and_empty_steps_are_left_out() {
        Point tank = Samples.place(store(), "north").tank();
        Instant hour = Instant.parse("2026-05-14T03:00:00Z");
        for (int second : new int[] {0, 5, 595, 600, 601, 1800, 2399}) {
            save(complete(tank, hour.plusSeconds(second)));
        }

        List<WaterState> newest =
                seen().water().newestOfEach(tank.id(), hour, hour.plusSeconds(2398), Duration.ofMinutes(10));

        assertThat(newest)
                .extracting(state -> Duration.between(hour, state.at()).toSeconds())
                .containsExactly(595L, 601L, 1800L);
    }

    @Test
    default void a_number_stands_in_the_column_that_bears_its_name() throws Exception {
        Point tank = Samples.place(store(), "north").tank();
        save(complete(tank, T0));

        assertThat(RawSql.ask(store(), "SELECT ph_total FROM water_state")).isEqualTo("1");
        assertThat(RawSql.ask(store(), "SELECT omega_aragonite FROM water_state"))
                .isEqualTo("11");
        assertThat(RawSql.ask(store(), "SELECT omega_aragonite_uncertainty FROM water_state"))
                .isEqualTo("14");
        assertThat(RawSql.ask(store(), "SELECT density_kg_m3 FROM water_state")).isEqualTo("13");
    }

    @Test
    default void an_incomplete_state_comes_back_without_numbers_and_with_what_was_missing() {
        Point tank = Samples.place(store(), "north").tank();
        WaterState state = new WaterState(
                tank.id(),
                T0,
                List.of(),
                List.of(
                        new MissingInput(Quantity.TOTAL_ALKALINITY, null, Duration.ofHours(36)),
                        new MissingInput(Quantity.PH, T0.minusMillis(999), Duration.ofMinutes(30))),
                null,
                List.of());

        save(state);

        assertThat(seen().water().newest(tank.id())).contains(state);
        assertThat(seen().water().newestComplete(tank.id())).isEmpty();
    }

    @Test
    default void the_newest_complete_state_may_be_older_than_the_newest() {
        Point tank = Samples.place(store(), "north").tank();
        save(complete(tank, T0), complete(tank, T0.plusSeconds(1)), incomplete(tank, T0.plusSeconds(2)));

        assertThat(seen().water().newest(tank.id())).contains(incomplete(tank, T0.plusSeconds(2)));
        assertThat(seen().water().newestComplete(tank.id())).contains(complete(tank, T0.plusSeconds(1)));
    }

    @Test
    default void a_state_takes_the_place_of_one_of_the_same_point_and_time() {
        Point tank = Samples.place(store(), "north").tank();
        Point other = Samples.place(store(), "south").tank();
        save(complete(tank, T0), complete(tank, T0.plusSeconds(1)), complete(other, T0));

        save(incomplete(tank, T0), complete(tank, T0.plusSeconds(2)), incomplete(other, T0.plusSeconds(1)));

        assertThat(between(tank, T0, T0.plusSeconds(9)))
                .containsExactly(
                        incomplete(tank, T0), complete(tank, T0.plusSeconds(1)), complete(tank, T0.plusSeconds(2)));
        assertThat(between(other, T0, T0.plusSeconds(9)))
                .containsExactly(complete(other, T0), incomplete(other, T0.plusSeconds(1)));
    }

    @Test
    default void saving_no_states_changes_nothing() {
        Point tank = Samples.place(store(), "north").tank();
        save(complete(tank, T0));

        save();

        assertThat(between(tank, T0, T0)).hasSize(1);
    }

    @Test
    default void states_between_two_times_take_both_ends_in_up_to_a_number() {
        Point tank = Samples.place(store(), "north").tank();
        Point other = Samples.place(store(), "south").tank();
        save(complete(other, T0.plusSeconds(1)));
        saveEverySecond(tank, 5);

        assertThat(between(tank, T0.plusSeconds(1), T0.plusSeconds(3)))
                .extracting(WaterState::at)
                .containsExactly(T0.plusSeconds(1), T0.plusSeconds(2), T0.plusSeconds(3));
        assertThat(seen().water().between(tank.id(), T0, T0.plusSeconds(9), 2))
                .extracting(WaterState::at)
                .containsExactly(T0, T0.plusSeconds(1));
    }

    @Test
    default void the_times_of_states_from_a_time_on_are_listed_up_to_a_number() {
        Point tank = Samples.place(store(), "north").tank();
        Point other = Samples.place(store(), "south").tank();
        save(complete(other, T0.plusSeconds(1)));
        saveEverySecond(tank, 5);

        assertThat(times(tank, T0.plusSeconds(3), 10)).containsExactly(T0.plusSeconds(3), T0.plusSeconds(4));
        assertThat(times(tank, T0.plusSeconds(3).plusMillis(1), 10)).containsExactly(T0.plusSeconds(4));
        assertThat(times(tank, T0, 2)).containsExactly(T0, T0.plusSeconds(1));
        assertThat(times(tank, T0.plusSeconds(5), 10)).isEmpty();
    }

    @Test
    default void spans_are_worked_off_in_the_order_they_came() {
        Point tank = Samples.place(store(), "north").tank();
        assertThat(nextSpan()).isNull();
        done().water().addSpan(tank.id(), T0.plusSeconds(50), T0.plusSeconds(60));
        done().water().addSpan(tank.id(), T0, T0.plusSeconds(10));

        Span first = nextSpan();
        assertThat(first).isEqualTo(new Span(first.id(), tank.id(), T0.plusSeconds(50), T0.plusSeconds(60)));

        done().water().moveSpan(first.id(), T0.plusSeconds(55));
        assertThat(nextSpan()).isEqualTo(new Span(first.id(), tank.id(), T0.plusSeconds(55), T0.plusSeconds(60)));

        done().water().removeSpan(first.id());
        Span second = nextSpan();
        assertThat(second).isEqualTo(new Span(second.id(), tank.id(), T0, T0.plusSeconds(10)));

        done().water().removeSpan(second.id());
        assertThat(nextSpan()).isNull();
    }

    private Span nextSpan() {
        return seen().water().nextSpan().orElse(null);
    }

    private void save(WaterState... states) {
        done().water().save(List.of(states));
    }

    private void saveEverySecond(Point tank, int count) {
        List<WaterState> states = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            states.add(complete(tank, T0.plusSeconds(i)));
        }
        save(states.toArray(WaterState[]::new));
    }

    private List<WaterState> between(Point tank, Instant from, Instant to) {
        return seen().water().between(tank.id(), from, to, 100);
    }

    private List<Instant> times(Point tank, Instant from, int most) {
        return seen().water().timesFrom(tank.id(), from, most);
    }

    private static WaterState complete(Point tank, Instant at) {
        return new WaterState(tank.id(), at, List.of(), List.of(), NUMBERS, List.of());
    }

    private static WaterState incomplete(Point tank, Instant at) {
        return new WaterState(tank.id(), at, List.of(), List.of(), null, List.of(new Note("none", "No input.")));
    }
}
