package org.hingeline.web;

import io.micrometer.core.instrument.Counter;
import io.micrometer.core.instrument.MeterRegistry;
import io.micrometer.core.instrument.Timer;
import java.util.concurrent.TimeUnit;
import org.hingeline.monitor.ReadingIntake.Answer;

/** What is counted as it happens. */
final class Meters {
    private final Counter stored;
    private final Counter duplicates;
    private final Counter refused;
    private final Counter waters;
    private final Timer parsed;
    private final Timer computed;
    private final Timer written;

    Meters(MeterRegistry registry) {
        stored = Counter.builder("hingeline.readings.stored")
                .description("readings stored")
                .register(registry);
        duplicates = Counter.builder("hingeline.readings.duplicates")
                .description("readings that had been stored before")
                .register(registry);
        refused = Counter.builder("hingeline.readings.refused")
                .description("readings refused")
                .register(registry);
        waters = Counter.builder("hingeline.seawater.waters")
                .description("waters that were sent in lists to be computed")
                .register(registry);
        parsed = ofWaters(registry, "parse");
        computed = ofWaters(registry, "compute");
        written = ofWaters(registry, "write");
    }

    private static Timer ofWaters(MeterRegistry registry, String part) {
        return Timer.builder("hingeline.seawater.states")
                .description("what a list of waters took, by part")
                .tag("part", part)
                .register(registry);
    }

    void readings(Answer answer) {
        stored.increment(answer.stored());
        duplicates.increment(answer.duplicates());
        refused.increment(answer.refused().size());
    }

    /** A list of waters was answered; times in nanoseconds. */
    void states(int count, long parseNs, long computeNs, long writeNs) {
        waters.increment(count);
        parsed.record(parseNs, TimeUnit.NANOSECONDS);
        computed.record(computeNs, TimeUnit.NANOSECONDS);
        written.record(writeNs, TimeUnit.NANOSECONDS);
    }
}
