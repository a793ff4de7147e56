package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

class DosePlannerTest {
    private static final DoseRequest TO_THREE = Waters.towards(new Target.OmegaAragonite(3.0));

    @Test
    void mass_balance_closes_to_a_billionth() {
        DosePlan plan = DosePlanner.plan(Waters.withProduct(TO_THREE, "monohydrate", 98.5, 50.0));
        double kilograms = 4000 / 1000.0 * plan.before().densityKgM3();
        double mol = plan.massG().value() * 0.985 / 124.00;
        assertThat((plan.after().totalAlkalinity() - plan.before().totalAlkalinity()) * kilograms)
                .isCloseTo(2 * mol, within(2 * mol * 1e-9));
        assertThat((plan.after().dic() - plan.before().dic()) * kilograms).isCloseTo(mol, within(mol * 1e-9));
    }

    @Test
    void additions_are_hourly_keep_the_step_in_ph_and_sum_to_the_mass() {
        DosePlan plan = DosePlanner.plan(Waters.withProduct(TO_THREE, "anhydrous", 99.2, 50.0));
        assertThat(plan.steps()).hasSize(3);
        assertThat(plan.steps()).extracting(DoseStep::atMinutes).containsExactly(0, 60, 120);
        assertThat(plan.steps().stream().mapToDouble(DoseStep::massG).sum())
                .isCloseTo(plan.massG().value(), within(1e-9));
        assertThat(plan.steps())
                .allSatisfy(step -> assertThat(step.stockMl()).isCloseTo(step.massG() / 50 * 1000, within(1e-9)));
        double ph = plan.before().phTotal();
        for (DoseStep step : plan.steps()) {
            assertThat(step.phTotal() - ph).isPositive().isLessThanOrEqualTo(0.15);
            ph = step.phTotal();
        }
        assertThat(plan.steps().get(2).omegaAragonite()).isEqualTo(plan.after().omegaAragonite());
    }

    @Test
    void decahydrate_and_assay_raise_what_is_weighed() {
        double pure = DosePlanner.plan(TO_THREE).massG().value();
        double decahydrate = DosePlanner.plan(Waters.withProduct(TO_THREE, "decahydrate", 100, null))
                .massG()
                .value();
        double half = DosePlanner.plan(Waters.withProduct(TO_THREE, "anhydrous", 50, null))
                .massG()
                .value();
        assertThat(decahydrate / pure).isCloseTo(286.14 / 105.99, within(0.003));
        assertThat(half / pure).isCloseTo(2, within(0.003));
    }

    @Test
    void ph_and_alkalinity_can_be_targets_too() {
        DosePlan toPh = DosePlanner.plan(Waters.towards(new Target.PhTotal(8.0)));
        assertThat(toPh.after().phTotal()).isCloseTo(8.0, within(0.001));
        DosePlan toAlkalinity = DosePlanner.plan(Waters.towards(new Target.TotalAlkalinity(2278e-6)));
        assertThat(toAlkalinity.after().totalAlkalinity() * 1e6).isCloseTo(2278, within(0.5));
    }

    @Test
    void the_range_of_the_mass_holds_the_constants_and_that_of_the_gain_does_not() {
        DosePlan plan = DosePlanner.plan(TO_THREE);
        Amount mass = plan.massG();
        assertThat(mass.low()).isLessThan(mass.value());
        assertThat(mass.high()).isGreaterThan(mass.value());
        // 6.8 % of Ω 3.0 is 0.2, where a gram more or less moves Ω by 0.026
        assertThat(mass.high() - mass.value()).isBetween(4.0, 12.0);
        Amount gain = plan.omegaAragoniteGain();
        assertThat(gain.value()).isCloseTo(3.0 - 1.336, within(0.01));
        assertThat((gain.high() - gain.value()) / gain.value()).isLessThan(0.04);
    }

    @Test
    void sure_inputs_leave_the_constants_in_the_range_of_the_mass_only() {
        DoseRequest sure = TO_THREE.but()
                .uncertainty(new InputUncertainty(0, 0, 0, 0, 0, 0, 0))
                .build();
        DosePlan plan = DosePlanner.plan(sure);
        assertThat(plan.omegaAragoniteGain().high())
                .isEqualTo(plan.omegaAragoniteGain().value());
        assertThat(plan.massG().high()).isGreaterThan(plan.massG().value() * 1.03);
    }

