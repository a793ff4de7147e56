package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.junit.jupiter.api.Test;

/** Water that flows: past an injection, and through a tank. */
class ReceiversTest {
    private static final DoseRequest STILL = Waters.towards(new Target.OmegaAragonite(2.5))
            .but()
            .stock(new Stock(50, null))
            .build();

    private static DosePlan planFor(Receiver receiver) {
        DosePlan plan = DosePlanner.plan(STILL.but().receiver(receiver).build());
        assertThat(plan.outcome()).as("%s", plan.reasons()).isEqualTo(Outcome.PLAN);
        return plan;
    }

    @Test
    void a_flow_gets_a_steady_injection_whose_alkalinity_is_that_of_the_water_it_leads_to() {
        DosePlan plan = planFor(new Receiver.Flow(60));
        PlannedProduct product = plan.products().get(0);
        assertThat(plan.massG()).isNull();
        double gramsPerHour = product.gramsPerHour().value();
        double kgPerHour = 60 * 60 / 1000.0 * plan.before().densityKgM3();
        double mol = gramsPerHour / 105.99 / kgPerHour;
        CarbonateState expected = CarbonateSystem.solve(
                        Conditions.of(22, 30),
                        new AlkalinityAndDic(
                                plan.before().totalAlkalinity() + 2 * mol,
                                plan.before().dic() + mol))
                .orElseThrow();
        assertThat(plan.after().omegaAragonite()).isCloseTo(expected.omegaAragonite(), within(1e-9));
        assertThat(plan.after().phTotal()).isCloseTo(expected.phTotal(), within(1e-9));
        assertThat(product.stockMlPerMinute()).isCloseTo(gramsPerHour / 50 * 1000 / 60, within(1e-9));
        assertThat(product.stock().litres()).isCloseTo(gramsPerHour * 24 / 50, within(1e-9));
        assertThat(plan.after().omegaAragonite()).isCloseTo(2.5, within(0.003));
    }

    @Test
    void the_injection_is_brought_up_by_the_hour_so_that_ph_keeps_its_step() {
        DosePlan plan = planFor(new Receiver.Flow(60));
        double ph = plan.before().phTotal();
        double gramsPerHour = 0;
        for (DoseStep step : plan.steps()) {
            assertThat(step.phTotal() - ph).isPositive().isLessThanOrEqualTo(0.15);
            assertThat(step.additions().get(0).massG()).isNull();
            assertThat(step.additions().get(0).gramsPerHour()).isGreaterThan(gramsPerHour);
            ph = step.phTotal();
            gramsPerHour = step.additions().get(0).gramsPerHour();
        }
        assertThat(plan.steps()).hasSizeGreaterThan(1);
        assertThat(gramsPerHour).isEqualTo(plan.products().get(0).gramsPerHour().value());
    }

    /** The tank's balance stepped through in time, apart from the planner: d(V c)/dt = injection − Q c. */
    @Test
    void first_charge_and_make_up_hold_a_flow_through_tank_where_the_plan_says() {
        Receiver.FlowThrough receiver = new Receiver.FlowThrough(4000, 40);
        DosePlan plan = planFor(receiver);
        double inTankG = 0;
        for (DoseStep step : plan.steps()) {
            Addition addition = step.additions().get(0);
            inTankG += addition.massG();
            double settledG = inTankG;
            for (int second = 0; second < 3600; second++) {
                inTankG += addition.gramsPerHour() / 3600 - inTankG * 40 / 4000 / 60;
            }
            assertThat(inTankG).isCloseTo(settledG, within(settledG * 1e-9));
        }
        assertThat(inTankG).isCloseTo(plan.massG().value(), within(1e-6));
        assertThat(plan.products().get(0).gramsPerHour().value())
                .isCloseTo(plan.massG().value() * 40 * 60 / 4000, within(1e-9));
        // without make-up it is washed out
        double leftG = inTankG;
        int steps = 1_000_000;
        for (int i = 0; i < steps; i++) {
            leftG -= leftG * 40 / 4000 * 90 / steps;
        }
        assertThat(leftG / inTankG).isCloseTo(receiver.leftAfter(90), within(1e-6));
        assertThat(receiver.leftAfter(receiver.halfLifeMinutes())).isCloseTo(0.5, within(1e-12));
    }

