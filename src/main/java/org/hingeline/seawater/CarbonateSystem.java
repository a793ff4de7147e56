package org.hingeline.seawater;

import java.util.Optional;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;

/**
 * Solves the carbonate system of a water from two known quantities.
 *
 * <p>With pH, and for inorganic carbon with pCO2, the answer is a closed form; alkalinity with inorganic carbon or pCO2
 * needs {@link HydrogenIonRoot}. A pH read at another temperature than the water's is taken where it was read
 * ({@link PhReadElsewhere}).
 */
public final class CarbonateSystem {
    /** Bicarbonate and carbonate over CO2: beyond it the water would be above pH 14. */
    private static final double IONISED_MAX = 1e14;

    /** Ten times what is accepted as an input, mol/kg-seawater: no equilibrium constant holds there. */
    private static final double DIC_MAX = 1;

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
        Unsolvable refusal = InputCheck.refusal(conditions, known);
        if (refusal != null) {
            return refusal;
        }
        KnownPh ph = known.ph();
        CarbonateResult result = ph != null && ph.readAtC(conditions.temperatureC()) != conditions.temperatureC()
                ? PhReadElsewhere.solve(constants, conditions, known, ph)
                : here(constants, conditions, known);
        return result instanceof Solved solved && solved.state().dic() > DIC_MAX
                ? tooMuchCarbon(solved.state())
                : result;
    }

    /** With pH, if it is known, read at the water's own temperature, and every input judged before. */
    static CarbonateResult here(SeawaterConstants k, Conditions conditions, KnownPair known) {
        if (known instanceof PhAndAlkalinity pair) {
            double h = hydrogenIon(k, pair.ph());
            double ofCarbon = pair.totalAlkalinity() - Alkalinity.withoutCarbonate(k, conditions, h);
            return ofCarbon < 0
                    ? contradiction(pair)
                    : solved(k, conditions, pair, h, pair.totalAlkalinity(), ofCarbon / Alkalinity.ofCarbon(k, h, 1));
        }
        if (known instanceof PhAndDic pair) {
            return solvedFromCarbon(k, conditions, pair, hydrogenIon(k, pair.ph()), pair.dic());
        }
        if (known instanceof PhAndPco2 pair) {
            double h = hydrogenIon(k, pair.ph());
            return solvedFromCarbon(k, conditions, pair, h, dicOf(k, h, k.co2(pair.pco2Atm())));
        }
        if (known instanceof AlkalinityAndDic pair) {
            double h = HydrogenIonRoot.fromDic(k, conditions, pair.totalAlkalinity(), pair.dic());
            return Double.isNaN(h)
                    ? notConverged(pair)
                    : solved(k, conditions, pair, h, pair.totalAlkalinity(), pair.dic());
        }
        if (known instanceof AlkalinityAndPco2 pair) {
            double co2 = k.co2(pair.pco2Atm());
            double h = HydrogenIonRoot.fromCo2(k, conditions, pair.totalAlkalinity(), co2);
            return Double.isNaN(h)
                    ? notConverged(pair)
                    : solved(k, conditions, pair, h, pair.totalAlkalinity(), dicOf(k, h, co2));
        }
        DicAndPco2 pair = (DicAndPco2) known;
        double ionised = pair.dic() / k.co2(pair.pco2Atm()) - 1;
        return ionised > 0 && ionised <= IONISED_MAX
                ? solvedFromCarbon(k, conditions, pair, hydrogenIonOfIonised(k, ionised), pair.dic())
                : contradiction(pair);
    }

    /** [H], total scale, of a pH read in water with these constants. */
    static double hydrogenIon(SeawaterConstants k, KnownPh ph) {
        return Math.exp(-(ph.value() + k.scales.offsetToTotal(ph.scale())) * SeawaterConstants.LN_10);
    }

    /** A pH that was given is answered as it was given, to the last digit. */
    private static double phTotal(SeawaterConstants k, KnownPair known, double h) {
        KnownPh ph = known.ph();
        return ph == null ? -Math.log10(h) : ph.value() + k.scales.offsetToTotal(ph.scale());
    }

    /** Where bicarbonate and carbonate together are that many times CO2: the root of r h² = K1 h + K1 K2. */
    private static double hydrogenIonOfIonised(SeawaterConstants k, double r) {
        return (k.k1 + Math.sqrt(k.k1 * (k.k1 + 4 * r * k.k2))) / (2 * r);
    }

    private static double dicOf(SeawaterConstants k, double h, double co2) {
        return co2 * (1 + k.k1 / h * (1 + k.k2 / h));
    }

    private static Unsolvable contradiction(PhAndAlkalinity pair) {
        return new Unsolvable(
                UnsolvableReason.INPUTS_CONTRADICT,
                pair.ph() + " and alkalinity " + pair.totalAlkalinity()
                        + " mol/kg contradict each other: borate, hydroxide and nutrients alone would exceed the"
                        + " alkalinity");
    }

    private static Unsolvable contradiction(DicAndPco2 pair) {
        return new Unsolvable(
                UnsolvableReason.INPUTS_CONTRADICT,
                "dissolved inorganic carbon " + pair.dic() + " mol/kg and pCO2 " + pair.pco2Atm()
                        + " atm contradict each other: dissolved CO2 would be as much as the inorganic carbon or more, or so"
                        + " little of it that the water would be above pH 14");
    }

    private static Unsolvable tooMuchCarbon(CarbonateState state) {
        return new Unsolvable(
                UnsolvableReason.TOO_MUCH_CARBON,
                state.known() + " would need " + state.dic()
                        + " mol/kg of inorganic carbon, and no water holds more than " + DIC_MAX);
    }

    static Unsolvable notConverged(KnownPair pair) {
        return new Unsolvable(
                UnsolvableReason.NOT_CONVERGED,
                "no pH was found for " + pair + " within " + HydrogenIonRoot.MAX_STEPS + " steps");
    }

    private static Solved solvedFromCarbon(
            SeawaterConstants k, Conditions conditions, KnownPair known, double h, double dic) {
        double alkalinity = Alkalinity.ofCarbon(k, h, dic) + Alkalinity.withoutCarbonate(k, conditions, h);
        return solved(k, conditions, known, h, alkalinity, dic);
    }

    private static Solved solved(
            SeawaterConstants k, Conditions conditions, KnownPair known, double h, double totalAlkalinity, double dic) {
        Speciation s = Speciation.of(k, conditions, h, dic);
        return new Solved(new CarbonateState(
                conditions,
                known,
                k,
                phTotal(k, known, h),
                totalAlkalinity,
                dic,
                s.co2(),
                s.bicarbonate(),
                s.carbonate(),
                s.fco2Atm(),
                s.pco2Atm(),
                s.omegaAragonite(),
                s.omegaCalcite(),
                k.densityKgM3,
                Cautions.of(k, conditions, known)));
    }
}
