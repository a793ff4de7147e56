package org.hingeline;

import java.nio.file.Path;
import java.time.InstantSource;
import org.hingeline.config.PasswordFile;
import org.hingeline.config.Settings;
import org.hingeline.store.Database;
import org.hingeline.store.EmbeddedDatabase;
import org.hingeline.store.PostgresDatabase;
import org.hingeline.store.Recovery;
import org.jspecify.annotations.Nullable;

/** Opens the database the settings name. */
final class Databases {
    private Databases() {}

    /**
     * An open database.
     *
     * @param report which backup took the place of a database damaged by a crash; absent when nothing was damaged
     */
    record Opened(Database database, @Nullable String report) {}

    /** For the service: falls back on a backup when a crash has damaged the embedded database. */
    static Opened openToServe(Settings settings, InstantSource clock) {
        if (settings.database().kind() == Settings.DatabaseKind.EMBEDDED) {
            Recovery.Recovered recovered = Recovery.open(settings.databaseFolder(), settings.backupsFolder(), clock);
            return new Opened(recovered.database(), recovered.report());
        }
        return new Opened(open(settings), null);
    }

    /** For a command, which leaves a damaged database to the service. */
    static Database open(Settings settings) {
        Settings.Database wanted = settings.database();
        if (wanted.kind() == Settings.DatabaseKind.EMBEDDED) {
            return EmbeddedDatabase.open(settings.databaseFolder());
        }
        Path passwordFile = wanted.passwordFile();
        return PostgresDatabase.open(
                required("database.url", wanted.url()),
                wanted.user() == null ? "" : wanted.user(),
                passwordFile == null ? "" : PasswordFile.read(passwordFile));
    }

    private static String required(String key, @Nullable String value) {
        if (value == null) {
            throw new CommandFailure(key + " is missing in the settings");
        }
        return value;
    }
}
