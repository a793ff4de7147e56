package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.time.Instant;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Signed;
import org.hingeline.hatchery.Dose.Standing;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

interface DoseContract extends StoreUnderTest {
    Dose.Foretold FORETOLD = new Dose.Foretold(
            T0.minusSeconds(60),
            4000,
            22.5,
            30.25,
            30,
            new Dose.Water(7.75, 1.5, 2078, 1983.5),
            new Dose.Water(8.0, 2.75, 2378, 2133.5),
            0.0075,
            0.0625,
            10);

    @Test
    default void a_dose_is_kept_with_what_was_foretold_of_it() {
        Samples.Place north = Samples.place(store(), "north");
        Dose given = dose(north, "key-0001", T0, FORETOLD, null, false);

        long id = done().doses().add(given);

        assertThat(find(north, id))
                .isEqualTo(new Dose(
                        id,
                        north.site().id(),
                        north.tank().id(),
                        "key-0001",
                        T0,
                        T0.plusSeconds(5),
                        "mia",
                        given.given(),
                        true,
                        FORETOLD,
                        null,
                        null,
                        false,
                        null,
                        null));
        assertThat(seen().doses().byKey(north.site().id(), "key-0001")).contains(find(north, id));
        assertThat(seen().doses().byKey(north.site().id(), "key-0002")).isEmpty();
    }

    @Test
    default void a_key_is_taken_once_at_a_site_and_a_dose_is_seen_at_its_own_only() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");
        long id = done().doses().add(dose(north, "key-0001", T0, null, null, false));

        assertThatThrownBy(() -> done().doses().add(dose(north, "key-0001", T0.plusSeconds(1), null, null, false)))
                .isInstanceOf(RuntimeException.class);
        done().doses().add(dose(south, "key-0001", T0, null, null, false));

        assertThat(seen().doses().between(north.tank().id(), Instant.EPOCH, T0.plusSeconds(100)))
                .hasSize(1);
        assertThat(seen().doses().dose(south.site().id(), id)).isEmpty();
    }

    @Test
    default void doses_of_a_span_come_oldest_first_with_both_ends() {
        Samples.Place north = Samples.place(store(), "north");
        long late = done().doses().add(dose(north, "key-late", T0.plusSeconds(20), null, null, false));
        long early = done().doses().add(dose(north, "key-early", T0, null, null, false));
        done().doses().add(dose(north, "key-after", T0.plusSeconds(21), null, null, false));

        assertThat(seen().doses().between(north.tank().id(), T0, T0.plusSeconds(20)))
                .extracting(Dose::id)
                .containsExactly(early, late);
    }

    @Test
    default void a_correction_takes_the_place_of_an_entry_until_it_is_undone_itself() {
        Samples.Place north = Samples.place(store(), "north");
        long wrong = done().doses().add(dose(north, "key-0001", T0, FORETOLD, null, false));
        long right = done().doses().add(dose(north, "key-0002", T0, null, wrong, false));

        assertThat(find(north, wrong).correctedBy()).isEqualTo(right);
        assertThat(find(north, wrong).standing()).isEqualTo(Standing.CORRECTED);
        assertThat(find(north, right).corrects()).isEqualTo(wrong);

        done().doses().undo(right, new Signed("mia", T0.plusSeconds(60)));

        assertThat(find(north, wrong).standing()).isEqualTo(Standing.RECORDED);
        assertThat(find(north, right).undone()).isEqualTo(new Signed("mia", T0.plusSeconds(60)));
        assertThat(find(north, right).counts()).isFalse();
    }

    @Test
    default void a_dose_that_waits_for_a_second_person_is_confirmed_once() {
        Samples.Place north = Samples.place(store(), "north");
        long id = done().doses().add(dose(north, "key-0001", T0, FORETOLD, null, true));
        assertThat(find(north, id).standing()).isEqualTo(Standing.PENDING);
        Signed ben = new Signed("ben", T0.plusSeconds(300));

        done().doses().confirm(id, ben, T0.plusSeconds(300), FORETOLD);

        assertThat(find(north, id).standing()).isEqualTo(Standing.RECORDED);
        assertThat(find(north, id).confirmed()).isEqualTo(ben);
        assertThat(find(north, id).at()).isEqualTo(T0.plusSeconds(300));
        assertThat(find(north, id).foretold()).isEqualTo(FORETOLD);
        assertThatThrownBy(() -> done().doses().confirm(id, ben, T0, null)).isInstanceOf(StoreException.class);
        assertThat(find(north, id).foretold()).isEqualTo(FORETOLD);
    }

    @Test
    default void a_dose_is_undone_once_and_stays_in_the_record() {
        Samples.Place north = Samples.place(store(), "north");
        long id = done().doses().add(dose(north, "key-0001", T0, null, null, false));
        Signed mia = new Signed("mia", T0.plusSeconds(60));

        done().doses().undo(id, mia);

        assertThatThrownBy(() -> done().doses().undo(id, new Signed("ben", T0.plusSeconds(70))))
                .isInstanceOf(StoreException.class);
        assertThat(find(north, id).undone()).isEqualTo(mia);
        assertThat(seen().doses().between(north.tank().id(), T0, T0)).hasSize(1);
    }

    private Dose find(Samples.Place place, long id) {
        return seen().doses().dose(place.site().id(), id).orElseThrow();
    }

    private static Dose dose(
            Samples.Place place,
            String key,
            Instant at,
            Dose.@Nullable Foretold foretold,
            @Nullable Long corrects,
            boolean secondPerson) {
        return new Dose(
                0,
                place.site().id(),
                place.tank().id(),
                key,
                at,
                T0.plusSeconds(5),
                "mia",
                new Dose.Given("sodium-carbonate", "anhydrous", 99.5, "SA-2291", 160.25, "by the inlet"),
                true,
                foretold,
                corrects,
                null,
                secondPerson,
                null,
                null);
    }
}
