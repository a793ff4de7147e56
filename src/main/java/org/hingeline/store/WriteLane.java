package org.hingeline.store;

import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.concurrent.locks.ReentrantLock;

/**
 * The one way to write to the embedded database: one connection, one writer at a time, and after each commit a
 * checkpoint that is on disk before the writer goes on.
 *
 * <p>The engine hands finished chunks to background threads, so that a commit can return before it is written, and
 * several writing connections can leave a table and its index in disagreement after a kill. One lane with a synchronous
 * checkpoint has neither fault; the kill test proves it on every build.
 */
final class WriteLane implements AutoCloseable {

    /** Work on the connection. */
    interface Work<T> {
        T on(Connection connection) throws SQLException;
    }

    private final ReentrantLock lock = new ReentrantLock(true);
    private final Connection connection;

    WriteLane(Connection connection) throws SQLException {
        this.connection = connection;
        connection.setAutoCommit(false);
    }

    /** Runs the work as one transaction; when it returns, the work is on disk. */
    <T> T transaction(Work<T> work) {
        Connection mine = acquire();
        try {
            T result = work.on(mine);
            mine.commit();
            checkpoint();
            return result;
        } catch (SQLException e) {
            rollback(e);
            throw new StoreException("the embedded database refused a write: " + e.getMessage(), e);
        } catch (RuntimeException | Error e) {
            rollback(e);
            throw e;
        } finally {
            release();
        }
    }

    /**
     * Takes the lane until {@link #release}; for callers that bring their own transactions.
     *
     * @throws IllegalStateException when this thread has it already: a transaction within a transaction would commit
     *     the outer one half done
     */
    Connection acquire() {
        if (lock.isHeldByCurrentThread()) {
            throw new IllegalStateException("this thread is writing already; a transaction cannot hold another");
        }
        lock.lock();
        return connection;
    }

    /** The connection, for the holder of the lane. */
    Connection held() {
        if (!lock.isHeldByCurrentThread()) {
            throw new IllegalStateException("only the holder of the write lane may use its connection");
        }
        return connection;
    }

    void release() {
        lock.unlock();
    }

    /** How many writers wait for the lane. */
    int waiting() {
        return lock.getQueueLength();
    }

    /** Puts everything committed on disk. Only for the holder of the lane. */
    void checkpoint() throws SQLException {
        try (Statement statement = connection.createStatement()) {
            statement.execute("CHECKPOINT SYNC");
        }
    }

    private void rollback(Throwable cause) {
        try {
            connection.rollback();
        } catch (SQLException e) {
            cause.addSuppressed(e);
        }
    }

    @Override
    public void close() throws SQLException {
        lock.lock();
        try {
            if (!connection.isClosed()) {
                connection.rollback();
                connection.close();
            }
        } finally {
            lock.unlock();
        }
    }
}
