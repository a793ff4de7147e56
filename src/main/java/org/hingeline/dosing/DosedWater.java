package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;

/**
 * A body of water and what an agent makes of it, closed to the air: alkalinity and inorganic carbon add up, all else
 * follows. The water of the stock solution is not counted.
 */
final class DosedWater {
    private final CarbonateState before;
    private final Agent agent;
    private final double kilograms;
    private final double molPerGram;
    private final double aerationPco2Atm;

    DosedWater(CarbonateState before, DoseRequest request) {
        this.before = before;
        this.agent = request.agent();
        this.kilograms = kilograms(before, request.receiver());
        this.molPerGram = request.assayPercent() / 100 / request.form().gramsPerMol();
        this.aerationPco2Atm = request.aerationPco2Atm();
    }

    private static double kilograms(CarbonateState water, Receiver receiver) {
        Receiver.Tank tank = (Receiver.Tank) receiver;
        return tank.volumeL() / 1000 * water.densityKgM3();
    }

    CarbonateState before() {
        return before;
    }

    /** Alkalinity that a mass in g adds, mol/kg-seawater. */
    double alkalinityOf(double massG) {
        return massG * molPerGram * agent.alkalinityPerMol() / kilograms;
    }

    /** The mass in g that adds that much alkalinity, mol/kg-seawater. */
    double massOf(double alkalinity) {
        return alkalinity * kilograms / (molPerGram * agent.alkalinityPerMol());
    }

    /** The water with that much alkalinity added by the agent, mol/kg-seawater. */
    CarbonateState with(double alkalinity) {
        double carbon = alkalinity * agent.dicPerMol() / agent.alkalinityPerMol();
        return solve(new AlkalinityAndDic(before.totalAlkalinity() + alkalinity, before.dic() + carbon));
    }

    /** The water with that much alkalinity added, then aerated. */
    CarbonateState aeratedWith(double alkalinity) {
        return solve(new AlkalinityAndPco2(before.totalAlkalinity() + alkalinity, aerationPco2Atm));
    }

    private CarbonateState solve(KnownPair known) {
        return CarbonateSystem.solve(before.constants(), before.conditions(), known)
                .orElseThrow();
    }
}
