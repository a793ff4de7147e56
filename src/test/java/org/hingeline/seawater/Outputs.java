package org.hingeline.seawater;

import java.util.List;

/** Everything a state tells and its uncertainty, in one order. */
final class Outputs {
    static final List<String> NAMES = List.of(
            "phTotal",
            "totalAlkalinity",
            "dic",
            "co2",
            "bicarbonate",
            "carbonate",
            "fco2Atm",
            "pco2Atm",
            "omegaAragonite",
            "omegaCalcite");

    private Outputs() {}

    static double[] of(CarbonateState s) {
        return new double[] {
            s.phTotal(),
            s.totalAlkalinity(),
            s.dic(),
            s.co2(),
            s.bicarbonate(),
            s.carbonate(),
            s.fco2Atm(),
            s.pco2Atm(),
            s.omegaAragonite(),
            s.omegaCalcite()
        };
    }

    static StandardUncertainty[] of(StateUncertainty u) {
        return new StandardUncertainty[] {
            u.phTotal(),
            u.totalAlkalinity(),
            u.dic(),
            u.co2(),
            u.bicarbonate(),
            u.carbonate(),
            u.fco2Atm(),
            u.pco2Atm(),
            u.omegaAragonite(),
            u.omegaCalcite()
        };
    }
}
