package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.time.InstantSource;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.hingeline.hatchery.Site;
import org.hingeline.store.Recovery.Recovered;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

@Timeout(120)
class RecoveryTest {
    private static final InstantSource CLOCK = InstantSource.fixed(Instant.parse("2026-05-14T03:20:00.123Z"));
    private static final Instant OLDER = Instant.parse("2026-05-13T18:00:00Z");
    private static final Instant NEWER = Instant.parse("2026-05-14T00:00:00Z");

    @TempDir
    Path data;

    private Path folder;
    private Path backups;
    private Path file;
    private Path older;
    private Path newer;

    /** Site one is in both backups, two in the newer, three in the database alone, which a crash has ended. */
    @BeforeEach
    void crashWithTwoBackups() throws IOException {
        folder = data.resolve("db");
        backups = data.resolve("backups");
        file = EmbeddedDatabase.databaseFile(folder);
        older = backups.resolve("older.zip");
        newer = backups.resolve("newer.zip");
        try (EmbeddedDatabase store = EmbeddedDatabase.open(folder)) {
            Samples.Place one = Samples.place(store, "one");
            store.writeOnly(books -> books.readings()
                    .insert(
                            List.of(Samples.reading(one.ph(), T0, 7), Samples.reading(one.ph(), T0.plusSeconds(1), 7)),
                            1,
                            T0));
            store.backUpTo(older);
            Samples.site(store, "two");
            store.backUpTo(newer);
            Samples.site(store, "three");
        }
        Files.setLastModifiedTime(older, FileTime.from(OLDER));
        Files.setLastModifiedTime(newer, FileTime.from(NEWER));
        new DatabaseFolder(folder).takeCleanStop();
    }

    @Test
    void a_sound_database_is_opened_as_it_is_and_nothing_is_reported() {
        Recovered recovered = Recovery.open(folder, backups, CLOCK);

        assertThat(recovered.report()).isNull();
        assertThat(sitesOf(recovered)).containsExactly("one", "three", "two");
        assertThat(aside()).isEmpty();
    }

    @Test
    void a_first_start_makes_a_database() {
        Recovered recovered = Recovery.open(data.resolve("new"), backups, CLOCK);

        assertThat(recovered.report()).isNull();
        assertThat(sitesOf(recovered)).isEmpty();
    }

    @Test
    void a_database_with_a_damaged_index_is_replaced_by_the_newest_backup_and_kept() throws Exception {
        Damage.toPrimaryKey(folder, Damage.Kind.LOST_FROM_INDEX, "reading");

        Recovered recovered = Recovery.open(folder, backups, CLOCK);

        Path kept = folder.resolve("hingeline.mv.db.damaged-20260514T032000Z");
        assertThat(recovered.report())
                .contains("did not end in an orderly way")
                .contains("table reading")
                .contains(newer + " of 2026-05-14T00:00:00Z took its place")
                .contains("kept as " + kept)
                .doesNotContain(older.toString());
        assertThat(recovered.database().integrityFaults()).isEmpty();
        assertThat(sitesOf(recovered)).containsExactly("one", "two");
        assertThat(aside()).containsExactly(kept.getFileName().toString());
        Path looked = Files.createDirectories(data.resolve("looked-at"));
        Files.copy(kept, EmbeddedDatabase.databaseFile(looked));
        new DatabaseFolder(looked).layCleanStop();
        assertThat(EmbeddedDatabaseTest.sites(looked)).containsExactly("one", "three", "two");
        assertThat(folder.resolve("restoring")).doesNotExist();
        assertThat(EmbeddedDatabaseTest.sites(folder)).containsExactly("one", "two");
    }

    @Test
    void a_file_that_cannot_be_read_is_replaced_by_the_newest_backup_and_kept_byte_for_byte() throws Exception {
        byte[] noise = noise(50_000);
        Files.write(file, noise);

        Recovered recovered = Recovery.open(folder, backups, CLOCK);

        assertThat(recovered.report()).contains("cannot be opened").contains(newer.toString());
        assertThat(sitesOf(recovered)).containsExactly("one", "two");
        assertThat(aside()).hasSize(1);
        assertThat(folder.resolve(aside().get(0))).hasBinaryContent(noise);
    }

    @Test
    void a_quarter_of_a_file_and_one_cut_off_in_its_header_are_replaced() throws Exception {
        byte[] whole = Files.readAllBytes(file);
        for (int length : List.of(whole.length / 4, 100)) {
            Files.write(file, Arrays.copyOf(whole, length));
            new DatabaseFolder(folder).takeCleanStop();

            Recovered recovered = Recovery.open(folder, backups, CLOCK);

            assertThat(recovered.report()).contains(newer.toString());
            assertThat(sitesOf(recovered)).containsExactly("one", "two");
        }
        assertThat(aside())
                .containsExactly(
                        "hingeline.mv.db.damaged-20260514T032000Z", "hingeline.mv.db.damaged-20260514T032000Z-2");
    }

