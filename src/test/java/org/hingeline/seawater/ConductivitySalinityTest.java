package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import java.util.SplittableRandom;
import org.hingeline.seawater.Figure.Known;
import org.hingeline.seawater.Figure.Refused;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ConductivitySalinityTest {
    private static final double[] SALINITIES = {0.001, 0.05, 0.5, 1.99, 2, 2.01, 10, 35, 42, 49.99};

    @Test
    void standard_seawater_at_15_degrees_of_1968_has_the_standard_conductivity() {
        assertThat(ConductivitySalinity.conductivity(35, 15 / 1.00024).orElseThrow())
                .isCloseTo(42.914, within(1e-6));
    }

    @Test
    void comes_back_from_salinity_through_conductivity() {
        for (double s : SALINITIES) {
            for (double t : new double[] {-2, 0, 5, 14.9, 15, 15.1, 25, 35, 45}) {
                for (double p : new double[] {0, 3, 200, 10_000}) {
                    double conductivity =
                            ConductivitySalinity.conductivity(s, t, p).orElseThrow();
                    assertThat(ConductivitySalinity.salinity(conductivity, t, p).orElseThrow())
                            .as("S %s, %s °C, %s dbar", s, t, p)
                            .isCloseTo(s, within(1e-12 + 1e-12 * s));
                }
            }
        }
    }

    @Test
    void comes_back_from_conductivity_through_salinity() {
        SplittableRandom random = new SplittableRandom(1978);
        for (int i = 0; i < 20_000; i++) {
            double t = random.nextDouble(-2, 45);
            double conductivity = random.nextDouble(0.01, 36);
            double s = ConductivitySalinity.salinity(conductivity, t).orElseThrow();
            assertThat(ConductivitySalinity.conductivity(s, t).orElseThrow())
                    .as("%s mS/cm, %s °C", conductivity, t)
                    .isCloseTo(conductivity, within(1e-11));
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {-2, 0, 5, 10, 15, 20, 25, 30, 35, 45})
    void has_no_step_at_a_salinity_of_2_where_the_published_extension_has_one(double t68) {
        double root = Bisection.root(x -> PracticalSalinity1978.ofRootRatio(x, t68) - 2, 0.2, 0.4);
        double published = HillDauphineeWoods1986.asPublished(2, root, t68);
        assertThat(published).as("the step of the extension as published").isCloseTo(2, within(0.0004));

        double below = PracticalSalinity1978.unclamped(root * (1 - 1e-9), t68);
        double above = PracticalSalinity1978.unclamped(root * (1 + 1e-9), t68);
        assertThat(below).isLessThan(2);
        assertThat(above - below).as("joined").isBetween(0.0, 2e-8);
    }

    @ParameterizedTest
    @ValueSource(doubles = {-2, 0, 15, 30, 45})
    void rises_with_conductivity_all_the_way(double temperatureC) {
        double last = -1;
        for (double c = 0.003; c < 60; c *= 1.003) {
            Figure figure = ConductivitySalinity.salinity(c, temperatureC);
            if (figure instanceof Known known) {
                assertThat(known.value()).as("%s mS/cm", c).isGreaterThan(last);
                last = known.value();
            }
        }
        assertThat(last).isGreaterThan(20);
    }

    @Test
    void pure_water_has_no_salinity() {
        assertThat(ConductivitySalinity.salinity(0, 20).orElseThrow()).isCloseTo(0, within(1e-15));
        assertThat(ConductivitySalinity.salinity(0.0005, 20).orElseThrow()).isZero();
        assertThat(ConductivitySalinity.conductivity(0, 20).orElseThrow()).isZero();
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, 15, 0, conductivity-out-of-range",
        "-0.1, 15, 0, conductivity-out-of-range",
        "Infinity, 15, 0, conductivity-out-of-range",
        "42000, 15, 0, conductivity-out-of-range",
        "40, NaN, 0, temperature-not-covered",
        "40, -2.1, 0, temperature-not-covered",
        "40, 45.5, 0, temperature-not-covered",
        "40, 15, NaN, pressure-out-of-range",
        "40, 15, -1, pressure-out-of-range",
        "40, 15, 10001, pressure-out-of-range",
        "80, 15, 0, salinity-not-covered"
    })
    void refuses_what_cannot_be(double conductivity, double temperatureC, double pressure, String code) {
        assertThat(ConductivitySalinity.salinity(conductivity, temperatureC, pressure))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo(code));
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, 15, 0, salinity-not-covered",
        "-0.1, 15, 0, salinity-not-covered",
        "50.1, 15, 0, salinity-not-covered",
        "35, NaN, 0, temperature-not-covered",
        "35, 15, NaN, pressure-out-of-range"
    })
    void refuses_the_conductivity_of_what_cannot_be(
            double salinity, double temperatureC, double pressure, String code) {
        assertThat(ConductivitySalinity.conductivity(salinity, temperatureC, pressure))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo(code));
    }

    @Test
    void quotes_the_bad_value() {
        assertThat(ConductivitySalinity.salinity(-3.25, 15))
                .isEqualTo(new Refused(
                        "conductivity-out-of-range",
                        "conductivity -3.25 mS/cm cannot be: 0.0 to 200.0 mS/cm is accepted"));
    }

    @ParameterizedTest
    @CsvSource({"50, 20, false", "55, 15, true", "50, 36, true", "1, 20, false", "50, 35, false"})
    void cautions_outside_the_scale_and_only_there(double conductivity, double temperatureC, boolean cautioned) {
        Known known = (Known) ConductivitySalinity.salinity(conductivity, temperatureC);
        assertThat(known.cautions()).hasSize(cautioned ? 1 : 0).allSatisfy(caution -> {
            assertThat(caution.code()).isEqualTo(FitRange.CAUTION_CODE);
            assertThat(caution.detail()).contains("Practical Salinity Scale 1978");
        });
    }

    @Test
    void carries_both_uncertainties_to_first_order() {
        double alone = uncertainty(40, 15, 0.1, 0);
        double warm = uncertainty(40, 15, 0, 0.1);
        assertThat(alone).isCloseTo(between(40.1, 15, 39.9, 15), within(1e-4));
        assertThat(warm).isCloseTo(between(40, 14.9, 40, 15.1), within(1e-4));
        assertThat(uncertainty(40, 15, 0.1, 0.1)).isCloseTo(Math.hypot(alone, warm), within(1e-12));
    }

    @Test
    void agrees_with_drawn_conductivities_and_temperatures() {
        Random random = new Random(44);
        int draws = 100_000;
        double sum = 0;
        double squares = 0;
        for (int i = 0; i < draws; i++) {
            double s = ConductivitySalinity.salinity(
                            32 + 0.2 * random.nextGaussian(), 12 + 0.15 * random.nextGaussian())
                    .orElseThrow();
            sum += s;
            squares += s * s;
        }
        double mean = sum / draws;
        assertThat(uncertainty(32, 12, 0.2, 0.15)).isCloseTo(Math.sqrt(squares / draws - mean * mean), within(0.003));
    }

    @ParameterizedTest
    @CsvSource({"-0.1, 0.1", "NaN, 0.1", "0.1, NaN", "0.1, -1", "Infinity, 0"})
    void refuses_an_uncertainty_that_cannot_be(double ofConductivity, double ofTemperature) {
        assertThat(ConductivitySalinity.uncertainty(40, 15, ofConductivity, ofTemperature))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo("uncertainty-out-of-range"));
    }

    private static double uncertainty(double c, double t, double ofConductivity, double ofTemperature) {
        return ConductivitySalinity.uncertainty(c, t, ofConductivity, ofTemperature)
                .orElseThrow();
    }

    /** Half the difference of two salinities. */
    private static double between(double highC, double highT, double lowC, double lowT) {
        return (ConductivitySalinity.salinity(highC, highT).orElseThrow()
                        - ConductivitySalinity.salinity(lowC, lowT).orElseThrow())
                / 2;
    }
}
