package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.junit.jupiter.api.Test;

/** The root is found wherever the inputs are accepted, however odd the water. */
class HardWatersTest {
    @Test
    void pure_water_with_nothing_in_it_is_neutral() {
        CarbonateState state = solve(Conditions.of(25, 0), new AlkalinityAndDic(0, 0));
        SeawaterConstants k = SeawaterConstants.of(Conditions.of(25, 0));
        assertThat(state.phTotal()).isCloseTo(-Math.log10(k.kw) / 2, within(1e-10));
        assertThat(state.omegaAragonite()).isZero();
    }

    @Test
    void rain_in_balance_with_the_air_is_at_ph_5_6() {
        // common knowledge of atmospheric chemistry: pure water at about 400 µatm CO2 and 25 °C is at pH 5.6
        Conditions fresh = Conditions.of(25, 0).with(CarbonicAcidFit.MILLERO_2006, BoronRatio.LEE_2010);
        CarbonateState state = solve(fresh, new AlkalinityAndPco2(0, 400e-6));
        assertThat(state.phTotal()).isCloseTo(5.6, within(0.05));
    }

    @Test
    void thousands_of_random_waters_converge_on_their_alkalinity() {
        Random random = new Random(20_141_007);
        for (int i = 0; i < 20_000; i++) {
            Conditions conditions = Conditions.of(-2 + 47 * random.nextDouble(), 50 * random.nextDouble())
                    .withNutrients(1e-3 * cube(random), 1e-2 * cube(random))
                    .with(CarbonicAcidFit.values()[random.nextInt(3)], BoronRatio.values()[random.nextInt(2)]);
            double ta = -0.01 + 0.11 * random.nextDouble();
            CarbonateState a = solve(conditions, new AlkalinityAndDic(ta, 0.1 * cube(random)));
            CarbonateState b = solve(conditions, new AlkalinityAndPco2(ta, Math.max(1e-9, cube(random))));
            assertThat(a.totalAlkalinity()).as("%s", a).isCloseTo(ta, within(1e-11));
            assertThat(b.totalAlkalinity()).as("%s", b).isCloseTo(ta, within(1e-11));
        }
    }

    @Test
    void a_trace_of_co2_in_acid_fresh_water_leaves_the_acid_as_it_is() {
        // the two bounds of the search all but meet here: a step may leave them by rounding alone
        Conditions fresh = Conditions.of(0, 0).with(CarbonicAcidFit.MILLERO_2006, BoronRatio.UPPSTROM_1974);
        double acid = 3.6788172305459506e-4;
        for (double pco2 : new double[] {1e-12, 1e-11, 1e-10, 1e-9}) {
            CarbonateState state = solve(fresh, new AlkalinityAndPco2(-acid, pco2));
            double h = new IndependentWater(fresh).hFromPco2(-acid, pco2).doubleValue();
            assertThat(state.phTotal()).as("pCO2 %s", pco2).isCloseTo(-Math.log10(h), within(1e-11));
        }
    }

    @Test
    void inputs_that_would_need_more_carbon_than_any_water_holds_are_refused() {
        for (KnownPair absurd : new KnownPair[] {
            new KnownPair.PhAndPco2(12.9, 911e-6), new KnownPair.PhAndAlkalinity(2.3, 0.038),
        }) {
            assertThat(CarbonateSystem.solve(Conditions.of(15, 30), absurd))
                    .as(absurd.toString())
                    .isInstanceOfSatisfying(
                            CarbonateResult.Unsolvable.class,
                            refusal -> assertThat(refusal.reason()).isEqualTo(UnsolvableReason.TOO_MUCH_CARBON));
        }
    }

    private static double cube(Random random) {
        double x = random.nextDouble();
        return x * x * x;
    }

    private static CarbonateState solve(Conditions conditions, KnownPair pair) {
        return CarbonateSystem.solve(conditions, pair).orElseThrow();
    }
}
