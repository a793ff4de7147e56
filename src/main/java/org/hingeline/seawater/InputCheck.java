package org.hingeline.seawater;

import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.jspecify.annotations.Nullable;

/** Refuses inputs that no natural water has, not-a-number among them, and most slips of the unit. */
final class InputCheck {
    private static final double PH_MIN = 2;
    private static final double PH_MAX = 13;
    private static final double ALKALINITY_MIN = -0.01;
    private static final double ALKALINITY_MAX = 0.1;
    private static final double DIC_MAX = 0.1;
    private static final double PCO2_MAX_ATM = 1;
    private static final double PHOSPHATE_MAX = 0.001;
    private static final double SILICATE_MAX = 0.01;
    private static final double CALCIUM_MAX = 0.1;

    private @Nullable Unsolvable refusal;

    private InputCheck() {}

    /** The first thing that cannot be; null when all can. */
    static @Nullable Unsolvable refusal(Conditions conditions, KnownPair known) {
        InputCheck check = new InputCheck();
        check.composition("phosphate", conditions.phosphate(), PHOSPHATE_MAX);
        check.composition("silicate", conditions.silicate(), SILICATE_MAX);
        Double calcium = conditions.calcium();
        if (calcium != null) {
            check.composition("calcium", calcium, CALCIUM_MAX);
        }
        check.pair(known);
        return check.refusal;
    }

    private void pair(KnownPair known) {
        if (known instanceof PhAndAlkalinity pair) {
            ph(pair.ph());
            alkalinity(pair.totalAlkalinity());
        } else if (known instanceof PhAndDic pair) {
            ph(pair.ph());
            dic(pair.dic());
        } else if (known instanceof PhAndPco2 pair) {
            ph(pair.ph());
            pco2(pair.pco2Atm());
        } else if (known instanceof AlkalinityAndDic pair) {
            alkalinity(pair.totalAlkalinity());
            dic(pair.dic());
        } else if (known instanceof AlkalinityAndPco2 pair) {
            alkalinity(pair.totalAlkalinity());
            pco2(pair.pco2Atm());
        } else if (known instanceof DicAndPco2 pair) {
            dic(pair.dic());
            pco2(pair.pco2Atm());
        }
    }

    private void composition(String name, double value, double max) {
        require(UnsolvableReason.COMPOSITION_OUT_OF_RANGE, name, value, 0, max, " mol/kg");
    }

    private void ph(KnownPh ph) {
        require(UnsolvableReason.PH_OUT_OF_RANGE, "pH", ph.value(), PH_MIN, PH_MAX, "");
    }

    private void alkalinity(double value) {
        require(
                UnsolvableReason.ALKALINITY_OUT_OF_RANGE,
                "total alkalinity",
                value,
                ALKALINITY_MIN,
                ALKALINITY_MAX,
                " mol/kg");
    }

    private void dic(double value) {
        require(UnsolvableReason.DIC_OUT_OF_RANGE, "dissolved inorganic carbon", value, 0, DIC_MAX, " mol/kg");
    }

    private void pco2(double value) {
        require(UnsolvableReason.PCO2_OUT_OF_RANGE, "pCO2", value, Double.MIN_NORMAL, PCO2_MAX_ATM, " atm");
    }

    private void require(UnsolvableReason reason, String name, double value, double min, double max, String unit) {
        if (refusal == null && !(value >= min && value <= max)) {
            String least = min == Double.MIN_NORMAL ? "above 0" : String.valueOf(min);
            refusal = new Unsolvable(
                    reason, name + " " + value + unit + " cannot be: " + least + " to " + max + unit + " is accepted");
        }
    }
}
