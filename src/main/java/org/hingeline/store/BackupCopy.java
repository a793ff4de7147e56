package org.hingeline.store;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;

/**
 * A backup of the embedded database.
 *
 * @param madeAt the time of the zip file
 */
record BackupCopy(Path zip, Instant madeAt) {

    /** Every zip file of a folder, newest first; none when there is no such folder. */
    static List<BackupCopy> newestFirst(Path folder) throws IOException {
        if (!Files.isDirectory(folder)) {
            return List.of();
        }
        List<Path> zips;
        try (Stream<Path> files = Files.list(folder)) {
            zips = files.filter(file -> file.toString().endsWith(".zip") && Files.isRegularFile(file))
                    .toList();
        }
        Stream.Builder<BackupCopy> copies = Stream.builder();
        for (Path zip : zips) {
            FileTime time = Files.getLastModifiedTime(zip);
            copies.add(new BackupCopy(zip, time.toInstant()));
        }
        return copies.build()
                .sorted(Comparator.comparing(BackupCopy::madeAt)
                        .thenComparing(BackupCopy::zip)
                        .reversed())
                .toList();
    }

    /**
     * Unpacks the backup into an empty folder and checks it there; the file is on disk when this returns.
     *
     * @return what is wrong with it, nothing when it can be used
     * @throws IOException when it cannot be unpacked
     */
    List<String> unpackInto(DatabaseFolder folder) throws IOException {
        String name = folder.file().getFileName().toString();
        try (ZipFile content = new ZipFile(zip.toFile())) {
            ZipEntry entry = content.getEntry(name);
            if (entry == null) {
                return List.of("it holds no " + name);
            }
            try (InputStream in = content.getInputStream(entry)) {
                Files.copy(in, folder.file());
            }
        }
        List<String> faults = check(folder);
        DatabaseFolder.force(folder.file());
        return faults;
    }

    private static List<String> check(DatabaseFolder folder) {
        try (Connection connection = folder.connect();
                Statement statement = connection.createStatement()) {
            List<String> faults = IntegrityCheck.faults(connection);
            if (faults.isEmpty() && !IntegrityCheck.holdsTables(connection)) {
                faults = List.of("it holds no tables");
            }
            statement.execute("SHUTDOWN");
            return faults;
        } catch (SQLException | StoreException e) {
            return List.of(String.valueOf(e.getMessage()));
        }
    }
}
