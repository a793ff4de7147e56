package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Observation;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.LimitBook.Watched;
import org.junit.jupiter.api.Test;

interface LimitContract extends StoreUnderTest {

    @Test
    default void a_limit_comes_back_as_it_was_set() {
        Point tank = Samples.place(store(), "north").tank();

        Limit saved = save(limit(tank, "omega", 1.8), T0);

        assertThat(saved)
                .isEqualTo(new Limit(
                        saved.id(),
                        tank.id(),
                        "omega",
                        Quantity.OMEGA_ARAGONITE,
                        Side.BELOW,
                        1.8,
                        0.05,
                        Duration.ofMinutes(10),
                        Duration.ofSeconds(90),
                        Priority.HIGH,
                        "Close the intake valve; draw from storage."));
        assertThat(seen().limits().limit(tank.id(), "omega")).contains(saved);
        assertThat(seen().limits().limit(tank.id(), "other")).isEmpty();
        assertThat(seen().limits().retiredLimit(tank.id(), "omega")).isEmpty();
    }

    @Test
    default void a_limit_changed_keeps_its_id_and_its_memory_and_is_watched_anew_on_another_quantity() {
        Point tank = Samples.place(store(), "north").tank();
        Limit first = save(limit(tank, "omega", 1.8), T0);
        AlertState state = new AlertState(Phase.NORMAL, T0, null, new Observation(T0, 1.7, 0.1));
        done().limits().saveState(first.id(), state, null);
        Limit changed = new Limit(
                0,
                tank.id(),
                "omega",
                Quantity.TEMPERATURE,
                Side.ABOVE,
                26,
                0,
                Duration.ZERO,
                Duration.ofHours(24),
                Priority.LOW,
                "Cool.");

        Limit saved = save(changed, T0.plusSeconds(60));

        assertThat(saved)
                .isEqualTo(new Limit(
                        first.id(),
                        tank.id(),
                        "omega",
                        Quantity.TEMPERATURE,
                        Side.ABOVE,
                        26,
                        0,
                        Duration.ZERO,
                        Duration.ofHours(24),
                        Priority.LOW,
                        "Cool."));
        assertThat(watched(tank)).containsExactly(new Watched(saved, state, null, T0.plusSeconds(60)));
    }

    @Test
    default void a_limit_with_another_threshold_is_watched_since_its_making_and_one_put_back_since_then() {
        Point tank = Samples.place(store(), "north").tank();
        save(limit(tank, "omega", 1.8), T0);
        Limit changed = save(limit(tank, "omega", 1.9), T0.plusSeconds(60));
        assertThat(watched(tank)).extracting(Watched::createdAt).containsExactly(T0);

        done().limits().retireLimit(changed.id(), T0.plusSeconds(120));
        save(limit(tank, "omega", 1.9), T0.plusSeconds(180));
        assertThat(watched(tank)).extracting(Watched::createdAt).containsExactly(T0.plusSeconds(180));
    }

    @Test
    default void limits_are_listed_by_name_for_their_point_alone() {
        Point tank = Samples.place(store(), "north").tank();
        Point other = Samples.place(store(), "south").tank();
        Limit ph = save(limit(tank, "ph", 1), T0);
        Limit omega = save(limit(tank, "omega", 1), T0);
        Limit elsewhere = save(limit(other, "omega", 2), T0);

        assertThat(seen().limits().limits(tank.id())).containsExactly(omega, ph);
        assertThat(seen().limits().limits(other.id())).containsExactly(elsewhere);
        assertThat(seen().limits().pointsWithLimits()).containsExactly(tank.id(), other.id());
    }

    @Test
    default void a_limit_taken_away_is_out_of_use_and_comes_back_under_its_old_id() {
        Point tank = Samples.place(store(), "north").tank();
        Limit omega = save(limit(tank, "omega", 1.8), T0);

        done().limits().retireLimit(omega.id(), T0.plusSeconds(1));

        assertThat(seen().limits().limits(tank.id())).isEmpty();
        assertThat(seen().limits().limit(tank.id(), "omega")).isEmpty();
        assertThat(seen().limits().retiredLimit(tank.id(), "omega")).contains(omega);
        assertThat(seen().limits().pointsWithLimits()).isEmpty();
        assertThat(watched(tank)).isEmpty();

        Limit back = save(limit(tank, "omega", 1.9), T0.plusSeconds(2));

        assertThat(back.id()).isEqualTo(omega.id());
        assertThat(back.threshold()).isEqualTo(1.9);
        assertThat(seen().limits().retiredLimit(tank.id(), "omega")).isEmpty();
        assertThat(watched(tank)).extracting(Watched::limit).containsExactly(back);
    }

