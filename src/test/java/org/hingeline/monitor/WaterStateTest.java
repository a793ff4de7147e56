package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan.SensorPlan;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.quality.Flag;
import org.hingeline.seawater.PhScale;
import org.junit.jupiter.api.Test;

class WaterStateTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void every_reading_time_has_a_state_that_says_what_it_is_made_of() {
        hatchery.readAllButPh(T0);
        hatchery.clock.set(T0.plusSeconds(300));
        hatchery.read("ph-1", 7.9, T0.plusSeconds(300));

        assertThat(hatchery.states()).extracting(WaterState::at).containsExactly(T0, T0.plusSeconds(300));
        WaterState state = hatchery.newestState();
        assertThat(state.inputs())
                .containsExactly(
                        new InputUsed(Quantity.PH, 7.9, T0.plusSeconds(300), "sensor", "ph-1", Flag.PASS),
                        new InputUsed(Quantity.TEMPERATURE, 22, T0, "sensor", "t-1", Flag.PASS),
                        new InputUsed(Quantity.SALINITY, 30, T0, "sensor", "s-1", Flag.PASS),
                        new InputUsed(Quantity.TOTAL_ALKALINITY, 2078, T0, "sensor", "ta-1", Flag.PASS));
        assertThat(state.inputs().get(1).age(state.at())).isEqualTo(Duration.ofMinutes(5));
        assertThat(state.missing()).isEmpty();
        assertThat(state.numbers()).isNotNull();
        assertThat(state.numbers().phTotal()).isEqualTo(7.9);
        assertThat(state.numbers().totalAlkalinityUmolKg()).isCloseTo(2078, within(1e-9));
    }

    @Test
    void an_input_at_its_age_limit_is_used_and_one_a_millisecond_older_is_missing() {
        hatchery.clock.set(T0.plus(Duration.ofDays(1)));
        hatchery.read("ph-1", 7.9, T0);
        Instant atTheLimit = T0.plus(Duration.ofMinutes(15));
        hatchery.readAllButPh(atTheLimit);
        hatchery.read("t-1", 22, atTheLimit.plusMillis(1));

        List<WaterState> states = hatchery.states();

        assertThat(states.get(1).missing()).isEmpty();
        assertThat(states.get(1).numbers()).isNotNull();
        assertThat(states.get(2).missing()).containsExactly(new MissingInput(Quantity.PH, T0, Duration.ofMinutes(15)));
        assertThat(states.get(2).numbers()).isNull();
    }

    @Test
    void what_was_last_read_is_named_up_to_twice_its_allowed_age() {
        hatchery.clock.set(T0.plus(Duration.ofDays(1)));
        hatchery.read("ph-1", 7.9, T0);
        Instant twice = T0.plus(Duration.ofMinutes(30));
        hatchery.take(row(0, "t-1", 22, twice), row(1, "t-1", 22, twice.plusMillis(1)));

        List<WaterState> states = hatchery.states();

        assertThat(states.get(1).missing().get(0).newestAt()).isEqualTo(T0);
        assertThat(states.get(2).missing().get(0).newestAt()).isNull();
    }

    @Test
    void the_freshest_value_of_several_is_used() {
        hatchery.readAllButPh(T0);
        hatchery.clock.set(T0.plusSeconds(120));
        hatchery.take(row(0, "ph-1", 7.7, T0.plusSeconds(60)), row(1, "ph-1", 7.8, T0.plusSeconds(120)));

        assertThat(hatchery.newestState().inputs().get(0).value()).isEqualTo(7.8);
    }

    @Test
    void a_value_outside_the_range_of_its_instrument_never_enters() {
        hatchery.readAllButPh(T0);
        hatchery.read("ph-1", 7.9, T0);
        hatchery.clock.set(T0.plusSeconds(60));
        hatchery.read("ph-1", 13.2, T0.plusSeconds(60));

        WaterState state = hatchery.newestState();

        assertThat(state.at()).isEqualTo(T0.plusSeconds(60));
        assertThat(state.inputs().get(0).value()).isEqualTo(7.9);
        assertThat(state.inputs().get(0).at()).isEqualTo(T0);
    }

    @Test
    void one_suspect_input_marks_the_whole_state() {
        hatchery.readAllButPh(T0);
        long ph = sensorId("ph-1");
        hatchery.database.writeOnly(books -> books.readings()
                .insert(
                        List.of(new ReadingBook.StoredReading(ph, T0.plusSeconds(30), 7.9, Flag.SUSPECT)),
                        hatchery.gateway.id(),
                        T0));
        hatchery.clock.set(T0.plusSeconds(60));
        hatchery.read("t-1", 22, T0.plusSeconds(60));

        WaterState state = hatchery.newestState();

        assertThat(state.suspect()).isTrue();
        assertThat(state.numbers()).isNotNull();
        assertThat(state.cautions()).extracting(WaterState.Note::code).contains("suspect-input");
    }

    @Test
    void ph_is_read_on_the_scale_of_its_sensor() {
        hatchery.readAllButPh(T0);
        double total = phTotalRead(PhScale.TOTAL, 1);
        double seawater = phTotalRead(PhScale.SEAWATER, 2);
        double free = phTotalRead(PhScale.FREE, 3);
        double nbs = phTotalRead(PhScale.NBS, 4);

        assertThat(total).isEqualTo(7.9);
        // Zeebe and Wolf-Gladrow 2001, section 1.1.6: seawater about 0.01 below total, free about 0.1 above, NBS about
        // 0.12 to 0.15 above
        assertThat(seawater).isBetween(7.9 + 0.005, 7.9 + 0.02);
        assertThat(free).isBetween(7.9 - 0.13, 7.9 - 0.08);
        assertThat(nbs).isBetween(7.9 - 0.17, 7.9 - 0.09);
    }

    @Test
    void a_glass_electrode_on_nbs_buffers_is_never_taken_for_as_certain_as_it_says() {
        hatchery.readAllButPh(T0);
        phTotalRead(PhScale.TOTAL, 1);
        double onTotal = hatchery.newestState().numbers().phTotalUncertainty();
        phTotalRead(PhScale.NBS, 2);
        double onNbs = hatchery.newestState().numbers().phTotalUncertainty();

        assertThat(onTotal).isCloseTo(0.02, within(0.005));
        assertThat(onNbs).isGreaterThanOrEqualTo(0.05);
    }

    @Test
    void of_two_sensors_at_one_moment_the_more_certain_speaks() {
        hatchery.sensor("ph-2", Quantity.PH, 0.005);
        hatchery.sensor("ph-0", Quantity.PH, 0.1);
        hatchery.readAllButPh(T0);

        hatchery.take(row(0, "ph-0", 7.7, T0), row(1, "ph-1", 7.8, T0), row(2, "ph-2", 7.9, T0));

        assertThat(hatchery.newestState().inputs().get(0).sensor()).isEqualTo("ph-2");
    }

    @Test
    void of_two_equally_certain_sensors_it_is_always_the_same_whichever_came_first() {
        hatchery.sensor("ph-2", Quantity.PH, 0.02);
        hatchery.readAllButPh(T0);

        hatchery.read("ph-2", 7.7, T0);
        hatchery.read("ph-1", 7.9, T0);

        assertThat(hatchery.newestState().inputs().get(0).sensor()).isEqualTo("ph-1");
    }

    @Test
    void a_reading_of_another_quantity_makes_no_state() {
        hatchery.read("o2-1", 7.5, T0);

        assertThat(hatchery.states()).isEmpty();
    }

    @Test
    void a_water_the_methods_do_not_cover_has_a_caution_and_no_numbers() {
        hatchery.take(row(0, "t-1", 44, T0), row(1, "s-1", 30, T0), row(2, "ta-1", 5, T0), row(3, "ph-1", 11.5, T0));

        WaterState state = hatchery.newestState();

        assertThat(state.missing()).isEmpty();
        assertThat(state.numbers()).isNull();
        assertThat(state.cautions())
                .isNotEmpty()
                .allSatisfy(note -> assertThat(note.detail()).isNotBlank());
    }

    private double phTotalRead(PhScale scale, int minute) {
        Instant at = T0.plusSeconds(60L * minute);
        hatchery.place.saveSensor(
                hatchery.site, new SensorPlan("tank", "ph-1", Quantity.PH, "[pH]", scale, 0.02, null), "test");
        hatchery.clock.set(at);
        hatchery.read("ph-1", 7.9, at);
        return hatchery.newestState().numbers().phTotal();
    }

    private long sensorId(String code) {
        return hatchery.place.sensors(hatchery.site).stream()
                .filter(sensor -> sensor.code().equals(code))
                .findFirst()
                .orElseThrow()
                .id();
    }
}
