package org.hingeline.dosing;

import java.util.Objects;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.InputUncertainty;

/**
 * The present water of another point of the site.
 *
 * @param code of the point
 * @param name of the point, as it should read in a sentence
 * @param kind what it is
 * @param state its water, from fresh inputs
 * @param uncertainty standard uncertainties of those inputs
 */
public record OtherWater(String code, String name, WaterKind kind, CarbonateState state, InputUncertainty uncertainty) {
    public OtherWater {
        Objects.requireNonNull(kind, "kind");
        Objects.requireNonNull(state, "state");
        Objects.requireNonNull(uncertainty, "uncertainty");
    }
}
