package org.hingeline.demo;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.EnumMap;
import java.util.Map;
import org.hingeline.alert.AlertMachine;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Event;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Observation;
import org.hingeline.alert.Transition;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What somebody sees who has just started the demonstration: its water as read, against its limits. */
class FirstMinutesTest {
    private static final PlacePlan PLAN = PlaceFileReader.read(Path.of("demo-hatchery/hatchery.yaml"));
    private static final Duration LIVE = Duration.ofSeconds(5);
    private static final Duration FRESH = Duration.ofMinutes(12);

    @ParameterizedTest
    @ValueSource(longs = {1, 7, 42, 20_260_514, -3})
    void two_alerts_are_raised_within_a_hundred_seconds_and_are_back_to_normal_after_ten_minutes_and_no_other_comes(
            long seed) {
        for (int hour = 0; hour < 24; hour += 3) {
            Instant start = Instant.parse("2026-05-14T03:20:00Z").plus(Duration.ofHours(hour));
            for (PlacePlan.LimitPlan planned : PLAN.limits()) {
                Map<Transition.Effect, Duration> seen = effects(seed, start, planned);
                String which = planned.point() + " " + planned.name() + ", seed " + seed + ", from " + start;
                boolean expected = planned.name().equals("omega-low")
                        && (planned.point().equals("intake") || planned.point().equals("larval-3"));
                if (expected) {
                    assertThat(seen).as(which).containsOnlyKeys(Transition.Effect.RAISE, Transition.Effect.RETURN);
                    assertThat(seen.get(Transition.Effect.RAISE))
                            .as(which)
                            .isBetween(Duration.ofSeconds(45), Duration.ofSeconds(100));
                    assertThat(seen.get(Transition.Effect.RETURN))
                            .as(which)
                            .isBetween(Duration.ofMinutes(7), Duration.ofMinutes(10));
                } else {
                    assertThat(seen).as(which).isEmpty();
                }
            }
        }
    }

    /** What happens to a limit in the first half hour, and how long after the start; each only once. */
    private static Map<Transition.Effect, Duration> effects(long seed, Instant start, PlacePlan.LimitPlan planned) {
        HatcheryWater water = new HatcheryWater(seed, start, start);
        Instruments instruments = new Instruments(seed);
        Limit limit = planned.toLimit(1);
        AlertState state = AlertState.INITIAL;
        Map<Transition.Effect, Duration> seen = new EnumMap<>(Transition.Effect.class);
        double alkalinity = instruments
                .read(water, planned.point(), start, true)
                .getOrDefault(Quantity.TOTAL_ALKALINITY, Double.NaN);
        for (Instant at = start; at.isBefore(start.plusSeconds(1800)); at = at.plus(LIVE)) {
            Map<Quantity, Double> shown = instruments.read(water, planned.point(), at, false);
            double value = limit.quantity() == Quantity.TEMPERATURE
                    ? shown.get(Quantity.TEMPERATURE)
                    : CarbonateSystem.solve(
                                    Conditions.of(shown.get(Quantity.TEMPERATURE), shown.get(Quantity.SALINITY)),
                                    new KnownPair.PhAndAlkalinity(shown.get(Quantity.PH), alkalinity * 1e-6))
                            .orElseThrow()
                            .omegaAragonite();
            for (Event event : new Event[] {new Event.Observed(new Observation(at, value, 0.1)), new Event.Tick()}) {
                Transition transition = AlertMachine.next(limit, FRESH, state, event, at);
                state = transition.state();
                if (transition.effect() != Transition.Effect.NOTHING) {
                    assertThat(seen.put(transition.effect(), Duration.between(start, at)))
                            .as("a second " + transition.effect() + " of " + planned)
                            .isNull();
                }
            }
        }
        return seen;
    }
}
