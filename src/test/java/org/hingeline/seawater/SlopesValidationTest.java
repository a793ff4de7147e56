package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.util.List;
import java.util.function.DoubleFunction;
import java.util.stream.Stream;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What the uncertainty makes of one input alone is the slope of the independent solution in 34-digit arithmetic, taken by
 * central differences. For alkalinity and carbon these are the buffer factors: Revelle's is the slope of ln pCO2 with ln DIC.
 */
class SlopesValidationTest {
    private static final double RELATIVE = 1e-6;
    private static final double STEP = 1e-5;
    /** What bisection to 1 in 10¹³ leaves of a difference over two steps, relative to the value. */
    private static final double BISECTED = 1e-7;

    /** Water of the bay, of the ocean and of an estuary. */
    static Stream<CarbonateState> waters() {
        return Stream.of(
                        CarbonateSystem.solve(Conditions.of(12, 30), new PhAndAlkalinity(7.7, 2078e-6)),
                        CarbonateSystem.solve(
                                Conditions.of(25, 35).withNutrients(1e-6, 10e-6), new PhAndAlkalinity(8.1, 2300e-6)),
                        CarbonateSystem.solve(
                                Conditions.of(18, 9).with(CarbonicAcidFit.MILLERO_2006, BoronRatio.UPPSTROM_1974),
                                new PhAndAlkalinity(7.4, 1100e-6)))
                .map(CarbonateResult::orElseThrow);
    }

    @ParameterizedTest
    @MethodSource("waters")
    void of_every_pair_with_every_input(CarbonateState w) {
        Conditions c = w.conditions();
        double ph = w.phTotal();
        double ta = w.totalAlkalinity();
        double dic = w.dic();
        double pco2 = w.pco2Atm();
        slopes(c, new PhAndAlkalinity(ph, ta), x -> new PhAndAlkalinity(ph + x, ta), ofPh(1));
        slopes(c, new PhAndAlkalinity(ph, ta), x -> new PhAndAlkalinity(ph, ta * (1 + x)), ofAlkalinity(ta));
        slopes(c, new PhAndDic(ph, dic), x -> new PhAndDic(ph + x, dic), ofPh(1));
        slopes(c, new PhAndDic(ph, dic), x -> new PhAndDic(ph, dic * (1 + x)), ofDic(dic));
        slopes(c, new PhAndPco2(ph, pco2), x -> new PhAndPco2(ph + x, pco2), ofPh(1));
        slopes(c, new PhAndPco2(ph, pco2), x -> new PhAndPco2(ph, pco2 * (1 + x)), ofPco2(pco2));
        slopes(c, new AlkalinityAndDic(ta, dic), x -> new AlkalinityAndDic(ta * (1 + x), dic), ofAlkalinity(ta));
        slopes(c, new AlkalinityAndDic(ta, dic), x -> new AlkalinityAndDic(ta, dic * (1 + x)), ofDic(dic));
        slopes(c, new AlkalinityAndPco2(ta, pco2), x -> new AlkalinityAndPco2(ta * (1 + x), pco2), ofAlkalinity(ta));
        slopes(c, new AlkalinityAndPco2(ta, pco2), x -> new AlkalinityAndPco2(ta, pco2 * (1 + x)), ofPco2(pco2));
        slopes(c, new DicAndPco2(dic, pco2), x -> new DicAndPco2(dic * (1 + x), pco2), ofDic(dic));
        slopes(c, new DicAndPco2(dic, pco2), x -> new DicAndPco2(dic, pco2 * (1 + x)), ofPco2(pco2));
        for (KnownPair pair : List.of(
                new PhAndAlkalinity(ph, ta),
                new PhAndAlkalinity(KnownPh.on(PhScale.FREE, ph), ta),
                new PhAndDic(KnownPh.on(PhScale.SEAWATER, ph), dic),
                new PhAndPco2(ph, pco2),
                new AlkalinityAndDic(ta, dic),
                new AlkalinityAndPco2(ta, pco2),
                new DicAndPco2(dic, pco2))) {
            same(
                    CarbonateSystem.solve(c, pair).orElseThrow(),
                    new InputUncertainty(0, 0, 0, 0, 1, 0, 0),
                    IndependentSolution.of(c.withTemperatureC(c.temperatureC() + STEP), pair),
                    IndependentSolution.of(c.withTemperatureC(c.temperatureC() - STEP), pair));
            same(
                    CarbonateSystem.solve(c, pair).orElseThrow(),
                    new InputUncertainty(0, 0, 0, 0, 0, 1, 0),
                    IndependentSolution.of(withSalinity(c, c.salinity() + STEP), pair),
                    IndependentSolution.of(withSalinity(c, c.salinity() - STEP), pair));
        }
    }

    private static void slopes(
            Conditions c, KnownPair pair, DoubleFunction<KnownPair> moved, InputUncertainty ofOneMoved) {
        same(
                CarbonateSystem.solve(c, pair).orElseThrow(),
                ofOneMoved,
                IndependentSolution.of(c, moved.apply(STEP)),
                IndependentSolution.of(c, moved.apply(-STEP)));
    }

    private static void same(
            CarbonateState state, InputUncertainty u, IndependentSolution up, IndependentSolution down) {
        BigDecimal[] high = up.quantities();
        BigDecimal[] low = down.quantities();
        double[] values = Outputs.of(state);
        StandardUncertainty[] ours = Outputs.of(Uncertainty.of(state, u));
        for (int q = 0; q < ours.length; q++) {
            double slope = Math.abs(high[q].subtract(low[q]).doubleValue()) / (2 * STEP);
            assertThat(ours[q].fromInputs())
                    .as("%s of %s with %s", Outputs.NAMES.get(q), state.known(), u)
                    .isCloseTo(slope, within(RELATIVE * slope + BISECTED * Math.abs(values[q])));
        }
    }

    private static InputUncertainty ofPh(double u) {
        return new InputUncertainty(u, 0, 0, 0, 0, 0, 0);
    }

    private static InputUncertainty ofAlkalinity(double u) {
        return new InputUncertainty(0, u, 0, 0, 0, 0, 0);
    }

    private static InputUncertainty ofDic(double u) {
        return new InputUncertainty(0, 0, u, 0, 0, 0, 0);
    }

    private static InputUncertainty ofPco2(double u) {
        return new InputUncertainty(0, 0, 0, u, 0, 0, 0);
    }

    private static Conditions withSalinity(Conditions c, double salinity) {
        return new Conditions(c.temperatureC(), salinity, c.phosphate(), c.silicate(), c.calcium(), c.fit(), c.boron());
    }
}
