package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Proxy;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Priority;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.AlertDesk.Acknowledged;
import org.hingeline.monitor.OutboxBook.Message;
import org.hingeline.monitor.PlacePlan.SubscriberPlan;
import org.junit.jupiter.api.Test;

class AlertsTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void an_alert_is_raised_once_however_long_the_water_stays_out() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);

        hatchery.readUntil(minutes(40), "o2-1", 5.2);

        assertThat(hatchery.open()).hasSize(1);
        Alert alert = hatchery.open().get(0);
        assertThat(alert.since()).isEqualTo(minutes(1));
        assertThat(alert.raisedAt()).isEqualTo(minutes(11));
        assertThat(alert.value()).isEqualTo(5.2);
        assertThat(hatchery.subjects()).hasSize(1);
    }

    @Test
    void the_delay_runs_out_by_time_alone_while_the_last_value_still_speaks_for_now() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.read("o2-1", 5.2, T0);

        hatchery.watchUntil(minutes(9.5));
        assertThat(hatchery.open()).isEmpty();
        hatchery.watchUntil(minutes(10));

        assertThat(hatchery.open()).extracting(Alert::limitName).containsExactly("oxygen");
    }

    @Test
    void a_delay_keeps_running_over_a_restart() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 10);
        hatchery.read("o2-1", 5.2, T0);
        hatchery.watchUntil(minutes(5));

        hatchery.restart();
        hatchery.clock.set(minutes(11));
        hatchery.housekeeping.watchLimits();

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(T0);
    }

    @Test
    void a_backlog_of_hours_ago_completes_the_record_and_rings_nobody() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.clock.set(minutes(300));
        List<IncomingReading> rows = new ArrayList<>();
        for (int i = 0; i < 120; i++) {
            rows.add(row(i, "o2-1", 3, minutes(i)));
        }
        assertThat(hatchery.take(rows.toArray(IncomingReading[]::new)).stored()).isEqualTo(120);
        hatchery.housekeeping.watchLimits();

        assertThat(hatchery.open()).isEmpty();
        assertThat(hatchery.subjects()).isEmpty();
    }

    @Test
    void a_computed_quantity_rings_with_its_value_and_uncertainty_in_the_message() {
        hatchery.limit("omega", "omegaAragonite", 3, 0);
        hatchery.readAllButPh(T0);
        hatchery.read("ph-1", 7.9, T0);

        WaterNumbers numbers = hatchery.newestState().numbers();
        Alert alert = hatchery.open().get(0);
        assertThat(alert.value()).isEqualTo(numbers.omegaAragonite());
        assertThat(alert.uncertainty()).isEqualTo(numbers.omegaAragoniteUncertainty());
        assertThat(messages().get(0).body())
                .contains("Ω %.2f ±%.2f".formatted(numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty()))
                .contains("under your 3.00")
                .contains("Act.");
    }

    @Test
    void water_to_and_fro_within_one_batch_is_told_as_its_beginning_and_its_end() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.start(hatchery.database, 4);
        List<IncomingReading> rows = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            rows.add(row(i, "o2-1", i % 2 == 0 ? 5 : 7, T0.plusSeconds(i)));
        }
        hatchery.clock.set(T0.plusSeconds(60));

        assertThat(hatchery.take(rows.toArray(IncomingReading[]::new)).stored()).isEqualTo(12);

        assertThat(hatchery.open()).extracting(Alert::phase).containsExactly(Phase.RETURNED_UNACKNOWLEDGED);
        assertThat(messages()).extracting(Message::key).doesNotHaveDuplicates();
        assertThat(hatchery.subjects()).hasSize(4).first().asString().startsWith("HIGH:");
    }

    @Test
    void a_failure_in_the_middle_leaves_neither_readings_nor_alert_nor_message() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.start(failingAtOutbox(hatchery.database), 1000);

        assertThatThrownBy(() -> hatchery.read("o2-1", 5, T0)).hasMessage("the outbox is full");

        assertThat(hatchery.open()).isEmpty();
        assertThat(messages()).isEmpty();
        hatchery.restart();
        assertThat(hatchery.read("o2-1", 5, T0).stored()).as("not a duplicate").isEqualTo(1);
        assertThat(hatchery.open()).hasSize(1);
        assertThat(messages()).hasSize(1);
    }

    @Test
    void alkalinity_that_comes_late_is_held_against_the_limit_at_once() {
        hatchery.limit("omega", "omegaAragonite", 3, 5);
        hatchery.clock.set(minutes(20));
        for (int i = 0; i <= 20; i++) {
            hatchery.take(
                    row(0, "t-1", 22, minutes(i)), row(1, "s-1", 30, minutes(i)), row(2, "ph-1", 7.6, minutes(i)));
        }
        assertThat(hatchery.open()).isEmpty();

        hatchery.read("ta-1", 2078, minutes(1));

        assertThat(hatchery.open()).extracting(Alert::since).containsExactly(minutes(1));
    }

    @Test
    void alkalinity_that_comes_late_corrects_the_value_that_speaks_for_now() {
        hatchery.limit("omega", "omegaAragonite", 1.5, 0);
        hatchery.read("ta-1", 4000, T0.minus(Duration.ofHours(20)));
        hatchery.take(row(0, "t-1", 22, T0), row(1, "s-1", 30, T0), row(2, "ph-1", 7.7, T0));
        assertThat(hatchery.open()).isEmpty();

        hatchery.read("ta-1", 2078, T0.minus(Duration.ofHours(2)));

        assertThat(hatchery.open())
                .extracting(Alert::value)
                .containsExactly(hatchery.newestState().numbers().omegaAragonite());
    }

    @Test
    void of_two_people_who_acknowledge_the_first_is_kept() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 5, T0);
        long id = hatchery.open().get(0).id();

        assertThat(hatchery.alerts.acknowledge(hatchery.site.id(), id, "Ana", "on my way"))
                .isEqualTo(Acknowledged.DONE);
        assertThat(hatchery.alerts.acknowledge(hatchery.site.id(), id, "Bo", "me too"))
                .isEqualTo(Acknowledged.NOTHING_TO_DO);
        assertThat(hatchery.alerts.acknowledge(hatchery.site.id() + 1, id, "Cy", null))
                .isEqualTo(Acknowledged.NO_SUCH_ALERT);

        Alert alert = hatchery.open().get(0);
        assertThat(alert.acknowledgedBy()).isEqualTo("Ana");
        assertThat(alert.acknowledgementNote()).isEqualTo("on my way");
        assertThat(hatchery.journal()).extracting(JournalBook.Entry::what).containsOnlyOnce("alert-acknowledged");
    }

    @Test
    void an_acknowledged_alert_closes_when_the_water_is_back() {
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);
        hatchery.read("o2-1", 5, T0);
        hatchery.alerts.acknowledge(hatchery.site.id(), hatchery.open().get(0).id(), "Ana", null);
        hatchery.clock.set(minutes(1));

        hatchery.read("o2-1", 7, minutes(1));

        assertThat(hatchery.open()).isEmpty();
        assertThat(hatchery.subjects()).hasSize(2).last().asString().startsWith("Back to normal");
    }

    @Test
    void subscribers_are_told_from_their_priority_on_and_only_while_active() {
        hatchery.place.saveSubscriber(
                hatchery.site, new SubscriberPlan("bo", "Bo", "bo@example.org", Priority.HIGH), true, "test");
        hatchery.place.saveSubscriber(
                hatchery.site, new SubscriberPlan("cy", "Cy", "cy@example.org", Priority.LOW), false, "test");
        hatchery.limits.save(
                hatchery.tank(),
                "oxygen",
                new LimitDesk.Wish("dissolvedOxygen", 6.0, null, 0.0, 0.0, 0.0, "medium", "Act."),
                "bo");
        hatchery.read("o2-1", 5, T0);
        assertThat(messages()).extracting(Message::recipient).containsExactly("ana@example.org");

        hatchery.limit("oxygen-low", "dissolvedOxygen", 5.5, 0);
        hatchery.clock.set(minutes(1));
        hatchery.read("o2-1", 5, minutes(1));
        assertThat(messages())
                .extracting(Message::recipient)
                .containsExactlyInAnyOrder("ana@example.org", "ana@example.org", "bo@example.org");
    }

    @Test
    void message_keys_are_unique_and_fit_even_where_codes_are_long() {
        String longest = "a".repeat(40);
        hatchery.place.saveSubscriber(
                hatchery.site,
                new SubscriberPlan(longest, "n".repeat(80), "bo@example.org", Priority.LOW),
                true,
                "test");
        hatchery.limit(longest, "dissolvedOxygen", 6, 0);

        hatchery.read("o2-1", 5, T0);

        assertThat(messages())
                .hasSize(2)
                .extracting(Message::key)
                .doesNotHaveDuplicates()
                .allSatisfy(key -> assertThat(key).hasSizeLessThanOrEqualTo(100));
    }

    @Test
    void two_sensors_of_one_moment_are_one_value_the_more_certain() {
        hatchery.sensor("o2-0", Quantity.DISSOLVED_OXYGEN, 0.05);
        hatchery.limit("oxygen", "dissolvedOxygen", 6, 0);

        hatchery.take(row(0, "o2-1", 5, T0), row(1, "o2-0", 7, T0));

        assertThat(hatchery.open()).isEmpty();
    }

    private List<Message> messages() {
        return hatchery.database.read(books -> books.outbox().messages(hatchery.site.id(), 1000));
    }

    static Instant minutes(double minutes) {
        return T0.plusSeconds(Math.round(minutes * 60));
    }

    /** The same storage, but no message can be queued. */
    private static Storage failingAtOutbox(Storage storage) {
        return new Storage() {
            @Override
            public <T> T write(Function<Books, T> work) {
                return storage.write(books -> work.apply(failing(books)));
            }

            @Override
            public <T> T read(Function<Books, T> work) {
                return storage.read(work);
            }
        };
    }

    private static Books failing(Books books) {
        OutboxBook outbox = (OutboxBook) Proxy.newProxyInstance(
                AlertsTest.class.getClassLoader(), new Class<?>[] {OutboxBook.class}, (proxy, method, args) -> {
                    if (method.getName().equals("add")) {
                        throw new IllegalStateException("the outbox is full");
                    }
                    return call(books.outbox(), method, args);
                });
        return (Books) Proxy.newProxyInstance(
                AlertsTest.class.getClassLoader(),
                new Class<?>[] {Books.class},
                (proxy, method, args) -> method.getName().equals("outbox") ? outbox : call(books, method, args));
    }

    private static Object call(Object target, java.lang.reflect.Method method, Object[] args) throws Throwable {
        try {
            method.setAccessible(true);
            return method.invoke(target, args);
        } catch (InvocationTargetException e) {
            throw e.getCause();
        }
    }
}
