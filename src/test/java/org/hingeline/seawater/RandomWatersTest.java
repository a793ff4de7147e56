package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.EnumSet;
import java.util.Map;
import java.util.Queue;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.Consumer;
import java.util.stream.IntStream;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.junit.jupiter.api.Test;

/**
 * What must hold for every water, tried on many seeded random ones ({@link RandomWaters}). That none hangs is said by none
 * being refused as not converged: every search ends after a fixed number of steps with that refusal.
 */
class RandomWatersTest {
    private static final int WATERS = 100_000;
    private static final int SHOWN = 3;

    private final AtomicInteger failed = new AtomicInteger();
    private final Queue<String> failures = new ConcurrentLinkedQueue<>();

    @Test
    void every_water_has_a_state_of_finite_numbers_none_of_them_negative() {
        forEachWater((random, water) -> {
            double[] amounts = {
                water.dic(),
                water.co2(),
                water.bicarbonate(),
                water.carbonate(),
                water.fco2Atm(),
                water.pco2Atm(),
                water.omegaAragonite(),
                water.omegaCalcite(),
                water.densityKgM3() - 900
            };
            for (double amount : amounts) {
                check(amount >= 0 && amount < Double.POSITIVE_INFINITY, "an amount in ", water);
            }
            check(water.phTotal() > 2 && water.phTotal() < 13, "pH of ", water);
            double carbon = water.co2() + water.bicarbonate() + water.carbonate();
            check(Math.abs(carbon - water.dic()) <= 1e-14 * water.dic(), "carbon does not add up in ", water);
        });
    }

    @Test
    void every_pair_leads_back_to_the_water() {
        forEachWater((random, water) -> {
            double ph = water.phTotal();
            double ta = water.totalAlkalinity();
            double dic = water.dic();
            double pco2 = water.pco2Atm();
            leadsBack(water, new PhAndAlkalinity(ph, ta));
            leadsBack(water, new PhAndDic(ph, dic));
            leadsBack(water, new PhAndPco2(ph, pco2));
            leadsBack(water, new AlkalinityAndDic(ta, dic));
            leadsBack(water, new AlkalinityAndPco2(ta, pco2));
            leadsBack(water, new DicAndPco2(dic, pco2));
        });
    }

    @Test
    void a_ph_on_any_scale_leads_back_to_the_water() {
        forEachWater((random, water) -> {
            Conditions c = water.conditions();
            PhScale scale = random.pick(PhScale.values());
            leadBack(water, KnownPh.on(scale, scale.fromTotal(water.phTotal(), c.temperatureC(), c.salinity())));
        });
    }

    @Test
    void a_ph_read_at_any_temperature_leads_back_to_the_water() {
        forEachWater((random, water) -> {
            double readAtC = random.or(new double[] {0, 45}, 0, 45);
            CarbonateState sample = solved(Treatment.atTemperature(water, readAtC), water.conditions());
            if (sample != null) {
                PhScale scale = random.pick(PhScale.values());
                double value = scale.fromTotal(
                        sample.phTotal(), readAtC, water.conditions().salinity());
                leadBack(water, KnownPh.on(scale, value).readAt(readAtC));
            }
        });
    }

    @Test
    void any_two_numbers_give_a_state_of_finite_numbers_or_a_refusal_in_words() {
        Map<UnsolvableReason, Integer> refusals = new ConcurrentHashMap<>();
        forEach(2013, random -> {
            Conditions conditions = AnyNumbers.conditions(random);
            KnownPair pair = AnyNumbers.pair(random);
            CarbonateResult result = CarbonateSystem.solve(conditions, pair);
            if (result instanceof Solved solved) {
                CarbonateState s = solved.state();
                double sum = s.totalAlkalinity() + s.dic() + s.pco2Atm() + s.omegaAragonite() + s.omegaCalcite();
                double least = Math.min(Math.min(s.co2(), s.bicarbonate()), Math.min(s.carbonate(), s.dic()));
                check(Double.isFinite(sum) && least >= 0, "an amount in ", s);
                check(s.phTotal() > 0 && s.phTotal() < 16, "pH of ", s);
            } else {
                Unsolvable refusal = (Unsolvable) result;
                refusals.merge(refusal.reason(), 1, Integer::sum);
                check(!refusal.detail().isBlank(), "no words for ", pair);
                // the one search without a bracket, asked for what no water has
                check(
                        refusal.reason() != UnsolvableReason.NOT_CONVERGED || pair instanceof PhAndPco2,
                        "not converged: ",
                        pair);
            }
        });
        assertThat(refusals.keySet()).containsAll(EnumSet.complementOf(EnumSet.of(UnsolvableReason.NOT_CONVERGED)));
    }

    private interface OfWater {
        void check(RandomWaters random, CarbonateState water);
    }

    private void forEachWater(OfWater property) {
        forEach(1867, random -> {
            Conditions conditions = random.conditions();
            AlkalinityAndDic pair = random.alkalinityAndDic();
            CarbonateState water = solved(CarbonateSystem.solve(conditions, pair), conditions);
            if (water != null) {
                property.check(random, water);
            }
        });
    }

    /** Every draw has a seed of its own, so that they are the same in whatever order they run. */
    private void forEach(long seed, Consumer<RandomWaters> property) {
        IntStream.range(0, WATERS).parallel().forEach(i -> property.accept(new RandomWaters(seed * 1_000_000 + i)));
        assertThat(failed)
                .as("failed, some of them:%n%s", String.join("\n", failures))
                .hasValue(0);
    }

    private void leadBack(CarbonateState water, KnownPh ph) {
        leadsBack(water, new PhAndAlkalinity(ph, water.totalAlkalinity()));
        leadsBack(water, new PhAndDic(ph, water.dic()));
        leadsBack(water, new PhAndPco2(ph, water.pco2Atm()));
    }

    private void leadsBack(CarbonateState water, KnownPair pair) {
        CarbonateResult result = CarbonateSystem.solve(water.constants(), water.conditions(), pair);
        if (result instanceof Solved solved) {
            double distance = SameWater.distance(water, solved.state());
            if (!(distance <= 1)) {
                check(false, distance + " times the tolerance away by " + pair + ": ", water);
            }
        } else {
            UnsolvableReason reason = ((Unsolvable) result).reason();
            if (!mayRefuse(water, pair, reason)) {
                check(false, reason.code() + " for " + pair + ": ", water);
            }
        }
    }

    /**
     * Water without CO2 has no pCO2 to be given. And a pH with an alkalinity that leaves less carbon than the rounding of that
     * alkalinity may as well leave less than none.
     */
    private static boolean mayRefuse(CarbonateState water, KnownPair pair, UnsolvableReason reason) {
        return switch (reason) {
            case PCO2_OUT_OF_RANGE -> water.pco2Atm() < Double.MIN_NORMAL;
            case INPUTS_CONTRADICT -> pair instanceof PhAndAlkalinity && water.dic() <= 1e-11 * SameWater.amount(water);
            default -> false;
        };
    }

    private CarbonateState solved(CarbonateResult result, Conditions conditions) {
        if (result instanceof Solved solved) {
            return solved.state();
        }
        check(false, ((Unsolvable) result).detail() + " in ", conditions);
        return null;
    }

    private void check(boolean holds, String otherwise, Object of) {
        if (!holds && failed.incrementAndGet() <= SHOWN) {
            failures.add(otherwise + of);
        }
    }
}
