package org.hingeline.seawater;

import static org.hingeline.seawater.HighPrecision.exp;
import static org.hingeline.seawater.HighPrecision.ln;
import static org.hingeline.seawater.HighPrecision.log10;
import static org.hingeline.seawater.HighPrecision.num;
import static org.hingeline.seawater.HighPrecision.over;
import static org.hingeline.seawater.HighPrecision.sqrt;
import static org.hingeline.seawater.HighPrecision.sum;
import static org.hingeline.seawater.HighPrecision.tenTo;
import static org.hingeline.seawater.HighPrecision.times;

import java.math.BigDecimal;
import java.util.function.UnaryOperator;

/**
 * The same equilibria written a second time from the publications, to 34 digits, and solved by bisection. It shares no line
 * with the product, so agreement speaks for both.
 */
final class IndependentWater {
    private static final BigDecimal[] STEPS = steps();

    private final BigDecimal k0;
    private final BigDecimal fugacity;
    private final BigDecimal k1;
    private final BigDecimal k2;
    private final BigDecimal kb;
    private final BigDecimal kw;
    private final BigDecimal kf;
    private final BigDecimal ks;
    private final BigDecimal kp1;
    private final BigDecimal kp2;
    private final BigDecimal kp3;
    private final BigDecimal ksi;
    private final BigDecimal kspAragonite;
    private final BigDecimal kspCalcite;
    private final BigDecimal totalOverFree;
    private final BigDecimal seawaterOverFree;
    private final BigDecimal electrode;
    private final BigDecimal boron;
    private final BigDecimal sulfate;
    private final BigDecimal fluoride;
    private final BigDecimal calcium;
    private final BigDecimal phosphate;
    private final BigDecimal silicate;

