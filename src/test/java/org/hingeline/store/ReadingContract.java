package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;
import static org.hingeline.store.Samples.reading;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.hatchery.Sensor;
import org.hingeline.monitor.ReadingBook.RefusedRow;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.quality.Flag;
import org.junit.jupiter.api.Test;

interface ReadingContract extends StoreUnderTest {

    @Test
    default void readings_come_back_with_value_and_flag_oldest_first() {
        Sensor ph = Samples.place(store(), "north").ph();
        List<StoredReading> readings = new ArrayList<>();
        for (Flag flag : Flag.values()) {
            readings.add(new StoredReading(ph.id(), T0.plusSeconds(readings.size()), 7.7 + flag.code(), flag));
        }
        List<StoredReading> shuffled =
                List.of(readings.get(3), readings.get(0), readings.get(4), readings.get(2), readings.get(1));

        insert(shuffled);

        assertThat(between(ph, T0, T0.plusSeconds(9))).containsExactlyElementsOf(readings);
    }

    @Test
    default void a_value_comes_back_to_the_last_bit() {
        Sensor ph = Samples.place(store(), "north").ph();
        List<Double> values = List.of(0.1 + 0.2, -7.71, Double.MIN_VALUE, Double.MAX_VALUE, 1e-300, 7.71);
        for (int i = 0; i < values.size(); i++) {
            insert(List.of(reading(ph, T0.plusSeconds(i), values.get(i))));
        }

        assertThat(between(ph, T0, T0.plusSeconds(9)))
                .extracting(StoredReading::value)
                .containsExactlyElementsOf(values);
    }

    @Test
    default void between_takes_both_ends_in() {
        Sensor ph = Samples.place(store(), "north").ph();
        Sensor other = Samples.place(store(), "south").ph();
        insert(List.of(reading(other, T0, 1)));
        insertEverySecond(ph, 4);

        assertThat(between(ph, T0.plusSeconds(1), T0.plusSeconds(2)))
                .extracting(StoredReading::at)
                .containsExactly(T0.plusSeconds(1), T0.plusSeconds(2));
        assertThat(between(
                        ph, T0.plusSeconds(1).plusMillis(1), T0.plusSeconds(2).minusMillis(1)))
                .isEmpty();
        assertThat(between(other, T0, T0.plusSeconds(9))).containsExactly(reading(other, T0, 1));
    }

    @Test
    default void newest_before_takes_the_start_in_and_leaves_the_end_out() {
        Sensor ph = Samples.place(store(), "north").ph();
        insertEverySecond(ph, 3);

        assertThat(newestBefore(ph, T0, T0.plusSeconds(2))).isEqualTo(T0.plusSeconds(1));
        assertThat(newestBefore(ph, T0, T0.plusSeconds(2).plusMillis(1))).isEqualTo(T0.plusSeconds(2));
        assertThat(newestBefore(ph, T0.plusSeconds(1), T0.plusSeconds(2))).isEqualTo(T0.plusSeconds(1));
        assertThat(newestBefore(ph, T0.plusSeconds(1).plusMillis(1), T0.plusSeconds(2)))
                .isNull();
        assertThat(newestBefore(ph, T0.minusSeconds(9), T0)).isNull();
    }

    @Test
    default void first_after_leaves_the_start_out_takes_the_end_in_and_passes_over_failed_values() {
        Sensor ph = Samples.place(store(), "north").ph();
        insert(List.of(
                reading(ph, T0, 7),
                new StoredReading(ph.id(), T0.plusSeconds(1), 7, Flag.FAIL),
                reading(ph, T0.plusSeconds(2), 7),
                reading(ph, T0.plusSeconds(3), 7)));

        assertThat(seen().readings().firstAfter(ph.id(), T0, T0.plusSeconds(2))).contains(T0.plusSeconds(2));
        assertThat(seen().readings().firstAfter(ph.id(), T0.minusMillis(1), T0.plusSeconds(3)))
                .contains(T0);
        assertThat(seen().readings().firstAfter(ph.id(), T0, T0.plusSeconds(1))).isEmpty();
    }

    @Test
    default void newest_before_passes_over_failed_and_missing_values_only() {
        Sensor ph = Samples.place(store(), "north").ph();
        List<Flag> flags = List.of(Flag.NOT_EVALUATED, Flag.FAIL, Flag.SUSPECT, Flag.MISSING, Flag.PASS);
        for (int i = 0; i < flags.size(); i++) {
            insert(List.of(new StoredReading(ph.id(), T0.plusSeconds(i), 7, flags.get(i))));
        }

        assertThat(newestBefore(ph, T0, T0.plusSeconds(2))).isEqualTo(T0);
        assertThat(newestBefore(ph, T0, T0.plusSeconds(4))).isEqualTo(T0.plusSeconds(2));
        assertThat(newestBefore(ph, T0, T0.plusSeconds(5))).isEqualTo(T0.plusSeconds(4));
    }

