package org.hingeline.alert;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.hingeline.alert.Transition.Effect;
import org.hingeline.measure.Quantity;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** Random lives of random limits, held against rules and against a second bookkeeping that remembers every value. */
class AlertMachinePropertyTest {
    private static final int LIVES = 400;
    private static final int EVENTS_EACH = 500;
    private static final Duration FRESH_FOR = Duration.ofMinutes(15);

    private final Map<Effect, Integer> seen = new EnumMap<>(Effect.class);

    @Test
    void two_hundred_thousand_random_events_break_no_rule() {
        for (int seed = 0; seed < LIVES; seed++) {
            new Life(seed).run();
        }
        // no rule was kept only because what it is about never came up
        assertThat(seen.keySet()).containsExactlyInAnyOrder(Effect.values());
        assertThat(seen.values()).allSatisfy(times -> assertThat(times).isGreaterThan(500));
    }

    private final class Life {
        private final int seed;
        private final Random random;
        private final Limit limit;
        /** Of a thousand events; some people never acknowledge, others at once. */
        private final int acknowledgements;

        private final List<Observation> taken = new ArrayList<>();
        private Instant now = Instant.parse("2026-05-14T00:00:00Z");
        private AlertState state = AlertState.INITIAL;
        private boolean open;

        Life(int seed) {
            this.seed = seed;
            this.random = new Random(seed);
            this.acknowledgements = random.nextInt(3) * 20;
            this.limit = new Limit(
                    1,
                    1,
                    "x",
                    Quantity.OMEGA_ARAGONITE,
                    random.nextBoolean() ? Side.BELOW : Side.ABOVE,
                    1.8,
                    random.nextInt(3) * 0.05,
                    Duration.ofMinutes(random.nextInt(4) * 6L),
                    Duration.ofMinutes(random.nextInt(4) * 6L),
                    Priority.HIGH,
                    "Act.");
        }

        void run() {
            for (int i = 0; i < EVENTS_EACH; i++) {
                now = now.plusSeconds(random.nextInt(240));
                Event event = event();
                AlertState before = state;
                Transition next = AlertMachine.next(limit, FRESH_FOR, before, event, now);
                state = next.state();
                seen.merge(next.effect(), 1, Integer::sum);
                String story = "seed " + seed + ", event " + i + ": " + before + " + " + event + " at " + now + " with "
                        + limit + " -> " + next;
                boolean late = keep(event, before);
                effectFitsPhases(story, before.phase(), event, next);
                oneOpenAlertAtMost(story, next.effect());
                if (late) {
                    assertThat(next).as(story).isEqualTo(new Transition(before, Effect.NOTHING));
                }
                runsAreThoseOfTheValues(story);
                raisesOnlyWhatIsOutLongEnoughNow(story, event, next.effect());
                nothingOverdueIsLeftAfterATick(story, event);
            }
        }

        private Event event() {
            int die = random.nextInt(1000);
            if (die < 650) {
                // mostly new, sometimes late, sometimes very late, sometimes a little ahead of the clock
                int age = random.nextInt(10) == 0 ? random.nextInt(7200) : random.nextInt(400) - 60;
                // the water wanders slowly, so that runs get long enough for the delays
                double drift = 0.25 * Math.sin(now.getEpochSecond() / 900.0);
                double value = 1.8 + drift + 0.05 * random.nextGaussian();
                return new Event.Observed(new Observation(now.minusSeconds(age), value, 0.1));
            }
            if (die < 650 + acknowledgements) {
                return new Event.Acknowledged();
            }
            return die < 997 ? new Event.Tick() : new Event.Retired();
        }

        /** Keeps the second bookkeeping; answers whether the event was a late value. */
        private boolean keep(Event event, AlertState before) {
            if (event instanceof Event.Retired) {
                taken.clear();
            }
            if (event instanceof Event.Observed observed) {
                Observation value = observed.observation();
                if (before.latest() != null
                        && !value.at().isAfter(before.latest().at())) {
                    return true;
                }
                taken.add(value);
            }
            return false;
        }

