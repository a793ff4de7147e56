package org.hingeline.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Definitions: the SI brochure (9th edition, 2019) for °C and K; NIST Special Publication 811 (2008), appendix B, for
 * the degree Fahrenheit, the US gallon (231 cubic inches, 3.785411784 L), the standard atmosphere (101325 Pa) and the
 * international foot (0.3048 m).
 */
class UnitConversionTest {

    @ParameterizedTest
    @CsvSource({
        "TEMPERATURE,     K,             273.15,  0",
        "TEMPERATURE,     [degF],        32,      0",
        "TEMPERATURE,     [degF],        212,     100",
        "TEMPERATURE,     [degF],        -40,     -40",
        "FLOW,            [gal_us]/min,  1,       3.785411784",
        "FLOW,            m3/h,          0.06,    1",
        "FLOW,            L/h,           60,      1",
        "PCO2,            Pa,            101325,  1000000",
        "LEVEL,           [ft_i],        10,      3.048",
        "LEVEL,           cm,            250,     2.5",
        "LEVEL,           mm,            -1500,   -1.5",
        "CONDUCTIVITY,    S/m,           4.2914,  42.914",
        "CONDUCTIVITY,    uS/cm,         42914,   42.914",
        "TOTAL_ALKALINITY, mmol/kg,      2.3,     2300",
        "TOTAL_ALKALINITY, mol/kg,       0.0023,  2300",
        "CALCIUM,         umol/kg,       10280,   10.28",
        "AMMONIA,         ug/L,          35,      0.035",
        "SALINITY,        [ppth],        35,      35",
        "SILENCE,         h,             1.5,     90"
    })
    void a_unit_becomes_the_canonical_one_by_its_published_definition(
            Quantity quantity, String ucum, double value, double canonical) {
        assertThat(UnitConversion.of(quantity, ucum).orElseThrow().toCanonical(value))
                .isCloseTo(canonical, within(1e-9 * Math.max(1, Math.abs(canonical))));
    }

    @Test
    void an_uncertainty_is_a_difference_and_takes_no_offset() {
        assertThat(UnitConversion.of(Quantity.TEMPERATURE, "[degF]")
                        .orElseThrow()
                        .uncertaintyToCanonical(1.8))
                .isCloseTo(1, within(1e-12));
        assertThat(UnitConversion.of(Quantity.TEMPERATURE, "K").orElseThrow().uncertaintyToCanonical(0.1))
                .isEqualTo(0.1);
    }

    @ParameterizedTest
    @EnumSource
    void the_canonical_unit_of_every_quantity_is_accepted_first_and_changes_nothing(Quantity quantity) {
        String ucum = quantity.unit().ucum();

        assertThat(UnitConversion.acceptedFor(quantity)).startsWith(ucum);
        assertThat(UnitConversion.of(quantity, ucum).orElseThrow().toCanonical(1.234))
                .isEqualTo(1.234);
    }

    @Test
    void a_unit_that_needs_more_than_the_value_or_is_written_otherwise_is_not_accepted() {
        assertThat(Stream.of("umol/L", "mmol/L", "meq/L", "µmol/kg", "UMOL/KG", "", " umol/kg"))
                .allSatisfy(ucum -> assertThat(UnitConversion.of(Quantity.TOTAL_ALKALINITY, ucum))
                        .isEmpty());
        assertThat(UnitConversion.of(Quantity.TEMPERATURE, "°C")).isEmpty();
        assertThat(UnitConversion.of(Quantity.PH, "Cel")).isEmpty();
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
