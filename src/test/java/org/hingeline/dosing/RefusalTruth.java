package org.hingeline.dosing;

import java.util.List;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.hingeline.seawater.PhScale;

/** Whether what a refusal says of a request is so, found out another way than the planner's. */
final class RefusalTruth {
    private static final int AMOUNTS = 100;

    private RefusalTruth() {}

    static boolean holds(Reason reason, DoseRequest request, CarbonateState before) {
        return switch (reason.code()) {
            case "corrosive-with-larvae" ->
                request.larvae()
                        && request.products().stream()
                                .anyMatch(p -> p.agent().hazards().stream()
                                        .anyMatch(h ->
                                                List.of("H290", "H314", "H318").contains(h.code())));
            case "target-above-bounds" ->
                request.target() instanceof Target.OmegaAragonite
                        ? request.target().value() > request.bounds().omegaAragoniteMax()
                        : request.target().value() > request.bounds().phTotalMax();
            case "water-beyond-bounds" ->
                before.phTotal() > request.bounds().phTotalMax()
                        || before.omegaAragonite() > request.bounds().omegaAragoniteMax();
            case "stock-too-strong" -> stockTooStrong(request, before);
            case "agent-cannot-reach", "out-of-reach", "would-break-bounds", "aeration-would-break-bounds" ->
                request.companion() != null || noAmountReachesWithinBounds(request, before);
            case "no-steps" -> request.companion() != null || cannotBeSplit(request, before);
            case "two-agents-cannot" -> oneIsNegative(request, before);
            case "discharge-ph" -> wouldFlowOnAboveNine(request, before);
            default -> throw new IllegalArgumentException("nobody has said when this is true: " + reason);
        };
    }

    private static boolean stockTooStrong(DoseRequest request, CarbonateState before) {
        double in100G = request.product()
                .agent()
                .solubility()
                .gramsPer100GWater(before.conditions().temperatureC());
        double pure = request.stock().gramsPerLitre()
                * request.product().agent().forms().get(0).gramsPerMol()
                / request.product().form().gramsPerMol();
        return pure > 0.8 * in100G / (100 + in100G) * 1000;
    }

    /** Amounts from a millionth of a mol per kg to a fiftieth, by even steps of the logarithm. */
    private static boolean noAmountReachesWithinBounds(DoseRequest request, CarbonateState before) {
        DosedWater water = new DosedWater(before, request);
        for (int i = 0; i <= AMOUNTS; i++) {
            double alkalinity = 1e-6 * Math.pow(0.02 / 1e-6, (double) i / AMOUNTS);
            CarbonateState state = water.with(alkalinity);
            CarbonateState aerated = water.aeratedWith(alkalinity);
            if (request.target().of(state) >= request.target().value()
                    && request.bounds().hold(state)
                    && request.bounds().hold(aerated)) {
                return false;
            }
        }
        return true;
    }

    /** Unit by unit, each step as many as the bound lets be: when even that fails, nothing splits it. */
    private static boolean cannotBeSplit(DoseRequest request, CarbonateState before) {
        DosedWater water = new DosedWater(before, request);
        double needed = DoseSearch.alkalinityFor(
                        water, request.target(), request.target().value())
                .orElseThrow();
        double massG = water.massOf(0, needed);
        double unit = Balance.forLoad(massG).grams(1);
        long units = Math.round(massG / unit);
        if (units < 1) {
            return true;
        }
        double step = request.bounds().phPerHourMax();
        double whole = Math.abs(water.withMasses(units * unit).phTotal() - before.phTotal());
        if (whole > step * 72) {
            return true;
        }
        long given = 0;
        for (int steps = 0; steps < 72; steps++) {
            double ph = water.withMasses(given * unit).phTotal();
            long more = 0;
            long stride = Math.max(1, units / 100_000);
            while (given + more < units
                    && Math.abs(water.withMasses((given + more + stride) * unit).phTotal() - ph) <= step) {
                more += stride;
            }
            given += more;
            if (given >= units) {
                CarbonateState after = water.withMasses(units * unit);
                return !request.bounds().hold(after) || !request.bounds().hold(water.aeratedWithMasses(units * unit));
            }
            if (more == 0) {
                return true;
            }
        }
        return true;
    }

    /** Alkalinity and carbon of the wanted water by halving; then two equations by hand. Without lime among the agents. */
    private static boolean oneIsNegative(DoseRequest request, CarbonateState before) {
        Hold hold = request.companion().hold();
        boolean ph = hold instanceof Hold.PhAtMost;
        double low = ph ? 0 : 6;
        double high = ph ? 0.1 : 10;
        for (int i = 0; i < 80; i++) {
            double middle = (low + high) / 2;
            if (wanted(before, hold, middle).omegaAragonite() < request.target().value()) {
                low = middle;
            } else {
                high = middle;
            }
        }
        CarbonateState there = wanted(before, hold, low);
        double alkalinity = there.totalAlkalinity() - before.totalAlkalinity();
        double dic = there.dic() - before.dic();
        Agent a = request.product().agent();
        Agent b = request.companion().product().agent();
        double determinant = a.alkalinityPerMol() * b.dicPerMol() - b.alkalinityPerMol() * a.dicPerMol();
        double first = (alkalinity * b.dicPerMol() - b.alkalinityPerMol() * dic) / determinant;
        double second = (a.alkalinityPerMol() * dic - alkalinity * a.dicPerMol()) / determinant;
        return Math.min(first, second) < 0;
    }

    private static CarbonateState wanted(CarbonateState before, Hold hold, double sought) {
        return CarbonateSystem.solve(
                        before.conditions(),
                        hold instanceof Hold.PhAtMost ph
                                ? new PhAndDic(ph.phTotalMax(), sought)
                                : new PhAndPco2(sought, ((Hold.Pco2) hold).pco2Atm()))
                .orElseThrow();
    }

    private static boolean wouldFlowOnAboveNine(DoseRequest request, CarbonateState before) {
        DosedWater water = new DosedWater(before, request);
        double needed = DoseSearch.alkalinityFor(
                        water, request.target(), request.target().value())
                .orElseThrow();
        double highest =
                Math.max(water.with(needed).phTotal(), water.aeratedWith(needed).phTotal());
        return !(request.receiver() instanceof Receiver.Tank)
                && (request.companion() != null
                        || PhScale.NBS.fromTotal(
                                        highest,
                                        before.conditions().temperatureC(),
                                        before.conditions().salinity())
                                > 8.99);
    }
}
