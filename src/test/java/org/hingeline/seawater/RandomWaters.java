package org.hingeline.seawater;

import java.util.SplittableRandom;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;

/**
 * Waters drawn over everything that must be solvable: alkalinity −500 to 6000 and inorganic carbon 0 to 8000 µmol/kg, salinity
 * 0 to 50, 0 to 45 °C, every fit, sometimes with nutrients or a measured calcium. The edges are hit on purpose, about every
 * third water lies on at least one.
 */
final class RandomWaters {
    private static final double[] TEMPERATURE_EDGES = {0, 45};
    private static final double[] SALINITY_EDGES = {0, 1e-12, 1e-6, 50};
    private static final double[] ALKALINITY_EDGES = {-500e-6, -1e-12, 0, 1e-12, 1e-9, 6000e-6};
    private static final double[] DIC_EDGES = {0, 1e-15, 1e-12, 1e-9, 8000e-6};

    private final SplittableRandom random;

    RandomWaters(long seed) {
        random = new SplittableRandom(seed);
    }

    Conditions conditions() {
        Conditions plain = Conditions.of(or(TEMPERATURE_EDGES, 0, 45), or(SALINITY_EDGES, 0, 50))
                .with(pick(CarbonicAcidFit.values()), pick(BoronRatio.values()));
        Conditions fed = random.nextInt(4) == 0 ? plain.withNutrients(small(1e-3), small(1e-2)) : plain;
        return random.nextInt(8) == 0 ? fed.withCalcium(or(new double[] {0, 0.1}, 0, 0.1)) : fed;
    }

    AlkalinityAndDic alkalinityAndDic() {
        // now and then in the ratio at which a carbonate system buffers least
        double ta = or(ALKALINITY_EDGES, -500e-6, 6000e-6);
        double dic = or(DIC_EDGES, 0, 8000e-6);
        return switch (random.nextInt(12)) {
            case 0 -> new AlkalinityAndDic(dic, dic);
            case 1 -> new AlkalinityAndDic(Math.min(2 * dic, 6000e-6), dic);
            default -> new AlkalinityAndDic(ta, dic);
        };
    }

    <T> T pick(T[] values) {
        return values[random.nextInt(values.length)];
    }

    double between(double low, double high) {
        return low + (high - low) * random.nextDouble();
    }

    /** On one of the edges about every eighth time. */
    double or(double[] edges, double low, double high) {
        return random.nextInt(8) == 0 ? edges[random.nextInt(edges.length)] : between(low, high);
    }

    /** Mostly small, at most that. */
    private double small(double most) {
        double x = random.nextDouble();
        return most * x * x * x * x;
    }
}
