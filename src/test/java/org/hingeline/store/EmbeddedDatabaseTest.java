package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.zip.ZipFile;
import org.hingeline.hatchery.Site;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

@Timeout(120)
class EmbeddedDatabaseTest {
    @TempDir
    Path folder;

    @Test
    void what_was_written_is_there_after_an_orderly_end() {
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            Samples.place(store, "north");
        }

        assertThat(sites()).containsExactly("north");
    }

    @Test
    void what_was_acknowledged_is_there_after_a_kill_and_the_tables_agree() throws IOException {
        OtherProcess.writing(folder).close();

        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            assertThat(store.integrityFaults()).isEmpty();
        }
        assertThat(sites()).containsExactly("written-by-another");
    }

    @Test
    void timed_work_picked_by_an_owner_that_died_is_free_at_the_next_start() throws Exception {
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            RawSql.run(store, """
                    INSERT INTO scheduled_tasks
                        (task_name, task_instance, execution_time, picked, picked_by, last_heartbeat, version)
                    VALUES ('watch-limits', 'recurring', TIMESTAMP WITH TIME ZONE '2026-05-14 03:20:00+00', TRUE, 'gone',
                            TIMESTAMP WITH TIME ZONE '2026-05-14 03:20:00+00', 7)
                    """);
        }

        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            assertThat(RawSql.ask(store, "SELECT count(*) FROM scheduled_tasks WHERE picked"))
                    .isEqualTo("0");
            assertThat(RawSql.ask(store, "SELECT version FROM scheduled_tasks")).isEqualTo("7");
        }
    }

    @Test
    void the_mark_of_an_orderly_end_is_laid_down_at_the_end_and_taken_away_at_the_start() {
        DatabaseFolder marks = new DatabaseFolder(folder);
        EmbeddedDatabase store = EmbeddedDatabase.open(folder);
        assertThat(marks.endedWell()).isFalse();

        store.close();

        assertThat(marks.endedWell()).isTrue();
    }

    @Test
    void closing_really_closes_while_another_database_stays_open() throws IOException {
        try (EmbeddedDatabase other = EmbeddedDatabase.open(folder.resolve("other"))) {
            EmbeddedDatabase store = EmbeddedDatabase.open(folder.resolve("one"));
            store.close();

            // the engine would refuse if this process still held the file
            OtherProcess.writing(folder.resolve("one")).close();

            other.checkAlive();
        }
    }

    @Test
    void a_failed_start_lets_the_file_go() throws Exception {
        fillAndDamage();
        assertThatThrownBy(() -> EmbeddedDatabase.open(folder)).isInstanceOf(DamagedDatabaseException.class);
        Files.move(EmbeddedDatabase.databaseFile(folder), folder.resolve("away"));
        Files.delete(folder.resolve("database-made"));

        OtherProcess.writing(folder).close();

        assertThat(sites()).containsExactly("written-by-another");
    }

    @Test
    void after_a_crash_damage_is_found_at_every_start() throws Exception {
        fillAndDamage();

        for (int start = 0; start < 2; start++) {
            assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                    .isInstanceOf(DamagedDatabaseException.class)
                    .hasMessageContaining("table reading");
        }
    }

    @Test
    void after_an_orderly_end_the_tables_are_not_compared() throws Exception {
        fillAndDamage();
        new DatabaseFolder(folder).layCleanStop();

        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            assertThat(store.integrityFaults()).isNotEmpty();
        }
    }

    @Test
    void a_file_that_was_emptied_or_lost_is_not_taken_for_a_first_start() throws IOException {
        EmbeddedDatabase.open(folder).close();
        Files.write(EmbeddedDatabase.databaseFile(folder), new byte[0]);
        assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                .isInstanceOf(DamagedDatabaseException.class)
                .hasMessageContaining("holds no tables");

        Files.delete(EmbeddedDatabase.databaseFile(folder));
        assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                .isInstanceOf(UnreadableDatabaseException.class)
                .hasMessageContaining("is gone");
    }

    @Test
    void a_file_of_noise_cannot_be_read_and_the_last_end_stays_an_orderly_one() throws IOException {
        EmbeddedDatabase.open(folder).close();
        byte[] noise = new byte[50_000];
        new Random(1).nextBytes(noise);
        Files.write(EmbeddedDatabase.databaseFile(folder), noise);

        assertThatThrownBy(() -> EmbeddedDatabase.open(folder))
                .isInstanceOf(UnreadableDatabaseException.class)
                .hasMessageContaining(folder.toString());

        assertThat(new DatabaseFolder(folder).endedWell()).isTrue();
    }

    @Test
    void an_interrupted_writer_or_reader_does_not_take_the_database_down() {
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            boolean stillInterrupted = CompletableFuture.supplyAsync(() -> {
                        Thread.currentThread().interrupt();
                        Samples.site(store, "interrupted");
                        return Thread.interrupted();
                    })
                    .join();

            assertThat(stillInterrupted).isTrue();
            Samples.site(store, "next");
            assertThat(store.integrityFaults()).isEmpty();
        }
        assertThat(sites()).containsExactly("interrupted", "next");
    }

    @Test
    void a_backup_made_among_writers_opens_with_all_rows_of_its_moment() throws Exception {
        Path zip = folder.resolve("backups/one.zip");
        AtomicBoolean stop = new AtomicBoolean();
        AtomicInteger written = new AtomicInteger();
        int before;
        int after;
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder.resolve("db"))) {
            Samples.Place north = Samples.place(store, "north");
            CompletableFuture<Void> writer = CompletableFuture.runAsync(() -> {
                while (!stop.get()) {
                    var at = T0.plusSeconds(written.get());
                    store.writeOnly(books ->
                            books.readings().insert(List.of(Samples.reading(north.ph(), at, 7.7)), 1, at));
                    written.incrementAndGet();
                }
            });
            waitUntil(written, 50);
            before = written.get();
            store.backUpTo(zip);
            after = written.get() + 1;
            waitUntil(written, after + 20);
            stop.set(true);
            writer.join();
        }

        Path copy = Files.createDirectories(folder.resolve("copy"));
        assertThat(new BackupCopy(zip, T0).unpackInto(new DatabaseFolder(copy))).isEmpty();
        try (EmbeddedDatabase store = EmbeddedDatabase.open(copy)) {
            assertThat(store.integrityFaults()).isEmpty();
            int rows = Integer.parseInt(RawSql.ask(store, "SELECT count(*) FROM reading"));
            assertThat(rows).isBetween(before, after);
        }
        assertThat(folder.resolve("backups")).isDirectoryContaining("glob:**one.zip");
        try (ZipFile content = new ZipFile(zip.toFile())) {
            assertThat(content.size()).isEqualTo(1);
        }
    }

    @Test
    void a_backup_that_fails_leaves_nothing_half_done_and_the_lane_free() throws IOException {
        Path blocked = Files.createFile(folder.resolve("a-file"));
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder.resolve("db"))) {
            assertThatThrownBy(() -> store.backUpTo(blocked.resolve("one.zip")))
                    .isInstanceOf(StoreException.class)
                    .hasMessageContaining("one.zip");

            Samples.site(store, "after");
        }
        assertThat(sites(folder.resolve("db"))).containsExactly("after");
    }

    private void fillAndDamage() throws Exception {
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            Samples.Place north = Samples.place(store, "north");
            // the engine makes an index anew that has lost all its entries, so one must stay
            store.writeOnly(books -> books.readings()
                    .insert(
                            List.of(
                                    Samples.reading(north.ph(), T0, 7.7),
                                    Samples.reading(north.ph(), T0.plusSeconds(1), 7.7)),
                            1,
                            T0));
        }
        new DatabaseFolder(folder).takeCleanStop();
        Damage.toPrimaryKey(folder, Damage.Kind.LOST_FROM_INDEX, "reading");
    }

    private static void waitUntil(AtomicInteger count, int least) throws InterruptedException {
        while (count.get() < least) {
            Thread.sleep(2);
        }
    }

    private List<String> sites() {
        return sites(folder);
    }

    static List<String> sites(Path folder) {
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            return store.read(books ->
                    books.place().sites().stream().map(Site::code).sorted().toList());
        }
    }
}
