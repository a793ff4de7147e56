package org.hingeline.seawater;

import java.util.List;
import java.util.Objects;

/** One computed number with its cautions, or the reason why there is none. */
public sealed interface Figure {
    /**
     * The number.
     *
     * @param value in the unit that the method giving it names
     * @param cautions what to know before relying on it; empty when all fits hold
     */
    record Known(double value, List<Caution> cautions) implements Figure {
        public Known {
            if (!Double.isFinite(value)) {
                throw new IllegalArgumentException("a known figure must be a finite number, got " + value);
            }
            cautions = List.copyOf(cautions);
        }
    }

    /**
     * There is no number.
     *
     * @param code why, for programs: lower-case words joined by hyphens
     * @param detail why, for people, with the value that was given
     */
    record Refused(String code, String detail) implements Figure {
        public Refused {
            Objects.requireNonNull(code, "code");
            Objects.requireNonNull(detail, "detail");
        }
    }

    /**
     * The number, for callers whose inputs are known to be good.
     *
     * @throws IllegalStateException with the refusal's words when there is none
     */
    default double orElseThrow() {
        if (this instanceof Known known) {
            return known.value();
        }
        Refused refusal = (Refused) this;
        throw new IllegalStateException(refusal.code() + ": " + refusal.detail());
    }
}
