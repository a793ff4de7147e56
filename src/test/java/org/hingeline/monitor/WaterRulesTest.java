package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;

import java.time.Duration;
import java.time.Instant;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.CarbonicAcidFit;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** Measured calcium and the chosen fits, in the water states of points. */
class WaterRulesTest {
    private final Hatchery hatchery = Hatchery.empty();

    @BeforeEach
    void calciumIsTitratedNowAndThen() {
        hatchery.sensor("ca-1", Quantity.CALCIUM, 0.1);
        hatchery.clock.set(T0.plus(Duration.ofDays(5)));
    }

    @Test
    void a_measured_calcium_takes_the_place_of_the_one_that_salinity_tells() {
        hatchery.readAllButPh(T0);
        hatchery.read("ph-1", 7.9, T0);
        WaterState before = hatchery.newestState();

        hatchery.read("ca-1", 9.6, T0);

        WaterState after = hatchery.newestState();
        CarbonateState expected = CarbonateSystem.solve(
                        Conditions.of(22, 30).withCalcium(9.6e-3), new PhAndAlkalinity(7.9, 2078e-6))
                .orElseThrow();
        assertThat(after.numbers().omegaAragonite()).isCloseTo(expected.omegaAragonite(), within(1e-12));
        assertThat(after.numbers().omegaAragonite())
                .isGreaterThan(1.08 * before.numbers().omegaAragonite());
        assertThat(after.numbers().dicUmolKg()).isEqualTo(before.numbers().dicUmolKg());
        assertThat(after.numbers().omegaAragoniteFromInputs())
                .as("one per cent more, that of the calcium")
                .isGreaterThan(1.08 * before.numbers().omegaAragoniteFromInputs());
        assertThat(after.inputs()).extracting(InputUsed::sensor).contains("ca-1");
    }

    @Test
    void a_calcium_too_old_is_left_out_and_is_no_missing_input() {
        hatchery.read("ca-1", 9.6, T0);
        Instant later =
                T0.plus(Hatchery.AGE_LIMITS.of(Quantity.TOTAL_ALKALINITY)).plusMillis(1);
        hatchery.readAllButPh(later);
        hatchery.read("ph-1", 7.9, later);

        WaterState state = hatchery.newestState();
        assertThat(state.missing()).isEmpty();
        assertThat(state.inputs()).extracting(InputUsed::quantity).doesNotContain(Quantity.CALCIUM);
    }

    @Test
    void the_fits_that_were_chosen_are_used() {
        WaterRules estuary =
                new WaterRules(Hatchery.AGE_LIMITS, CarbonicAcidFit.MILLERO_2006, BoronRatio.UPPSTROM_1974);
        Conditions conditions = estuary.conditions(15, 12, null);
        assertThat(conditions)
                .isEqualTo(Conditions.of(15, 12).with(CarbonicAcidFit.MILLERO_2006, BoronRatio.UPPSTROM_1974));

        hatchery.start(hatchery.database, Hatchery.ROWS_PER_TRANSACTION, estuary);
        hatchery.readAllButPh(T0);
        hatchery.read("ph-1", 7.9, T0);

        CarbonateState expected = CarbonateSystem.solve(
                        Conditions.of(22, 30).with(CarbonicAcidFit.MILLERO_2006, BoronRatio.UPPSTROM_1974),
                        new PhAndAlkalinity(7.9, 2078e-6))
                .orElseThrow();
        assertThat(hatchery.newestState().numbers().omegaAragonite())
                .isCloseTo(expected.omegaAragonite(), within(1e-12));
    }
}
