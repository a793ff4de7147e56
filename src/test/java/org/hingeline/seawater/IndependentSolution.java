package org.hingeline.seawater;

import static org.hingeline.seawater.HighPrecision.num;

import java.math.BigDecimal;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;

/** A water solved from any pair in 34-digit arithmetic, its pH read at its own temperature. */
record IndependentSolution(IndependentWater water, BigDecimal h, BigDecimal dic) {
    static IndependentSolution of(Conditions conditions, KnownPair pair) {
        IndependentWater w = new IndependentWater(conditions);
        if (pair instanceof PhAndAlkalinity p) {
            BigDecimal h = hydrogenIon(w, p.ph());
            return new IndependentSolution(w, h, w.dic(h, num(p.totalAlkalinity())));
        }
        if (pair instanceof PhAndDic p) {
            return new IndependentSolution(w, hydrogenIon(w, p.ph()), num(p.dic()));
        }
        if (pair instanceof PhAndPco2 p) {
            BigDecimal h = hydrogenIon(w, p.ph());
            return new IndependentSolution(w, h, w.dicOfPco2(h, p.pco2Atm()));
        }
        if (pair instanceof AlkalinityAndDic p) {
            return new IndependentSolution(w, w.hFromDic(num(p.totalAlkalinity()), num(p.dic())), num(p.dic()));
        }
        if (pair instanceof AlkalinityAndPco2 p) {
            BigDecimal h = w.hFromPco2(p.totalAlkalinity(), p.pco2Atm());
            return new IndependentSolution(w, h, w.dicOfPco2(h, p.pco2Atm()));
        }
        DicAndPco2 p = (DicAndPco2) pair;
        return new IndependentSolution(w, w.hFromDicAndPco2(p.dic(), p.pco2Atm()), num(p.dic()));
    }

    private static BigDecimal hydrogenIon(IndependentWater water, KnownPh ph) {
        return water.hydrogenIon(ph.value(), ph.scale());
    }

    /** In the order of {@link Outputs#NAMES}. */
    BigDecimal[] quantities() {
        return new BigDecimal[] {
            water.ph(h, PhScale.TOTAL),
            water.totalAlkalinity(h, dic),
            dic,
            water.co2(h, dic),
            water.bicarbonate(h, dic),
            water.carbonate(h, dic),
            water.fco2(h, dic),
            water.pco2(h, dic),
            water.omegaAragonite(h, dic),
            water.omegaCalcite(h, dic)
        };
    }
}
