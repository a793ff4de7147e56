package org.hingeline;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.concurrent.CountDownLatch;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * Lets SIGTERM and Ctrl-C end the program in order: the process stays until everything is closed. To be made before
 * anything is started, so that a signal during the start, too, leaves a database that was closed.
 */
final class OrderlyEnd implements AutoCloseable {
    private static final Logger LOG = LoggerFactory.getLogger(OrderlyEnd.class);

    private final CountDownLatch asked = new CountDownLatch(1);
    private final CountDownLatch closed = new CountDownLatch(1);
    private final Deque<AutoCloseable> parts = new ArrayDeque<>();

    OrderlyEnd() {
        Runtime.getRuntime().addShutdownHook(new Thread(this::askAndWait, "shutdown"));
    }

    private void askAndWait() {
        asked.countDown();
        try {
            closed.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** Adds a part; the last one added is closed first. */
    <T extends AutoCloseable> T closes(T part) {
        parts.push(part);
        return part;
    }

    /** Waits for the signal. */
    void await() {
        try {
            asked.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** Closes the parts and lets the process go. */
    @Override
    public void close() {
        LOG.info("stopping");
        for (AutoCloseable part : parts) {
            try {
                part.close();
            } catch (Exception e) {
                LOG.error("a part did not stop well", e);
            }
        }
        LOG.info("stopped");
        closed.countDown();
    }
}
