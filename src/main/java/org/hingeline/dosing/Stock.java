package org.hingeline.dosing;

import org.jspecify.annotations.Nullable;

/**
 * The solution that a dose is added as. Numbers are judged by the planner, not here.
 *
 * @param gramsPerLitre strength, g of what is weighed per L
 * @param temperatureC of the stock, °C; null takes the water's
 */
public record Stock(double gramsPerLitre, @Nullable Double temperatureC) {
    double temperatureIn(double waterTemperatureC) {
        return temperatureC == null ? waterTemperatureC : temperatureC;
    }
}
