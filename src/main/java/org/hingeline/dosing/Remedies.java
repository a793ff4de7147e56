package org.hingeline.dosing;

import java.util.List;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Treatment;

/** What helps without a chemical. */
final class Remedies {
    private Remedies() {}

    /** Aeration, when the water holds more CO2 than the air it would be aerated with. */
    static List<Remedy> of(CarbonateState before, Target target, double aerationPco2Atm) {
        if (!(before.pco2Atm() > aerationPco2Atm)
                || !(Treatment.equilibrated(before, aerationPco2Atm) instanceof Solved solved)) {
            return List.of();
        }
        CarbonateState aerated = solved.state();
        boolean reaches = target.of(aerated) >= target.value();
        String detail = "Aeration to " + Words.number(aerationPco2Atm * 1e6, 0)
                + " µatm alone brings the water from Ω aragonite " + Words.number(before.omegaAragonite(), 2) + ", pH "
                + Words.number(before.phTotal(), 2) + " to Ω aragonite " + Words.number(aerated.omegaAragonite(), 2)
                + ", pH " + Words.number(aerated.phTotal(), 2)
                + (reaches
                        ? ": the target is reached without a chemical."
                        : ": short of the target, yet less to dose.");
        return List.of(new Remedy("aerate", detail, aerated, reaches));
    }
}
