package org.hingeline.alert;

import java.time.Duration;
import java.time.Instant;
import org.hingeline.alert.Transition.Effect;
import org.jspecify.annotations.Nullable;

/** The life of an alert as one pure function; states and arrows are drawn in the package documentation. */
public final class AlertMachine {
    private AlertMachine() {}

    /**
     * @param freshFor how long a value speaks for the present; an older one never raises
     * @param now the present. A value lets a delay run out only up to its own time, because the value after it may be
     *     waiting in the same batch; a tick lets it run out up to now. So whoever has fed in all values that have come
     *     sends a tick after them.
     */
    public static Transition next(Limit limit, Duration freshFor, AlertState state, Event event, Instant now) {
        if (event instanceof Event.Observed observed) {
            return observe(limit, freshFor, state, observed.observation(), now);
        }
        if (event instanceof Event.Tick) {
            return tick(limit, freshFor, state, now);
        }
        if (event instanceof Event.Acknowledged) {
            return acknowledge(state);
        }
        return retire(state);
    }

    private static Transition observe(Limit limit, Duration freshFor, AlertState state, Observation seen, Instant now) {
        Observation latest = state.latest();
        if (latest != null && !seen.at().isAfter(latest.at())) {
            return nothing(state);
        }
        return settle(limit, judged(limit, state, seen), fresh(seen, freshFor, now), seen.at());
    }

    private static Transition tick(Limit limit, Duration freshFor, AlertState state, Instant now) {
        Observation latest = state.latest();
        if (latest == null) {
            return nothing(state);
        }
        boolean fresh = fresh(latest, freshFor, now);
        // while values keep coming the last one holds until now; after that it only vouches for its own time
        Instant known = fresh && now.isAfter(latest.at()) ? now : latest.at();
        // judged again, because the limit may have been changed since the value came
        return settle(limit, judged(limit, state, latest), fresh, known);
    }

    /** The state with this as its latest observation, and the runs out and back that it continues, begins or ends. */
    private static AlertState judged(Limit limit, AlertState state, Observation seen) {
        boolean out = limit.side().out(seen.value(), limit.threshold());
        boolean back = limit.side().back(seen.value(), limit.threshold(), limit.deadband());
        Instant outSince = out ? orElse(state.outSince(), seen.at()) : null;
        Instant backSince = back && stands(state.phase()) ? orElse(state.backSince(), seen.at()) : null;
        return new AlertState(state.phase(), outSince, backSince, seen);
    }

    private static boolean fresh(Observation latest, Duration freshFor, Instant now) {
        return !latest.at().plus(freshFor).isBefore(now);
    }

    /** Lets the delays run out that have run out by the time up to which the water is known. */
    private static Transition settle(Limit limit, AlertState state, boolean fresh, Instant known) {
        if (stands(state.phase())) {
            if (!ranOut(state.backSince(), limit.offDelay(), known)) {
                return nothing(state);
            }
            return state.phase() == Phase.ACKNOWLEDGED
                    ? new Transition(rested(state, Phase.NORMAL), Effect.CLOSE)
                    : new Transition(rested(state, Phase.RETURNED_UNACKNOWLEDGED), Effect.RETURN);
        }
        if (!fresh || !ranOut(state.outSince(), limit.onDelay(), known)) {
            return nothing(state);
        }
        return new Transition(
                state.in(Phase.UNACKNOWLEDGED), state.phase() == Phase.NORMAL ? Effect.RAISE : Effect.RAISE_AGAIN);
    }

    private static Transition acknowledge(AlertState state) {
        return switch (state.phase()) {
            case UNACKNOWLEDGED -> new Transition(state.in(Phase.ACKNOWLEDGED), Effect.ACKNOWLEDGE);
            case RETURNED_UNACKNOWLEDGED -> new Transition(rested(state, Phase.NORMAL), Effect.CLOSE);
            case NORMAL, ACKNOWLEDGED -> nothing(state);
        };
    }

    private static Transition retire(AlertState state) {
        return new Transition(AlertState.INITIAL, state.phase().open() ? Effect.CLOSE : Effect.NOTHING);
    }

    private static boolean stands(Phase phase) {
        return phase == Phase.UNACKNOWLEDGED || phase == Phase.ACKNOWLEDGED;
    }

    private static boolean ranOut(@Nullable Instant since, Duration delay, Instant known) {
        return since != null && !since.plus(delay).isAfter(known);
    }

    private static AlertState rested(AlertState state, Phase phase) {
        return new AlertState(phase, state.outSince(), null, state.latest());
    }

    private static Transition nothing(AlertState state) {
        return new Transition(state, Effect.NOTHING);
    }

    private static Instant orElse(@Nullable Instant first, Instant second) {
        return first != null ? first : second;
    }
}
