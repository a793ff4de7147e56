package org.hingeline.monitor;

import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Limit;
import org.jspecify.annotations.Nullable;

/** Limits, and what the alert machine remembers of each. */
public interface LimitBook {

    /**
     * A limit in use and the machine's memory of it.
     *
     * @param createdAt since when its quantity is watched: when the limit was made, put back, or set on another quantity
     */
    record Watched(Limit limit, AlertState state, @Nullable Long alertId, Instant createdAt) {}

    /** Limits in use at a point, by name. */
    List<Limit> limits(long pointId);

    Optional<Limit> limit(long pointId, String name);

    /** A limit that was taken away and can be put back. */
    Optional<Limit> retiredLimit(long pointId, String name);

    /** Saves by name within the point, putting a retired one of that name back in use. */
    Limit saveLimit(Limit limit, Instant now);

    void retireLimit(long limitId, Instant now);

    /** Limits in use at the points, their memory locked against other nodes until the transaction ends. */
    List<Watched> watchedForUpdate(Collection<Long> pointIds);

    /** The watch of one limit, locked likewise. */
    Optional<Watched> watchedByAlertForUpdate(long alertId);

    void saveState(long limitId, AlertState state, @Nullable Long alertId);

    /** Points that have a limit in use. */
    List<Long> pointsWithLimits();
}
