package org.hingeline.demo;

import java.time.Instant;
import java.util.List;
import java.util.SplittableRandom;

/**
 * The water of an invented inlet at any moment: a tide, the day's photosynthesis and respiration, a small river, weather,
 * and a spell of upwelling in the fortnight before the origin and every thirteen days from there.
 *
 * <p>It is a function of seed, origin and absolute time alone: history and the present join without a jump. Sizes are
 * those of a sheltered inlet of the north-east Pacific in the growing season, chosen, not fitted to any place.
 */
final class BayWater {
    /** Solar time at about 124° west. */
    private static final double SOLAR_OFFSET_H = -8.27;

    private static final double SPELL_EVERY_H = 13 * 24;
    private static final double MEAN_SALINITY = 30.6;
    /** A level this far above the mean counts as 1 in what the tide does to the water. */
    private static final double TIDE_SCALE_M = 1.6;

    private final List<Wave> tide;
    private final List<Wave> weather;
    private final List<Wave> river;
    private final List<Wave> heat;
    private final List<Wave> bloom;
    private final double spellStartH;
    private final double spellLengthH;

    /** @param origin by when the first spell of upwelling has been over for some days */
    BayWater(long seed, Instant origin) {
        SplittableRandom chance = new SplittableRandom(seed);
        // M2, S2, K1, O1, N2
        tide = List.of(
                Wave.of(0.95, 12.4206, chance),
                Wave.of(0.28, 12, chance),
                Wave.of(0.42, 23.9345, chance),
                Wave.of(0.27, 25.8193, chance),
                Wave.of(0.19, 12.6583, chance));
        weather = slow(chance, 41, 97);
        river = slow(chance, 67, 171);
        heat = slow(chance, 59, 143);
        bloom = slow(chance, 53, 127);
        spellLengthH = 24 * (3.3 + 1.4 * chance.nextDouble());
        spellStartH = Wave.hours(origin) - 24 * (9 + chance.nextDouble());
    }

    WaterBody at(Instant time) {
        double level = levelM(time) / TIDE_SCALE_M;
        double upwelling = upwelling(time);
        // the river stands deepest in the inlet at low water
        double fresh = 0.3 * (1 + sum(river, time)) * (1 - 0.5 * level);
        double salinity = MEAN_SALINITY + 0.2 * level + 0.8 * upwelling - fresh;
        double temperatureC =
                13.6 + 0.5 * dayPeakingAt(16, time) - 0.35 * level - 3.0 * upwelling + 0.5 * sum(heat, time);
        // Washington waters to 25 m, Fassbender et al. 2017: TA = 647 + 47.7 S
        double alkalinity = 647 + 47.7 * salinity + 3 * sum(weather, time);
        // by late afternoon photosynthesis has taken most carbon out, by dawn respiration has put it back
        double ofTheDay = -(20 - 9 * upwelling) * dayPeakingAt(17.5, time);
        double carbon = 1896
                + 40 * (salinity - MEAN_SALINITY)
                + 95 * upwelling
                + ofTheDay
                - 6 * level
                - 8 * sum(bloom, time)
                + 4 * sum(weather, time);
        return new WaterBody(temperatureC, salinity, alkalinity, carbon);
    }

    /** Metres above mean sea level. */
    double levelM(Instant time) {
        return tide.stream().mapToDouble(wave -> wave.at(time)).sum();
    }

    /** 0 without upwelling, 1 at its full strength. */
    double upwelling(Instant time) {
        double into = (Wave.hours(time) - spellStartH) % SPELL_EVERY_H;
        into = into < 0 ? into + SPELL_EVERY_H : into;
        double rise = smooth(into / 20);
        double fall = smooth((into - (spellLengthH - 22)) / 22);
        return rise * (1 - fall);
    }

    /** From 0 to 1 without a corner at either end. */
    static double smooth(double x) {
        double within = Math.min(1, Math.max(0, x));
        return within * within * (3 - 2 * within);
    }

    private static double dayPeakingAt(double solarHour, Instant time) {
        return Math.cos(2 * Math.PI * (Wave.hours(time) + SOLAR_OFFSET_H - solarHour) / 24);
    }

    /** Two slow waves, together within −1 and 1. */
    private static List<Wave> slow(SplittableRandom chance, double shorterH, double longerH) {
        return List.of(Wave.of(0.4, shorterH, chance), Wave.of(0.6, longerH, chance));
    }

    private static double sum(List<Wave> waves, Instant time) {
        return waves.stream().mapToDouble(wave -> wave.at(time)).sum();
    }
}
