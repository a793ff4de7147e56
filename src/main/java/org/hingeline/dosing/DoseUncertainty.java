package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.ConstantUncertainty;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.StandardUncertainty;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.seawater.Uncertainty;

/**
 * How sure the outcome of a dose is; the dose itself counts as exact.
 *
 * <p>Compared with a target or a bound, a result carries the constants' share too; comparing before and after leaves it
 * out, since the same constants serve both.
 */
final class DoseUncertainty {
    private final Uncertainty before;
    private final Uncertainty after;

    DoseUncertainty(CarbonateState before, CarbonateState after, InputUncertainty inputs) {
        this.before = Uncertainty.ofMeasured(before, inputs, ConstantUncertainty.ORR_2018);
        this.after = this.before.carriedTo(after);
    }

    /** Of the target's quantity after the dose, to compare with the target: both shares. */
    double afterAgainst(Target target) {
        StateUncertainty u = after.ofState();
        StandardUncertainty ofTarget = target instanceof Target.OmegaAragonite
                ? u.omegaAragonite()
                : target instanceof Target.PhTotal ? u.phTotal() : u.totalAlkalinity();
        return ofTarget.total();
    }

    /** Of the gain in Ω of aragonite by the dose: the inputs' share only. */
    double ofGain() {
        return before.ofChangeTo(after).omegaAragonite().fromInputs();
    }
}
