package org.hingeline.seawater;

import java.lang.reflect.Field;
import java.util.List;

/** Constants of a water moved off by their uncertainties, for the solver to solve with as if they were the true ones. */
final class PerturbedConstants {
    static final int COUNT = 8;

    private static final List<Field> LOGARITHMIC = List.of(
            field("k0"),
            field("k1"),
            field("k2"),
            field("kb"),
            field("kw"),
            field("kspAragonite"),
            field("kspCalcite"));
    private static final double[] BY = {0.002, 0.0075, 0.015, 0.01, 0.01, 0.02, 0.02};
    private static final Field BORON = field("boron");
    private static final double BORON_BY = 0.02;

    private PerturbedConstants() {}

    /**
     * @param off of K0, K1, K2, KB, KW, Ksp of aragonite and calcite, and total boron, in standard uncertainties of Orr et al.
     *     2018
     */
    static SeawaterConstants of(Conditions c, double[] off) {
        SeawaterConstants fresh = SeawaterConstants.of(c);
        try {
            for (int i = 0; i < BY.length; i++) {
                Field constant = LOGARITHMIC.get(i);
                constant.setDouble(fresh, constant.getDouble(fresh) * Math.pow(10, BY[i] * off[i]));
            }
            BORON.setDouble(fresh, BORON.getDouble(fresh) * (1 + BORON_BY * off[COUNT - 1]));
        } catch (IllegalAccessException e) {
            throw new IllegalStateException(e);
        }
        return fresh;
    }

    private static Field field(String name) {
        try {
            Field field = SeawaterConstants.class.getDeclaredField(name);
            field.setAccessible(true);
            return field;
        } catch (NoSuchFieldException e) {
            throw new IllegalStateException(e);
        }
    }
}
