package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;

class DerivedWatersTest {
    private final CarbonateState cool = CarbonateSystem.solve(Conditions.of(12, 30), new PhAndAlkalinity(7.9, 2078e-6))
            .orElseThrow();

    @Test
    void warming_a_closed_water_lowers_ph_and_raises_pco2_and_omega_and_keeps_carbon() {
        CarbonateState warm = Treatment.atTemperature(cool, 24).orElseThrow();
        assertThat(warm.dic()).isEqualTo(cool.dic());
        assertThat(warm.totalAlkalinity()).isCloseTo(cool.totalAlkalinity(), within(1e-13));
        assertThat(warm.phTotal()).isLessThan(cool.phTotal());
        assertThat(warm.pco2Atm()).isGreaterThan(cool.pco2Atm());
        assertThat(warm.omegaAragonite()).isGreaterThan(cool.omegaAragonite());
        CarbonateState back = Treatment.atTemperature(warm, 12).orElseThrow();
        assertThat(back.phTotal()).isCloseTo(cool.phTotal(), within(1e-10));
    }

    @Test
    void aeration_reaches_the_pco2_asked_for_and_keeps_alkalinity() {
        CarbonateState aerated = Treatment.equilibrated(cool, 420e-6).orElseThrow();
        assertThat(aerated.pco2Atm()).isCloseTo(420e-6, within(1e-15));
        assertThat(aerated.totalAlkalinity()).isCloseTo(cool.totalAlkalinity(), within(1e-13));
    }

    @Test
    void wire_names_lead_back_to_their_choice() {
        for (PhScale scale : PhScale.values()) {
            assertThat(PhScale.fromWireName(scale.wireName())).contains(scale);
        }
        for (CarbonicAcidFit fit : CarbonicAcidFit.values()) {
            assertThat(CarbonicAcidFit.fromWireName(fit.wireName())).contains(fit);
        }
        for (BoronRatio ratio : BoronRatio.values()) {
            assertThat(BoronRatio.fromWireName(ratio.wireName())).contains(ratio);
        }
        assertThat(PhScale.fromWireName("Total")).isEmpty();
    }

    @Test
    void an_uncertainty_that_is_no_number_or_negative_is_refused() {
        assertThatThrownBy(() -> InputUncertainty.ofPhAndAlkalinity(-0.01, 0, 0, 0))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("ph")
                .hasMessageContaining("-0.01");
        assertThatThrownBy(() -> InputUncertainty.ofPhAndAlkalinity(0.01, 0, Double.NaN, 0))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("temperatureC");
    }

    @Test
    void the_uncertainty_at_salinity_zero_is_a_number() {
        CarbonateState fresh = CarbonateSystem.solve(Conditions.of(15, 0), new PhAndAlkalinity(7.5, 500e-6))
                .orElseThrow();
        StateUncertainty u = Uncertainty.of(fresh, InputUncertainty.DEFAULTS);
        assertThat(u.pco2Atm().total()).isPositive().isFinite();
        assertThat(u.phTotal().total()).isCloseTo(0.02, within(1e-9));
    }
}
