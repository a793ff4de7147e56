package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.Figure.Known;
import org.hingeline.seawater.Figure.Refused;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class TrisStandardTest {
    @ParameterizedTest
    @EnumSource(PhScale.class)
    void a_sensor_that_reads_the_standard_deviates_by_nothing_on_any_scale(PhScale scale) {
        double standard = TrisStandard.ph(18, 33).orElseThrow();
        double reading = scale.fromTotal(standard, 18, 33);
        assertThat(TrisStandard.deviation(reading, scale, 18, 33).orElseThrow()).isCloseTo(0, within(1e-12));
        assertThat(TrisStandard.deviation(reading + 0.07, scale, 18, 33).orElseThrow())
                .isCloseTo(0.07, within(1e-12));
    }

    @Test
    void a_reading_on_the_wrong_scale_shows_as_a_deviation() {
        double standard = TrisStandard.ph(25, 35).orElseThrow();
        assertThat(TrisStandard.deviation(standard, PhScale.FREE, 25, 35).orElseThrow())
                .isCloseTo(-0.1077, within(0.00005));
    }

    @Test
    void cautions_outside_the_fit_and_on_nbs_buffers() {
        Known known = (Known) TrisStandard.deviation(8.2, PhScale.NBS, 25, 10);
        assertThat(known.cautions()).extracting(Caution::code).containsExactly("outside-fit-range", "nbs-scale");
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, 25, 35, ph-out-of-range",
        "13.5, 25, 35, ph-out-of-range",
        "8, NaN, 35, temperature-not-covered",
        "8, 60, 35, temperature-not-covered",
        "8, 25, -1, salinity-not-covered",
        "8, 25, NaN, salinity-not-covered"
    })
    void refuses_what_cannot_be(double reading, double temperatureC, double salinity, String code) {
        assertThat(TrisStandard.deviation(reading, PhScale.NBS, temperatureC, salinity))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo(code));
    }
}
