package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.ConstantUncertainty;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.Treatment;
import org.hingeline.seawater.Uncertainty;
import org.junit.jupiter.api.Test;

/** What helps without a chemical: 22 °C, salinity 30, Ω 1.34 here; other waters around it. */
class RemediesTest {
    private static final Target TWO = new Target.OmegaAragonite(2.0);
    private static final OtherWater GOOD_STORE = other("storage", WaterKind.STORE, 20, 31, 8.1, 2200);
    private static final OtherWater BAD_STORE = other("old-storage", WaterKind.STORE, 20, 31, 7.5, 2050);
    private static final OtherWater BAD_INTAKE = other("intake", WaterKind.INTAKE, 12, 29, 7.6, 2000);
    private static final OtherWater GOOD_INTAKE = other("intake", WaterKind.INTAKE, 14, 31, 8.1, 2150);
    private static final OtherWater TANK = other("larval-1", WaterKind.TANK, 26, 30, 8.2, 2300);

    private static OtherWater other(
            String code, WaterKind kind, double temperatureC, double salinity, double ph, double taUmolKg) {
        CarbonateState state = CarbonateSystem.solve(
                        Conditions.of(temperatureC, salinity), new PhAndAlkalinity(ph, taUmolKg * 1e-6))
                .orElseThrow();
        return new OtherWater(code, "the " + code, kind, state, InputUncertainty.DEFAULTS);
    }

    private static List<Remedy> remedies(Target target, WaterKind kind, String feedsFrom, OtherWater... others) {
        return DosePlanner.plan(Waters.towards(target)
                        .but()
                        .surroundings(new Surroundings(kind, feedsFrom, List.of(others)))
                        .build())
                .remedies();
    }

    private static Remedy remedy(List<Remedy> remedies, String code) {
        return remedies.stream().filter(r -> r.code().equals(code)).findFirst().orElseThrow();
    }

    @Test
    void those_that_reach_the_target_come_first_and_the_least_invasive_of_them_at_the_very_first() {
        assertThat(remedies(TWO, WaterKind.TANK, "intake", BAD_INTAKE, GOOD_STORE))
                .extracting(Remedy::code)
                .containsExactly("hold", "blend", "aerate");
        assertThat(remedies(TWO, WaterKind.TANK, "intake", BAD_INTAKE, BAD_STORE))
                .extracting(Remedy::code)
                .as("aeration reaches it, holding keeps what is there, blending does not work")
                .containsExactly("aerate", "hold", "blend");
    }

    @Test
    void a_tank_fed_with_worse_water_holds_it_and_draws_from_a_better_store() {
        Remedy hold = remedy(remedies(TWO, WaterKind.TANK, "intake", BAD_INTAKE, GOOD_STORE), "hold");
        assertThat(hold.fromPoint()).isEqualTo("storage");
        assertThat(hold.reaches()).isEqualTo(GOOD_STORE.state());
        assertThat(hold.reachesTarget()).isTrue();
        assertThat(hold.detail()).contains("draw from the storage instead");
    }

    @Test
    void without_a_better_store_the_tank_keeps_its_own_water() {
        Remedy hold = remedy(remedies(TWO, WaterKind.TANK, "intake", BAD_INTAKE, BAD_STORE), "hold");
        assertThat(hold.fromPoint()).isNull();
        assertThat(hold.reaches().omegaAragonite()).isCloseTo(1.336, within(0.001));
        assertThat(hold.reachesTarget()).isFalse();
        assertThat(hold.whyNot()).contains("falls short");
        assertThat(hold.detail()).contains("recirculate");
    }

    @Test
    void holding_what_is_no_worse_does_not_help_and_says_so() {
        Remedy hold = remedy(remedies(TWO, WaterKind.TANK, "intake", GOOD_INTAKE), "hold");
        assertThat(hold.reaches()).isNull();
        assertThat(hold.whyNot()).contains("no worse than the water here");
    }

    @Test
    void an_intake_is_held_when_a_store_is_better() {
        List<Remedy> here = remedies(TWO, WaterKind.INTAKE, null, GOOD_STORE, TANK);
        assertThat(remedy(here, "hold").fromPoint()).isEqualTo("storage");
        assertThat(remedy(remedies(TWO, WaterKind.INTAKE, null, BAD_STORE, TANK), "hold")
                        .whyNot())
                .contains("no worse than the old-storage");
    }

