package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;
import static org.hingeline.store.Samples.reading;

import java.time.Duration;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.CyclicBarrier;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Books;
import org.hingeline.monitor.OutboxBook.Message;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

@Timeout(60)
class PostgresStoreTest extends StoreContractTest {

    @Override
    public Database another() {
        PostgresContainer.Database database = PostgresContainer.freshDatabase();
        return PostgresDatabase.open(database.jdbcUrl(), database.user(), database.password());
    }

    @Test
    void a_server_that_cannot_be_reached_is_told_by_its_address() {
        assertThatThrownBy(() -> PostgresDatabase.open("jdbc:postgresql://localhost:1/none", "u", "p"))
                .isInstanceOf(StoreException.class)
                .hasMessageContaining("jdbc:postgresql://localhost:1/none");
    }

    @Test
    void a_claimer_passes_over_messages_that_another_is_claiming_and_does_not_wait() throws Exception {
        Site north = Samples.site(store(), "north");
        for (String key : List.of("a", "b", "c")) {
            store().writeOnly(books -> books.outbox().add(OutboxContract.message(north, key, T0)));
        }
        CountDownLatch otherIsDone = new CountDownLatch(1);
        CountDownLatch claimed = new CountDownLatch(1);
        ExecutorService node = Executors.newSingleThreadExecutor();
        try {
            Future<List<String>> slow = node.submit(() -> store().write(books -> {
                List<String> keys = claim(books, 2);
                claimed.countDown();
                await(otherIsDone);
                return keys;
            }));
            await(claimed);

            List<String> quick = store().write(books -> claim(books, 9));
            otherIsDone.countDown();

            assertThat(quick).containsExactly("c");
            assertThat(slow.get()).containsExactly("a", "b");
        } finally {
            otherIsDone.countDown();
            node.shutdown();
        }
    }

    @Test
    void of_two_writers_of_the_same_reading_one_wins_and_the_other_is_run_again_and_sees_it() throws Exception {
        Samples.Place north = Samples.place(store(), "north");
        CyclicBarrier bothFoundNothing = new CyclicBarrier(2);
        AtomicInteger runs = new AtomicInteger();
        AtomicInteger inserts = new AtomicInteger();
        ExecutorService nodes = Executors.newFixedThreadPool(2);
        try {
            Callable<Boolean> writer = () -> {
                AtomicInteger mine = new AtomicInteger();
                return store().write(books -> {
                    runs.incrementAndGet();
                    boolean known =
                            !books.readings().between(north.ph().id(), T0, T0).isEmpty();
                    if (mine.incrementAndGet() == 1) {
                        meet(bothFoundNothing);
                    }
                    if (!known) {
                        inserts.incrementAndGet();
                        books.readings().insert(List.of(reading(north.ph(), T0, 7.7)), 1, T0);
                    }
                    return known;
                });
            };

            Future<Boolean> one = nodes.submit(writer);
            Future<Boolean> other = nodes.submit(writer);

            assertThat(List.of(one.get(30, TimeUnit.SECONDS), other.get(30, TimeUnit.SECONDS)))
                    .containsExactlyInAnyOrder(false, true);
        } finally {
            nodes.shutdown();
        }
        assertThat(runs).hasValue(3);
        assertThat(inserts).hasValue(2);
    }

    private static List<String> claim(Books books, int most) {
        return books.outbox().claimDue(T0, Duration.ofMinutes(1), "node", most).stream()
                .map(Message::key)
                .toList();
    }

    private static void await(CountDownLatch latch) {
        try {
            assertThat(latch.await(20, TimeUnit.SECONDS)).isTrue();
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    private static void meet(CyclicBarrier barrier) {
        try {
            barrier.await(20, TimeUnit.SECONDS);
        } catch (Exception e) {
            throw new IllegalStateException(e);
        }
    }
}
