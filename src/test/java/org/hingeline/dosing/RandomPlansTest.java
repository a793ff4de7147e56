package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;

/** Seeded random questions: whatever is asked, a plan keeps its own bounds and adds up. */
class RandomPlansTest {
    @Test
    void no_plan_breaks_its_own_bounds_and_every_plan_adds_up() {
        Random random = new Random(20_220_412);
        Map<Outcome, Integer> seen = new EnumMap<>(Outcome.class);
        for (int i = 0; i < 20_000; i++) {
            DoseRequest request = anyRequest(random);
            DosePlan plan = DosePlanner.plan(request);
            seen.merge(plan.outcome(), 1, Integer::sum);
            if (plan.outcome() == Outcome.PLAN) {
                keepsItsBounds(request, plan);
                addsUp(request, plan);
            } else {
                assertThat(plan.reasons()).as("%s", request).isNotEmpty();
            }
        }
        assertThat(seen.get(Outcome.PLAN)).isGreaterThan(2000);
        assertThat(seen.get(Outcome.REFUSED)).isGreaterThan(1000);
        assertThat(seen.get(Outcome.NOT_NEEDED)).isGreaterThan(1000);
    }

    private static void keepsItsBounds(DoseRequest request, DosePlan plan) {
        Bounds bounds = request.bounds();
        String as = request.toString();
        double ph = plan.before().phTotal();
        int atMinutes = -60;
        for (DoseStep step : plan.steps()) {
            assertThat(step.phTotal()).as(as).isLessThanOrEqualTo(bounds.phTotalMax());
            assertThat(step.omegaAragonite()).as(as).isLessThanOrEqualTo(bounds.omegaAragoniteMax());
            assertThat(Math.abs(step.phTotal() - ph)).as(as).isLessThanOrEqualTo(bounds.phPerHourMax());
            assertThat(step.atMinutes() - atMinutes).as(as).isGreaterThanOrEqualTo(60);
            assertThat(step.massG()).as(as).isPositive();
            ph = step.phTotal();
            atMinutes = step.atMinutes();
        }
        for (CarbonateState state : List.of(plan.after(), plan.afterAeration())) {
            assertThat(state.phTotal()).as(as).isLessThanOrEqualTo(bounds.phTotalMax());
            assertThat(state.omegaAragonite()).as(as).isLessThanOrEqualTo(bounds.omegaAragoniteMax());
        }
    }

    private static void addsUp(DoseRequest request, DosePlan plan) {
        String as = request.toString();
        Amount mass = plan.massG();
        assertThat(plan.steps().stream().mapToDouble(DoseStep::massG).sum())
                .as(as)
                .isCloseTo(mass.value(), within(mass.value() * 1e-9));
        assertThat(mass.low()).as(as).isBetween(0.0, mass.value());
        assertThat(mass.high()).as(as).isGreaterThanOrEqualTo(mass.value()).isFinite();
        double kilograms = ((Receiver.Tank) request.receiver()).volumeL()
                / 1000
                * plan.before().densityKgM3();
        double added = request.product().agent().alkalinityPerMol()
                * mass.value()
                * request.product().assayPercent()
                / 100
                / request.product().form().gramsPerMol()
                / kilograms;
        assertThat(plan.after().totalAlkalinity() - plan.before().totalAlkalinity())
                .as(as)
                .isCloseTo(added, within(1e-12));
        // the rounding of the balance is all that parts the mass from the exact one
        DosedWater water = new DosedWater(plan.before(), request);
        double exact = water.massOf(
                0,
                DoseSearch.alkalinityFor(
                                water, request.target(), request.target().value())
                        .orElseThrow());
        double unit = Balance.forLoad(exact).grams(1);
        assertThat(mass.value()).as(as).isCloseTo(exact, within(unit * 1.000001));
    }

    private static DoseRequest anyRequest(Random random) {
        Conditions conditions = Conditions.of(between(random, 5, 32), between(random, 19, 42));
        CarbonateResult water = CarbonateSystem.solve(
                conditions, new PhAndAlkalinity(between(random, 7.2, 8.3), between(random, 1200e-6, 2800e-6)));
        Agent agent = Agent.all().get(random.nextInt(4));
        Bounds bounds = random.nextBoolean()
                ? Bounds.DEFAULTS
                : new Bounds(between(random, 7.8, 9), between(random, 1.5, 7), between(random, 0.02, 0.5));
        Target target = switch (random.nextInt(4)) {
            case 0 -> new Target.PhTotal(between(random, 7.4, bounds.phTotalMax()));
            case 1 -> new Target.TotalAlkalinity(between(random, 1400e-6, 3200e-6));
            default -> new Target.OmegaAragonite(between(random, 0.5, bounds.omegaAragoniteMax()));
        };
        return DoseRequest.of(
                        water,
                        InputUncertainty.DEFAULTS,
                        new Receiver.Tank(Math.pow(10, between(random, 0, 7))),
                        target)
                .product(new Product(
                        agent, agent.forms().get(random.nextInt(agent.forms().size())), between(random, 1, 100)))
                .bounds(bounds)
                .stock(random.nextBoolean() ? null : new Stock(between(random, 0.5, 80), null))
                .aerationPco2Atm(between(random, 300e-6, 900e-6))
                .larvae(random.nextInt(4) == 0)
                .build();
    }

    private static double between(Random random, double low, double high) {
        return low + (high - low) * random.nextDouble();
    }
}