    @Test
    default void the_newest_time_of_a_point_is_that_of_any_of_its_sensors() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");
        Sensor second = Samples.phSensor(store(), north.tank(), "ph-2");
        assertThat(newestAt(north)).isNull();

        insert(List.of(reading(north.ph(), T0.plusSeconds(5), 7)));
        insert(List.of(reading(second, T0.plusSeconds(7), 7)));
        insert(List.of(reading(south.ph(), T0.plusSeconds(9), 7)));

        assertThat(newestAt(north)).isEqualTo(T0.plusSeconds(7));
    }

    @Test
    default void one_sensor_has_one_reading_at_a_time_and_a_batch_with_a_second_leaves_nothing() {
        Samples.Place north = Samples.place(store(), "north");
        Sensor second = Samples.phSensor(store(), north.tank(), "ph-2");
        insert(List.of(reading(north.ph(), T0, 7.7)));

        assertThatThrownBy(() ->
                        insert(List.of(reading(north.ph(), T0.minusSeconds(1), 7.6), reading(north.ph(), T0, 7.7))))
                .isInstanceOf(RuntimeException.class);
        insert(List.of(reading(second, T0, 7.8)));

        assertThat(between(north.ph(), T0.minusSeconds(9), T0)).containsExactly(reading(north.ph(), T0, 7.7));
        assertThat(between(second, T0, T0)).containsExactly(reading(second, T0, 7.8));
    }

    @Test
    default void no_reading_is_stored_for_a_sensor_that_does_not_exist() {
        assertThatThrownBy(() -> insert(List.of(new StoredReading(4711, T0, 7, Flag.PASS))))
                .isInstanceOf(RuntimeException.class);
    }

    @Test
    default void refused_rows_are_kept_for_their_site_newest_first() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");
        RefusedRow older = refused(north, T0, 0);
        RefusedRow first = refused(north, T0.plusSeconds(1), 0);
        RefusedRow second = refused(north, T0.plusSeconds(1), 7);
        RefusedRow elsewhere = refused(south, T0.plusSeconds(2), 1);

        store().writeOnly(books -> {
            books.readings().insertRefused(List.of());
            books.readings().insertRefused(List.of(first, second, elsewhere));
            books.readings().insertRefused(List.of(older));
        });

        assertThat(seen().readings().refused(north.site().id(), 10)).containsExactly(second, first, older);
        assertThat(seen().readings().refused(north.site().id(), 2)).containsExactly(second, first);
        assertThat(seen().readings().refused(south.site().id(), 10)).containsExactly(elsewhere);
    }

    @Test
    default void an_overlong_refused_row_is_kept_shortened() {
        Samples.Place north = Samples.place(store(), "north");

        done().readings()
                .insertRefused(
                        List.of(new RefusedRow(north.site().id(), "shed", T0, 0, "x".repeat(5000), "y".repeat(5000))));

        RefusedRow kept = seen().readings().refused(north.site().id(), 1).get(0);
        assertThat(kept.row()).hasSize(2000).startsWith("xxx").endsWith("\u2026");
        assertThat(kept.detail()).hasSize(1000).startsWith("yyy").endsWith("\u2026");
    }

    private void insert(List<StoredReading> readings) {
        done().readings().insert(readings, 1, T0);
    }

    private void insertEverySecond(Sensor sensor, int count) {
        List<StoredReading> readings = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            readings.add(reading(sensor, T0.plusSeconds(i), 7 + i / 10.0));
        }
        insert(readings);
    }

    private List<StoredReading> between(Sensor sensor, Instant from, Instant to) {
        return seen().readings().between(sensor.id(), from, to);
    }

    private Instant newestBefore(Sensor sensor, Instant from, Instant before) {
        return seen().readings()
                .newestBefore(sensor.id(), from, before)
                .map(StoredReading::at)
                .orElse(null);
    }

    private Instant newestAt(Samples.Place place) {
        return seen().readings().newestAt(place.tank().id()).orElse(null);
    }

    private static RefusedRow refused(Samples.Place place, Instant at, int index) {
        return new RefusedRow(place.site().id(), "shed", at, index, "{\"row\":" + index + "}", "no such sensor");
    }
}
