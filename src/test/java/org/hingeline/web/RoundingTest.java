package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Random;
import org.junit.jupiter.api.Test;

class RoundingTest {
    @Test
    void leaves_the_dust_of_binary_arithmetic_out() {
        assertThat(Rounding.to(2077.9999999999995, 10)).isEqualTo(2078);
        assertThat(Rounding.to(1.945420759123, 10)).isEqualTo(1.945420759);
        assertThat(Rounding.to(-0.000123456, 4)).isEqualTo(-0.0001235);
        assertThat(Rounding.to(0.1 + 0.2, 10)).hasToString("0.3");
    }

    @Test
    void leaves_alone_what_has_no_digits() {
        assertThat(Rounding.to(0, 10)).isZero();
        assertThat(Rounding.to(Double.POSITIVE_INFINITY, 10)).isInfinite();
        assertThat(Rounding.to(Double.NaN, 10)).isNaN();
    }

    @Test
    void is_within_half_a_digit_at_every_magnitude() {
        Random random = new Random(5);
        for (int i = 0; i < 100_000; i++) {
            double value = Math.exp(random.nextDouble() * 1200 - 600) * (random.nextBoolean() ? 1 : -1);
            double rounded = Rounding.to(value, 10);
            assertThat(Math.abs(rounded / value - 1))
                    .as("%s to %s", value, rounded)
                    .isLessThan(5.1e-10);
            assertThat(new BigDecimal(rounded).round(new MathContext(10)).doubleValue())
                    .as("the double nearest to ten digits, for %s", value)
                    .isEqualTo(rounded);
        }
    }
}
