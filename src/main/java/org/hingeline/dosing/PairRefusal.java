package org.hingeline.dosing;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hingeline.seawater.CarbonateState;

/** Why two agents cannot hold what they were to hold. */
final class PairRefusal {
    private PairRefusal() {}

    static Reason of(DoseRequest request, Companion companion, CarbonateState before, Optional<Mix> mix) {
        Agent first = request.product().agent();
        Agent second = companion.product().agent();
        String wanted = request.target().words() + " with " + companion.hold().words();
        if (mix.isEmpty()) {
            return new Reason(
                    "two-agents-cannot",
                    wanted + " is no water that can be solved for.",
                    "Aerate first, or hold another value.");
        }
        Agent tooMuch = mix.get().first() < 0 ? first : second;
        double mol = Math.min(mix.get().first(), mix.get().second());
        return new Reason(
                "two-agents-cannot",
                wanted + " would need " + Words.number(-mol * 1e6, 1) + " µmol/kg of " + tooMuch.words()
                        + " taken out of the water, which no dose can: " + first.words() + " and " + second.words()
                        + " cannot do both.",
                lift(request, companion, before));
    }

    private static String lift(DoseRequest request, Companion companion, CarbonateState before) {
        if (companion.hold() instanceof Hold.PhAtMost) {
            return "Allow a pH of at least the present " + Words.number(before.phTotal(), 2)
                    + ", ask for less, or aerate first and measure again.";
        }
        OptionalDouble ofFirst = PairSolver.pco2With(new DosedWater(before, request), request.target());
        OptionalDouble ofSecond = PairSolver.pco2With(
                new DosedWater(before, request, List.of(companion.product()), Mix.OF_FIRST), request.target());
        if (ofFirst.isEmpty() || ofSecond.isEmpty()) {
            return "Hold another pCO2, or aerate to it instead.";
        }
        double low = Math.min(ofFirst.getAsDouble(), ofSecond.getAsDouble());
        double high = Math.max(ofFirst.getAsDouble(), ofSecond.getAsDouble());
        return "Hold a pCO2 between " + Words.number(low * 1e6, 0) + " and " + Words.number(high * 1e6, 0)
                + " µatm, which one or the other alone would give, or aerate to it instead.";
    }
}
