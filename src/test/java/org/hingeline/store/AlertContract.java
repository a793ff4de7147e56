package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.time.Duration;
import java.time.Instant;
import java.util.function.Consumer;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook;
import org.hingeline.monitor.AlertBook.Alert;
import org.junit.jupiter.api.Test;

interface AlertContract extends StoreUnderTest {

    @Test
    default void an_alert_keeps_what_it_said_when_it_was_raised() {
        Samples.Place north = Samples.place(store(), "north");
        Limit omega = limit(north, 1.8);
        long id = open(alert(north, omega, T0));

        limit(north, 1.2);

        Alert found = find(north, id);
        assertThat(found)
                .isEqualTo(new Alert(
                        id,
                        north.site().id(),
                        north.tank().id(),
                        omega.id(),
                        "omega",
                        omega.quantity(),
                        omega.side(),
                        1.8,
                        omega.priority(),
                        omega.action(),
                        Phase.UNACKNOWLEDGED,
                        T0.minusSeconds(600),
                        T0,
                        1.75,
                        0.125,
                        null,
                        null,
                        null,
                        null,
                        null));
        assertThat(seen().alerts().openAlerts(north.site().id())).containsExactly(found);
        assertThat(seen().alerts().closedAlerts(north.site().id(), 10)).isEmpty();
    }

    @Test
    default void an_alert_is_acknowledged_with_a_note_or_without() {
        Samples.Place north = Samples.place(store(), "north");
        Limit omega = limit(north, 1.8);
        long noted = open(alert(north, omega, T0));
        long bare = open(alert(north, omega, T0));

        change(alerts -> alerts.acknowledge(noted, T0.plusSeconds(5), "mia", "On it."));
        change(alerts -> alerts.acknowledge(bare, T0.plusSeconds(6), "ben", null));

        Alert found = find(north, noted);
        assertThat(found.phase()).isEqualTo(Phase.ACKNOWLEDGED);
        assertThat(found.acknowledgedAt()).isEqualTo(T0.plusSeconds(5));
        assertThat(found.acknowledgedBy()).isEqualTo("mia");
        assertThat(found.acknowledgementNote()).isEqualTo("On it.");
        assertThat(find(north, bare).acknowledgedBy()).isEqualTo("ben");
        assertThat(find(north, bare).acknowledgementNote()).isNull();
    }

    @Test
    default void an_alert_returns_is_raised_again_and_closes() {
        Samples.Place north = Samples.place(store(), "north");
        long id = open(alert(north, limit(north, 1.8), T0));

        change(alerts -> alerts.returned(id, T0.plusSeconds(10)));
        assertThat(find(north, id).phase()).isEqualTo(Phase.RETURNED_UNACKNOWLEDGED);
        assertThat(find(north, id).returnedAt()).isEqualTo(T0.plusSeconds(10));

        change(alerts -> alerts.reopen(id, T0.plusSeconds(20), T0.plusSeconds(30), 1.5, 0.25));
        Alert again = find(north, id);
        assertThat(again.phase()).isEqualTo(Phase.UNACKNOWLEDGED);
        assertThat(again.since()).isEqualTo(T0.plusSeconds(20));
        assertThat(again.raisedAt()).isEqualTo(T0.plusSeconds(30));
        assertThat(again.value()).isEqualTo(1.5);
        assertThat(again.uncertainty()).isEqualTo(0.25);
        assertThat(again.returnedAt()).isNull();

        change(alerts -> alerts.close(id, T0.plusSeconds(40)));
        Alert closed = find(north, id);
        assertThat(closed.phase()).isEqualTo(Phase.NORMAL);
        assertThat(closed.returnedAt()).isEqualTo(T0.plusSeconds(40));
        assertThat(closed.closedAt()).isEqualTo(T0.plusSeconds(40));
    }

    @Test
    default void closing_keeps_the_time_at_which_the_water_had_returned() {
        Samples.Place north = Samples.place(store(), "north");
        long id = open(alert(north, limit(north, 1.8), T0));
        change(alerts -> alerts.returned(id, T0.plusSeconds(10)));

        change(alerts -> alerts.close(id, T0.plusSeconds(40)));

        assertThat(find(north, id).returnedAt()).isEqualTo(T0.plusSeconds(10));
        assertThat(find(north, id).closedAt()).isEqualTo(T0.plusSeconds(40));
    }

    @Test
    default void a_closed_alert_stays_as_it_is() {
        Samples.Place north = Samples.place(store(), "north");
        long id = open(alert(north, limit(north, 1.8), T0));
        change(alerts -> alerts.close(id, T0.plusSeconds(40)));
        Alert closed = find(north, id);

        assertRefused(id, alerts -> alerts.acknowledge(id, T0.plusSeconds(50), "mia", null));
        assertRefused(id, alerts -> alerts.returned(id, T0.plusSeconds(50)));
        assertRefused(id, alerts -> alerts.reopen(id, T0, T0, 1, 1));
        assertRefused(id, alerts -> alerts.close(id, T0.plusSeconds(50)));

        assertThat(find(north, id)).isEqualTo(closed);
    }

