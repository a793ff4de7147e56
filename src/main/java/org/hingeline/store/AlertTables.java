package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Phase;
import org.hingeline.monitor.AlertBook;
import org.jdbi.v3.core.Handle;
import org.jspecify.annotations.Nullable;

final class AlertTables implements AlertBook {
    private final Handle handle;

    AlertTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public long open(Alert alert) {
        return Sql.insertedId(handle.createUpdate("""
                                INSERT INTO alert
                                    (site_id, point_id, limit_id, limit_name, quantity, side, threshold, priority,
                                     action, phase, since_at, raised_at, alert_value, uncertainty)
                                VALUES (:site, :point, :limit, :name, :quantity, :side, :threshold, :priority,
                                        :action, :phase, :since, :raised, :alertValue, :uncertainty)
                                """)
                .bind("site", alert.siteId())
                .bind("point", alert.pointId())
                .bind("limit", alert.limitId())
                .bind("name", alert.limitName())
                .bind("quantity", alert.quantity().code())
                .bind("side", alert.side().code())
                .bind("threshold", alert.threshold())
                .bind("priority", alert.priority().code())
                .bind("action", alert.action())
                .bind("phase", Phase.UNACKNOWLEDGED.code())
                .bind("since", alert.since())
                .bind("raised", alert.raisedAt())
                .bind("alertValue", alert.value())
                .bind("uncertainty", alert.uncertainty()));
    }

    @Override
    public void reopen(long alertId, Instant since, Instant raisedAt, double value, double uncertainty) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE alert
                                SET phase = 'unacknowledged', since_at = :since, raised_at = :raised,
                                    alert_value = :alertValue, uncertainty = :uncertainty, returned_at = NULL
                                WHERE id = :id AND closed_at IS NULL
                                """)
                        .bind("since", since)
                        .bind("raised", raisedAt)
                        .bind("alertValue", value)
                        .bind("uncertainty", uncertainty)
                        .bind("id", alertId)
                        .execute(),
                "raising alert " + alertId + " again");
    }

    @Override
    public void acknowledge(long alertId, Instant at, String by, @Nullable String note) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE alert
                                SET phase = 'acknowledged', acknowledged_at = :at, acknowledged_by = :by,
                                    acknowledgement_note = :note
                                WHERE id = :id AND closed_at IS NULL
                                """)
                        .bind("at", at)
                        .bind("by", Sql.fit(by, 80))
                        .bind("note", note)
                        .bind("id", alertId)
                        .execute(),
                "acknowledging alert " + alertId);
    }

    @Override
    public void returned(long alertId, Instant at) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE alert SET phase = 'returned-unacknowledged', returned_at = :at
                                WHERE id = :id AND closed_at IS NULL
                                """).bind("at", at).bind("id", alertId).execute(),
                "noting the return of alert " + alertId);
    }

    @Override
    public void close(long alertId, Instant at) {
        Sql.one(handle.createUpdate("""
                                UPDATE alert
                                SET phase = 'normal', returned_at = COALESCE(returned_at, :at), closed_at = :at
                                WHERE id = :id AND closed_at IS NULL
                                """).bind("at", at).bind("id", alertId).execute(), "closing alert " + alertId);
    }

    @Override
    public Optional<Alert> alert(long siteId, long alertId) {
        return handle.createQuery("SELECT * FROM alert WHERE site_id = :site AND id = :id")
                .bind("site", siteId)
                .bind("id", alertId)
                .map((row, context) -> alert(row))
                .findOne();
    }

    @Override
    public List<Alert> openAlerts(long siteId) {
        return handle.createQuery(
                        "SELECT * FROM alert WHERE site_id = :site AND closed_at IS NULL ORDER BY raised_at DESC, id DESC")
                .bind("site", siteId)
                .map((row, context) -> alert(row))
                .list();
    }

    @Override
    public int countOpen() {
        return handle.createQuery("SELECT count(*) FROM alert WHERE closed_at IS NULL")
                .mapTo(Integer.class)
                .one();
    }

    @Override
    public int countSilent() {
        return handle.createQuery("""
                        SELECT count(*) FROM alert
                        WHERE closed_at IS NULL AND quantity = 'silence' AND phase <> 'returned-unacknowledged'
                        """).mapTo(Integer.class).one();
    }

    @Override
    public List<Alert> closedAlerts(long siteId, int most) {
        return handle.createQuery("""
                        SELECT * FROM alert WHERE site_id = :site AND closed_at IS NOT NULL
                        ORDER BY closed_at DESC, id DESC LIMIT :most
                        """)
                .bind("site", siteId)
                .bind("most", most)
                .map((row, context) -> alert(row))
                .list();
    }

    private static Alert alert(ResultSet row) throws SQLException {
        return new Alert(
                row.getLong("id"),
                row.getLong("site_id"),
                row.getLong("point_id"),
                row.getLong("limit_id"),
                row.getString("limit_name"),
                Columns.quantity(row),
                Columns.side(row),
                row.getDouble("threshold"),
                Columns.priority(row),
                row.getString("action"),
                Phase.ofCode(row.getString("phase")),
                Sql.instant(row, "since_at"),
                Sql.instant(row, "raised_at"),
                row.getDouble("alert_value"),
                row.getDouble("uncertainty"),
                Sql.instantOrNull(row, "acknowledged_at"),
                row.getString("acknowledged_by"),
                row.getString("acknowledgement_note"),
                Sql.instantOrNull(row, "returned_at"),
                Sql.instantOrNull(row, "closed_at"));
    }
}