        private void effectFitsPhases(String story, Phase from, Event event, Transition next) {
            Phase to = next.state().phase();
            boolean fits = switch (next.effect()) {
                case NOTHING -> from == to;
                case RAISE -> from == Phase.NORMAL && to == Phase.UNACKNOWLEDGED;
                case RAISE_AGAIN -> from == Phase.RETURNED_UNACKNOWLEDGED && to == Phase.UNACKNOWLEDGED;
                case RETURN -> from == Phase.UNACKNOWLEDGED && to == Phase.RETURNED_UNACKNOWLEDGED;
                case ACKNOWLEDGE ->
                    from == Phase.UNACKNOWLEDGED && to == Phase.ACKNOWLEDGED && event instanceof Event.Acknowledged;
                case CLOSE ->
                    to == Phase.NORMAL
                            && switch (from) {
                                case NORMAL -> false;
                                case UNACKNOWLEDGED -> event instanceof Event.Retired;
                                case ACKNOWLEDGED -> !(event instanceof Event.Acknowledged);
                                case RETURNED_UNACKNOWLEDGED ->
                                    event instanceof Event.Acknowledged || event instanceof Event.Retired;
                            };
            };
            assertThat(fits).as(story).isTrue();
        }

        private void oneOpenAlertAtMost(String story, Effect effect) {
            if (effect == Effect.RAISE) {
                assertThat(open)
                        .as("a second alert while one is open; " + story)
                        .isFalse();
                open = true;
            } else if (effect == Effect.CLOSE) {
                assertThat(open).as("nothing to close; " + story).isTrue();
                open = false;
            } else if (effect != Effect.NOTHING) {
                assertThat(open).as("no alert to speak of; " + story).isTrue();
            }
            assertThat(state.phase().open()).as(story).isEqualTo(open);
        }

        private void runsAreThoseOfTheValues(String story) {
            assertThat(state.latest()).as(story).isEqualTo(taken.isEmpty() ? null : taken.get(taken.size() - 1));
            assertThat(state.outSince()).as(story).isEqualTo(outSince());
            if (state.backSince() != null) {
                assertThat(state.phase()).as(story).isIn(Phase.UNACKNOWLEDGED, Phase.ACKNOWLEDGED);
                assertThat(outSince()).as(story).isNull();
            }
        }

        private void raisesOnlyWhatIsOutLongEnoughNow(String story, Event event, Effect effect) {
            if (effect != Effect.RAISE && effect != Effect.RAISE_AGAIN) {
                return;
            }
            Observation latest = taken.get(taken.size() - 1);
            assertThat(latest.at().plus(FRESH_FOR)).as(story).isAfterOrEqualTo(now);
            Instant known = event instanceof Event.Tick && now.isAfter(latest.at()) ? now : latest.at();
            assertThat(outSince()).as(story).isNotNull();
            assertThat(Duration.between(outSince(), known)).as(story).isGreaterThanOrEqualTo(limit.onDelay());
        }

        private void nothingOverdueIsLeftAfterATick(String story, Event event) {
            Instant outSince = outSince();
            if (!(event instanceof Event.Tick) || outSince == null) {
                return;
            }
            boolean fresh = !taken.get(taken.size() - 1).at().plus(FRESH_FOR).isBefore(now);
            if (fresh && !outSince.plus(limit.onDelay()).isAfter(now)) {
                assertThat(state.phase()).as(story).isIn(Phase.UNACKNOWLEDGED, Phase.ACKNOWLEDGED);
            }
        }

        /** Beginning of the run of values out of the limit that the newest value belongs to. */
        private @Nullable Instant outSince() {
            Instant since = null;
            for (int i = taken.size() - 1; i >= 0 && out(taken.get(i).value()); i--) {
                since = taken.get(i).at();
            }
            return since;
        }

        private boolean out(double value) {
            return limit.side() == Side.BELOW ? value < 1.8 : value > 1.8;
        }
    }
}
