package org.hingeline.monitor;

import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.UnsolvableReason;
import org.jspecify.annotations.Nullable;

/**
 * A wished water in the core's units, each of its fields in its range.
 *
 * @param cautions about its salinity, when that comes from conductivity
 */
record WishedWater(
        WaterWish wish,
        Conditions conditions,
        KnownPair known,
        InputUncertainty uncertainty,
        boolean salinityFromConductivity,
        List<Caution> cautions) {

    /** The state, or why there is none; the reason is told to the faults in the units and names of the wish. */
    CarbonateResult solve(WaterFaults faults) {
        CarbonateResult result = CarbonateSystem.solve(conditions, known);
        if (result instanceof Unsolvable refusal) {
            tell(refusal.reason(), faults);
        }
        return result;
    }

    private void tell(UnsolvableReason reason, WaterFaults faults) {
        if (reason == UnsolvableReason.INPUTS_CONTRADICT && known instanceof PhAndAlkalinity) {
            String ph = given(faults, "ph", wish.ph());
            String alkalinity = given(faults, "totalAlkalinityUmolKg", wish.totalAlkalinityUmolKg());
            faults.addImpossible(
                    reason,
                    "ph",
                    ph + " and " + alkalinity + " contradict each other: borate, hydroxide and nutrients alone would"
                            + " exceed the alkalinity; a lower ph is accepted");
            faults.addImpossible(
                    reason,
                    "totalAlkalinityUmolKg",
                    alkalinity + " is too low for " + ph + ": a higher one is accepted");
        } else if (reason == UnsolvableReason.INPUTS_CONTRADICT && known instanceof DicAndPco2 pair) {
            tellOfCo2(pair, faults);
        } else if (reason == UnsolvableReason.TOO_MUCH_CARBON) {
            faults.addImpossible(
                    reason,
                    "",
                    given(faults) + " would need more inorganic carbon than any water holds: at most 1000000 µmol/kg is"
                            + " accepted");
        } else {
            faults.addImpossible(
                    reason, "", "no state was found for this water (" + reason.code() + "): " + given(faults));
        }
    }

    /** A mole of CO2 in a kilogram of water needs more than an atmosphere, so the two are told apart by their size. */
    private void tellOfCo2(DicAndPco2 pair, WaterFaults faults) {
        String dic = given(faults, "dicUmolKg", wish.dicUmolKg());
        String pco2 = given(faults, "pco2Uatm", wish.pco2Uatm());
        boolean tooMuch = pair.pco2Atm() > pair.dic();
        faults.addImpossible(
                UnsolvableReason.INPUTS_CONTRADICT,
                "dicUmolKg",
                dic + " and " + pco2 + " contradict each other: "
                        + (tooMuch
                                ? "dissolved CO2 alone would exceed the inorganic carbon; a higher dicUmolKg is accepted"
                                : "with so little CO2 the water would be above pH 14; a lower dicUmolKg is accepted"));
        faults.addImpossible(
                UnsolvableReason.INPUTS_CONTRADICT,
                "pco2Uatm",
                pco2
                        + (tooMuch ? " is too high for " : " is too low for ")
                        + dic
                        + (tooMuch ? ": a lower one is accepted" : ": a higher one is accepted"));
    }

    /** The two that are known, with their values. */
    private String given(WaterFaults faults) {
        return Stream.of(
                        given(faults, "ph", wish.ph()),
                        given(faults, "totalAlkalinityUmolKg", wish.totalAlkalinityUmolKg()),
                        given(faults, "dicUmolKg", wish.dicUmolKg()),
                        given(faults, "pco2Uatm", wish.pco2Uatm()))
                .filter(each -> !each.isEmpty())
                .collect(Collectors.joining(" and "));
    }

    private static String given(WaterFaults faults, String name, @Nullable Double value) {
        return value == null ? "" : faults.at(name) + " " + WaterFaults.plain(value);
    }
}
