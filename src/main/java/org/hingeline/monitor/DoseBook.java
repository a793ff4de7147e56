package org.hingeline.monitor;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Dose;
import org.jspecify.annotations.Nullable;

/** The doses given. Records are added and marked, never deleted. */
public interface DoseBook {
    /** Adds a record; its id, and what corrects, confirms or undoes it, are ignored. */
    long add(Dose dose);

    Optional<Dose> dose(long siteId, long id);

    Optional<Dose> byKey(long siteId, String key);

    /** Every record of the point with from ≤ at ≤ to, whatever became of it, oldest first. */
    List<Dose> between(long pointId, Instant from, Instant to);

    /** Somebody else stands for it as well; the time it was put in and what is foretold may be later than first said. */
    void confirm(long id, Dose.Signed confirmed, Instant at, Dose.@Nullable Foretold foretold);

    void undo(long id, Dose.Signed undone);
}
