package org.hingeline.store;

import java.io.PrintWriter;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Proxy;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.SQLFeatureNotSupportedException;
import java.util.logging.Logger;
import javax.sql.DataSource;
import org.jspecify.annotations.Nullable;

/**
 * Lends the write lane as a {@link DataSource} to a library that brings its own SQL: a connection holds the lane from
 * {@code getConnection} to {@code close}, and what it committed is on disk when {@code close} returns.
 */
final class LaneDataSource implements DataSource {
    private final WriteLane lane;

    LaneDataSource(WriteLane lane) {
        this.lane = lane;
    }

    @Override
    public Connection getConnection() throws SQLException {
        Connection real = lane.acquire();
        try {
            real.setAutoCommit(true);
        } catch (SQLException | RuntimeException e) {
            lane.release();
            throw e;
        }
        boolean[] closed = {false};
        return (Connection) Proxy.newProxyInstance(
                LaneDataSource.class.getClassLoader(), new Class<?>[] {Connection.class}, (proxy, method, args) -> {
                    if (method.getName().equals("close")) {
                        if (!closed[0]) {
                            closed[0] = true;
                            giveBack(real);
                        }
                        return null;
                    }
                    if (method.getName().equals("isClosed")) {
                        return closed[0];
                    }
                    if (closed[0] && method.getDeclaringClass() != Object.class) {
                        throw new SQLException("this connection has given the write lane back");
                    }
                    try {
                        return method.invoke(real, args);
                    } catch (InvocationTargetException e) {
                        throw e.getCause() != null ? e.getCause() : e;
                    }
                });
    }

    private void giveBack(Connection real) throws SQLException {
        try {
            if (!real.getAutoCommit()) {
                real.rollback(); // what was to stay was committed by its owner
            }
            real.setAutoCommit(false);
            lane.checkpoint();
        } finally {
            lane.release();
        }
    }

    @Override
    public Connection getConnection(String username, String password) throws SQLException {
        return getConnection();
    }

    @Override
    public @Nullable PrintWriter getLogWriter() {
        return null;
    }

    @Override
    public void setLogWriter(PrintWriter out) {
        // drivers' logs are not wanted here
    }

    @Override
    public void setLoginTimeout(int seconds) {
        // the lane is already open
    }

    @Override
    public int getLoginTimeout() {
        return 0;
    }

    @Override
    public Logger getParentLogger() throws SQLFeatureNotSupportedException {
        throw new SQLFeatureNotSupportedException();
    }

    @Override
    public <T> T unwrap(Class<T> type) throws SQLException {
        throw new SQLException("not a wrapper for " + type.getName());
    }

    @Override
    public boolean isWrapperFor(Class<?> type) {
        return false;
    }
}
