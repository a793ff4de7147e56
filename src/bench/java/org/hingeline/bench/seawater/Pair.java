package org.hingeline.bench.seawater;

import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.hingeline.seawater.KnownPh;
import org.hingeline.seawater.PhScale;

/** Which two quantities are known. */
public enum Pair {
    PH_TA("pH + TA", 1.5),
    PH_DIC("pH + DIC", Double.NaN),
    PH_PCO2("pH + pCO2", Double.NaN),
    TA_DIC("TA + DIC", 2.5),
    TA_PCO2("TA + pCO2", Double.NaN),
    DIC_PCO2("DIC + pCO2", Double.NaN),
    /** pH read in a laboratory. */
    PH_ELSEWHERE_TA("pH read at 25 °C + TA", Double.NaN),
    /** One after the other. */
    MIXED("the six pairs in turn", Double.NaN);

    final String title;
    /** At most so many times the constants alone; not a number where none is set. */
    final double aim;

    Pair(String title, double aim) {
        this.title = title;
        this.aim = aim;
    }

    KnownPair of(CarbonateState s, int turn) {
        return switch (this) {
            case PH_TA -> new PhAndAlkalinity(s.phTotal(), s.totalAlkalinity());
            case PH_DIC -> new PhAndDic(s.phTotal(), s.dic());
            case PH_PCO2 -> new PhAndPco2(s.phTotal(), s.pco2Atm());
            case TA_DIC -> new AlkalinityAndDic(s.totalAlkalinity(), s.dic());
            case TA_PCO2 -> new AlkalinityAndPco2(s.totalAlkalinity(), s.pco2Atm());
            case DIC_PCO2 -> new DicAndPco2(s.dic(), s.pco2Atm());
            case PH_ELSEWHERE_TA ->
                new PhAndAlkalinity(new KnownPh(s.phTotal(), PhScale.TOTAL, 25.0), s.totalAlkalinity());
            case MIXED -> values()[turn % PH_ELSEWHERE_TA.ordinal()].of(s, turn);
        };
    }
}
