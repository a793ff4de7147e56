package org.hingeline.dosing;

import java.util.List;
import java.util.Objects;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.InputUncertainty;
import org.jspecify.annotations.Nullable;

/**
 * A question to {@link DosePlanner}. Numbers are not judged here: what the planner cannot stand on, it refuses with a
 * reason.
 *
 * @param water the water as solved from its inputs; null when inputs are missing altogether
 * @param uncertainty standard uncertainties of the inputs
 * @param inputNotes what is wrong with the inputs; empty when nothing is
 * @param receiver what receives the dose
 * @param target what it is to reach
 * @param product what is weighed
 * @param bounds what the plan may not cross
 * @param stock the solution it is added as; null when none is given
 * @param aerationPco2Atm what aeration reaches, atm
 * @param larvae whether larvae are in the water that is dosed
 * @param companion a second agent, to hold pH or pCO2 with; null for one agent alone
 * @param ammoniaMgL total ammonia in the water, mg/L as N; null when it is not known
 * @param surroundings where the water is; null for one that is known by its numbers alone
 */
public record DoseRequest(
        @Nullable CarbonateResult water,
        InputUncertainty uncertainty,
        List<InputNote> inputNotes,
        Receiver receiver,
        Target target,
        Product product,
        Bounds bounds,
        @Nullable Stock stock,
        double aerationPco2Atm,
        boolean larvae,
        @Nullable Companion companion,
        @Nullable Double ammoniaMgL,
        @Nullable Surroundings surroundings) {
    /** 420 µatm, today's air. */
    public static final double AIR_PCO2_ATM = 420e-6;

    public DoseRequest {
        Objects.requireNonNull(uncertainty, "uncertainty");
        inputNotes = List.copyOf(inputNotes);
        Objects.requireNonNull(receiver, "receiver");
        Objects.requireNonNull(target, "target");
        Objects.requireNonNull(product, "product");
        Objects.requireNonNull(bounds, "bounds");
    }

    /** Sound inputs, pure sodium carbonate, default bounds, no stock given, aeration to today's air, no larvae. */
    public static DoseRequestBuilder of(
            @Nullable CarbonateResult water, InputUncertainty uncertainty, Receiver receiver, Target target) {
        return new DoseRequestBuilder(water, uncertainty, receiver, target);
    }

    /** The same question, to be changed. */
    public DoseRequestBuilder but() {
        return new DoseRequestBuilder(water, uncertainty, receiver, target)
                .inputNotes(inputNotes)
                .product(product)
                .bounds(bounds)
                .stock(stock)
                .aerationPco2Atm(aerationPco2Atm)
                .larvae(larvae)
                .companion(companion)
                .ammoniaMgL(ammoniaMgL)
                .surroundings(surroundings);
    }

    /** What may be weighed: one product, or two. */
    List<Product> products() {
        Companion second = companion;
        return second == null ? List.of(product) : List.of(product, second.product());
    }

    /** The stock of the first product (0) or the second (1). */
    @Nullable
    Stock stockOf(int index) {
        Companion second = companion;
        return index == 0 ? stock : second == null ? null : second.stock();
    }
}
