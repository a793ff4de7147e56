package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Duration;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Test;

class TurnsTest {
    private static final Duration LONG = Duration.ofSeconds(30);

    @Test
    void turns_away_what_finds_neither_a_place_nor_room_to_wait() throws Exception {
        Turns turns = new Turns(1, 0, LONG);
        CountDownLatch inside = new CountDownLatch(1);
        CountDownLatch leave = new CountDownLatch(1);
        ExecutorService threads = Executors.newSingleThreadExecutor();
        try {
            Future<?> first = threads.submit(() -> turns.run(() -> {
                inside.countDown();
                awaitQuietly(leave);
            }));
            inside.await();
            assertThat(turns.run(() -> {})).isFalse();
            leave.countDown();
            first.get();
            assertThat(turns.run(() -> {})).isTrue();
        } finally {
            threads.shutdownNow();
        }
    }

    @Test
    void turns_away_what_waited_too_long() throws Exception {
        Turns turns = new Turns(1, 5, Duration.ofMillis(20));
        ExecutorService threads = Executors.newSingleThreadExecutor();
        try {
            boolean done = turns.run(() -> assertThat(waiting(threads, turns)).isFalse());
            assertThat(done).isTrue();
        } finally {
            threads.shutdownNow();
        }
    }

    @Test
    void frees_the_place_of_work_that_failed() {
        Turns turns = new Turns(1, 0, LONG);
        assertThatThrownBy(() -> turns.run(() -> {
                    throw new IllegalStateException("failed");
                }))
                .hasMessage("failed");
        assertThat(turns.run(() -> {})).isTrue();
    }

    private static boolean waiting(ExecutorService threads, Turns turns) {
        try {
            return threads.submit(() -> turns.run(() -> {})).get();
        } catch (InterruptedException | ExecutionException e) {
            throw new IllegalStateException(e);
        }
    }

    private static void awaitQuietly(CountDownLatch latch) {
        try {
            latch.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
