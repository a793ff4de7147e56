package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hingeline.seawater.CarbonateState;

/** Splits a dose into hourly steps of about the same change in pH, none above the bound. */
final class StepSchedule {
    /** Three days of hourly additions: beyond that the water has changed by itself. */
    static final int STEPS_MAX = 72;

    private static final int MINUTES_BETWEEN = 60;

    private final DosedWater water;
    private final DoseRequest request;
    private final Bounds bounds;
    private final Weighing weighing;

    StepSchedule(DosedWater water, DoseRequest request, Weighing weighing) {
        this.water = water;
        this.request = request;
        this.bounds = request.bounds();
        this.weighing = weighing;
    }

    /** The fewest steps that keep the bounds; empty when the balance is too coarse or the time too long. */
    Optional<List<DoseStep>> steps() {
        long parcels = weighing.parcels();
        double whole = Math.abs(at(parcels).phTotal() - water.before().phTotal());
        int fewest = Math.max(1, (int) Math.ceil(whole / bounds.phPerHourMax()));
        for (int n = fewest; n <= Math.min(STEPS_MAX, parcels); n++) {
            List<DoseStep> steps = split(n);
            if (keepsTheBounds(steps)) {
                return Optional.of(steps);
            }
        }
        List<DoseStep> steps = longest();
        return steps.size() <= STEPS_MAX && keepsTheBounds(steps) ? Optional.of(steps) : Optional.empty();
    }

    /** Each step as long as the bound lets it be: where the balance is coarse, even steps may fail and these not. */
    private List<DoseStep> longest() {
        List<DoseStep> steps = new ArrayList<>();
        long parcels = weighing.parcels();
        boolean rising = at(parcels).phTotal() > water.before().phTotal();
        long given = 0;
        while (given < parcels && steps.size() <= STEPS_MAX) {
            double reach = at(given).phTotal() + (rising ? 1 : -1) * bounds.phPerHourMax();
            double whole = at(parcels).phTotal();
            boolean last = rising ? whole <= reach : whole >= reach;
            long sum = last ? parcels : Math.max(given + 1, parcelsAt(reach, given, parcels, rising));
            steps.add(step(steps.size() * MINUTES_BETWEEN, given, sum));
            given = sum;
        }
        return steps;
    }

    private List<DoseStep> split(int n) {
        List<DoseStep> steps = new ArrayList<>();
        long parcels = weighing.parcels();
        double start = water.before().phTotal();
        double whole = at(parcels).phTotal() - start;
        long given = 0;
        for (int i = 1; i <= n; i++) {
            long sum = i == n ? parcels : parcelsAt(start + whole * i / n, given, parcels, whole > 0);
            if (sum > given) {
                steps.add(step(steps.size() * MINUTES_BETWEEN, given, sum));
            }
            given = sum;
        }
        return steps;
    }

    private DoseStep step(int atMinutes, long given, long sum) {
        CarbonateState state = at(sum);
        List<Addition> additions = new ArrayList<>();
        for (int i = 0; i < weighing.products(); i++) {
            additions.add(Addition.of(
                    request.receiver(), weighing.grams(i, given, sum), weighing.grams(i, 0, sum), request.stockOf(i)));
        }
        return new DoseStep(atMinutes, additions, state.phTotal(), state.omegaAragonite());
    }

    /** The largest sum of parcels whose pH has not passed the mark. */
    private long parcelsAt(double mark, long from, long to, boolean rising) {
        long low = from;
        long high = to;
        while (high - low > 1) {
            long middle = low + (high - low) / 2;
            double ph = at(middle).phTotal();
            if (rising ? ph <= mark : ph >= mark) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return low;
    }

    private boolean keepsTheBounds(List<DoseStep> steps) {
        double ceiling = ceilingHeld();
        double ph = water.before().phTotal();
        for (DoseStep step : steps) {
            if (Math.abs(step.phTotal() - ph) > bounds.phPerHourMax()
                    || step.phTotal() > ceiling
                    || step.phTotal() > bounds.phTotalMax()
                    || step.omegaAragonite() > bounds.omegaAragoniteMax()) {
                return false;
            }
            ph = step.phTotal();
        }
        return true;
    }

    /** A ceiling of pH that two agents hold, unless the water comes down to it from above. */
    private double ceilingHeld() {
        Companion companion = request.companion();
        return companion != null
                        && companion.hold() instanceof Hold.PhAtMost ph
                        && companion.hold().keptBy(water.before())
                ? ph.phTotalMax()
                : Double.POSITIVE_INFINITY;
    }

    private CarbonateState at(long some) {
        return water.withMasses(weighing.grams(some));
    }
}