    @Test
    void the_first_charge_of_a_flow_through_tank_is_the_dose_of_a_still_one() {
        assertThat(planFor(new Receiver.FlowThrough(4000, 40)).massG())
                .isEqualTo(DosePlanner.plan(STILL).massG());
    }

    @Test
    void water_that_flows_comes_with_a_word_on_the_interlock_and_on_washout() {
        assertThat(planFor(new Receiver.Flow(60)).cautions())
                .extracting(Caution::code)
                .contains("flow-interlock")
                .doesNotContain("washout");
        assertThat(planFor(new Receiver.FlowThrough(4000, 40)).cautions())
                .filteredOn(c -> c.code().equals("washout"))
                .singleElement()
                .satisfies(c -> assertThat(c.detail()).contains("after 69 min", "55 % of it is left after an hour"));
        assertThat(DosePlanner.plan(STILL).cautions())
                .extracting(Caution::code)
                .doesNotContain("flow-interlock", "washout");
    }

    @Test
    void flows_that_cannot_be_are_refused() {
        for (Receiver receiver : List.of(
                new Receiver.Flow(0),
                new Receiver.Flow(-1),
                new Receiver.Flow(Double.NaN),
                new Receiver.Flow(1.1e6),
                new Receiver.FlowThrough(4000, 0),
                new Receiver.FlowThrough(10, 40))) {
            assertThat(DosePlanner.plan(STILL.but().receiver(receiver).build()).reasons())
                    .as("%s", receiver)
                    .extracting(Reason::code)
                    .containsExactly("flow-implausible");
        }
        assertThat(DosePlanner.plan(STILL.but()
                                .receiver(new Receiver.FlowThrough(-4000, 40))
                                .build())
                        .reasons())
                .extracting(Reason::code)
                .contains("volume-implausible");
    }

    @Test
    void water_that_flows_on_may_not_pass_what_discharge_permits_hold() {
        DoseRequest far = STILL.but()
                .product(Product.pure(Agent.SODIUM_HYDROXIDE))
                .target(new Target.PhTotal(8.95))
                .bounds(new Bounds(9, 7, 0.5))
                .water(CarbonateSystem.solve(Conditions.of(22, 30), new AlkalinityAndDic(600e-6, 560e-6)))
                .aerationPco2Atm(900e-6)
                .build();
        assertThat(DosePlanner.plan(far).outcome()).isEqualTo(Outcome.PLAN);
        assertThat(DosePlanner.plan(far.but().receiver(new Receiver.Flow(60)).build())
                        .reasons())
                .singleElement()
                .satisfies(r -> {
                    assertThat(r.code()).isEqualTo("discharge-ph");
                    assertThat(r.detail()).contains("pH 9.08 on the NBS scale");
                });
    }

    @Test
    void the_plume_says_how_much_water_the_stock_needs_around_it() {
        DosePlan plan = DosePlanner.plan(STILL);
        DosedWater water = new DosedWater(plan.before(), STILL);
        double litres = Plume.of(water, new Stock(50, null))
                .litresPerLitreTo(Plume.OMEGA_ARAGONITE_FORMS)
                .orElseThrow();
        // 50 g of soda ash in so many litres of this water, counted anew
        double mol = 50 / 105.99 / (litres * plan.before().densityKgM3() / 1000);
        CarbonateState edge = CarbonateSystem.solve(
                        Conditions.of(22, 30),
                        new AlkalinityAndDic(
                                plan.before().totalAlkalinity() + 2 * mol,
                                plan.before().dic() + mol))
                .orElseThrow();
        assertThat(edge.omegaAragonite()).isCloseTo(7, within(1e-6));
        assertThat(plan.cautions())
                .filteredOn(c -> c.code().equals("plume"))
                .singleElement()
                .satisfies(c -> assertThat(c.detail())
                        .contains("needs " + (int) Math.ceil(litres) + " L of this water")
                        .contains("to 12.3"));
    }
}