    @Test
    void a_water_at_its_target_needs_nothing() {
        DosePlan plan = DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(1.3)));
        assertThat(plan.outcome()).isEqualTo(Outcome.NOT_NEEDED);
        assertThat(plan.massG()).isNull();
        assertThat(plan.steps()).isEmpty();
        assertThat(plan.reasons())
                .singleElement()
                .satisfies(r -> assertThat(r.detail()).contains("1.34"));
    }

    static Stream<Arguments> refusals() {
        CarbonateResult hot = CarbonateSystem.solve(Conditions.of(80, 30), new PhAndAlkalinity(8, 2e-3));
        CarbonateResult estuary = CarbonateSystem.solve(Conditions.of(15, 12), new PhAndAlkalinity(7.6, 1.2e-3));
        CarbonateResult strange = CarbonateSystem.solve(Conditions.of(15, 30), new PhAndAlkalinity(7.6, 50e-3));
        CarbonateResult mistaken = CarbonateSystem.solve(Conditions.of(15, 46), new PhAndAlkalinity(7.6, 2e-3));
        return Stream.of(
                refusal("water-unknown", r -> r.but().water(null).build()),
                refusal("water-unsolvable", r -> r.but().water(hot).build()),
                refusal("outside-fits", r -> r.but().water(estuary).build()),
                refusal("water-implausible", r -> r.but().water(strange).build()),
                refusal("volume-implausible", r -> Waters.withVolumeL(r, 0)),
                refusal("volume-implausible", r -> Waters.withVolumeL(r, -4000)),
                refusal("volume-implausible", r -> Waters.withVolumeL(r, 1.1e7)),
                refusal("volume-implausible", r -> Waters.withVolumeL(r, Double.NaN)),
                refusal("salinity-implausible", r -> r.but().water(mistaken).build()),
                refusal(
                        "stock-implausible",
                        r -> r.but().stock(new Stock(50, 60.0)).build()),
                refusal(
                        "corrosive-with-larvae",
                        r -> r.but()
                                .product(Product.pure(Agent.SODIUM_HYDROXIDE))
                                .larvae(true)
                                .build()),
                refusal(
                        "corrosive-with-larvae",
                        r -> r.but()
                                .product(Product.pure(Agent.CALCIUM_HYDROXIDE))
                                .larvae(true)
                                .build()),
                refusal(
                        "water-beyond-bounds",
                        r -> r.but().bounds(new Bounds(7.6, 4.5, 0.15)).build()),
                refusal("no-steps", r -> Waters.withVolumeL(r, 0.001)),
                refusal(
                        "no-steps",
                        r -> r.but().bounds(new Bounds(8.4, 4.5, 0.001)).build()),
                refusal("assay-implausible", r -> Waters.withProduct(r, "anhydrous", 0.5, null)),
                refusal("assay-implausible", r -> Waters.withProduct(r, "anhydrous", 100.1, null)),
                refusal("assay-implausible", r -> Waters.withProduct(r, "anhydrous", Double.NaN, null)),
                refusal("stock-implausible", r -> Waters.withProduct(r, "anhydrous", 100, 0.0)),
                refusal("stock-too-strong", r -> Waters.withProduct(r, "anhydrous", 100, 250.0)),
                refusal(
                        "aeration-implausible",
                        r -> r.but().aerationPco2Atm(420).build()),
                refusal(
                        "would-break-bounds",
                        r -> r.but().bounds(new Bounds(8.0, 4.5, 0.15)).build()));
    }

    private static Arguments refusal(String code, UnaryOperator<DoseRequest> change) {
        return Arguments.of(code, change);
    }

    @ParameterizedTest
    @MethodSource("refusals")
    void refuses_with_a_reason_and_what_would_lift_it(String code, UnaryOperator<DoseRequest> change) {
        DosePlan plan = DosePlanner.plan(change.apply(TO_THREE));
        assertThat(plan.outcome()).isEqualTo(Outcome.REFUSED);
        assertThat(plan.massG()).isNull();
        assertThat(plan.reasons()).extracting(Reason::code).contains(code);
        assertThat(plan.reasons()).allSatisfy(r -> assertThat(r.lift()).isNotBlank());
    }

    @ParameterizedTest
    @EnumSource(InputNote.Problem.class)
    void refuses_inputs_that_cannot_be_stood_on_and_says_what_to_do(InputNote.Problem problem) {
        InputNote note = new InputNote("pH", problem, "sensor ph-3, last read 5 h ago.");
        DosePlan plan =
                DosePlanner.plan(TO_THREE.but().inputNotes(List.of(note)).build());
        assertThat(plan.outcome()).isEqualTo(Outcome.REFUSED);
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("input-" + problem.word());
            assertThat(r.detail()).contains("sensor ph-3");
            assertThat(r.lift()).isEqualTo(problem.lift());
        });
    }

    @Test
    void refuses_a_target_above_the_bounds() {
        for (Target target :
                List.of(new Target.OmegaAragonite(4.6), new Target.PhTotal(8.41), new Target.TotalAlkalinity(2300))) {
            assertThat(DosePlanner.plan(Waters.towards(target)).reasons())
                    .extracting(Reason::code)
                    .containsExactly("target-above-bounds");
        }
        assertThat(DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(Double.NaN)))
                        .reasons())
                .extracting(Reason::code)
                .containsExactly("target-implausible");
    }

    @Test
    void refuses_to_dose_water_that_would_pass_the_bounds_once_its_co2_leaves() {
        CarbonateResult rich = CarbonateSystem.solve(Conditions.of(22, 33), new AlkalinityAndPco2(2600e-6, 4000e-6));
        DosePlan plan = DosePlanner.plan(TO_THREE.but().water(rich).build());
        assertThat(plan.outcome()).isEqualTo(Outcome.REFUSED);
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("aeration-would-break-bounds");
            assertThat(r.lift()).contains("Aerate first");
        });
        assertThat(plan.remedies()).extracting(Remedy::code).containsExactly("aerate");
    }

    @Test
    void all_reasons_are_given_at_once() {
        DoseRequest bad = Waters.withVolumeL(Waters.withProduct(TO_THREE, "anhydrous", 0, -1.0), -1);
        assertThat(DosePlanner.plan(bad).reasons())
                .extracting(Reason::code)
                .containsExactly("volume-implausible", "assay-implausible", "stock-implausible");
    }

    @Test
    void a_stock_near_saturation_says_how_strong_it_may_be() {
        CarbonateResult cold = CarbonateSystem.solve(Conditions.of(10, 30), new PhAndAlkalinity(7.7, 2078e-6));
        DoseRequest request = Waters.withProduct(TO_THREE, "anhydrous", 100, 100.0)
                .but()
                .water(cold)
                .build();
        // 12.2 g in 112.2 g of solution at 10 °C, four fifths of it
        assertThat(DosePlanner.plan(request).reasons())
                .singleElement()
                .satisfies(r -> assertThat(r.lift())
                        .startsWith("Make the stock no stronger than 86 g/L: ")
                        .contains(" L or more for "));
        DoseRequest crystals = Waters.withProduct(TO_THREE, "decahydrate", 100, 100.0)
                .but()
                .water(cold)
                .build();
        assertThat(DosePlanner.plan(crystals).outcome()).isEqualTo(Outcome.PLAN);
    }

    @Test
    void a_plan_carries_every_caution() {
        DosePlan plan = DosePlanner.plan(TO_THREE);
        assertThat(plan.cautions())
                .extracting(Caution::code)
                .contains(
                        "suggestion",
                        "hazard-H319",
                        "protection",
                        "safety-data-sheet",
                        "product",
                        "dissolve-first",
                        "add-slowly",
                        "plume",
                        "measure-between",
                        "ammonia",
                        "discharge",
                        "no-larval-limit",
                        "no-stock-given");
        assertThat(plan.cautions())
                .filteredOn(c -> c.code().equals("ammonia"))
                .singleElement()
                .satisfies(c -> assertThat(c.detail()).contains("from 2.4 % to 5.0 %"));
    }

    @Test
    void a_plan_close_to_a_bound_says_so() {
        DosePlan plan = DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(4.4)));
        assertThat(plan.cautions()).extracting(Caution::code).contains("bound-within-uncertainty");
        assertThat(DosePlanner.plan(TO_THREE).cautions())
                .extracting(Caution::code)
                .doesNotContain("bound-within-uncertainty");
    }

    @Test
    void bounds_beyond_reason_are_no_bounds() {
        assertThatThrownBy(() -> new Bounds(9.1, 4.5, 0.15))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("phTotalMax 9.1");
        assertThatThrownBy(() -> new Bounds(8.4, 7.5, 0.15)).hasMessageContaining("omegaAragoniteMax 7.5");
        assertThatThrownBy(() -> new Bounds(8.4, 4.5, Double.NaN)).hasMessageContaining("phPerHourMax NaN");
    }

    @Test
    void solubility_goes_straight_between_its_rows_and_stays_at_its_ends() {
        SolubilityTable table = Agent.SODIUM_CARBONATE.solubility();
        assertThat(table.gramsPer100GWater(-1)).isEqualTo(7);
        assertThat(table.gramsPer100GWater(0)).isEqualTo(7);
        assertThat(table.gramsPer100GWater(15)).isCloseTo(17.0, within(1e-12));
        assertThat(table.gramsPer100GWater(25)).isEqualTo(29.4);
        assertThat(table.gramsPer100GWater(35)).isEqualTo(39.7);
    }

    @Test
    void after_aeration_is_the_dosed_water_in_balance_with_the_air() {
        DosePlan plan = DosePlanner.plan(TO_THREE);
        CarbonateState aerated = plan.afterAeration();
        assertThat(aerated.pco2Atm() * 1e6).isCloseTo(420, within(1e-6));
        assertThat(aerated.totalAlkalinity()).isCloseTo(plan.after().totalAlkalinity(), within(1e-12));
    }
}
