package org.hingeline.dosing;

import java.time.Instant;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.hingeline.dosing.DoseOutcome.Basis;
import org.hingeline.dosing.DoseOutcome.Seen;
import org.hingeline.dosing.DoseOutcome.Verdict;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.PhAndDic;

/**
 * Holds a dose against what was foretold of it, once the tank is mixed.
 *
 * <p>What is compared is the alkalinity that arrived with the alkalinity that was to arrive. Where alkalinity was measured
 * again after mixing, sharply enough for a dose of that size, it is the difference of the two. Otherwise it follows from
 * pH: of all waters that the agent makes out of the one before (for each mol of alkalinity its own share of carbon), the one
 * that has the pH that was read, at the temperature it was read. That is exact for a tank closed to the air; CO2 that
 * leaves also raises pH, and then more seems to have arrived. A stale alkalinity in the states after the dose is not used:
 * it does not know of the dose.
 *
 * <p>Two readings of one sensor are compared with each other, so neither the constants' share nor the sensor's common error
 * counts in full: the uncertainty is that of the foretold change, the scatter of the readings, and {@link #OF_WEIGHING}.
 * The dose came out as foretold when the difference is within twice that.
 */
public final class DoseComparison {
    /** Weighing, assay and mixing together, as a share of the dose; an engineering allowance, not literature. */
    public static final double OF_WEIGHING = 0.03;

    /** Salinity that moves by more than this says that water came in; an engineering allowance, not literature. */
    public static final double SALINITY_MOVE = 0.5;

    /** So many states settle the matter before the time is up; when it is up, two will do. */
    private static final int ENOUGH = 3;

    private static final int LEAST = 2;

    /**
     * A dose and what was foretold of it; amounts in mol/kg-seawater.
     *
     * @param alkalinityBefore of the water before, total
     * @param dicBefore of the water before
     * @param salinityBefore practical
     * @param expectedAlkalinity that was to arrive, above 0
     * @param phChangeUncertainty standard, of the foretold change of pH, without the constants' share
     * @param alkalinityUncertainty standard, of one measured alkalinity
     * @param mixedAt when the tank counts as mixed
     * @param until when readings no longer tell of this dose alone
     */
    public record Dosed(
            Agent agent,
            double alkalinityBefore,
            double dicBefore,
            double salinityBefore,
            double expectedAlkalinity,
            double phChangeUncertainty,
            double alkalinityUncertainty,
            Instant mixedAt,
            Instant until) {
        double carbonPerAlkalinity() {
            return agent.dicPerMol() / agent.alkalinityPerMol();
        }
    }

    /**
     * A water state after the dose.
     *
     * @param phAt when its pH was read
     * @param phTotal total scale
     * @param alkalinityAt when its alkalinity was measured
     * @param totalAlkalinity mol/kg-seawater
     */
    public record After(
            Instant phAt, double phTotal, Conditions conditions, Instant alkalinityAt, double totalAlkalinity) {}

    private record Arrival(After state, double alkalinity) {}

    private DoseComparison() {}

    /**
     * @param states complete water states in the order of time, none of them suspect; those before mixing or too late are left out here
     * @param flowing whether water ran in or out meanwhile
     */
    public static DoseOutcome compare(Dosed dosed, List<After> states, boolean flowing, Instant now) {
        if (!dosed.mixedAt().isBefore(dosed.until())) {
            return DoseOutcome.cannotTell("Another dose went in before this one was mixed.");
        }
        if (flowing) {
            return DoseOutcome.cannotTell("Water ran through the tank, so the dose did not stay.");
        }
        List<After> settled = settled(dosed, states);
        boolean over = !now.isBefore(dosed.until());
        if (settled.size() < (over ? LEAST : ENOUGH)) {
            return over
                    ? DoseOutcome.cannotTell("Too few usable readings came once it was mixed.")
                    : DoseOutcome.notYet(
                            now.isBefore(dosed.mixedAt()) ? "The tank is still mixing." : "Waiting for readings.");
        }
        double salinity = median(
                settled.stream().mapToDouble(s -> s.conditions().salinity()).toArray());
        if (Math.abs(salinity - dosed.salinityBefore()) > SALINITY_MOVE) {
            return DoseOutcome.cannotTell("Salinity moved from " + Words.number(dosed.salinityBefore(), 1) + " to "
                    + Words.number(salinity, 1) + ": water was exchanged.");
        }
        return judged(dosed, settled);
    }

    private static List<After> settled(Dosed dosed, List<After> states) {
        // several states may rest on one reading of pH; the last of them knows most
        Map<Instant, After> byReading = new TreeMap<>();
        states.stream()
                .filter(s -> !s.phAt().isBefore(dosed.mixedAt()) && !s.phAt().isAfter(dosed.until()))
                .forEach(s -> byReading.put(s.phAt(), s));
        return List.copyOf(byReading.values());
    }

    /** By the alkalinity measured since, if there is one and it is sharp enough for a dose of this size; else by pH. */
    private static DoseOutcome judged(Dosed dosed, List<After> settled) {
        List<After> titrated = settled.stream()
                .filter(s -> !s.alkalinityAt().isBefore(dosed.mixedAt()))
                .toList();
        if (!titrated.isEmpty()) {
            DoseOutcome byAlkalinity = judged(dosed, Basis.TOTAL_ALKALINITY, titrated);
            if (byAlkalinity.verdict() != Verdict.CANNOT_TELL) {
                return byAlkalinity;
            }
        }
        return judged(dosed, Basis.PH, settled);
    }

