package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import org.hingeline.measure.Quantity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class LateReadingsTest {
    private static final int MANY = 1200;

    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void states_after_a_late_reading_are_computed_again_at_once_when_they_are_few() {
        hatchery.readAllButPh(T0);
        hatchery.clock.set(T0.plusSeconds(600));
        for (int minute = 1; minute <= 10; minute++) {
            hatchery.read("t-1", 22, T0.plusSeconds(60L * minute));
        }
        assertThat(hatchery.newestState().numbers()).isNull();

        hatchery.read("ph-1", 7.9, T0.plusSeconds(120));

        assertThat(hatchery.states())
                .allSatisfy(state -> assertThat(state.numbers() != null)
                        .isEqualTo(!state.at().isBefore(T0.plusSeconds(120))));
        assertThat(span()).isEmpty();
    }

    @Test
    void a_late_reading_changes_nothing_beyond_the_next_one_of_its_quantity() {
        hatchery.clock.set(T0.plus(Duration.ofDays(1)));
        hatchery.readAllButPh(T0);
        hatchery.take(row(0, "ph-1", 7.9, T0.plusSeconds(60)), row(1, "t-1", 22, T0.plusSeconds(90)));

        hatchery.read("ph-1", 7.5, T0.plusSeconds(30));

        assertThat(hatchery.states().stream().map(this::ph).toList())
                .containsExactly(Optional.empty(), Optional.of(7.5), Optional.of(7.9), Optional.of(7.9));
    }

    @Test
    void many_states_are_computed_again_step_by_step_also_when_the_service_ends_in_the_middle() {
        postTemperaturesOfManyMinutes();

        hatchery.readAllButPh(T0);
        assertThat(hatchery.states().stream().filter(state -> knows(state, Quantity.SALINITY)))
                .hasSizeLessThan(MANY / 2);
        assertThat(span()).isPresent();

        assertThat(hatchery.housekeeping.workOffLateReadings()).isTrue();
        Instant reached = span().orElseThrow().after();
        assertThat(reached).isAfter(T0.plusSeconds(300 * 60)).isBefore(T0.plusSeconds(MANY * 60));
        hatchery.restart();
        int steps = 0;
        while (hatchery.housekeeping.workOffLateReadings()) {
            assertThat(++steps).isLessThan(20);
        }

        assertThat(span()).isEmpty();
        assertThat(hatchery.states()).hasSize(MANY + 1).allSatisfy(state -> {
            boolean salinityIsYoung = !state.at().isAfter(T0.plus(Duration.ofHours(6)));
            assertThat(knows(state, Quantity.SALINITY)).isEqualTo(salinityIsYoung);
            assertThat(knows(state, Quantity.TOTAL_ALKALINITY)).isTrue();
        });
        assertThat(hatchery.housekeeping.workOffLateReadings()).isFalse();
    }

    @Test
    void the_newest_state_does_not_wait_for_the_many_before_it() {
        postTemperaturesOfManyMinutes();

        hatchery.read("ta-1", 2078, T0);

        assertThat(span()).isPresent();
        assertThat(knows(hatchery.newestState(), Quantity.TOTAL_ALKALINITY)).isTrue();
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void readings_in_any_order_and_any_batches_give_the_states_of_readings_in_order(boolean conductivity) {
        for (int seed = 1; seed <= 2; seed++) {
            Hatchery first = Hatchery.empty();
            sensors(first, conductivity);
            first.clock.set(T0.plus(Duration.ofDays(20)));
            List<IncomingReading> rows = readings(new Random(seed), conductivity);
            rows.sort(Comparator.comparing(IncomingReading::at).thenComparing(IncomingReading::index));
            for (int from = 0; from < rows.size(); from += 6) {
                first.take(rows.subList(from, Math.min(rows.size(), from + 6)).toArray(IncomingReading[]::new));
            }
            List<WaterState> inOrder = statesOf(first);

            Hatchery second = Hatchery.empty();
            sensors(second, conductivity);
            second.clock.set(T0.plus(Duration.ofDays(20)));
            Random random = new Random(100 + seed);
            Collections.shuffle(rows, random);
            for (int from = 0; from < rows.size(); ) {
                int to = Math.min(rows.size(), from + 1 + random.nextInt(40));
                second.take(rows.subList(from, to).toArray(IncomingReading[]::new));
                from = to;
            }
            while (second.housekeeping.workOffLateReadings()) {
                // until all is done
            }

            assertThat(inOrder.stream()
                            .flatMap(state -> state.inputs().stream())
                            .filter(input -> input.origin().equals("conductivity")))
                    .hasSizeGreaterThan(conductivity ? 20 : -1)
                    .hasSizeLessThan(conductivity ? 1000 : 1);
            assertThat(statesOf(second)).as("seed %s", seed).isEqualTo(inOrder);
        }
    }

    private static void sensors(Hatchery hatchery, boolean conductivity) {
        if (conductivity) {
            hatchery.sensor("c-1", Quantity.CONDUCTIVITY, 0.1);
            hatchery.sensor("c-2", Quantity.CONDUCTIVITY, 0.05);
        }
        hatchery.sensor("ph-2", Quantity.PH, 0.02);
        hatchery.sensor("t-2", Quantity.TEMPERATURE, 0.05);
    }

    /** Some hundred readings of eleven days, dense and with gaps, some of one moment, some not usable. */
    private static List<IncomingReading> readings(Random random, boolean conductivity) {
        List<IncomingReading> rows = new ArrayList<>();
        Set<String> taken = new HashSet<>();
        String[] sensors = conductivity
                ? new String[] {"ph-1", "c-1", "ph-2", "t-1", "t-2", "s-1", "ta-1", "c-2"}
                : new String[] {"ph-1", "ph-1", "ph-2", "t-1", "t-2", "s-1", "ta-1", "o2-1"};
        double[] base = {7.9, conductivity ? 43 : 7.9, 7.8, 22, 21.5, 30, 2078, conductivity ? 44 : 7};
        for (int i = 0; i < 420; i++) {
            int which = random.nextInt(sensors.length);
            Instant spell = T0.plus(Duration.ofHours(37L * random.nextInt(8)));
            Instant at = spell.plus(Duration.ofMinutes(5L * random.nextInt(60)));
            double value = random.nextInt(15) == 0 ? 9999 : base[which] * (1 + 0.02 * random.nextDouble());
            if (conductivity && which == 5 && i % 4 != 0) {
                continue; // salinity seldom, so that conductivity has to stand in
            }
            if (taken.add(sensors[which] + at)) {
                rows.add(row(i, sensors[which], value, at));
            }
        }
        assertThat(rows).hasSizeGreaterThan(300);
        return rows;
    }

    private static List<WaterState> statesOf(Hatchery hatchery) {
        long tank = hatchery.tank().id();
        return hatchery.states().stream()
                .map(s -> {
                    assertThat(s.pointId()).isEqualTo(tank);
                    return new WaterState(0, s.at(), s.inputs(), s.missing(), s.numbers(), s.cautions());
                })
                .toList();
    }

    private void postTemperaturesOfManyMinutes() {
        hatchery.clock.set(T0.plus(Duration.ofDays(1)));
        List<IncomingReading> rows = new ArrayList<>();
        for (int minute = 1; minute <= MANY; minute++) {
            rows.add(row(minute, "t-1", 22, T0.plusSeconds(60L * minute)));
        }
        hatchery.take(rows.toArray(IncomingReading[]::new));
    }

    private Optional<WaterBook.Span> span() {
        return hatchery.database.read(books -> books.water().nextSpan());
    }

    private Optional<Double> ph(WaterState state) {
        return state.inputs().stream()
                .filter(input -> input.quantity() == Quantity.PH)
                .findFirst()
                .map(WaterState.InputUsed::value);
    }

    private static boolean knows(WaterState state, Quantity quantity) {
        return state.inputs().stream().anyMatch(input -> input.quantity() == quantity);
    }
}
