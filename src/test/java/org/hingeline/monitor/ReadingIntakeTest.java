package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.KeyBook.GatewayKey;
import org.hingeline.monitor.ReadingBook.RefusedRow;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.monitor.ReadingIntake.Answer;
import org.hingeline.monitor.ReadingIntake.Refusal;
import org.junit.jupiter.api.Test;

class ReadingIntakeTest {
    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void the_same_reading_again_is_a_duplicate_in_the_store_and_within_a_batch() {
        assertThat(hatchery.take(row(0, "t-1", 22, T0), row(1, "t-1", 22, T0))).isEqualTo(new Answer(1, 1, List.of()));
        assertThat(hatchery.take(row(0, "t-1", 22, T0))).isEqualTo(new Answer(0, 1, List.of()));

        assertThat(readings("t-1")).hasSize(1);
    }

    @Test
    void another_value_for_the_same_moment_is_refused_in_the_store_and_within_a_batch() {
        Answer first = hatchery.take(row(0, "t-1", 22, T0), row(1, "t-1", 23, T0));
        Answer second = hatchery.take(row(4, "t-1", 24, T0));

        assertThat(first.stored()).isEqualTo(1);
        assertThat(first.refused())
                .containsExactly(new Refusal(
                        1, "value 23.0 contradicts 22.0, which this sensor already reported for 2026-05-14T03:00:00Z"));
        assertThat(second.refused()).extracting(Refusal::index).containsExactly(4);
        assertThat(readings("t-1")).extracting(StoredReading::value).containsExactly(22.0);
    }

    @Test
    void a_time_is_cut_to_whole_milliseconds_so_that_the_rest_makes_no_second_reading() {
        hatchery.take(row(0, "t-1", 22, T0.plusNanos(1_999_999)));
        Answer again = hatchery.take(row(0, "t-1", 22, T0.plusNanos(1_000_001)));

        assertThat(again.duplicates()).isEqualTo(1);
        assertThat(readings("t-1")).extracting(StoredReading::at).containsExactly(T0.plusMillis(1));
    }

    @Test
    void a_batch_of_several_transactions_is_taken_as_one() {
        hatchery.start(hatchery.database, 7);
        List<IncomingReading> rows = new ArrayList<>();
        IntStream.range(0, 40).forEach(i -> rows.add(row(i, "t-1", 22, T0.minusSeconds(i))));
        rows.add(row(40, "t-1", 22, T0.minusSeconds(3)));
        rows.add(row(41, "t-1", 25, T0.minusSeconds(39)));
        rows.add(row(42, "t-9", 25, T0));

        Answer answer = hatchery.take(rows.toArray(IncomingReading[]::new));

        assertThat(answer.stored()).isEqualTo(40);
        assertThat(answer.duplicates()).isEqualTo(1);
        assertThat(answer.refused()).extracting(Refusal::index).containsExactly(41, 42);
        assertThat(hatchery.states()).hasSize(40);
    }

    @Test
    void refused_rows_are_kept_with_place_text_and_reason() {
        hatchery.take(row(3, "t-1", 22, T0), row(5, "t-7", 22, T0));

        List<RefusedRow> kept = hatchery.database.read(books -> books.readings().refused(hatchery.site.id(), 10));

        assertThat(kept).hasSize(1);
        assertThat(kept.get(0).index()).isEqualTo(5);
        assertThat(kept.get(0).row()).isEqualTo("row 5");
        assertThat(kept.get(0).gateway()).isEqualTo("pier");
        assertThat(kept.get(0).receivedAt()).isEqualTo(T0);
        assertThat(kept.get(0).detail())
                .contains("t-7")
                .contains("not registered at tank")
                .contains("t-1 (temperature)");
    }

