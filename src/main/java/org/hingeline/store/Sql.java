package org.hingeline.store;

import java.lang.reflect.Type;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.Jdbi;
import org.jdbi.v3.core.argument.Argument;
import org.jdbi.v3.core.argument.ArgumentFactory;
import org.jdbi.v3.core.config.ConfigRegistry;
import org.jdbi.v3.core.statement.Update;
import org.jspecify.annotations.Nullable;

/** The few conversions between Java and SQL values that the tables share. Times go in and out as UTC. */
final class Sql {
    private Sql() {}

    /** Teaches Jdbi to bind an {@link Instant} as a time with offset. */
    static Jdbi configure(Jdbi jdbi) {
        jdbi.registerArgument((ArgumentFactory) Sql::instantArgument);
        return jdbi;
    }

    private static Optional<Argument> instantArgument(Type type, Object value, ConfigRegistry config) {
        if (!type.equals(Instant.class)) {
            return Optional.empty();
        }
        return Optional.of((position, statement, context) -> setInstant(statement, position, (Instant) value));
    }

    static void setInstant(PreparedStatement statement, int position, @Nullable Instant value) throws SQLException {
        if (value == null) {
            statement.setNull(position, Types.TIMESTAMP_WITH_TIMEZONE);
        } else {
            statement.setObject(position, value.atOffset(ZoneOffset.UTC));
        }
    }

    /** What a row becomes. */
    interface RowReader<T> {
        T read(ResultSet row) throws SQLException;
    }

    /**
     * Runs a query in plain JDBC: on the hot path, where a batch of readings asks some hundred small questions, naming
     * parameters costs more than the answer.
     *
     * @param parameters whole numbers and {@link Instant}s
     */
    static <T> List<T> list(Handle handle, String sql, RowReader<T> reader, Object... parameters) {
        try (PreparedStatement query = handle.getConnection().prepareStatement(sql)) {
            for (int i = 0; i < parameters.length; i++) {
                if (parameters[i] instanceof Instant time) {
                    setInstant(query, i + 1, time);
                } else {
                    query.setObject(i + 1, parameters[i]);
                }
            }
            List<T> found = new ArrayList<>();
            try (ResultSet row = query.executeQuery()) {
                while (row.next()) {
                    found.add(reader.read(row));
                }
            }
            return found;
        } catch (SQLException e) {
            throw new StoreException("a query failed: " + e.getMessage(), e);
        }
    }

    static @Nullable Instant instantOrNull(ResultSet row, String column) throws SQLException {
        OffsetDateTime time = row.getObject(column, OffsetDateTime.class);
        return time == null ? null : time.toInstant();
    }

    static Instant instant(ResultSet row, String column) throws SQLException {
        Instant time = instantOrNull(row, column);
        if (time == null) {
            throw new SQLException("column " + column + " is unexpectedly null");
        }
        return time;
    }

    static Instant instant(ResultSet row, int column) throws SQLException {
        return row.getObject(column, OffsetDateTime.class).toInstant();
    }

    static @Nullable Double doubleOrNull(ResultSet row, String column) throws SQLException {
        double value = row.getDouble(column);
        return row.wasNull() ? null : value;
    }

    static @Nullable Long longOrNull(ResultSet row, String column) throws SQLException {
        long value = row.getLong(column);
        return row.wasNull() ? null : value;
    }

    /** Ids as a list for IN; they are numbers, so nothing can be smuggled in. */
    static String ids(Collection<Long> ids) {
        return ids.stream().distinct().sorted().map(String::valueOf).collect(Collectors.joining(", "));
    }

    /** The id that the database gave the row just inserted. */
    static long insertedId(Update update) {
        return update.executeAndReturnGeneratedKeys("id").mapTo(Long.class).one();
    }

    /** @throws StoreException when not exactly one row was touched */
    static void one(int updated, String what) {
        if (updated != 1) {
            throw new StoreException(what + ": " + updated + " rows changed where one was expected");
        }
    }

    /** Shortens a text to what its column holds. */
    static String fit(String text, int most) {
        return text.length() <= most ? text : text.substring(0, most - 1) + "\u2026";
    }
}
