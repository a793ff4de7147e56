package org.hingeline.seawater;

import static org.hingeline.seawater.HighPrecision.ln;
import static org.hingeline.seawater.HighPrecision.num;
import static org.hingeline.seawater.HighPrecision.over;
import static org.hingeline.seawater.HighPrecision.sqrt;
import static org.hingeline.seawater.HighPrecision.sum;
import static org.hingeline.seawater.HighPrecision.tenTo;
import static org.hingeline.seawater.HighPrecision.times;

import java.math.BigDecimal;

/**
 * K1 and K2 of carbonic acid, written a second time from the publications to 34 digits.
 *
 * @param onSeawaterScale whether on that scale, or else on the total scale
 */
record IndependentCarbonicAcid(BigDecimal k1, BigDecimal k2, boolean onSeawaterScale) {
    /** t in K, s practical salinity. */
    static IndependentCarbonicAcid of(CarbonicAcidFit fit, BigDecimal t, BigDecimal s) {
        return switch (fit) {
            case LUEKER_2000 -> lueker(t, s);
            case MILLERO_2006 ->
                estuarine(
                        t,
                        s,
                        new String[] {"13.4191", "0.0331", "-0.0000533", "-530.123", "-6.103", "-2.0695"},
                        new String[] {"21.0894", "0.1248", "-0.0003687", "-772.483", "-20.051", "-3.3336"});
            case WATERS_2014 ->
                estuarine(
                        t,
                        s,
                        new String[] {"13.40916", "0.031646", "-0.000051895", "-531.3642", "-5.713", "-2.0669166"},
                        new String[] {"21.22589", "0.1245087", "-0.00037243", "-779.3444", "-19.91739", "-3.3534679"});
        };
    }

    private static IndependentCarbonicAcid lueker(BigDecimal t, BigDecimal s) {
        BigDecimal lnT = ln(t);
        BigDecimal pK1 = sum(
                over(num("3633.86"), t),
                num("-61.2172"),
                times(num("9.67770"), lnT),
                times(num("-0.011555"), s),
                times(num("0.0001152"), s, s));
        BigDecimal pK2 = sum(
                over(num("471.78"), t),
                num("25.9290"),
                times(num("-3.16967"), lnT),
                times(num("-0.01781"), s),
                times(num("0.0001122"), s, s));
        return new IndependentCarbonicAcid(tenTo(pK1.negate()), tenTo(pK2.negate()), false);
    }

    private static IndependentCarbonicAcid estuarine(BigDecimal t, BigDecimal s, String[] first, String[] second) {
        BigDecimal lnT = ln(t);
        BigDecimal pK1 =
                sum(num("-126.34048"), over(num("6320.813"), t), times(num("19.568224"), lnT), salt(t, lnT, s, first));
        BigDecimal pK2 =
                sum(num("-90.18333"), over(num("5143.692"), t), times(num("14.613358"), lnT), salt(t, lnT, s, second));
        return new IndependentCarbonicAcid(tenTo(pK1.negate()), tenTo(pK2.negate()), true);
    }

    /** a0 S^0.5 + a1 S + a2 S² + (a3 S^0.5 + a4 S)/T + a5 S^0.5 ln T. */
    private static BigDecimal salt(BigDecimal t, BigDecimal lnT, BigDecimal s, String[] a) {
        BigDecimal root = sqrt(s);
        return sum(
                times(num(a[0]), root),
                times(num(a[1]), s),
                times(num(a[2]), s, s),
                over(sum(times(num(a[3]), root), times(num(a[4]), s)), t),
                times(num(a[5]), root, lnT));
    }
}
