package org.hingeline.api;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.concurrent.atomic.AtomicReference;

/** A clock that stands still until it is set. */
final class SettableClock extends Clock {
    private final AtomicReference<Instant> now;

    SettableClock(Instant now) {
        this.now = new AtomicReference<>(now);
    }

    void set(Instant to) {
        now.set(to);
    }

    void forward(Duration by) {
        now.updateAndGet(at -> at.plus(by));
    }

    @Override
    public Instant instant() {
        return now.get();
    }

    @Override
    public ZoneId getZone() {
        return ZoneOffset.UTC;
    }

    @Override
    public Clock withZone(ZoneId zone) {
        return this;
    }
}
