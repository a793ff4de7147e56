package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.List;

/**
 * Whether the fits on which pH and Ω hang hold for a water. The others (bisulfate, hydrogen fluoride, nutrients, density)
 * play a small part and only give a caution.
 */
public final class Coverage {
    private Coverage() {}

    /** A caution for each of K1 and K2, KB, KW, K0 and Ksp that is outside its published range; empty when all hold. */
    public static List<Caution> ofDecisiveFits(Conditions conditions) {
        List<Caution> outside = new ArrayList<>();
        for (FitRange range : List.of(
                conditions.fit().range(), Weiss1974.RANGE, BoricAcid.RANGE, WaterDissociation.RANGE, Mucci1983.RANGE)) {
            range.caution(conditions.temperatureC(), conditions.salinity()).ifPresent(outside::add);
        }
        return List.copyOf(outside);
    }
}
