package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.Figure.Known;
import org.hingeline.seawater.Figure.Refused;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class VolumeAmountTest {
    private static final double[] SALINITIES = {0.001, 0.05, 0.5, 1.99, 2, 2.01, 10, 35, 42, 50};

    @Test
    void a_millimole_per_litre_of_standard_seawater_is_a_little_less_per_kilogram() {
        assertThat(VolumeAmount.perKilogram(1e-3, 25, 35).orElseThrow()).isCloseTo(977.19e-6, within(0.005e-6));
    }

    @Test
    void comes_back_from_volume_through_mass() {
        for (double s : SALINITIES) {
            for (double t : new double[] {-2, 5, 20, 45}) {
                double perKilogram = VolumeAmount.perKilogram(2.3e-3, t, s).orElseThrow();
                assertThat(VolumeAmount.perLitre(perKilogram, t, s).orElseThrow())
                        .isCloseTo(2.3e-3, within(1e-17));
            }
        }
    }

    @Test
    void ten_degrees_make_a_fifth_of_a_per_cent() {
        double cold = VolumeAmount.perKilogram(1, 15, 35).orElseThrow();
        double warm = VolumeAmount.perKilogram(1, 25, 35).orElseThrow();
        assertThat(warm / cold - 1).isBetween(0.002, 0.003);
    }

    @Test
    void cautions_outside_the_equation_of_state() {
        assertThat(((Known) VolumeAmount.perKilogram(1e-3, 25, 45)).cautions()).hasSize(1);
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, 25, 35, amount-out-of-range",
        "Infinity, 25, 35, amount-out-of-range",
        "1, NaN, 35, temperature-not-covered",
        "1, 25, 51, salinity-not-covered"
    })
    void refuses_what_cannot_be(double amount, double temperatureC, double salinity, String code) {
        assertThat(VolumeAmount.perKilogram(amount, temperatureC, salinity))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo(code));
        assertThat(VolumeAmount.perLitre(amount, temperatureC, salinity))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo(code));
    }
}
