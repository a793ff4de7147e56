package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.store.Samples.T0;

import java.time.Instant;
import java.util.List;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.JournalBook.Entry;
import org.junit.jupiter.api.Test;

interface JournalContract extends StoreUnderTest {

    @Test
    default void the_journal_is_read_newest_first_and_of_one_moment_the_last_entry_first() {
        Site north = Samples.site(store(), "north");
        Entry middle = add(north.id(), T0.plusSeconds(1), "first of the moment");
        Entry middleToo = add(north.id(), T0.plusSeconds(1), "second of the moment");
        Entry newest = add(north.id(), T0.plusSeconds(2), "newest");
        Entry oldest = add(north.id(), T0, "oldest");

        assertThat(entries(north, 10)).containsExactly(newest, middleToo, middle, oldest);
        assertThat(entries(north, 2)).containsExactly(newest, middleToo);
    }

    @Test
    default void the_journal_of_a_site_holds_nothing_of_another_or_of_the_whole_installation() {
        Site north = Samples.site(store(), "north");
        Site south = Samples.site(store(), "south");
        Entry ours = add(north.id(), T0, "ours");
        add(south.id(), T0, "theirs");
        add(null, T0, "everybody's");

        assertThat(entries(north, 10)).containsExactly(ours);
    }

    @Test
    default void overlong_words_are_shortened() {
        Site north = Samples.site(store(), "north");
        done().journal().add(new Entry(T0, north.id(), "w".repeat(99), "done", "s".repeat(999), "d".repeat(9999)));

        Entry entry = entries(north, 1).get(0);

        assertThat(entry.who()).hasSize(80);
        assertThat(entry.subject()).hasSize(200);
        assertThat(entry.detail()).hasSize(2000);
    }

    private Entry add(Long siteId, Instant at, String detail) {
        Entry entry = new Entry(at, siteId, "mia", "limit-changed", "omega at tank", detail);
        done().journal().add(entry);
        return entry;
    }

    private List<Entry> entries(Site site, int most) {
        return seen().journal().entries(site.id(), most);
    }
}
