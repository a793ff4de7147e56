package org.hingeline.store;

import java.math.BigDecimal;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;

/** SQL beside the tables' own, to see what really stands in a column. */
final class RawSql {
    private RawSql() {}

    /** The first value of the first row; a whole number without its decimals. */
    static String ask(Database store, String sql) throws SQLException {
        try (Connection connection = store.schedulerDataSource().getConnection();
                Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery(sql)) {
            rows.next();
            Object value = rows.getObject(1);
            return value instanceof Number number
                    ? new BigDecimal(number.toString()).stripTrailingZeros().toPlainString()
                    : String.valueOf(value);
        }
    }

    static void run(Database store, String sql) throws SQLException {
        try (Connection connection = store.schedulerDataSource().getConnection();
                Statement statement = connection.createStatement()) {
            statement.execute(sql);
        }
    }
}
