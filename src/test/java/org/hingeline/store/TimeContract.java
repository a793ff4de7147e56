package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.TimeZone;
import org.hingeline.monitor.Books;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

interface TimeContract extends StoreUnderTest {

    /** Around the hours that come twice or never on the local clock. */
    @ParameterizedTest
    @CsvSource({
        "Europe/Berlin, 2026-10-24T23:30:00Z", "Europe/Berlin, 2026-03-28T23:30:00Z",
        "America/St_Johns, 2026-11-01T03:00:00Z", "Pacific/Auckland, 2026-04-04T12:30:00Z"
    })
    default void times_keep_every_millisecond_in_a_zone_that_changes_its_clocks(String zone, Instant start)
            throws Exception {
        TimeZone usual = TimeZone.getDefault();
        TimeZone.setDefault(TimeZone.getTimeZone(zone));
        try (Database store = another()) {
            Samples.Place north = Samples.place(store, "north");
            List<StoredReading> readings = new ArrayList<>();
            for (int i = 0; i < 240; i++) {
                Instant at = start.plus(Duration.ofMinutes(i)).plusMillis(i * 37 % 1000);
                readings.add(Samples.reading(north.ph(), at, i));
            }
            Books seen = OneByOne.books(work -> store.read(work));
            long ph = north.ph().id();
            Instant end = start.plus(Duration.ofHours(5));
            store.writeOnly(books -> books.readings().insert(readings, 1, start));

            assertThat(seen.readings().between(ph, start, end)).containsExactlyElementsOf(readings);
            assertThat(seen.readings().newestAt(north.tank().id()))
                    .contains(readings.get(239).at());
            assertThat(RawSql.ask(store, "SELECT extract(EPOCH FROM min(at)) FROM reading"))
                    .isEqualTo(String.valueOf(start.getEpochSecond()));

            TimeZone.setDefault(TimeZone.getTimeZone("America/Los_Angeles"));
            assertThat(seen.readings().between(ph, start, end)).containsExactlyElementsOf(readings);
        } finally {
            TimeZone.setDefault(usual);
        }
    }
}
