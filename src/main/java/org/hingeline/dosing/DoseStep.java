package org.hingeline.dosing;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * One step of a dose, and the water once it is mixed in.
 *
 * @param atMinutes minutes after the first step
 * @param additions what is added of each product, one or two
 * @param phTotal pH afterwards, total scale
 * @param omegaAragonite saturation state of aragonite afterwards
 */
public record DoseStep(int atMinutes, List<Addition> additions, double phTotal, double omegaAragonite) {
    public DoseStep {
        additions = List.copyOf(additions);
        if (additions.isEmpty()) {
            throw new IllegalArgumentException("a step needs something to add");
        }
    }

    /** What to weigh of the first product, g; 0 where it is injected only. */
    public double massG() {
        Double massG = additions.get(0).massG();
        return massG == null ? 0 : massG;
    }

    /** The same as stock solution, mL; null when no stock was given or it is injected only. */
    public @Nullable Double stockMl() {
        return additions.get(0).stockMl();
    }
}
