package org.hingeline.web;

import io.micrometer.core.instrument.Counter;
import io.micrometer.core.instrument.MeterRegistry;
import org.hingeline.monitor.ReadingIntake.Answer;

/** What is counted as it happens. */
final class Meters {
    private final Counter stored;
    private final Counter duplicates;
    private final Counter refused;

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
    }

    void readings(Answer answer) {
        stored.increment(answer.stored());
        duplicates.increment(answer.duplicates());
        refused.increment(answer.refused().size());
    }
}
