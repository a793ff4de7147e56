package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.quality.Flag;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.Uncertainty;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** Salinity from conductivity where none was read, or not lately. */
class ConductivityStateTest {
    private static final double CONDUCTIVITY = conductivity(30, 22);

    private final Hatchery hatchery = Hatchery.empty();

    @BeforeEach
    void aConductivitySensorStandsInTheTank() {
        hatchery.sensor("c-1", Quantity.CONDUCTIVITY, 0.2);
        hatchery.clock.set(T0.plus(Duration.ofDays(1)));
    }

    @Test
    void a_point_without_salinity_takes_it_from_conductivity_and_says_so() {
        readAllWithConductivity(T0);

        WaterState state = hatchery.newestState();

        assertThat(state.missing()).isEmpty();
        InputUsed salinity = state.inputs().get(2);
        assertThat(salinity.quantity()).isEqualTo(Quantity.SALINITY);
        assertThat(salinity.value()).isCloseTo(30, within(1e-9));
        assertThat(salinity.at()).isEqualTo(T0);
        assertThat(salinity.origin()).isEqualTo("conductivity");
        assertThat(salinity.sensor()).isEqualTo("c-1");
        assertThat(salinity.source()).isEqualTo("conductivity sensor c-1");
        assertThat(salinity.flag()).isEqualTo(Flag.PASS);
        assertThat(state.cautions()).isEmpty();
        assertThat(state.numbers().omegaAragonite())
                .isCloseTo(solved(22, salinity.value()).omegaAragonite(), within(1e-12));
    }

    @Test
    void a_fresh_salinity_that_was_read_is_used_as_before() {
        hatchery.readAllButPh(T0);
        hatchery.read("ph-1", 7.9, T0);
        WaterState before = hatchery.newestState();

        hatchery.read("c-1", 20, T0);

        assertThat(hatchery.newestState()).isEqualTo(before);
        assertThat(before.inputs().get(2).origin()).isEqualTo("sensor");
    }

    @Test
    void a_salinity_past_its_age_limit_gives_way_to_conductivity() {
        hatchery.readAllButPh(T0);
        Instant later = T0.plus(Hatchery.AGE_LIMITS.of(Quantity.SALINITY)).plusMillis(1);
        readAllWithConductivity(later);

        assertThat(hatchery.newestState().inputs().get(2).at()).isEqualTo(later);
        assertThat(hatchery.newestState().inputs().get(2).origin()).isEqualTo("conductivity");
    }

    @Test
    void a_conductivity_goes_with_the_temperature_of_its_own_time() {
        Instant warmer = T0.plus(Duration.ofHours(3));
        hatchery.take(row(0, "t-1", 22, T0), row(1, "c-1", CONDUCTIVITY, T0.plusSeconds(30)));
        hatchery.take(row(0, "t-1", 26, warmer), row(1, "ta-1", 2078, warmer), row(2, "ph-1", 7.9, warmer));

        WaterState state = hatchery.newestState();

        assertThat(state.inputs().get(1).value()).isEqualTo(26);
        assertThat(state.inputs().get(2).value()).isCloseTo(30, within(1e-9));
        assertThat(state.inputs().get(2).age(state.at()))
                .isEqualTo(Duration.ofHours(3).minusSeconds(30));
    }

    @Test
    void a_conductivity_is_used_up_to_the_age_limit_of_salinity() {
        Duration allowed = Hatchery.AGE_LIMITS.of(Quantity.SALINITY);
        hatchery.take(row(0, "t-1", 22, T0), row(1, "c-1", CONDUCTIVITY, T0));
        hatchery.read("ph-1", 7.9, T0.plus(allowed));
        assertThat(hatchery.newestState().missing())
                .extracting(MissingInput::quantity)
                .doesNotContain(Quantity.SALINITY);

        hatchery.read("ph-1", 7.9, T0.plus(allowed).plusMillis(1));
        assertThat(hatchery.newestState().missing()).contains(new MissingInput(Quantity.SALINITY, T0, allowed));
    }

    @Test
    void a_conductivity_without_a_temperature_gives_no_salinity_and_the_state_says_why() {
        Instant later = T0.plus(Duration.ofMinutes(61));
        hatchery.read("t-1", 22, T0);
        hatchery.read("c-1", CONDUCTIVITY, later);

        WaterState state = hatchery.newestState();

        assertThat(state.missing()).extracting(MissingInput::quantity).contains(Quantity.SALINITY);
        assertThat(state.cautions()).extracting(Note::code).containsExactly("conductivity-without-temperature");
        assertThat(state.cautions().get(0).detail()).contains("60 min").contains(later.toString());
    }

    @Test
    void a_conductivity_that_no_salinity_has_is_refused_in_words_and_no_number_flows_on() {
        hatchery.take(row(0, "t-1", 5, T0), row(1, "c-1", 79, T0), row(2, "ta-1", 2078, T0), row(3, "ph-1", 7.9, T0));

        WaterState state = hatchery.newestState();

        assertThat(state.numbers()).isNull();
        assertThat(state.missing()).extracting(MissingInput::quantity).containsExactly(Quantity.SALINITY);
        assertThat(state.cautions()).singleElement().satisfies(note -> {
            assertThat(note.code()).isEqualTo("salinity-not-covered");
            assertThat(note.detail()).contains("79.0 mS/cm");
        });
    }

