package org.hingeline.seawater;

import java.util.Optional;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.jspecify.annotations.Nullable;

/** Refuses inputs that no natural water has, not-a-number among them, and most slips of the unit. */
final class InputCheck {
    private static final double PH_MIN = 2;
    private static final double PH_MAX = 12;
    private static final double ALKALINITY_MIN = -0.01;
    private static final double ALKALINITY_MAX = 0.1;
    private static final double DIC_MAX = 0.1;
    private static final double PCO2_MAX_ATM = 1;
    private static final double PHOSPHATE_MAX = 0.001;
    private static final double SILICATE_MAX = 0.01;
    private static final double CALCIUM_MAX = 0.1;

    private InputCheck() {}

    static Optional<Unsolvable> refusal(Conditions conditions, KnownPair known) {
        return composition("phosphate", conditions.phosphate(), PHOSPHATE_MAX)
                .or(() -> composition("silicate", conditions.silicate(), SILICATE_MAX))
                .or(() -> calcium(conditions.calcium()))
                .or(() -> pair(known));
    }

    private static Optional<Unsolvable> calcium(@Nullable Double calcium) {
        return calcium == null ? Optional.empty() : composition("calcium", calcium, CALCIUM_MAX);
    }

    private static Optional<Unsolvable> composition(String name, double value, double max) {
        return within(UnsolvableReason.COMPOSITION_OUT_OF_RANGE, name, value, 0, max, " mol/kg");
    }

    private static Optional<Unsolvable> pair(KnownPair known) {
        if (known instanceof PhAndAlkalinity pair) {
            return within(UnsolvableReason.PH_OUT_OF_RANGE, "pH", pair.ph(), PH_MIN, PH_MAX, "")
                    .or(() -> alkalinity(pair.totalAlkalinity()));
        }
        if (known instanceof AlkalinityAndDic pair) {
            return alkalinity(pair.totalAlkalinity())
                    .or(() -> within(
                            UnsolvableReason.DIC_OUT_OF_RANGE,
                            "dissolved inorganic carbon",
                            pair.dic(),
                            0,
                            DIC_MAX,
                            " mol/kg"));
        }
        AlkalinityAndPco2 pair = (AlkalinityAndPco2) known;
        return alkalinity(pair.totalAlkalinity())
                .or(() -> within(
                        UnsolvableReason.PCO2_OUT_OF_RANGE,
                        "pCO2",
                        pair.pco2Atm(),
                        Double.MIN_NORMAL,
                        PCO2_MAX_ATM,
                        " atm"));
    }

    private static Optional<Unsolvable> alkalinity(double value) {
        return within(
                UnsolvableReason.ALKALINITY_OUT_OF_RANGE,
                "total alkalinity",
                value,
                ALKALINITY_MIN,
                ALKALINITY_MAX,
                " mol/kg");
    }

    private static Optional<Unsolvable> within(
            UnsolvableReason reason, String name, double value, double min, double max, String unit) {
        if (value >= min && value <= max) {
            return Optional.empty();
        }
        String least = min == Double.MIN_NORMAL ? "above 0" : String.valueOf(min);
        return Optional.of(new Unsolvable(
                reason, name + " " + value + unit + " cannot be: " + least + " to " + max + unit + " is accepted"));
    }
}
