package org.hingeline.store;

import com.zaxxer.hikari.HikariConfig;
import com.zaxxer.hikari.HikariDataSource;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.Set;
import java.util.function.Function;
import javax.sql.DataSource;
import org.hingeline.monitor.Books;
import org.jdbi.v3.core.Jdbi;

/** A PostgreSQL server, which several nodes may share. */
public final class PostgresDatabase implements Database {
    private static final int CONNECTIONS = 12;
    private static final int TRIES = 5;

    /** Lost a race against another node: unique violation, serialisation failure, deadlock, lock not had in time. */
    private static final Set<String> RUN_AGAIN = Set.of("23505", "40001", "40P01", "55P03");

    private final HikariDataSource pool;
    private final Jdbi jdbi;

    private PostgresDatabase(HikariDataSource pool) {
        this.pool = pool;
        this.jdbi = Sql.configure(Jdbi.create(pool));
    }

    /**
     * Connects and brings the tables up to date.
     *
     * @throws StoreException when the server cannot be reached or refuses
     */
    public static PostgresDatabase open(String url, String user, String password) {
        HikariConfig config = new HikariConfig();
        config.setJdbcUrl(url);
        config.setUsername(user);
        config.setPassword(password);
        config.setMaximumPoolSize(CONNECTIONS);
        config.setPoolName("postgresql");
        config.addDataSourceProperty("reWriteBatchedInserts", "true");
        // a node that hangs or loses its power in the middle of a transaction must not hold the others for hours
        config.addDataSourceProperty("tcpKeepAlive", "true");
        config.addDataSourceProperty("socketTimeout", "60");
        config.setConnectionInitSql("SET idle_in_transaction_session_timeout = '15s'; SET lock_timeout = '20s'");
        HikariDataSource pool = null;
        try {
            pool = new HikariDataSource(config);
            Migrations.run(url, user, password);
            return new PostgresDatabase(pool);
        } catch (RuntimeException e) {
            if (pool != null) {
                pool.close();
            }
            throw new StoreException("the database at " + url + " cannot be used: " + e.getMessage(), e);
        }
    }

    @Override
    public <T> T write(Function<Books, T> work) {
        for (int attempt = 1; ; attempt++) {
            try {
                return jdbi.inTransaction(handle -> work.apply(new JdbiBooks(handle)));
            } catch (RuntimeException e) {
                if (attempt == TRIES || !lostRace(e)) {
                    throw e;
                }
            }
        }
    }

    private static boolean lostRace(Throwable failure) {
        for (Throwable cause = failure; cause != null; cause = cause.getCause()) {
            if (cause instanceof SQLException sql && RUN_AGAIN.contains(String.valueOf(sql.getSQLState()))) {
                return true;
            }
        }
        return false;
    }

    @Override
    public <T> T read(Function<Books, T> work) {
        return jdbi.withHandle(handle -> work.apply(new JdbiBooks(handle)));
    }

    @Override
    public DataSource schedulerDataSource() {
        return pool;
    }

    @Override
    public void checkAlive() {
        try (Connection connection = pool.getConnection();
                Statement statement = connection.createStatement()) {
            statement.execute("SELECT 1");
        } catch (SQLException e) {
            throw new StoreException("the database does not answer: " + e.getMessage(), e);
        }
    }

    @Override
    public void close() {
        pool.close();
    }
}
