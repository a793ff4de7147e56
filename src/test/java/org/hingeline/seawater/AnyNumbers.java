package org.hingeline.seawater;

import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;

/** Inputs as a broken sensor or a slip of the unit gives them, among good ones. */
final class AnyNumbers {
    private static final Double[] ODD = {
        Double.NaN,
        Double.NEGATIVE_INFINITY,
        Double.POSITIVE_INFINITY,
        Double.MAX_VALUE,
        -Double.MAX_VALUE,
        Double.MIN_VALUE,
        -Double.MIN_VALUE,
        Double.MIN_NORMAL,
        0.0,
        -0.0,
        1e-300,
        2300.0,
        -1e-9
    };

    private AnyNumbers() {}

    static Conditions conditions(RandomWaters random) {
        Conditions plain = new Conditions(
                number(random, -2, 45),
                number(random, 0, 50),
                Math.max(0, number(random, -3e-6, 3e-6)),
                Math.max(0, number(random, -1e-4, 1e-4)),
                null,
                random.pick(CarbonicAcidFit.values()),
                random.pick(BoronRatio.values()));
        return random.between(0, 1) < 0.2 ? plain.withCalcium(number(random, 0, 0.1)) : plain;
    }

    static KnownPair pair(RandomWaters random) {
        double ta = number(random, -0.01, 0.1);
        double dic = number(random, 0, 0.1);
        double pco2 = number(random, 0, 1);
        double value = number(random, 2, 13);
        KnownPh plain = KnownPh.on(random.pick(PhScale.values()), value);
        KnownPh ph = random.between(0, 1) < 0.3 ? plain.readAt(number(random, -2, 45)) : plain;
        return switch ((int) random.between(0, 6)) {
            case 0 -> new PhAndAlkalinity(ph, ta);
            case 1 -> new PhAndDic(ph, dic);
            case 2 -> new PhAndPco2(ph, pco2 * 1e-3);
            case 3 -> new AlkalinityAndDic(ta, dic);
            case 4 -> new AlkalinityAndPco2(ta, pco2);
            default -> new DicAndPco2(dic, pco2);
        };
    }

    /** Every thirtieth is odd. */
    private static double number(RandomWaters random, double low, double high) {
        return random.between(0, 30) < 1 ? random.pick(ODD) : random.between(low, high);
    }
}
