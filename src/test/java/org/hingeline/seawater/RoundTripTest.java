package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.concurrent.atomic.AtomicInteger;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Round every pair and back to where it began. */
class RoundTripTest {
    private static final double TOLERANCE = 1e-10;

    @ParameterizedTest
    @EnumSource(CarbonicAcidFit.class)
    void every_pair_leads_back_to_the_same_water(CarbonicAcidFit fit) {
        AtomicInteger waters = new AtomicInteger();
        Grid.forEach(1e-6, 20e-6, (plain, pair) -> {
            Conditions conditions = plain.with(fit, BoronRatio.LEE_2010);
            if (!(CarbonateSystem.solve(conditions, pair) instanceof Solved solved)) {
                return;
            }
            waters.incrementAndGet();
            CarbonateState start = solved.state();
            double ta = start.totalAlkalinity();
            CarbonateState fromDic = CarbonateSystem.solve(conditions, new AlkalinityAndDic(ta, start.dic()))
                    .orElseThrow();
            CarbonateState fromPco2 = CarbonateSystem.solve(
                            conditions, new AlkalinityAndPco2(fromDic.totalAlkalinity(), fromDic.pco2Atm()))
                    .orElseThrow();
            CarbonateState back = CarbonateSystem.solve(
                            conditions, new PhAndAlkalinity(fromPco2.phTotal(), fromPco2.totalAlkalinity()))
                    .orElseThrow();
            same(pair, start, fromDic);
            same(pair, start, fromPco2);
            same(pair, start, back);
        });
        assertThat(waters).hasValueGreaterThan(800);
    }

    @ParameterizedTest
    @EnumSource(PhScale.class)
    void a_ph_goes_to_the_total_scale_and_back(PhScale scale) {
        double there = scale.toTotal(8.05, 12.5, 31);
        assertThat(scale.fromTotal(there, 12.5, 31)).isCloseTo(8.05, within(1e-14));
    }

    private static void same(KnownPair as, CarbonateState expected, CarbonateState actual) {
        for (String name : new String[] {
            "phTotal",
            "totalAlkalinity",
            "dic",
            "co2",
            "bicarbonate",
            "carbonate",
            "pco2",
            "fco2",
            "omegaAragonite",
            "omegaCalcite"
        }) {
            double value = Quantities.of(expected, name);
            assertThat(Quantities.of(actual, name))
                    .as("%s of %s", name, as)
                    .isCloseTo(value, within(Math.abs(value) * TOLERANCE));
        }
    }
}
