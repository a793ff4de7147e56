package org.hingeline;

import org.hingeline.config.PasswordFile;
import org.hingeline.config.Settings;
import org.hingeline.store.Database;
import org.hingeline.store.EmbeddedDatabase;
import org.hingeline.store.PostgresDatabase;
import org.jspecify.annotations.Nullable;

/** Opens the database the settings name. */
final class Databases {
    private Databases() {}

    static Database open(Settings settings) {
        Settings.Database wanted = settings.database();
        if (wanted.kind() == Settings.DatabaseKind.EMBEDDED) {
            return EmbeddedDatabase.open(settings.databaseFolder());
        }
        java.nio.file.@Nullable Path passwordFile = wanted.passwordFile();
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
