package org.hingeline;

import java.time.Duration;
import java.time.InstantSource;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;
import org.hingeline.delivery.Courier;
import org.hingeline.monitor.Storage;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/** Sends what is due on a thread of its own: at once when asked, and only if something is due. */
final class Nudge implements AutoCloseable {
    private static final Logger LOG = LoggerFactory.getLogger(Nudge.class);
    private static final Duration LAST_SEND = Duration.ofSeconds(25);

    private final Courier courier;
    private final Storage storage;
    private final InstantSource clock;
    private final AtomicBoolean asked = new AtomicBoolean();
    private final ExecutorService sender = Executors.newSingleThreadExecutor(work -> new Thread(work, "courier"));

    Nudge(Courier courier, Storage storage, InstantSource clock) {
        this.courier = courier;
        this.storage = storage;
        this.clock = clock;
    }

    /** Returns at once; many calls while one run is waiting are one. */
    void now() {
        if (!sender.isShutdown() && asked.compareAndSet(false, true)) {
            sender.execute(this::run);
        }
    }

    private void run() {
        asked.set(false);
        try {
            while (!sender.isShutdown()
                    && storage.read(books -> books.outbox().anyDue(clock.instant()))
                    && courier.deliverDue() > 0) {
                LOG.debug("a run of messages is through");
            }
        } catch (RuntimeException e) {
            LOG.error("messages could not be sent; the next run tries again", e);
        }
    }

    /** Lets a message that is being sent get through. */
    @Override
    public void close() {
        sender.shutdown();
        try {
            if (!sender.awaitTermination(LAST_SEND.toSeconds(), TimeUnit.SECONDS)) {
                LOG.warn("a message was still being sent at the end; it will be sent again");
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
