package org.hingeline.hatchery;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.PhScale;
import org.junit.jupiter.api.Test;

/** Every refusal names the field, quotes the value and says what would be accepted. */
class RecordsTest {
    private static final Duration GAP = Duration.ofMinutes(15);

    @Test
    void codes_are_short_and_fit_into_an_address() {
        assertThat(Codes.isCode("larval-3")).isTrue();
        assertThat(Codes.isCode("3")).isTrue();
        assertThat(Codes.isCode("a".repeat(40))).isTrue();
        assertThat(new String[] {"", "-a", "Larval", "a b", "a_b", "a".repeat(41), "ä", "a/b", "a\n"})
                .noneMatch(Codes::isCode);
    }

    @Test
    void a_site_needs_a_code_and_a_name() {
        refused(() -> new Site(0, "Cove", "Cove", ZoneOffset.UTC), "site code", "\"Cove\"", "small letters");
        refused(() -> new Site(0, "cove", " ", ZoneOffset.UTC), "site name", "1 to 80 characters");
        refused(() -> new Site(0, "cove", "x".repeat(81), ZoneOffset.UTC), "site name", "1 to 80 characters");
    }

    @Test
    void a_point_holds_a_volume_it_can_have() {
        assertThat(point(4000.0, GAP).volumeL()).isEqualTo(4000);
        assertThat(point(null, GAP).volumeL()).isNull();
        refused(() -> point(0.0, GAP), "volumeL 0.0", "above 0");
        refused(() -> point(-1.0, GAP), "volumeL -1.0", "above 0");
        refused(() -> point(Double.NaN, GAP), "volumeL NaN");
        refused(() -> point(1.1e7, GAP), "volumeL 1.1E7", "at most");
    }

    @Test
    void a_point_has_a_longest_gap_of_at_most_a_month() {
        assertThat(point(null, Duration.ofDays(31)).maxGap()).isEqualTo(Duration.ofDays(31));
        refused(() -> point(null, Duration.ZERO), "maxGapMin 0.0", "above 0");
        refused(() -> point(null, Duration.ofMinutes(-1)), "maxGapMin -1.0");
        refused(() -> point(null, Duration.ofDays(31).plusSeconds(1)), "maxGapMin 44640.0", "at most 44640");
    }

    @Test
    void a_sensor_measures_what_can_be_measured_in_a_unit_of_it() {
        refused(
                () -> sensor(Quantity.OMEGA_ARAGONITE, "1", null, 0.1),
                "omegaAragonite",
                "computed",
                "ph, temperature");
        refused(() -> sensor(Quantity.TEMPERATURE, "[pH]", null, 0.1), "\"[pH]\"", "temperature", "Cel, [degF], K");
    }

    @Test
    void a_ph_sensor_says_its_scale_and_no_other_does() {
        assertThat(sensor(Quantity.PH, "[pH]", PhScale.NBS, 0.02).phScale()).isEqualTo(PhScale.NBS);
        refused(() -> sensor(Quantity.PH, "[pH]", null, 0.02), "phScale is missing", "total, seawater, free or nbs");
        refused(() -> sensor(Quantity.SALINITY, "1", PhScale.TOTAL, 0.1), "phScale TOTAL", "salinity");
    }

    @Test
    void nothing_is_measured_without_uncertainty() {
        for (double bad : new double[] {0, -0.1, Double.NaN, Double.POSITIVE_INFINITY}) {
            refused(() -> sensor(Quantity.SALINITY, "1", null, bad), "standardUncertainty " + bad, "above 0");
        }
    }

    @Test
    void larvae_build_their_first_shell_in_the_first_48_hours() {
        Instant spawned = Instant.parse("2026-05-14T03:20:00Z");
        Batch batch = new Batch(0, 1, "b-1", "Crassostrea gigas", spawned, null);

        assertThat(batch.buildsFirstShell(spawned)).isTrue();
        assertThat(batch.buildsFirstShell(spawned.minusMillis(1))).isFalse();
        assertThat(batch.buildsFirstShell(spawned.plus(Duration.ofHours(48)).minusMillis(1)))
                .isTrue();
        assertThat(batch.buildsFirstShell(spawned.plus(Duration.ofHours(48)))).isFalse();
        refused(() -> new Batch(0, 1, "B 1", "Crassostrea gigas", spawned, null), "batch code", "\"B 1\"");
        refused(() -> new Batch(0, 1, "b-1", "", spawned, null), "species");
    }

    @Test
    void kinds_are_found_by_code_and_listed_for_people() {
        assertThat(PointKind.values())
                .allSatisfy(kind -> assertThat(PointKind.ofCode(kind.code())).contains(kind));
        assertThat(PointKind.ofCode("pond")).isEmpty();
        assertThat(PointKind.codes()).isEqualTo("intake, storage, header, larval, discharge");
    }

    private static Point point(Double volumeL, Duration maxGap) {
        return new Point(0, 0, "tank", "Tank", PointKind.LARVAL, 1, null, volumeL, maxGap);
    }

    private static Sensor sensor(Quantity quantity, String unit, PhScale scale, double standardUncertainty) {
        return new Sensor(0, 0, "x-1", quantity, unit, scale, standardUncertainty, null);
    }

    private static void refused(ThrowingCallable making, String... said) {
        assertThatIllegalArgumentException()
                .isThrownBy(making)
                .satisfies(e -> assertThat(e.getMessage()).contains(said));
    }
}
