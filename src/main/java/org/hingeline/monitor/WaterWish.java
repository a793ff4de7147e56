package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/**
 * A water as a person or a script gives it, in the units of the wire; what is absent takes its default. Values are judged
 * by {@link WaterCalculator}.
 *
 * @param temperatureC °C (ITS-90), −2 to 45
 * @param salinity practical (PSS-78), 0 to 50; either this or {@code conductivityMsCm}
 * @param conductivityMsCm mS/cm as measured at {@code temperatureC}, not referred to another temperature
 * @param ph on {@code phScale}, 2 to 13; two of this and the next three are needed
 * @param totalAlkalinityUmolKg µmol/kg-seawater
 * @param dicUmolKg dissolved inorganic carbon, µmol/kg-seawater
 * @param pco2Uatm partial pressure of CO2 in air at equilibrium with the water at {@code temperatureC}, µatm
 * @param phScale wire name of a {@link org.hingeline.seawater.PhScale}; total where absent
 * @param phTemperatureC temperature of the sample when its pH was read, °C; the water's own where absent
 * @param phosphateUmolKg µmol/kg-seawater; 0 where absent
 * @param silicateUmolKg µmol/kg-seawater; 0 where absent
 * @param calciumMmolKg measured calcium, mmol/kg-seawater; from salinity where absent
 * @param constants wire name of a {@link org.hingeline.seawater.CarbonicAcidFit}; lueker2000 where absent
 * @param boron wire name of a {@link org.hingeline.seawater.BoronRatio}; lee2010 where absent
 * @param warmToC asks what the water becomes at that temperature, closed to the air, °C
 * @param equilibrateToUatm asks what it becomes in balance with a gas of that pCO2, µatm
 * @param blendWith asks what it becomes mixed with another
 * @param ammoniaMgL total ammonia nitrogen, mg/L as N; asks for its un-ionised share
 */
public record WaterWish(
        @Nullable Double temperatureC,
        @Nullable Double salinity,
        @Nullable Double conductivityMsCm,
        @Nullable Double ph,
        @Nullable Double totalAlkalinityUmolKg,
        @Nullable Double dicUmolKg,
        @Nullable Double pco2Uatm,
        @Nullable String phScale,
        @Nullable Double phTemperatureC,
        @Nullable Double phosphateUmolKg,
        @Nullable Double silicateUmolKg,
        @Nullable Double calciumMmolKg,
        @Nullable String constants,
        @Nullable String boron,
        @Nullable Uncertainty uncertainty,
        @Nullable Double warmToC,
        @Nullable Double equilibrateToUatm,
        @Nullable Blend blendWith,
        @Nullable Double ammoniaMgL) {

    /** Standard uncertainties of what was given, each in the unit of its quantity; absent ones take the usual value. */
    public record Uncertainty(
            @Nullable Double ph,
            @Nullable Double totalAlkalinityUmolKg,
            @Nullable Double dicUmolKg,
            @Nullable Double pco2Uatm,
            @Nullable Double temperatureC,
            @Nullable Double salinity,
            @Nullable Double conductivityMsCm,
            @Nullable Double calciumMmolKg) {}

    /**
     * Another water to mix in.
     *
     * @param water the other water, without wishes of its own; its fits are those of the first where it names none
     * @param massShare its share of the mass of the mixture, 0 to 1
     */
    public record Blend(@Nullable WaterWish water, @Nullable Double massShare) {}

    /** A wish to be filled in. */
    public static WaterWishBuilder builder() {
        return new WaterWishBuilder();
    }
}
