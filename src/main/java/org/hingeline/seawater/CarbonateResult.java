package org.hingeline.seawater;

import java.util.Objects;
import java.util.function.Function;

/** What solving a water gives: its state, or why there is none. */
public sealed interface CarbonateResult {
    /** The water was solved. */
    record Solved(CarbonateState state) implements CarbonateResult {
        public Solved {
            Objects.requireNonNull(state, "state");
        }
    }

    /**
     * The water could not be solved.
     *
     * @param reason why, for programs
     * @param detail why, for people, with the value that was given
     */
    record Unsolvable(UnsolvableReason reason, String detail) implements CarbonateResult {
        public Unsolvable {
            Objects.requireNonNull(reason, "reason");
            Objects.requireNonNull(detail, "detail");
        }
    }

    /** What follows from the state, or the same refusal. */
    default CarbonateResult then(Function<CarbonateState, CarbonateResult> next) {
        return this instanceof Solved solved ? next.apply(solved.state()) : this;
    }

    /**
     * The state, for callers whose inputs are known to be good.
     *
     * @throws IllegalStateException with the refusal's words when there is none
     */
    default CarbonateState orElseThrow() {
        if (this instanceof Solved solved) {
            return solved.state();
        }
        Unsolvable refusal = (Unsolvable) this;
        throw new IllegalStateException(refusal.reason().code() + ": " + refusal.detail());
    }
}
