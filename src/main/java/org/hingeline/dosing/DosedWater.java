package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;

/**
 * A body of water and what a product makes of it, closed to the air: alkalinity, inorganic carbon and calcium add up, all
 * else follows. The water of the stock solution is not counted.
 */
final class DosedWater {
    private final CarbonateState before;
    private final Product product;
    private final double kilograms;
    private final double aerationPco2Atm;

    DosedWater(CarbonateState before, DoseRequest request) {
        this.before = before;
        this.product = request.product();
        this.kilograms = request.receiver().litresDosed() / 1000 * before.densityKgM3();
        this.aerationPco2Atm = request.aerationPco2Atm();
    }

    CarbonateState before() {
        return before;
    }

    /** Alkalinity that a mass in g adds, mol/kg-seawater. */
    double alkalinityOf(double massG) {
        return massG * product.molPerGram() * product.agent().alkalinityPerMol() / kilograms;
    }

    /** The mass in g that adds that much alkalinity, mol/kg-seawater. */
    double massOf(double alkalinity) {
        return alkalinity * kilograms / (product.molPerGram() * product.agent().alkalinityPerMol());
    }

    /** The water with that much alkalinity added by the agent, mol/kg-seawater. */
    CarbonateState with(double alkalinity) {
        double mol = alkalinity / product.agent().alkalinityPerMol();
        return solve(
                mol,
                new AlkalinityAndDic(
                        before.totalAlkalinity() + alkalinity,
                        before.dic() + mol * product.agent().dicPerMol()));
    }

    /** The water with that much alkalinity added, then aerated. */
    CarbonateState aeratedWith(double alkalinity) {
        return solve(
                alkalinity / product.agent().alkalinityPerMol(),
                new AlkalinityAndPco2(before.totalAlkalinity() + alkalinity, aerationPco2Atm));
    }

    private CarbonateState solve(double mol, KnownPair known) {
        double calcium = mol * product.agent().calciumPerMol();
        Conditions conditions = before.conditions();
        return CarbonateSystem.solve(
                        before.constants(),
                        calcium == 0 ? conditions : conditions.withCalcium(before.calcium() + calcium),
                        known)
                .orElseThrow();
    }
}