    @Test
    void an_emptied_or_vanished_file_is_replaced() throws Exception {
        Files.write(file, new byte[0]);
        assertThat(sitesOf(Recovery.open(folder, backups, CLOCK))).containsExactly("one", "two");

        new DatabaseFolder(folder).takeCleanStop();
        Files.delete(file);
        Recovered recovered = Recovery.open(folder, backups, CLOCK);

        assertThat(recovered.report()).contains("is gone").contains("There is no damaged file to keep");
        assertThat(sitesOf(recovered)).containsExactly("one", "two");
    }

    @Test
    void a_backup_that_cannot_be_used_is_passed_over_for_the_next_older_one() throws Exception {
        Files.write(file, noise(50_000));
        Files.write(newer, noise(5_000));
        Files.setLastModifiedTime(newer, FileTime.from(NEWER));

        Recovered recovered = Recovery.open(folder, backups, CLOCK);

        assertThat(recovered.report())
                .contains(older + " of 2026-05-13T18:00:00Z took its place")
                .contains("Newer backups could not be used: " + newer);
        assertThat(sitesOf(recovered)).containsExactly("one");
    }

    @Test
    void a_backup_that_is_damaged_itself_is_passed_over() throws Exception {
        Files.write(file, noise(50_000));
        Path scratch = Files.createDirectories(data.resolve("scratch"));
        new BackupCopy(newer, NEWER).unpackInto(new DatabaseFolder(scratch));
        Damage.toPrimaryKey(scratch, Damage.Kind.LOST_FROM_TABLE, "reading");
        zip(EmbeddedDatabase.databaseFile(scratch), newer);
        Files.setLastModifiedTime(newer, FileTime.from(NEWER));

        Recovered recovered = Recovery.open(folder, backups, CLOCK);

        assertThat(recovered.report()).contains(older.toString()).contains(newer + " (table reading");
        assertThat(sitesOf(recovered)).containsExactly("one");
    }

    @Test
    void without_a_usable_backup_nothing_is_moved_and_every_start_says_why() throws Exception {
        byte[] noise = noise(50_000);
        Files.write(file, noise);
        Files.write(newer, noise(5_000));
        Files.write(older, noise(5_000));

        for (int start = 0; start < 2; start++) {
            assertThatThrownBy(() -> Recovery.open(folder, backups, CLOCK))
                    .isInstanceOf(StoreException.class)
                    .hasMessageContaining("No backup can take its place")
                    .hasMessageContaining(newer.toString())
                    .hasMessageContaining(older.toString())
                    .hasMessageContaining("Nothing was moved");
        }
        assertThat(file).hasBinaryContent(noise);
        assertThat(aside()).isEmpty();
    }

    @Test
    void without_any_backup_that_is_said() throws Exception {
        Files.write(file, noise(50_000));

        assertThatThrownBy(() -> Recovery.open(folder, data.resolve("no-such-folder"), CLOCK))
                .isInstanceOf(StoreException.class)
                .hasMessageContaining("there is none in " + data.resolve("no-such-folder"));
    }

    @Test
    void a_database_in_use_by_another_process_is_told_as_such_and_nothing_is_moved() throws Exception {
        try (OtherProcess other = OtherProcess.writing(folder)) {
            assertThatThrownBy(() -> Recovery.open(folder, backups, CLOCK))
                    .isInstanceOf(DatabaseInUseException.class)
                    .hasMessageContaining(folder + " is in use by another process");
        }

        assertThat(aside()).isEmpty();
        assertThat(EmbeddedDatabaseTest.sites(folder)).containsExactly("one", "three", "two", "written-by-another");
    }

    @Test
    void damage_after_an_orderly_end_is_left_to_a_person() throws Exception {
        byte[] noise = noise(50_000);
        Files.write(file, noise);
        new DatabaseFolder(folder).layCleanStop();

        for (int start = 0; start < 2; start++) {
            assertThatThrownBy(() -> Recovery.open(folder, backups, CLOCK))
                    .isInstanceOf(UnreadableDatabaseException.class);
        }
        assertThat(file).hasBinaryContent(noise);
        assertThat(aside()).isEmpty();
    }

    private static byte[] noise(int length) {
        byte[] noise = new byte[length];
        new Random(1).nextBytes(noise);
        return noise;
    }

    private static void zip(Path content, Path zip) throws IOException {
        try (var out = new ZipOutputStream(Files.newOutputStream(zip))) {
            out.putNextEntry(new ZipEntry("hingeline.mv.db"));
            Files.copy(content, out);
            out.closeEntry();
        }
    }

    private static List<String> sitesOf(Recovered recovered) {
        try (EmbeddedDatabase store = recovered.database()) {
            return store.read(books ->
                    books.place().sites().stream().map(Site::code).sorted().toList());
        }
    }

    private List<String> aside() {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(path -> path.getFileName().toString())
                    .filter(name -> name.contains("damaged"))
                    .sorted()
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
