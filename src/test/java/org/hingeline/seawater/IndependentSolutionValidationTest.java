package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Against a second writing of the equilibria in 34-digit arithmetic, solved by bisection. */
class IndependentSolutionValidationTest {
    private static final double BILLIONTH = 1e-9;
    private static final double PHOSPHATE = 2e-6;
    private static final double SILICATE = 60e-6;

    @Test
    void its_own_exponential_and_logarithm_are_sound() {
        assertThat(HighPrecision.exp(BigDecimal.ONE).toString()).startsWith("2.71828182845904523536028747135266");
        assertThat(HighPrecision.LN_10.toString()).startsWith("2.30258509299404568401799145468436");
        assertThat(HighPrecision.exp(HighPrecision.ln(HighPrecision.num("291.9")))
                        .doubleValue())
                .isEqualTo(291.9, within(1e-25));
    }

    @Test
    void all_pairs_agree_to_a_billionth_over_the_grid() {
        allPairsAgree(waters(PHOSPHATE, SILICATE, 1), 800);
    }

    @Test
    void without_nutrients_all_pairs_agree_to_a_billionth_over_the_grid() {
        allPairsAgree(waters(0, 0, 3), 200);
    }

    @ParameterizedTest
    @EnumSource(names = {"MILLERO_2006", "WATERS_2014"})
    void with_the_other_fits_and_boron_ratio_and_a_measured_calcium_all_pairs_agree(CarbonicAcidFit fit) {
        List<Water> waters = waters(PHOSPHATE, SILICATE, 5).stream()
                .map(w -> new Water(
                        w.conditions.with(fit, BoronRatio.UPPSTROM_1974).withCalcium(9.1e-3), w.ph, w.totalAlkalinity))
                .toList();
        allPairsAgree(waters, 100);
    }

    @ParameterizedTest
    @EnumSource
    void a_ph_on_any_scale_agrees_to_a_billionth(PhScale scale) {
        waters(PHOSPHATE, SILICATE, 3).parallelStream().forEach(w -> {
            IndependentWater independent = new IndependentWater(w.conditions);
            BigDecimal h = independent.hydrogenIon(w.ph, scale);
            same(new PhAndDic(KnownPh.on(scale, w.ph), 2e-3), w.conditions, independent, h, exact(2e-3));
            assertThat(scale.fromTotal(w.ph, w.conditions.temperatureC(), w.conditions.salinity()))
                    .isCloseTo(
                            independent
                                    .ph(independent.hydrogenIon(w.ph, PhScale.TOTAL), scale)
                                    .doubleValue(),
                            within(1e-12));
        });
    }

    @Test
    void a_ph_read_at_another_temperature_agrees_to_a_billionth() {
        waters(PHOSPHATE, SILICATE, 3).parallelStream().filter(Water::hasCarbon).forEach(w -> {
            double readAtC = w.conditions.temperatureC() < 16 ? 25 : 4;
            IndependentWater sample = new IndependentWater(w.conditions.withTemperatureC(readAtC));
            IndependentWater there = new IndependentWater(w.conditions);
            KnownPh ph = KnownPh.on(PhScale.SEAWATER, w.ph).readAt(readAtC);
            BigDecimal hOfSample = sample.hydrogenIon(w.ph, PhScale.SEAWATER);

            BigDecimal dic = sample.dic(hOfSample, exact(w.totalAlkalinity));
            if (dic.signum() > 0) {
                BigDecimal h = there.hFromDic(exact(w.totalAlkalinity), dic);
                same(new PhAndAlkalinity(ph, w.totalAlkalinity), w.conditions, there, h, dic);
                // the pCO2 of that water, and the pH in the sample, lead to the same
                same(new PhAndPco2(ph, there.pco2(h, dic).doubleValue()), w.conditions, there, h, dic);
            }
            BigDecimal ta = sample.totalAlkalinity(hOfSample, exact(2e-3));
            same(new PhAndDic(ph, 2e-3), w.conditions, there, there.hFromDic(ta, exact(2e-3)), exact(2e-3));
        });
    }

    private static void allPairsAgree(List<Water> waters, int atLeast) {
        List<Water> withCarbon =
                waters.parallelStream().filter(Water::hasCarbon).toList();
        withCarbon.parallelStream().forEach(IndependentSolutionValidationTest::allPairsAgree);
        assertThat(withCarbon).hasSizeGreaterThanOrEqualTo(atLeast);
    }