    @Test
    void the_blend_is_the_least_share_that_reaches_the_target() {
        Remedy blend = remedy(remedies(TWO, WaterKind.TANK, "intake", BAD_INTAKE, GOOD_STORE, BAD_STORE), "blend");
        CarbonateState here = Waters.measured().orElseThrow();
        assertThat(blend.fromPoint()).isEqualTo("storage");
        assertThat(blend.reaches().omegaAragonite()).isCloseTo(2.0, within(1e-6));
        assertThat(Treatment.blended(here, GOOD_STORE.state(), blend.massShare() - 0.001)
                        .orElseThrow()
                        .omegaAragonite())
                .isLessThan(2.0);
        assertThat(blend.reaches().totalAlkalinity())
                .isCloseTo(
                        here.totalAlkalinity() * (1 - blend.massShare())
                                + GOOD_STORE.state().totalAlkalinity() * blend.massShare(),
                        within(1e-12));
        assertThat(blend.uncertainty().omegaAragonite().total())
                .isEqualTo(Uncertainty.ofMeasured(here, Waters.UNCERTAINTY, ConstantUncertainty.ORR_2018)
                        .blendedWith(
                                Uncertainty.ofMeasured(
                                        GOOD_STORE.state(), InputUncertainty.DEFAULTS, ConstantUncertainty.ORR_2018),
                                blend.massShare(),
                                blend.reaches())
                        .ofState()
                        .omegaAragonite()
                        .total());
        assertThat(blend.detail()).containsPattern("% of the water from the storage \\(\\d+ L\\)");
    }

    @Test
    void water_of_another_tank_is_never_drawn_on() {
        List<Remedy> remedies = remedies(TWO, WaterKind.TANK, "intake", BAD_INTAKE, TANK);
        assertThat(remedies).extracting(Remedy::fromPoint).containsOnlyNulls();
        assertThat(remedy(remedies, "blend").whyNot()).contains("the intake");
    }

    @Test
    void nothing_known_around_is_said() {
        List<Remedy> remedies = remedies(TWO, WaterKind.TANK, null);
        assertThat(remedy(remedies, "hold").whyNot()).contains("not known at present");
        assertThat(remedy(remedies, "blend").whyNot()).contains("known at present");
    }

    @Test
    void water_on_its_way_to_a_warmer_tank_gets_better_by_the_warmth_alone() {
        Remedy warm = remedy(remedies(TWO, WaterKind.INTAKE, null, TANK), "warm");
        CarbonateState warmed =
                Treatment.atTemperature(Waters.measured().orElseThrow(), 26).orElseThrow();
        assertThat(warm.reaches().omegaAragonite())
                .isEqualTo(warmed.omegaAragonite())
                .isGreaterThan(1.34);
        assertThat(warm.detail()).contains("26.0 °C of the larval-1");
        assertThat(warm.uncertainty().omegaAragonite().total()).isPositive();
        assertThat(remedy(remedies(TWO, WaterKind.INTAKE, null, other("cold", WaterKind.TANK, 18, 30, 8, 2100)), "warm")
                        .whyNot())
                .contains("would not be warmer");
        assertThat(remedies(TWO, WaterKind.TANK, null, TANK))
                .extracting(Remedy::code)
                .doesNotContain("warm");
    }

    @Test
    void water_below_the_air_in_co2_is_not_to_be_aerated() {
        Remedy aerate = DosePlanner.plan(
                        Waters.towards(TWO).but().aerationPco2Atm(950e-6).build())
                .remedies()
                .get(0);
        assertThat(aerate.reaches()).isNull();
        assertThat(aerate.whyNot()).contains("would bring CO2 in");
    }

    @Test
    void no_remedy_stands_on_inputs_that_cannot_be_stood_on() {
        InputNote stale = new InputNote("pH", InputNote.Problem.STALE, "read 5 h ago.");
        assertThat(DosePlanner.plan(Waters.towards(TWO)
                                .but()
                                .inputNotes(List.of(stale))
                                .surroundings(new Surroundings(WaterKind.TANK, null, List.of(GOOD_STORE)))
                                .build())
                        .remedies())
                .isEmpty();
    }
}
