package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.stream.Stream;
import org.hingeline.dosing.DosePlan.Outcome;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** What sets the agents apart. */
class AgentsTest {
    private static final Target OMEGA_TWO = new Target.OmegaAragonite(2.0);

    static Stream<Agent> everyAgent() {
        return Agent.all().stream();
    }

    /** Atoms counted by hand: Na2CO3, NaHCO3, NaOH, Ca(OH)2. */
    @ParameterizedTest
    @CsvSource({
        "sodium-carbonate, 105.99, 2, 1, 0",
        "sodium-bicarbonate, 84.01, 1, 1, 0",
        "sodium-hydroxide, 40.00, 1, 0, 0",
        "calcium-hydroxide, 74.09, 2, 0, 1"
    })
    void mass_balance_closes_to_a_billionth(String code, double gramsPerMol, double ta, double dic, double calcium) {
        Target target = code.equals("sodium-bicarbonate") ? new Target.OmegaAragonite(1.45) : OMEGA_TWO;
        DosePlan plan =
                DosePlanner.plan(Waters.towards(target, Agent.ofCode(code).orElseThrow()));
        assertThat(plan.outcome()).as("%s", plan.reasons()).isEqualTo(Outcome.PLAN);
        CarbonateState before = plan.before();
        double mol = plan.massG().value() / gramsPerMol / (4000 / 1000.0 * before.densityKgM3());
        Conditions limed = Conditions.of(22, 30).withCalcium(0.02128 / 40.087 * 30 / 1.80655 + calcium * mol);
        CarbonateState expected = CarbonateSystem.solve(
                        limed, new AlkalinityAndDic(before.totalAlkalinity() + ta * mol, before.dic() + dic * mol))
                .orElseThrow();
        assertThat(plan.after().totalAlkalinity()).isCloseTo(expected.totalAlkalinity(), within(1e-9 * ta * mol));
        assertThat(plan.after().dic()).isCloseTo(expected.dic(), within(1e-9 * mol));
        assertThat(plan.after().omegaAragonite()).isCloseTo(expected.omegaAragonite(), within(1e-9));
        assertThat(plan.after().phTotal()).isCloseTo(expected.phTotal(), within(1e-9));
    }

    @Test
    void calcium_from_lime_counts_in_omega() {
        DosePlan lime = DosePlanner.plan(Waters.towards(OMEGA_TWO, Agent.CALCIUM_HYDROXIDE));
        CarbonateState withoutItsCalcium = CarbonateSystem.solve(
                        Conditions.of(22, 30),
                        new AlkalinityAndDic(
                                lime.after().totalAlkalinity(), lime.after().dic()))
                .orElseThrow();
        double added = (lime.after().totalAlkalinity() - lime.before().totalAlkalinity()) / 2;
        assertThat(lime.after().omegaAragonite() / withoutItsCalcium.omegaAragonite())
                .isCloseTo(1 + added / lime.before().calcium(), within(1e-9));
        assertThat(lime.afterAeration().calcium()).isEqualTo(lime.after().calcium());
    }

    @Test
    void calcium_from_lime_is_added_to_a_measured_calcium() {
        var water = CarbonateSystem.solve(
                Conditions.of(22, 30).withCalcium(9.5e-3),
                new PhAndAlkalinity(Waters.worked().phTotal(), 2078e-6));
        DosePlan lime = DosePlanner.plan(Waters.towards(OMEGA_TWO, Agent.CALCIUM_HYDROXIDE)
                .but()
                .water(water)
                .build());
        double added = (lime.after().totalAlkalinity() - lime.before().totalAlkalinity()) / 2;
        assertThat(lime.after().calcium()).isCloseTo(9.5e-3 + added, within(1e-15));
    }

