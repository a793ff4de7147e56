package org.hingeline.kill;

import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * Reads every table by each of its indexes and by scan, and makes sure that the engine really used the one and the
 * other. Shares no code with the service's own check.
 */
final class IndexComparison {
    private record Index(String schema, String table, String name, List<String> columns) {}

    private record Rows(long count, long xor, long sum) {}

    private IndexComparison() {}

    static List<String> faults(Connection connection) throws SQLException {
        Map<String, Index> indexes = new LinkedHashMap<>();
        try (Statement statement = connection.createStatement();
                ResultSet row = statement.executeQuery("""
                        SELECT table_schema, table_name, index_name, column_name
                        FROM information_schema.index_columns WHERE table_schema = 'public'
                        ORDER BY table_name, index_name, ordinal_position
                        """)) {
            while (row.next()) {
                Index index = new Index(row.getString(1), row.getString(2), row.getString(3), new ArrayList<>());
                indexes.computeIfAbsent(index.table() + "." + index.name(), key -> index)
                        .columns()
                        .add(row.getString(4));
            }
        }
        List<String> faults = new ArrayList<>();
        if (indexes.size() < 20) {
            faults.add("only " + indexes.size() + " indexes are there");
        }
        for (Index index : indexes.values()) {
            String columns = "\"" + String.join("\", \"", index.columns()) + "\"";
            String select = "SELECT _rowid_, " + columns + " FROM \"" + index.table() + "\" USE INDEX ";
            try {
                Rows scanned = rows(connection, select + "()", ".tableScan", index);
                Rows indexed = rows(
                        connection, select + "(\"" + index.name() + "\") ORDER BY " + columns, index.name(), index);
                if (!scanned.equals(indexed)) {
                    faults.add("table " + index.table() + ": " + scanned.count() + " rows by scan, " + indexed.count()
                            + " by " + index.name() + (scanned.count() == indexed.count() ? ", of other content" : ""));
                }
            } catch (SQLException e) {
                faults.add("table " + index.table() + ", " + index.name() + ": " + e.getMessage());
            }
        }
        return faults;
    }

    private static Rows rows(Connection connection, String sql, String path, Index index) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            try (ResultSet plan = statement.executeQuery("EXPLAIN " + sql)) {
                plan.next();
                if (!plan.getString(1).contains(path)) {
                    throw new SQLException("not read by " + path + ": " + plan.getString(1));
                }
            }
            statement.setFetchSize(1000);
            try (ResultSet row = statement.executeQuery(sql)) {
                long count = 0;
                long xor = 0;
                long sum = 0;
                while (row.next()) {
                    long hash = row.getLong(1);
                    for (int i = 2; i <= index.columns().size() + 1; i++) {
                        hash = Long.rotateLeft(hash * 0x100000001B3L, 17) ^ Objects.hashCode(row.getObject(i));
                    }
                    count++;
                    xor ^= hash;
                    sum += hash;
                }
                return new Rows(count, xor, sum);
            }
        }
    }
}
