package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The refusals and cautions that the methods giving a {@link Figure} share. */
final class FigureCheck {
    static final String PH_CODE = UnsolvableReason.PH_OUT_OF_RANGE.code();

    private FigureCheck() {}

    /** A refusal when a value is not a number or outside what can be; the ends are accepted. */
    static Optional<Figure.Refused> within(
            String code, String name, double value, double min, double max, String unit) {
        if (value >= min && value <= max) {
            return Optional.empty();
        }
        return Optional.of(new Figure.Refused(
                code, name + " " + value + unit + " cannot be: " + min + " to " + max + unit + " is accepted"));
    }

    /** A refusal of a temperature or salinity that no fit covers. */
    static Optional<Figure.Refused> water(double temperatureC, double salinity) {
        return SolvableWater.refusal(temperatureC, salinity)
                .map(refusal -> new Figure.Refused(refusal.reason().code(), refusal.detail()));
    }

    static Optional<Figure.Refused> ph(double ph) {
        return within(PH_CODE, "pH", ph, InputCheck.PH_MIN, InputCheck.PH_MAX, "");
    }

    /** Cautions of the fits that do not cover the water. */
    static List<Caution> cautions(double temperatureC, double salinity, FitRange... fits) {
        List<Caution> cautions = new ArrayList<>();
        for (FitRange fit : fits) {
            fit.caution(temperatureC, salinity).ifPresent(cautions::add);
        }
        return cautions;
    }
}
