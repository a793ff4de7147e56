package org.hingeline.web;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.StandardUncertainty;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.web.CalculatorResult.Part;

/** All numbers of a water with all digits that are worth copying, under the names that the API has for them. */
final class CalculatorDigits {
    private static final MathContext EIGHT = new MathContext(8);

    private CalculatorDigits() {}

    static String of(CalculatedWater water, StateUncertainty uncertainty, List<Part> parts) {
        CarbonateState state = water.state();
        StringBuilder text = new StringBuilder();
        row(text, "", "value", "\u00b1", "constants", "inputs");
        for (Part part : parts) {
            StandardUncertainty u = part.uncertainty().apply(uncertainty);
            row(
                    text,
                    part.code(),
                    plain(part.value().applyAsDouble(state) * part.scale()),
                    plain(u.total() * part.scale()),
                    plain(u.fromConstants() * part.scale()),
                    plain(u.fromInputs() * part.scale()));
        }
        row(text, "densityKgM3", plain(state.densityKgM3()), "", "", "");
        row(text, "temperatureC", plain(state.conditions().temperatureC()), "", "", "");
        row(text, "salinity", plain(state.conditions().salinity()), "", "", "");
        return text.toString().stripTrailing();
    }

    private static void row(StringBuilder text, String name, String value, String u, String constants, String inputs) {
        text.append(String.format(Locale.ROOT, "%-22s %12s %12s %12s %12s%n", name, value, u, constants, inputs)
                .replaceAll(" +\\R", "\n"));
    }

    private static String plain(double value) {
        BigDecimal rounded = new BigDecimal(value).round(EIGHT);
        return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
    }

    /** What a method gives, for people. */
    static String methodName(String key) {
        return switch (key) {
            case "constants" -> "carbonic acid";
            case "co2Solubility" -> "solubility of CO\u2082";
            case "ksp" -> "solubility of aragonite and calcite";
            case "phScale" -> "pH scale of the results";
            case "phConversion" -> "pH as given";
            case "uncertainty" -> "\u00b1";
            default -> key;
        };
    }
}
