package org.hingeline;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.concurrent.atomic.AtomicReference;

/** Goes as the machine's clock does, and can be set forward: timed work keeps running, and nobody waits for hours. */
public final class SteppedClock extends Clock {
    private final AtomicReference<Duration> ahead = new AtomicReference<>(Duration.ZERO);
    private final Clock real = Clock.systemUTC();

    /** Lets this much time pass at once. */
    public void pass(Duration time) {
        ahead.updateAndGet(before -> before.plus(time));
    }

    @Override
    public Instant instant() {
        return real.instant().plus(ahead.get());
    }

    @Override
    public ZoneId getZone() {
        return ZoneOffset.UTC;
    }

    @Override
    public Clock withZone(ZoneId zone) {
        throw new UnsupportedOperationException("times are shown in the zone of the site, not of the clock");
    }
}
