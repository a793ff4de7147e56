package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.StateUncertainty;
import org.jspecify.annotations.Nullable;

/**
 * Something to do that needs no chemical.
 *
 * @param code a stable name for programs
 * @param detail a sentence for people
 * @param needs what it takes
 * @param fromPoint code of the point whose water it draws on; null when none
 * @param massShare share of that water in the mixture, 0 to 1; null when nothing is mixed
 * @param reaches the water it leads to; null where it cannot work
 * @param uncertainty standard uncertainties of that water; null where it cannot work
 * @param reachesTarget whether that water is at the target or better
 * @param whyNot why it cannot work, or falls short; null when it reaches the target
 */
public record Remedy(
        String code,
        String detail,
        String needs,
        @Nullable String fromPoint,
        @Nullable Double massShare,
        @Nullable CarbonateState reaches,
        @Nullable StateUncertainty uncertainty,
        boolean reachesTarget,
        @Nullable String whyNot) {
    public Remedy {
        if (reachesTarget && reaches == null || reachesTarget != (whyNot == null)) {
            throw new IllegalArgumentException(
                    "a remedy reaches the target with a water, or says why not: " + code + ", " + whyNot);
        }
    }

    static Remedy cannot(String code, String needs, String whyNot) {
        return new Remedy(code, whyNot, needs, null, null, null, null, false, whyNot);
    }

    /** One that leads to a water; the sentence ends with how good that is. */
    static Remedy to(
            String code,
            String doing,
            String needs,
            @Nullable OtherWater from,
            @Nullable Double massShare,
            CarbonateState reaches,
            StateUncertainty uncertainty,
            Target target) {
        boolean reached = target.of(reaches) >= target.value();
        String detail = doing + " Ω aragonite " + Words.number(reaches.omegaAragonite(), 2) + " (±"
                + Words.number(uncertainty.omegaAragonite().total(), 2) + "), pH "
                + Words.number(reaches.phTotal(), 2)
                + (reached ? ": the target is reached without a chemical." : ": short of the target.");
        return new Remedy(
                code,
                detail,
                needs,
                from == null ? null : from.code(),
                massShare,
                reaches,
                uncertainty,
                reached,
                reached ? null : "It falls short of " + target.words() + ".");
    }
}
