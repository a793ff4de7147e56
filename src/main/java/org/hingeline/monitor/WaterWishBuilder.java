package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/** Fills in a {@link WaterWish} field by field; what is never set is absent. */
public final class WaterWishBuilder {
    private @Nullable Double temperatureC;
    private @Nullable Double salinity;
    private @Nullable Double conductivityMsCm;
    private @Nullable Double ph;
    private @Nullable Double totalAlkalinityUmolKg;
    private @Nullable Double dicUmolKg;
    private @Nullable Double pco2Uatm;
    private @Nullable String phScale;
    private @Nullable Double phTemperatureC;
    private @Nullable Double phosphateUmolKg;
    private @Nullable Double silicateUmolKg;
    private @Nullable Double calciumMmolKg;
    private @Nullable String constants;
    private @Nullable String boron;
    private WaterWish.@Nullable Uncertainty uncertainty;
    private @Nullable Double warmToC;
    private @Nullable Double equilibrateToUatm;
    private WaterWish.@Nullable Blend blendWith;
    private @Nullable Double ammoniaMgL;

    WaterWishBuilder() {}

    public WaterWishBuilder temperatureC(@Nullable Double value) {
        temperatureC = value;
        return this;
    }

    public WaterWishBuilder salinity(@Nullable Double value) {
        salinity = value;
        return this;
    }

    public WaterWishBuilder conductivityMsCm(@Nullable Double value) {
        conductivityMsCm = value;
        return this;
    }

    public WaterWishBuilder ph(@Nullable Double value) {
        ph = value;
        return this;
    }

    public WaterWishBuilder totalAlkalinityUmolKg(@Nullable Double value) {
        totalAlkalinityUmolKg = value;
        return this;
    }

    public WaterWishBuilder dicUmolKg(@Nullable Double value) {
        dicUmolKg = value;
        return this;
    }

    public WaterWishBuilder pco2Uatm(@Nullable Double value) {
        pco2Uatm = value;
        return this;
    }

    public WaterWishBuilder phScale(@Nullable String value) {
        phScale = value;
        return this;
    }

    public WaterWishBuilder phTemperatureC(@Nullable Double value) {
        phTemperatureC = value;
        return this;
    }

    public WaterWishBuilder phosphateUmolKg(@Nullable Double value) {
        phosphateUmolKg = value;
        return this;
    }

    public WaterWishBuilder silicateUmolKg(@Nullable Double value) {
        silicateUmolKg = value;
        return this;
    }

    public WaterWishBuilder calciumMmolKg(@Nullable Double value) {
        calciumMmolKg = value;
        return this;
    }

    public WaterWishBuilder constants(@Nullable String value) {
        constants = value;
        return this;
    }

    public WaterWishBuilder boron(@Nullable String value) {
        boron = value;
        return this;
    }

    public WaterWishBuilder uncertainty(WaterWish.@Nullable Uncertainty value) {
        uncertainty = value;
        return this;
    }

    public WaterWishBuilder warmToC(@Nullable Double value) {
        warmToC = value;
        return this;
    }

    public WaterWishBuilder equilibrateToUatm(@Nullable Double value) {
        equilibrateToUatm = value;
        return this;
    }

    public WaterWishBuilder blendWith(WaterWish.@Nullable Blend value) {
        blendWith = value;
        return this;
    }

    public WaterWishBuilder ammoniaMgL(@Nullable Double value) {
        ammoniaMgL = value;
        return this;
    }

    public WaterWish build() {
        return new WaterWish(
                temperatureC,
                salinity,
                conductivityMsCm,
                ph,
                totalAlkalinityUmolKg,
                dicUmolKg,
                pco2Uatm,
                phScale,
                phTemperatureC,
                phosphateUmolKg,
                silicateUmolKg,
                calciumMmolKg,
                constants,
                boron,
                uncertainty,
                warmToC,
                equilibrateToUatm,
                blendWith,
                ammoniaMgL);
    }
}
