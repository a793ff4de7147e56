package org.hingeline.monitor;

import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Who did what when. Entries are added, never changed. */
public interface JournalBook {

    /**
     * An entry.
     *
     * @param siteId absent when it concerns the whole installation
     * @param who a person's or token's name, or {@code hingeline}
     * @param what a short code such as {@code limit-changed}
     * @param subject what it was done to
     * @param detail before and after, in words
     */
    record Entry(Instant at, @Nullable Long siteId, String who, String what, String subject, String detail) {}

    void add(Entry entry);

    /** Newest first. */
    List<Entry> entries(long siteId, int most);
}
