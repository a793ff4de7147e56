package org.hingeline.dosing;

import java.util.Optional;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.PhScale;

/** What dosed water may leave a site with: typical permits hold pH 6.0 to 9.0, read on NBS buffers. */
final class Discharge {
    private static final double PH_NBS_MAX = 9.0;

    private Discharge() {}

    /** Water that flows on after the dose leaves as it is: above pH 9.0 it must not. */
    static Optional<Reason> refusal(Receiver receiver, CarbonateState after, CarbonateState aerated) {
        double highest = Math.max(nbs(after), nbs(aerated));
        if (!(receiver.injectedPerHour() > 0) || highest <= PH_NBS_MAX) {
            return Optional.empty();
        }
        return Optional.of(new Reason(
                "discharge-ph",
                "The water flows on at pH " + Words.number(highest, 2)
                        + " on the NBS scale; typical discharge permits end at 9.0.",
                "Ask for less, or dose a tank without flow and bring its pH down before the water is let out, as the"
                        + " site's own permit says."));
    }

    private static double nbs(CarbonateState state) {
        return PhScale.NBS.fromTotal(
                state.phTotal(),
                state.conditions().temperatureC(),
                state.conditions().salinity());
    }
}
