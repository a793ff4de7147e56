package org.hingeline.seawater;

import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;

/** The worked water of {@code dosing.csv} with alkalinity and carbon added to it, closed to the air. */
final class DosedChemistry {
    private static final CarbonateState START = CarbonateSystem.solve(
                    Conditions.of(22, 30), new AlkalinityAndPco2(2078e-6, 900e-6))
            .orElseThrow();

    private DosedChemistry() {}

    /** After an agent that brings that much alkalinity, µmol/kg. */
    static CarbonateState with(String agent, double addedAlkalinity) {
        if (agent.equals("aeration")) {
            return Treatment.equilibrated(START, 420e-6).orElseThrow();
        }
        double added = addedAlkalinity * 1e-6;
        return CarbonateSystem.solve(
                        START.conditions(),
                        new AlkalinityAndDic(
                                START.totalAlkalinity() + added, START.dic() + added * dicPerAlkalinity(agent)))
                .orElseThrow();
    }

    private static double dicPerAlkalinity(String agent) {
        return switch (agent) {
            case "sodium-carbonate" -> 0.5;
            case "sodium-bicarbonate" -> 1;
            case "sodium-hydroxide" -> 0;
            default -> throw new IllegalArgumentException("no such agent: " + agent);
        };
    }
}
