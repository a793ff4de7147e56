package org.hingeline.seawater;

/**
 * Whether two states are of one water, to a tenth of a billionth: of [H], and for amounts of what is in the water, |TA| +
 * DIC.
 *
 * <p>That is the measure that double precision allows: an amount that is the small difference of large ones (the carbon of
 * a caustic solution) carries their rounding, not its own. Where there is next to nothing in the water, 0.1 µmol/kg counts as
 * in it, less than a tenth of what any titration tells apart: 10⁻¹⁷ mol/kg is then the difference allowed.
 */
final class SameWater {
    static final double TOLERANCE = 1e-10;
    private static final double LEAST_AMOUNT = 1e-7;

    private SameWater() {}

    /** The amount that differences are measured by, mol/kg. */
    static double amount(CarbonateState water) {
        return Math.abs(water.totalAlkalinity()) + water.dic() + LEAST_AMOUNT;
    }

    /** The largest difference, in units of what is allowed: at most 1 when it is the same water. */
    static double distance(CarbonateState a, CarbonateState b) {
        double amount = amount(a);
        double perAtm = 1 / a.constants().co2(1);
        double perCarbonate = a.constants().calcium(a.conditions()) / a.constants().kspAragonite;
        double[] off = {
            Math.abs(a.phTotal() - b.phTotal()) * SeawaterConstants.LN_10,
            Math.abs(a.totalAlkalinity() - b.totalAlkalinity()) / amount,
            Math.abs(a.dic() - b.dic()) / amount,
            Math.abs(a.co2() - b.co2()) / amount,
            Math.abs(a.bicarbonate() - b.bicarbonate()) / amount,
            Math.abs(a.carbonate() - b.carbonate()) / amount,
            Math.abs(a.pco2Atm() - b.pco2Atm()) / (amount * perAtm),
            Math.abs(a.omegaAragonite() - b.omegaAragonite()) / Math.max(amount * perCarbonate, Double.MIN_NORMAL)
        };
        double worst = 0;
        for (double d : off) {
            if (!(d <= worst)) {
                worst = d;
            }
        }
        return worst / TOLERANCE;
    }
}
