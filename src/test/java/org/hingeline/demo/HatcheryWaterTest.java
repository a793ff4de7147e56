package org.hingeline.demo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.KnownPair;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class HatcheryWaterTest {
    private static final Instant START = Instant.parse("2026-05-14T03:20:00Z");
    private static final Duration FORTNIGHT = Duration.ofDays(14);

    @Test
    void the_same_seed_gives_the_same_water_and_another_seed_another() {
        HatcheryWater once = new HatcheryWater(7, START, START);
        HatcheryWater again = new HatcheryWater(7, START, START);
        HatcheryWater other = new HatcheryWater(8, START, START);
        for (String point : once.points()) {
            Instant at = START.minusSeconds(86_400);
            assertThat(again.at(point, at)).isEqualTo(once.at(point, at)).isNotEqualTo(other.at(point, at));
            assertThat(new Instruments(7).read(again, point, at, true))
                    .isEqualTo(new Instruments(7).read(once, point, at, true));
        }
    }

    @Test
    void a_later_start_does_not_rewrite_what_was_before_it() {
        HatcheryWater first = new HatcheryWater(7, START, START);
        HatcheryWater restarted = new HatcheryWater(7, START, START.plusSeconds(90_000));
        Instant at = START.minusSeconds(5);
        assertThat(restarted.at("larval-3", at)).isEqualTo(first.at("larval-3", at));
    }

    @Test
    void ph_and_alkalinity_lead_back_to_the_carbon_the_water_was_made_of() {
        HatcheryWater water = new HatcheryWater(7, START, START);
        for (Instant at = START.minus(FORTNIGHT); at.isBefore(START.plusSeconds(600)); at = at.plusSeconds(11_111)) {
            for (String point : water.points()) {
                WaterBody body = water.at(point, at);
                CarbonateState state = body.solved();
                double back = CarbonateSystem.solve(
                                state.conditions(),
                                new KnownPair.PhAndAlkalinity(state.phTotal(), body.totalAlkalinityUmolKg() * 1e-6))
                        .orElseThrow()
                        .dic();
                assertThat(back / (body.dicUmolKg() * 1e-6)).isCloseTo(1, within(1e-9));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 7, 42, 20_260_514, -3})
    void the_water_stays_believable_for_a_month_and_a_half(long seed) {
        HatcheryWater water = new HatcheryWater(seed, START, START);
        for (Instant at = START.minus(FORTNIGHT);
                at.isBefore(START.plus(Duration.ofDays(30)));
                at = at.plusSeconds(2111)) {
            for (String point : water.points()) {
                CarbonateState state = water.at(point, at).solved();
                assertThat(state.phTotal()).as(point + " pH at " + at).isBetween(7.5, 8.3);
                assertThat(state.omegaAragonite())
                        .as(point + " \u03a9 at " + at)
                        .isBetween(0.8, 3.5);
                assertThat(state.conditions().salinity()).isBetween(28.0, 33.0);
                assertThat(water.levelM(at)).isBetween(-2.2, 2.2);
                boolean heated = point.startsWith("larval");
                assertThat(state.conditions().temperatureC()).isBetween(heated ? 22.0 : 9.0, heated ? 24.0 : 16.0);
            }
        }
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 7, 42, 20_260_514, -3})
    void but_for_the_excursion_no_limit_is_crossed_in_the_two_days_around_the_start(long seed) {
        // an excursion that never comes
        HatcheryWater water = new HatcheryWater(seed, START, START.plus(FORTNIGHT));
        for (Instant at = START.minus(Duration.ofDays(2));
                at.isBefore(START.plus(Duration.ofDays(2)));
                at = at.plusSeconds(911)) {
            for (String point : water.points()) {
                assertThat(water.at(point, at).solved().omegaAragonite())
                        .as(point + " at " + at)
                        .isGreaterThan(1.05 * limit(point));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 7, 42, 20_260_514, -3})
    void the_last_fortnight_has_a_spell_of_upwelling_of_three_to_five_days(long seed) {
        HatcheryWater water = new HatcheryWater(seed, START, START);
        List<Double> dayMeans = new ArrayList<>();
        for (int day = 0; day < 14; day++) {
            double sum = 0;
            for (int i = 0; i < 48; i++) {
                Instant at = START.minus(FORTNIGHT).plus(Duration.ofMinutes(day * 1440L + i * 30L));
                sum += water.at("intake", at).solved().omegaAragonite();
            }
            dayMeans.add(sum / 48);
        }
        assertThat(dayMeans)
                .filteredOn(mean -> mean < 1.75)
                .as("day means " + dayMeans)
                .hasSizeBetween(2, 5);
        assertThat(dayMeans)
                .filteredOn(mean -> mean > 1.9)
                .as("day means " + dayMeans)
                .hasSizeGreaterThan(7);
        assertThat(dayMeans.get(13)).isGreaterThan(1.9);
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 7, 42, 20_260_514, -3})
    void soon_after_a_start_the_intake_and_tank_3_fall_below_their_limits_long_enough_to_be_told_and_come_back(
            long seed) {
        for (int hour = 0; hour < 24; hour++) {
            Instant start = START.plus(Duration.ofHours(hour));
            HatcheryWater water = new HatcheryWater(seed, START, start);
            Map<String, Duration> onDelays =
                    Map.of("intake", Duration.ofSeconds(60), "larval-3", Duration.ofSeconds(30));
            onDelays.forEach((point, onDelay) -> {
                assertThat(omega(water, point, start.plusSeconds(10))).isGreaterThan(limit(point));
                for (int s = 40; s <= 40 + onDelay.toSeconds() + 240; s += 5) {
                    assertThat(omega(water, point, start.plusSeconds(s)))
                            .as(point + " " + s + " s after a start at " + start)
                            .isLessThan(0.97 * limit(point));
                }
                assertThat(omega(water, point, start.plusSeconds(480))).isGreaterThan(limit(point) + 0.05);
                assertThat(omega(water, point, start.plusSeconds(45 * 60 + 60))).isLessThan(limit(point));
            });
            assertThat(omega(water, "storage", start.plusSeconds(60))).isGreaterThan(1.7);
        }
    }

    @Test
    void nothing_jumps_where_history_meets_the_present() {
        HatcheryWater water = new HatcheryWater(7, START, START);
        for (String point : water.points()) {
            double before = water.at(point, START.minusSeconds(5)).solved().phTotal();
            double after = water.at(point, START.plusSeconds(5)).solved().phTotal();
            assertThat(after).isCloseTo(before, within(0.002));
        }
    }

    @Test
    void instruments_show_rounded_values_near_the_truth() {
        HatcheryWater water = new HatcheryWater(7, START, START);
        Map<Quantity, Double> shown = new Instruments(7).read(water, "intake", START, true);
        WaterBody truth = water.at("intake", START);

        assertThat(shown)
                .containsOnlyKeys(
                        Quantity.PH,
                        Quantity.TEMPERATURE,
                        Quantity.SALINITY,
                        Quantity.TOTAL_ALKALINITY,
                        Quantity.LEVEL);
        assertThat(shown.get(Quantity.PH)).isCloseTo(truth.solved().phTotal(), within(0.01));
        assertThat(String.valueOf(shown.get(Quantity.PH))).matches("\\d\\.\\d{1,3}");
        assertThat(shown.get(Quantity.TOTAL_ALKALINITY))
                .isCloseTo(truth.totalAlkalinityUmolKg(), within(10.0))
                .isEqualTo(Math.rint(shown.get(Quantity.TOTAL_ALKALINITY)));
    }

    @Test
    void a_point_it_does_not_know_has_no_water() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new HatcheryWater(7, START, START).at("pond", START))
                .withMessageContaining("\"pond\"");
    }

    private static double omega(HatcheryWater water, String point, Instant at) {
        return water.at(point, at).solved().omegaAragonite();
    }

    private static double limit(String point) {
        return switch (point) {
            case "intake", "storage" -> 1.7;
            case "larval-3" -> 2.0;
            default -> 1.8;
        };
    }
}
