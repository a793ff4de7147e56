package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;

/**
 * What an agent adds to a water, mol/kg-seawater: alkalinity, inorganic carbon and calcium add up, all else follows.
 *
 * @param alkalinity total alkalinity
 * @param dic dissolved inorganic carbon
 * @param calcium calcium
 */
record AddedMatter(double alkalinity, double dic, double calcium) {
    static final AddedMatter NOTHING = new AddedMatter(0, 0, 0);

    /** Of so many mol of the agent per kg of sea water. */
    static AddedMatter of(Agent agent, double mol) {
        return new AddedMatter(mol * agent.alkalinityPerMol(), mol * agent.dicPerMol(), mol * agent.calciumPerMol());
    }

    AddedMatter and(AddedMatter other) {
        return new AddedMatter(alkalinity + other.alkalinity, dic + other.dic, calcium + other.calcium);
    }

    /** The water with this added, closed to the air. */
    CarbonateResult to(CarbonateState before) {
        return solve(before, new AlkalinityAndDic(before.totalAlkalinity() + alkalinity, before.dic() + dic));
    }

    /** The water with this added, then aerated to a pCO2 in atm. */
    CarbonateResult toAerated(CarbonateState before, double pco2Atm) {
        return solve(before, new AlkalinityAndPco2(before.totalAlkalinity() + alkalinity, pco2Atm));
    }

    private CarbonateResult solve(CarbonateState before, KnownPair known) {
        Conditions conditions = before.conditions();
        return CarbonateSystem.solve(
                before.constants(),
                calcium == 0 ? conditions : conditions.withCalcium(before.calcium() + calcium),
                known);
    }
}
