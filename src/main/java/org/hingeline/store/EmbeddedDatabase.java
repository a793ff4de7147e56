package org.hingeline.store;

import com.zaxxer.hikari.HikariConfig;
import com.zaxxer.hikari.HikariDataSource;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Function;
import javax.sql.DataSource;
import org.hingeline.monitor.Books;
import org.jdbi.v3.core.ConnectionFactory;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.Handles;
import org.jdbi.v3.core.Jdbi;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * H2 in a folder on this machine: read through a pool, written through one {@link WriteLane}. After a run that did not
 * end in an orderly way, every table is compared with its indexes before anything is served.
 */
public final class EmbeddedDatabase implements Database {
    private static final Logger LOG = LoggerFactory.getLogger(EmbeddedDatabase.class);
    private static final int READERS = 8;

    private final DatabaseFolder folder;
    private final WriteLane lane;
    private final HikariDataSource readers;
    private final Jdbi readJdbi;
    private final Jdbi writeJdbi;
    private final AtomicBoolean closed = new AtomicBoolean();

    private EmbeddedDatabase(DatabaseFolder folder, WriteLane lane, HikariDataSource readers) {
        this.folder = folder;
        this.lane = lane;
        this.readers = readers;
        this.readJdbi = Sql.configure(Jdbi.create(readers));
        this.writeJdbi = Sql.configure(Jdbi.create(new OnLane(lane)));
        this.writeJdbi.getConfig(Handles.class).setForceEndTransactions(false);
    }

    /**
     * Opens the database in a folder, making it if need be, checking it if the last run did not end well, and bringing
     * its tables up to date.
     *
     * @throws DamagedDatabaseException when the check finds faults, or the file holds no tables though it did before
     * @throws UnreadableDatabaseException when the file is gone or the engine cannot make sense of it
     * @throws DatabaseInUseException when another process has it open
     * @throws StoreException when it cannot be opened for another reason
     */
    public static EmbeddedDatabase open(Path path) {
        DatabaseFolder folder = new DatabaseFolder(path);
        try {
            Files.createDirectories(path);
            boolean existed = Files.exists(folder.file());
            if (!existed && folder.wasMade()) {
                throw new UnreadableDatabaseException("the database file " + folder.file() + " is gone");
            }
            boolean endedWell = folder.takeCleanStop();
            Connection connection = connect(folder, endedWell);
            try {
                check(connection, folder, existed && !endedWell);
                return serving(connection, folder);
            } catch (SQLException | IOException | RuntimeException e) {
                abandon(connection, e);
                if (endedWell) {
                    folder.layCleanStop(); // nothing was served, so the last end is still an orderly one
                }
                throw e;
            }
        } catch (IOException e) {
            throw new StoreException("the database folder " + path + " cannot be used: " + e.getMessage(), e);
        } catch (SQLException e) {
            throw new StoreException("the embedded database in " + path + " cannot be opened: " + e.getMessage(), e);
        }
    }

    /** The database file of a folder. */
    public static Path databaseFile(Path folder) {
        return new DatabaseFolder(folder).file();
    }

    private static Connection connect(DatabaseFolder folder, boolean endedWell) throws IOException {
        try {
            return folder.connect();
        } catch (StoreException e) {
            if (endedWell) {
                folder.layCleanStop(); // nothing ran, so the last end is still an orderly one
            }
            throw e;
        }
    }

    private static void check(Connection connection, DatabaseFolder folder, boolean afterCrash) throws SQLException {
        if (folder.wasMade() && !IntegrityCheck.holdsTables(connection)) {
            throw new DamagedDatabaseException(List.of(folder.file() + " holds no tables, though it did before"));
        }
        if (afterCrash) {
            LOG.warn("the last run did not end in an orderly way; comparing every table with its indexes");
            List<String> faults = IntegrityCheck.faults(connection);
            if (!faults.isEmpty()) {
                throw new DamagedDatabaseException(faults);
            }
            LOG.info("every table agrees with its indexes");
        }
    }

