package org.hingeline.store;

import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.monitor.ReadingBook;
import org.hingeline.quality.Flag;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.statement.PreparedBatch;

/**
 * Readings and refused rows.
 *
 * <p>The order of every query names all columns of the key, or the reverse of all: then the engine walks the index from
 * that end and stops at the limit, instead of sorting everything there is.
 */
final class ReadingTables implements ReadingBook {
    private final Handle handle;

    ReadingTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public List<StoredReading> between(long sensorId, Instant from, Instant to, int most) {
        return Sql.list(handle, """
                SELECT sensor_id, at, reading_value, flag FROM reading
                WHERE sensor_id = ? AND at >= ? AND at <= ? ORDER BY sensor_id, at LIMIT ?
                """, ReadingTables::reading, sensorId, from, to, most);
    }

    @Override
    public Optional<StoredReading> newestBefore(long sensorId, Instant from, Instant before) {
        return Sql.list(handle, """
                SELECT sensor_id, at, reading_value, flag FROM reading
                WHERE sensor_id = ? AND at >= ? AND at < ? AND flag NOT IN (4, 9)
                ORDER BY sensor_id DESC, at DESC LIMIT 1
                """, ReadingTables::reading, sensorId, from, before).stream()
                .findFirst();
    }

    @Override
    public Optional<Instant> firstAfter(long sensorId, Instant after, Instant to) {
        return handle.createQuery("""
                        SELECT at FROM reading
                        WHERE sensor_id = :sensor AND at > :after AND at <= :to AND flag NOT IN (4, 9)
                        ORDER BY sensor_id, at LIMIT 1
                        """)
                .bind("sensor", sensorId)
                .bind("after", after)
                .bind("to", to)
                .map((row, context) -> Sql.instant(row, "at"))
                .findOne();
    }

    @Override
    public Optional<Instant> newestAt(long pointId) {
        return handle
                .createQuery("""
                        SELECT (SELECT r.at FROM reading r WHERE r.sensor_id = s.id
                                ORDER BY r.sensor_id DESC, r.at DESC LIMIT 1) AS newest
                        FROM sensor s WHERE s.point_id = :point
                        """)
                .bind("point", pointId)
                .map((row, context) -> Optional.ofNullable(Sql.instantOrNull(row, "newest")))
                .stream()
                .flatMap(Optional::stream)
                .max(Instant::compareTo);
    }

    /** Plain JDBC: this is the hot path of the whole service. */
    @Override
    public void insert(List<StoredReading> readings, long gatewayKeyId, Instant receivedAt) {
        if (readings.isEmpty()) {
            return;
        }
        String sql = """
                INSERT INTO reading (sensor_id, at, reading_value, flag, gateway_key_id, received_at)
                VALUES (?, ?, ?, ?, ?, ?)
                """;
        try (PreparedStatement insert = handle.getConnection().prepareStatement(sql)) {
            for (StoredReading reading : readings) {
                insert.setLong(1, reading.sensorId());
                Sql.setInstant(insert, 2, reading.at());
                insert.setDouble(3, reading.value());
                insert.setInt(4, reading.flag().code());
                insert.setLong(5, gatewayKeyId);
                Sql.setInstant(insert, 6, receivedAt);
                insert.addBatch();
            }
            insert.executeBatch();
        } catch (SQLException e) {
            throw new StoreException("readings could not be stored: " + e.getMessage(), e);
        }
    }

    @Override
    public void insertRefused(List<RefusedRow> rows) {
        if (rows.isEmpty()) {
            return;
        }
        PreparedBatch batch = handle.prepareBatch("""
                INSERT INTO refused_row (site_id, gateway, received_at, row_index, row_text, detail)
                VALUES (:site, :gateway, :received, :index, :row, :detail)
                """);
        for (RefusedRow row : rows) {
            batch.bind("site", row.siteId())
                    .bind("gateway", row.gateway())
                    .bind("received", row.receivedAt())
                    .bind("index", row.index())
                    .bind("row", Sql.fit(row.row(), 2000))
                    .bind("detail", Sql.fit(row.detail(), 1000))
                    .add();
        }
        batch.execute();
    }

    @Override
    public List<RefusedRow> refused(long siteId, int most) {
        return handle.createQuery("""
                        SELECT * FROM refused_row WHERE site_id = :site ORDER BY received_at DESC, id DESC LIMIT :most
                        """)
                .bind("site", siteId)
                .bind("most", most)
                .map((row, context) -> new RefusedRow(
                        row.getLong("site_id"),
                        row.getString("gateway"),
                        Sql.instant(row, "received_at"),
                        row.getInt("row_index"),
                        row.getString("row_text"),
                        row.getString("detail")))
                .list();
    }

    @Override
    public void removeRefusedBefore(Instant time) {
        handle.createUpdate("DELETE FROM refused_row WHERE received_at < :time")
                .bind("time", time)
                .execute();
    }

    private static StoredReading reading(ResultSet row) throws SQLException {
        return new StoredReading(row.getLong(1), Sql.instant(row, 2), row.getDouble(3), Flag.ofCode(row.getInt(4)));
    }
}
