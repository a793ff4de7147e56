package org.hingeline.seawater;

import java.util.OptionalDouble;

/**
 * The [H] at which a water has a given alkalinity, by Newton's method in ln [H] on a bracket that holds the root by
 * proof, with bisection where a Newton step would leave it: the approach of Munhoven, G. (2013), Mathematics of the
 * total alkalinity–pH equation, Geoscientific Model Development 6, 1367–1388.
 *
 * <p>Alkalinity falls strictly with [H]. Everything in it but hydroxide and free H⁺ is bounded, so the root lies between
 * those of a/h − h/s = c for the two bounds, which are closed forms.
 */
final class HydrogenIonRoot {
    /** Relative in [H]. */
    static final double TOLERANCE = 1e-12;

    static final int MAX_STEPS = 100;

    private final SeawaterConstants k;
    private final Alkalinity alkalinity;

    HydrogenIonRoot(SeawaterConstants constants, Conditions conditions) {
        this.k = constants;
        this.alkalinity = new Alkalinity(constants, conditions);
    }

    /** [H], total scale, from total alkalinity and inorganic carbon; empty when not converged. */
    OptionalDouble fromDic(double totalAlkalinity, double dic) {
        double low = balance(k.kw, totalAlkalinity - alkalinity.infimumWithoutWater());
        double high = balance(k.kw, totalAlkalinity - (alkalinity.supremumWithoutWater() + 2 * dic));
        return search(
                low,
                high,
                carbonateGuess(totalAlkalinity, dic),
                h -> alkalinity.ofCarbon(h, dic) + alkalinity.withoutCarbonate(h) - totalAlkalinity,
                h -> alkalinity.slopeOfCarbon(h, dic) + alkalinity.slopeWithoutCarbonate(h));
    }

    /** [H], total scale, from total alkalinity and dissolved CO2; empty when not converged. */
    OptionalDouble fromCo2(double totalAlkalinity, double co2) {
        // bicarbonate joins hydroxide in a/h; dropping carbonate, 2 co2 K1 K2/h², leaves a bound from below
        double a = k.kw + co2 * k.k1;
        double low = balance(a, totalAlkalinity - alkalinity.infimumWithoutWater());
        // from h = 2 co2 K1 K2/a on, carbonate is no more than a/h, so 2a/h − h/s bounds from above
        double high = Math.max(
                2 * co2 * k.k1 * k.k2 / a, balance(2 * a, totalAlkalinity - alkalinity.supremumWithoutWater()));
        return search(
                low,
                high,
                1e-8,
                h -> alkalinity.ofCo2(h, co2) + alkalinity.withoutCarbonate(h) - totalAlkalinity,
                h -> alkalinity.slopeOfCo2(h, co2) + alkalinity.slopeWithoutCarbonate(h));
    }

    /** The positive root of a/h − h/s = c, written so that neither sign of c cancels. */
    private double balance(double a, double c) {
        double s = k.scales.totalOverFree();
        double root = Math.sqrt(c * c + 4 * a / s);
        return c > 0 ? 2 * a / (c + root) : s * (root - c) / 2;
    }

    /** [H] if borate were what it is at pH 8 and the rest of the alkalinity carbonate. */
    private double carbonateGuess(double totalAlkalinity, double dic) {
        double ratio = (totalAlkalinity - k.boron * k.kb / (k.kb + 1e-8)) / dic;
        if (!(ratio > 0.01 && ratio < 1.99)) {
            return 1e-8;
        }
        double b = k.k1 * (ratio - 1);
        double root = Math.sqrt(b * b - 4 * ratio * k.k1 * k.k2 * (ratio - 2));
        return b < 0 ? (root - b) / (2 * ratio) : 2 * k.k1 * k.k2 * (2 - ratio) / (root + b);
    }

    interface OfH {
        double at(double h);
    }

    private static OptionalDouble search(double hLow, double hHigh, double hGuess, OfH excess, OfH slope) {
        double low = Math.log(hLow);
        double high = Math.log(hHigh);
        double x = Math.log(hGuess);
        if (!(x > low && x < high)) {
            x = (low + high) / 2;
        }
        for (int step = 0; step < MAX_STEPS; step++) {
            double h = Math.exp(x);
            double f = excess.at(h);
            if (f == 0) {
                return OptionalDouble.of(h);
            }
            if (f > 0) {
                low = x;
            } else {
                high = x;
            }
            double newton = x - f / slope.at(h);
            double next = newton > low && newton < high ? newton : (low + high) / 2;
            if (Math.abs(next - x) <= TOLERANCE) {
                return OptionalDouble.of(Math.exp(next));
            }
            x = next;
        }
        return OptionalDouble.empty();
    }
}
