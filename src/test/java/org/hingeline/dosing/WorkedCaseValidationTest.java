package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateState;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

/** Against the worked case that was computed elsewhere. */
class WorkedCaseValidationTest {
    private final DoseRequest toThree = Waters.towards(new Target.OmegaAragonite(3.0));
    private final DosedWater water = new DosedWater(Waters.worked(), toThree);

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/dosing.csv", useHeadersInDisplayName = true)
    void agrees_with_the_worked_dose(
            String agent, double addedAlkalinity, String quantity, double value, double tolerance) {
        CarbonateState after = agent.equals("aeration")
                ? water.aeratedWith(0)
                : watered(Agent.ofCode(agent).orElseThrow()).with(addedAlkalinity * 1e-6);
        double actual = switch (quantity) {
            case "phTotal" -> after.phTotal();
            case "dic" -> after.dic() * 1e6;
            case "pco2" -> after.pco2Atm() * 1e6;
            case "omegaAragonite" -> after.omegaAragonite();
            default -> throw new IllegalArgumentException("no such quantity: " + quantity);
        };
        assertThat(actual).as(quantity).isCloseTo(value, within(tolerance));
    }

    private static DosedWater watered(Agent agent) {
        return new DosedWater(Waters.worked(), Waters.towards(new Target.OmegaAragonite(3.0), agent));
    }

    @ParameterizedTest
    @CsvSource({"sodium-carbonate, 312.3, 0.05", "sodium-bicarbonate, 4143, 0.5", "sodium-hydroxide, 163.6, 0.05"})
    void omega_three_takes_as_much_as_was_worked_out(String agent, double umolKg, double tolerance) {
        double added = DoseSearch.alkalinityFor(
                        watered(Agent.ofCode(agent).orElseThrow()), new Target.OmegaAragonite(3.0), 3.0)
                .orElseThrow();
        assertThat(added * 1e6).isCloseTo(umolKg, within(tolerance));
    }

    @ParameterizedTest
    @CsvSource({"sodium-carbonate, 5.4", "sodium-bicarbonate, 8.6", "sodium-hydroxide, 4.1", "calcium-hydroxide, 3.8"})
    void grams_for_a_hundred_umol_kg_in_a_cubic_metre(String agent, double grams) {
        DoseRequest cubicMetre = Waters.withVolumeL(
                Waters.towards(
                        new Target.OmegaAragonite(3.0), Agent.ofCode(agent).orElseThrow()),
                1000);
        assertThat(new DosedWater(Waters.worked(), cubicMetre).massOf(0, 100e-6))
                .isCloseTo(grams, within(0.05));
    }

    @Test
    void the_plan_for_omega_three_weighs_that_and_lands_there() {
        DosePlan plan = DosePlanner.plan(toThree);
        assertThat(plan.outcome()).isEqualTo(Outcome.PLAN);
        // 312.3 µmol/kg of 4000 L at 1.020425 kg/L, half as many mol of 105.99 g/mol; the balance shows 0.1 g
        assertThat(plan.massG().value()).isCloseTo(312.3e-6 * 4000 * 1.020425 / 2 * 105.99, within(0.05 + 0.011));
        assertThat(plan.after().phTotal()).isCloseTo(8.050, within(0.001));
        assertThat(plan.after().pco2Atm() * 1e6).isCloseTo(430, within(1.0));
        assertThat(plan.after().omegaAragonite()).isCloseTo(3.0, within(0.003));
    }

    @Test
    void aeration_alone_is_offered_first_with_what_it_reaches() {
        DosePlan plan = DosePlanner.plan(toThree);
        assertThat(plan.remedies()).singleElement().satisfies(remedy -> {
            assertThat(remedy.code()).isEqualTo("aerate");
            assertThat(remedy.reaches().phTotal()).isCloseTo(8.006, within(0.0005));
            assertThat(remedy.reaches().omegaAragonite()).isCloseTo(2.388, within(0.0005));
            assertThat(remedy.reachesTarget()).isFalse();
            assertThat(remedy.detail()).contains("2.39").contains("420 µatm");
        });
        assertThat(DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(2.3)))
                        .remedies())
                .singleElement()
                .satisfies(remedy -> assertThat(remedy.reachesTarget()).isTrue());
    }
}
