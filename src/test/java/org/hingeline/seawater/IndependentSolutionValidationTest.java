package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.util.HashMap;
import java.util.Map;
import org.assertj.core.data.Offset;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.junit.jupiter.api.Test;

/** Against a second writing of the equilibria in 34-digit arithmetic, solved by bisection. */
class IndependentSolutionValidationTest {
    private static final double PHOSPHATE = 2e-6;
    private static final double SILICATE = 60e-6;

    private final Map<Conditions, IndependentWater> independent = new HashMap<>();

    private IndependentWater independent(Conditions c) {
        return independent.computeIfAbsent(
                c, k -> new IndependentWater(k.temperatureC(), k.salinity(), k.phosphate(), k.silicate()));
    }

    @Test
    void its_own_exponential_and_logarithm_are_sound() {
        assertThat(HighPrecision.exp(BigDecimal.ONE).toString()).startsWith("2.71828182845904523536028747135266");
        assertThat(HighPrecision.LN_10.toString()).startsWith("2.30258509299404568401799145468436");
        assertThat(HighPrecision.exp(HighPrecision.ln(HighPrecision.num("291.9")))
                        .doubleValue())
                .isEqualTo(291.9, within(1e-25));
    }

    @Test
    void ph_and_alkalinity_agree_to_a_billionth_over_the_grid() {
        Grid.forEach(PHOSPHATE, SILICATE, (conditions, pair) -> {
            CarbonateResult result = CarbonateSystem.solve(conditions, pair);
            IndependentWater water = independent(conditions);
            BigDecimal h = IndependentWater.hydrogenIon(pair.ph().value());
            BigDecimal dic = water.dic(h, pair.totalAlkalinity());
            if (dic.signum() < 0) {
                assertThat(result).isInstanceOf(CarbonateResult.Unsolvable.class);
                return;
            }
            CarbonateState state = result.orElseThrow();
            String as = pair + " in " + conditions;
            assertThat(state.dic()).as(as).isCloseTo(dic.doubleValue(), billionth(dic));
            same(as, state.co2(), water.co2(h, dic));
            same(as, state.bicarbonate(), water.bicarbonate(h, dic));
            same(as, state.carbonate(), water.carbonate(h, dic));
            same(as, state.pco2Atm(), water.pco2(h, dic));
            same(as, state.omegaAragonite(), water.omegaAragonite(h, dic));
            same(as, state.omegaCalcite(), water.omegaCalcite(h, dic));
        });
    }

    @Test
    void alkalinity_with_carbon_or_pco2_agrees_to_a_billionth_over_the_grid() {
        Grid.forEach(PHOSPHATE, SILICATE, (conditions, pair) -> {
            if (pair.totalAlkalinity() < 1e-3) {
                return; // the corner without carbon is the other test's
            }
            IndependentWater water = independent(conditions);
            CarbonateState start = CarbonateSystem.solve(conditions, pair).orElseThrow();
            double ta = pair.totalAlkalinity();
            String as = pair + " in " + conditions;

            double ofDic = CarbonateSystem.solve(conditions, new AlkalinityAndDic(ta, start.dic()))
                    .orElseThrow()
                    .phTotal();
            same(as, Math.pow(10, -ofDic), water.bisectFromDic(ta, start.dic()));

            double ofPco2 = CarbonateSystem.solve(conditions, new AlkalinityAndPco2(ta, start.pco2Atm()))
                    .orElseThrow()
                    .phTotal();
            same(as, Math.pow(10, -ofPco2), water.bisectFromPco2(ta, start.pco2Atm()));
        });
    }

    private static void same(String as, double value, BigDecimal expected) {
        assertThat(value).as(as).isCloseTo(expected.doubleValue(), billionth(expected));
    }

    private static Offset<Double> billionth(BigDecimal of) {
        return within(Math.abs(of.doubleValue()) * 1e-9);
    }
}