    IndependentWater(Conditions c) {
        BigDecimal t = num(c.temperatureC()).add(num("273.15"));
        BigDecimal s = num(c.salinity());
        BigDecimal rs = sqrt(s);
        BigDecimal lnT = ln(t);
        BigDecimal cl = over(s, num("1.80655"));
        String boronPerChlorinity = c.boron() == BoronRatio.LEE_2010 ? "0.0002414" : "0.000232";
        boron = over(times(num(boronPerChlorinity), cl), num("10.811"));
        sulfate = over(times(num("0.14"), cl), num("96.062"));
        fluoride = over(times(num("0.000067"), cl), num("18.998"));
        Double measured = c.calcium();
        calcium = measured == null ? over(times(num("0.02128"), cl), num("40.087")) : num(measured);
        phosphate = num(c.phosphate());
        silicate = num(c.silicate());

        BigDecimal t100 = over(t, num("100"));
        k0 = exp(sum(
                num("-60.2409"),
                over(num("93.4517"), t100),
                times(num("23.3585"), ln(t100)),
                times(s, num("0.023517")),
                times(s, num("-0.023656"), t100),
                times(s, num("0.0047036"), t100, t100)));
        BigDecimal virial = sum(
                num("-1636.75"),
                times(num("12.0408"), t),
                times(num("-0.0327957"), t, t),
                times(num("0.0000316528"), t, t, t));
        BigDecimal cross = sum(num("57.7"), times(num("-0.118"), t));
        fugacity = exp(over(sum(virial, cross, cross), times(num("82.05736"), t)));

        kb = exp(sum(
                over(
                        sum(
                                num("-8966.90"),
                                times(num("-2890.53"), rs),
                                times(num("-77.942"), s),
                                times(num("1.728"), s, rs),
                                times(num("-0.0996"), s, s)),
                        t),
                num("148.0248"),
                times(num("137.1942"), rs),
                times(num("1.62142"), s),
                times(sum(num("-24.4344"), times(num("-25.085"), rs), times(num("-0.2474"), s)), lnT),
                times(num("0.053105"), rs, t)));
        kw = exp(sum(
                over(num("-13847.26"), t),
                num("148.9652"),
                times(num("-23.6521"), lnT),
                times(sum(over(num("118.67"), t), num("-5.977"), times(num("1.0495"), lnT)), rs),
                times(num("-0.01615"), s)));
        kf = exp(sum(over(num("874"), t), num("-9.68"), times(num("0.111"), rs)));

        BigDecimal i = over(times(num("19.924"), s), sum(num("1000"), times(num("-1.005"), s)));
        BigDecimal ri = sqrt(i);
        BigDecimal perKgSeawater = ln(sum(BigDecimal.ONE, times(num("-0.001005"), s)));
        ks = exp(sum(
                over(num("-4276.1"), t),
                num("141.328"),
                times(num("-23.093"), lnT),
                times(sum(over(num("-13856"), t), num("324.57"), times(num("-47.986"), lnT)), ri),
                times(sum(over(num("35474"), t), num("-771.54"), times(num("114.723"), lnT)), i),
                times(over(num("-2698"), t), i, ri),
                times(over(num("1776"), t), i, i),
                perKgSeawater));
        totalOverFree = sum(BigDecimal.ONE, over(sulfate, ks));
        seawaterOverFree = sum(totalOverFree, over(fluoride, over(kf, totalOverFree)));
        electrode = sum(
                num("1.2948"),
                times(num("-0.002036"), t),
                times(num("0.0004607"), s, s),
                times(num("-0.000001475"), t, s, s));
        IndependentCarbonicAcid acid = IndependentCarbonicAcid.of(c.fit(), t, s);
        BigDecimal toTotal = acid.onSeawaterScale() ? over(totalOverFree, seawaterOverFree) : BigDecimal.ONE;
        k1 = times(acid.k1(), toTotal);
        k2 = times(acid.k2(), toTotal);
        ksi = exp(sum(
                over(num("-8904.2"), t),
                num("117.385"),
                times(num("-19.334"), lnT),
                times(sum(over(num("-458.79"), t), num("3.5913")), ri),
                times(sum(over(num("188.74"), t), num("-1.5998")), i),
                times(sum(over(num("-12.1652"), t), num("0.07871")), i, i),
                perKgSeawater));
        kp1 = exp(sum(
                over(num("-4576.752"), t),
                num("115.525"),
                times(num("-18.453"), lnT),
                times(sum(over(num("-106.736"), t), num("0.69171")), rs),
                times(sum(over(num("-0.65643"), t), num("-0.01844")), s)));
        kp2 = exp(sum(
                over(num("-8814.715"), t),
                num("172.0883"),
                times(num("-27.927"), lnT),
                times(sum(over(num("-160.340"), t), num("1.3566")), rs),
                times(sum(over(num("0.37335"), t), num("-0.05778")), s)));
        kp3 = exp(sum(
                over(num("-3070.75"), t),
                num("-18.141"),
                times(sum(over(num("17.27039"), t), num("2.81197")), rs),
                times(sum(over(num("-44.99486"), t), num("-0.09984")), s)));
        BigDecimal mucci = sum(times(num("-0.077993"), t), times(num("71.595"), log10(t)));
        kspAragonite = tenTo(sum(
                num("-171.945"),
                mucci,
                over(num("2903.293"), t),
                times(sum(num("-0.068393"), times(num("0.0017276"), t), over(num("88.135"), t)), rs),
                times(num("-0.10018"), s),
                times(num("0.0059415"), s, rs)));
        kspCalcite = tenTo(sum(
                num("-171.9065"),
                mucci,
                over(num("2839.319"), t),
                times(sum(num("-0.77712"), times(num("0.0028426"), t), over(num("178.34"), t)), rs),
                times(num("-0.07711"), s),
                times(num("0.0041249"), s, rs)));
    }

    /** [H] on the total scale of a pH on another. */
    BigDecimal hydrogenIon(double ph, PhScale scale) {
        BigDecimal h = tenTo(num(ph).negate());
        return switch (scale) {
            case TOTAL -> h;
            case FREE -> times(h, totalOverFree);
            case SEAWATER -> over(times(h, totalOverFree), seawaterOverFree);
            case NBS -> over(times(over(h, electrode), totalOverFree), seawaterOverFree);
        };
    }

    /** pH on a scale of [H] on the total scale. */
    BigDecimal ph(BigDecimal h, PhScale scale) {
        BigDecimal free = over(h, totalOverFree);
        BigDecimal seawater = times(free, seawaterOverFree);
        return log10(
                        switch (scale) {
                            case TOTAL -> h;
                            case FREE -> free;
                            case SEAWATER -> seawater;
                            case NBS -> times(seawater, electrode);
                        })
                .negate();
    }

