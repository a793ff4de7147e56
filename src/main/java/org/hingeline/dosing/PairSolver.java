package org.hingeline.dosing;

import java.util.Optional;
import java.util.OptionalDouble;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;

/**
 * How much of two agents brings a water to a given Ω at a given pH or pCO2.
 *
 * <p>Both fix alkalinity and inorganic carbon: at a given pH Ω is proportional to inorganic carbon; at a given pCO2 it
 * goes with 1/[H]². The two differences from the present water are then two linear equations in the mol of the agents.
 * Calcium that an agent brings enters Ω, so the water is solved again with it until it no longer moves.
 */
final class PairSolver {
    private static final int ROUNDS = 60;
    /** Below this an amount is the rounding of the arithmetic, mol/kg-seawater. */
    private static final double NOTHING = 1e-12;

    private final CarbonateState before;
    private final Agent first;
    private final Agent second;

    PairSolver(CarbonateState before, Agent first, Agent second) {
        this.before = before;
        this.first = first;
        this.second = second;
    }

    /** Whether the two add alkalinity and carbon in the same proportion, so that nothing can be held with them. */
    boolean alike() {
        return determinant() == 0;
    }

    /** The amounts, negative ones too; empty when no such water can be. */
    Optional<Mix> solve(double omegaAragonite, Hold hold) {
        Mix mix = new Mix(0, 0);
        for (int i = 0; i < ROUNDS; i++) {
            double calcium = mix.first() * first.calciumPerMol() + mix.second() * second.calciumPerMol();
            Optional<CarbonateState> there = there(calcium, omegaAragonite, hold);
            if (there.isEmpty()) {
                return Optional.empty();
            }
            Mix next = between(there.get());
            if (calciumMoves(mix, next) < NOTHING * 1e-6) {
                return Optional.of(new Mix(rounded(next.first()), rounded(next.second())));
            }
            mix = next;
        }
        return Optional.empty();
    }

    private double calciumMoves(Mix from, Mix to) {
        return Math.abs((to.first() - from.first()) * first.calciumPerMol())
                + Math.abs((to.second() - from.second()) * second.calciumPerMol());
    }

    private Optional<CarbonateState> there(double calcium, double omegaAragonite, Hold hold) {
        Conditions conditions =
                calcium == 0 ? before.conditions() : before.conditions().withCalcium(before.calcium() + calcium);
        if (hold instanceof Hold.PhAtMost ph) {
            return state(CarbonateSystem.solve(conditions, new PhAndDic(ph.phTotalMax(), before.dic())))
                    .flatMap(some -> state(CarbonateSystem.solve(
                            conditions,
                            new PhAndDic(ph.phTotalMax(), before.dic() * omegaAragonite / some.omegaAragonite()))));
        }
        double pco2 = ((Hold.Pco2) hold).pco2Atm();
        return state(CarbonateSystem.solve(conditions, new PhAndPco2(before.phTotal(), pco2)))
                .flatMap(some -> state(CarbonateSystem.solve(
                        conditions,
                        new PhAndPco2(
                                before.phTotal() + Math.log10(omegaAragonite / some.omegaAragonite()) / 2, pco2))));
    }

    private Mix between(CarbonateState there) {
        double alkalinity = there.totalAlkalinity() - before.totalAlkalinity();
        double dic = there.dic() - before.dic();
        return new Mix(
                (alkalinity * second.dicPerMol() - dic * second.alkalinityPerMol()) / determinant(),
                (first.alkalinityPerMol() * dic - first.dicPerMol() * alkalinity) / determinant());
    }

    private double determinant() {
        return first.alkalinityPerMol() * second.dicPerMol() - first.dicPerMol() * second.alkalinityPerMol();
    }

    private static double rounded(double mol) {
        return Math.abs(mol) < NOTHING ? 0 : mol;
    }

    private static Optional<CarbonateState> state(CarbonateResult result) {
        return result instanceof Solved solved ? Optional.of(solved.state()) : Optional.empty();
    }

    /** The pCO2 that the target is reached with by one agent alone, atm, if it is. */
    static OptionalDouble pco2With(DosedWater alone, Target target) {
        OptionalDouble needed = DoseSearch.alkalinityFor(alone, target, target.value());
        return needed.isEmpty()
                ? OptionalDouble.empty()
                : OptionalDouble.of(alone.with(needed.getAsDouble()).pco2Atm());
    }
}
