package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.store.Samples.T0;

import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;
import org.hingeline.monitor.JournalBook.Entry;
import org.hingeline.monitor.ReadingBook.RefusedRow;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

class IntegrityCheckTest {
    @TempDir
    Path folder;

    @BeforeEach
    void fill() {
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            Samples.Place north = Samples.place(store, "north");
            Samples.phSensor(store, Samples.tank(store, north.site(), "tank-2"), "ph-2");
            for (int i = 0; i < 50; i++) {
                var at = T0.plusSeconds(i);
                store.writeOnly(books -> {
                    books.readings().insert(List.of(Samples.reading(north.ph(), at, 7.7)), 1, at);
                    books.readings()
                            .insertRefused(List.of(new RefusedRow(north.site().id(), "shed", at, 0, "row", "why")));
                    books.journal().add(new Entry(at, north.site().id(), "mia", "x", "y", "z"));
                });
            }
        }
    }

    @Test
    void a_sound_database_has_no_faults() throws SQLException {
        assertThat(faults()).isEmpty();
    }

    @ParameterizedTest
    @EnumSource
    void a_damaged_index_is_found(Damage.Kind kind) throws SQLException {
        Damage.to(folder, kind, "journal", "journal_by_site");

        assertThat(faults())
                .singleElement()
                .asString()
                .contains("table journal")
                .contains("journal_by_site (site_id, at)");
    }

    @ParameterizedTest
    @EnumSource
    void a_damaged_primary_key_of_several_columns_is_found(Damage.Kind kind) throws SQLException {
        Damage.toPrimaryKey(folder, kind, "reading");

        assertThat(faults())
                .isNotEmpty()
                .allSatisfy(fault -> assertThat(fault).contains("table reading"))
                .anySatisfy(fault -> assertThat(fault).contains("PRIMARY_KEY").contains("(sensor_id, at)"));
    }

    /** Among them two over the same columns, of which queries use only the one. */
    @ParameterizedTest
    @ValueSource(strings = {"reading", "sensor", "journal", "point", "refused_row"})
    void damage_to_any_index_is_found_and_told_by_its_name(String table) throws Exception {
        List<String> names = Damage.indexesOf(folder, table);
        assertThat(names).isNotEmpty();
        for (String name : names) {
            Path copy = Files.createDirectories(folder.resolve("copy-" + name));
            Files.copy(EmbeddedDatabase.databaseFile(folder), EmbeddedDatabase.databaseFile(copy));

            Damage.to(copy, Damage.Kind.LOST_FROM_INDEX, table, name);

            assertThat(faults(copy)).singleElement().asString().contains("table " + table, "index " + name + " (");
        }
    }

    @Test
    void a_database_without_tables_is_told_from_one_with_tables() throws SQLException {
        assertThat(holdsTables(folder)).isTrue();
        assertThat(holdsTables(folder.resolve("new"))).isFalse();
    }

    private static boolean holdsTables(Path folder) throws SQLException {
        try (Connection connection = new DatabaseFolder(folder).connect()) {
            return IntegrityCheck.holdsTables(connection);
        }
    }

    private List<String> faults() throws SQLException {
        return faults(folder);
    }

    private static List<String> faults(Path folder) throws SQLException {
        try (Connection connection = new DatabaseFolder(folder).connect()) {
            return IntegrityCheck.faults(connection);
        }
    }
}
