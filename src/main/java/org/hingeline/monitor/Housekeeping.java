package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;

/** The timed work that nobody asks for: time passing over the limits, late states computed again, old sessions gone. */
public final class Housekeeping {
    private static final Duration KEEP_REFUSED = Duration.ofDays(90);

    private final Storage storage;
    private final InstantSource clock;
    private final AlertWatch watch;
    private final WaterLedger ledger;

    public Housekeeping(Storage storage, InstantSource clock, AlertWatch watch, WaterRules water) {
        this.storage = storage;
        this.clock = clock;
        this.watch = watch;
        this.ledger = new WaterLedger(water);
    }

    /** Lets time pass over every limit. */
    public void watchLimits() {
        watch.tick(storage, clock.instant());
    }

    /**
     * Computes a few of the states again that late readings have made out of date.
     *
     * @return whether there is more to do
     */
    public boolean workOffLateReadings() {
        return storage.read(books -> books.water().nextSpan()).isPresent() && storage.write(ledger::workOff);
    }

    /** Takes away sessions that are over, and refused rows that nobody will look at any more. */
    public void tidy() {
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            books.people().removeSessionsExpiredBy(now);
            books.readings().removeRefusedBefore(now.minus(KEEP_REFUSED));
        });
    }
}
