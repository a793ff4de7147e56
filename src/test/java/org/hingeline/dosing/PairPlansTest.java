package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.junit.jupiter.api.Test;

/** Two agents that reach Ω while they hold pH or pCO2. */
class PairPlansTest {
    private static final Target OMEGA = new Target.OmegaAragonite(2.5);

    private static DoseRequest with(Hold hold) {
        return Waters.towards(OMEGA)
                .but()
                .receiver(new Receiver.Tank(250_000))
                .stock(new Stock(50, null))
                .companion(new Companion(Product.pure(Agent.SODIUM_BICARBONATE), new Stock(40, null), hold))
                .build();
    }

    private static DosePlan planned(DoseRequest request) {
        DosePlan plan = DosePlanner.plan(request);
        assertThat(plan.outcome()).as("%s", plan.reasons()).isEqualTo(Outcome.PLAN);
        return plan;
    }

    @Test
    void carbonate_and_bicarbonate_reach_omega_under_a_ceiling_of_ph() {
        DosePlan plan = planned(with(new Hold.PhAtMost(7.9)));
        assertThat(plan.after().omegaAragonite()).isCloseTo(2.5, within(0.002));
        assertThat(plan.after().phTotal()).isLessThanOrEqualTo(7.9).isCloseTo(7.9, within(0.001));
        assertThat(plan.products())
                .hasSize(2)
                .allSatisfy(p -> assertThat(p.massG().value()).isPositive());
        assertThat(plan.cautions()).extracting(Caution::code).contains("two-products");
    }

    @Test
    void carbonate_and_bicarbonate_reach_omega_at_a_given_pco2() {
        DosePlan plan = planned(with(new Hold.Pco2(700e-6)));
        assertThat(plan.after().omegaAragonite()).isCloseTo(2.5, within(0.002));
        assertThat(plan.after().pco2Atm() * 1e6).isCloseTo(700, within(0.7));
    }

    @Test
    void mass_balance_of_both_closes_to_a_billionth() {
        DosePlan plan = planned(with(new Hold.PhAtMost(7.9)));
        double kg = 250 * plan.before().densityKgM3();
        double carbonate = plan.products().get(0).massG().value() / 105.99 / kg;
        double bicarbonate = plan.products().get(1).massG().value() / 84.01 / kg;
        CarbonateState expected = CarbonateSystem.solve(
                        Conditions.of(22, 30),
                        new AlkalinityAndDic(
                                plan.before().totalAlkalinity() + 2 * carbonate + bicarbonate,
                                plan.before().dic() + carbonate + bicarbonate))
                .orElseThrow();
        assertThat(plan.after().totalAlkalinity()).isCloseTo(expected.totalAlkalinity(), within(1e-12));
        assertThat(plan.after().omegaAragonite()).isCloseTo(expected.omegaAragonite(), within(1e-9));
        assertThat(plan.after().phTotal()).isCloseTo(expected.phTotal(), within(1e-9));
    }

    @Test
    void the_solution_is_exact_before_the_balance_rounds_it() {
        PairSolver solver = new PairSolver(Waters.worked(), Agent.SODIUM_CARBONATE, Agent.SODIUM_BICARBONATE);
        CarbonateState before = Waters.worked();
        for (Hold hold : new Hold[] {new Hold.PhAtMost(7.9), new Hold.Pco2(700e-6)}) {
            Mix mix = solver.solve(2.5, hold).orElseThrow();
            CarbonateState there = CarbonateSystem.solve(
                            Conditions.of(22, 30),
                            new AlkalinityAndDic(
                                    before.totalAlkalinity() + 2 * mix.first() + mix.second(),
                                    before.dic() + mix.first() + mix.second()))
                    .orElseThrow();
            assertThat(there.omegaAragonite()).isCloseTo(2.5, within(1e-9));
            if (hold instanceof Hold.PhAtMost) {
                assertThat(there.phTotal()).isCloseTo(7.9, within(1e-9));
            } else {
                assertThat(there.pco2Atm()).isCloseTo(700e-6, within(1e-14));
            }
        }
    }