    @Test
    void a_conductivity_outside_the_scale_computes_with_a_caution() {
        hatchery.take(
                row(0, "t-1", 22, T0),
                row(1, "c-1", conductivity(44, 22), T0),
                row(2, "ta-1", 2078, T0),
                row(3, "ph-1", 7.9, T0));

        assertThat(hatchery.newestState().numbers()).isNotNull();
        assertThat(hatchery.newestState().cautions())
                .extracting(Note::detail)
                .anyMatch(detail -> detail.contains("Practical Salinity Scale 1978"));
    }

    @Test
    void the_uncertainty_of_both_measurements_goes_into_that_of_omega() {
        readAllWithConductivity(T0);

        WaterNumbers numbers = hatchery.newestState().numbers();

        // registered: 0.2 mS/cm and 0.1 °C
        double expected = Uncertainty.of(
                        solved(22, 30),
                        InputUncertainty.ofPhAndAlkalinity(0.02, 10e-6, 0.1, 0)
                                .withSalinityFrom(0.2, ConductivitySalinity.slopes(CONDUCTIVITY, 22)))
                .omegaAragonite()
                .fromInputs();
        assertThat(numbers.omegaAragoniteFromInputs()).isCloseTo(expected, within(1e-8));
    }

    @Test
    void a_suspect_temperature_makes_the_salinity_suspect() {
        long temperature = hatchery.place.sensors(hatchery.site).stream()
                .filter(sensor -> sensor.code().equals("t-1"))
                .findFirst()
                .orElseThrow()
                .id();
        hatchery.database.writeOnly(books -> books.readings()
                .insert(
                        List.of(new ReadingBook.StoredReading(temperature, T0, 22, Flag.SUSPECT)),
                        hatchery.gateway.id(),
                        T0));
        hatchery.read("c-1", CONDUCTIVITY, T0);

        assertThat(hatchery.newestState().inputs())
                .filteredOn(input -> input.quantity() == Quantity.SALINITY)
                .singleElement()
                .extracting(InputUsed::flag)
                .isEqualTo(Flag.SUSPECT);
    }

    @Test
    void a_late_conductivity_computes_the_states_after_it_again() {
        hatchery.take(row(0, "t-1", 22, T0), row(1, "ta-1", 2078, T0), row(2, "ph-1", 7.9, T0.plusSeconds(300)));
        assertThat(hatchery.newestState().numbers()).isNull();

        hatchery.read("c-1", CONDUCTIVITY, T0.plusSeconds(10));

        assertThat(hatchery.newestState().at()).isEqualTo(T0.plusSeconds(300));
        assertThat(hatchery.newestState().numbers().salinity()).isCloseTo(30, within(1e-9));
    }

    @Test
    void a_late_temperature_reaches_as_far_as_the_conductivity_it_belongs_to() {
        Instant hoursLater = T0.plus(Duration.ofHours(4));
        hatchery.read("c-1", CONDUCTIVITY, T0.plusSeconds(60));
        hatchery.take(row(0, "t-1", 25, hoursLater), row(1, "ta-1", 2078, hoursLater), row(2, "ph-1", 7.9, hoursLater));
        assertThat(hatchery.newestState().numbers()).isNull();

        hatchery.read("t-1", 22, T0);

        assertThat(hatchery.newestState().at()).isEqualTo(hoursLater);
        assertThat(hatchery.newestState().numbers().salinity()).isCloseTo(30, within(1e-9));
    }

    @Test
    void a_dose_is_planned_from_it_with_its_uncertainty() {
        hatchery.clock.set(T0);
        readAllWithConductivity(T0);
        DoseWaters.Water water = new DoseWaters(hatchery.database, Hatchery.WATER)
                .of(hatchery.board.point(hatchery.site, "tank").orElseThrow());

        assertThat(water.result().orElseThrow().conditions().salinity()).isCloseTo(30, within(1e-9));
        assertThat(water.uncertainty().salinity()).isBetween(0.13, 0.2);
        assertThat(water.notes()).isEmpty();
    }

    private void readAllWithConductivity(Instant at) {
        hatchery.take(
                row(0, "t-1", 22, at),
                row(1, "c-1", CONDUCTIVITY, at),
                row(2, "ta-1", 2078, at),
                row(3, "ph-1", 7.9, at));
    }

    private static double conductivity(double salinity, double temperatureC) {
        return ConductivitySalinity.conductivity(salinity, temperatureC).orElseThrow();
    }

    private static CarbonateState solved(double temperatureC, double salinity) {
        return CarbonateSystem.solve(Conditions.of(temperatureC, salinity), new KnownPair.PhAndAlkalinity(7.9, 2078e-6))
                .orElseThrow();
    }
}
