package org.hingeline;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.hingeline.config.Settings;
import org.hingeline.store.Database;
import org.hingeline.store.EmbeddedDatabase;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/** Copies of the embedded database made while it runs, the newest few kept. A PostgreSQL server is backed up by its own tools. */
final class Backups {
    private static final Logger LOG = LoggerFactory.getLogger(Backups.class);
    private static final DateTimeFormatter STAMP =
            DateTimeFormatter.ofPattern("yyyyMMdd'T'HHmmss'Z'").withZone(ZoneOffset.UTC);

    private final @Nullable EmbeddedDatabase database;
    private final Path folder;
    private final Duration every;
    private final int keep;
    private final InstantSource clock;

    private Backups(@Nullable EmbeddedDatabase database, Path folder, Duration every, int keep, InstantSource clock) {
        this.database = database;
        this.folder = folder;
        this.every = every;
        this.keep = keep;
        this.clock = clock;
    }

    static Backups of(Database database, Settings settings, InstantSource clock) {
        return new Backups(
                database instanceof EmbeddedDatabase embedded ? embedded : null,
                settings.backupsFolder(),
                settings.backups().every(),
                settings.backups().keep(),
                clock);
    }

    /** Whether this program makes the backups. */
    boolean possible() {
        return database != null;
    }

    /** Makes one if the newest is due to be followed, so that many starts in a row do not push the older ones out. */
    void make() {
        EmbeddedDatabase open = database;
        if (open == null
                || age().map(age -> age.compareTo(every.multipliedBy(9).dividedBy(10)) < 0)
                        .orElse(false)) {
            return;
        }
        Path zip = folder.resolve("hingeline-" + STAMP.format(clock.instant()) + ".zip");
        open.backUpTo(zip);
        LOG.info("backed up to {}", zip.getFileName());
        List<Path> all = newestFirst();
        for (Path old : all.subList(Math.min(keep, all.size()), all.size())) {
            try {
                Files.delete(old);
            } catch (IOException e) {
                LOG.warn("the old backup {} could not be deleted: {}", old.getFileName(), e.getMessage());
            }
        }
    }

    /** Age of the newest backup, if there is one. */
    Optional<Duration> age() {
        return newestFirst().stream().findFirst().map(newest -> {
            try {
                Instant made = Files.getLastModifiedTime(newest).toInstant();
                return Duration.between(made, clock.instant());
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        });
    }

    private List<Path> newestFirst() {
        if (!Files.isDirectory(folder)) {
            return List.of();
        }
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.getFileName().toString().matches("hingeline-\\d{8}T\\d{6}Z\\.zip"))
                    .sorted(Comparator.comparing(file -> file.getFileName().toString(), Comparator.reverseOrder()))
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
