package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.dosing.DoseComparison.After;
import org.hingeline.dosing.DoseComparison.Dosed;
import org.hingeline.dosing.DoseOutcome.Basis;
import org.hingeline.dosing.DoseOutcome.Verdict;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** A dose of sodium carbonate for +300 µmol/kg into the worked water, and what its tank reads afterwards. */
class DoseComparisonTest {
    private static final Instant T0 = Instant.parse("2026-05-14T03:00:00Z");
    private static final Instant MIXED = T0.plus(Duration.ofMinutes(30));
    private static final Instant UNTIL = MIXED.plus(Duration.ofMinutes(30));
    private static final Agent SODA = Agent.SODIUM_CARBONATE;
    private static final CarbonateState BEFORE = ((Solved) Waters.measured()).state();

    /** Of pure anhydrous soda ash in 4000 L, so that 300 µmol/kg arrive. */
    private static final double MASS_G = 300e-6 / 2 * 105.99 * 4 * BEFORE.densityKgM3();

    private static final DoseEffect EFFECT = DoseEffect.of(
                    BEFORE, Waters.UNCERTAINTY, 0, new DoseEffect.Given(Product.pure(SODA), MASS_G, 4000))
            .orElseThrow();

    @Test
    void the_foretold_water_is_the_worked_case_and_closes_in_mass() {
        // CO2 900 µatm, TA +300 by sodium carbonate: pH 8.040, Ω 2.929
        assertThat(EFFECT.after().phTotal()).isCloseTo(8.040, within(5e-4));
        assertThat(EFFECT.after().omegaAragonite()).isCloseTo(2.929, within(5e-4));
        assertThat(EFFECT.after().totalAlkalinity() - BEFORE.totalAlkalinity()).isCloseTo(300e-6, within(1e-15));
        assertThat(EFFECT.after().dic() - BEFORE.dic()).isCloseTo(150e-6, within(1e-15));
    }

    @Test
    void what_before_and_after_share_is_left_out_of_the_uncertainty() {
        double ofChange = EFFECT.ofChange().phTotal().fromInputs();

        assertThat(ofChange).isPositive().isLessThan(Waters.UNCERTAINTY.ph());
    }

    @Test
    void alkalinity_that_older_doses_added_counts_in_the_water_before() {
        DoseEffect second = DoseEffect.of(
                        BEFORE, Waters.UNCERTAINTY, 300e-6, new DoseEffect.Given(Product.pure(SODA), MASS_G, 4000))
                .orElseThrow();

        assertThat(second.before().totalAlkalinity()).isCloseTo(2378e-6, within(1e-12));
        assertThat(second.before().phTotal()).isCloseTo(BEFORE.phTotal(), within(1e-9));
    }

    @ParameterizedTest
    @CsvSource({"0.37, LESS", "0.8, LESS", "1, AS_FORETOLD", "0.97, AS_FORETOLD", "1.3, MORE"})
    void the_share_that_arrived_is_found_from_ph_alone(double share, Verdict verdict) {
        DoseOutcome outcome = compare(readings(5, share, 22, 30));

        assertThat(outcome.verdict()).as(outcome.detail()).isEqualTo(verdict);
        assertThat(outcome.seen().basis()).isEqualTo(Basis.PH);
        assertThat(outcome.seen().share()).isCloseTo(share, within(1e-6));
        assertThat(outcome.seen().states()).isEqualTo(5);
        assertThat(outcome.seen().omegaAragonite())
                .isCloseTo(dosed(share, 22, 30).omegaAragonite(), within(1e-6));
    }

    @Test
    void a_tank_that_warmed_meanwhile_is_judged_at_the_temperature_it_has() {
        assertThat(compare(readings(3, 1, 24, 30)).seen().share()).isCloseTo(1, within(1e-6));
    }

    @Test
    void an_alkalinity_measured_afterwards_outranks_ph_which_aeration_moves() {
        List<After> states = new ArrayList<>(readings(3, 1.5, 22, 30));
        CarbonateState water = dosed(0.5, 22, 30);
        states.replaceAll(
                s -> new After(s.phAt(), s.phTotal(), s.conditions(), MIXED.plusSeconds(60), water.totalAlkalinity()));

        DoseOutcome outcome = compare(states);

        assertThat(outcome.verdict()).isEqualTo(Verdict.LESS);
        assertThat(outcome.seen().basis()).isEqualTo(Basis.TOTAL_ALKALINITY);
        assertThat(outcome.seen().share()).isCloseTo(0.5, within(1e-9));
    }

    @Test
    void an_alkalinity_too_coarse_for_a_small_dose_leaves_it_to_ph() {
        Dosed small = new Dosed(SODA, BEFORE.totalAlkalinity(), BEFORE.dic(), 30, 25e-6, 0.001, 10e-6, MIXED, UNTIL);
        List<After> states = new ArrayList<>(readings(3, 25.0 / 300, 22, 30));
        states.replaceAll(
                s -> new After(s.phAt(), s.phTotal(), s.conditions(), MIXED.plusSeconds(60), BEFORE.totalAlkalinity()));

        DoseOutcome outcome = DoseComparison.compare(small, states, false, UNTIL);

        assertThat(outcome.verdict()).as(outcome.detail()).isEqualTo(Verdict.AS_FORETOLD);
        assertThat(outcome.seen().basis()).isEqualTo(Basis.PH);
    }

