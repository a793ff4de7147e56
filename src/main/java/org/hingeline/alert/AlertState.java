package org.hingeline.alert;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * What the machine remembers of one limit.
 *
 * @param outSince time of the first value of the present run out of the limit, if it is out
 * @param backSince time of the first value of the present run back inside limit and deadband, if an alert stands
 * @param latest the newest observation seen
 */
public record AlertState(
        Phase phase,
        @Nullable Instant outSince,
        @Nullable Instant backSince,
        @Nullable Observation latest) {

    /** Nothing seen yet. */
    public static final AlertState INITIAL = new AlertState(Phase.NORMAL, null, null, null);

    AlertState in(Phase next) {
        return new AlertState(next, outSince, backSince, latest);
    }
}
