package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;

/** A clock that stands still until it is told to go on. */
final class SettableClock implements InstantSource {
    private Instant now;

    SettableClock(Instant start) {
        now = start;
    }

    @Override
    public Instant instant() {
        return now;
    }

    void set(Instant time) {
        now = time;
    }

    void pass(Duration time) {
        now = now.plus(time);
    }
}
