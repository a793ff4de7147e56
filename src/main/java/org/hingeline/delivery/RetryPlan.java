package org.hingeline.delivery;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.monitor.OutboxBook.Message;

/**
 * How often and for how long a message is tried.
 *
 * @param pauses after the first, second, … failure; the last one repeats
 * @param giveUpAfter age of a message at which a failure is its last
 * @param perRunMost attempts in one run
 */
public record RetryPlan(List<Duration> pauses, Duration giveUpAfter, int perRunMost) {
    /** A pause is up to this much longer, so that messages which failed together do not all come back together. */
    private static final double JITTER = 0.1;

    public RetryPlan {
        pauses = List.copyOf(pauses);
        if (pauses.isEmpty() || pauses.stream().anyMatch(pause -> pause.isNegative() || pause.isZero())) {
            throw new IllegalArgumentException("pauses " + pauses + " must be one or more, each above 0");
        }
        if (perRunMost < 1) {
            throw new IllegalArgumentException("perRunMost " + perRunMost + " must be 1 or more");
        }
    }

    /** @param chance 0 to 1 */
    Instant nextAttempt(Message failed, Instant now, double chance) {
        Duration pause = pauses.get(Math.min(failed.attempts(), pauses.size() - 1));
        return now.plusMillis(Math.round(pause.toMillis() * (1 + JITTER * chance)));
    }

    boolean isOver(Message failed, Instant now) {
        return !failed.createdAt().plus(giveUpAfter).isAfter(now);
    }
}
