package org.hingeline.monitor;

import java.time.Instant;
import org.hingeline.alert.AlertMachine;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Event;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Side;
import org.hingeline.alert.Transition;
import org.hingeline.monitor.LimitBook.Watched;
import org.jspecify.annotations.Nullable;

/** What becomes of an alert, and of what is remembered of a limit, when the limit changes or goes. */
final class LimitChange {
    private LimitChange() {}

    /** Ends the alert, if one is open, and forgets everything. */
    static void end(Books books, Watched watched, Instant now) {
        end(books, watched, AlertState.INITIAL, now);
    }

    private static void end(Books books, Watched watched, AlertState after, Instant now) {
        Transition transition =
                AlertMachine.next(watched.limit(), AlertWatch.NO_MATTER, watched.state(), new Event.Retired(), now);
        Long alertId = watched.alertId();
        if (transition.effect() == Transition.Effect.CLOSE && alertId != null) {
            books.alerts().close(alertId, now);
        }
        books.limits().saveState(watched.limit().id(), after, null);
    }

    /**
     * Keeps of the memory what is still true. On another quantity nothing is; on the other side of the threshold only the
     * newest value. An alert says what it was raised for, so in both cases it ends with what it was raised for. Where only
     * numbers change, the alert stands or ends by the new ones; a run that was counted against a wider limit is not
     * counted against a narrower one.
     */
    static void carryOver(Books books, Watched before, Limit after, Instant now) {
        Limit old = before.limit();
        AlertState state = before.state();
        if (old.quantity() != after.quantity()) {
            end(books, before, now);
        } else if (old.side() != after.side()) {
            end(books, before, new AlertState(Phase.NORMAL, null, null, state.latest()), now);
        } else {
            double wider = after.side() == Side.BELOW
                    ? after.threshold() - old.threshold()
                    : old.threshold() - after.threshold();
            double backLater = wider + after.deadband() - old.deadband();
            @Nullable Instant outSince = wider >= 0 ? state.outSince() : null;
            @Nullable Instant backSince = backLater <= 0 ? state.backSince() : null;
            books.limits()
                    .saveState(
                            old.id(),
                            new AlertState(state.phase(), outSince, backSince, state.latest()),
                            before.alertId());
        }
    }
}
