package org.hingeline.seawater;

import java.util.function.BiConsumer;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/** The waters that are gone through: salinity 5–40, 0–35 °C, pH 6.8–9, alkalinity 800–3000 µmol/kg. */
final class Grid {
    private static final double[] SALINITY = {5, 12, 20, 27, 34, 40};
    private static final double[] TEMPERATURE_C = {0, 8, 15, 22, 29, 35};
    private static final double[] PH = {6.8, 7.3, 7.7, 8.1, 8.5, 9.0};
    private static final double[] ALKALINITY = {800e-6, 1500e-6, 2300e-6, 3000e-6};

    private Grid() {}

    static void forEach(double phosphate, double silicate, BiConsumer<Conditions, PhAndAlkalinity> water) {
        for (double s : SALINITY) {
            for (double t : TEMPERATURE_C) {
                Conditions conditions = Conditions.of(t, s).withNutrients(phosphate, silicate);
                for (double ph : PH) {
                    for (double ta : ALKALINITY) {
                        water.accept(conditions, new PhAndAlkalinity(ph, ta));
                    }
                }
            }
        }
    }
}
