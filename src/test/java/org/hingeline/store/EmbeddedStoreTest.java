package org.hingeline.store;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.io.TempDir;

class EmbeddedStoreTest extends StoreContractTest {
    @TempDir
    Path folder;

    @Override
    public Database another() {
        try {
            return EmbeddedDatabase.open(Files.createTempDirectory(folder, "db"));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