    @Test
    void calcium_of_lime_enters_the_solution() {
        PairSolver solver = new PairSolver(Waters.worked(), Agent.CALCIUM_HYDROXIDE, Agent.SODIUM_BICARBONATE);
        CarbonateState before = Waters.worked();
        Mix mix = solver.solve(2.5, new Hold.PhAtMost(7.95)).orElseThrow();
        CarbonateState there = CarbonateSystem.solve(
                        Conditions.of(22, 30).withCalcium(before.calcium() + mix.first()),
                        new AlkalinityAndDic(
                                before.totalAlkalinity() + 2 * mix.first() + mix.second(), before.dic() + mix.second()))
                .orElseThrow();
        assertThat(there.omegaAragonite()).isCloseTo(2.5, within(1e-9));
        assertThat(there.phTotal()).isCloseTo(7.95, within(1e-9));
    }

    @Test
    void under_a_ceiling_that_carbonate_alone_keeps_nothing_else_is_added() {
        DosePlan plan = planned(with(new Hold.PhAtMost(8.3)));
        assertThat(plan.products())
                .singleElement()
                .satisfies(p -> assertThat(p.product().agent()).isEqualTo(Agent.SODIUM_CARBONATE));
    }

    @Test
    void a_ph_below_the_present_that_would_take_carbonate_out_is_refused_with_that_reason() {
        DosePlan plan = DosePlanner.plan(with(new Hold.PhAtMost(7.2)));
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("two-agents-cannot");
            assertThat(r.detail()).contains("µmol/kg of sodium carbonate taken out of the water");
            assertThat(r.lift()).contains("at least the present 7.71");
        });
    }

    @Test
    void a_pco2_below_what_carbonate_alone_leaves_is_refused_with_the_range_that_would_do() {
        DosePlan plan = DosePlanner.plan(with(new Hold.Pco2(300e-6)));
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("two-agents-cannot");
            assertThat(r.detail()).contains("µmol/kg of sodium bicarbonate taken out of the water");
            assertThat(r.lift()).startsWith("Hold a pCO2 between ");
        });
        double alone = DosePlanner.plan(Waters.towards(OMEGA)).after().pco2Atm() * 1e6;
        assertThat(plan.reasons().get(0).lift()).contains("between " + Math.round(alone) + " and ");
    }

    @Test
    void every_step_adds_of_both_in_the_same_proportion_and_keeps_the_ceiling() {
        DosePlan plan = planned(with(new Hold.PhAtMost(7.9))
                .but()
                .bounds(new Bounds(8.4, 4.5, 0.05))
                .build());
        double ratio = plan.products().get(1).massG().value()
                / plan.products().get(0).massG().value();
        double first = 0;
        double second = 0;
        assertThat(plan.steps()).hasSizeGreaterThan(2);
        for (DoseStep step : plan.steps()) {
            assertThat(step.phTotal()).isLessThanOrEqualTo(7.9);
            first += step.additions().get(0).massG();
            second += step.additions().get(1).massG();
            assertThat(second / first).isCloseTo(ratio, within(ratio * 0.01));
        }
        assertThat(first).isCloseTo(plan.products().get(0).massG().value(), within(1e-6));
        assertThat(second).isCloseTo(plan.products().get(1).massG().value(), within(1e-6));
    }

    @Test
    void two_agents_need_a_target_of_omega_a_plausible_hold_and_to_differ() {
        DoseRequest request = with(new Hold.PhAtMost(7.9));
        assertThat(DosePlanner.plan(
                                request.but().target(new Target.PhTotal(7.9)).build())
                        .reasons())
                .extracting(Reason::code)
                .containsExactly("hold-needs-omega");
        assertThat(DosePlanner.plan(with(new Hold.Pco2(Double.NaN))).reasons())
                .extracting(Reason::code)
                .containsExactly("hold-implausible");
        assertThat(DosePlanner.plan(request.but()
                                .companion(new Companion(
                                        Product.pure(Agent.SODIUM_CARBONATE), null, new Hold.PhAtMost(7.9)))
                                .build())
                        .reasons())
                .extracting(Reason::code)
                .containsExactly("agents-alike");
    }

    @Test
    void the_second_stock_must_dissolve_too() {
        DosePlan plan = DosePlanner.plan(with(new Hold.PhAtMost(7.9))
                .but()
                .companion(new Companion(
                        Product.pure(Agent.SODIUM_BICARBONATE), new Stock(90, 10.0), new Hold.PhAtMost(7.9)))
                .build());
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("stock-too-strong");
            assertThat(r.detail()).contains("sodium bicarbonate");
        });
    }
}
