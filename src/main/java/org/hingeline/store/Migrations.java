package org.hingeline.store;

import org.flywaydb.core.Flyway;
import org.flywaydb.core.api.FlywayException;

/** Brings the tables up to date with the files in {@code migrations/}. */
final class Migrations {
    private Migrations() {}

    static int run(String url, String user, String password) {
        try {
            return Flyway.configure()
                    .dataSource(url, user, password)
                    .locations("classpath:migrations")
                    .load()
                    .migrate()
                    .migrationsExecuted;
        } catch (FlywayException e) {
            throw new StoreException("the tables could not be brought up to date: " + e.getMessage(), e);
        }
    }
}
