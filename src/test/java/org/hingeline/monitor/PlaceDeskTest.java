package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.monitor.AlertsTest.minutes;
import static org.hingeline.monitor.Hatchery.T0;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.PointKind;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan.BatchPlan;
import org.hingeline.monitor.PlacePlan.LimitPlan;
import org.hingeline.monitor.PlacePlan.PointPlan;
import org.hingeline.monitor.PlacePlan.SensorPlan;
import org.hingeline.monitor.PlacePlan.SitePlan;
import org.hingeline.monitor.PlacePlan.SubscriberPlan;
import org.junit.jupiter.api.Test;

class PlaceDeskTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void a_plan_applied_again_changes_nothing_more() {
        PlacePlan plan = full();
        hatchery.place.apply(plan, "test");
        List<Object> before = everything();

        hatchery.clock.pass(Duration.ofHours(5));
        hatchery.place.apply(plan, "test");

        assertThat(everything()).isEqualTo(before);
        assertThat(hatchery.journal())
                .filteredOn(e -> e.what().equals("limit-saved"))
                .hasSize(1);
    }

    @Test
    void a_changed_plan_changes_what_has_the_same_code_and_takes_nothing_away() {
        hatchery.place.apply(full(), "test");
        List<SensorPlan> sensors = List.of(Hatchery.sensorPlan("t-1", Quantity.TEMPERATURE, 0.5));
        hatchery.place.apply(
                new PlacePlan(
                        new SitePlan("cove", "Cove and Sons", ZoneOffset.UTC),
                        List.of(Hatchery.tankPlan(Duration.ofMinutes(30))),
                        sensors,
                        List.of(),
                        List.of(),
                        List.of()),
                "test");

        assertThat(hatchery.place.site("cove").orElseThrow().name()).isEqualTo("Cove and Sons");
        assertThat(hatchery.place.sensors(hatchery.site)).hasSize(5).anySatisfy(sensor -> {
            assertThat(sensor.code()).isEqualTo("t-1");
            assertThat(sensor.standardUncertainty()).isEqualTo(0.5);
        });
        assertThat(limits()).extracting(Limit::name).containsExactly("oxygen", "silence");
    }

    @Test
    void the_watch_over_silence_follows_the_longest_gap() {
        assertThat(silence().threshold()).isEqualTo(15);

        hatchery.place.savePoint(hatchery.site, Hatchery.tankPlan(Duration.ofMinutes(40)), "test");

        assertThat(silence().threshold()).isEqualTo(40);
        assertThat(silence().quantity()).isEqualTo(Quantity.SILENCE);
    }

    @Test
    void a_known_sensor_keeps_quantity_and_point_on_the_page_and_in_a_plan() {
        hatchery.place.savePoint(
                hatchery.site,
                new PointPlan("intake", "Intake", PointKind.INTAKE, 0, null, null, Duration.ofMinutes(15)),
                "test");
        SensorPlan otherQuantity = Hatchery.sensorPlan("t-1", Quantity.SALINITY, 0.1);
        SensorPlan otherPoint = new SensorPlan("intake", "t-1", Quantity.TEMPERATURE, "Cel", null, 0.1, null);

        for (SensorPlan wrong : List.of(otherQuantity, otherPoint)) {
            assertThatThrownBy(() -> hatchery.place.saveSensor(hatchery.site, wrong, "test"))
                    .isInstanceOf(FieldFaultsException.class)
                    .hasMessageContaining("t-1")
                    .hasMessageContaining("another code");
            PlacePlan plan = new PlacePlan(
                    new SitePlan("cove", "Changed", ZoneOffset.UTC),
                    List.of(
                            Hatchery.tankPlan(Duration.ofMinutes(15)),
                            new PointPlan("intake", "Intake", PointKind.INTAKE, 0, null, null, Duration.ofMinutes(15))),
                    List.of(wrong),
                    List.of(),
                    List.of(),
                    List.of());
            assertThatThrownBy(() -> hatchery.place.apply(plan, "test")).isInstanceOf(FieldFaultsException.class);
        }

        assertThat(hatchery.place.site("cove").orElseThrow().name())
                .as("nothing of a refused plan is kept")
                .isEqualTo("Cove");
        assertThat(hatchery.place.sensors(hatchery.site)).anySatisfy(sensor -> {
            assertThat(sensor.code()).isEqualTo("t-1");
            assertThat(sensor.quantity()).isEqualTo(Quantity.TEMPERATURE);
        });
    }

    @Test
    void a_sensor_at_a_point_that_is_not_there_is_refused() {
        SensorPlan nowhere = new SensorPlan("pond", "x-1", Quantity.TEMPERATURE, "Cel", null, 0.1, null);

        assertThatThrownBy(() -> hatchery.place.saveSensor(hatchery.site, nowhere, "test"))
                .hasMessageContaining("\"pond\"");
    }

    @Test
    void a_plan_puts_a_limit_back_that_was_taken_away() {
        hatchery.place.apply(full(), "test");
        hatchery.limits.retire(hatchery.tank(), "oxygen", "bo");

        hatchery.clock.set(minutes(60));
        hatchery.place.apply(full(), "test");

        assertThat(limits()).extracting(Limit::name).contains("oxygen");
    }

    @Test
    void a_batch_keeps_its_spawn_when_its_plan_gives_hours_and_takes_a_time_that_is_given() {
        hatchery.place.apply(full(), "test");
        Instant spawned = T0.minus(Duration.ofHours(20));
        hatchery.clock.pass(Duration.ofHours(3));
        hatchery.place.apply(full(), "test");
        assertThat(batches()).extracting(Batch::spawnedAt).containsExactly(spawned);

        hatchery.place.apply(with(new BatchPlan("tank", "b-1", "Ostrea lurida", T0, null)), "test");
        assertThat(batches()).extracting(Batch::spawnedAt).containsExactly(T0);
    }

    private static PlacePlan full() {
        return with(new BatchPlan("tank", "b-1", "Ostrea lurida", null, 20.0));
    }

    private static PlacePlan with(BatchPlan batch) {
        PlacePlan plan = Hatchery.plan("cove");
        return new PlacePlan(
                plan.site(),
                plan.points(),
                plan.sensors(),
                List.of(new LimitPlan(
                        "tank",
                        "oxygen",
                        new LimitDesk.Wish("dissolvedOxygen", 6.0, null, null, null, null, "high", "Act."))),
                List.of(new SubscriberPlan("ana", "Ana", "ana@example.org", Priority.LOW)),
                List.of(batch));
    }

    private List<Object> everything() {
        return List.of(
                hatchery.place.sites(),
                hatchery.place.points(hatchery.site),
                hatchery.place.sensors(hatchery.site),
                hatchery.place.subscribers(hatchery.site),
                limits(),
                batches());
    }

    private List<Limit> limits() {
        return hatchery.database.read(
                books -> books.limits().limits(hatchery.tank().id()));
    }

    private Limit silence() {
        return limits().stream().filter(Limit::onSilence).findFirst().orElseThrow();
    }

    private List<Batch> batches() {
        return hatchery.database.read(books -> books.place().batchesNow(hatchery.site.id(), hatchery.clock.instant()));
    }
}
