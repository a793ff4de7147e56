package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.math.MathContext;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A blend against balances of mass and heat that are worked out on their own, and solved in 34-digit arithmetic. */
class BlendValidationTest {
    private static final CarbonateState BAY = CarbonateSystem.solve(
                    Conditions.of(9, 31).withNutrients(2.1e-6, 45e-6), new PhAndAlkalinity(7.72, 2125e-6))
            .orElseThrow();
    private static final CarbonateState RIVER = CarbonateSystem.solve(
                    Conditions.of(17, 6).withNutrients(0.4e-6, 120e-6).withCalcium(2.2e-3), new PhAndDic(7.6, 930e-6))
            .orElseThrow();

    @ParameterizedTest
    @ValueSource(doubles = {0, 0.01, 0.3, 0.5, 0.77, 1})
    void conserves_what_is_in_both_and_is_solved_as_such(double share) {
        CarbonateState blend = Treatment.blended(BAY, RIVER, share).orElseThrow();
        Conditions c = blend.conditions();
        conserved(share, BAY.totalAlkalinity(), RIVER.totalAlkalinity(), blend.totalAlkalinity());
        conserved(share, BAY.dic(), RIVER.dic(), blend.dic());
        conserved(share, 31, 6, c.salinity());
        conserved(share, 2.1e-6, 0.4e-6, c.phosphate());
        conserved(share, 45e-6, 120e-6, c.silicate());
        // calcium of the bay goes with its chlorinity: Riley & Tongudai 1967
        conserved(share, 0.02128 / 40.087 * 31 / 1.80655, 2.2e-3, c.calcium());

        IndependentWater independent = new IndependentWater(c);
        BigDecimal dic = mix(share, BAY.dic(), RIVER.dic());
        BigDecimal h = independent.hFromDic(mix(share, BAY.totalAlkalinity(), RIVER.totalAlkalinity()), dic);
        IndependentSolutionValidationTest.same(blend, independent, h, dic);
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.05, 0.3, 0.5, 0.8})
    void its_temperature_balances_the_heat_that_one_gives_and_the_other_takes(double share) {
        double mixed =
                Treatment.blended(BAY, RIVER, share).orElseThrow().conditions().temperatureC();
        double taken = (1 - share) * (enthalpy(mixed, 31) - enthalpy(9, 31));
        double given = share * (enthalpy(17, 6) - enthalpy(mixed, 6));
        // one heat capacity for each water, that of its own temperature, leaves a thousandth of a degree
        assertThat((taken - given) / 4000).isCloseTo(0, within(0.002));
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.1, 0.5, 0.9})
    void volumes_become_masses_by_their_densities(double volumeOfOther) {
        double share = Treatment.massShare(BAY, 1 - volumeOfOther, RIVER, volumeOfOther);
        double kgOfOther = volumeOfOther * MilleroPoisson1981.densityKgM3(17, 6);
        double kg = (1 - volumeOfOther) * MilleroPoisson1981.densityKgM3(9, 31);
        assertThat(share).isCloseTo(kgOfOther / (kg + kgOfOther), within(1e-15));
    }

    private static void conserved(double share, double one, double other, double blend) {
        double expected = mix(share, one, other).doubleValue();
        assertThat(blend).isCloseTo(expected, within(1e-14 * Math.abs(expected)));
    }

    private static BigDecimal mix(double share, double one, double other) {
        BigDecimal s = new BigDecimal(share);
        return BigDecimal.ONE
                .subtract(s)
                .multiply(new BigDecimal(one))
                .add(s.multiply(new BigDecimal(other)), MathContext.DECIMAL128);
    }

    /** J/kg over that of 0 °C: the integral of the heat capacity of UNESCO 44, term by term. */
    private static double enthalpy(double t, double s) {
        double[] water = {4217.4, -3.720283, 0.1412855, -2.654387e-3, 2.093236e-5};
        double[] a = {-7.643575, 0.1072763, -1.38385e-3};
        double[] b = {0.1770383, -4.07718e-3, 5.148e-5};
        return integral(water, t) + s * integral(a, t) + Math.pow(s, 1.5) * integral(b, t);
    }

    private static double integral(double[] coefficients, double t) {
        double sum = 0;
        for (int i = 0; i < coefficients.length; i++) {
            sum += coefficients[i] * Math.pow(t, i + 1) / (i + 1);
        }
        return sum;
    }
}
