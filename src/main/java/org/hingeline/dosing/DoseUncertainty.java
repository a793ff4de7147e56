package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.seawater.Uncertainty;

/**
 * How sure the outcome of a dose is. The inputs' share comes from solving and dosing the water again with each input a
 * standard uncertainty up and down, which keeps what before and after have in common.
 *
 * <p>Compared with a target or a bound, a result carries the constants' share too; comparing before and after leaves it
 * out, since the same constants serve both.
 */
final class DoseUncertainty {
    private final DosedWater water;
    private final double alkalinity;
    private final List<CarbonateState[]> upAndDown = new ArrayList<>();
    private final StateUncertainty ofBefore;

    DoseUncertainty(DosedWater water, double alkalinity, InputUncertainty u) {
        this.water = water;
        this.alkalinity = alkalinity;
        CarbonateState before = water.before();
        ofBefore = Uncertainty.of(before, u);
        Conditions c = before.conditions();
        KnownPair known = before.known();
        add(c, first(known, u, 1), c, first(known, u, -1));
        add(c, second(known, u, 1), c, second(known, u, -1));
        double t = c.temperatureC();
        add(c.withTemperatureC(t + u.temperatureC()), known, c.withTemperatureC(t - u.temperatureC()), known);
        add(salinity(c, u.salinity()), known, salinity(c, -u.salinity()), known);
    }

    /** Of the target's quantity after the dose, to compare with the target: both shares. */
    double afterAgainst(Target target) {
        double inputs = fromInputs(state -> target.of(water.with(state, alkalinity)));
        return Math.hypot(inputs, fromConstants(target));
    }

    /** Of the gain in Ω of aragonite by the dose: the inputs' share only. */
    double ofGain() {
        return fromInputs(state -> water.with(state, alkalinity).omegaAragonite() - state.omegaAragonite());
    }

    /** The share of the constants keeps its proportion to Ω and its size in pH; alkalinity as measured has none. */
    private double fromConstants(Target target) {
        if (target instanceof Target.OmegaAragonite) {
            double before = water.before().omegaAragonite();
            double relative = before > 0 ? ofBefore.omegaAragonite().fromConstants() / before : 0;
            return relative * water.with(alkalinity).omegaAragonite();
        }
        return target instanceof Target.PhTotal ? ofBefore.phTotal().fromConstants() : 0;
    }

    private double fromInputs(ToDoubleFunction<CarbonateState> quantity) {
        double sum = 0;
        for (CarbonateState[] pair : upAndDown) {
            double half = (quantity.applyAsDouble(pair[0]) - quantity.applyAsDouble(pair[1])) / 2;
            sum += half * half;
        }
        return Math.sqrt(sum);
    }

    private void add(Conditions up, KnownPair knownUp, Conditions down, KnownPair knownDown) {
        upAndDown.add(new CarbonateState[] {solvedOrBefore(up, knownUp), solvedOrBefore(down, knownDown)});
    }

    /** At the edge of what can be solved, the water itself stands in for the neighbour beyond. */
    private CarbonateState solvedOrBefore(Conditions conditions, KnownPair known) {
        return CarbonateSystem.solve(conditions, known) instanceof CarbonateResult.Solved solved
                ? solved.state()
                : water.before();
    }

    private static KnownPair first(KnownPair known, InputUncertainty u, int sign) {
        if (known instanceof PhAndAlkalinity p) {
            return new PhAndAlkalinity(p.ph() + sign * u.ph(), p.scale(), p.totalAlkalinity());
        }
        if (known instanceof AlkalinityAndDic p) {
            return new AlkalinityAndDic(p.totalAlkalinity() + sign * u.totalAlkalinity(), p.dic());
        }
        AlkalinityAndPco2 p = (AlkalinityAndPco2) known;
        return new AlkalinityAndPco2(p.totalAlkalinity() + sign * u.totalAlkalinity(), p.pco2Atm());
    }

    private static KnownPair second(KnownPair known, InputUncertainty u, int sign) {
        if (known instanceof PhAndAlkalinity p) {
            return new PhAndAlkalinity(p.ph(), p.scale(), p.totalAlkalinity() + sign * u.totalAlkalinity());
        }
        if (known instanceof AlkalinityAndDic p) {
            return new AlkalinityAndDic(p.totalAlkalinity(), p.dic() + sign * u.dic());
        }
        AlkalinityAndPco2 p = (AlkalinityAndPco2) known;
        return new AlkalinityAndPco2(p.totalAlkalinity(), p.pco2Atm() + sign * u.pco2Atm());
    }

    private static Conditions salinity(Conditions c, double off) {
        return new Conditions(
                c.temperatureC(), c.salinity() + off, c.phosphate(), c.silicate(), c.calcium(), c.fit(), c.boron());
    }
}
