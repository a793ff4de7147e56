package org.hingeline.seawater;

import java.util.Optional;

/**
 * Un-ionised ammonia NH3, the toxic form, out of total ammonia NH3 + NH4⁺: fit of {@link CleggWhitfield1995}, total scale,
 * salinity 0 to 40, −2 to 40 °C; outside, the answer carries a caution.
 */
public final class Ammonia {
    /**
     * Criterion maximum concentration in saltwater, a one-hour average, mg/L of un-ionised NH3: US EPA (1989), Ambient
     * water quality criteria for ammonia (saltwater), EPA 440/5-88-004, quoted from memory.
     */
    public static final double EPA_1989_ACUTE_MG_L = 0.233;

    /** Criterion continuous concentration, a four-day average; source and unit as {@link #EPA_1989_ACUTE_MG_L}. */
    public static final double EPA_1989_CHRONIC_MG_L = 0.035;

    /** The code of a refused concentration. */
    public static final String AMOUNT_CODE = "ammonia-out-of-range";

    /** Mass of NH3 per mass of its nitrogen, 17.031/14.007. */
    private static final double NH3_PER_NITROGEN = 17.031 / 14.007;

    /** Hundred times what any living tank has; beyond it is a slip of the unit. */
    private static final double TOTAL_MAX_MG_L = 1000;

    private Ammonia() {}

    /**
     * The share of total ammonia that is un-ionised.
     *
     * @param phTotal pH, total scale, 2 to 13
     * @param temperatureC temperature, °C (ITS-90), −2 to 45
     * @param salinity practical salinity, 0 to 50
     * @return 0 to 1, or a refusal
     */
    public static Figure unionisedShare(double phTotal, double temperatureC, double salinity) {
        Optional<Figure.Refused> refused = FigureCheck.ph(phTotal).or(() -> FigureCheck.water(temperatureC, salinity));
        if (refused.isPresent()) {
            return refused.get();
        }
        return new Figure.Known(
                CleggWhitfield1995.unionisedShare(phTotal, temperatureC, salinity),
                FigureCheck.cautions(temperatureC, salinity, CleggWhitfield1995.RANGE));
    }

    /**
     * Un-ionised ammonia counted as nitrogen.
     *
     * @param totalAmmoniaMgNPerL total ammonia, mg/L as N, 0 to 1000
     * @return mg/L as N, or a refusal; the other arguments are those of {@link #unionisedShare}
     */
    public static Figure unionisedNitrogenMgL(
            double totalAmmoniaMgNPerL, double phTotal, double temperatureC, double salinity) {
        return times(totalAmmoniaMgNPerL, 1, unionisedShare(phTotal, temperatureC, salinity));
    }

    /**
     * Un-ionised ammonia counted as NH3, as the criteria of the US EPA count it.
     *
     * @param totalAmmoniaMgNPerL total ammonia, mg/L as N, 0 to 1000
     * @return mg/L as NH3, or a refusal; the other arguments are those of {@link #unionisedShare}
     */
    public static Figure unionisedNh3MgL(
            double totalAmmoniaMgNPerL, double phTotal, double temperatureC, double salinity) {
        return times(totalAmmoniaMgNPerL, NH3_PER_NITROGEN, unionisedShare(phTotal, temperatureC, salinity));
    }

    private static Figure times(double totalMgNPerL, double factor, Figure share) {
        if (!(share instanceof Figure.Known known)) {
            return share;
        }
        Optional<Figure.Refused> refused =
                FigureCheck.within(AMOUNT_CODE, "total ammonia", totalMgNPerL, 0, TOTAL_MAX_MG_L, " mg/L as N");
        if (refused.isPresent()) {
            return refused.get();
        }
        return new Figure.Known(totalMgNPerL * factor * known.value(), known.cautions());
    }
}
