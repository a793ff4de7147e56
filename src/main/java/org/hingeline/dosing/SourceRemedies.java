package org.hingeline.dosing;

import java.util.Comparator;
import java.util.Optional;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.ConstantUncertainty;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.seawater.Treatment;
import org.hingeline.seawater.Uncertainty;

/** Remedies that draw on another point's water, or keep it out. */
final class SourceRemedies {
    private static final int SHARES_TRIED = 100;
    private static final int HALVINGS = 40;
    private static final String HOLD_NEEDS =
            "A better water to draw from, known from fresh readings, and enough of it.";
    private static final String BLEND_NEEDS = "Another point's water, known from fresh readings, and enough of it.";

    private final DoseRequest request;
    private final Surroundings around;
    private final CarbonateState before;
    private final Uncertainty uncertainty;
    private final Target target;

    /** A share of another water, and what it makes. */
    private record Blended(OtherWater other, double share, CarbonateState state) {}

    SourceRemedies(DoseRequest request, Surroundings around, CarbonateState before, Uncertainty uncertainty) {
        this.request = request;
        this.around = around;
        this.before = before;
        this.uncertainty = uncertainty;
        this.target = request.target();
    }

    Remedy hold() {
        Optional<OtherWater> feed = around.feed();
        // of an intake the water in question is what would be held
        CarbonateState comesIn = around.kind() == WaterKind.INTAKE
                ? before
                : feed.map(OtherWater::state).orElse(null);
        if (comesIn == null) {
            return Remedy.cannot(
                    "hold",
                    HOLD_NEEDS,
                    "Whether to hold the intake cannot be told: what flows in is not known at present.");
        }
        Optional<OtherWater> store = around.others().stream()
                .filter(o ->
                        o.kind() == WaterKind.STORE && !feed.filter(o::equals).isPresent())
                .max(Comparator.comparingDouble(o -> target.of(o.state())));
        boolean ownIsKept = around.kind() != WaterKind.INTAKE;
        double own = ownIsKept ? target.of(before) : Double.NEGATIVE_INFINITY;
        double stored = store.map(o -> target.of(o.state())).orElse(Double.NEGATIVE_INFINITY);
        if (Math.max(own, stored) <= target.of(comesIn)) {
            return Remedy.cannot(
                    "hold",
                    HOLD_NEEDS,
                    "Holding the intake does not help: what flows in, at " + Words.water(comesIn)
                            + ", is no worse than "
                            + (ownIsKept ? "the water here" : "")
                            + (ownIsKept && store.isPresent() ? " and " : "")
                            + store.map(OtherWater::name).orElse(ownIsKept ? "" : "any stored water that is known")
                            + ".");
        }
        if (own >= stored) {
            return Remedy.to(
                    "hold",
                    "Hold what flows in, which is at " + Words.water(comesIn)
                            + ", and let the water here recirculate: it stays at",
                    HOLD_NEEDS,
                    null,
                    null,
                    before,
                    uncertainty.ofState(),
                    target);
        }
        OtherWater from = store.orElseThrow();
        return Remedy.to(
                "hold",
                "Hold what flows in, which is at " + Words.water(comesIn) + ", and draw from " + from.name()
                        + " instead, which is at",
                HOLD_NEEDS,
                from,
                null,
                from.state(),
                of(from).ofState(),
                target);
    }

    /** The least share of another water that reaches the target. */
    Remedy blend() {
        if (around.sources().isEmpty()) {
            return Remedy.cannot(
                    "blend", BLEND_NEEDS, "Blending cannot be told: no other water to draw from is known at present.");
        }
        Optional<Blended> least = around.sources().stream()
                .flatMap(other -> leastShare(other).stream())
                .min(Comparator.comparingDouble(Blended::share));
        if (least.isPresent()) {
            return remedy(least.get());
        }
        OtherWater best = around.sources().stream()
                .max(Comparator.comparingDouble(o -> target.of(o.state())))
                .orElseThrow();
        return Remedy.cannot(
                "blend",
                BLEND_NEEDS,
                "Blending does not reach " + target.words() + ": the best other water, " + best.name() + ", is at "
                        + Words.water(best.state()) + " itself.");
    }

    private Remedy remedy(Blended blended) {
        StateUncertainty sure = uncertainty
                .blendedWith(of(blended.other()), blended.share(), blended.state())
                .ofState();
        double volumeShare = volumeShare(blended);
        String litres = request.receiver() instanceof Receiver.Flow flow
                ? Words.litresAtLeast(volumeShare * flow.flowLMin()) + "/min"
                : Words.litresAtLeast(volumeShare * request.receiver().litresDosed());
        return Remedy.to(
                "blend",
                "With " + Words.number(Math.ceil(1000 * blended.share()) / 10, 1) + " % of the water from "
                        + blended.other().name() + " (" + litres + ") the water goes from " + Words.water(before)
                        + " to " + Words.number(blended.state().conditions().temperatureC(), 1) + " °C, salinity "
                        + Words.number(blended.state().conditions().salinity(), 1) + ",",
                BLEND_NEEDS,
                blended.other(),
                blended.share(),
                blended.state(),
                sure,
                target);
    }

    /** The share of the volume of the blend, whose density is close to that of both. */
    private double volumeShare(Blended blended) {
        double other = blended.share() / blended.other().state().densityKgM3();
        return other / (other + (1 - blended.share()) / before.densityKgM3());
    }

    /** The target's quantity need not move one way with the share, so the first crossing is looked for from below. */
    private Optional<Blended> leastShare(OtherWater other) {
        for (int i = 1; i <= SHARES_TRIED; i++) {
            double high = (double) i / SHARES_TRIED;
            if (reached(other, high)) {
                double low = (double) (i - 1) / SHARES_TRIED;
                for (int j = 0; j < HALVINGS; j++) {
                    double middle = (low + high) / 2;
                    if (reached(other, middle)) {
                        high = middle;
                    } else {
                        low = middle;
                    }
                }
                double share = high;
                return mixed(other, share).map(state -> new Blended(other, share, state));
            }
        }
        return Optional.empty();
    }

    private boolean reached(OtherWater other, double share) {
        return mixed(other, share)
                .filter(state -> target.of(state) >= target.value())
                .isPresent();
    }

    private Optional<CarbonateState> mixed(OtherWater other, double share) {
        return Treatment.blended(before, other.state(), share) instanceof Solved solved
                ? Optional.of(solved.state())
                : Optional.empty();
    }

    private static Uncertainty of(OtherWater other) {
        return Uncertainty.ofMeasured(other.state(), other.uncertainty(), ConstantUncertainty.ORR_2018);
    }
}
