package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.hingeline.seawater.CarbonateState;

/** The reasons against a dose for a water that could be dosed, in words. */
final class Refusals {
    private Refusals() {}

    private static final Set<String> ABOUT_WATER_OR_AIM = Set.of(
            "water-implausible",
            "salinity-implausible",
            "outside-fits",
            "volume-implausible",
            "flow-implausible",
            "target-implausible",
            "aeration-implausible");

    /** Whether the water, where it is and what it is to become can be stood on, so that remedies can. */
    static boolean aboutTheDoseOnly(List<Reason> reasons) {
        return reasons.stream().noneMatch(r -> ABOUT_WATER_OR_AIM.contains(r.code()));
    }

    static Reason notNeeded(DoseRequest request, CarbonateState before) {
        return new Reason(
                "already-there",
                "The water is at " + Words.water(before) + ": the target of "
                        + request.target().words() + " is met.",
                "Ask for a higher target if the water must be better than that.");
    }

    static Reason beyondBounds(DoseRequest request, CarbonateState before) {
        return new Reason(
                "water-beyond-bounds",
                "The water is at " + Words.water(before) + ", beyond the bounds of "
                        + request.bounds().words() + ", before anything is added.",
                "Check the readings. Blend it with other water, or have the site's bounds edited.");
    }

    /** No amount that could be thought of reaches the target. */
    static Reason outOfReach(DoseRequest request, DosedWater water) {
        CarbonateState much = water.with(DoseSearch.ALKALINITY_MAX);
        boolean lowers = much.phTotal() < water.before().phTotal();
        return new Reason(
                lowers ? "agent-cannot-reach" : "out-of-reach",
                request.product().agent().words() + " cannot bring the water to "
                        + request.target().words() + (lowers ? ": it lowers pH" : "") + ". Even "
                        + amount(water, DoseSearch.ALKALINITY_MAX) + " would lead to " + Words.water(much)
                        + ", pCO2 " + uatm(much) + ".",
                lowers
                        ? "Aerate first; use sodium carbonate, or carbonate and bicarbonate together."
                        : "Aerate first, or ask for less.");
    }

    /** The dose that would be needed crosses a bound. */
    static Reason breaksBounds(DoseRequest request, DosedWater water, double needed, double most) {
        CarbonateState there = water.with(needed);
        CarbonateState aerated = water.aeratedWith(needed);
        Bounds bounds = request.bounds();
        String agent = request.product().agent().words();
        String target = request.target().words();
        if (there.phTotal() < water.before().phTotal()) {
            return new Reason(
                    "agent-cannot-reach",
                    agent + " lowers pH and barely lifts Ω: " + target + " would take " + amount(water, needed)
                            + " and lead to " + Words.water(there) + ", pCO2 " + uatm(there) + ", and once aerated to "
                            + Words.water(aerated) + ", beyond the bounds of " + bounds.words() + ".",
                    "Aerate first; use sodium carbonate, or carbonate and bicarbonate together.");
        }
        if (bounds.hold(there)) {
            return new Reason(
                    "aeration-would-break-bounds",
                    "Dosed to " + target + ", the water would rise to pH " + Words.number(aerated.phTotal(), 2)
                            + ", Ω aragonite " + Words.number(aerated.omegaAragonite(), 2)
                            + " as its CO2 leaves, above the bounds of " + bounds.words() + ".",
                    "Aerate first, measure again, then ask again.");
        }
        CarbonateState best = water.with(most);
        return new Reason(
                "would-break-bounds",
                target + " would need " + Words.water(there) + ", above the bounds of " + bounds.words() + ".",
                "Within the bounds " + agent + " reaches " + Words.water(best)
                        + ": ask for less; the bounds are the site's to edit.");
    }

    static Reason notWeighable(DoseRequest request, double... massesG) {
        List<String> doses = new ArrayList<>();
        for (double massG : massesG) {
            doses.add(Words.number(massG, 3) + " g in whole units of "
                    + Balance.forLoad(massG).grams(1) + " g");
        }
        return new Reason(
                "no-steps",
                "The dose of " + String.join(" and ", doses) + " cannot be split into at most "
                        + StepSchedule.STEPS_MAX + " hourly steps that keep to "
                        + request.bounds().phPerHourMax() + " pH per hour and "
                        + request.bounds().words() + ".",
                "Dose a larger volume, ask for less, aerate first, or have the site's bound on pH per hour edited.");
    }

    static Reason stockTooStrong(Product product, double gramsPerLitre, double temperatureC, double massG) {
        double most = product.strongestStockGramsPerLitre(temperatureC);
        return new Reason(
                "stock-too-strong",
                "A stock of " + Words.number(gramsPerLitre, 1) + " g/L of " + product.words()
                        + " does not stay dissolved at " + Words.number(temperatureC, 1) + " °C.",
                "Make the stock no stronger than " + Words.notAbove(most) + " g/L: " + Words.litresAtLeast(massG / most)
                        + " or more for " + Words.mass(massG) + ".");
    }

    private static String amount(DosedWater water, double alkalinity) {
        List<String> masses = new ArrayList<>();
        for (int i = 0; i < water.products().size(); i++) {
            masses.add(Words.mass(water.massOf(i, alkalinity)));
        }
        return Words.number(alkalinity * 1e6, 0) + " µmol/kg of alkalinity (" + String.join(" and ", masses) + ")";
    }

    private static String uatm(CarbonateState state) {
        return Words.number(state.pco2Atm() * 1e6, 0) + " µatm";
    }
}
