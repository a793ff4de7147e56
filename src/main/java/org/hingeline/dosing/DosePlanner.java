package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;

/**
 * Suggests a dose, or says why there is none.
 *
 * <p>A plan keeps its {@link Bounds} at every step, closed to the air and also once the dosed water has been aerated:
 * water rich in CO2 that is dosed to a target overshoots it when the CO2 leaves. The mass is rounded to what a balance can
 * weigh, to the nearest unit, and down where the nearest would cross a bound.
 *
 * <p>The range of the mass is that of the dose that reaches the target, given one standard uncertainty of the water, the
 * constants' share included, since a target is compared with an absolute limit; its upper end stays within the bounds.
 * The gain in Ω compares before with after and leaves the constants' share out.
 */
public final class DosePlanner {
    private DosePlanner() {}

    /** A plan, "not needed", or a refusal with its reasons; never throws for a bad number. */
    public static DosePlan plan(DoseRequest request) {
        List<Reason> reasons = RequestCheck.reasons(request);
        if (!(request.water() instanceof Solved solved)) {
            return DosePlan.without(Outcome.REFUSED, reasons, null, List.of(), List.of());
        }
        CarbonateState before = solved.state();
        if (!reasons.isEmpty()) {
            boolean sound = request.inputNotes().isEmpty();
            List<Remedy> remedies = sound ? remedies(request, before) : List.of();
            return DosePlan.without(Outcome.REFUSED, reasons, before, remedies, before.cautions());
        }
        if (request.target().of(before) >= request.target().value()) {
            return DosePlan.without(
                    Outcome.NOT_NEEDED, List.of(notNeeded(request, before)), before, List.of(), before.cautions());
        }
        return new Sound(request, before).plan();
    }

    private static List<Remedy> remedies(DoseRequest request, CarbonateState before) {
        return Remedies.of(before, request.target(), request.aerationPco2Atm());
    }

    private static Reason notNeeded(DoseRequest request, CarbonateState before) {
        return new Reason(
                "already-there",
                "The water is at Ω aragonite " + Words.number(before.omegaAragonite(), 2) + ", pH "
                        + Words.number(before.phTotal(), 2) + ": the target of "
                        + request.target().words() + " is met.",
                "Ask for a higher target if the water must be better than that.");
    }

    /** A request whose every number can be stood on. */
    private record Sound(DoseRequest request, CarbonateState before) {
        DosePlan plan() {
            DosedWater water = new DosedWater(before, request);
            Target target = request.target();
            Bounds bounds = request.bounds();
            OptionalDouble needed = DoseSearch.alkalinityFor(water, target, target.value());
            if (needed.isEmpty()) {
                return refused(
                        "out-of-reach",
                        request.agent().words() + " cannot bring the water to " + target.words() + ".",
                        "Aerate first, or ask for less.");
            }
            double most = DoseSearch.alkalinityWithin(water, bounds);
            if (needed.getAsDouble() > most) {
                return refused(breaks(water, needed.getAsDouble(), most));
            }
            double massG = water.massOf(needed.getAsDouble());
            Balance balance = Balance.forLoad(massG);
            long units = balance.nearest(massG);
            if (balance.grams(units) > water.massOf(most)) {
                units = balance.notAbove(water.massOf(most));
            }
            StepSchedule schedule = new StepSchedule(water, bounds, balance, request.stockGramsPerLitre());
            Optional<List<DoseStep>> steps = units < 1 ? Optional.empty() : schedule.of(units);
            if (steps.isEmpty()) {
                return refused(notWeighable(massG, balance));
            }
            return plan(water, balance.grams(units), most, steps.get());
        }

        private DosePlan plan(DosedWater water, double massG, double most, List<DoseStep> steps) {
            double added = water.alkalinityOf(massG);
            CarbonateState after = water.with(added);
            DoseUncertainty uncertainty = new DoseUncertainty(water.before(), after, request.uncertainty());
            double againstTarget = uncertainty.afterAgainst(request.target());
            List<Caution> cautions = new ArrayList<>(DoseCautions.of(request, water, massG, after));
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
                    before,
                    after,
                    water.aeratedWith(added),
                    remedies(request, before),
                    cautions);
        }

        private double massFor(DosedWater water, double value, double most) {
            double added =
                    DoseSearch.alkalinityFor(water, request.target(), value).orElse(most);
            return water.massOf(Math.min(added, most));
        }

        private boolean nearABound(DoseUncertainty uncertainty, CarbonateState after) {
            Bounds bounds = request.bounds();
            Target omega = new Target.OmegaAragonite(bounds.omegaAragoniteMax());
            Target ph = new Target.PhTotal(bounds.phTotalMax());
            return after.omegaAragonite() + uncertainty.afterAgainst(omega) > bounds.omegaAragoniteMax()
                    || after.phTotal() + uncertainty.afterAgainst(ph) > bounds.phTotalMax();
        }

        private Reason breaks(DosedWater water, double needed, double most) {
            Target target = request.target();
            if (request.bounds().hold(water.with(needed))) {
                CarbonateState aerated = water.aeratedWith(needed);
                return new Reason(
                        "aeration-would-break-bounds",
                        "Dosed to " + target.words() + ", the water would rise to pH "
                                + Words.number(aerated.phTotal(), 2) + ", Ω aragonite "
                                + Words.number(aerated.omegaAragonite(), 2)
                                + " as its CO2 leaves, above the bounds of "
                                + request.bounds().words() + ".",
                        "Aerate first, measure again, then ask again.");
            }
            CarbonateState there = water.with(needed);
            CarbonateState best = water.with(most);
            return new Reason(
                    "would-break-bounds",
                    target.words() + " would need pH " + Words.number(there.phTotal(), 2) + ", Ω aragonite "
                            + Words.number(there.omegaAragonite(), 2) + ", above the bounds of "
                            + request.bounds().words() + ".",
                    "Within the bounds " + request.agent().words() + " reaches Ω aragonite "
                            + Words.number(best.omegaAragonite(), 2) + ", pH " + Words.number(best.phTotal(), 2)
                            + ": ask for less; the bounds are the site's to edit.");
        }

        private Reason notWeighable(double massG, Balance balance) {
            return new Reason(
                    "no-steps",
                    "The dose of " + Words.number(massG, 3) + " g cannot be split into at most "
                            + StepSchedule.STEPS_MAX + " hourly additions of whole units of "
                            + balance.grams(1) + " g that keep to "
                            + request.bounds().phPerHourMax() + " pH per hour.",
                    "Dose a larger volume, ask for less, aerate first, or have the site's bound on pH per hour edited.");
        }

        private DosePlan refused(String code, String detail, String lift) {
            return refused(new Reason(code, detail, lift));
        }

        private DosePlan refused(Reason reason) {
            return DosePlan.without(
                    Outcome.REFUSED, List.of(reason), before, remedies(request, before), before.cautions());
        }
    }
}
