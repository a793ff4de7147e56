package org.hingeline.api;

import java.nio.file.Path;
import java.time.Instant;
import org.hingeline.RunningService;
import org.hingeline.SettableClock;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.io.TempDir;

/** A running service, and somebody who may see and no more, for the tests of one class. */
abstract class AskedByViewer {
    static RunningService service;
    static String viewer;

    @BeforeAll
    static void start(@TempDir Path data) {
        service = RunningService.start(data, new SettableClock(Instant.parse("2026-05-14T12:00:00Z")));
        viewer = service.token(Role.VIEWER);
    }

    @AfterAll
    static void stop() {
        service.close();
    }
}
