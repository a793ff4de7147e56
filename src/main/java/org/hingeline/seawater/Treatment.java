package org.hingeline.seawater;

import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.jspecify.annotations.Nullable;

/** What a water becomes when it is warmed or cooled, aerated, or blended with another. */
public final class Treatment {
    private Treatment() {}

    /**
     * The same water, closed to the air, at another temperature: alkalinity and inorganic carbon stay, pH and Ω move.
     *
     * @param state a solved water
     * @param temperatureC the new temperature, °C, −2 to 45
     */
    public static CarbonateResult atTemperature(CarbonateState state, double temperatureC) {
        return CarbonateSystem.solve(
                state.conditions().withTemperatureC(temperatureC),
                new AlkalinityAndDic(state.totalAlkalinity(), state.dic()));
    }

    /**
     * The same water in equilibrium with a gas, as by aeration: alkalinity stays, CO2 goes in or out.
     *
     * @param state a solved water
     * @param pco2Atm partial pressure of CO2, atm, above 0 to 1
     */
    public static CarbonateResult equilibrated(CarbonateState state, double pco2Atm) {
        return CarbonateSystem.solve(
                state.constants(), state.conditions(), new AlkalinityAndPco2(state.totalAlkalinity(), pco2Atm));
    }

    /**
     * Two waters mixed, closed to the air: mass, heat, salinity, alkalinity, inorganic carbon, calcium and nutrients are
     * conserved. Heat is counted with the heat capacity of each water; the heat of mixing itself is left out. The fits
     * are those of the first water.
     *
     * @param one a solved water
     * @param other the water it is mixed with
     * @param shareOfOther mass of the other over the mass of the mixture, 0 to 1
     * @throws IllegalArgumentException when the share is not from 0 to 1
     */
    public static CarbonateResult blended(CarbonateState one, CarbonateState other, double shareOfOther) {
        if (!(shareOfOther >= 0 && shareOfOther <= 1)) {
            throw new IllegalArgumentException("a share of the mass is from 0 to 1, got " + shareOfOther);
        }
        Conditions a = one.conditions();
        Conditions b = other.conditions();
        Blend blend = new Blend(shareOfOther);
        Conditions mixed = new Conditions(
                new Blend(Blend.heatShareOfOther(a, b, shareOfOther)).of(a.temperatureC(), b.temperatureC()),
                blend.of(a.salinity(), b.salinity()),
                blend.of(a.phosphate(), b.phosphate()),
                blend.of(a.silicate(), b.silicate()),
                calcium(one, other, blend),
                a.fit(),
                a.boron());
        return CarbonateSystem.solve(
                mixed,
                new AlkalinityAndDic(
                        blend.of(one.totalAlkalinity(), other.totalAlkalinity()), blend.of(one.dic(), other.dic())));
    }

    /**
     * The share of the mass that a volume of another water has in a mixture.
     *
     * @param volume of the water, in any unit
     * @param volumeOfOther in the same unit
     */
    public static double massShare(CarbonateState one, double volume, CarbonateState other, double volumeOfOther) {
        double mass = volume * one.densityKgM3();
        double massOfOther = volumeOfOther * other.densityKgM3();
        return massOfOther / (mass + massOfOther);
    }

    /** From salinity while both are: the ratio is the same for every salinity, so mixing keeps it. */
    private static @Nullable Double calcium(CarbonateState one, CarbonateState other, Blend blend) {
        return one.conditions().calcium() == null && other.conditions().calcium() == null
                ? null
                : blend.of(
                        one.constants().calcium(one.conditions()),
                        other.constants().calcium(other.conditions()));
    }
}
