package org.hingeline.seawater;

import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;

/** Where an uncertainty comes from. */
public enum UncertaintySource {
    /** The equilibrium constants and total boron; common to all waters. */
    CONSTANTS,
    PH,
    TOTAL_ALKALINITY,
    DIC,
    PCO2,
    TEMPERATURE,
    SALINITY,
    /** A measured calcium. */
    CALCIUM,
    /** The thermometer where the pH was read, when that was not in the water. */
    TEMPERATURE_AT_PH;

    /** Of the first of the two known quantities. */
    static UncertaintySource firstOf(KnownPair known) {
        if (known.ph() != null) {
            return PH;
        }
        return known instanceof DicAndPco2 ? DIC : TOTAL_ALKALINITY;
    }

    /** Of the second. */
    static UncertaintySource secondOf(KnownPair known) {
        if (known instanceof PhAndAlkalinity) {
            return TOTAL_ALKALINITY;
        }
        return known instanceof PhAndDic || known instanceof AlkalinityAndDic ? DIC : PCO2;
    }
}
