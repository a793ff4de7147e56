package org.hingeline;

import io.micrometer.core.instrument.Gauge;
import io.micrometer.core.instrument.MeterRegistry;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import org.hingeline.monitor.OutboxBook.Backlog;
import org.hingeline.monitor.Storage;

/** What is measured when somebody asks. */
final class Gauges {
    private Gauges() {}

    static void bind(MeterRegistry registry, Storage storage, Backups backups, InstantSource clock) {
        Gauge.builder("hingeline.outbox.waiting", () -> backlog(storage).waiting())
                .description("messages waiting to be sent")
                .register(registry);
        Gauge.builder("hingeline.outbox.oldest", () -> {
                    Instant oldest = backlog(storage).oldest();
                    return oldest == null
                            ? 0
                            : Duration.between(oldest, clock.instant()).toSeconds();
                })
                .description("age of the oldest waiting message")
                .baseUnit("seconds")
                .register(registry);
        Gauge.builder(
                        "hingeline.silent.points",
                        () -> storage.read(books -> books.alerts().countSilent()))
                .description("points with an open alert because nothing usable is heard")
                .register(registry);
        Gauge.builder(
                        "hingeline.alerts.open",
                        () -> storage.read(books -> books.alerts().countOpen()))
                .description("open alerts")
                .register(registry);
        if (backups.possible()) {
            Gauge.builder(
                            "hingeline.backup.age",
                            () -> backups.age().map(Duration::toSeconds).orElse(-1L))
                    .description("age of the newest backup, -1 when there is none")
                    .baseUnit("seconds")
                    .register(registry);
        }
    }

    private static Backlog backlog(Storage storage) {
        return storage.read(books -> books.outbox().backlog());
    }
}
