package org.hingeline.dosing;

import java.util.OptionalDouble;
import java.util.function.DoublePredicate;

/** Finds how much alkalinity a water needs by halving, for agents that raise what is aimed at all the way. */
final class DoseSearch {
    /** More than any plan within {@link Bounds} can need, mol/kg-seawater. */
    static final double ALKALINITY_MAX = 0.02;

    private static final int HALVINGS = 60;

    private DoseSearch() {}

    /** The alkalinity to add to reach a number of the target's quantity, mol/kg-seawater; empty when out of reach. */
    static OptionalDouble alkalinityFor(DosedWater water, Target target, double value) {
        if (target.of(water.before()) >= value) {
            return OptionalDouble.of(0);
        }
        return first(added -> target.of(water.with(added)) >= value);
    }

    /** The alkalinity up to which a dose keeps the bounds, closed and aerated, mol/kg-seawater; 0 when none does. */
    static double alkalinityWithin(DosedWater water, Bounds bounds) {
        return first(added -> !bounds.hold(water.with(added)) || !bounds.hold(water.aeratedWith(added)))
                .orElse(ALKALINITY_MAX);
    }

    /** Where a condition that stays true once it is true begins to be. */
    private static OptionalDouble first(DoublePredicate reached) {
        if (!reached.test(ALKALINITY_MAX)) {
            return OptionalDouble.empty();
        }
        double low = 0;
        double high = ALKALINITY_MAX;
        for (int i = 0; i < HALVINGS; i++) {
            double middle = (low + high) / 2;
            if (reached.test(middle)) {
                high = middle;
            } else {
                low = middle;
            }
        }
        return OptionalDouble.of(low);
    }
}
