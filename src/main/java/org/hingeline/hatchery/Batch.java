package org.hingeline.hatchery;

import java.time.Duration;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * A cohort of larvae in a tank.
 *
 * @param endedAt when it left the tank, or absent while it is there
 */
public record Batch(
        long id,
        long pointId,
        String code,
        String species,
        Instant spawnedAt,
        @Nullable Instant endedAt) {

    /** The time in which embryos build their first shell. */
    public static final Duration FIRST_SHELL = Duration.ofHours(48);

    public Batch {
        Codes.check("batch code", code);
        Codes.checkName("species", species);
    }

    public Duration age(Instant now) {
        return Duration.between(spawnedAt, now);
    }

    /** Whether the larvae are building their first shell, the time when they need carbonate most. */
    public boolean buildsFirstShell(Instant now) {
        Duration age = age(now);
        return !age.isNegative() && age.compareTo(FIRST_SHELL) < 0;
    }
}
