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
        DosedWater water = new DosedWater(before, request);
        Bounds bounds = request.bounds();
        if (!bounds.hold(before)) {
            return refused(Refusals.beyondBounds(request, before));
        }
        OptionalDouble needed = DoseSearch.alkalinityFor(
                water, request.target(), request.target().value());
        if (needed.isEmpty()) {
            return refused(Refusals.outOfReach(request, water));
        }
        double most = DoseSearch.alkalinityWithin(water, bounds);
        if (needed.getAsDouble() > most) {
            return refused(Refusals.breaksBounds(request, water, needed.getAsDouble(), most));
        }
        double massG = water.massOf(needed.getAsDouble());
        Stock stock = request.stock();
        if (stock != null && stock.gramsPerLitre() > strongest(stock)) {
            return refused(
                    Refusals.stockTooStrong(request.product(), stock.gramsPerLitre(), temperatureC(stock), massG));
        }
        Balance balance = Balance.forLoad(massG);
        long units = balance.nearest(massG);
        if (balance.grams(units) > water.massOf(most)) {
            units = balance.notAbove(water.massOf(most));
        }
        StepSchedule schedule = new StepSchedule(water, bounds, balance, stock == null ? null : stock.gramsPerLitre());
        Optional<List<DoseStep>> steps = units < 1 ? Optional.empty() : schedule.of(units);
        if (steps.isEmpty()) {
            return refused(Refusals.notWeighable(request, massG, balance));
        }
        return plan(water, balance.grams(units), most, steps.get());
    }

    private DosePlan plan(DosedWater water, double massG, double most, List<DoseStep> steps) {
        double added = water.alkalinityOf(massG);
        CarbonateState after = water.with(added);
        CarbonateState aerated = water.aeratedWith(added);
        DoseUncertainty uncertainty = new DoseUncertainty(water.before(), after, request.uncertainty());
        double againstTarget = uncertainty.afterAgainst(request.target());
        List<Caution> cautions = new ArrayList<>(DoseCautions.of(request, before, after, massG));
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
                new Amount(
                        massG,
                        Math.min(massG, massFor(water, request.target().value() - againstTarget, most)),
                        Math.max(massG, massFor(water, request.target().value() + againstTarget, most))),
                new Amount(gain, gain - ofGain, gain + ofGain),
                steps,
                recipe(massG),
                before,
                after,
                aerated,
                DosePlanner.remedies(request, before),
                cautions);
    }

    private double massFor(DosedWater water, double value, double most) {
        double added = DoseSearch.alkalinityFor(water, request.target(), value).orElse(most);
        return water.massOf(Math.min(added, most));
    }

    private @Nullable StockRecipe recipe(double massG) {
        Stock stock = request.stock();
        return stock == null
                ? null
                : new StockRecipe(
                        stock.gramsPerLitre(), temperatureC(stock), strongest(stock), massG / stock.gramsPerLitre());
    }

    private double strongest(Stock stock) {
        return request.product().strongestStockGramsPerLitre(temperatureC(stock));
    }

    private double temperatureC(Stock stock) {
        Double own = stock.temperatureC();
        return own == null ? before.conditions().temperatureC() : own;
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
