package org.hingeline.dosing;

import java.util.List;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;

/**
 * Suggests a dose, or says why there is none.
 *
 * <p>A plan keeps its {@link Bounds} at every step, closed to the air and also once the dosed water has been aerated:
 * water rich in CO2 that is dosed to a target overshoots it when the CO2 leaves. The mass is rounded to what a balance can
 * weigh, to the nearest unit, and down where the nearest would cross a bound.
 *
 * <p>The range of the mass is that of the dose that reaches the target, given one standard uncertainty of the water, the
 * constants' share included, since a target is compared with an absolute limit; its upper end stays within the bounds.
 * The gain in Ω compares before with after and leaves the constants' share out.
 */
public final class DosePlanner {
    private DosePlanner() {}

    /** A plan, "not needed", or a refusal with its reasons; never throws for a bad number. */
    public static DosePlan plan(DoseRequest request) {
        List<Reason> reasons = RequestCheck.reasons(request);
        if (!(request.water() instanceof Solved solved)) {
            return DosePlan.without(Outcome.REFUSED, reasons, null, List.of(), List.of());
        }
        CarbonateState before = solved.state();
        if (!reasons.isEmpty()) {
            boolean sound = request.inputNotes().isEmpty() && Refusals.aboutTheDoseOnly(reasons);
            List<Remedy> remedies = sound ? remedies(request, before) : List.of();
            return DosePlan.without(Outcome.REFUSED, reasons, before, remedies, before.cautions());
        }
        if (request.target().of(before) >= request.target().value()) {
            return DosePlan.without(
                    Outcome.NOT_NEEDED,
                    List.of(Refusals.notNeeded(request, before)),
                    before,
                    List.of(),
                    before.cautions());
        }
        return new SoundRequest(request, before).plan();
    }

    static List<Remedy> remedies(DoseRequest request, CarbonateState before) {
        return Remedies.of(request, before);
    }
}
