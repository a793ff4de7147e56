package org.hingeline.dosing;

import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * A second agent of a plan, and what it is for.
 *
 * @param product what is weighed
 * @param stock the solution it is added as; null when none is given
 * @param hold what the two together hold
 */
public record Companion(Product product, @Nullable Stock stock, Hold hold) {
    public Companion {
        Objects.requireNonNull(product, "product");
        Objects.requireNonNull(hold, "hold");
    }
}
