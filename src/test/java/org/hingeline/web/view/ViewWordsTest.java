package org.hingeline.web.view;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import org.hingeline.web.view.LayoutView.Role;
import org.hingeline.web.view.TideStrip.Level;
import org.hingeline.web.view.TideStrip.Stretch;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ViewWordsTest {
    private static final ZoneId LISBON = ZoneId.of("Europe/Lisbon");
    private static final Instant NOW = Instant.parse("2026-05-14T02:12:00Z");

    @ParameterizedTest
    @CsvSource({
        "-90, just now",
        "59, just now",
        "60, 1 min ago",
        "3599, 59 min ago",
        "3600, 1 h ago",
        "11100, 3 h 5 min ago",
        "86400, 24 h ago",
        "259200, 3 days ago",
    })
    void ages_read_as_people_say_them(long seconds, String words) {
        assertThat(Moment.age(Duration.ofSeconds(seconds))).isEqualTo(words);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "2026-05-14T02:10:00Z; 03:10",
                "2026-05-13T23:00:00Z; 00:00",
                "2026-05-13T22:59:00Z; 13 May, 23:59",
                "2025-12-31T12:00:00Z; 31 Dec 2025, 12:00",
            })
    void clocks_show_the_site_s_time_and_the_day_unless_it_is_today(Instant at, String clock) {
        assertThat(Moment.of(at, NOW, LISBON).clock()).isEqualTo(clock);
    }

    @Test
    void the_headline_names_the_one_that_is_short() {
        assertThat(site("Intake:FIT", "Larval 3:SHORT").headline())
                .isEqualTo("Larval 3 is short of carbonate. Water fit at 1 of 2 points.");
    }

    @Test
    void the_headline_counts_when_there_are_too_many_to_name() {
        assertThat(site("A:SHORT", "B:SHORT", "C:SHORT", "D:SHORT", "E:UNKNOWN").headline())
                .isEqualTo("4 points are short of carbonate. Not known at E. The water is known to be fit nowhere.");
    }

    @Test
    void water_not_known_is_never_called_fit() {
        StatusView status = site("A:FIT", "B:UNKNOWN", "C:UNKNOWN");
        assertThat(status.standing()).isEqualTo(Standing.UNKNOWN);
        assertThat(status.headline()).isEqualTo("Not known at B and C. Water fit at 1 of 3 points.");
        assertThat(site("A:UNKNOWN").headline()).isEqualTo("Not known at any point.");
        assertThat(new StatusView(null, List.of()).standing()).isEqualTo(Standing.UNKNOWN);
    }

    @Test
    void a_point_without_a_limit_is_told_as_that_and_not_as_unknown() {
        StatusView status = site("A:FIT", "B:NO_LIMIT");
        assertThat(status.standing()).isEqualTo(Standing.FIT);
        assertThat(status.headline()).isEqualTo("Water fit at 1 of 2 points. No limit is set at B.");
        assertThat(site("A:NO_LIMIT", "B:NO_LIMIT").standing()).isEqualTo(Standing.UNKNOWN);
        assertThat(site("A:NO_LIMIT", "B:NO_LIMIT").headline())
                .isEqualTo("No limit is set at any point: nothing is judged and nobody is told.");
    }

    @Test
    void what_is_to_be_done_at_several_points_is_said_once_and_the_most_urgent_first() {
        StatusView status = new StatusView(
                null,
                List.of(
                        callOf("A", "Look.", 2),
                        callOf("B", "Close the valve.", 3),
                        callOf("C", "Look.", 2),
                        callOf("D", "", 0)));
        assertThat(status.calls())
                .extracting(
                        StatusView.Call::action,
                        call -> call.points().stream().map(PathPoint::name).toList())
                .containsExactly(
                        org.assertj.core.groups.Tuple.tuple("Close the valve.", List.of("B")),
                        org.assertj.core.groups.Tuple.tuple("Look.", List.of("A", "C")));
    }

    @Test
    void the_strip_wastes_no_word_on_a_few_minutes_unless_they_are_the_present() {
        assertThat(strip(stretch(24, 6, Standing.FIT), stretch(5.9, 0, Standing.FIT)))
                .isEqualTo("Intake: fit throughout.");
        assertThat(strip(stretch(24, 0.05, Standing.FIT), stretch(0.05, 0, Standing.SHORT)))
                .isEqualTo("Intake: fit throughout, short just now.");
    }

    private static String strip(Stretch... stretches) {
        return TideStrip.draw("Intake", NOW.minus(Duration.ofHours(24)), NOW, LISBON, List.of(stretches), List.of())
                .summary();
    }

    @Test
    void all_fit_is_said_in_one_sentence() {
        assertThat(site("A:FIT", "B:FIT").headline()).isEqualTo("The water is fit at all 2 points.");
        assertThat(site("A:FIT").headline()).isEqualTo("The water is fit.");
    }

    @Test
    void the_strip_shows_as_not_known_what_nobody_measured() {
        TideStrip strip = TideStrip.draw(
                "Intake, last 24 h",
                NOW.minus(Duration.ofHours(24)),
                NOW,
                LISBON,
                List.of(stretch(30, 18, Standing.FIT), stretch(18, 12, Standing.FIT), stretch(6, 0, Standing.SHORT)),
                List.of());
        assertThat(strip.spans())
                .extracting(TideStrip.Span::standing, TideStrip.Span::x, TideStrip.Span::width)
                .containsExactly(
                        org.assertj.core.groups.Tuple.tuple(Standing.FIT, "0.000%", "50.000%"),
                        org.assertj.core.groups.Tuple.tuple(Standing.UNKNOWN, "50.000%", "25.000%"),
                        org.assertj.core.groups.Tuple.tuple(Standing.SHORT, "75.000%", "25.000%"));
        assertThat(strip.summary()).isEqualTo("Intake, last 24 h: fit 12 h, short 6 h, not known 6 h.");
        assertThat(strip.tide()).isFalse();
    }

    @Test
    void the_strip_draws_high_water_above_low_water() {
        TideStrip strip = TideStrip.draw(
                "Intake",
                NOW.minus(Duration.ofHours(24)),
                NOW,
                LISBON,
                List.of(),
                List.of(new Level(NOW.minus(Duration.ofHours(12)), 3.1), new Level(NOW, 0.4)));
        assertThat(strip.surface()).isEqualTo("M0 10.0L500.0 10.0L1000.0 62.0L1000 62.0");
        assertThat(strip.ticks())
                .extracting(TideStrip.Tick::label)
                .startsWith("06:00")
                .doesNotContain("03:00");
    }

    @Test
    void the_strip_counts_hours_of_the_site_s_clock_through_a_change_of_clocks() {
        Instant afterTheChange = Instant.parse("2026-03-29T12:00:00Z");
        TideStrip strip = TideStrip.draw(
                "Intake", afterTheChange.minus(Duration.ofHours(24)), afterTheChange, LISBON, List.of(), List.of());
        assertThat(strip.ticks())
                .extracting(TideStrip.Tick::label)
                .containsExactly("15:00", "18:00", "21:00", "00:00", "03:00", "06:00", "09:00");
    }

    @Test
    void links_name_the_site_only_when_there_are_several() {
        assertThat(layout(1).link("/alerts#a")).isEqualTo("/alerts#a");
        assertThat(layout(2).link("/alerts#a")).isEqualTo("/alerts?site=s%201#a");
        assertThat(layout(2).linkTo("points", "ä/1", "limits", "first shell"))
                .isEqualTo("/points/%C3%A4%2F1/limits/first%20shell?site=s%201");
    }

    private static LayoutView layout(int sites) {
        List<SiteChoice> choices = List.of(new SiteChoice("s 1", "One", true), new SiteChoice("s2", "Two", false))
                .subList(0, sites);
        return new LayoutView("One", "s 1", choices, "Ana", Role.VIEWER, "t", "UTC", Moment.never(), "", "");
    }

    private static Stretch stretch(double fromHoursAgo, double toHoursAgo, Standing standing) {
        return new Stretch(hoursAgo(fromHoursAgo), hoursAgo(toHoursAgo), standing);
    }

    private static Instant hoursAgo(double hours) {
        return NOW.minusSeconds(Math.round(hours * 3600));
    }

    private static StatusView site(String... points) {
        return new StatusView(
                null,
                java.util.Arrays.stream(points)
                        .map(p -> point(p.split(":")[0], p.split(":")[1]))
                        .toList());
    }

    private static PathPoint point(String name, String standing) {
        return standing.equals("NO_LIMIT")
                ? point(name, Standing.UNKNOWN, "2.10", "", false, 0)
                : point(name, Standing.valueOf(standing), "", "", true, 0);
    }

    private static PathPoint callOf(String name, String action, int urgency) {
        return point(name, Standing.SHORT, "1.50", action, true, urgency);
    }

    private static PathPoint point(
            String name, Standing standing, String omega, String action, boolean judged, int urgency) {
        String verdict = standing == Standing.SHORT ? "short of carbonate" : standing.word();
        return new PathPoint(
                name,
                name,
                Place.TANK,
                standing,
                verdict,
                omega,
                "",
                "",
                Moment.never(),
                List.of(),
                action,
                "",
                List.of(),
                false,
                judged,
                urgency);
    }
}
