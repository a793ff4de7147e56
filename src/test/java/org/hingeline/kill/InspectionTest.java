package org.hingeline.kill;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import org.hingeline.RunningService;
import org.hingeline.store.Damage;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The inspection sees what a kill could do: each fault is made on purpose in a copy of a sound database. */
@Tag("kill")
class InspectionTest {
    @TempDir
    private static Path folder;

    private static final Promises PROMISES = new Promises();
    private static Place place;

    @BeforeAll
    static void make_a_sound_database_with_readings_and_alerts() {
        place = Place.setUp(folder.resolve("data"), 1);
        long now = System.currentTimeMillis();
        List<ReadingRow> rows = place.sensors().stream()
                .flatMap(sensor -> List.of(now - 2000, now - 1000, now).stream().map(at -> ReadingRow.of(sensor, at)))
                .toList();
        try (RunningService service = RunningService.start(place.data(), Clock.systemUTC())) {
            PROMISES.sending("gateway 0", rows);
            assertThat(service.postReadings(ReadingRow.json(rows)).body()).contains("\"stored\":" + rows.size());
            PROMISES.stored("gateway 0", rows, 0);
        }
    }

    @Test
    void finds_nothing_where_nothing_is_wrong() throws Exception {
        Inspection.Findings found = inspect("SELECT 1");

        assertThat(found.sound()).as(found.words()).isTrue();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "DELETE FROM reading WHERE at = (SELECT max(at) FROM reading)",
                "UPDATE reading SET reading_value = reading_value + 0.001 WHERE sensor_id = (SELECT min(sensor_id) FROM reading)"
            })
    void finds_a_reading_that_is_gone_or_another(String harm) throws Exception {
        assertThat(inspect(harm).lost()).isNotEmpty();
    }

    @Test
    void finds_a_message_that_was_sent_nowhere() throws Exception {
        assertThat(inspect(
                                "UPDATE outbox SET state = 'sent', message_key = 'x' WHERE id = (SELECT min(id) FROM outbox)")
                        .lost())
                .isNotEmpty();
    }

    @Test
    void finds_two_open_alerts_of_one_limit() throws Exception {
        assertThat(inspect("""
                        INSERT INTO alert (site_id, point_id, limit_id, limit_name, quantity, side, threshold, priority,
                            action, phase, since_at, raised_at, alert_value, uncertainty)
                        SELECT site_id, point_id, limit_id, limit_name, quantity, side, threshold, priority,
                            action, phase, since_at, raised_at, alert_value, uncertainty
                        FROM alert WHERE closed_at IS NULL
                        """).doubled()).isNotEmpty();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "DELETE FROM water_state WHERE at = (SELECT max(at) FROM water_state)",
                "DELETE FROM outbox WHERE message_key LIKE '%-raised-%'",
                "UPDATE alert_state SET phase = 'normal' WHERE alert_id IS NOT NULL",
                "UPDATE alert SET closed_at = raised_at",
                "UPDATE \"flyway_schema_history\" SET \"success\" = FALSE"
            })
    void finds_half_a_transaction(String harm) throws Exception {
        assertThat(inspect(harm).halves()).isNotEmpty();
    }

    @ParameterizedTest
    @EnumSource(Damage.Kind.class)
    void finds_an_index_that_disagrees_with_its_table(Damage.Kind kind) throws Exception {
        Path copy = Files.createDirectories(folder.resolve(kind.name()))
                .resolve(place.database().getFileName());
        Files.copy(place.database(), copy);
        Damage.toPrimaryKey(copy.getParent(), kind, "reading");

        try (Inspection inspection = new Inspection(copy, place.mail())) {
            assertThat(inspection.tables().indexes()).isNotEmpty();
        }
    }

    private static Inspection.Findings inspect(String harm) throws Exception {
        Path copy = folder.resolve("copy.mv.db");
        Files.copy(place.database(), copy, StandardCopyOption.REPLACE_EXISTING);
        harm(copy, harm);
        try (Inspection inspection = new Inspection(copy, place.mail())) {
            return inspection.compare(PROMISES, Instant.EPOCH);
        }
    }

    private static void harm(Path copy, String sql) throws SQLException {
        String url = "jdbc:h2:file:" + copy.toString().replace(".mv.db", "")
                + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH";
        try (Connection connection = DriverManager.getConnection(url, "sa", "");
                Statement statement = connection.createStatement()) {
            statement.execute(sql);
            statement.execute("SHUTDOWN");
        }
    }
}
