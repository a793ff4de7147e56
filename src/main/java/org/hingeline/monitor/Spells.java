package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.NavigableSet;
import java.util.TreeSet;

/**
 * Parts a batch at its long pauses, so that one row with a date of last year does not make the service read all that
 * lies between.
 */
final class Spells {
    private static final Duration PAUSE = Duration.ofHours(6);

    private Spells() {}

    /** The same times in order, in runs without a long pause. */
    static List<NavigableSet<Instant>> of(NavigableSet<Instant> times) {
        List<NavigableSet<Instant>> spells = new ArrayList<>();
        NavigableSet<Instant> spell = new TreeSet<>();
        for (Instant at : times) {
            if (!spell.isEmpty() && at.isAfter(spell.last().plus(PAUSE))) {
                spells.add(spell);
                spell = new TreeSet<>();
            }
            spell.add(at);
        }
        if (!spell.isEmpty()) {
            spells.add(spell);
        }
        return spells;
    }
}