    @Test
    default void open_alerts_are_listed_newest_first_and_closed_ones_by_their_end() {
        Samples.Place north = Samples.place(store(), "north");
        Limit omega = limit(north, 1.8);
        long a = open(alert(north, omega, T0));
        long b = open(alert(north, omega, T0.plusSeconds(1)));
        long c = open(alert(north, omega, T0.plusSeconds(1)));
        long d = open(alert(north, omega, T0.plusSeconds(2)));
        assertThat(seen().alerts().openAlerts(north.site().id()))
                .extracting(Alert::id)
                .containsExactly(d, c, b, a);

        change(alerts -> alerts.close(d, T0.plusSeconds(5)));
        change(alerts -> alerts.close(a, T0.plusSeconds(6)));
        change(alerts -> alerts.close(b, T0.plusSeconds(5)));

        assertThat(seen().alerts().openAlerts(north.site().id()))
                .extracting(Alert::id)
                .containsExactly(c);
        assertThat(seen().alerts().closedAlerts(north.site().id(), 10))
                .extracting(Alert::id)
                .containsExactly(a, d, b);
        assertThat(seen().alerts().closedAlerts(north.site().id(), 2))
                .extracting(Alert::id)
                .containsExactly(a, d);
    }

    @Test
    default void the_alerts_of_a_site_are_not_shown_to_another() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");
        Limit omega = limit(north, 1.8);
        long open = open(alert(north, omega, T0));
        long closed = open(alert(north, omega, T0));
        change(alerts -> alerts.close(closed, T0));
        long southId = south.site().id();

        assertThat(seen().alerts().alert(southId, open)).isEmpty();
        assertThat(seen().alerts().openAlerts(southId)).isEmpty();
        assertThat(seen().alerts().closedAlerts(southId, 10)).isEmpty();
    }

    @Test
    default void open_alerts_are_counted_over_all_sites_and_so_are_silent_points() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");
        assertThat(seen().alerts().countOpen()).isZero();
        assertThat(seen().alerts().countSilent()).isZero();
        long low = open(alert(north, limit(north, 1.8), T0));
        long silent = open(alert(south, silence(south), T0));
        long silentToo = open(alert(north, silence(north), T0));

        assertThat(seen().alerts().countOpen()).isEqualTo(3);
        assertThat(seen().alerts().countSilent()).isEqualTo(2);

        change(alerts -> alerts.acknowledge(silent, T0, "mia", null));
        change(alerts -> alerts.returned(silentToo, T0));
        assertThat(seen().alerts().countOpen()).isEqualTo(3);
        assertThat(seen().alerts().countSilent()).isOne();

        change(alerts -> alerts.close(silent, T0));
        change(alerts -> alerts.close(low, T0));
        assertThat(seen().alerts().countOpen()).isOne();
        assertThat(seen().alerts().countSilent()).isZero();
    }

    private Limit silence(Samples.Place place) {
        Limit silence = new Limit(
                0,
                place.tank().id(),
                "silence",
                Quantity.SILENCE,
                Side.ABOVE,
                45,
                0,
                Duration.ZERO,
                Duration.ZERO,
                Priority.MEDIUM,
                "Look at the gateway.");
        return done().limits().saveLimit(silence, T0);
    }

    private void assertRefused(long id, Consumer<AlertBook> change) {
        assertThatThrownBy(() -> change(change))
                .isInstanceOf(StoreException.class)
                .hasMessageContaining("alert " + id);
    }

    private void change(Consumer<AlertBook> change) {
        store().writeOnly(books -> change.accept(books.alerts()));
    }

    private long open(Alert alert) {
        return done().alerts().open(alert);
    }

    private Alert find(Samples.Place place, long id) {
        return seen().alerts().alert(place.site().id(), id).orElseThrow();
    }

    private Limit limit(Samples.Place place, double threshold) {
        return done().limits().saveLimit(LimitContract.limit(place.tank(), "omega", threshold), T0);
    }

    static Alert alert(Samples.Place place, Limit limit, Instant raisedAt) {
        return new Alert(
                0,
                place.site().id(),
                place.tank().id(),
                limit.id(),
                limit.name(),
                limit.quantity(),
                limit.side(),
                limit.threshold(),
                limit.priority(),
                limit.action(),
                Phase.UNACKNOWLEDGED,
                raisedAt.minusSeconds(600),
                raisedAt,
                1.75,
                0.125,
                null,
                null,
                null,
                null,
                null);
    }
}
