package org.hingeline.bench.seawater;

import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/** Which two quantities are known. */
public enum Pair {
    PH_TA("pH + TA", 1.5),
    TA_DIC("TA + DIC", 2.5),
    TA_PCO2("TA + pCO2", Double.NaN),
    /** One after the other. */
    MIXED("the pairs in turn", Double.NaN);

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
            case TA_DIC -> new AlkalinityAndDic(s.totalAlkalinity(), s.dic());
            case TA_PCO2 -> new AlkalinityAndPco2(s.totalAlkalinity(), s.pco2Atm());
            case MIXED -> values()[turn % MIXED.ordinal()].of(s, turn);
        };
    }
}
