package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.assertj.core.data.Offset;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/**
 * Holds density, heat capacity and salinity against TEOS-10, computed by another library into the tables
 * {@code teos10-*.csv} by {@code src/test/reference-scripts/teos10.py}.
 */
class Teos10ValidationTest {
    /**
     * Millero and Poisson 1981 give 0.0036 kg/m³ as the standard error of their fit; TEOS-10 rests on the same
     * measurements and later ones. Three standard errors, four for the salinities above 40 at the edge of the fit.
     */
    static final double DENSITY_STANDARD_ERROR = 0.0036;

    /**
     * The heat capacity of pure water that the 1973 fit starts from is 2 to 3.3 J/(kg K) below today's; the fit itself
     * was good to about 1 J/(kg K). Together 5, which is 0.12 %.
     */
    static final Offset<Double> HEAT_CAPACITY = within(5.0);

    /** Both sides use PSS-78 with the same extension; the tables have 12 digits. */
    static final Offset<Double> SAME_EQUATION = within(1e-9);

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/teos10-density.csv", useHeadersInDisplayName = true)
    void density_is_that_of_teos10_within_the_errors_of_the_fit(
            double temperatureC, double salinity, double densityKgM3, double heatCapacity) {
        assertThat(MilleroPoisson1981.densityKgM3(temperatureC, salinity))
                .isCloseTo(densityKgM3, within((salinity > 40 ? 4 : 3) * DENSITY_STANDARD_ERROR));
        assertThat(MilleroPerronDesnoyers1973.heatCapacity(temperatureC, salinity))
                .isCloseTo(heatCapacity, HEAT_CAPACITY);
    }

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/teos10-salinity.csv", useHeadersInDisplayName = true)
    void salinity_of_a_conductivity_is_that_of_teos10(
            double conductivityMsCm, double temperatureC, double pressureDbar, double salinity) {
        assertThat(ConductivitySalinity.salinity(conductivityMsCm, temperatureC, pressureDbar)
                        .orElseThrow())
                .isCloseTo(salinity, SAME_EQUATION);
    }

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/teos10-conductivity.csv", useHeadersInDisplayName = true)
    void conductivity_of_a_salinity_is_that_of_teos10(
            double salinity, double temperatureC, double pressureDbar, double conductivityMsCm) {
        assertThat(ConductivitySalinity.conductivity(salinity, temperatureC, pressureDbar)
                        .orElseThrow())
                .isCloseTo(conductivityMsCm, SAME_EQUATION);
    }
}
