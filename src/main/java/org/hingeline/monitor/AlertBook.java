package org.hingeline.monitor;

import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.jspecify.annotations.Nullable;

/** Limits, what the alert machine remembers of each, and the alerts. */
public interface AlertBook {

    /**
     * A limit in use and the machine's memory of it.
     *
     * @param createdAt since when its quantity is watched: when the limit was made, put back, or set on another quantity
     */
    record Watched(Limit limit, AlertState state, @Nullable Long alertId, Instant createdAt) {}

    /**
     * An alert. What it says is fixed when it is raised, so that the record stays true when the limit changes.
     *
     * @param since time of the first value out of the limit
     * @param value the value that raised it, canonical unit
     * @param uncertainty its standard uncertainty
     */
    record Alert(
            long id,
            long siteId,
            long pointId,
            long limitId,
            String limitName,
            Quantity quantity,
            Side side,
            double threshold,
            Priority priority,
            String action,
            Phase phase,
            Instant since,
            Instant raisedAt,
            double value,
            double uncertainty,
            @Nullable Instant acknowledgedAt,
            @Nullable String acknowledgedBy,
            @Nullable String acknowledgementNote,
            @Nullable Instant returnedAt,
            @Nullable Instant closedAt) {}

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

    /** Opens an alert; the id in the record is ignored. */
    long open(Alert alert);

    void reopen(long alertId, Instant since, Instant raisedAt, double value, double uncertainty);

    void acknowledge(long alertId, Instant at, String by, @Nullable String note);

    void returned(long alertId, Instant at);

    void close(long alertId, Instant at);

    Optional<Alert> alert(long siteId, long alertId);

    List<Alert> openAlerts(long siteId);

    /** Open alerts of all sites. */
    int countOpen();

    /** Points of all sites with an open alert because nothing usable is heard. */
    int countSilent();

    /** Closed alerts, newest first. */
    List<Alert> closedAlerts(long siteId, int most);
}
