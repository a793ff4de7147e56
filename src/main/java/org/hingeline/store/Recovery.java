package org.hingeline.store;

import java.io.IOException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Instant;
import java.time.InstantSource;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * Opens the embedded database, and where a crash has damaged it, the newest usable backup in its place.
 *
 * <p>The damaged file is kept under another name, never deleted. The backup is unpacked and checked beside the database
 * and takes its place in one step, so that a crash on the way leaves either the one or the other. After an orderly end
 * nothing is put back by itself: damage then has another cause, which a person must look into.
 */
public final class Recovery {
    private static final Logger LOG = LoggerFactory.getLogger(Recovery.class);
    private static final DateTimeFormatter STAMP =
            DateTimeFormatter.ofPattern("yyyyMMdd'T'HHmmss'Z'").withZone(ZoneOffset.UTC);

    private final DatabaseFolder folder;
    private final DatabaseFolder scratch;
    private final Path backups;
    private final Instant now;

    /**
     * The open database.
     *
     * @param report in words, which backup took the place of a damaged database and where the damaged file lies; absent
     *     when nothing was damaged
     */
    public record Recovered(
            EmbeddedDatabase database, @Nullable String report) {}

    private Recovery(Path folder, Path backups, Instant now) {
        this.folder = new DatabaseFolder(folder);
        this.scratch = new DatabaseFolder(folder.resolve("restoring"));
        this.backups = backups;
        this.now = now;
    }

    /**
     * Opens the database in {@code folder}, falling back on the zip files in {@code backups} after a crash.
     *
     * @throws DatabaseInUseException when another process has it open; nothing is moved
     * @throws DamagedDatabaseException when it is damaged although it ended in an orderly way; nothing is moved
     * @throws StoreException when it cannot be opened and no backup can take its place; nothing is moved
     */
    public static Recovered open(Path folder, Path backups, InstantSource clock) {
        boolean endedWell = new DatabaseFolder(folder).endedWell();
        try {
            return new Recovered(EmbeddedDatabase.open(folder), null);
        } catch (DamagedDatabaseException | UnreadableDatabaseException damage) {
            if (endedWell) {
                throw damage;
            }
            return new Recovery(folder, backups, clock.instant()).fallBack(damage);
        }
    }

    private Recovered fallBack(RuntimeException damage) {
        LOG.error("the database cannot be used, looking for a backup: {}", damage.getMessage());
        List<String> passedOver = new ArrayList<>();
        try {
            for (BackupCopy backup : BackupCopy.newestFirst(backups)) {
                String fault = unpack(backup);
                if (fault == null) {
                    String report = putBack(backup, damage, passedOver);
                    LOG.error(report);
                    return new Recovered(EmbeddedDatabase.open(folder.path()), report);
                }
                passedOver.add(backup.zip() + " (" + fault + ")");
            }
        } catch (IOException e) {
            throw new StoreException("a backup could not take the place of the damaged database: " + e.getMessage(), e);
        }
        String why = passedOver.isEmpty()
                ? "there is none in " + backups
                : "none in " + backups + " is usable: " + String.join(", ", passedOver);
        throw new StoreException(
                damage.getMessage() + ". No backup can take its place: " + why + ". Nothing was moved.", damage);
    }

    /** Unpacks the backup beside the database; answers what is wrong with it, null when it can be used. */
    private @Nullable String unpack(BackupCopy backup) throws IOException {
        clearScratch();
        Files.createDirectories(scratch.path());
        try {
            List<String> faults = backup.unpackInto(scratch);
            return faults.isEmpty() ? null : String.join("; ", faults);
        } catch (IOException e) {
            return "it cannot be unpacked: " + e.getMessage();
        }
    }

    private String putBack(BackupCopy backup, RuntimeException damage, List<String> passedOver) throws IOException {
        String kept = "There is no damaged file to keep.";
        if (Files.exists(folder.file())) {
            kept = "What was written after that is in the damaged file alone, kept as " + keepDamaged() + ".";
        }
        Files.move(scratch.file(), folder.file(), StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        DatabaseFolder.force(folder.path());
        clearScratch();
        return "The last run did not end in an orderly way, and its database could not be used (" + damage.getMessage()
                + "). The backup " + backup.zip() + " of " + backup.madeAt().truncatedTo(ChronoUnit.SECONDS)
                + " took its place. " + kept
                + (passedOver.isEmpty() ? "" : " Newer backups could not be used: " + String.join(", ", passedOver));
    }

    /** Gives the damaged file a second name, so that it outlives the move of the backup over its first. */
    private Path keepDamaged() throws IOException {
        String name = folder.file().getFileName() + ".damaged-" + STAMP.format(now);
        for (int n = 1; ; n++) {
            Path aside = folder.path().resolve(n == 1 ? name : name + "-" + n);
            try {
                return link(aside);
            } catch (FileAlreadyExistsException taken) {
                LOG.info("{} is from an earlier time and stays", aside);
            }
        }
    }

    private Path link(Path aside) throws IOException {
        try {
            return Files.createLink(aside, folder.file());
        } catch (FileAlreadyExistsException e) {
            throw e;
        } catch (IOException | UnsupportedOperationException e) {
            // a file system without links; a copy does as well
            Files.copy(folder.file(), aside);
            DatabaseFolder.force(aside);
            return aside;
        }
    }

    private void clearScratch() throws IOException {
        if (!Files.isDirectory(scratch.path())) {
            return;
        }
        try (Stream<Path> content = Files.walk(scratch.path())) {
            for (Path path : content.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(path);
            }
        }
    }
}
