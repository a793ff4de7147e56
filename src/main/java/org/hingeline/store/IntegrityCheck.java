package org.hingeline.store;

import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * Compares every table of the embedded database with each of its indexes: the rows an index knows, in number and
 * content, must be the rows a scan of the table finds.
 */
final class IntegrityCheck {

    /** Rows and an order-independent sum over their contents. */
    private record Digest(long rows, long sum) {}

    private record Index(String table, String name, List<String> columns) {}

    private IntegrityCheck() {}

    /** In words, one for each table and index that disagree or cannot be read; none when all is sound. */
    static List<String> faults(Connection connection) throws SQLException {
        List<String> faults = new ArrayList<>();
        for (Index index : indexes(connection)) {
            String columns = "\"" + String.join("\", \"", index.columns()) + "\"";
            try {
                // an empty list of indexes makes the engine scan the table itself
                Digest byScan =
                        digest(connection, "SELECT " + columns + " FROM \"" + index.table() + "\" USE INDEX ()", index);
                Digest byIndex = digest(
                        connection,
                        "SELECT " + columns + " FROM \"" + index.table() + "\" USE INDEX (\"" + index.name()
                                + "\") ORDER BY " + columns,
                        index);
                if (!byScan.equals(byIndex)) {
                    faults.add("table " + index.table() + " has " + byScan.rows() + " rows, its index " + index.name()
                            + " " + byIndex.rows() + (byScan.rows() == byIndex.rows() ? " of other content" : ""));
                }
            } catch (SQLException e) {
                faults.add("table " + index.table() + ", index " + index.name() + " cannot be read: " + e.getMessage());
            }
        }
        return faults;
    }

    private static List<Index> indexes(Connection connection) throws SQLException {
        Map<String, Index> indexes = new LinkedHashMap<>();
        String sql = """
                SELECT i.table_name, i.index_name, c.column_name
                FROM information_schema.indexes i
                JOIN information_schema.index_columns c
                    ON c.index_schema = i.index_schema AND c.index_name = i.index_name
                WHERE i.table_schema = 'public'
                ORDER BY i.table_name, i.index_name, c.ordinal_position
                """;
        try (PreparedStatement statement = connection.prepareStatement(sql);
                ResultSet rows = statement.executeQuery()) {
            while (rows.next()) {
                String table = rows.getString(1);
                String name = rows.getString(2);
                indexes.computeIfAbsent(table + "." + name, key -> new Index(table, name, new ArrayList<>()))
                        .columns()
                        .add(rows.getString(3));
            }
        }
        return List.copyOf(indexes.values());
    }

    private static Digest digest(Connection connection, String sql, Index index) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            statement.setFetchSize(1000);
            try (ResultSet rows = statement.executeQuery(sql)) {
                long count = 0;
                long sum = 0;
                int width = index.columns().size();
                while (rows.next()) {
                    long hash = 1;
                    for (int i = 1; i <= width; i++) {
                        hash = hash * 1_000_003 + Objects.hashCode(rows.getObject(i));
                    }
                    count++;
                    sum += hash * 0x9E3779B97F4A7C15L;
                }
                return new Digest(count, sum);
            }
        }
    }
}