    @Test
    void every_fault_names_the_value_and_what_would_be_accepted() {
        String at = T0.toString();
        assertThat(refusal("pond", "ph", 7.9, at, null, null)).contains("pond").contains("tank");
        assertThat(refusal("tank", "salt", 30.0, at, null, null))
                .contains("salt")
                .contains("salinity");
        assertThat(refusal("tank", "omegaAragonite", 2.0, at, null, null)).contains("cannot be posted");
        assertThat(refusal("tank", "ph", 7.9, at, "Cel", null)).contains("Cel").contains("[pH]");
        assertThat(refusal("tank", "ph", 7.9, at, null, "t-1")).contains("t-1").contains("temperature");
        assertThat(refusal("tank", "dic", 2000.0, at, null, null)).contains("no sensor for dic");
        assertThat(refusal("tank", "ph", Double.NaN, at, null, null)).contains("NaN");
        assertThat(refusal("tank", "ph", null, at, null, null)).contains("value is missing");
        assertThat(refusal("tank", "ph", 7.9, null, null, null)).contains("at is missing");
        assertThat(refusal("tank", "ph", 7.9, "2026-05-14T03:00:00", null, null))
                .contains("offset");
        assertThat(refusal("tank", "ph", 7.9, "1999-12-31T23:59:59Z", null, null))
                .contains("before 2000");
        assertThat(readings("ph-1")).isEmpty();
    }

    @Test
    void a_quantity_with_several_sensors_needs_the_sensor_named() {
        hatchery.sensor("ph-2", Quantity.PH, 0.02);

        assertThat(refusal("tank", "ph", 7.9, T0.toString(), null, null))
                .contains("ph-1")
                .contains("ph-2");
    }

    @Test
    void a_time_ahead_of_the_clock_is_taken_up_to_the_tolerance() {
        Instant latest = T0.plus(Duration.ofMinutes(2));

        assertThat(hatchery.read("t-1", 22, latest).stored()).isEqualTo(1);
        assertThat(hatchery.read("t-1", 22, latest.plusMillis(1))
                        .refused()
                        .get(0)
                        .detail())
                .contains("in the future")
                .contains("gateway's clock");
    }

    @Test
    void units_are_converted_once() {
        hatchery.take(new IncomingReading(0, "tank", "temperature", 71.6, T0.toString(), "[degF]", null, null, "row"));

        assertThat(readings("t-1").get(0).value()).isCloseTo(22, within(1e-12));
    }

    @Test
    void a_gateway_is_heard_even_when_nothing_it_says_can_be_taken() {
        assertThat(heard()).isNull();
        hatchery.read("t-9", 22, T0);
        assertThat(heard()).isEqualTo(T0);

        hatchery.clock.pass(Duration.ofSeconds(30));
        hatchery.read("t-1", 22, T0);
        assertThat(heard()).isEqualTo(T0.plusSeconds(30));
    }

    @Test
    void a_key_of_another_site_sees_none_of_this_one() {
        Site other = hatchery.otherSite();
        GatewayKey stranger = hatchery.makeGateway(other);

        Answer answer = hatchery.intake.take(stranger, List.of(row(0, "t-1", 22, T0)));

        assertThat(answer.stored()).isZero();
        assertThat(answer.refused().get(0).detail())
                .contains("not known at this site")
                .doesNotContain("larval");
        assertThat(readings("t-1")).isEmpty();
        assertThat(hatchery.database.<List<RefusedRow>>read(
                        books -> books.readings().refused(hatchery.site.id(), 10)))
                .isEmpty();
    }

    @Test
    void one_row_of_long_ago_does_not_hinder_the_rest() {
        Answer answer = hatchery.take(
                row(0, "t-1", 20, Instant.parse("2003-01-01T00:00:00Z")), row(1, "t-1", 22, T0), row(2, "t-1", 22, T0));

        assertThat(answer).isEqualTo(new Answer(2, 1, List.of()));
        assertThat(hatchery.states()).hasSize(2);
    }

    private String refusal(String point, String quantity, Double value, String at, String unit, String sensor) {
        Answer answer = hatchery.take(new IncomingReading(0, point, quantity, value, at, unit, sensor, null, "row"));
        assertThat(answer.stored()).isZero();
        assertThat(answer.refused()).hasSize(1);
        return answer.refused().get(0).detail();
    }

    private List<StoredReading> readings(String sensor) {
        return hatchery.database.read(books -> books.place().sensors(hatchery.site.id()).stream()
                .filter(s -> s.code().equals(sensor))
                .flatMap(s -> books.readings().between(s.id(), Instant.EPOCH, T0.plus(Duration.ofDays(1))).stream())
                .toList());
    }

    private Instant heard() {
        return hatchery.accounts.gatewayKeys(hatchery.site).get(0).lastHeardAt();
    }
}
