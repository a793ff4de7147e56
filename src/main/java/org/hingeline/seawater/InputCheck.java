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
    static final double PH_MIN = 2;
    static final double PH_MAX = 13;
    private static final double ALKALINITY_MIN = -0.01;
    private static final double ALKALINITY_MAX = 0.1;
    private static final double DIC_MAX = 0.1;
    private static final double PCO2_MAX_ATM = 1;
    private static final double PHOSPHATE_MAX = 0.001;
    private static final double SILICATE_MAX = 0.01;
    private static final double CALCIUM_MAX = 0.1;

    private InputCheck() {}

    /** The first thing that cannot be; null when all can. */
    static @Nullable Unsolvable refusal(Conditions conditions, KnownPair known) {
        Unsolvable refusal = composition("phosphate", conditions.phosphate(), PHOSPHATE_MAX);
        if (refusal == null) {
            refusal = composition("silicate", conditions.silicate(), SILICATE_MAX);
        }
        Double calcium = conditions.calcium();
        if (refusal == null && calcium != null) {
            refusal = composition("calcium", calcium, CALCIUM_MAX);
        }
        return refusal == null ? pair(known) : refusal;
    }

    private static @Nullable Unsolvable pair(KnownPair known) {
        if (known instanceof PhAndAlkalinity pair) {
            return first(ph(pair.ph()), alkalinity(pair.totalAlkalinity()));
        }
        if (known instanceof PhAndDic pair) {
            return first(ph(pair.ph()), dic(pair.dic()));
        }
        if (known instanceof PhAndPco2 pair) {
            return first(ph(pair.ph()), pco2(pair.pco2Atm()));
        }
        if (known instanceof AlkalinityAndDic pair) {
            return first(alkalinity(pair.totalAlkalinity()), dic(pair.dic()));
        }
        if (known instanceof AlkalinityAndPco2 pair) {
            return first(alkalinity(pair.totalAlkalinity()), pco2(pair.pco2Atm()));
        }
        DicAndPco2 pair = (DicAndPco2) known;
        return first(dic(pair.dic()), pco2(pair.pco2Atm()));
    }

    private static @Nullable Unsolvable first(@Nullable Unsolvable one, @Nullable Unsolvable other) {
        return one == null ? other : one;
    }

    private static @Nullable Unsolvable composition(String name, double value, double max) {
        return within(UnsolvableReason.COMPOSITION_OUT_OF_RANGE, name, value, 0, max, " mol/kg");
    }

    private static @Nullable Unsolvable ph(KnownPh ph) {
        return within(UnsolvableReason.PH_OUT_OF_RANGE, "pH", ph.value(), PH_MIN, PH_MAX, "");
    }

    private static @Nullable Unsolvable alkalinity(double value) {
        return within(
                UnsolvableReason.ALKALINITY_OUT_OF_RANGE,
                "total alkalinity",
                value,
                ALKALINITY_MIN,
                ALKALINITY_MAX,
                " mol/kg");
    }

    private static @Nullable Unsolvable dic(double value) {
        return within(UnsolvableReason.DIC_OUT_OF_RANGE, "dissolved inorganic carbon", value, 0, DIC_MAX, " mol/kg");
    }

    private static @Nullable Unsolvable pco2(double value) {
        return within(UnsolvableReason.PCO2_OUT_OF_RANGE, "pCO2", value, Double.MIN_NORMAL, PCO2_MAX_ATM, " atm");
    }

    private static @Nullable Unsolvable within(
            UnsolvableReason reason, String name, double value, double min, double max, String unit) {
        if (value >= min && value <= max) {
            return null;
        }
        String least = min == Double.MIN_NORMAL ? "above 0" : String.valueOf(min);
        return new Unsolvable(
                reason, name + " " + value + unit + " cannot be: " + least + " to " + max + unit + " is accepted");
    }
}
