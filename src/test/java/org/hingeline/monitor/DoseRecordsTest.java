package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.dosing.DoseOutcome;
import org.hingeline.dosing.DoseOutcome.Verdict;
import org.hingeline.dosing.TankVolume;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Standing;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PeopleBook.Membership;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** The tank of 4000 L at 22 °C, salinity 30, alkalinity 2078 µmol/kg and pH 7.7. */
class DoseRecordsTest {
    private static final Conditions WATER = Conditions.of(22, 30);
    private static final CarbonateState BEFORE =
            CarbonateSystem.solve(WATER, new PhAndAlkalinity(7.7, 2078e-6)).orElseThrow();

    /** Of anhydrous soda ash of 100 %, in 4000 L: +300 µmol/kg. */
    private static final double FOR_300 = 300e-6 / 2 * 105.99 * 4 * BEFORE.densityKgM3();

    private final Hatchery hatchery = Hatchery.empty();
    private int keys;

    @Test
    void what_is_foretold_is_reckoned_from_the_tank_and_the_mass_given() {
        water(7.7);

        Dose dose = record("mia", FOR_300, null);

        Dose.Foretold foretold = dose.foretold();
        CarbonateState after = dosed(1, 1);
        assertThat(foretold.addedAlkalinityUmolKg()).isCloseTo(300, within(1e-6));
        assertThat(foretold.after().phTotal()).isCloseTo(after.phTotal(), within(1e-9));
        assertThat(foretold.after().omegaAragonite()).isCloseTo(after.omegaAragonite(), within(1e-9));
        assertThat(foretold.stateAt()).isEqualTo(T0);
    }

    @Test
    void without_a_fresh_water_nothing_is_foretold_and_nothing_judged() {
        Dose dose = record("mia", 50, null);

        assertThat(dose.foretold()).isNull();
        assertThat(outcome(dose).detail()).contains("Nothing was foretold");
    }

    @Test
    void a_dose_that_arrived_in_full_is_as_foretold_though_the_alkalinity_is_an_old_one() {
        water(7.7);
        Dose dose = record("mia", FOR_300, null);
        assertThat(outcome(dose).verdict()).isEqualTo(Verdict.NOT_YET);

        settle(dosed(1, 1).phTotal());

        assertThat(outcome(dose).verdict()).as(outcome(dose).detail()).isEqualTo(Verdict.AS_FORETOLD);
        assertThat(outcome(dose).seen().share()).isCloseTo(1, within(0.001));
    }

    @Test
    void decahydrate_taken_for_anhydrous_shows_as_a_third_of_it() {
        water(7.7);
        Dose dose = record("mia", FOR_300, null);

        settle(dosed(105.99 / 286.14, 1).phTotal());

        assertThat(outcome(dose).verdict()).isEqualTo(Verdict.LESS);
        assertThat(outcome(dose).detail()).contains("37 % of it").contains("hydration");
    }

    @Test
    void water_that_ran_in_leaves_it_open() {
        hatchery.sensor("flow-1", Quantity.FLOW, 1);
        water(7.7);
        Dose dose = record("mia", FOR_300, null);
        hatchery.clock.set(T0.plus(Duration.ofMinutes(10)));
        hatchery.take(new IncomingReading(
                0, "tank", "flow", 12.0, hatchery.clock.instant().toString(), null, "flow-1", null, "row 0"));

        settle(dosed(1, 1).phTotal());

        assertThat(outcome(dose).detail()).contains("Water ran through");
    }

    @Test
    void a_second_dose_knows_of_the_first_though_the_titration_does_not() {
        water(7.7);
        record("mia", FOR_300, null);
        settle(dosed(1, 1).phTotal());

        Dose second = record("mia", FOR_300, null);

        assertThat(second.foretold().before().totalAlkalinityUmolKg()).isCloseTo(2378, within(0.01));
        assertThat(second.foretold().after().phTotal()).isCloseTo(dosed(1, 2).phTotal(), within(1e-4));
        settle(dosed(1, 2).phTotal());
        assertThat(outcome(second).verdict()).isEqualTo(Verdict.AS_FORETOLD);
    }

