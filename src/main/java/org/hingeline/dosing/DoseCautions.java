package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.CleggWhitfield1995;
import org.jspecify.annotations.Nullable;

/** What a person should know before putting a chemical into water with animals in it. */
final class DoseCautions {
    private static final double STOCK_SHARE_WORTH_SAYING = 0.01;

    private final DoseRequest request;
    private final List<Caution> cautions = new ArrayList<>();

    private DoseCautions(DoseRequest request) {
        this.request = request;
    }

    static List<Caution> of(
            DoseRequest request,
            DosedWater water,
            CarbonateState after,
            @Nullable AmmoniaShift ammonia,
            double... massesG) {
        DoseCautions all = new DoseCautions(request);
        all.add(
                "suggestion",
                "This is a suggestion from a calculation: a person who knows the tank confirms it first.");
        for (int i = 0; i < massesG.length; i++) {
            ProductCautions.of(water.products().get(i), request.stockOf(i)).stream()
                    .filter(c -> !all.cautions.contains(c))
                    .forEach(all.cautions::add);
        }
        if (massesG.length > 1) {
            all.add(
                    "two-products",
                    "Make up and add the two products apart, each as its own stock, in the same steps.");
        }
        all.inTheWater(water.before(), after);
        all.ammonia(water.before(), after, ammonia);
        all.flow();
        for (int i = 0; i < massesG.length; i++) {
            all.plume(water.before(), water.products().get(i), request.stockOf(i));
            all.stock(request.stockOf(i), massesG[i]);
        }
        return all.cautions;
    }

    private void inTheWater(CarbonateState before, CarbonateState after) {
        add(
                "add-slowly",
                "Add it slowly to strong flow, away from larvae: rather to a header tank than to the larvae's own.");
        add(
                "measure-between",
                "Mix for three turnovers and measure pH before each next addition; stop when it is not what the plan expects.");
        if (after.pco2Atm() > before.pco2Atm()) {
            add(
                    "co2-rises",
                    "The dose raises pCO2 from " + Words.number(before.pco2Atm() * 1e6, 0) + " to "
                            + Words.number(after.pco2Atm() * 1e6, 0) + " µatm until the water is aerated.");
        }
        add("discharge", "Before the water is let out, check its pH and solids against the site's own permit.");
        add(
                "no-larval-limit",
                "No published larval limit for pH steps was found: the bounds are engineering defaults for the site to"
                        + " edit.");
    }

    private void ammonia(CarbonateState before, CarbonateState after, @Nullable AmmoniaShift shift) {
        add(
                "ammonia",
                "The un-ionised, toxic share of ammonia moves with pH: here from "
                        + Words.number(100 * share(before), 1) + " % to " + Words.number(100 * share(after), 1) + " %. "
                        + (shift == null ? "Measure total ammonia first." : shift.words() + "."));
        if (shift == null && request.receiver() instanceof Receiver.Tank) {
            add(
                    "ammonia-unknown",
                    "Total ammonia of this still tank is not known, and it gathers where water stands: measure it and"
                            + " plan again with its value.");
        }
        if (shift != null && shift.chronic()) {
            add(
                    "ammonia-above-criterion",
                    "Un-ionised ammonia would be above the " + (shift.acute() ? "acute" : "chronic")
                            + " criterion: exchange water before raising pH.");
        }
    }

    private static double share(CarbonateState state) {
        return CleggWhitfield1995.unionisedShare(
                state.phTotal(),
                state.conditions().temperatureC(),
                state.conditions().salinity());
    }

    private void flow() {
        if (request.receiver() instanceof Receiver.Tank) {
            return;
        }
        add(
                "flow-interlock",
                "Measure the flow first, and let the injection stop by itself when the flow stops: undiluted stock in a"
                        + " line is a danger to larvae and people.");
        if (request.receiver() instanceof Receiver.FlowThrough through) {
            add(
                    "washout",
                    "What flows in is counted as like the water in the tank now. Without make-up half of the dose is"
                            + " washed out after " + Words.number(through.halfLifeMinutes(), 0) + " min, and "
                            + Words.number(100 * through.leftAfter(60), 0) + " % of it is left after an hour.");
        }
    }

    private void plume(CarbonateState before, Product product, @Nullable Stock stock) {
        StringBuilder detail = new StringBuilder("Where the stock enters, the water passes the thresholds of"
                + " precipitation long before the tank's mean does.");
        if (stock != null) {
            DosedWater water = new DosedWater(before, request, List.of(product), Mix.OF_FIRST);
            Plume plume = Plume.of(water, stock);
            OptionalDouble calm = plume.litresPerLitreTo(Plume.OMEGA_ARAGONITE_FORMS);
            OptionalDouble spontaneous = plume.litresPerLitreTo(Plume.OMEGA_SPONTANEOUS);
            if (calm.isPresent()) {
                detail.append(" A litre of stock of " + product.agent().words() + " needs "
                        + Words.number(Math.ceil(calm.getAsDouble()), 0)
                        + " L of this water around it before Ω aragonite is down to 7, above which aragonite forms");
                if (spontaneous.isPresent()) {
                    detail.append(" (" + Words.number(Math.ceil(spontaneous.getAsDouble()), 0)
                            + " L to 12.3, where it forms by itself)");
                }
                detail.append(": let it into a stream that carries so many times as much.");
            }
        }
        add("plume", detail + " If it turns cloudy, stop: a runaway takes more alkalinity than was added.");
    }

    private void stock(@Nullable Stock stock, double massG) {
        if (stock == null) {
            if (cautions.stream().noneMatch(c -> c.code().equals("no-stock-given"))) {
                add("no-stock-given", "No stock strength was given: its solubility was not checked.");
            }
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
