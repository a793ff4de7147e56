package org.hingeline.dosing;

import org.jspecify.annotations.Nullable;

/**
 * What a step adds of one product.
 *
 * @param massG what to weigh and put in, g; null where nothing is put in at once
 * @param stockMl the same as stock solution, mL; null without a stock
 * @param gramsPerHour what to inject steadily from then on, g/h; null for water that does not flow
 * @param stockMlPerMinute the same as stock solution, mL/min; null without a stock
 */
public record Addition(
        @Nullable Double massG,
        @Nullable Double stockMl,
        @Nullable Double gramsPerHour,
        @Nullable Double stockMlPerMinute) {
    static Addition of(Receiver receiver, double putInG, double reachedG, @Nullable Stock stock) {
        Double massG = receiver.charged() ? putInG : null;
        Double gramsPerHour = receiver.injectedPerHour() > 0 ? reachedG * receiver.injectedPerHour() : null;
        return new Addition(
                massG,
                massG == null || stock == null ? null : massG / stock.gramsPerLitre() * 1000,
                gramsPerHour,
                gramsPerHour == null || stock == null ? null : gramsPerHour / stock.gramsPerLitre() * 1000 / 60);
    }
}
