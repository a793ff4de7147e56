package org.hingeline.monitor;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.jspecify.annotations.Nullable;

/** Limits, what the alert machine remembers of each, and the alerts. */
public interface AlertBook {

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