    private static EmbeddedDatabase serving(Connection connection, DatabaseFolder folder)
            throws SQLException, IOException {
        Migrations.run(folder.url(), DatabaseFolder.USER, DatabaseFolder.PASSWORD);
        WriteLane lane = new WriteLane(connection);
        lane.transaction(EmbeddedDatabase::freeTimedWork); // with it a checkpoint behind the migrations
        folder.layMade();
        return new EmbeddedDatabase(folder, lane, readers(folder));
    }

    /**
     * Timed work that the last owner had picked when it died is free again at once: this database has one owner, so
     * nobody else can be at it.
     */
    private static int freeTimedWork(Connection connection) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            return statement.executeUpdate(
                    "UPDATE scheduled_tasks SET picked = FALSE, picked_by = NULL, last_heartbeat = NULL WHERE picked");
        }
    }

    /** Lets the database go without writing anything more to it. */
    private static void abandon(Connection connection, Exception reason) {
        try (connection;
                Statement statement = connection.createStatement()) {
            statement.execute("SHUTDOWN IMMEDIATELY");
        } catch (SQLException e) {
            reason.addSuppressed(e);
        }
    }

    private static HikariDataSource readers(DatabaseFolder folder) {
        HikariConfig config = new HikariConfig();
        config.setJdbcUrl(folder.url());
        config.setUsername(DatabaseFolder.USER);
        config.setPassword(DatabaseFolder.PASSWORD);
        config.setMaximumPoolSize(READERS);
        config.setMinimumIdle(1);
        config.setPoolName("readers");
        return new HikariDataSource(config);
    }

    @Override
    public <T> T write(Function<Books, T> work) {
        return lane.transaction(same -> {
            try (Handle handle = writeJdbi.open()) {
                return work.apply(new JdbiBooks(handle));
            }
        });
    }

    @Override
    public <T> T read(Function<Books, T> work) {
        return readJdbi.withHandle(handle -> work.apply(new JdbiBooks(handle)));
    }

    @Override
    public DataSource schedulerDataSource() {
        return new LaneDataSource(lane);
    }

    @Override
    public void checkAlive() {
        try (Connection connection = readers.getConnection();
                Statement statement = connection.createStatement()) {
            statement.execute("SELECT 1");
        } catch (SQLException e) {
            throw new StoreException("the embedded database does not answer: " + e.getMessage(), e);
        }
    }

    /** The lane's connection, lent to Jdbi within a transaction of the lane; only the lane ends either. */
    private record OnLane(WriteLane lane) implements ConnectionFactory {
        @Override
        public Connection openConnection() {
            return lane.held();
        }

        @Override
        public void closeConnection(Connection connection) {
            // the lane keeps its connection open
        }
    }

    /** Writes a consistent copy of the running database to a zip file, in one piece or not at all. */
    public void backUpTo(Path zip) {
        Path part = zip.resolveSibling(zip.getFileName() + ".part");
        Connection connection = lane.acquire();
        try (Statement statement = connection.createStatement()) {
            Files.createDirectories(zip.toAbsolutePath().getParent());
            statement.execute("BACKUP TO '" + part.toAbsolutePath().toString().replace("'", "''") + "'");
            connection.commit();
            DatabaseFolder.force(part);
            Files.move(part, zip, StandardCopyOption.ATOMIC_MOVE);
        } catch (SQLException | IOException e) {
            throw new StoreException("the backup to " + zip + " failed: " + e.getMessage(), e);
        } finally {
            lane.release();
        }
    }

    /** Compares every table with its indexes, while writers wait; in words, none when all is sound. */
    public List<String> integrityFaults() {
        return lane.transaction(IntegrityCheck::faults);
    }

    /** Waits for the writer at work, then ends; a second call does nothing. */
    @Override
    public void close() {
        if (closed.getAndSet(true)) {
            return;
        }
        try {
            readers.close();
            Connection connection = lane.acquire();
            try (Statement statement = connection.createStatement()) {
                statement.execute("SHUTDOWN");
            } finally {
                lane.release();
            }
            lane.close();
            folder.layCleanStop();
        } catch (SQLException | IOException e) {
            throw new StoreException("the embedded database did not close well: " + e.getMessage(), e);
        }
    }
}
