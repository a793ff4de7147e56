package org.hingeline.dosing;

import org.jspecify.annotations.Nullable;

/**
 * One addition, and the water once it is mixed in.
 *
 * @param atMinutes minutes after the first addition
 * @param massG what to weigh for this addition, g
 * @param stockMl the same as stock solution, mL; null when no stock was given
 * @param phTotal pH afterwards, total scale
 * @param omegaAragonite saturation state of aragonite afterwards
 */
public record DoseStep(
        int atMinutes, double massG, @Nullable Double stockMl, double phTotal, double omegaAragonite) {}
