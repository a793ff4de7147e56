package org.hingeline.monitor;

import java.util.Objects;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.hingeline.seawater.Conditions;
import org.jspecify.annotations.Nullable;

/** How the water states of points are made: how old an input may be, and which published fits they are computed with. */
public record WaterRules(AgeLimits ageLimits, CarbonicAcidFit constants, BoronRatio boron) {
    public WaterRules {
        Objects.requireNonNull(ageLimits, "ageLimits");
        Objects.requireNonNull(constants, "constants");
        Objects.requireNonNull(boron, "boron");
    }

    /** With Lueker et al. 2000 and Lee et al. 2010. */
    public static WaterRules of(AgeLimits ageLimits) {
        return new WaterRules(ageLimits, CarbonicAcidFit.LUEKER_2000, BoronRatio.LEE_2010);
    }

    /** @param calciumMmolKg measured calcium, mmol/kg; null takes it from salinity */
    Conditions conditions(double temperatureC, double salinity, @Nullable Double calciumMmolKg) {
        return Conditions.of(temperatureC, salinity)
                .with(constants, boron)
                .withCalcium(calciumMmolKg == null ? null : calciumMmolKg * 1e-3);
    }
}
