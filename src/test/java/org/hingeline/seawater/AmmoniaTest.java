package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.Figure.Known;
import org.hingeline.seawater.Figure.Refused;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AmmoniaTest {
    @Test
    void half_a_milligram_of_total_ammonia_is_seldom_toxic_at_ph_8_and_passes_the_chronic_criterion_at_8_5() {
        double calm = Ammonia.unionisedNh3MgL(0.5, 8.0, 15, 30).orElseThrow();
        double raised = Ammonia.unionisedNh3MgL(0.5, 8.5, 25, 30).orElseThrow();
        assertThat(calm)
                .isCloseTo(0.5 * 0.0261 * 17.031 / 14.007, within(1e-4))
                .isLessThan(Ammonia.EPA_1989_CHRONIC_MG_L);
        assertThat(raised)
                .isCloseTo(0.5 * 0.1588 * 17.031 / 14.007, within(1e-4))
                .isBetween(Ammonia.EPA_1989_CHRONIC_MG_L, Ammonia.EPA_1989_ACUTE_MG_L);
    }

    @Test
    void as_nitrogen_it_is_the_share_of_the_total() {
        assertThat(Ammonia.unionisedNitrogenMgL(2, 8.0, 25, 35).orElseThrow()).isCloseTo(2 * 0.0556, within(1e-4));
    }

    @Test
    void raising_the_ph_from_8_to_8_5_makes_nearly_three_times_as_much_toxic() {
        double before = Ammonia.unionisedShare(8.0, 20, 30).orElseThrow();
        double after = Ammonia.unionisedShare(8.5, 20, 30).orElseThrow();
        assertThat(after / before).isBetween(2.8, 3.0);
    }

    @Test
    void cautions_outside_the_fit() {
        Known known = (Known) Ammonia.unionisedNh3MgL(0.5, 8, 42, 30);
        assertThat(known.cautions())
                .singleElement()
                .satisfies(caution -> assertThat(caution.detail()).contains("Clegg & Whitfield 1995"));
        assertThat(((Known) Ammonia.unionisedNh3MgL(0.5, 8, 40, 0)).cautions()).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, 8, 20, 30, ammonia-out-of-range",
        "-0.1, 8, 20, 30, ammonia-out-of-range",
        "1001, 8, 20, 30, ammonia-out-of-range",
        "0.5, NaN, 20, 30, ph-out-of-range",
        "0.5, 14, 20, 30, ph-out-of-range",
        "0.5, 8, 60, 30, temperature-not-covered",
        "0.5, 8, 20, NaN, salinity-not-covered"
    })
    void refuses_what_cannot_be(double total, double ph, double temperatureC, double salinity, String code) {
        assertThat(Ammonia.unionisedNh3MgL(total, ph, temperatureC, salinity))
                .isInstanceOfSatisfying(
                        Refused.class, refused -> assertThat(refused.code()).isEqualTo(code));
    }
}
