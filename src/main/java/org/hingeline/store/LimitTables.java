package org.hingeline.store;

import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Duration;
import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Observation;
import org.hingeline.alert.Phase;
import org.hingeline.monitor.LimitBook;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.statement.Update;
import org.jspecify.annotations.Nullable;

final class LimitTables implements LimitBook {
    private final Handle handle;

    LimitTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public List<Limit> limits(long pointId) {
        return handle.createQuery(
                        "SELECT * FROM limit_rule WHERE point_id = :point AND retired_at IS NULL ORDER BY name")
                .bind("point", pointId)
                .map((row, context) -> limit(row))
                .list();
    }

    @Override
    public Optional<Limit> limit(long pointId, String name) {
        return handle.createQuery(
                        "SELECT * FROM limit_rule WHERE point_id = :point AND name = :name AND retired_at IS NULL")
                .bind("point", pointId)
                .bind("name", name)
                .map((row, context) -> limit(row))
                .findOne();
    }

    @Override
    public Optional<Limit> retiredLimit(long pointId, String name) {
        return handle.createQuery(
                        "SELECT * FROM limit_rule WHERE point_id = :point AND name = :name AND retired_at IS NOT NULL")
                .bind("point", pointId)
                .bind("name", name)
                .map((row, context) -> limit(row))
                .findOne();
    }

    @Override
    public Limit saveLimit(Limit limit, Instant now) {
        int updated = bound(limit, """
                        UPDATE limit_rule
                        SET quantity = :quantity, side = :side, threshold = :threshold, deadband = :deadband,
                            on_delay_s = :onDelayS, off_delay_s = :offDelayS, priority = :priority, action = :action,
                            created_at = CASE WHEN retired_at IS NULL AND quantity = :quantity
                                              THEN created_at ELSE CAST(:now AS TIMESTAMP WITH TIME ZONE) END,
                            retired_at = NULL
                        WHERE point_id = :point AND name = :name
                        """).bind("now", now).execute();
        if (updated == 0) {
            long id = Sql.insertedId(bound(limit, """
                            INSERT INTO limit_rule
                                (point_id, name, quantity, side, threshold, deadband, on_delay_s, off_delay_s,
                                 priority, action, created_at)
                            VALUES (:point, :name, :quantity, :side, :threshold, :deadband, :onDelayS, :offDelayS,
                                    :priority, :action, :now)
                            """).bind("now", now));
            handle.createUpdate("INSERT INTO alert_state (limit_id, phase) VALUES (:limit, :phase)")
                    .bind("limit", id)
                    .bind("phase", Phase.NORMAL.code())
                    .execute();
        }
        return limit(limit.pointId(), limit.name()).orElseThrow();
    }

    private Update bound(Limit limit, String sql) {
        return handle.createUpdate(sql)
                .bind("point", limit.pointId())
                .bind("name", limit.name())
                .bind("quantity", limit.quantity().code())
                .bind("side", limit.side().code())
                .bind("threshold", limit.threshold())
                .bind("deadband", limit.deadband())
                .bind("onDelayS", limit.onDelay().toSeconds())
                .bind("offDelayS", limit.offDelay().toSeconds())
                .bind("priority", limit.priority().code())
                .bind("action", limit.action());
    }

    @Override
    public void retireLimit(long limitId, Instant now) {
        Sql.one(
                handle.createUpdate("UPDATE limit_rule SET retired_at = :now WHERE id = :id AND retired_at IS NULL")
                        .bind("now", now)
                        .bind("id", limitId)
                        .execute(),
                "taking limit " + limitId + " away");
    }

    @Override
    public List<Watched> watchedForUpdate(Collection<Long> pointIds) {
        if (pointIds.isEmpty()) {
            return List.of();
        }
        return handle.createQuery("""
                        SELECT l.*, s.phase, s.out_since, s.back_since, s.latest_at, s.latest_value,
                               s.latest_uncertainty, s.alert_id
                        FROM alert_state s JOIN limit_rule l ON l.id = s.limit_id
                        WHERE l.point_id IN (<points>) AND l.retired_at IS NULL
                        ORDER BY l.id
                        FOR UPDATE
                        """)
                .define("points", Sql.ids(pointIds))
                .map((row, context) -> watched(row))
                .list();
    }

    @Override
    public Optional<Watched> watchedByAlertForUpdate(long alertId) {
        return handle.createQuery("""
                        SELECT l.*, s.phase, s.out_since, s.back_since, s.latest_at, s.latest_value,
                               s.latest_uncertainty, s.alert_id
                        FROM alert_state s JOIN limit_rule l ON l.id = s.limit_id
                        WHERE s.alert_id = :alert
                        FOR UPDATE
                        """)
                .bind("alert", alertId)
                .map((row, context) -> watched(row))
                .findOne();
    }

    /** Plain JDBC: nearly every reading moves some limit's memory. */
    @Override
    public void saveState(long limitId, AlertState state, @Nullable Long alertId) {
        String sql = """
                UPDATE alert_state
                SET phase = ?, out_since = ?, back_since = ?, latest_at = ?, latest_value = ?, latest_uncertainty = ?,
                    alert_id = ?
                WHERE limit_id = ?
                """;
        Observation latest = state.latest();
        try (PreparedStatement update = handle.getConnection().prepareStatement(sql)) {
            update.setString(1, state.phase().code());
            Sql.setInstant(update, 2, state.outSince());
            Sql.setInstant(update, 3, state.backSince());
            Sql.setInstant(update, 4, latest == null ? null : latest.at());
            update.setObject(5, latest == null ? null : latest.value(), Types.DOUBLE);
            update.setObject(6, latest == null ? null : latest.standardUncertainty(), Types.DOUBLE);
            update.setObject(7, alertId, Types.BIGINT);
            update.setLong(8, limitId);
            Sql.one(update.executeUpdate(), "saving the state of limit " + limitId);
        } catch (SQLException e) {
            throw new StoreException("the state of limit " + limitId + " could not be saved: " + e.getMessage(), e);
        }
    }

    @Override
    public List<Long> pointsWithLimits() {
        return handle.createQuery("SELECT DISTINCT point_id FROM limit_rule WHERE retired_at IS NULL ORDER BY point_id")
                .mapTo(Long.class)
                .list();
    }

    private static Limit limit(ResultSet row) throws SQLException {
        return new Limit(
                row.getLong("id"),
                row.getLong("point_id"),
                row.getString("name"),
                Columns.quantity(row),
                Columns.side(row),
                row.getDouble("threshold"),
                row.getDouble("deadband"),
                Duration.ofSeconds(row.getLong("on_delay_s")),
                Duration.ofSeconds(row.getLong("off_delay_s")),
                Columns.priority(row),
                row.getString("action"));
    }

    private static Watched watched(ResultSet row) throws SQLException {
        Instant latestAt = Sql.instantOrNull(row, "latest_at");
        Observation latest = latestAt == null
                ? null
                : new Observation(latestAt, row.getDouble("latest_value"), row.getDouble("latest_uncertainty"));
        return new Watched(
                limit(row),
                new AlertState(
                        Phase.ofCode(row.getString("phase")),
                        Sql.instantOrNull(row, "out_since"),
                        Sql.instantOrNull(row, "back_since"),
                        latest),
                Sql.longOrNull(row, "alert_id"),
                Sql.instant(row, "created_at"));
    }
}
