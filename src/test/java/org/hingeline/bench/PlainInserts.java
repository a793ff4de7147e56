package org.hingeline.bench;

import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.PreparedStatement;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;

/**
 * What the service is measured against: batch inserts into a table of the same shape on the same engine, as durable, by
 * one connection and nothing else.
 */
final class PlainInserts implements AutoCloseable {
    private final Connection connection;

    PlainInserts(Path folder) throws SQLException {
        String url = "jdbc:h2:async:" + folder.toAbsolutePath().resolve("plain")
                + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH"
                + ";WRITE_DELAY=0;DB_CLOSE_ON_EXIT=FALSE;MAX_COMPACT_TIME=5000;QUERY_CACHE_SIZE=64";
        connection = DriverManager.getConnection(url, "sa", "");
        try (Statement statement = connection.createStatement()) {
            statement.execute("CREATE TABLE sensor (id BIGINT PRIMARY KEY)");
            for (long id = 1; id <= (long) BenchPlace.POINTS * BenchPlace.QUANTITIES.size(); id++) {
                statement.execute("INSERT INTO sensor VALUES (" + id + ")");
            }
            statement.execute("""
                    CREATE TABLE reading (
                        sensor_id      BIGINT NOT NULL REFERENCES sensor,
                        at             TIMESTAMP WITH TIME ZONE NOT NULL,
                        reading_value  DOUBLE PRECISION NOT NULL,
                        flag           SMALLINT NOT NULL,
                        gateway_key_id BIGINT NOT NULL,
                        received_at    TIMESTAMP WITH TIME ZONE NOT NULL,
                        PRIMARY KEY (sensor_id, at)
                    )
                    """);
        }
        connection.setAutoCommit(false);
    }

    void insert(List<Row> rows) throws SQLException {
        OffsetDateTime received = Instant.now().atOffset(ZoneOffset.UTC);
        try (PreparedStatement insert = connection.prepareStatement("INSERT INTO reading VALUES (?, ?, ?, ?, ?, ?)")) {
            for (Row row : rows) {
                insert.setLong(1, row.sensor());
                insert.setObject(2, row.at().atOffset(ZoneOffset.UTC));
                insert.setDouble(3, row.value());
                insert.setInt(4, 1);
                insert.setLong(5, 1);
                insert.setObject(6, received);
                insert.addBatch();
            }
            insert.executeBatch();
        }
        connection.commit();
        try (Statement statement = connection.createStatement()) {
            statement.execute("CHECKPOINT SYNC");
        }
    }

    @Override
    public void close() throws SQLException {
        connection.close();
    }
}
