package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;

import org.hingeline.measure.Quantity;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.junit.jupiter.api.Test;

/** A stored water state, taken up as a wish and computed again. */
class StateWishesTest {
    private static final WaterRules ESTUARY =
            new WaterRules(Hatchery.AGE_LIMITS, CarbonicAcidFit.MILLERO_2006, BoronRatio.UPPSTROM_1974);

    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void gives_the_very_numbers_of_the_state_with_its_calcium_its_fits_and_its_uncertainty() {
        hatchery.sensor("ca-1", Quantity.CALCIUM, 0.1);
        hatchery.start(hatchery.database, Hatchery.ROWS_PER_TRANSACTION, ESTUARY);
        hatchery.readAllButPh(T0);
        hatchery.read("ca-1", 9.6, T0);
        hatchery.read("ph-1", 7.9, T0);
        WaterState state = hatchery.newestState();

        StateWishes wishes = new StateWishes(hatchery.database, ESTUARY);
        CalculatedWater again = new WaterCalculator().calculate(wishes.of(state), true);

        WaterNumbers stored = state.numbers();
        assertThat(again.state().omegaAragonite()).isCloseTo(stored.omegaAragonite(), within(1e-12));
        assertThat(again.state().dic() * 1e6).isCloseTo(stored.dicUmolKg(), within(1e-8));
        assertThat(again.uncertainty().omegaAragonite().total())
                .isCloseTo(stored.omegaAragoniteUncertainty(), within(1e-12));
        assertThat(wishes.orphans(state)).isEmpty();
    }

    @Test
    void says_what_it_knows_of_a_state_that_lacks_an_input() {
        hatchery.read("ph-1", 7.9, T0);
        WaterState state = hatchery.newestState();

        WaterWish wish = new StateWishes(hatchery.database, ESTUARY).of(state);

        assertThat(wish.ph()).isEqualTo(7.9);
        assertThat(wish.phScale()).isEqualTo("total");
        assertThat(wish.uncertainty().ph()).isPositive();
        assertThat(wish.totalAlkalinityUmolKg()).isNull();
        assertThat(wish.constants()).isEqualTo("millero2006");
    }
}
