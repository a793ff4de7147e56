package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;

/** Values this code gave when it was validated: they show a change, they prove nothing. */
class UncertaintyRegressionTest {
    @Test
    void the_first_order_shares_of_omega_are_what_they_were() {
        CarbonateState state = CarbonateSystem.solve(Conditions.of(22, 30), new PhAndAlkalinity(7.9, 2078e-6))
                .orElseThrow();
        StateUncertainty u = Uncertainty.of(state, InputUncertainty.ofPhAndAlkalinity(0.02, 17e-6, 0.1, 0.1));
        double omega = state.omegaAragonite();
        assertThat(omega).isCloseTo(1.9454208, within(1e-7));
        assertThat(u.omegaAragonite().fromConstants() / omega).isCloseTo(0.0551844, within(1e-7));
        assertThat(u.omegaAragonite().fromInputs() / omega).isCloseTo(0.0404833, within(1e-7));
        assertThat(u.omegaAragonite().total() / omega).isCloseTo(0.0684413, within(1e-7));
        assertThat(u.phTotal().total()).isCloseTo(0.02, within(1e-12));
    }
}
