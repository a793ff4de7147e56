package org.hingeline.seawater;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.DoubleBinaryOperator;

/** Which published fit gives K1 and K2 of carbonic acid. */
public enum CarbonicAcidFit {
    /** Lueker, Dickson & Keeling 2000: the default for sea water, salinity 19–43, 2–35 °C. */
    LUEKER_2000("lueker2000", Lueker2000.RANGE, PhScale.TOTAL, Lueker2000::pK1, Lueker2000::pK2),
    /** Millero et al. 2006: for estuaries, salinity 1–50, 0–50 °C. */
    MILLERO_2006("millero2006", Millero2006.RANGE, PhScale.SEAWATER, Millero2006::pK1, Millero2006::pK2),
    /** Waters, Millero & Woosley 2014: salinity 1–50, 0–50 °C. */
    WATERS_2014("waters2014", Waters2014.RANGE, PhScale.SEAWATER, Waters2014::pK1, Waters2014::pK2);

    private final String wireName;
    private final FitRange range;
    private final PhScale scale;
    private final DoubleBinaryOperator pK1;
    private final DoubleBinaryOperator pK2;

    CarbonicAcidFit(
            String wireName, FitRange range, PhScale scale, DoubleBinaryOperator pK1, DoubleBinaryOperator pK2) {
        this.wireName = wireName;
        this.range = range;
        this.scale = scale;
        this.pK1 = pK1;
        this.pK2 = pK2;
    }

    /** The name in the wire contract. */
    public String wireName() {
        return wireName;
    }

    /** The fit's name and where it holds. */
    public FitRange range() {
        return range;
    }

    /** The scale the fit was published on. */
    PhScale scale() {
        return scale;
    }

    /** pK1 on {@link #scale()}; t in K, s practical salinity. */
    double pK1(double t, double s) {
        return pK1.applyAsDouble(t, s);
    }

    /** pK2 on {@link #scale()}; t in K, s practical salinity. */
    double pK2(double t, double s) {
        return pK2.applyAsDouble(t, s);
    }

    /** The fit of that wire name, if there is one. */
    public static Optional<CarbonicAcidFit> fromWireName(String name) {
        return Arrays.stream(values()).filter(f -> f.wireName.equals(name)).findFirst();
    }
}
