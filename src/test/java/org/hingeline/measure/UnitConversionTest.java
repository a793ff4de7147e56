package org.hingeline.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class UnitConversionTest {

    @Test
    void an_uncertainty_is_a_difference_and_takes_no_offset() {
        assertThat(Units.find(Quantity.TEMPERATURE, "[degF]")
                        .orElseThrow()
                        .conversion()
                        .uncertaintyToCanonical(1.8))
                .isCloseTo(1, within(1e-12));
        assertThat(Units.find(Quantity.TEMPERATURE, "K")
                        .orElseThrow()
                        .conversion()
                        .uncertaintyToCanonical(0.1))
                .isEqualTo(0.1);
    }

    @ParameterizedTest
    @EnumSource
    void the_canonical_unit_of_every_quantity_is_accepted_first_and_changes_nothing(Quantity quantity) {
        String ucum = quantity.unit().ucum();

        assertThat(Units.codes(quantity)).startsWith(ucum);
        assertThat(Units.find(quantity, ucum).orElseThrow().conversion().toCanonical(1.234))
                .isEqualTo(1.234);
    }

    @Test
    void a_factor_that_is_no_positive_number_is_refused_by_name() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new UnitConversion("Cel", 0, 1))
                .withMessageContaining("Cel")
                .withMessageContaining("0.0");
        assertThatIllegalArgumentException().isThrownBy(() -> new UnitConversion("Cel", Double.NaN, 1));
        assertThatIllegalArgumentException().isThrownBy(() -> new UnitConversion("Cel", 1, Double.POSITIVE_INFINITY));
    }

    @Test
    void every_quantity_is_found_by_a_code_of_its_own() {
        assertThat(Arrays.stream(Quantity.values()).map(Quantity::code)).doesNotHaveDuplicates();
        assertThat(Quantity.values()).allSatisfy(quantity -> {
            assertThat(Quantity.ofCode(quantity.code())).contains(quantity);
            assertThat(quantity.sensorMin()).isLessThan(quantity.sensorMax());
        });
        assertThat(Quantity.ofCode("PH")).isEmpty();
    }

    @Test
    void only_what_sensors_report_is_listed_for_readings_and_silence_is_never_listed() {
        assertThat(Quantity.measuredCodes())
                .isEqualTo("ph, temperature, salinity, conductivity, totalAlkalinity, dic, pco2, calcium,"
                        + " dissolvedOxygen, flow, level, ammonia");
        assertThat(Quantity.limitCodes()).contains("omegaAragonite").doesNotContain("silence");
    }
}
