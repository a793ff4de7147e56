package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Coverage;

/** Everything that refuses a request before any dose is looked for; all reasons are given at once. */
final class RequestCheck {
    private static final double VOLUME_MAX_L = 1e7;
    private static final double FLOW_MAX_L_MIN = 1e6;
    private static final double HOLD_PCO2_MAX_ATM = 10_000e-6;
    private static final double AMMONIA_MAX_MG_L = 100;
    private static final double AERATION_MIN_ATM = 100e-6;
    private static final double AERATION_MAX_ATM = 5000e-6;
    private static final double ALKALINITY_MAX = 0.01;
    private static final double STOCK_MAX_C = 40;
    private static final double SALINITY_MIN = 1;
    private static final double SALINITY_MAX = 42;

    private final DoseRequest request;
    private final List<Reason> reasons = new ArrayList<>();

    private RequestCheck(DoseRequest request) {
        this.request = request;
    }

    static List<Reason> reasons(DoseRequest request) {
        RequestCheck check = new RequestCheck(request);
        check.inputs();
        check.water();
        check.receiver();
        for (int i = 0; i < request.products().size(); i++) {
            check.product(i);
        }
        check.target();
        check.aeration();
        check.ammonia();
        Companion companion = request.companion();
        if (companion != null) {
            check.companion(companion);
        }
        return check.reasons;
    }

    private void inputs() {
        for (InputNote note : request.inputNotes()) {
            refuse(
                    "input-" + note.problem().word(),
                    note.quantity() + " is " + note.problem().word() + ": " + note.detail(),
                    note.problem().lift());
        }
    }

    private void water() {
        CarbonateResult water = request.water();
        if (water == null) {
            if (request.inputNotes().isEmpty()) {
                refuse(
                        "water-unknown",
                        "The state of the water is not known.",
                        "Measure pH, alkalinity, temperature and" + " salinity.");
            }
        } else if (water instanceof Unsolvable u) {
            refuse("water-unsolvable", u.reason().code() + ": " + u.detail(), "Check the value and measure again.");
        } else if (water instanceof Solved solved) {
            double alkalinity = solved.state().totalAlkalinity();
            if (!(alkalinity >= 0 && alkalinity <= ALKALINITY_MAX)) {
                refuse(
                        "water-implausible",
                        "A total alkalinity of " + Words.number(alkalinity * 1e6, 0)
                                + " µmol/kg is no water of a hatchery.",
                        "Titrate again: 0 to " + Words.number(ALKALINITY_MAX * 1e6, 0) + " µmol/kg is accepted.");
            }
            double salinity = solved.state().conditions().salinity();
            if (!(salinity >= SALINITY_MIN && salinity <= SALINITY_MAX)) {
                refuse(
                        "salinity-implausible",
                        "A salinity of " + Words.number(salinity, 1) + " is no sea water of a hatchery.",
                        "Check the value and its unit: practical salinity, 1 to 42, not conductivity in mS/cm.");
            }
            for (Caution caution : Coverage.ofDecisiveFits(solved.state().conditions())) {
                refuse(
                        "outside-fits",
                        caution.detail(),
                        "Use constants whose range holds the water (millero2006 for estuaries), or dose where it does.");
            }
        }
    }

    private void receiver() {
        double volumeL = request.receiver() instanceof Receiver.Tank tank
                ? tank.volumeL()
                : request.receiver() instanceof Receiver.FlowThrough through ? through.volumeL() : 1;
        if (!(volumeL > 0 && volumeL <= VOLUME_MAX_L)) {
            refuse(
                    "volume-implausible",
                    "A tank of " + volumeL + " L cannot be planned for.",
                    "Give the volume in litres, above 0 and at most 10,000,000 (10,000 m³).");
        }
        double flowLMin = request.receiver() instanceof Receiver.Flow flow
                ? flow.flowLMin()
                : request.receiver() instanceof Receiver.FlowThrough through ? through.flowLMin() : 1;
        if (!(flowLMin > 0 && flowLMin <= FLOW_MAX_L_MIN)) {
            refuse(
                    "flow-implausible",
                    "A flow of " + flowLMin + " L/min cannot be planned for.",
                    "Give the flow in litres per minute, above 0 and at most 1,000,000.");
        }
        if (request.receiver() instanceof Receiver.FlowThrough && volumeL < flowLMin) {
            refuse(
                    "flow-implausible",
                    "A tank of " + volumeL + " L that " + flowLMin
                            + " L/min flow through holds its water for less than a minute.",
                    "Check both, or plan for the flow alone.");
        }
    }