    /** Every pair is given the doubles next to the independent water, and the independent solution starts from the same. */
    private static void allPairsAgree(Water w) {
        Conditions c = w.conditions;
        IndependentWater independent = new IndependentWater(c);
        BigDecimal h = independent.hydrogenIon(w.ph, PhScale.TOTAL);
        double ta = w.totalAlkalinity;
        BigDecimal exactDic = independent.dic(h, exact(ta));
        same(new PhAndAlkalinity(w.ph, ta), c, independent, h, exactDic);

        double dic = exactDic.doubleValue();
        double pco2 = independent.pco2(h, exactDic).doubleValue();
        same(new PhAndDic(w.ph, dic), c, independent, h, exact(dic));
        same(new PhAndPco2(w.ph, pco2), c, independent, h, independent.dicOfPco2(h, pco2));
        same(new AlkalinityAndDic(ta, dic), c, independent, independent.hFromDic(exact(ta), exact(dic)), exact(dic));
        BigDecimal hOfTaPco2 = independent.hFromPco2(ta, pco2);
        same(new AlkalinityAndPco2(ta, pco2), c, independent, hOfTaPco2, independent.dicOfPco2(hOfTaPco2, pco2));
        same(new DicAndPco2(dic, pco2), c, independent, independent.hFromDicAndPco2(dic, pco2), exact(dic));
    }

    private static void same(KnownPair pair, Conditions c, IndependentWater w, BigDecimal h, BigDecimal dic) {
        same(CarbonateSystem.solve(c, pair).orElseThrow(), w, h, dic);
    }

    static void same(CarbonateState state, IndependentWater w, BigDecimal h, BigDecimal dic) {
        String as = state.known() + " in " + state.conditions();
        assertThat(state.phTotal())
                .as("pH of %s", as)
                .isCloseTo(-HighPrecision.log10(h).doubleValue(), within(BILLIONTH / 2.3));
        same(as, "alkalinity", state.totalAlkalinity(), w.totalAlkalinity(h, dic));
        same(as, "carbon", state.dic(), dic);
        same(as, "CO2", state.co2(), w.co2(h, dic));
        same(as, "bicarbonate", state.bicarbonate(), w.bicarbonate(h, dic));
        same(as, "carbonate", state.carbonate(), w.carbonate(h, dic));
        same(as, "fCO2", state.fco2Atm(), w.fco2(h, dic));
        same(as, "pCO2", state.pco2Atm(), w.pco2(h, dic));
        same(as, "aragonite", state.omegaAragonite(), w.omegaAragonite(h, dic));
        same(as, "calcite", state.omegaCalcite(), w.omegaCalcite(h, dic));
    }

    private static void same(String as, String what, double value, BigDecimal expected) {
        double exact = expected.doubleValue();
        assertThat(value).as("%s of %s", what, as).isCloseTo(exact, within(Math.abs(exact) * BILLIONTH));
    }

    private static BigDecimal exact(double value) {
        return HighPrecision.num(value);
    }

    /** A water of the grid. */
    private record Water(Conditions conditions, double ph, double totalAlkalinity) {
        /** At high pH and little alkalinity borate and hydroxide alone would exceed it: those are refused. */
        boolean hasCarbon() {
            boolean solved = CarbonateSystem.solve(conditions, new PhAndAlkalinity(ph, totalAlkalinity))
                    instanceof CarbonateResult.Solved;
            IndependentWater independent = new IndependentWater(conditions);
            BigDecimal dic = independent.dic(independent.hydrogenIon(ph, PhScale.TOTAL), exact(totalAlkalinity));
            assertThat(solved).as("solved, with carbon %s", dic).isEqualTo(dic.signum() >= 0);
            return solved;
        }
    }

    /** Every n-th water of the grid. */
    private static List<Water> waters(double phosphate, double silicate, int every) {
        List<Water> all = new ArrayList<>();
        int[] count = {0};
        Grid.forEach(phosphate, silicate, (c, pair) -> {
            if (count[0]++ % every == 0) {
                all.add(new Water(c, pair.ph().value(), pair.totalAlkalinity()));
            }
        });
        return all;
    }
}
