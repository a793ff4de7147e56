package org.hingeline.seawater;

import java.util.Optional;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;

/**
 * A pH that was read in a sample at another temperature than the water's, as in a laboratory: the sample, kept closed,
 * is solved at the temperature of the reading, and its alkalinity and inorganic carbon are carried over to the water.
 */
final class PhReadElsewhere {
    private static final int MAX_STEPS = 50;
    private static final double TOLERANCE = 1e-12;

    private PhReadElsewhere() {}

    static CarbonateResult solve(SeawaterConstants water, Conditions conditions, KnownPair known, KnownPh ph) {
        double readAtC = ph.readAtC(conditions.temperatureC());
        Optional<Unsolvable> refusal = SolvableWater.refusal(readAtC, conditions.salinity());
        if (refusal.isPresent()) {
            Unsolvable outside = refusal.get();
            return new Unsolvable(outside.reason(), "where the pH was read, " + outside.detail());
        }
        Conditions sample = conditions.withTemperatureC(readAtC);
        SeawaterConstants k = SeawaterConstants.of(sample);
        CarbonateResult result = known instanceof PhAndPco2 pair
                ? withPco2OfTheWater(water, conditions, k, sample, pair)
                : CarbonateSystem.here(k, sample, known).then(read -> carriedOver(water, conditions, read));
        return result.then(state -> new Solved(state.asKnownFrom(known, Cautions.of(water, k, conditions, known))));
    }

    private static CarbonateResult carriedOver(SeawaterConstants water, Conditions conditions, CarbonateState sample) {
        return CarbonateSystem.here(water, conditions, new AlkalinityAndDic(sample.totalAlkalinity(), sample.dic()));
    }

    /**
     * pCO2 is that of the water, not of the sample. At a fixed pH both are very nearly in proportion, so correcting the
     * sample's by the ratio that the water's missed by gains digits at every step.
     */
    private static CarbonateResult withPco2OfTheWater(
            SeawaterConstants water, Conditions conditions, SeawaterConstants k, Conditions sample, PhAndPco2 pair) {
        double x = Math.log(pair.pco2Atm());
        double lastX = Double.NaN;
        double lastMiss = Double.NaN;
        for (int step = 0; step < MAX_STEPS; step++) {
            CarbonateResult result = CarbonateSystem.here(k, sample, new PhAndPco2(pair.ph(), Math.exp(x)))
                    .then(read -> carriedOver(water, conditions, read));
            if (!(result instanceof Solved solved)) {
                return result;
            }
            double miss = Math.log(pair.pco2Atm() / solved.state().pco2Atm());
            if (Math.abs(miss) <= TOLERANCE) {
                return result;
            }
            double slope = -(miss - lastMiss) / (x - lastX);
            lastX = x;
            lastMiss = miss;
            x += slope > 0.05 ? miss / slope : miss;
        }
        return CarbonateSystem.notConverged(pair);
    }
}
