package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/** Holds whole waters against published and independently computed ones. */
class WholeSystemsValidationTest {
    @ParameterizedTest
    @CsvFileSource(resources = "/reference/whole-systems.csv", useHeadersInDisplayName = true)
    void agrees_with_the_published_water(
            double temperatureC,
            double salinity,
            String boron,
            double totalAlkalinity,
            double pco2,
            String quantity,
            double value,
            double tolerance,
            String source) {
        Conditions conditions = Conditions.of(temperatureC, salinity)
                .with(
                        CarbonicAcidFit.LUEKER_2000,
                        BoronRatio.fromWireName(boron).orElseThrow());
        CarbonateState state = CarbonateSystem.solve(
                        conditions, new AlkalinityAndPco2(totalAlkalinity * 1e-6, pco2 * 1e-6))
                .orElseThrow();
        assertThat(Quantities.of(state, quantity))
                .as("%s (source %s)", quantity, source)
                .isCloseTo(value, within(tolerance));
    }

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/default-fits.csv", useHeadersInDisplayName = true)
    void agrees_with_the_water_of_the_default_fits(String quantity, double value, double tolerance) {
        CarbonateState state = CarbonateSystem.solve(Conditions.of(25, 35), new PhAndAlkalinity(8.1, 2300e-6))
                .orElseThrow();
        assertThat(Quantities.of(state, quantity)).as(quantity).isCloseTo(value, within(tolerance));
    }

    @Test
    void a_seawater_scale_ph_read_as_total_moves_pco2_by_two_to_four_per_cent() {
        // a worked example elsewhere has pH 7.9391 and 2.5 %, for a water whose salinity is not given; the step between
        // the
        // scales goes with salinity
        Conditions conditions = Conditions.of(22, 28);
        double total = pco2(conditions, PhScale.TOTAL);
        double seawater = pco2(conditions, PhScale.SEAWATER);
        assertThat(Math.abs(total / seawater - 1)).isBetween(0.02, 0.04);
    }

    private static double pco2(Conditions conditions, PhScale scale) {
        return CarbonateSystem.solve(conditions, new PhAndAlkalinity(7.9391, scale, 2300e-6))
                .orElseThrow()
                .pco2Atm();
    }
}
