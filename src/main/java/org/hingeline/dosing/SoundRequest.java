package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.jspecify.annotations.Nullable;

/** A request whose every number can be stood on, and whose target is not met yet. */
record SoundRequest(DoseRequest request, CarbonateState before) {
    DosePlan plan() {
        Bounds bounds = request.bounds();
        if (!bounds.hold(before)) {
            return refused(Refusals.beyondBounds(request, before));
        }
        DosedWater alone = new DosedWater(before, request);
        OptionalDouble needed = DoseSearch.alkalinityFor(
                alone, request.target(), request.target().value());
        Companion companion = request.companion();
        if (companion != null
                && (needed.isEmpty()
                        || companion.hold() instanceof Hold.Pco2
                        || !companion.hold().keptBy(alone.with(needed.getAsDouble())))) {
            return planOfTwo(companion);
        }
        return needed.isEmpty()
                ? refused(Refusals.outOfReach(request, alone))
                : plan(alone, needed.getAsDouble(), null);
    }

    private DosePlan planOfTwo(Companion companion) {
        PairSolver solver = new PairSolver(
                before, request.product().agent(), companion.product().agent());
        Optional<Mix> mix = solver.solve(request.target().value(), companion.hold());
        if (mix.isEmpty() || mix.get().first() < 0 || mix.get().second() < 0) {
            return refused(PairRefusal.of(request, companion, before, mix));
        }
        DosedWater water = new DosedWater(before, request, request.products(), mix.get());
        double alkalinity = mix.get().first() * request.product().agent().alkalinityPerMol()
                + mix.get().second() * companion.product().agent().alkalinityPerMol();
        return plan(water, alkalinity, companion.hold());
    }

    private DosePlan plan(DosedWater water, double needed, @Nullable Hold hold) {
        Bounds bounds = request.bounds();
        double most = DoseSearch.alkalinityWithin(water, bounds);
        if (needed > most) {
            return refused(Refusals.breaksBounds(request, water, needed, most));
        }
        double[] massesG = new double[water.products().size()];
        for (int i = 0; i < massesG.length; i++) {
            massesG[i] = water.massOf(i, needed);
            Stock stock = request.stockOf(i);
            double temperatureC =
                    stock == null ? 0 : stock.temperatureIn(before.conditions().temperatureC());
            Product product = water.products().get(i);
            if (stock != null && stock.gramsPerLitre() > product.strongestStockGramsPerLitre(temperatureC)) {
                return refused(Refusals.stockTooStrong(product, stock.gramsPerLitre(), temperatureC, massesG[i]));
            }
        }
        Optional<Weighing> weighing = Weighing.nearest(massesG, grams -> {
            CarbonateState after = water.withMasses(grams);
            return bounds.hold(after)
                    && bounds.hold(water.aeratedWithMasses(grams))
                    && (hold == null || hold.keptBy(after));
        });
        Optional<List<DoseStep>> steps = weighing.flatMap(w -> new StepSchedule(water, request, w).steps());
        if (weighing.isEmpty() || steps.isEmpty()) {
            return refused(Refusals.notWeighable(request, massesG));
        }
        return plan(water, weighing.get().grams(weighing.get().parcels()), most, steps.get());
    }

    private DosePlan plan(DosedWater water, double[] massesG, double most, List<DoseStep> steps) {
        CarbonateState after = water.withMasses(massesG);
        CarbonateState aerated = water.aeratedWithMasses(massesG);
        Optional<Reason> discharge = Discharge.refusal(request.receiver(), after, aerated);
        if (discharge.isPresent()) {
            return refused(discharge.get());
        }
        Double totalAmmonia = request.ammoniaMgL();
        AmmoniaShift ammonia = totalAmmonia == null ? null : AmmoniaShift.of(totalAmmonia, before, after, aerated);
        DoseUncertainty uncertainty = new DoseUncertainty(before, after, request.uncertainty());
        List<Caution> cautions = new ArrayList<>(DoseCautions.of(request, water, after, ammonia, massesG));
        if (nearABound(uncertainty, after)) {
            cautions.add(new Caution(
                    "bound-within-uncertainty",
                    "The water after the dose is within one standard uncertainty of a bound ("
                            + request.bounds().words() + "): stop earlier and measure."));
        }
        cautions.addAll(before.cautions());
        double gain = after.omegaAragonite() - before.omegaAragonite();
        double ofGain = uncertainty.ofGain();
        return new DosePlan(
                Outcome.PLAN,
                List.of(),
                products(water, massesG, most, uncertainty.afterAgainst(request.target())),
                new Amount(gain, gain - ofGain, gain + ofGain),
                steps,
                before,
                after,
                aerated,
                ammonia,
                DosePlanner.remedies(request, before),
                cautions);
    }

    private List<PlannedProduct> products(DosedWater water, double[] massesG, double most, double againstTarget) {
        double target = request.target().value();
        double low = alkalinityFor(water, target - againstTarget, most);
        double high = alkalinityFor(water, target + againstTarget, most);
        List<PlannedProduct> products = new ArrayList<>();
        for (int i = 0; i < massesG.length; i++) {
            double massG = massesG[i];
            products.add(PlannedProduct.of(
                    water.products().get(i),
                    request.receiver(),
                    new Amount(massG, Math.min(massG, water.massOf(i, low)), Math.max(massG, water.massOf(i, high))),
                    request.stockOf(i),
                    before.conditions().temperatureC()));
        }
        return products;
    }

    private double alkalinityFor(DosedWater water, double value, double most) {
        double added = DoseSearch.alkalinityFor(water, request.target(), value).orElse(most);
        return Math.min(added, most);
    }

    private boolean nearABound(DoseUncertainty uncertainty, CarbonateState after) {
        Bounds bounds = request.bounds();
        Target omega = new Target.OmegaAragonite(bounds.omegaAragoniteMax());
        Target ph = new Target.PhTotal(bounds.phTotalMax());
        return after.omegaAragonite() + uncertainty.afterAgainst(omega) > bounds.omegaAragoniteMax()
                || after.phTotal() + uncertainty.afterAgainst(ph) > bounds.phTotalMax();
    }

    private DosePlan refused(Reason reason) {
        return DosePlan.without(
                Outcome.REFUSED, List.of(reason), before, DosePlanner.remedies(request, before), before.cautions());
    }
}