    @Test
    void bicarbonate_that_cannot_reach_is_refused_with_what_it_would_take_and_why() {
        DosePlan plan = DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(3.0), Agent.SODIUM_BICARBONATE));
        assertThat(plan.outcome()).isEqualTo(Outcome.REFUSED);
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("agent-cannot-reach");
            assertThat(r.detail())
                    .contains("lowers pH", "4143 µmol/kg of alkalinity", "1.42 kg", "pH 7.57", "3871 µatm")
                    .contains("once aerated");
            assertThat(r.lift()).contains("Aerate first", "sodium carbonate");
        });
        assertThat(plan.remedies()).extracting(Remedy::code).containsExactly("aerate");
    }

    @Test
    void bicarbonate_cannot_raise_ph_at_all() {
        DosePlan plan = DosePlanner.plan(Waters.towards(new Target.PhTotal(7.9), Agent.SODIUM_BICARBONATE));
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("agent-cannot-reach");
            assertThat(r.detail()).contains("it lowers pH", "20000 µmol/kg");
        });
    }

    @Test
    void bicarbonate_is_planned_where_it_works_with_a_word_on_the_co2_it_brings() {
        DosePlan plan = DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(1.45), Agent.SODIUM_BICARBONATE));
        assertThat(plan.outcome()).isEqualTo(Outcome.PLAN);
        assertThat(plan.after().phTotal()).isLessThan(plan.before().phTotal());
        assertThat(plan.after().omegaAragonite()).isCloseTo(1.45, within(0.001));
        assertThat(plan.cautions()).extracting(Caution::code).contains("co2-rises");
        assertThat(DosePlanner.plan(Waters.towards(OMEGA_TWO)).cautions())
                .extracting(Caution::code)
                .doesNotContain("co2-rises");
    }

    @Test
    void caustic_comes_with_its_hazards_what_to_wear_and_the_heat_it_makes() {
        DoseRequest request = Waters.towards(OMEGA_TWO, Agent.SODIUM_HYDROXIDE)
                .but()
                .stock(new Stock(100, null))
                .build();
        DosePlan plan = DosePlanner.plan(request);
        assertThat(plan.cautions())
                .extracting(Caution::code)
                .contains("hazard-H290", "hazard-H314", "protection", "corrosive", "permit", "heat-of-solution");
        // 100 g/L is 2.5 mol/L, 44.5 kJ/mol, 4.18 kJ per litre and degree
        assertThat(caution(plan, "heat-of-solution")).contains("about 27 °C at 100 g/L", "never water onto it");
        assertThat(caution(plan, "protection")).contains("face shield", "gloves");
        assertThat(caution(plan, "safety-data-sheet")).contains("licensed");
    }

    @Test
    void lime_comes_with_its_hazards_and_a_word_on_its_particles() {
        DosePlan plan = DosePlanner.plan(Waters.towards(OMEGA_TWO, Agent.CALCIUM_HYDROXIDE));
        assertThat(plan.cautions())
                .extracting(Caution::code)
                .contains("hazard-H315", "hazard-H318", "hazard-H335", "corrosive", "lime-settles");
        assertThat(caution(plan, "product")).contains("quicklime");
    }

    @ParameterizedTest
    @MethodSource("everyAgent")
    void with_larvae_in_the_water_only_agents_without_the_corrosion_sign_are_planned(Agent agent) {
        DosePlan plan = DosePlanner.plan(Waters.towards(new Target.OmegaAragonite(1.4), agent)
                .but()
                .larvae(true)
                .build());
        boolean mild = List.of(Agent.SODIUM_CARBONATE, Agent.SODIUM_BICARBONATE).contains(agent);
        assertThat(plan.outcome()).isEqualTo(mild ? Outcome.PLAN : Outcome.REFUSED);
    }

    @Test
    void a_stock_of_lime_that_cannot_dissolve_is_refused_with_the_volume_that_would_do() {
        DosePlan plan = DosePlanner.plan(Waters.towards(OMEGA_TWO, Agent.CALCIUM_HYDROXIDE)
                .but()
                .stock(new Stock(5, 10.0))
                .build());
        assertThat(plan.reasons()).singleElement().satisfies(r -> {
            assertThat(r.code()).isEqualTo("stock-too-strong");
            // 0.175 g in 100 g of water at 10 °C, four fifths of it: 1.397 g/L
            assertThat(r.lift()).contains("no stronger than 1.39 g/L").containsPattern("\\d+\\.\\d L or more");
        });
        DosePlan weaker = DosePlanner.plan(Waters.towards(OMEGA_TWO, Agent.CALCIUM_HYDROXIDE)
                .but()
                .stock(new Stock(1.39, 10.0))
                .build());
        assertThat(weaker.outcome()).isEqualTo(Outcome.PLAN);
        assertThat(weaker.products().get(0).stock().litres())
                .isCloseTo(weaker.massG().value() / 1.39, within(1e-9));
    }

    private static String caution(DosePlan plan, String code) {
        return plan.cautions().stream()
                .filter(c -> c.code().equals(code))
                .map(Caution::detail)
                .findFirst()
                .orElse("no caution " + code);
    }
}