    @Test
    default void a_limit_cannot_be_taken_away_twice() {
        Point tank = Samples.place(store(), "north").tank();
        Limit omega = save(limit(tank, "omega", 1.8), T0);
        done().limits().retireLimit(omega.id(), T0);

        assertThatThrownBy(() -> done().limits().retireLimit(omega.id(), T0))
                .isInstanceOf(StoreException.class)
                .hasMessageContaining("limit " + omega.id());
    }

    @Test
    default void a_new_limit_is_watched_from_a_blank_memory() {
        Point tank = Samples.place(store(), "north").tank();
        Point other = Samples.place(store(), "south").tank();
        Limit omega = save(limit(tank, "omega", 1.8), T0);
        Limit ph = save(limit(tank, "ph", 7.5), T0.plusMillis(1));
        save(limit(other, "omega", 1.8), T0);

        assertThat(watched(tank))
                .containsExactly(
                        new Watched(omega, AlertState.INITIAL, null, T0),
                        new Watched(ph, AlertState.INITIAL, null, T0.plusMillis(1)));
        assertThat(done().limits().watchedForUpdate(List.of())).isEmpty();
        assertThat(done().limits().watchedForUpdate(List.of(tank.id(), other.id())))
                .hasSize(3);
    }

    @Test
    default void the_memory_of_a_limit_comes_back_whole_and_can_be_cleared() {
        Samples.Place north = Samples.place(store(), "north");
        Limit omega = save(limit(north.tank(), "omega", 1.8), T0);
        Alert alert = AlertContract.alert(north, omega, T0);
        long alertId = done().alerts().open(alert);
        AlertState full = new AlertState(
                Phase.ACKNOWLEDGED, T0.plusMillis(1), T0.plusMillis(2), new Observation(T0.plusMillis(3), 1.7, 0.125));

        done().limits().saveState(omega.id(), full, alertId);

        assertThat(watched(north.tank())).containsExactly(new Watched(omega, full, alertId, T0));
        assertThat(done().limits().watchedByAlertForUpdate(alertId)).contains(new Watched(omega, full, alertId, T0));

        done().limits().saveState(omega.id(), AlertState.INITIAL, null);

        assertThat(watched(north.tank())).containsExactly(new Watched(omega, AlertState.INITIAL, null, T0));
        assertThat(done().limits().watchedByAlertForUpdate(alertId)).isEmpty();
    }

    @Test
    default void the_memory_of_an_unknown_limit_cannot_be_saved() {
        assertThatThrownBy(() -> done().limits().saveState(4711, AlertState.INITIAL, null))
                .isInstanceOf(StoreException.class)
                .hasMessageContaining("4711");
    }

    @Test
    default void every_phase_comes_back() {
        Point tank = Samples.place(store(), "north").tank();
        Limit omega = save(limit(tank, "omega", 1.8), T0);
        for (Phase phase : Phase.values()) {
            AlertState state = new AlertState(phase, null, null, null);

            done().limits().saveState(omega.id(), state, null);

            assertThat(watched(tank)).extracting(Watched::state).containsExactly(state);
        }
    }

    private Limit save(Limit limit, Instant now) {
        return done().limits().saveLimit(limit, now);
    }

    private List<Watched> watched(Point point) {
        return done().limits().watchedForUpdate(List.of(point.id()));
    }

    static Limit limit(Point point, String name, double threshold) {
        return new Limit(
                0,
                point.id(),
                name,
                Quantity.OMEGA_ARAGONITE,
                Side.BELOW,
                threshold,
                0.05,
                Duration.ofMinutes(10),
                Duration.ofSeconds(90),
                Priority.HIGH,
                "Close the intake valve; draw from storage.");
    }
}
