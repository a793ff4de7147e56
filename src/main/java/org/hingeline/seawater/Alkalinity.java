package org.hingeline.seawater;

/**
 * Total alkalinity and its slope with ln [H] (Dickson 1981, Deep-Sea Research 28A, 609–623): bicarbonate, carbonate,
 * borate, hydroxide, phosphate and silicate species minus free H⁺, bisulfate, HF and H3PO4. Amounts mol/kg-seawater,
 * h is [H] on the total scale.
 *
 * <p>Every term falls with ln h, and curves at most three times as much as it falls: the curvature of an acid's charge
 * is the third cumulant of its proton count, the slope minus the second, and no acid here binds more than three.
 */
final class Alkalinity {
    /** Greatest ratio of curvature to slope with ln h. */
    static final double CURVATURE_MAX = 3;

    private Alkalinity() {}

    /** All alkalinity that is not bicarbonate or carbonate. */
    static double withoutCarbonate(SeawaterConstants k, Conditions conditions, double h) {
        double free = h / k.scales.totalOverFree();
        double borate = k.boron * k.kb / (k.kb + h);
        double bisulfate = k.sulfate * free / (free + k.ks);
        double fluoric = k.fluoride * h / (h + k.kf);
        return borate + k.kw / h - free - bisulfate - fluoric + ofNutrients(k, conditions, h);
    }

    private static double ofNutrients(SeawaterConstants k, Conditions conditions, double h) {
        double silicate = conditions.silicate();
        double phosphate = conditions.phosphate();
        double silicic = silicate == 0 ? 0 : silicate * k.ksi / (k.ksi + h);
        if (phosphate == 0) {
            return silicic;
        }
        double p2 = k.kp1 * k.kp2;
        double p3 = p2 * k.kp3;
        double d = h * h * h + k.kp1 * h * h + p2 * h + p3;
        return silicic + phosphate * (p2 * h + 2 * p3 - h * h * h) / d;
    }

    /** d {@link #withoutCarbonate} / d ln h: negative everywhere. */
    static double slopeWithoutCarbonate(SeawaterConstants k, Conditions conditions, double h) {
        double free = h / k.scales.totalOverFree();
        double borate = acidSlope(k.boron, k.kb, h);
        double bisulfate = acidSlope(k.sulfate, k.ks, free);
        double fluoric = acidSlope(k.fluoride, k.kf, h);
        return -(borate + k.kw / h + free + bisulfate + fluoric + fallOfNutrients(k, conditions, h));
    }

    /** total·K·h/(K + h)²: how fast an acid takes up protons as ln h rises. */
    private static double acidSlope(double total, double k, double h) {
        double sum = k + h;
        return total * k * h / (sum * sum);
    }

    /** For phosphoric acid the variance of the proton count: charge falls as protons bind (Munhoven 2013). */
    private static double fallOfNutrients(SeawaterConstants k, Conditions conditions, double h) {
        double silicate = conditions.silicate();
        double phosphate = conditions.phosphate();
        double silicic = silicate == 0 ? 0 : acidSlope(silicate, k.ksi, h);
        if (phosphate == 0) {
            return silicic;
        }
        double a = h * h * h;
        double b = k.kp1 * h * h;
        double c = k.kp1 * k.kp2 * h;
        double e = k.kp1 * k.kp2 * k.kp3;
        double d = a + b + c + e;
        double mean = (3 * a + 2 * b + c) / d;
        return silicic + phosphate * ((9 * a + 4 * b + c) / d - mean * mean);
    }

    /** Bicarbonate plus twice carbonate of that much inorganic carbon. */
    static double ofCarbon(SeawaterConstants k, double h, double dic) {
        double d = h * h + k.k1 * h + k.k1 * k.k2;
        return dic * (k.k1 * h + 2 * k.k1 * k.k2) / d;
    }

    /** d {@link #ofCarbon} / d ln h. */
    static double slopeOfCarbon(SeawaterConstants k, double h, double dic) {
        double a = h * h;
        double b = k.k1 * h;
        double c = k.k1 * k.k2;
        double d = a + b + c;
        return -dic * (b * (a + c) + 4 * a * c) / (d * d);
    }

    /** Bicarbonate plus twice carbonate in equilibrium with that much dissolved CO2. */
    static double ofCo2(SeawaterConstants k, double h, double co2) {
        return co2 * k.k1 / h * (1 + 2 * k.k2 / h);
    }

    /** d {@link #ofCo2} / d ln h. */
    static double slopeOfCo2(SeawaterConstants k, double h, double co2) {
        return -co2 * k.k1 / h * (1 + 4 * k.k2 / h);
    }

    /** What {@link #withoutCarbonate} less hydroxide and free H⁺ tends to at low pH. */
    static double infimumWithoutWater(SeawaterConstants k, Conditions conditions) {
        return -(conditions.phosphate() + k.sulfate + k.fluoride);
    }

    /** What {@link #withoutCarbonate} less hydroxide and free H⁺ tends to at high pH. */
    static double supremumWithoutWater(SeawaterConstants k, Conditions conditions) {
        return k.boron + 2 * conditions.phosphate() + conditions.silicate();
    }
}
