package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.CleggWhitfield1995;

/** What a person should know before putting a chemical into water with animals in it. */
final class DoseCautions {
    private static final double STOCK_SHARE_WORTH_SAYING = 0.01;

    private DoseCautions() {}

    static List<Caution> of(DoseRequest request, DosedWater water, double massG, CarbonateState after) {
        Agent agent = request.agent();
        List<Caution> cautions = new ArrayList<>();
        cautions.add(new Caution(
                "suggestion",
                "This is a suggestion from a calculation: a person who knows the tank confirms it first."));
        for (Hazard hazard : agent.hazards()) {
            cautions.add(new Caution(
                    "hazard-" + hazard.code(), agent.words() + ", " + hazard.code() + ": " + hazard.words()));
        }
        add(cautions, "protection", "Wear goggles and gloves.");
        add(
                cautions,
                "safety-data-sheet",
                "Read the safety data sheet of the product and follow local rules for storing and handling it.");
        add(
                cautions,
                "product",
                "Check hydrate and assay on the label: this plan is for " + agent.words() + ", "
                        + request.form().code() + ", " + Words.number(request.assayPercent(), 1)
                        + " %. Decahydrate taken for anhydrous under-doses 2.7 times.");
        add(cautions, "dissolve-first", "Dissolve it completely first; never add dry powder to the tank by hand.");
        add(
                cautions,
                "add-slowly",
                "Add it slowly to strong flow, away from larvae: rather to a header tank than to the larvae's own.");
        add(
                cautions,
                "plume",
                "Where the stock enters, the water passes the thresholds of precipitation long before the tank's mean"
                        + " does. If it turns cloudy, stop: a runaway takes more alkalinity than was added.");
        add(
                cautions,
                "measure-between",
                "Mix for three turnovers and measure pH before each next addition; stop when it is not what the plan expects.");
        cautions.add(ammonia(water.before(), after));
        add(
                cautions,
                "discharge",
                "Before the water is let out, check its pH and solids against the site's own permit.");
        add(
                cautions,
                "no-larval-limit",
                "No published larval limit for pH steps was found: the bounds are engineering defaults for the site to"
                        + " edit.");
        if (request.stockGramsPerLitre() == null) {
            add(cautions, "no-stock-given", "No stock strength was given: its solubility was not checked.");
        } else {
            stockVolume(cautions, request, massG);
        }
        return cautions;
    }

    private static Caution ammonia(CarbonateState before, CarbonateState after) {
        return new Caution(
                "ammonia",
                "The un-ionised, toxic share of ammonia rises with pH: here from "
                        + Words.number(100 * share(before), 1) + " % to " + Words.number(100 * share(after), 1)
                        + " %. Measure total ammonia first.");
    }

    private static double share(CarbonateState state) {
        return CleggWhitfield1995.unionisedShare(
                state.phTotal(),
                state.conditions().temperatureC(),
                state.conditions().salinity());
    }

    private static void stockVolume(List<Caution> cautions, DoseRequest request, double massG) {
        Double strength = request.stockGramsPerLitre();
        if (strength != null && request.receiver() instanceof Receiver.Tank tank) {
            double share = massG / strength / tank.volumeL();
            if (share > STOCK_SHARE_WORTH_SAYING) {
                add(
                        cautions,
                        "stock-dilutes",
                        "The stock makes up " + Words.number(100 * share, 1)
                                + " % of the tank; its dilution of the sea water is not counted. Make it stronger.");
            }
        }
    }

    private static void add(List<Caution> cautions, String code, String detail) {
        cautions.add(new Caution(code, detail));
    }
}
