package org.hingeline.store;

import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.h2.engine.SessionLocal;
import org.h2.index.Cursor;
import org.h2.index.Index;
import org.h2.jdbc.JdbcConnection;
import org.h2.result.SearchRow;
import org.h2.table.Column;
import org.h2.table.Table;

/**
 * Compares every table of the embedded database with each of its indexes: the rows an index knows, in number, values
 * and place, must be the rows a scan of the table finds.
 *
 * <p>It reads the engine's own trees rather than asking in SQL: the planner takes one of two indexes over the same
 * columns whatever its hints say, and the other would never be looked at.
 */
final class IntegrityCheck {

    /** Rows and an order-independent sum over their contents. */
    private record Digest(long rows, long sum) {}

    private IntegrityCheck() {}

    /** Whether there is any table at all. */
    static boolean holdsTables(Connection connection) throws SQLException {
        return !tables(session(connection)).isEmpty();
    }

    /**
     * In words, one for each table and index that disagree or cannot be read; none when all is sound. Nobody may write
     * meanwhile.
     */
    static List<String> faults(Connection connection) throws SQLException {
        SessionLocal session = session(connection);
        List<String> faults = new ArrayList<>();
        for (Table table : tables(session)) {
            for (Index index : indexes(table)) {
                compare(session, table, index, faults);
            }
        }
        try {
            connection.rollback(); // ends the reading
        } catch (SQLException e) {
            faults.add("the check could not be brought to its end: " + e.getMessage());
        }
        return faults;
    }

    private static void compare(SessionLocal session, Table table, Index index, List<String> faults) {
        try {
            Column[] columns = index.getColumns();
            Digest byScan = digest(session, table.getScanIndex(session), columns);
            Digest byIndex = digest(session, index, columns);
            if (!byScan.equals(byIndex)) {
                faults.add("table " + table.getName() + " has " + byScan.rows() + " rows, its index " + name(index)
                        + " " + byIndex.rows() + (byScan.rows() == byIndex.rows() ? " of other content" : ""));
            }
        } catch (RuntimeException e) {
            // what the engine throws when it cannot make sense of a page is of many kinds
            faults.add("table " + table.getName() + ", index " + name(index) + " cannot be read: " + e.getMessage());
        }
    }

    private static Digest digest(SessionLocal session, Index index, Column[] columns) {
        Cursor cursor = index.find(session, null, null, false);
        long count = 0;
        long sum = 0;
        while (cursor.next()) {
            SearchRow row = cursor.getSearchRow();
            long hash = row.getKey();
            for (Column column : columns) {
                hash = hash * 1_000_003 + row.getValue(column.getColumnId()).hashCode();
            }
            count++;
            sum += hash * 0x9E3779B97F4A7C15L;
        }
        return new Digest(count, sum);
    }

    private static String name(Index index) {
        return Arrays.stream(index.getColumns())
                .map(Column::getName)
                .collect(Collectors.joining(", ", index.getName() + " (", ")"));
    }

    private static SessionLocal session(Connection connection) throws SQLException {
        return (SessionLocal) connection.unwrap(JdbcConnection.class).getSession();
    }

    private static List<Table> tables(SessionLocal session) {
        return List.copyOf(session.getDatabase().getSchema("public").getAllTablesAndViews(session));
    }

    private static List<Index> indexes(Table table) {
        return table.getIndexes().stream()
                .filter(index -> !index.getIndexType().isScan())
                .toList();
    }
}