    private static DoseOutcome judged(Dosed dosed, Basis basis, List<After> settled) {
        List<Arrival> arrivals = settled.stream()
                .flatMap(s -> arrived(dosed, basis, s, s.phTotal()).stream()
                        .mapToObj(alkalinity -> new Arrival(s, alkalinity)))
                .sorted(Comparator.comparingDouble(Arrival::alkalinity))
                .toList();
        if (arrivals.isEmpty()) {
            return DoseOutcome.cannotTell("The readings after it do not make a water that can be worked out.");
        }
        Arrival middle = arrivals.get((arrivals.size() - 1) / 2);
        double arrived =
                median(arrivals.stream().mapToDouble(Arrival::alkalinity).toArray());
        double scatter = 1.4826
                * median(arrivals.stream()
                        .mapToDouble(a -> Math.abs(a.alkalinity() - arrived))
                        .toArray());
        double ofReadings = basis == Basis.PH
                ? dosed.phChangeUncertainty() * alkalinityPerPh(dosed, middle.state())
                : Math.sqrt(2) * dosed.alkalinityUncertainty();
        double expected = dosed.expectedAlkalinity();
        double uncertainty = Math.hypot(Math.hypot(ofReadings, scatter), OF_WEIGHING * expected);
        Optional<CarbonateState> water = water(dosed, middle.state().conditions(), arrived);
        if (water.isEmpty() || !Double.isFinite(uncertainty) || 2 * uncertainty >= expected) {
            return DoseOutcome.cannotTell("The dose is too small to be seen: it was to add " + micromoles(expected)
                    + ", and the readings tell that to \u00b1" + micromoles(uncertainty) + ".");
        }
        return said(new Seen(
                basis,
                arrivals.size(),
                middle.state().phTotal(),
                water.get().omegaAragonite(),
                arrived,
                expected,
                uncertainty));
    }

    private static DoseOutcome said(Seen seen) {
        double difference = seen.arrivedAlkalinity() - seen.expectedAlkalinity();
        String numbers = Math.round(100 * seen.share()) + " % of it (\u00b1"
                + Math.round(100 * seen.standardUncertainty() / seen.expectedAlkalinity())
                + " %) is seen in the water.";
        if (Math.abs(difference) <= 2 * seen.standardUncertainty()) {
            return new DoseOutcome(Verdict.AS_FORETOLD, "As foretold: " + numbers, seen);
        }
        if (difference < 0) {
            return new DoseOutcome(
                    Verdict.LESS,
                    "Less than foretold: " + numbers
                            + " Check mixing, assay and hydration, and the volume of the tank, before giving more.",
                    seen);
        }
        return new DoseOutcome(
                Verdict.MORE,
                "More than foretold: " + numbers + " Give no more; check the mass, hydration and volume."
                        + (seen.basis() == Basis.PH
                                ? " Air that drives CO2 out raises pH too: an alkalinity measured now would tell."
                                : ""),
                seen);
    }

    /**
     * Alkalinity that arrived, mol/kg-seawater. At a given pH alkalinity is a straight line of carbon, TA = f DIC + g, and
     * the agent moves along another, so where they cross is had without searching.
     */
    private static OptionalDouble arrived(Dosed dosed, Basis basis, After state, double phTotal) {
        if (basis == Basis.TOTAL_ALKALINITY) {
            return OptionalDouble.of(state.totalAlkalinity() - dosed.alkalinityBefore());
        }
        double dic = dosed.dicBefore();
        Optional<CarbonateState> once = solved(state.conditions(), new PhAndDic(phTotal, dic));
        Optional<CarbonateState> more = solved(state.conditions(), new PhAndDic(phTotal, 1.5 * dic));
        if (once.isEmpty() || more.isEmpty()) {
            return OptionalDouble.empty();
        }
        double slope = (more.get().totalAlkalinity() - once.get().totalAlkalinity()) / (0.5 * dic);
        double arrived =
                (once.get().totalAlkalinity() - dosed.alkalinityBefore()) / (1 - dosed.carbonPerAlkalinity() * slope);
        return Double.isFinite(arrived) ? OptionalDouble.of(arrived) : OptionalDouble.empty();
    }

    private static double alkalinityPerPh(Dosed dosed, After state) {
        double step = 1e-4;
        OptionalDouble above = arrived(dosed, Basis.PH, state, state.phTotal() + step);
        OptionalDouble below = arrived(dosed, Basis.PH, state, state.phTotal() - step);
        return above.isPresent() && below.isPresent()
                ? Math.abs(above.getAsDouble() - below.getAsDouble()) / (2 * step)
                : Double.POSITIVE_INFINITY;
    }

    private static Optional<CarbonateState> water(Dosed dosed, Conditions conditions, double arrived) {
        return solved(
                conditions,
                new AlkalinityAndDic(
                        dosed.alkalinityBefore() + arrived, dosed.dicBefore() + dosed.carbonPerAlkalinity() * arrived));
    }

    private static Optional<CarbonateState> solved(Conditions conditions, KnownPair pair) {
        return CarbonateSystem.solve(conditions, pair) instanceof Solved solved
                ? Optional.of(solved.state())
                : Optional.empty();
    }

    private static String micromoles(double alkalinity) {
        return Words.number(alkalinity * 1e6, 0) + " \u00b5mol/kg";
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        int half = sorted.length / 2;
        return sorted.length % 2 == 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
    }
}
