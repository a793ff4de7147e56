package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.Consumer;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Observation;
import org.hingeline.alert.Phase;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Books;
import org.hingeline.monitor.JournalBook.Entry;
import org.hingeline.monitor.LimitBook.Watched;
import org.junit.jupiter.api.Test;

interface TransactionContract extends StoreUnderTest {

    @Test
    default void a_transaction_that_throws_leaves_nothing_behind() {
        Samples.Place north = Samples.place(store(), "north");

        assertThatThrownBy(() -> store().write(books -> {
                    books.place()
                            .saveSite(new Site(0, "south", "South", north.site().zone()));
                    books.readings().insert(List.of(Samples.reading(north.ph(), T0, 7.7)), 1, T0);
                    books.journal().add(new Entry(T0, north.site().id(), "mia", "x", "y", "z"));
                    throw new IllegalStateException("thought better of it");
                }))
                .isInstanceOf(IllegalStateException.class)
                .hasMessage("thought better of it");

        assertThat(seen().place().sites()).containsExactly(north.site());
        assertThat(seen().readings().between(north.ph().id(), T0, T0)).isEmpty();
        assertThat(seen().journal().entries(north.site().id(), 9)).isEmpty();
    }

    @Test
    default void a_transaction_that_throws_an_error_leaves_nothing_behind() {
        assertThatThrownBy(() -> store().write(books -> {
                    books.people().savePerson("mia", "Mia", "hash", T0);
                    throw new AssertionError("out of everything");
                }))
                .isInstanceOf(AssertionError.class);

        assertThat(seen().people().countPeople()).isZero();
    }

    @Test
    default void work_goes_on_after_a_transaction_that_the_database_refused() {
        Samples.Place north = Samples.place(store(), "north");
        Site unknown = new Site(4711, "south", "South", north.site().zone());

        assertThatThrownBy(() -> done().place().savePoint(Samples.tank(unknown, "tank")))
                .isInstanceOf(RuntimeException.class);

        assertThat(Samples.tank(store(), north.site(), "tank-2").id()).isPositive();
        assertThat(seen().place().points(north.site().id())).hasSize(2);
    }

    @Test
    default void a_transaction_sees_what_it_wrote_and_others_see_it_after_it_ends() {
        int inside = store().write(books -> {
            books.people().savePerson("mia", "Mia", "hash", T0);
            int outside = CompletableFuture.supplyAsync(() -> seen().people().countPeople())
                    .join();
            assertThat(outside).isZero();
            return books.people().countPeople();
        });

        assertThat(inside).isOne();
        assertThat(seen().people().countPeople()).isOne();
    }

    @Test
    default void no_change_of_a_watched_limit_is_lost_between_writers() throws Exception {
        Samples.Place north = Samples.place(store(), "north");
        Limit limit = done().limits().saveLimit(LimitContract.limit(north.tank(), "omega", 1), T0);

        together(4, 10, books -> {
            Watched watched =
                    books.limits().watchedForUpdate(List.of(north.tank().id())).get(0);
            Observation latest = watched.state().latest();
            double count = latest == null ? 0 : latest.value();
            Observation next = new Observation(T0, count + 1, 0);
            books.limits().saveState(limit.id(), new AlertState(Phase.NORMAL, null, null, next), null);
        });

        assertThat(done().limits().watchedForUpdate(List.of(north.tank().id())))
                .extracting(watched -> watched.state().latest().value())
                .containsExactly(40.0);
    }

    @Test
    default void writers_that_lock_the_same_point_take_turns() throws Exception {
        Samples.Place north = Samples.place(store(), "north");
        long tank = north.tank().id();

        // without the lock, two writers would find the same newest time and give the same next one
        together(4, 10, books -> {
            books.place().lockPoints(List.of(tank));
            var next =
                    books.readings().newestAt(tank).map(at -> at.plusMillis(1)).orElse(T0);
            books.readings().insert(List.of(Samples.reading(north.ph(), next, 7)), 1, T0);
        });

        assertThat(seen().readings().between(north.ph().id(), T0, T0.plusSeconds(9)))
                .hasSize(40)
                .last()
                .isEqualTo(Samples.reading(north.ph(), T0.plusMillis(39), 7));
    }

    @Test
    default void what_the_scheduler_writes_by_itself_is_there_for_everybody() throws Exception {
        RawSql.run(store(), """
                INSERT INTO scheduled_tasks (task_name, task_instance, execution_time, picked, version)
                VALUES ('silence', 'one', TIMESTAMP WITH TIME ZONE '2026-05-14 03:20:00+00', FALSE, 1)
                """);

        assertThat(RawSql.ask(store(), "SELECT task_instance FROM scheduled_tasks"))
                .isEqualTo("one");
    }

    @Test
    default void a_database_that_was_closed_says_that_it_does_not_answer() {
        Database other = another();
        other.checkAlive();

        other.close();
        other.close();

        assertThatThrownBy(other::checkAlive).isInstanceOf(StoreException.class);
        store().checkAlive();
    }

    private void together(int writers, int times, Consumer<Books> work) throws Exception {
        Callable<Integer> writer = () -> {
            for (int i = 0; i < times; i++) {
                store().writeOnly(work);
            }
            return times;
        };
        ExecutorService nodes = Executors.newFixedThreadPool(writers);
        try {
            List<Callable<Integer>> all = new ArrayList<>();
            for (int i = 0; i < writers; i++) {
                all.add(writer);
            }
            for (Future<Integer> done : nodes.invokeAll(all)) {
                assertThat(done.get()).isEqualTo(times);
            }
        } finally {
            nodes.shutdown();
        }
    }
}
