package org.hingeline.monitor;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.Origin;
import org.hingeline.seawater.StateUncertainty;
import org.jspecify.annotations.Nullable;

/**
 * What {@link WaterCalculator} makes of a {@link WaterWish}.
 *
 * @param state the water
 * @param uncertainty of its quantities; null when none was asked for
 * @param omegaAragoniteByOrigin the uncertainty of Ω of aragonite that each origin alone would give; empty when none was
 *     asked for
 * @param inputs the standard uncertainties counted with, the usual ones where the wish named none
 * @param warmed the water at another temperature; null when not asked for
 * @param equilibrated the water in balance with a gas; null when not asked for
 * @param blended the water mixed with another; null when not asked for
 * @param ammonia null when not asked for
 * @param cautions of the water, of the salinity out of its conductivity, and of the ammonia
 * @param method which fits were used, and how the inputs were read
 */
public record CalculatedWater(
        CarbonateState state,
        @Nullable StateUncertainty uncertainty,
        Map<Origin, Double> omegaAragoniteByOrigin,
        InputUncertainty inputs,
        @Nullable Treated warmed,
        @Nullable Treated equilibrated,
        @Nullable Treated blended,
        @Nullable UnionisedAmmonia ammonia,
        List<Caution> cautions,
        WaterMethod method) {
    public CalculatedWater {
        Objects.requireNonNull(state, "state");
        omegaAragoniteByOrigin = Map.copyOf(omegaAragoniteByOrigin);
        Objects.requireNonNull(inputs, "inputs");
        cautions = List.copyOf(cautions);
        Objects.requireNonNull(method, "method");
    }

    /**
     * What the water becomes.
     *
     * @param uncertainty carried over from the water's; null when none was asked for
     * @param cautions of the state, and of the other water of a blend
     */
    public record Treated(CarbonateState state, @Nullable StateUncertainty uncertainty, List<Caution> cautions) {
        public Treated {
            Objects.requireNonNull(state, "state");
            cautions = List.copyOf(cautions);
        }
    }

    /**
     * The toxic form of ammonia.
     *
     * @param share un-ionised over total, 0 to 1
     * @param nitrogenMgL un-ionised, mg/L as N
     * @param nh3MgL the same, mg/L as NH3
     * @param cautions about the fit
     */
    public record UnionisedAmmonia(double share, double nitrogenMgL, double nh3MgL, List<Caution> cautions) {
        public UnionisedAmmonia {
            cautions = List.copyOf(cautions);
        }
    }
}
