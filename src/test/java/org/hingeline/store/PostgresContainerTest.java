package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;

import java.sql.DriverManager;
import java.sql.SQLException;
import org.hingeline.store.PostgresContainer.Database;
import org.junit.jupiter.api.Test;

class PostgresContainerTest {
    @Test
    void a_fresh_database_answers_and_is_a_postgresql() throws SQLException {
        Database database = PostgresContainer.freshDatabase();

        assertThat(ask(database, "SELECT 1")).isEqualTo("1");
        assertThat(ask(database, "SELECT version()")).startsWith("PostgreSQL ");
    }

    @Test
    void two_fresh_databases_do_not_see_each_other() throws SQLException {
        Database one = PostgresContainer.freshDatabase();
        Database other = PostgresContainer.freshDatabase();

        ask(one, "CREATE TABLE tide (level_m numeric)");

        assertThat(ask(one, "SELECT count(*) FROM pg_tables WHERE tablename = 'tide'"))
                .isEqualTo("1");
        assertThat(ask(other, "SELECT count(*) FROM pg_tables WHERE tablename = 'tide'"))
                .isEqualTo("0");
    }

    private static String ask(Database database, String sql) throws SQLException {
        try (var connection = DriverManager.getConnection(database.jdbcUrl(), database.user(), database.password());
                var statement = connection.createStatement()) {
            if (!statement.execute(sql)) {
                return "";
            }
            try (var rows = statement.getResultSet()) {
                rows.next();
                return rows.getString(1);
            }
        }
    }
}
