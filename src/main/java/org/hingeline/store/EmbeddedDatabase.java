package org.hingeline.store;

import com.zaxxer.hikari.HikariConfig;
import com.zaxxer.hikari.HikariDataSource;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.List;
import java.util.function.Function;
import javax.sql.DataSource;
import org.hingeline.monitor.Books;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.Jdbi;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * H2 in a folder on this machine: read through a pool, written through one {@link WriteLane}.
 *
 * <p>A file {@code clean-stop} is laid down at an orderly end and taken away at the start. When it is missing, the last
 * run ended in a crash, and every table is compared with its indexes before anything is served.
 */
public final class EmbeddedDatabase implements Database {
    private static final Logger LOG = LoggerFactory.getLogger(EmbeddedDatabase.class);
    private static final String NAME = "hingeline";
    private static final String CLEAN_STOP = "clean-stop";
    private static final int READERS = 8;

    private final Path folder;
    private final WriteLane lane;
    private final HikariDataSource readers;
    private final Jdbi readJdbi;
    private final Jdbi writeJdbi;

    private EmbeddedDatabase(Path folder, WriteLane lane, HikariDataSource readers) {
        this.folder = folder;
        this.lane = lane;
        this.readers = readers;
        this.readJdbi = Sql.configure(Jdbi.create(readers));
        this.writeJdbi = Sql.configure(Jdbi.create(() -> {
            throw new SQLException("the write lane hands out its connection itself");
        }));
    }

    /**
     * Opens the database in a folder, making it if need be, checking it if the last run did not end well, and bringing
     * its tables up to date.
     *
     * @throws StoreException when it cannot be opened or is damaged
     */
    public static EmbeddedDatabase open(Path folder) {
        try {
            Files.createDirectories(folder);
            boolean existed = Files.exists(databaseFile(folder));
            boolean endedWell = Files.deleteIfExists(folder.resolve(CLEAN_STOP));
            Connection connection = DriverManager.getConnection(url(folder), "sa", "");
            if (existed && !endedWell) {
                checkAfterCrash(connection);
            }
            Migrations.run(url(folder), "sa", "");
            WriteLane lane = new WriteLane(connection);
            lane.transaction(same -> true); // a checkpoint behind the migrations
            return new EmbeddedDatabase(folder, lane, readers(folder));
        } catch (IOException e) {
            throw new StoreException("the database folder " + folder + " cannot be used: " + e.getMessage(), e);
        } catch (SQLException e) {
            throw new StoreException("the embedded database in " + folder + " cannot be opened: " + e.getMessage(), e);
        }
    }

    /** The database file of a folder. */
    public static Path databaseFile(Path folder) {
        return folder.resolve(NAME + ".mv.db");
    }

    static String url(Path folder) {
        // the engine's own shutdown hook is off: this program closes the database itself, after its writers
        return "jdbc:h2:file:" + folder.toAbsolutePath().resolve(NAME)
                + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH"
                + ";WRITE_DELAY=0;DB_CLOSE_ON_EXIT=FALSE;DB_CLOSE_DELAY=-1;MAX_COMPACT_TIME=5000;QUERY_CACHE_SIZE=64";
    }

    private static void checkAfterCrash(Connection connection) throws SQLException {
        LOG.warn("the last run did not end in an orderly way; comparing every table with its indexes");
        List<String> faults = IntegrityCheck.faults(connection);
        if (!faults.isEmpty()) {
            try (Statement statement = connection.createStatement()) {
                statement.execute("SHUTDOWN IMMEDIATELY");
            }
            throw new DamagedDatabaseException(faults);
        }
        LOG.info("every table agrees with its indexes");
    }

    private static HikariDataSource readers(Path folder) {
        HikariConfig config = new HikariConfig();
        config.setJdbcUrl(url(folder));
        config.setUsername("sa");
        config.setPassword("");
        config.setMaximumPoolSize(READERS);
        config.setMinimumIdle(1);
        config.setPoolName("readers");
        return new HikariDataSource(config);
    }

    @Override
    public <T> T write(Function<Books, T> work) {
        return lane.transaction(connection -> {
            try (Handle handle = writeJdbi.open(connection)) {
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

    /** Writes a consistent copy of the running database to a zip file, in one piece or not at all. */
    public void backUpTo(Path zip) {
        Path part = zip.resolveSibling(zip.getFileName() + ".part");
        Connection connection = lane.acquire();
        try (Statement statement = connection.createStatement()) {
            Files.createDirectories(zip.toAbsolutePath().getParent());
            statement.execute("BACKUP TO '" + part.toAbsolutePath().toString().replace("'", "''") + "'");
            connection.commit();
            Files.move(part, zip, java.nio.file.StandardCopyOption.ATOMIC_MOVE);
        } catch (SQLException | IOException e) {
            throw new StoreException("the backup to " + zip + " failed: " + e.getMessage(), e);
        } finally {
            lane.release();
        }
    }

    /** Compares every table with its indexes; for tests and for the command that checks on demand. */
    public List<String> integrityFaults() {
        try (Connection connection = readers.getConnection()) {
            return IntegrityCheck.faults(connection);
        } catch (SQLException e) {
            throw new StoreException("the check of the tables could not be made: " + e.getMessage(), e);
        }
    }

    @Override
    public void close() {
        try {
            readers.close();
            Connection connection = lane.acquire();
            try (Statement statement = connection.createStatement()) {
                statement.execute("SHUTDOWN");
            } finally {
                lane.release();
            }
            lane.close();
            Files.writeString(folder.resolve(CLEAN_STOP), "the last run ended in an orderly way\n");
        } catch (SQLException | IOException e) {
            throw new StoreException("the embedded database did not close well: " + e.getMessage(), e);
        }
    }
}