    @Test
    void the_middle_of_the_readings_counts_and_one_wild_one_does_not() {
        List<After> states = new ArrayList<>(readings(4, 1, 22, 30));
        After wild = states.get(2);
        states.set(2, new After(wild.phAt(), 7.2, wild.conditions(), T0, 2078e-6));

        assertThat(compare(states).verdict()).isEqualTo(Verdict.AS_FORETOLD);
    }

    @Test
    void readings_before_mixing_or_too_late_tell_nothing() {
        List<After> early = new ArrayList<>(readings(5, 0.2, 22, 30));
        early.replaceAll(s -> new After(T0.plusSeconds(60), s.phTotal(), s.conditions(), T0, 2078e-6));
        assertThat(compare(early).verdict()).isEqualTo(Verdict.CANNOT_TELL);

        early.replaceAll(s -> new After(UNTIL.plusSeconds(1), s.phTotal(), s.conditions(), T0, 2078e-6));
        assertThat(compare(early).verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }

    @Test
    void it_waits_for_mixing_and_then_for_three_readings_of_their_own() {
        assertThat(DoseComparison.compare(question(), List.of(), false, T0.plusSeconds(60))
                        .detail())
                .contains("mixing");
        List<After> readings = readings(3, 1, 22, 30);
        Instant now = MIXED.plus(Duration.ofMinutes(12));
        assertThat(DoseComparison.compare(question(), readings.subList(0, 2), false, now)
                        .verdict())
                .isEqualTo(Verdict.NOT_YET);
        assertThat(DoseComparison.compare(question(), readings, false, now).verdict())
                .isEqualTo(Verdict.AS_FORETOLD);
        After first = readings.get(0);
        assertThat(DoseComparison.compare(question(), List.of(first, first, first), false, now)
                        .verdict())
                .as("three states of one reading")
                .isEqualTo(Verdict.NOT_YET);
        assertThat(compare(List.of(first)).verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }

    @Test
    void running_or_exchanged_water_and_a_dose_on_top_leave_it_open() {
        assertThat(DoseComparison.compare(question(), readings(5, 1, 22, 30), true, UNTIL)
                        .detail())
                .contains("Water ran");
        assertThat(compare(readings(5, 1, 22, 30.6)).detail()).contains("Salinity moved from 30.0 to 30.6");
        Dosed crowded = new Dosed(SODA, 2078e-6, 1983e-6, 30, 300e-6, 0.005, 10e-6, MIXED, MIXED);
        assertThat(DoseComparison.compare(crowded, readings(5, 1, 22, 30), false, UNTIL)
                        .detail())
                .contains("Another dose");
    }

    @ParameterizedTest
    @ValueSource(doubles = {1, 3})
    void a_dose_too_small_to_be_seen_is_not_judged(double micromoles) {
        Dosed small = new Dosed(
                SODA, BEFORE.totalAlkalinity(), BEFORE.dic(), 30, micromoles * 1e-6, 0.005, 10e-6, MIXED, UNTIL);

        DoseOutcome outcome = DoseComparison.compare(small, readings(5, 0, 22, 30), false, UNTIL);

        assertThat(outcome.verdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(outcome.detail()).contains("too small to be seen");
    }

    @Test
    void a_shortfall_says_what_to_check_before_more_is_given() {
        assertThat(compare(readings(5, 0.37, 22, 30)).detail())
                .startsWith("Less than foretold: 37 % of it (±")
                .contains("mixing, assay and hydration, and the volume");
        assertThat(compare(readings(5, 1.4, 22, 30)).detail())
                .startsWith("More than foretold: 140 %")
                .contains("Give no more");
    }

    private static DoseOutcome compare(List<After> states) {
        return DoseComparison.compare(question(), states, false, UNTIL);
    }

    private static Dosed question() {
        return new Dosed(
                SODA,
                BEFORE.totalAlkalinity(),
                BEFORE.dic(),
                30,
                300e-6,
                EFFECT.ofChange().phTotal().fromInputs(),
                10e-6,
                MIXED,
                UNTIL);
    }

    /** What the tank reads every five minutes when that share of the dose has arrived; the alkalinity is an old one. */
    private static List<After> readings(int count, double share, double temperatureC, double salinity) {
        List<After> states = new ArrayList<>();
        CarbonateState water = dosed(share, temperatureC, salinity);
        for (int i = 0; i < count; i++) {
            states.add(new After(
                    MIXED.plus(Duration.ofMinutes(5L * i)), water.phTotal(), water.conditions(), T0, 2078e-6));
        }
        return states;
    }

    private static CarbonateState dosed(double share, double temperatureC, double salinity) {
        return CarbonateSystem.solve(
                        Conditions.of(temperatureC, salinity),
                        new AlkalinityAndDic(BEFORE.totalAlkalinity() + share * 300e-6, BEFORE.dic() + share * 150e-6))
                .orElseThrow();
    }
}
