package org.hingeline.seawater;

import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;

/**
 * A measured water that can be drawn again and again, each input off by chance and the constants off by chance, and solved
 * every time from the beginning.
 *
 * @param conditions as measured
 * @param pair as measured
 * @param u standard uncertainty of the inputs
 */
record DrawnWater(Conditions conditions, KnownPair pair, InputUncertainty u) {
    /** How many inputs there may be: temperature, salinity, the two, temperature of a pH reading, calcium. */
    static final int INPUTS = 6;

    CarbonateState measured() {
        return CarbonateSystem.solve(conditions, pair).orElseThrow();
    }

    /** With inputs and constants off by so many standard uncertainties. */
    CarbonateState drawn(double[] off, double[] constantsOff) {
        Double calcium = conditions.calcium();
        Conditions c = new Conditions(
                conditions.temperatureC() + u.temperatureC() * off[0],
                conditions.salinity() + u.salinity() * off[1],
                conditions.phosphate(),
                conditions.silicate(),
                calcium == null ? null : calcium + u.calcium() * off[5],
                conditions.fit(),
                conditions.boron());
        return solve(c, moved(off), constantsOff);
    }

    private KnownPair moved(double[] off) {
        if (pair instanceof PhAndAlkalinity p) {
            return new PhAndAlkalinity(moved(p.ph(), off), p.totalAlkalinity() + u.totalAlkalinity() * off[3]);
        }
        if (pair instanceof PhAndDic p) {
            return new PhAndDic(moved(p.ph(), off), p.dic() + u.dic() * off[3]);
        }
        if (pair instanceof PhAndPco2 p) {
            return new PhAndPco2(moved(p.ph(), off), p.pco2Atm() + u.pco2Atm() * off[3]);
        }
        if (pair instanceof AlkalinityAndDic p) {
            return new AlkalinityAndDic(p.totalAlkalinity() + u.totalAlkalinity() * off[2], p.dic() + u.dic() * off[3]);
        }
        if (pair instanceof AlkalinityAndPco2 p) {
            return new AlkalinityAndPco2(
                    p.totalAlkalinity() + u.totalAlkalinity() * off[2], p.pco2Atm() + u.pco2Atm() * off[3]);
        }
        DicAndPco2 p = (DicAndPco2) pair;
        return new DicAndPco2(p.dic() + u.dic() * off[2], p.pco2Atm() + u.pco2Atm() * off[3]);
    }

    private KnownPh moved(KnownPh ph, double[] off) {
        double by = ph.scale() == PhScale.NBS ? Math.max(u.ph(), 0.05) : u.ph();
        Double readAtC = ph.readAtC();
        return new KnownPh(
                ph.value() + by * off[2], ph.scale(), readAtC == null ? null : readAtC + u.temperatureC() * off[4]);
    }

    /** The solver with other constants; a pH read elsewhere goes the long way, because there constants are used twice. */
    static CarbonateState solve(Conditions c, KnownPair pair, double[] constantsOff) {
        SeawaterConstants k = PerturbedConstants.of(c, constantsOff);
        KnownPh ph = pair.ph();
        if (ph == null || ph.readAtC() == null) {
            return CarbonateSystem.solve(k, c, pair).orElseThrow();
        }
        Conditions sample = c.withTemperatureC(ph.readAtC());
        SeawaterConstants kOfSample = PerturbedConstants.of(sample, constantsOff);
        KnownPh there = KnownPh.on(ph.scale(), ph.value());
        if (pair instanceof PhAndAlkalinity p) {
            return carried(kOfSample, sample, new PhAndAlkalinity(there, p.totalAlkalinity()), k, c);
        }
        if (pair instanceof PhAndDic p) {
            return carried(kOfSample, sample, new PhAndDic(there, p.dic()), k, c);
        }
        double pco2 = ((PhAndPco2) pair).pco2Atm();
        double ofSample = pco2;
        CarbonateState water = carried(kOfSample, sample, new PhAndPco2(there, ofSample), k, c);
        while (Math.abs(pco2 / water.pco2Atm() - 1) > 1e-11) {
            ofSample *= pco2 / water.pco2Atm();
            water = carried(kOfSample, sample, new PhAndPco2(there, ofSample), k, c);
        }
        return water;
    }

    private static CarbonateState carried(
            SeawaterConstants kOfSample, Conditions sample, KnownPair pair, SeawaterConstants k, Conditions c) {
        CarbonateState read = CarbonateSystem.solve(kOfSample, sample, pair).orElseThrow();
        return CarbonateSystem.solve(k, c, new AlkalinityAndDic(read.totalAlkalinity(), read.dic()))
                .orElseThrow();
    }
}
