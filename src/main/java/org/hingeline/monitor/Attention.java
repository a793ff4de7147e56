package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * For how long this node has looked at the limits without a break.
 *
 * <p>After the service was down, or its machine slept, every point looks silent, although gateways are about to deliver
 * what they kept. So nothing is called silent until the node has watched for a while: the point's longest gap, but never
 * more than {@link #GRACE}, after which a gateway that lives has tried again. The memory is this node's own; losing it
 * costs no more than that delay.
 */
final class Attention {
    static final Duration GRACE = Duration.ofMinutes(5);

    /** Looks come every few seconds; a longer pause than this is a break. */
    private static final Duration BREAK = Duration.ofMinutes(1);

    private @Nullable Instant since;
    private @Nullable Instant last;

    /** Takes note of a look; answers how long there was no break before it. */
    synchronized Duration look(Instant now) {
        Instant begun = since;
        if (begun == null || last == null || now.isBefore(begun) || now.isAfter(last.plus(BREAK))) {
            begun = now;
        }
        since = begun;
        last = now;
        return Duration.between(begun, now);
    }

    /** Whether somebody who watched so long may call a point with this longest gap silent. */
    static boolean suffices(Duration watched, Duration maxGap) {
        return watched.compareTo(maxGap) >= 0 || watched.compareTo(GRACE) >= 0;
    }
}