    @Test
    void a_dose_on_top_of_one_that_is_not_mixed_leaves_both_open() {
        water(7.7);
        Dose first = record("mia", FOR_300, null);
        hatchery.clock.set(T0.plus(Duration.ofMinutes(10)));
        Dose second = record("mia", FOR_300, null);

        settle(dosed(1, 2).phTotal());

        assertThat(outcome(first).detail()).contains("Another dose went in");
        assertThat(outcome(second).detail()).contains("The dose before it was not mixed");
        hatchery.doseRecords.undo(hatchery.site, person("mia", Role.OPERATOR), undoable(second));
    }

    private long undoable(Dose dose) {
        hatchery.clock.set(dose.recordedAt().plus(DoseRecords.UNDO));
        return dose.id();
    }

    @Test
    void three_shortfalls_suggest_the_volume_of_the_tank() {
        double pH = 7.7;
        for (int i = 1; i <= 3; i++) {
            assertThat(hatchery.doseHistory.volume(hatchery.tank())).isEmpty();
            water(pH);
            record("mia", FOR_300 / 2, null);
            pH = dosed(0.4, i).phTotal();
            settle(pH);
        }

        TankVolume volume = hatchery.doseHistory.volume(hatchery.tank()).orElseThrow();

        assertThat(volume.doses()).isEqualTo(3);
        assertThat(volume.lowL()).isLessThan(5000).isGreaterThan(4000);
        assertThat(volume.highL()).isGreaterThan(5000);
    }

    @Test
    void every_step_is_journaled_with_what_was_there_before() {
        Dose dose = record("mia", 50, null);
        Caller boss = person("zoe", Role.MANAGER);
        hatchery.doseRecords.correct(hatchery.site, boss, dose.id(), entry(0.0, null, "Never put in."));
        Dose second = record("mia", 40, null);
        hatchery.doseRecords.undo(hatchery.site, boss, second.id());
        Dose large = record("mia", 600, null);
        hatchery.doseRecords.confirm(hatchery.site, boss, large.id());

        assertThat(hatchery.journal().stream()
                        .map(JournalBook.Entry::what)
                        .filter(what -> what.startsWith("dose-"))
                        .toList())
                .containsExactlyInAnyOrder(
                        "dose-recorded",
                        "dose-corrected",
                        "dose-recorded",
                        "dose-undone",
                        "dose-recorded",
                        "dose-confirmed");
        assertThat(hatchery.journal())
                .filteredOn(entry -> entry.what().equals("dose-corrected"))
                .singleElement()
                .satisfies(entry -> assertThat(entry.detail())
                        .contains("before: dose " + dose.id() + ", 50.0 g sodium-carbonate")
                        .contains("Never put in."));
    }

    @Test
    void a_correction_may_say_that_nothing_was_put_in_and_a_dose_may_not() {
        Dose dose = record("mia", 50, null);

        Dose correction = hatchery.doseRecords
                .correct(hatchery.site, person("mia", Role.OPERATOR), dose.id(), entry(0.0, null, "Never put in."))
                .dose();

        assertThat(outcome(correction).detail()).isEqualTo("Nothing was put in.");
        assertThatThrownBy(() -> record("mia", 0, null)).hasMessageContaining("above 0");
        assertThatThrownBy(() -> hatchery.doseRecords.undo(hatchery.site, person("mia", Role.OPERATOR), dose.id()))
                .hasMessageContaining("was corrected by dose " + correction.id());
    }