    private BigDecimal withoutCarbonate(BigDecimal h) {
        BigDecimal free = over(h, totalOverFree);
        BigDecimal h2 = times(h, h);
        BigDecimal h3 = times(h2, h);
        BigDecimal p12 = times(kp1, kp2);
        BigDecimal p123 = times(p12, kp3);
        BigDecimal phosphoric = over(
                times(phosphate, sum(times(p12, h), p123, p123, h3.negate())),
                sum(h3, times(kp1, h2), times(p12, h), p123));
        return sum(
                over(boron, sum(BigDecimal.ONE, over(h, kb))),
                over(kw, h),
                phosphoric,
                over(silicate, sum(BigDecimal.ONE, over(h, ksi))),
                free.negate(),
                over(sulfate, sum(BigDecimal.ONE, over(ks, free))).negate(),
                over(fluoride, sum(BigDecimal.ONE, over(kf, h))).negate());
    }

    /** Inorganic carbon from [H] and alkalinity. */
    BigDecimal dic(BigDecimal h, BigDecimal totalAlkalinity) {
        BigDecimal carbonateAlkalinity = totalAlkalinity.subtract(withoutCarbonate(h));
        return over(times(carbonateAlkalinity, carbonSum(h)), sum(times(k1, h), times(num("2"), k1, k2)));
    }

    private BigDecimal carbonSum(BigDecimal h) {
        return sum(times(h, h), times(k1, h), times(k1, k2));
    }

    BigDecimal co2(BigDecimal h, BigDecimal dic) {
        return over(times(dic, h, h), carbonSum(h));
    }

    BigDecimal bicarbonate(BigDecimal h, BigDecimal dic) {
        return over(times(dic, k1, h), carbonSum(h));
    }

    BigDecimal carbonate(BigDecimal h, BigDecimal dic) {
        return over(times(dic, k1, k2), carbonSum(h));
    }

    BigDecimal pco2(BigDecimal h, BigDecimal dic) {
        return over(co2(h, dic), times(k0, fugacity));
    }

    BigDecimal omegaAragonite(BigDecimal h, BigDecimal dic) {
        return over(times(carbonate(h, dic), calcium), kspAragonite);
    }

    BigDecimal omegaCalcite(BigDecimal h, BigDecimal dic) {
        return over(times(carbonate(h, dic), calcium), kspCalcite);
    }

    BigDecimal totalAlkalinity(BigDecimal h, BigDecimal dic) {
        BigDecimal carbonate = carbonate(h, dic);
        return sum(bicarbonate(h, dic), carbonate, carbonate, withoutCarbonate(h));
    }

    BigDecimal fco2(BigDecimal h, BigDecimal dic) {
        return over(co2(h, dic), k0);
    }

    /** Inorganic carbon from [H] and pCO2 in atm. */
    BigDecimal dicOfPco2(BigDecimal h, double pco2) {
        BigDecimal co2 = times(num(pco2), k0, fugacity);
        BigDecimal bicarbonate = over(times(co2, k1), h);
        return sum(co2, bicarbonate, over(times(bicarbonate, k2), h));
    }

    /** [H] from alkalinity and inorganic carbon. */
    BigDecimal hFromDic(BigDecimal totalAlkalinity, BigDecimal dic) {
        return bisect(h -> totalAlkalinity(h, dic).subtract(totalAlkalinity));
    }

    /** [H] from alkalinity and pCO2 in atm. */
    BigDecimal hFromPco2(double totalAlkalinity, double pco2) {
        return bisect(h -> totalAlkalinity(h, dicOfPco2(h, pco2)).subtract(num(totalAlkalinity)));
    }

    /** [H] from inorganic carbon and pCO2 in atm. */
    BigDecimal hFromDicAndPco2(double dic, double pco2) {
        return bisect(h -> dicOfPco2(h, pco2).subtract(num(dic)));
    }

    /** Where a function that falls with [H] crosses zero between pH 1 and 14, to 1 in 10¹³. */
    private static BigDecimal bisect(UnaryOperator<BigDecimal> falling) {
        BigDecimal h = num("3.1622776601683793e-8");
        for (BigDecimal step : STEPS) {
            h = falling.apply(h).signum() > 0 ? times(h, step) : over(h, step);
        }
        return h;
    }

    /** From the middle of the range each step goes half as far, in the logarithm, as the one before. */
    private static BigDecimal[] steps() {
        BigDecimal[] steps = new BigDecimal[48];
        BigDecimal step = sqrt(num("3.1622776601683793e6"));
        for (int i = 0; i < steps.length; i++) {
            steps[i] = step;
            step = sqrt(step);
        }
        return steps;
    }
}
