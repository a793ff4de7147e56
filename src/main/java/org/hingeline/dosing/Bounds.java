package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;

/**
 * What no plan may cross. The defaults are engineering starting points for a site to edit, not literature: no published
 * larval limit for steps in pH was found. A site may not set them beyond pH 9, Ω 7 (aragonite forms from sea water above
 * about 7: Moras et al. 2022) or 1 pH per hour.
 *
 * @param phTotalMax highest pH, total scale, above 6 to 9
 * @param omegaAragoniteMax highest saturation state of aragonite, above 0 to 7
 * @param phPerHourMax largest step of pH in an hour with larvae in the water, above 0 to 1
 */
public record Bounds(double phTotalMax, double omegaAragoniteMax, double phPerHourMax) {
    /** pH 8.4, Ω 4.5, 0.15 pH per hour. */
    public static final Bounds DEFAULTS = new Bounds(8.4, 4.5, 0.15);

    public Bounds {
        require("phTotalMax", phTotalMax, 6, 9);
        require("omegaAragoniteMax", omegaAragoniteMax, 0, 7);
        require("phPerHourMax", phPerHourMax, 0, 1);
    }

    private static void require(String name, double value, double above, double max) {
        if (!(value > above && value <= max)) {
            throw new IllegalArgumentException(name + " " + value + " must be above " + above + " and at most " + max);
        }
    }

    /** Whether a water keeps the ceilings of pH and Ω. */
    boolean hold(CarbonateState state) {
        return state.phTotal() <= phTotalMax && state.omegaAragonite() <= omegaAragoniteMax;
    }

    String words() {
        return "pH " + phTotalMax + " (total scale) and Ω aragonite " + omegaAragoniteMax;
    }
}
