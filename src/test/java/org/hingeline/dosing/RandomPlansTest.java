package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
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
        Map<String, Integer> codes = new TreeMap<>();
        Map<Outcome, Integer> seen = new EnumMap<>(Outcome.class);
        for (int i = 0; i < 20_000; i++) {
            DoseRequest request = anyRequest(random);
            DosePlan plan = DosePlanner.plan(request);
            seen.merge(plan.outcome(), 1, Integer::sum);
            if (plan.outcome() == Outcome.PLAN) {
                keepsItsBounds(request, plan);
                addsUp(request, plan);
            } else if (plan.outcome() == Outcome.NOT_NEEDED) {
                assertThat(request.target().of(plan.before()))
                        .as("%s", request)
                        .isGreaterThanOrEqualTo(request.target().value());
            } else {
                assertThat(plan.reasons()).as("%s", request).isNotEmpty();
                for (Reason reason : plan.reasons()) {
                    codes.merge(reason.code(), 1, Integer::sum);
                    assertThat(RefusalTruth.holds(reason, request, plan.before()))
                            .as("%s is true of %s", reason, request)
                            .isTrue();
                }
            }
            if (plan.outcome() != Outcome.NOT_NEEDED && plan.before() != null) {
                assertThat(request.target().of(plan.before()))
                        .as("%s", request)
                        .satisfiesAnyOf(
                                value -> assertThat(value)
                                        .isLessThan(request.target().value()),
                                value -> assertThat(plan.reasons()).isNotEmpty());
            }
        }
        assertThat(codes.keySet())
                .contains(
                        "corrosive-with-larvae",
                        "stock-too-strong",
                        "agent-cannot-reach",
                        "would-break-bounds",
                        "aeration-would-break-bounds",
                        "water-beyond-bounds",
                        "no-steps",
                        "two-agents-cannot",
                        "out-of-reach");
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
            assertThat(step.additions())
                    .as(as)
                    .anyMatch(a ->
                            a.massG() != null && a.massG() > 0 || a.gramsPerHour() != null && a.gramsPerHour() > 0);
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
        double kilograms =
                request.receiver().litresDosed() / 1000 * plan.before().densityKgM3();
        double alkalinity = plan.before().totalAlkalinity();
        double dic = plan.before().dic();
        double[] massesG = new double[plan.products().size()];
        for (int i = 0; i < massesG.length; i++) {
            PlannedProduct planned = plan.products().get(i);
            Amount amount = planned.massG() == null ? planned.gramsPerHour() : planned.massG();
            massesG[i] = amount.value();
            assertThat(amount.low()).as(as).isBetween(0.0, amount.value());
            assertThat(amount.high())
                    .as(as)
                    .isGreaterThanOrEqualTo(amount.value())
                    .isFinite();
            sumsExactly(as, plan, i, planned);
            Product product = planned.product();
            double mol = amount.value()
                    * product.assayPercent()
                    / 100
                    / product.form().gramsPerMol()
                    / kilograms;
            alkalinity += mol * product.agent().alkalinityPerMol();
            dic += mol * product.agent().dicPerMol();
        }
        assertThat(plan.after().totalAlkalinity()).as(as).isCloseTo(alkalinity, within(1e-12));
        assertThat(plan.after().dic()).as(as).isCloseTo(dic, within(1e-12));
        DoseStep last = plan.steps().get(plan.steps().size() - 1);
        assertThat(last.phTotal()).as(as).isEqualTo(plan.after().phTotal());
        Companion companion = request.companion();
        if (companion != null && companion.hold() instanceof Hold.PhAtMost ph) {
            assertThat(plan.after().phTotal()).as(as).isLessThanOrEqualTo(ph.phTotalMax());
        }
        if (massesG.length == 1) {
            // the rounding of the balance is all that parts the mass from the exact one
            DosedWater water = new DosedWater(plan.before(), request);
            double exact = water.massOf(
                    0,
                    DoseSearch.alkalinityFor(
                                    water, request.target(), request.target().value())
                            .orElseThrow());
            double unit = Balance.forLoad(exact).grams(1);
            assertThat(massesG[0]).as(as).isCloseTo(exact, within(unit * 1.000001));
        }
    }

    /** Counted in hundredths of a gram, the finest that a balance shows here, the steps sum to the mass exactly. */
    private static void sumsExactly(String as, DosePlan plan, int product, PlannedProduct planned) {
        if (planned.massG() != null) {
            long sum = plan.steps().stream()
                    .mapToLong(step -> Math.round(step.additions().get(product).massG() * 100))
                    .sum();
            assertThat(sum).as(as).isEqualTo(Math.round(planned.massG().value() * 100));
        }
        if (planned.gramsPerHour() != null) {
            Addition last =
                    plan.steps().get(plan.steps().size() - 1).additions().get(product);
            assertThat(last.gramsPerHour())
                    .as(as)
                    .isCloseTo(
                            planned.gramsPerHour().value(),
                            within(planned.gramsPerHour().value() * 1e-12));
        }
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
        double litres = Math.pow(10, between(random, 0, 7));
        Receiver receiver = switch (random.nextInt(4)) {
            case 0 -> new Receiver.Flow(litres / 10);
            case 1 -> new Receiver.FlowThrough(litres, litres * between(random, 0.0001, 0.1));
            default -> new Receiver.Tank(litres);
        };
        Companion companion = null;
        if (random.nextInt(4) == 0) {
            Agent second = random.nextInt(3) == 0 ? Agent.SODIUM_HYDROXIDE : Agent.SODIUM_BICARBONATE;
            agent = second.equals(Agent.SODIUM_HYDROXIDE) || random.nextInt(3) > 0
                    ? Agent.SODIUM_CARBONATE
                    : Agent.SODIUM_HYDROXIDE;
            target = new Target.OmegaAragonite(between(random, 0.5, bounds.omegaAragoniteMax()));
            companion = new Companion(
                    Product.pure(second),
                    null,
                    random.nextBoolean()
                            ? new Hold.PhAtMost(between(random, 7.3, 8.6))
                            : new Hold.Pco2(between(random, 200e-6, 2000e-6)));
        }
        return DoseRequest.of(water, InputUncertainty.DEFAULTS, receiver, target)
                .product(new Product(
                        agent, agent.forms().get(random.nextInt(agent.forms().size())), between(random, 1, 100)))
                .bounds(bounds)
                .stock(random.nextBoolean() ? null : new Stock(between(random, 0.5, 80), null))
                .aerationPco2Atm(between(random, 300e-6, 900e-6))
                .companion(companion)
                .larvae(random.nextInt(4) == 0)
                .build();
    }

    private static double between(Random random, double low, double high) {
        return low + (high - low) * random.nextDouble();
    }
}
