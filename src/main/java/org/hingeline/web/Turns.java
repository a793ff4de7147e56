package org.hingeline.web;

import java.time.Duration;
import java.util.concurrent.Semaphore;
import java.util.concurrent.TimeUnit;

/** Lets a few heavy requests in at a time, a few more wait, and turns the rest away, so that the others keep their room. */
final class Turns {
    private final Semaphore places;
    private final int mostWaiting;
    private final Duration longestWait;

    /**
     * @param atOnce how many are let in
     * @param mostWaiting how many may wait; each holds a thread
     */
    Turns(int atOnce, int mostWaiting, Duration longestWait) {
        places = new Semaphore(atOnce, true);
        this.mostWaiting = mostWaiting;
        this.longestWait = longestWait;
    }

    /** @return false when there was no place in time and nothing was done */
    boolean run(Runnable work) {
        if (!places.tryAcquire() && !waited()) {
            return false;
        }
        try {
            work.run();
        } finally {
            places.release();
        }
        return true;
    }

    private boolean waited() {
        if (places.getQueueLength() >= mostWaiting) {
            return false;
        }
        try {
            return places.tryAcquire(longestWait.toMillis(), TimeUnit.MILLISECONDS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return false;
        }
    }
}
