package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.Role;

/** Columns that stand in several tables and hold a code. */
final class Columns {
    private Columns() {}

    static Quantity quantity(ResultSet row) throws SQLException {
        return Quantity.ofCode(row.getString("quantity")).orElseThrow();
    }

    static Side side(ResultSet row) throws SQLException {
        return row.getString("side").equals(Side.BELOW.code()) ? Side.BELOW : Side.ABOVE;
    }

    static Priority priority(ResultSet row) throws SQLException {
        return Priority.ofCode(row.getString("priority")).orElseThrow();
    }

    static Role role(ResultSet row) throws SQLException {
        return Role.ofCode(row.getString("role")).orElseThrow();
    }
}
