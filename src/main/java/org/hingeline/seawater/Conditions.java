package org.hingeline.seawater;

import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * Everything about a water but the two carbonate quantities, and which fits to use for it.
 *
 * <p>Values are not judged here: {@link CarbonateSystem} answers a typed refusal for what it cannot solve, so that a bad
 * number from a sensor is an answer and not an exception.
 *
 * @param temperatureC temperature, °C (ITS-90), −2 to 45
 * @param salinity practical salinity (PSS-78), 0 to 50
 * @param phosphate total phosphate, mol/kg-seawater, 0 to 0.001
 * @param silicate total silicate, mol/kg-seawater, 0 to 0.01
 * @param calcium measured calcium, mol/kg-seawater, 0 to 0.1; null takes it from salinity
 * @param fit K1 and K2 of carbonic acid
 * @param boron total boron from salinity
 */
public record Conditions(
        double temperatureC,
        double salinity,
        double phosphate,
        double silicate,
        @Nullable Double calcium,
        CarbonicAcidFit fit,
        BoronRatio boron) {
    public Conditions {
        Objects.requireNonNull(fit, "fit");
        Objects.requireNonNull(boron, "boron");
    }

    /** No nutrients, calcium from salinity, Lueker et al. 2000 and Lee et al. 2010. */
    public static Conditions of(double temperatureC, double salinity) {
        return new Conditions(temperatureC, salinity, 0, 0, null, CarbonicAcidFit.LUEKER_2000, BoronRatio.LEE_2010);
    }

    /** The same water at another temperature, °C. */
    public Conditions withTemperatureC(double newTemperatureC) {
        return new Conditions(newTemperatureC, salinity, phosphate, silicate, calcium, fit, boron);
    }

    /** The same water with these nutrients, mol/kg-seawater. */
    public Conditions withNutrients(double newPhosphate, double newSilicate) {
        return new Conditions(temperatureC, salinity, newPhosphate, newSilicate, calcium, fit, boron);
    }

    /** The same water with measured calcium, mol/kg-seawater; null takes it from salinity. */
    public Conditions withCalcium(@Nullable Double newCalcium) {
        return new Conditions(temperatureC, salinity, phosphate, silicate, newCalcium, fit, boron);
    }

    /** The same water with other fits. */
    public Conditions with(CarbonicAcidFit newFit, BoronRatio newBoron) {
        return new Conditions(temperatureC, salinity, phosphate, silicate, calcium, newFit, newBoron);
    }
}
