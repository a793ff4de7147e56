package org.hingeline.bench.seawater;

import java.util.Random;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.CarbonicAcidFit;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/** Random waters to go round in, so that no branch and no value can be learnt by heart. */
public enum Waters {
    /** Inside every fit: salinity 20–40, 9–33 °C; the default fits, no nutrients. */
    ORDINARY {
        @Override
        Conditions draw(Random random) {
            return Conditions.of(between(random, 9, 33), between(random, 20, 40));
        }
    },
    /** The same with phosphate and silicate, and each of the carbonic-acid fits and boron ratios. */
    VARIED {
        @Override
        Conditions draw(Random random) {
            return ORDINARY.draw(random)
                    .withNutrients(between(random, 0, 3e-6), between(random, 0, 80e-6))
                    .with(pick(random, CarbonicAcidFit.values()), pick(random, BoronRatio.values()));
        }
    },
    /** River water, outside several fits: salinity 1–4, which brings cautions. */
    OUTSIDE {
        @Override
        Conditions draw(Random random) {
            return Conditions.of(between(random, 9, 33), between(random, 1, 4));
        }
    };

    /** A power of two. */
    static final int COUNT = 1024;

    private static final long SEED = 20_180_704;

    abstract Conditions draw(Random random);

    Conditions[] conditions() {
        Random random = new Random(SEED);
        Conditions[] all = new Conditions[COUNT];
        for (int i = 0; i < COUNT; i++) {
            all[i] = draw(random);
        }
        return all;
    }

    /** What is known of each water: pH 7.4–8.4 and alkalinity 1500–2600 µmol/kg, told by the pair asked for. */
    KnownPair[] known(Conditions[] conditions, Pair pair) {
        Random random = new Random(SEED + 1);
        KnownPair[] all = new KnownPair[conditions.length];
        for (int i = 0; i < all.length; i++) {
            KnownPair start = new PhAndAlkalinity(between(random, 7.4, 8.4), between(random, 1500e-6, 2600e-6));
            CarbonateState state = CarbonateSystem.solve(conditions[i], start).orElseThrow();
            all[i] = pair.of(state, i);
        }
        return all;
    }

    private static double between(Random random, double low, double high) {
        return low + (high - low) * random.nextDouble();
    }

    private static <T> T pick(Random random, T[] values) {
        return values[random.nextInt(values.length)];
    }
}
