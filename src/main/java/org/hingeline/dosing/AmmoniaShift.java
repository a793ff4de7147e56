package org.hingeline.dosing;

import org.hingeline.seawater.Ammonia;
import org.hingeline.seawater.CarbonateState;

/**
 * What a dose makes of the ammonia in the water: the total stays, the un-ionised, toxic share moves with pH. Held against
 * the saltwater criteria of the US EPA (1989), quoted from memory.
 *
 * @param totalMgL total ammonia, mg/L as N
 * @param unionisedBeforeMgL un-ionised ammonia now, mg/L as NH3
 * @param unionisedAfterMgL when the dose is mixed in, the higher of closed and aerated, mg/L as NH3
 */
public record AmmoniaShift(double totalMgL, double unionisedBeforeMgL, double unionisedAfterMgL) {
    /** mg/L as NH3, a four-day average. */
    public static final double CHRONIC_MG_L = Ammonia.EPA_1989_CHRONIC_MG_L;

    /** mg/L as NH3, a one-hour average. */
    public static final double ACUTE_MG_L = Ammonia.EPA_1989_ACUTE_MG_L;

    static AmmoniaShift of(double totalMgL, CarbonateState before, CarbonateState after, CarbonateState aerated) {
        return new AmmoniaShift(
                totalMgL, nh3(totalMgL, before), Math.max(nh3(totalMgL, after), nh3(totalMgL, aerated)));
    }

    private static double nh3(double totalMgL, CarbonateState state) {
        return Ammonia.unionisedNh3MgL(
                        totalMgL,
                        state.phTotal(),
                        state.conditions().temperatureC(),
                        state.conditions().salinity())
                .orElseThrow();
    }

    /** Whether the dose brings it above the acute criterion, or leaves it there. */
    boolean acute() {
        return unionisedAfterMgL > ACUTE_MG_L;
    }

    boolean chronic() {
        return unionisedAfterMgL > CHRONIC_MG_L;
    }

    String words() {
        return "Un-ionised ammonia goes from " + Words.number(unionisedBeforeMgL, 3) + " to "
                + Words.number(unionisedAfterMgL, 3) + " mg/L as NH3 (total " + Words.number(totalMgL, 2)
                + " mg/L as N); US EPA 1989 saltwater criteria: " + CHRONIC_MG_L + " chronic, " + ACUTE_MG_L
                + " acute";
    }
}
