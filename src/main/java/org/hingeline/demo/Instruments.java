package org.hingeline.demo;

import java.time.Instant;
import java.util.EnumMap;
import java.util.Map;
import java.util.SplittableRandom;
import org.hingeline.measure.Quantity;

/** What the instruments show of a water: a little noise, then rounded to what their display has. */
final class Instruments {

    /**
     * How an instrument shows.
     *
     * @param noise standard deviation from one value to the next, canonical unit; a fraction of the registered standard
     *     uncertainty, most of which is the calibration and does not show from value to value
     * @param step of the display, canonical unit
     */
    record Display(double noise, double step) {}

    static final Map<Quantity, Display> DISPLAYS = Map.of(
            Quantity.PH, new Display(0.003, 0.001),
            Quantity.TEMPERATURE, new Display(0.015, 0.01),
            Quantity.SALINITY, new Display(0.015, 0.01),
            Quantity.TOTAL_ALKALINITY, new Display(3, 1),
            Quantity.LEVEL, new Display(0.008, 0.01));

    private final long seed;

    Instruments(long seed) {
        this.seed = seed;
    }

    /** @param titrated whether somebody titrated the alkalinity at this moment */
    Map<Quantity, Double> read(HatcheryWater water, String point, Instant at, boolean titrated) {
        WaterBody body = water.at(point, at);
        Map<Quantity, Double> shown = new EnumMap<>(Quantity.class);
        show(shown, Quantity.PH, body.solved().phTotal(), point, at);
        show(shown, Quantity.TEMPERATURE, body.temperatureC(), point, at);
        show(shown, Quantity.SALINITY, body.salinity(), point, at);
        if (titrated) {
            show(shown, Quantity.TOTAL_ALKALINITY, body.totalAlkalinityUmolKg(), point, at);
        }
        if (point.equals(HatcheryWater.INTAKE)) {
            show(shown, Quantity.LEVEL, water.levelM(at), point, at);
        }
        return shown;
    }

    private void show(Map<Quantity, Double> shown, Quantity quantity, double truth, String point, Instant at) {
        Display display = DISPLAYS.get(quantity);
        if (display == null) {
            throw new IllegalArgumentException("no instrument shows " + quantity.code());
        }
        // the same seed, instrument and moment always give the same noise
        long mixed = seed * 31 + point.hashCode();
        mixed = mixed * 31 + quantity.code().hashCode();
        mixed = mixed * 0x9E3779B97F4A7C15L + at.toEpochMilli();
        double chance = new SplittableRandom(mixed).nextGaussian();
        double value = truth + display.noise * Math.max(-3, Math.min(3, chance));
        // dividing by a whole number gives the nearest decimal, multiplying by 0.001 does not
        double steps = Math.rint(1 / display.step);
        shown.put(quantity, Math.rint(value * steps) / steps);
    }
}
