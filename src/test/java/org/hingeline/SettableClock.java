package org.hingeline;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.concurrent.atomic.AtomicReference;

/** A clock that stands still until it is set. */
public final class SettableClock extends Clock {
    private final AtomicReference<Instant> now;

    public SettableClock(Instant now) {
        this.now = new AtomicReference<>(now);
    }

    public void set(Instant to) {
        now.set(to);
    }

    public void pass(Duration by) {
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
