package org.hingeline.seawater;

/**
 * The mean of two waters.
 *
 * @param shareOfOther weight of the other water, 0 to 1
 */
record Blend(double shareOfOther) {
    double of(double one, double other) {
        return (1 - shareOfOther) * one + shareOfOther * other;
    }

    /** The weight of the other water's temperature where it has that share of the mass: its share of the heat capacity. */
    static double heatShareOfOther(Conditions one, Conditions other, double shareOfOther) {
        double ofOne = (1 - shareOfOther) * heatCapacity(one);
        double ofOther = shareOfOther * heatCapacity(other);
        return ofOther / (ofOne + ofOther);
    }

    private static double heatCapacity(Conditions water) {
        return MilleroPerronDesnoyers1973.heatCapacity(water.temperatureC(), water.salinity());
    }
}
