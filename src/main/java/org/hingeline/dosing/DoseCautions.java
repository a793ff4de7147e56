package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.CleggWhitfield1995;

/** What a person should know before putting a chemical into water with animals in it. */
final class DoseCautions {
    private static final double STOCK_SHARE_WORTH_SAYING = 0.01;

    private final DoseRequest request;
    private final List<Caution> cautions = new ArrayList<>();

    private DoseCautions(DoseRequest request) {
        this.request = request;
    }

    static List<Caution> of(DoseRequest request, CarbonateState before, CarbonateState after, double massG) {
        DoseCautions all = new DoseCautions(request);
        all.add(
                "suggestion",
                "This is a suggestion from a calculation: a person who knows the tank confirms it first.");
        all.cautions.addAll(ProductCautions.of(request.product(), request.stock()));
        all.inTheWater(before, after);
        all.stock(massG);
        return all.cautions;
    }

    private void inTheWater(CarbonateState before, CarbonateState after) {
        add(
                "add-slowly",
                "Add it slowly to strong flow, away from larvae: rather to a header tank than to the larvae's own.");
        add(
                "plume",
                "Where the stock enters, the water passes the thresholds of precipitation long before the tank's mean"
                        + " does. If it turns cloudy, stop: a runaway takes more alkalinity than was added.");
        add(
                "measure-between",
                "Mix for three turnovers and measure pH before each next addition; stop when it is not what the plan expects.");
        if (after.pco2Atm() > before.pco2Atm()) {
            add(
                    "co2-rises",
                    "The dose raises pCO2 from " + Words.number(before.pco2Atm() * 1e6, 0) + " to "
                            + Words.number(after.pco2Atm() * 1e6, 0) + " µatm until the water is aerated.");
        }
        add(
                "ammonia",
                "The un-ionised, toxic share of ammonia rises with pH: here from "
                        + Words.number(100 * share(before), 1) + " % to " + Words.number(100 * share(after), 1)
                        + " %. Measure total ammonia first.");
        add("discharge", "Before the water is let out, check its pH and solids against the site's own permit.");
        add(
                "no-larval-limit",
                "No published larval limit for pH steps was found: the bounds are engineering defaults for the site to"
                        + " edit.");
    }

    private static double share(CarbonateState state) {
        return CleggWhitfield1995.unionisedShare(
                state.phTotal(),
                state.conditions().temperatureC(),
                state.conditions().salinity());
    }

    private void stock(double massG) {
        Stock stock = request.stock();
        if (stock == null) {
            add("no-stock-given", "No stock strength was given: its solubility was not checked.");
            return;
        }
        double share = massG / stock.gramsPerLitre() / request.receiver().litresDosed();
        if (share > STOCK_SHARE_WORTH_SAYING) {
            add(
                    "stock-dilutes",
                    "The stock makes up " + Words.number(100 * share, 1)
                            + " % of the water; its dilution of the sea water is not counted. Make it stronger if it"
                            + " stays dissolved.");
        }
    }

    private void add(String code, String detail) {
        cautions.add(new Caution(code, detail));
    }
}
