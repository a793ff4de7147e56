package org.hingeline.dosing;

import org.jspecify.annotations.Nullable;

/**
 * One product of a plan.
 *
 * @param product what is weighed
 * @param massG what to weigh in all, g; null where it is injected only
 * @param gramsPerHour what to inject steadily once the target is reached, g/h; null for water that does not flow
 * @param stockMlPerMinute the same as stock solution, mL/min; null without a stock
 * @param stock how to make up the stock; null when no strength was given
 */
public record PlannedProduct(
        Product product,
        @Nullable Amount massG,
        @Nullable Amount gramsPerHour,
        @Nullable Double stockMlPerMinute,
        @Nullable StockRecipe stock) {
    private static final double HOURS_OF_STOCK = 24;

    /** @param reached the mass for {@link Receiver#litresDosed}, g, with its range */
    static PlannedProduct of(
            Product product, Receiver receiver, Amount reached, @Nullable Stock stock, double waterTemperatureC) {
        double perHour = receiver.injectedPerHour();
        Amount massG = receiver.charged() ? reached : null;
        Amount gramsPerHour = perHour > 0 ? reached.times(perHour) : null;
        if (stock == null) {
            return new PlannedProduct(product, massG, gramsPerHour, null, null);
        }
        double temperatureC = stock.temperatureIn(waterTemperatureC);
        double litres =
                reached.value() * ((receiver.charged() ? 1 : 0) + HOURS_OF_STOCK * perHour) / stock.gramsPerLitre();
        return new PlannedProduct(
                product,
                massG,
                gramsPerHour,
                gramsPerHour == null ? null : gramsPerHour.value() / stock.gramsPerLitre() * 1000 / 60,
                new StockRecipe(
                        stock.gramsPerLitre(),
                        temperatureC,
                        product.strongestStockGramsPerLitre(temperatureC),
                        litres));
    }
}
