package org.hingeline.quality;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import org.hingeline.measure.Quantity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class GrossRangeTest {

    @ParameterizedTest
    @EnumSource
    void the_ends_of_the_instrument_pass_and_the_next_number_outside_fails(Quantity quantity) {
        assertThat(GrossRange.test(quantity, quantity.sensorMin())).isEqualTo(Flag.PASS);
        assertThat(GrossRange.test(quantity, quantity.sensorMax())).isEqualTo(Flag.PASS);
        assertThat(GrossRange.test(quantity, Math.nextDown(quantity.sensorMin())))
                .isEqualTo(Flag.FAIL);
        assertThat(GrossRange.test(quantity, Math.nextUp(quantity.sensorMax()))).isEqualTo(Flag.FAIL);
    }

    @Test
    void what_is_no_number_fails() {
        assertThat(GrossRange.test(Quantity.PH, Double.NaN)).isEqualTo(Flag.FAIL);
    }

    @Test
    void flags_have_the_codes_of_the_manuals_and_come_back_from_them() {
        assertThat(Flag.values()).extracting(Flag::code).containsExactly(1, 2, 3, 4, 9);
        assertThat(Flag.values())
                .allSatisfy(flag -> assertThat(Flag.ofCode(flag.code())).isEqualTo(flag));
        assertThatIllegalArgumentException().isThrownBy(() -> Flag.ofCode(5)).withMessageContaining("5");
    }

    @Test
    void only_failed_and_missing_values_are_unusable() {
        assertThat(Flag.values()).filteredOn(flag -> !flag.usable()).containsExactly(Flag.FAIL, Flag.MISSING);
    }
}
