package org.hingeline.seawater;

/**
 * The [H] at which a water has a given alkalinity, by Newton's method in ln [H] on a bracket that holds the root by
 * proof, with bisection where a Newton step would leave it: the approach of Munhoven, G. (2013), Mathematics of the
 * total alkalinity–pH equation, Geoscientific Model Development 6, 1367–1388.
 *
 * <p>Alkalinity falls strictly with [H]. Everything in it but hydroxide and free H⁺ is bounded, so the root lies between
 * those of a/h − h/s = c for the two bounds, which are closed forms.
 *
 * <p>A Newton step of d in ln [H] leaves an error of at most half of {@link Alkalinity#CURVATURE_MAX} times d², so the
 * search ends with the step that is small enough to leave {@link #TOLERANCE}.
 */
final class HydrogenIonRoot {
    /** Relative in [H]. */
    static final double TOLERANCE = 1e-14;

    static final int MAX_STEPS = 100;

    private static final double LAST_STEP = Math.sqrt(TOLERANCE / Alkalinity.CURVATURE_MAX);

    /** Steps in ln [H] from which 1 + d + d²/2 stands for the exponential of d. */
    private static final double SMALL_STEP = 0.1;

    private HydrogenIonRoot() {}

    /** [H], total scale, from total alkalinity and inorganic carbon; not a number when not converged. */
    static double fromDic(SeawaterConstants k, Conditions conditions, double totalAlkalinity, double dic) {
        double low = balance(k, k.kw, totalAlkalinity - Alkalinity.infimumWithoutWater(k, conditions));
        double high = balance(k, k.kw, totalAlkalinity - (Alkalinity.supremumWithoutWater(k, conditions) + 2 * dic));
        double h = within(low, high, carbonateGuess(k, totalAlkalinity, dic));
        for (int step = 0; step < MAX_STEPS; step++) {
            double excess =
                    Alkalinity.ofCarbon(k, h, dic) + Alkalinity.withoutCarbonate(k, conditions, h) - totalAlkalinity;
            if (excess > 0) {
                low = h;
            } else {
                high = h;
            }
            double slope = Alkalinity.slopeOfCarbon(k, h, dic) + Alkalinity.slopeWithoutCarbonate(k, conditions, h);
            double move = -excess / slope;
            h = moved(h, move, low, high);
            if (Math.abs(move) <= LAST_STEP) {
                return h;
            }
        }
        return Double.NaN;
    }

    /** [H], total scale, from total alkalinity and dissolved CO2; not a number when not converged. */
    static double fromCo2(SeawaterConstants k, Conditions conditions, double totalAlkalinity, double co2) {
        // bicarbonate joins hydroxide in a/h; dropping carbonate, 2 co2 K1 K2/h², leaves a bound from below
        double a = k.kw + co2 * k.k1;
        double low = balance(k, a, totalAlkalinity - Alkalinity.infimumWithoutWater(k, conditions));
        // from h = 2 co2 K1 K2/a on, carbonate is no more than a/h, so 2a/h − h/s bounds from above
        double high = Math.max(
                2 * co2 * k.k1 * k.k2 / a,
                balance(k, 2 * a, totalAlkalinity - Alkalinity.supremumWithoutWater(k, conditions)));
        double h = within(low, high, 1e-8);
        for (int step = 0; step < MAX_STEPS; step++) {
            double excess =
                    Alkalinity.ofCo2(k, h, co2) + Alkalinity.withoutCarbonate(k, conditions, h) - totalAlkalinity;
            if (excess > 0) {
                low = h;
            } else {
                high = h;
            }
            double slope = Alkalinity.slopeOfCo2(k, h, co2) + Alkalinity.slopeWithoutCarbonate(k, conditions, h);
            double move = -excess / slope;
            h = moved(h, move, low, high);
            if (Math.abs(move) <= LAST_STEP) {
                return h;
            }
        }
        return Double.NaN;
    }

    /** The positive root of a/h − h/s = c, written so that neither sign of c cancels. */
    private static double balance(SeawaterConstants k, double a, double c) {
        double s = k.scales.totalOverFree();
        double root = Math.sqrt(c * c + 4 * a / s);
        return c > 0 ? 2 * a / (c + root) : s * (root - c) / 2;
    }

    /** [H] if borate were what it is at pH 8 and the rest of the alkalinity carbonate. */
    private static double carbonateGuess(SeawaterConstants k, double totalAlkalinity, double dic) {
        double ratio = (totalAlkalinity - k.boron * k.kb / (k.kb + 1e-8)) / dic;
        if (!(ratio > 0.01 && ratio < 1.99)) {
            return 1e-8;
        }
        double b = k.k1 * (ratio - 1);
        double root = Math.sqrt(b * b - 4 * ratio * k.k1 * k.k2 * (ratio - 2));
        return b < 0 ? (root - b) / (2 * ratio) : 2 * k.k1 * k.k2 * (2 - ratio) / (root + b);
    }

    private static double within(double low, double high, double guess) {
        return guess > low && guess < high ? guess : Math.sqrt(low * high);
    }

    /** h moved by that much in ln h, or the middle of the bracket in ln h where that would leave it. */
    private static double moved(double h, double move, double low, double high) {
        double next = h * (Math.abs(move) < SMALL_STEP ? 1 + move * (1 + move / 2) : Math.exp(move));
        if (Math.abs(move) <= LAST_STEP) {
            // rounding alone can carry the last step across a bound
            return Math.max(low, Math.min(high, next));
        }
        return next >= low && next <= high ? next : Math.sqrt(low) * Math.sqrt(high);
    }
}
