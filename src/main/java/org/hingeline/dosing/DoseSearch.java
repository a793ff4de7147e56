package org.hingeline.dosing;

import java.util.OptionalDouble;
import java.util.function.DoublePredicate;

/**
 * Finds how much alkalinity a water needs by halving.
 *
 * <p>Along a dose pH moves one way only: at a given pH alkalinity and inorganic carbon lie on a straight line, which the
 * straight line of a dose crosses once at most. It rises towards the pH of the agent's own solution, or, with bicarbonate
 * in most sea water, falls towards it. Ω rises with every agent: where bicarbonate lowers pH, borate and hydroxide give
 * way, and carbonate and CO2 rise together. What has been reached on the way thus stays reached, unless it was at the
 * start and the dose leads away from it.
 */
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

    /** The alkalinity up to which a dose of a water that keeps the bounds goes on keeping them, closed and aerated. */
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
