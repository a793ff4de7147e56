package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;

/** Independent published fits of the same constants stand against each other where both hold. */
class FitsAgreeValidationTest {
    @Test
    void waters_2014_stays_within_a_few_thousandths_of_millero_2006() {
        for (double s = 1; s <= 50; s++) {
            for (double t = 273.15; t <= 323.15; t += 5) {
                String as = "salinity " + s + ", " + t + " K";
                assertThat(Waters2014.pK1(t, s)).as(as).isCloseTo(Millero2006.pK1(t, s), within(0.0031));
                assertThat(Waters2014.pK2(t, s)).as(as).isCloseTo(Millero2006.pK2(t, s), within(0.0031));
            }
        }
    }

    @Test
    void the_three_fits_agree_on_ocean_water_within_their_stated_uncertainty() {
        for (double s = 25; s <= 38; s += 1) {
            for (double t = 8; t <= 30; t += 2) {
                double lueker = pco2(t, s, CarbonicAcidFit.LUEKER_2000);
                // 0.0075 in pK1 and 0.015 in pK2 (Orr et al. 2018), twice, come to about 6 % of pCO2
                assertThat(pco2(t, s, CarbonicAcidFit.MILLERO_2006) / lueker).isCloseTo(1, within(0.06));
                assertThat(pco2(t, s, CarbonicAcidFit.WATERS_2014) / lueker).isCloseTo(1, within(0.06));
            }
        }
    }

    @Test
    void aragonite_is_always_more_soluble_than_calcite() {
        Grid.forEach(0, 0, (conditions, pair) -> {
            SeawaterConstants k = SeawaterConstants.of(conditions);
            assertThat(k.kspAragonite).isGreaterThan(k.kspCalcite);
        });
    }

    private static double pco2(double t, double s, CarbonicAcidFit fit) {
        return CarbonateSystem.solve(
                        Conditions.of(t, s).with(fit, BoronRatio.LEE_2010), new PhAndAlkalinity(8.0, 2200e-6))
                .orElseThrow()
                .pco2Atm();
    }
}
