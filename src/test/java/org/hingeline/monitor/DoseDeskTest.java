package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.monitor.AlertsTest.minutes;
import static org.hingeline.monitor.Hatchery.T0;

import java.time.Duration;
import java.util.List;
import org.hingeline.dosing.DosePlan;
import org.hingeline.dosing.Reason;
import org.hingeline.measure.Quantity;
import org.hingeline.quality.Flag;
import org.junit.jupiter.api.Test;

class DoseDeskTest {
    private static final DoseWish.Agent ANHYDROUS = new DoseWish.Agent("sodium-carbonate", "anhydrous", 99.2);
    private static final DoseWish.Target TARGET = new DoseWish.Target(2.5, null, null);

    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void a_tank_with_fresh_inputs_gets_a_plan_for_its_own_volume() {
        water();

        DosePlan plan = hatchery.doses.plan(hatchery.site, wish("tank"));

        assertThat(plan.outcome()).isEqualTo(DosePlan.Outcome.PLAN);
        assertThat(plan.reasons()).isEmpty();
    }

    @Test
    void an_input_that_was_fresh_for_its_state_but_is_old_by_now_is_refused() {
        water();
        hatchery.clock.set(minutes(15));
        assertThat(hatchery.doses.plan(hatchery.site, wish("tank")).outcome()).isEqualTo(DosePlan.Outcome.PLAN);

        hatchery.clock.set(minutes(16));

        refused("ph", "16 min", "at most 15 min");
    }

    @Test
    void a_water_with_an_input_missing_is_refused_and_says_which() {
        hatchery.readAllButPh(T0);

        refused("pH", "not read lately");
    }

    @Test
    void a_tank_never_read_is_refused() {
        refused("never read");
    }

    @Test
    void a_suspect_input_is_refused() {
        hatchery.readAllButPh(T0);
        long ph = hatchery.place.sensors(hatchery.site).stream()
                .filter(s -> s.code().equals("ph-1"))
                .findFirst()
                .orElseThrow()
                .id();
        hatchery.database.writeOnly(books -> books.readings()
                .insert(List.of(new ReadingBook.StoredReading(ph, T0, 7.9, Flag.SUSPECT)), hatchery.gateway.id(), T0));
        hatchery.read("t-1", 22, T0.plusSeconds(1));

        refused("ph-1", "suspect");
    }

    @Test
    void total_ammonia_read_within_three_days_is_taken_up() {
        hatchery.sensor("nh-1", Quantity.AMMONIA, 0.05);
        hatchery.read("nh-1", 0.4, T0);
        hatchery.clock.set(T0.plus(Duration.ofDays(2)));
        hatchery.readAllButPh(hatchery.clock.instant());
        hatchery.read("ph-1", 7.9, hatchery.clock.instant());

        DosePlan fresh = hatchery.doses.plan(hatchery.site, wish("tank"));
        assertThat(fresh.ammonia().totalMgL()).isEqualTo(0.4);

        hatchery.clock.set(T0.plus(Duration.ofDays(4)));
        hatchery.readAllButPh(hatchery.clock.instant());
        hatchery.read("ph-1", 7.9, hatchery.clock.instant());

        DosePlan old = hatchery.doses.plan(hatchery.site, wish("tank"));
        assertThat(old.ammonia()).isNull();
    }

    @Test
    void every_fault_of_a_request_is_named_at_once() {
        DoseWish wish = new DoseWish(
                "pond",
                null,
                null,
                new DoseWish.Target(2.5, 8.0, null),
                new DoseWish.Agent("lime", null, Double.NaN),
                new DoseWish.Bounds(20.0, null, null),
                null,
                1.0);

        assertThatThrownBy(() -> hatchery.doses.plan(hatchery.site, wish))
                .isInstanceOfSatisfying(
                        FieldFaultsException.class,
                        e -> assertThat(e.faults())
                                .extracting(FieldFaults.Fault::field)
                                .containsExactlyInAnyOrder(
                                        "point",
                                        "volumeL",
                                        "target",
                                        "agent/code",
                                        "agent/assayPercent",
                                        "bounds/phTotalMax",
                                        "aerateToUatm"))
                .hasMessageContaining("\"pond\"")
                .hasMessageContaining("\"lime\"")
                .hasMessageContaining("20.0");
    }

    @Test
    void a_request_names_a_point_or_a_water_and_not_both_or_neither() {
        WaterWish given = WaterWish.builder()
                .temperatureC(22.0)
                .salinity(30.0)
                .ph(7.9)
                .totalAlkalinityUmolKg(2078.0)
                .build();

        assertThatThrownBy(() -> hatchery.doses.plan(hatchery.site, wish(null))).hasMessageContaining("neither");
        assertThatThrownBy(() -> hatchery.doses.plan(
                        hatchery.site, new DoseWish("tank", given, null, TARGET, ANHYDROUS, null, null, null)))
                .hasMessageContaining("both");
        assertThat(hatchery.doses
                        .plan(hatchery.site, new DoseWish(null, given, 4000.0, TARGET, ANHYDROUS, null, null, null))
                        .outcome())
                .isEqualTo(DosePlan.Outcome.PLAN);
    }

    @Test
    void the_hydration_is_never_guessed() {
        water();
        DoseWish wish = new DoseWish(
                "tank", null, null, TARGET, new DoseWish.Agent("sodium-carbonate", null, 99.0), null, null, null);

        assertThatThrownBy(() -> hatchery.doses.plan(hatchery.site, wish))
                .isInstanceOfSatisfying(
                        FieldFaultsException.class,
                        e -> assertThat(e.faults())
                                .extracting(FieldFaults.Fault::field)
                                .containsExactly("agent/hydration"));
    }

    @Test
    void what_is_given_of_a_water_must_be_numbers_on_a_known_scale() {
        WaterWish given = WaterWish.builder()
                .temperatureC(Double.NaN)
                .ph(7.9)
                .phScale("sws")
                .totalAlkalinityUmolKg(2078.0)
                .uncertainty(new WaterWish.Uncertainty(-0.1, null, null, null, null, null, null, null))
                .warmToC(25.0)
                .build();

        assertThatThrownBy(() -> hatchery.doses.plan(
                        hatchery.site, new DoseWish(null, given, 4000.0, TARGET, ANHYDROUS, null, null, null)))
                .isInstanceOfSatisfying(
                        FieldFaultsException.class,
                        e -> assertThat(e.faults())
                                .extracting(FieldFaults.Fault::field)
                                .containsExactlyInAnyOrder(
                                        "water/temperatureC",
                                        "water/salinity",
                                        "water/phScale",
                                        "water/uncertainty/ph",
                                        "water/warmToC"));
    }

    private void refused(String... said) {
        DosePlan plan = hatchery.doses.plan(hatchery.site, wish("tank"));
        assertThat(plan.outcome()).isEqualTo(DosePlan.Outcome.REFUSED);
        assertThat(plan.reasons().stream().map(Reason::detail).toList().toString())
                .contains(said);
    }

    private void water() {
        hatchery.readAllButPh(T0);
        hatchery.read("ph-1", 7.9, T0);
    }

    private static DoseWish wish(String point) {
        return new DoseWish(point, null, null, TARGET, ANHYDROUS, null, null, null);
    }
}
