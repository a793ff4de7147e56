package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.PointKind;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan.BatchPlan;
import org.hingeline.monitor.PlacePlan.LimitPlan;
import org.hingeline.monitor.PlacePlan.PointPlan;
import org.hingeline.monitor.PlacePlan.SensorPlan;
import org.hingeline.monitor.PlacePlan.SitePlan;
import org.hingeline.monitor.PlacePlan.SubscriberPlan;
import org.junit.jupiter.api.Test;

class PlacePlanTest {
    private static final SitePlan SITE = new SitePlan("a", "A", ZoneOffset.UTC);
    private static final LimitDesk.Wish WISH =
            new LimitDesk.Wish("omegaAragonite", 1.7, null, null, null, null, "high", "Close the valve.");

    @Test
    void a_code_twice_or_one_that_names_no_point_is_refused() {
        List<PointPlan> intake = List.of(point("intake", null));
        assertThatIllegalArgumentException()
                .isThrownBy(() -> plan(List.of(point("intake", null), point("intake", null)), List.of(), List.of()))
                .withMessage("point \"intake\" is there twice");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> plan(List.of(point("tank", "sea")), List.of(), List.of()))
                .withMessage("feedsFrom \"sea\" of point tank must name another point of the plan");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> plan(intake, List.of(sensor("tank")), List.of()))
                .withMessage("point \"tank\" of sensor t-1 must name a point of the plan");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> plan(intake, List.of(), List.of(new LimitPlan("tank", "low", WISH))))
                .withMessage("point \"tank\" of limit low must name a point of the plan");
    }

    @Test
    void its_parts_keep_the_rules_of_the_records_they_become() {
        assertThatIllegalArgumentException().isThrownBy(() -> point("Intake", null));
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new SensorPlan("intake", "p", Quantity.PH, "[pH]", null, 0.02, null))
                .withMessageContaining("phScale is missing");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new SubscriberPlan("a", "A", "a b@example.org", Priority.LOW));
        assertThatThrownBy(() -> new LimitPlan("intake", "silence", WISH)).isInstanceOf(FieldFaultsException.class);
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new BatchPlan("tank", "b", "Ostrea lurida", Instant.EPOCH, 2.0));
    }

    @Test
    void the_records_it_becomes_say_the_same() {
        Instant now = Instant.parse("2026-05-14T03:20:00Z");

        assertThat(point("tank", "intake").toPoint(7).siteId()).isEqualTo(7);
        assertThat(point("tank", "intake").toPoint(7).feedsFrom()).isEqualTo("intake");
        assertThat(sensor("tank").toSensor(9).pointId()).isEqualTo(9);
        assertThat(new LimitPlan("tank", "low", WISH).toLimit(9).threshold()).isEqualTo(1.7);
        assertThat(new BatchPlan("tank", "b", "Ostrea lurida", null, 1.5)
                        .toBatch(9, now)
                        .spawnedAt())
                .isEqualTo("2026-05-14T01:50:00Z");
        assertThat(new SubscriberPlan("a", "A", "a@example.org", Priority.LOW).toSubscriber(7))
                .isEqualTo(new PeopleBook.Subscriber(0, 7, "a", "A", "a@example.org", Priority.LOW, true));
    }

    @Test
    void a_list_changed_afterwards_changes_no_plan() {
        List<PointPlan> points = new ArrayList<>(List.of(point("intake", null)));
        PlacePlan plan = plan(points, List.of(), List.of());
        points.clear();

        assertThat(plan.points()).hasSize(1);
    }

    private static PlacePlan plan(List<PointPlan> points, List<SensorPlan> sensors, List<LimitPlan> limits) {
        return new PlacePlan(SITE, points, sensors, limits, List.of(), List.of());
    }

    private static PointPlan point(String code, String feedsFrom) {
        return new PointPlan(code, code, PointKind.LARVAL, 1, feedsFrom, 4000.0, Duration.ofMinutes(15));
    }

    private static SensorPlan sensor(String point) {
        return new SensorPlan(point, "t-1", Quantity.TEMPERATURE, "Cel", null, 0.1, null);
    }
}