    private void product(int index) {
        Product product = request.products().get(index);
        if (!(product.assayPercent() >= 1 && product.assayPercent() <= 100)) {
            refuse(
                    "assay-implausible",
                    "An assay of " + product.assayPercent() + " % cannot be.",
                    "Read the assay from the label or the certificate: 1 to 100 %.");
        }
        if (request.larvae() && product.agent().corrosive()) {
            refuse(
                    "corrosive-with-larvae",
                    product.agent().words() + " is labelled corrosive, and larvae are in the water.",
                    "Use sodium carbonate or bicarbonate, or dose a header tank or storage without larvae.");
        }
        Stock stock = request.stockOf(index);
        if (stock != null) {
            stock(stock);
        }
    }

    private void stock(Stock stock) {
        if (!(stock.gramsPerLitre() > 0 && Double.isFinite(stock.gramsPerLitre()))) {
            refuse(
                    "stock-implausible",
                    "A stock of " + stock.gramsPerLitre() + " g/L cannot be.",
                    "Give the strength of the stock in g per litre, above 0.");
        }
        Double temperatureC = stock.temperatureC();
        if (temperatureC != null && !(temperatureC >= 0 && temperatureC <= STOCK_MAX_C)) {
            refuse(
                    "stock-implausible",
                    "A stock at " + temperatureC + " °C cannot be planned for.",
                    "Give the temperature of the stock, 0 to " + Words.number(STOCK_MAX_C, 0) + " °C.");
        }
    }

    private void companion(Companion companion) {
        Hold hold = companion.hold();
        boolean plausible = hold instanceof Hold.PhAtMost ph
                ? ph.phTotalMax() > 6 && ph.phTotalMax() <= 9
                : ((Hold.Pco2) hold).pco2Atm() >= AERATION_MIN_ATM && ((Hold.Pco2) hold).pco2Atm() <= HOLD_PCO2_MAX_ATM;
        if (!plausible) {
            refuse(
                    "hold-implausible",
                    hold.words() + " cannot be held.",
                    "Give a ceiling of pH above 6 and at most 9, or a pCO2 of 100 to 10,000 µatm.");
        }
        if (!(request.target() instanceof Target.OmegaAragonite)) {
            refuse(
                    "hold-needs-omega",
                    "Two agents are planned for a target of Ω aragonite, not for "
                            + request.target().words() + ".",
                    "Give the target as Ω aragonite, or ask for one agent.");
        }
        Agent first = request.product().agent();
        Agent second = companion.product().agent();
        if (first.alkalinityPerMol() * second.dicPerMol() == first.dicPerMol() * second.alkalinityPerMol()) {
            refuse(
                    "agents-alike",
                    first.words() + " and " + second.words()
                            + " add alkalinity and carbon in the same proportion: nothing can be held with them.",
                    "Choose two that differ, such as sodium carbonate and sodium bicarbonate.");
        }
    }

    private void target() {
        Target target = request.target();
        Bounds bounds = request.bounds();
        double most = switch (kind(target)) {
            case OMEGA -> bounds.omegaAragoniteMax();
            case PH -> bounds.phTotalMax();
            case ALKALINITY -> ALKALINITY_MAX;
        };
        if (!(target.value() > 0 && Double.isFinite(target.value()))) {
            refuse("target-implausible", target.words() + " cannot be a target.", "Give a target above 0.");
        } else if (target.value() > most) {
            refuse(
                    "target-above-bounds",
                    target.words() + " is above the bound of " + most + ".",
                    "Ask for no more than " + most + "; the bounds are the site's to edit.");
        }
    }

    private enum Kind {
        OMEGA,
        PH,
        ALKALINITY
    }

    private static Kind kind(Target target) {
        if (target instanceof Target.OmegaAragonite) {
            return Kind.OMEGA;
        }
        return target instanceof Target.PhTotal ? Kind.PH : Kind.ALKALINITY;
    }

    private void aeration() {
        double pco2 = request.aerationPco2Atm();
        if (!(pco2 >= AERATION_MIN_ATM && pco2 <= AERATION_MAX_ATM)) {
            refuse(
                    "aeration-implausible",
                    "Aeration to " + Words.number(pco2 * 1e6, 0) + " µatm cannot be.",
                    "Give the pCO2 that aeration reaches: 100 to 5000 µatm, 420 in open air.");
        }
    }

    private void ammonia() {
        Double totalMgL = request.ammoniaMgL();
        if (totalMgL != null && !(totalMgL >= 0 && totalMgL <= AMMONIA_MAX_MG_L)) {
            refuse(
                    "ammonia-implausible",
                    "Total ammonia of " + totalMgL + " mg/L cannot be.",
                    "Give total ammonia in mg/L as N, 0 to " + Words.number(AMMONIA_MAX_MG_L, 0) + ".");
        }
    }

    private void refuse(String code, String detail, String lift) {
        reasons.add(new Reason(code, detail, lift));
    }
}
