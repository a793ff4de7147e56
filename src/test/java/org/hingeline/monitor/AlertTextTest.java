package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Locale;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.quality.Flag;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AlertTextTest {
    /** 03:24 at the site. */
    private static final Instant NOW = Instant.parse("2026-05-14T10:24:00Z");

    private static final Site SITE = new Site(1, "fennick", "Fennick Bay", ZoneId.of("America/Los_Angeles"));
    private static final Point LARVAL_3 =
            new Point(3, 1, "larval-3", "Larval 3", PointKind.LARVAL, 5, "storage", 20_000.0, Duration.ofMinutes(30));
    private static final Batch BATCH =
            new Batch(1, 3, "og-26-14", "Crassostrea gigas", Instant.parse("2026-05-13T03:24:00Z"), null);

    @Test
    void a_raised_alert_says_what_is_wrong_then_what_to_do_then_the_rest() {
        AlertText text = AlertText.raised(news(omega(1.62, 0.11), water(), BATCH));

        assertThat(text.subject()).isEqualTo("HIGH: Larval 3, Ω 1.62 under 1.80 - Fennick Bay");
        assertThat(text.body()).isEqualTo("""
                        Larval 3 (20 m3): Ω 1.62 ±0.11, under your 1.80 for 12 min.

                        What to do: Close the intake valve; draw from storage.
                        Priority: high.
                        Under the limit since 14 May 2026, 03:12.
                        It counts as back at 1.85 or more for 10 min.
                        In the tank: batch og-26-14, Crassostrea gigas, 31 h after spawning: building its first shell now.

                        The water at 03:23:
                          Ω aragonite 1.61 ±0.11
                          pH 7.71 ±0.02 on the total scale, temperature 22.0 °C, salinity 30.4, total alkalinity 2078 µmol/kg
                        From these readings:
                          pH 7.845 on the sensor's scale, sensor ph-3 at 03:23, 1 min ago
                          temperature 22.0 °C, sensor t-3 at 03:20, 4 min ago
                          salinity 30.4, sensor s-3 at 03:20, 4 min ago
                          total alkalinity 2078 µmol/kg, sensor ta-bench at 13 May 2026, 09:00, 18 h 24 min ago

                        The point: https://water.example.org/points/larval-3?site=fennick
                        All alerts, and to acknowledge: https://water.example.org/alerts?site=fennick

                        ± is the combined standard uncertainty: about two times in three the true value lies within it.
                        Times are those of America/Los_Angeles. Written 14 May 2026, 03:24.
                        """);
    }

    @Test
    void an_alert_raised_again_says_that_it_is_the_same_one() {
        AlertText text = AlertText.raisedAgain(news(omega(1.62, 0.11), null, null));

        assertThat(text.subject()).isEqualTo("HIGH again: Larval 3, Ω 1.62 under 1.80 - Fennick Bay");
        assertThat(text.body()).isEqualTo("""
                        Larval 3 (20 m3): Ω 1.62 ±0.11, under your 1.80 again for 12 min.

                        What to do: Close the intake valve; draw from storage.
                        Priority: high.
                        Under the limit since 14 May 2026, 03:12.
                        It had come back to normal before anybody acknowledged the alert; the same alert stands again.
                        It counts as back at 1.85 or more for 10 min.

                        No water state of this point is known.

                        The point: https://water.example.org/points/larval-3?site=fennick
                        All alerts, and to acknowledge: https://water.example.org/alerts?site=fennick

                        ± is the combined standard uncertainty: about two times in three the true value lies within it.
                        Times are those of America/Los_Angeles. Written 14 May 2026, 03:24.
                        """);
    }

    @Test
    void back_to_normal_says_for_how_long_it_was_out_and_that_nobody_has_acknowledged() {
        AlertText text = AlertText.backToNormal(news(omega(1.62, 0.11), water(1.91, List.of(), Flag.PASS), null));

        assertThat(text.subject()).isEqualTo("Back to normal: Larval 3, Ω 1.91 - Fennick Bay");
        assertThat(text.body()).startsWith("""
                        Larval 3 (20 m3): Ω 1.91 ±0.11, back within your 1.80.

                        It was under it for 12 min, from 14 May 2026, 03:12 to 03:24.
                        Nobody has acknowledged the alert yet; it stays on the list until somebody does.

                        The water at 03:23:
                          Ω aragonite 1.91 ±0.11
                        """).doesNotContain("What to do");
    }

    @Test
    void back_to_normal_of_an_acknowledged_alert_says_by_whom() {
        Alert acknowledged = omega(1.62, 0.11, "Ines Vale");

        assertThat(AlertText.backToNormal(news(acknowledged, null, null)).body())
                .startsWith("""
                        Larval 3 (20 m3): Ω is back within your 1.80.

                        It was under it for 12 min, from 14 May 2026, 03:12 to 03:24.
                        Acknowledged by Ines Vale. Nothing is left to do.
                        """);
    }

    @Test
    void silence_says_what_is_missing_and_since_when() {
        WaterState silent = new WaterState(
                3,
                NOW,
                List.of(new InputUsed(
                        Quantity.TEMPERATURE,
                        22.04,
                        Instant.parse("2026-05-14T10:20:00Z"),
                        "sensor",
                        "t-3",
                        Flag.PASS)),
                List.of(
                        new MissingInput(Quantity.PH, Instant.parse("2026-05-14T08:10:00Z"), Duration.ofMinutes(15)),
                        new MissingInput(Quantity.TOTAL_ALKALINITY, null, Duration.ofDays(3))),
                null,
                List.of());

        AlertText text = AlertText.silence(news(silence(134), silent, null));

        assertThat(text.subject()).isEqualTo("MEDIUM: Larval 3, no Ω since 01:10 - Fennick Bay");
        assertThat(text.body()).isEqualTo("""
                        Larval 3 (20 m3): no Ω since 01:10, for 2 h 14 min: pH last heard 01:10; total alkalinity never heard.

                        What to do: Look at the gateway: power, network, sensor plugs.
                        Priority: medium.
                        While it is silent no limit of this point can be watched: the water may be out of them unseen.

                        Last known, at 03:24:
                        From these readings:
                          temperature 22.0 °C, sensor t-3 at 03:20, 4 min ago
                        Missing:
                          pH last heard 01:10; used up to 15 min old
                          total alkalinity never heard; used up to 3 d old

                        The point: https://water.example.org/points/larval-3?site=fennick
                        All alerts, and to acknowledge: https://water.example.org/alerts?site=fennick

                        Times are those of America/Los_Angeles. Written 14 May 2026, 03:24.
                        """);
    }

    @Test
    void silence_after_a_sound_state_gives_the_last_water_known() {
        AlertText text = AlertText.silence(news(silence(600), water(), null));

        assertThat(text.subject()).isEqualTo("MEDIUM: Larval 3, nothing heard since 13 May 2026, 17:24 - Fennick Bay");
        assertThat(text.body())
                .startsWith("Larval 3 (20 m3): nothing heard since 13 May 2026, 17:24, for 10 h.\n")
                .contains("Last known, at 03:23:\n  Ω aragonite 1.61 ±0.11\n");
    }

    @Test
    void silence_of_a_point_that_never_had_an_omega_does_not_speak_of_it() {
        Instant last = NOW.minus(Duration.ofMinutes(134));
        WaterState temperatureOnly = new WaterState(
                3,
                last,
                List.of(new InputUsed(Quantity.TEMPERATURE, 22.04, last, "sensor", "t-3", Flag.PASS)),
                List.of(new MissingInput(Quantity.PH, null, Duration.ofMinutes(15))),
                null,
                List.of());

        assertThat(AlertText.silence(news(silence(134), temperatureOnly, null)).body())
                .startsWith("Larval 3 (20 m3): nothing heard since 01:10, for 2 h 14 min.\n")
                .contains("  temperature 22.0 °C, sensor t-3 at 01:10, 2 h 14 min ago\n");
    }

    @Test
    void a_silent_point_that_is_heard_again_says_so() {
        AlertText text = AlertText.backToNormal(news(silence(134), water(), null));

        assertThat(text.subject()).isEqualTo("Back to normal: Larval 3, heard again - Fennick Bay");
        assertThat(text.body()).startsWith("""
                        Larval 3 (20 m3): heard again.

                        It was silent for 2 h 14 min, from 14 May 2026, 01:10 to 03:24.
                        """);
    }

    @Test
    void suspect_inputs_and_cautions_are_told() {
        WaterState water = water(
                1.61, List.of(new Note("salinity-low", "Salinity is near the edge of the method.")), Flag.SUSPECT);

        assertThat(AlertText.raised(news(omega(1.62, 0.11), water, null)).body())
                .contains("  pH 7.845 on the sensor's scale, sensor ph-3 at 03:23, 1 min ago, SUSPECT\n")
                .contains("""
                        total alkalinity 2078 µmol/kg, sensor ta-bench at 13 May 2026, 09:00, 18 h 24 min ago

                        Caution: an input is marked suspect, and so is everything worked out from it. Check that sensor.
                        Caution: Salinity is near the edge of the method.

                        The point:\
                        """);
    }

    @Test
    void other_quantities_carry_their_unit_and_side() {
        Alert warm = alert(Quantity.TEMPERATURE, Side.ABOVE, 26, 26.34, 0.1, null);

        AlertText text = AlertText.raised(news(warm, null, null));

        assertThat(text.subject()).isEqualTo("HIGH: Larval 3, temperature 26.3 over 26.0 - Fennick Bay");
        assertThat(text.body())
                .startsWith("Larval 3 (20 m3): temperature 26.3 ±0.1 °C, over your 26.0 °C for 12 min.\n")
                .contains("\nOver the limit since 14 May 2026, 03:12.\n")
                .contains("\nIt counts as back at 25.95 °C or less for 10 min.\n");
    }

    @ParameterizedTest
    @CsvSource({
        "1.796, 1.8, 1.796 ±0.110, 1.80",
        "1.7996, 1.8, 1.7996 ±0.1100, 1.80",
        "1.724, 1.725, 1.72 ±0.11, 1.725",
        "1.62, 1.8, 1.62 ±0.11, 1.80"
    })
    void rounding_never_hides_that_the_value_is_out(double value, double threshold, String shown, String limit) {
        Alert alert = alert(Quantity.OMEGA_ARAGONITE, Side.BELOW, threshold, value, 0.11, null);

        assertThat(AlertText.raised(news(alert, null, null)).body())
                .startsWith("Larval 3 (20 m3): Ω " + shown + ", under your " + limit + " for 12 min.");
    }

    @Test
    void an_unknown_uncertainty_is_left_out_and_not_explained() {
        assertThat(AlertText.raised(news(omega(1.62, 0), null, null)).body())
                .startsWith("Larval 3 (20 m3): Ω 1.62, under your 1.80 for 12 min.")
                .doesNotContain("±");
    }

    @Test
    void a_subject_is_one_line_of_at_most_100_characters_whatever_people_call_things() {
        Point named = new Point(
                3,
                1,
                "x",
                "Tank\r\nBcc: a@b.c " + "ä".repeat(60),
                PointKind.LARVAL,
                1,
                null,
                null,
                Duration.ofMinutes(5));
        Site site = new Site(1, "s", "S".repeat(80), ZoneId.of("UTC"));

        AlertText text = AlertText.raised(
                new AlertNews(site, named, omega(1.62, 0.11), limit(), null, null, "https://water.example.org", NOW));

        assertThat(text.subject())
                .hasSize(100)
                .startsWith("HIGH: Tank  Bcc: a@b.c ää")
                .contains(", Ω 1.62 under 1.80 - SSS")
                .endsWith("…")
                .doesNotContain("\n", "\r");
        assertThat(text.body()).startsWith("Tank  Bcc: a@b.c ää");
    }

    @Test
    void the_machine_s_own_language_changes_nothing() {
        Locale before = Locale.getDefault();
        String usual = AlertText.raised(news(omega(1.62, 0.11), water(), BATCH)).body();
        try {
            Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
            assertThat(AlertText.raised(news(omega(1.62, 0.11), water(), BATCH)).body())
                    .isEqualTo(usual);
        } finally {
            Locale.setDefault(before);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "59, less than a minute",
        "60, 1 min",
        "3599, 59 min",
        "3600, 1 h",
        "3660, 1 h 1 min",
        "172799, 47 h 59 min",
        "172800, 2 d",
        "180000, 2 d 2 h",
        "-5, less than a minute"
    })
    void lengths_of_time_are_said_in_the_two_largest_units(long seconds, String words) {
        assertThat(Wording.length(Duration.ofSeconds(seconds))).isEqualTo(words);
    }

    @ParameterizedTest
    @CsvSource({"400, 400 L", "999.94, 999.9 L", "1000, 1 m3", "20000, 20 m3", "12500, 12.5 m3"})
    void volumes_are_in_litres_or_cubic_metres(double litres, String words) {
        assertThat(Wording.volume(litres)).isEqualTo(words);
    }

    private static AlertNews news(Alert alert, @Nullable WaterState water, @Nullable Batch batch) {
        return new AlertNews(SITE, LARVAL_3, alert, limit(), water, batch, "https://water.example.org", NOW);
    }

    private static Limit limit() {
        return new Limit(
                7,
                3,
                "omega-low",
                Quantity.OMEGA_ARAGONITE,
                Side.BELOW,
                1.8,
                0.05,
                Duration.ofMinutes(10),
                Duration.ofMinutes(10),
                Priority.HIGH,
                "Close the intake valve; draw from storage.");
    }

    private static Alert omega(double value, double uncertainty) {
        return omega(value, uncertainty, null);
    }

    private static Alert omega(double value, double uncertainty, @Nullable String acknowledgedBy) {
        return alert(Quantity.OMEGA_ARAGONITE, Side.BELOW, 1.8, value, uncertainty, acknowledgedBy);
    }

    private static Alert alert(
            Quantity quantity,
            Side side,
            double threshold,
            double value,
            double uncertainty,
            @Nullable String acknowledgedBy) {
        return new Alert(
                11,
                1,
                3,
                7,
                "omega-low",
                quantity,
                side,
                threshold,
                Priority.HIGH,
                "Close the intake valve; draw from storage.",
                Phase.UNACKNOWLEDGED,
                NOW.minus(Duration.ofMinutes(12)),
                NOW.minus(Duration.ofMinutes(1)),
                value,
                uncertainty,
                acknowledgedBy == null ? null : NOW,
                acknowledgedBy,
                null,
                null,
                null);
    }

    private static Alert silence(double minutes) {
        return new Alert(
                12,
                1,
                3,
                8,
                "silence",
                Quantity.SILENCE,
                Side.ABOVE,
                30,
                Priority.MEDIUM,
                "Look at the gateway: power, network, sensor plugs.",
                Phase.UNACKNOWLEDGED,
                NOW,
                NOW,
                minutes,
                0,
                null,
                null,
                null,
                null,
                null);
    }

    private static WaterState water() {
        return water(1.61, List.of(), Flag.PASS);
    }

    private static WaterState water(double omega, List<Note> cautions, Flag phFlag) {
        Instant at = Instant.parse("2026-05-14T10:23:00Z");
        Instant slow = Instant.parse("2026-05-14T10:20:00Z");
        return new WaterState(
                3,
                at,
                List.of(
                        new InputUsed(Quantity.PH, 7.845, at, "sensor", "ph-3", phFlag),
                        new InputUsed(Quantity.TEMPERATURE, 22.04, slow, "sensor", "t-3", Flag.PASS),
                        new InputUsed(Quantity.SALINITY, 30.4, slow, "sensor", "s-3", Flag.PASS),
                        new InputUsed(
                                Quantity.TOTAL_ALKALINITY,
                                2078,
                                Instant.parse("2026-05-13T16:00:00Z"),
                                "sensor",
                                "ta-bench",
                                Flag.PASS)),
                List.of(),
                new WaterNumbers(
                        7.712, 22.04, 30.4, 2078, 1960, 812, 809, 26, 1830, 104, omega, 2.5, 1021, 0.11, 0.06, 0.09,
                        0.021),
                cautions);
    }
}
