package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/** Holds salinity from conductivity against the check values of UNESCO 44. */
class PracticalSalinityValidationTest {
    @ParameterizedTest
    @CsvFileSource(resources = "/reference/salinity-check-values.csv", useHeadersInDisplayName = true)
    void reproduces_the_check_values(
            double ratio, double t68, double pressureDbar, double salinity, double tolerance, String source) {
        assertThat(PracticalSalinity1978.salinity(ratio, t68, pressureDbar))
                .as("source %s", source)
                .isCloseTo(salinity, within(tolerance));
    }

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/salinity-check-values.csv", useHeadersInDisplayName = true)
    void reproduces_them_from_a_conductivity_and_an_its_90_temperature(
            double ratio, double t68, double pressureDbar, double salinity, double tolerance, String source) {
        Figure computed = ConductivitySalinity.salinity(42.914 * ratio, t68 / 1.00024, pressureDbar);
        assertThat(computed.orElseThrow()).as("source %s", source).isCloseTo(salinity, within(tolerance));
    }
}
