package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hingeline.seawater.CarbonateState;
import org.jspecify.annotations.Nullable;

/** Splits a mass into hourly additions of about the same step in pH, none above the bound. */
final class StepSchedule {
    /** Three days of hourly additions: beyond that the water has changed by itself. */
    static final int STEPS_MAX = 72;

    private static final int MINUTES_BETWEEN = 60;

    private final DosedWater water;
    private final Bounds bounds;
    private final Balance balance;
    private final @Nullable Double stockGramsPerLitre;

    StepSchedule(DosedWater water, Bounds bounds, Balance balance, @Nullable Double stockGramsPerLitre) {
        this.water = water;
        this.bounds = bounds;
        this.balance = balance;
        this.stockGramsPerLitre = stockGramsPerLitre;
    }

    /** The fewest additions that keep the step in pH; empty when the balance is too coarse or the time too long. */
    Optional<List<DoseStep>> of(long units) {
        double whole = Math.abs(at(units).phTotal() - water.before().phTotal());
        int fewest = Math.max(1, (int) Math.ceil(whole / bounds.phPerHourMax()));
        for (int n = fewest; n <= Math.min(STEPS_MAX, units); n++) {
            List<DoseStep> steps = split(units, n);
            if (keepsTheBounds(steps)) {
                return Optional.of(steps);
            }
        }
        return Optional.empty();
    }

    private List<DoseStep> split(long units, int n) {
        List<DoseStep> steps = new ArrayList<>();
        double start = water.before().phTotal();
        double whole = at(units).phTotal() - start;
        long given = 0;
        for (int i = 1; i <= n; i++) {
            long sum = i == n ? units : unitsAt(start + whole * i / n, given, units, whole > 0);
            if (sum > given) {
                CarbonateState state = at(sum);
                double massG = balance.grams(sum - given);
                steps.add(new DoseStep(
                        steps.size() * MINUTES_BETWEEN,
                        massG,
                        stockGramsPerLitre == null ? null : massG / stockGramsPerLitre * 1000,
                        state.phTotal(),
                        state.omegaAragonite()));
            }
            given = sum;
        }
        return steps;
    }

    /** The largest sum of units whose pH has not passed the mark. */
    private long unitsAt(double mark, long from, long to, boolean rising) {
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
        double ph = water.before().phTotal();
        for (DoseStep step : steps) {
            if (Math.abs(step.phTotal() - ph) > bounds.phPerHourMax()
                    || step.phTotal() > bounds.phTotalMax()
                    || step.omegaAragonite() > bounds.omegaAragoniteMax()) {
                return false;
            }
            ph = step.phTotal();
        }
        return true;
    }

    private CarbonateState at(long units) {
        return water.with(water.alkalinityOf(balance.grams(units)));
    }
}
