package org.hingeline.store;

import java.io.EOFException;
import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import org.h2.api.ErrorCode;

/**
 * The folder of an embedded database: its file, and two marks beside it that outlive a crash.
 *
 * <p>{@code clean-stop} is laid down at an orderly end and taken away at the start: when it is missing, the last run
 * ended in a crash. {@code database-made} is laid down once the tables have been made, so that a file that was lost or
 * emptied is not taken for a first start.
 */
record DatabaseFolder(Path path) {
    static final String USER = "sa";
    static final String PASSWORD = "";

    private static final String NAME = "hingeline";
    private static final String CLEAN_STOP = "clean-stop";
    private static final String MADE = "database-made";

    Path file() {
        return path.resolve(NAME + ".mv.db");
    }

    String url() {
        // async: a plain file channel is closed by the engine's side when a thread that uses it is interrupted, and
        //   the database with it; this one outlives an interrupt
        // the engine's own shutdown hook is off: this program closes the database itself, after its writers
        return "jdbc:h2:async:" + path.toAbsolutePath().resolve(NAME)
                + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH"
                + ";WRITE_DELAY=0;DB_CLOSE_ON_EXIT=FALSE;MAX_COMPACT_TIME=5000;QUERY_CACHE_SIZE=64";
    }

    /**
     * Opens a connection, and with the first one the database.
     *
     * @throws DatabaseInUseException when another process has it open
     * @throws UnreadableDatabaseException when the engine cannot make sense of the file
     * @throws StoreException when the file may be sound but could not be opened, as on a full disk
     */
    Connection connect() {
        try {
            return DriverManager.getConnection(url(), USER, PASSWORD);
        } catch (SQLException e) {
            if (e.getErrorCode() == ErrorCode.DATABASE_ALREADY_OPEN_1) {
                throw new DatabaseInUseException("the database in " + path + " is in use by another process", e);
            }
            String message = "the embedded database in " + path + " cannot be opened: " + e.getMessage();
            throw ofTheContent(e) ? new UnreadableDatabaseException(message, e) : new StoreException(message, e);
        }
    }

    /** Whether the failure lies in what the file holds, rather than in the disk, the access or the engine's version. */
    private static boolean ofTheContent(SQLException failure) {
        if (failure.getErrorCode() == ErrorCode.FILE_VERSION_ERROR_1
                || failure.getErrorCode() == ErrorCode.WRONG_USER_OR_PASSWORD) {
            return false;
        }
        for (Throwable cause = failure; cause != null; cause = cause.getCause()) {
            if (cause instanceof IOException && !(cause instanceof EOFException)) {
                return false;
            }
        }
        return true;
    }

    boolean endedWell() {
        return Files.exists(path.resolve(CLEAN_STOP));
    }

    /** Takes the mark of an orderly end away, on disk too; answers whether it was there. */
    boolean takeCleanStop() throws IOException {
        boolean there = Files.deleteIfExists(path.resolve(CLEAN_STOP));
        if (there) {
            force(path);
        }
        return there;
    }

    void layCleanStop() throws IOException {
        Files.writeString(path.resolve(CLEAN_STOP), "the last run ended in an orderly way\n");
    }

    boolean wasMade() {
        return Files.exists(path.resolve(MADE));
    }

    void layMade() throws IOException {
        if (!wasMade()) {
            Files.writeString(
                    path.resolve(MADE), "the tables have been made; to begin anew, remove the whole folder\n");
            force(path);
        }
    }

    /** Puts the content of a file, or the names in a folder, on disk. */
    static void force(Path fileOrFolder) throws IOException {
        try (FileChannel channel = FileChannel.open(fileOrFolder, StandardOpenOption.READ)) {
            channel.force(true);
        }
    }
}
