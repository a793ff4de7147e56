package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/** Solves the carbonate system of a water from two known quantities. */
public final class CarbonateSystem {
    private CarbonateSystem() {}

    /** The state of the water, or why there is none; never throws for a bad number. */
    public static CarbonateResult solve(Conditions conditions, KnownPair known) {
        Optional<Unsolvable> refusal = SolvableWater.refusal(conditions.temperatureC(), conditions.salinity());
        return refusal.isPresent() ? refusal.get() : solve(SeawaterConstants.of(conditions), conditions, known);
    }

    /**
     * The same with constants that were evaluated before.
     *
     * @throws IllegalArgumentException when the constants are those of another water
     */
    public static CarbonateResult solve(SeawaterConstants constants, Conditions conditions, KnownPair known) {
        if (!constants.belongTo(conditions)) {
            throw new IllegalArgumentException("constants for " + constants.temperatureC + " °C, salinity "
                    + constants.salinity + " do not belong to " + conditions);
        }
        Optional<Unsolvable> refusal = InputCheck.refusal(conditions, known);
        if (refusal.isPresent()) {
            return refusal.get();
        }
        if (known instanceof PhAndAlkalinity pair) {
            return fromPh(constants, conditions, pair);
        }
        HydrogenIonRoot root = new HydrogenIonRoot(constants, conditions);
        if (known instanceof AlkalinityAndDic pair) {
            OptionalDouble h = root.fromDic(pair.totalAlkalinity(), pair.dic());
            return h.isEmpty() ? notConverged(pair) : solved(constants, conditions, known, h.getAsDouble(), pair.dic());
        }
        AlkalinityAndPco2 pair = (AlkalinityAndPco2) known;
        double co2 = pair.pco2Atm() * constants.fugacityFactor * constants.k0;
        OptionalDouble h = root.fromCo2(pair.totalAlkalinity(), co2);
        return h.isEmpty()
                ? notConverged(pair)
                : solved(constants, conditions, known, h.getAsDouble(), dicOf(constants, h.getAsDouble(), co2));
    }

    /**
     * The same water, closed to the air, at another temperature: alkalinity and inorganic carbon stay, pH and Ω move.
     *
     * @param state a solved water
     * @param temperatureC the new temperature, °C
     */
    public static CarbonateResult atTemperature(CarbonateState state, double temperatureC) {
        return solve(
                state.conditions().withTemperatureC(temperatureC),
                new AlkalinityAndDic(state.totalAlkalinity(), state.dic()));
    }

    /**
     * The same water after aeration to a partial pressure of CO2: alkalinity stays, CO2 goes in or out.
     *
     * @param state a solved water
     * @param pco2Atm partial pressure of CO2, atm
     */
    public static CarbonateResult equilibrated(CarbonateState state, double pco2Atm) {
        return solve(state.conditions(), new AlkalinityAndPco2(state.totalAlkalinity(), pco2Atm));
    }

    private static CarbonateResult fromPh(SeawaterConstants k, Conditions conditions, PhAndAlkalinity pair) {
        double h = Math.pow(10, -(pair.ph() + k.scales.offsetToTotal(pair.scale())));
        Alkalinity alkalinity = new Alkalinity(k, conditions);
        double ofCarbon = pair.totalAlkalinity() - alkalinity.withoutCarbonate(h);
        if (ofCarbon < 0) {
            return new Unsolvable(
                    UnsolvableReason.INPUTS_CONTRADICT,
                    "pH " + pair.ph() + " (" + pair.scale().wireName() + ") and alkalinity " + pair.totalAlkalinity()
                            + " mol/kg contradict each other: borate, hydroxide and nutrients alone would exceed the"
                            + " alkalinity");
        }
        return solved(k, conditions, pair, h, ofCarbon / alkalinity.ofCarbon(h, 1));
    }

    private static double dicOf(SeawaterConstants k, double h, double co2) {
        return co2 * (1 + k.k1 / h * (1 + k.k2 / h));
    }

    private static Unsolvable notConverged(KnownPair pair) {
        return new Unsolvable(
                UnsolvableReason.NOT_CONVERGED,
                "no pH was found for " + pair + " within " + HydrogenIonRoot.MAX_STEPS + " steps");
    }

    private static CarbonateResult solved(
            SeawaterConstants k, Conditions conditions, KnownPair known, double h, double dic) {
        Speciation s = Speciation.of(k, conditions, h, dic);
        List<Caution> cautions = new ArrayList<>(k.cautions(conditions));
        if (known instanceof PhAndAlkalinity pair && pair.scale() == PhScale.NBS) {
            cautions.add(Takahashi1982.CAUTION);
        }
        return new Solved(new CarbonateState(
                conditions,
                known,
                -Math.log10(h),
                known instanceof PhAndAlkalinity pair ? pair.totalAlkalinity() : s.totalAlkalinity(),
                dic,
                s.co2(),
                s.bicarbonate(),
                s.carbonate(),
                s.fco2Atm(),
                s.pco2Atm(),
                s.omegaAragonite(),
                s.omegaCalcite(),
                k.densityKgM3,
                cautions));
    }
}