    @Test
    void what_is_in_the_water_already_a_manager_records_past_the_bound() {
        for (int i = 0; i < 4; i++) {
            record("mia", 500, null);
        }
        Instant anHourAgo = T0.minus(Duration.ofHours(1));
        assertThatThrownBy(() -> record("mia", 10, anHourAgo)).hasMessageContaining("a manager can record");
        assertThatThrownBy(() -> hatchery.doseRecords.record(
                        hatchery.site, person("zoe", Role.MANAGER), entry(10.0, null, null)))
                .as("nobody puts in more than that now")
                .hasMessageContaining("is too much");

        Dose dose = hatchery.doseRecords
                .record(hatchery.site, person("zoe", Role.MANAGER), entry(10.0, anHourAgo, null))
                .dose();

        assertThat(dose.standing()).isEqualTo(Standing.RECORDED);
    }

    @Test
    void a_dose_that_waits_counts_against_the_day_and_can_be_withdrawn_at_any_time() {
        Dose waiting = record("mia", 700, null);
        record("mia", 900, null);
        assertThatThrownBy(() -> record("ben", 500, null)).hasMessageContaining("is too much");
        hatchery.clock.set(T0.plus(Duration.ofHours(3)));

        hatchery.doseRecords.undo(hatchery.site, person("mia", Role.OPERATOR), waiting.id());

        record("ben", 500, null);
        assertThatThrownBy(
                        () -> hatchery.doseRecords.confirm(hatchery.site, person("ben", Role.OPERATOR), waiting.id()))
                .hasMessageContaining("was undone and waits for nobody");
    }

    @Test
    void a_dose_put_in_earlier_keeps_its_time_when_it_is_confirmed() {
        Instant anHourAgo = T0.minus(Duration.ofHours(1));
        Dose earlier = record("mia", 600, anHourAgo);
        Dose now = record("mia", 600, null);
        hatchery.clock.set(T0.plusSeconds(300));
        Caller ben = person("ben", Role.OPERATOR);

        assertThat(hatchery.doseRecords
                        .confirm(hatchery.site, ben, earlier.id())
                        .at())
                .isEqualTo(anHourAgo);
        assertThat(hatchery.doseRecords.confirm(hatchery.site, ben, now.id()).at())
                .isEqualTo(T0.plusSeconds(300));
    }

    /** The tank is read at the clock's time. */
    private void water(double ph) {
        Instant at = hatchery.clock.instant();
        if (at.equals(T0)) {
            hatchery.readAllButPh(at);
        } else {
            hatchery.take(Hatchery.row(0, "t-1", 22, at), Hatchery.row(1, "s-1", 30, at));
        }
        hatchery.read("ph-1", ph, at);
    }

    /** After the mixing, the tank is read every five minutes, and an hour has passed. */
    private void settle(double ph) {
        Instant start = hatchery.clock.instant();
        for (int minutes = 30; minutes <= 60; minutes += 5) {
            hatchery.clock.set(start.plus(Duration.ofMinutes(minutes)));
            water(ph);
        }
    }

    /** The water when that share of so many doses has arrived. */
    private static CarbonateState dosed(double share, int doses) {
        return CarbonateSystem.solve(
                        WATER,
                        new AlkalinityAndDic(
                                BEFORE.totalAlkalinity() + share * doses * 300e-6,
                                BEFORE.dic() + share * doses * 150e-6))
                .orElseThrow();
    }

    private DoseOutcome outcome(Dose dose) {
        return hatchery.doseHistory
                .one(hatchery.site.id(), dose.id())
                .orElseThrow()
                .outcome();
    }

    private Dose record(String who, double massG, @Nullable Instant at) {
        return hatchery.doseRecords
                .record(hatchery.site, person(who, Role.OPERATOR), entry(massG, at, null))
                .dose();
    }

    private Caller person(String name, Role role) {
        return new Caller(name, "proof", List.of(new Membership(hatchery.site, role)));
    }

    private DoseEntry entry(double massG, @Nullable Instant at, @Nullable String note) {
        return new DoseEntry(
                "key-0000" + keys++,
                "tank",
                at == null ? null : at.toString(),
                new DoseWish.Agent("sodium-carbonate", "anhydrous", 100.0),
                massG,
                "SA-2291",
                null,
                note,
                true);
    }
}
