package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.stream.Stream;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class RefusalAndCautionTest {
    private static final PhAndAlkalinity GOOD = new PhAndAlkalinity(8.1, 2300e-6);

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, -2.1, 45.1, 300, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY})
    void refuses_a_temperature_no_fit_covers_and_quotes_it(double t) {
        refused(CarbonateSystem.solve(Conditions.of(t, 35), GOOD), UnsolvableReason.TEMPERATURE_NOT_COVERED, t);
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, -0.1, 50.1, Double.POSITIVE_INFINITY})
    void refuses_a_salinity_no_fit_covers_and_quotes_it(double s) {
        refused(CarbonateSystem.solve(Conditions.of(15, s), GOOD), UnsolvableReason.SALINITY_NOT_COVERED, s);
    }

    static Stream<Arguments> badPairs() {
        return Stream.of(
                Arguments.of(new PhAndAlkalinity(Double.NaN, 2300e-6), UnsolvableReason.PH_OUT_OF_RANGE, Double.NaN),
                Arguments.of(new PhAndAlkalinity(13.5, 2300e-6), UnsolvableReason.PH_OUT_OF_RANGE, 13.5),
                Arguments.of(new PhAndAlkalinity(8, 2300), UnsolvableReason.ALKALINITY_OUT_OF_RANGE, 2300.0),
                Arguments.of(new PhAndAlkalinity(8, Double.NaN), UnsolvableReason.ALKALINITY_OUT_OF_RANGE, Double.NaN),
                Arguments.of(new AlkalinityAndDic(2300e-6, -1e-9), UnsolvableReason.DIC_OUT_OF_RANGE, -1e-9),
                Arguments.of(new AlkalinityAndDic(2300e-6, 2000), UnsolvableReason.DIC_OUT_OF_RANGE, 2000.0),
                Arguments.of(new AlkalinityAndPco2(2300e-6, 0), UnsolvableReason.PCO2_OUT_OF_RANGE, 0.0),
                Arguments.of(new AlkalinityAndPco2(2300e-6, 420), UnsolvableReason.PCO2_OUT_OF_RANGE, 420.0),
                Arguments.of(new PhAndAlkalinity(9.5, 100e-6), UnsolvableReason.INPUTS_CONTRADICT, 9.5));
    }

    @ParameterizedTest
    @MethodSource("badPairs")
    void refuses_a_pair_no_water_has_and_quotes_the_value(KnownPair pair, UnsolvableReason reason, double quoted) {
        refused(CarbonateSystem.solve(Conditions.of(15, 30), pair), reason, quoted);
    }

    @Test
    void refuses_an_impossible_composition() {
        Conditions negative = Conditions.of(15, 30).withNutrients(-1e-6, 0);
        refused(CarbonateSystem.solve(negative, GOOD), UnsolvableReason.COMPOSITION_OUT_OF_RANGE, -1e-6);
        Conditions millimolSlip = Conditions.of(15, 30).withCalcium(10.3);
        refused(CarbonateSystem.solve(millimolSlip, GOOD), UnsolvableReason.COMPOSITION_OUT_OF_RANGE, 10.3);
    }

    @Test
    void a_refusal_thrown_keeps_its_words() {
        assertThatThrownBy(
                        () -> CarbonateSystem.solve(Conditions.of(60, 30), GOOD).orElseThrow())
                .isInstanceOf(IllegalStateException.class)
                .hasMessageContaining("temperature-not-covered")
                .hasMessageContaining("60.0");
    }

    @Test
    void constants_of_another_water_are_not_accepted() {
        SeawaterConstants other = SeawaterConstants.of(Conditions.of(14, 30));
        assertThatThrownBy(() -> CarbonateSystem.solve(other, Conditions.of(15, 30), GOOD))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("14.0");
    }

    @Test
    void water_within_every_fit_carries_no_caution() {
        assertThat(solve(Conditions.of(15, 30), GOOD).cautions()).isEmpty();
    }

    @Test
    void estuarine_water_is_solved_with_a_caution_that_names_the_fit_and_its_range() {
        assertThat(solve(Conditions.of(15, 12), GOOD).cautions())
                .singleElement()
                .satisfies(c -> {
                    assertThat(c.code()).isEqualTo("outside-fit-range");
                    assertThat(c.detail())
                            .contains("Lueker, Dickson & Keeling 2000")
                            .contains("19 to 43")
                            .contains("2 to 35 °C")
                            .contains("salinity 12");
                });
        Conditions estuary = Conditions.of(15, 12).with(CarbonicAcidFit.MILLERO_2006, BoronRatio.LEE_2010);
        assertThat(solve(estuary, GOOD).cautions()).isEmpty();
    }

    @Test
    void cold_water_names_each_fit_it_is_outside_of() {
        assertThat(solve(Conditions.of(1, 30), GOOD).cautions())
                .extracting(Caution::detail)
                .anySatisfy(d -> assertThat(d).contains("Lueker"))
                .anySatisfy(d -> assertThat(d).contains("Perez & Fraga 1987"))
                .anySatisfy(d -> assertThat(d).contains("Mucci 1983"))
                .hasSize(3);
    }

    @Test
    void nutrients_bring_their_own_fits_only_when_present() {
        assertThat(solve(Conditions.of(20, 46), GOOD).cautions())
                .noneSatisfy(c -> assertThat(c.detail()).contains("KSi"));
        assertThat(solve(Conditions.of(20, 46).withNutrients(1e-6, 1e-5), GOOD).cautions())
                .anySatisfy(c -> assertThat(c.detail()).contains("KSi"))
                .anySatisfy(c -> assertThat(c.detail()).contains("KP1"));
    }

    @Test
    void a_ph_on_nbs_buffers_says_what_it_carries() {
        assertThat(solve(Conditions.of(15, 30), new PhAndAlkalinity(8.1, PhScale.NBS, 2300e-6))
                        .cautions())
                .singleElement()
                .satisfies(c -> {
                    assertThat(c.code()).isEqualTo("nbs-scale");
                    assertThat(c.detail()).contains("0.05");
                });
    }

    @Test
    void a_measured_calcium_overrides_that_of_salinity() {
        CarbonateState plain = solve(Conditions.of(15, 30), GOOD);
        double doubled = 2 * SeawaterConstants.of(Conditions.of(15, 30)).calciumFromSalinity;
        CarbonateState measured = solve(Conditions.of(15, 30).withCalcium(doubled), GOOD);
        assertThat(measured.omegaAragonite() / plain.omegaAragonite()).isEqualTo(2.0);
        assertThat(measured.phTotal()).isEqualTo(plain.phTotal());
    }

    private static CarbonateState solve(Conditions conditions, KnownPair pair) {
        return CarbonateSystem.solve(conditions, pair).orElseThrow();
    }

    private static void refused(CarbonateResult result, UnsolvableReason reason, double quoted) {
        assertThat(result).isInstanceOfSatisfying(Unsolvable.class, r -> {
            assertThat(r.reason()).isEqualTo(reason);
            assertThat(r.detail()).contains(String.valueOf(quoted));
        });
    }
}
