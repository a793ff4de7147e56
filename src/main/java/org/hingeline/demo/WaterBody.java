package org.hingeline.demo;

import java.util.List;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;

/**
 * Water by what is conserved in it; pH and Ω follow from that and are never set.
 *
 * @param temperatureC ITS-90
 * @param salinity PSS-78
 */
record WaterBody(double temperatureC, double salinity, double totalAlkalinityUmolKg, double dicUmolKg) {

    CarbonateState solved() {
        return CarbonateSystem.solve(
                        Conditions.of(temperatureC, salinity),
                        new AlkalinityAndDic(totalAlkalinityUmolKg * 1e-6, dicUmolKg * 1e-6))
                .orElseThrow();
    }

    WaterBody atTemperature(double newTemperatureC) {
        return new WaterBody(newTemperatureC, salinity, totalAlkalinityUmolKg, dicUmolKg);
    }

    /** With CO2 put in, or taken out when negative: carbon changes, alkalinity does not. */
    WaterBody withCarbonDioxide(double addedUmolKg) {
        return new WaterBody(temperatureC, salinity, totalAlkalinityUmolKg, dicUmolKg + addedUmolKg);
    }

    /** Equal parts of each, mixed; differences in heat capacity and density are too small to matter here. */
    static WaterBody mixed(List<WaterBody> parts) {
        double t = 0;
        double s = 0;
        double ta = 0;
        double dic = 0;
        for (WaterBody part : parts) {
            t += part.temperatureC;
            s += part.salinity;
            ta += part.totalAlkalinityUmolKg;
            dic += part.dicUmolKg;
        }
        int n = parts.size();
        return new WaterBody(t / n, s / n, ta / n, dic / n);
    }
}
