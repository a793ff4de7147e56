package org.hingeline.dosing;

import java.util.List;
import java.util.stream.Stream;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.jspecify.annotations.Nullable;

/**
 * What {@link DosePlanner} answers: a suggestion, which a person confirms.
 *
 * @param outcome plan, not needed, or refused
 * @param reasons why it is not needed or was refused; empty for a plan
 * @param products what to weigh or inject in all, one product or two; the range is that of the dose that reaches the
 *     target, from the uncertainty of the water with the constants' share, since the target is a limit; empty unless there
 *     is a plan
 * @param omegaAragoniteGain how far the dose lifts Ω; its range leaves out the constants' share, which moves before and
 *     after alike; null unless there is a plan
 * @param steps the additions; empty unless there is a plan
 * @param before the water now; null when there is none
 * @param after the water when all is mixed in, closed to the air; null unless there is a plan
 * @param afterAeration the dosed water in balance with the air it is aerated with; null unless there is a plan
 * @param ammonia what the dose makes of the ammonia in the water; null unless there is a plan and total ammonia is known
 * @param remedies what needs no chemical, to be considered first
 * @param cautions what to know before acting
 */
public record DosePlan(
        Outcome outcome,
        List<Reason> reasons,
        List<PlannedProduct> products,
        @Nullable Amount omegaAragoniteGain,
        List<DoseStep> steps,
        @Nullable CarbonateState before,
        @Nullable CarbonateState after,
        @Nullable CarbonateState afterAeration,
        @Nullable AmmoniaShift ammonia,
        List<Remedy> remedies,
        List<Caution> cautions) {
    /** What came of the question. */
    public enum Outcome {
        PLAN("plan"),
        NOT_NEEDED("not-needed"),
        REFUSED("refused");

        private final String wireName;

        Outcome(String wireName) {
            this.wireName = wireName;
        }

        /** The name in the wire contract. */
        public String wireName() {
            return wireName;
        }
    }

    public DosePlan {
        reasons = List.copyOf(reasons);
        products = List.copyOf(products);
        steps = List.copyOf(steps);
        remedies = List.copyOf(remedies);
        cautions = List.copyOf(cautions);
        boolean plan = outcome == Outcome.PLAN;
        if (plan != reasons.isEmpty()
                || plan == steps.isEmpty()
                || plan == products.isEmpty()
                || plan != (after != null)) {
            throw new IllegalArgumentException("a plan has products and steps and no reasons, all else has reasons: "
                    + outcome + ", " + reasons + ", " + products + ", " + steps);
        }
    }

    /** What to weigh of the first product in all, g; null unless there is a plan, and where it is injected only. */
    public @Nullable Amount massG() {
        return products.isEmpty() ? null : products.get(0).massG();
    }

    /** The same with one more caution, before the others. */
    public DosePlan withCaution(Caution caution) {
        return new DosePlan(
                outcome,
                reasons,
                products,
                omegaAragoniteGain,
                steps,
                before,
                after,
                afterAeration,
                ammonia,
                remedies,
                Stream.concat(Stream.of(caution), cautions.stream()).toList());
    }

    static DosePlan without(
            Outcome outcome,
            List<Reason> reasons,
            @Nullable CarbonateState before,
            List<Remedy> remedies,
            List<Caution> cautions) {
        return new DosePlan(outcome, reasons, List.of(), null, List.of(), before, null, null, null, remedies, cautions);
    }
}
