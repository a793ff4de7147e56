package org.hingeline.delivery;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.function.Function;
import org.hingeline.delivery.Channel.Outcome;
import org.hingeline.monitor.JournalBook;
import org.hingeline.monitor.OutboxBook.Message;
import org.hingeline.monitor.OutboxBook.State;
import org.junit.jupiter.api.Test;

class CourierTest {
    private static final Instant START = Instant.parse("2026-05-14T10:24:00Z");
    private static final RetryPlan PLAN = new RetryPlan(
            List.of(Duration.ofSeconds(10), Duration.ofSeconds(30), Duration.ofMinutes(2)), Duration.ofHours(1), 50);

    private final FakeStorage storage = new FakeStorage();
    private final List<String> delivered = Collections.synchronizedList(new ArrayList<>());
    private volatile Instant now = START;
    private volatile Function<Message, Outcome> answer = message -> new Outcome.Accepted();

    private final Courier courier = courier("node-a", PLAN, 0);

    @Test
    void sends_what_is_due_and_marks_it() {
        long first = storage.queue("a", "ines@example.org", START);
        long second = storage.queue("b", "kofi@example.org", START);
        long later = storage.queue("c", "kofi@example.org", START.plusSeconds(60));

        assertThat(courier.deliverDue()).isEqualTo(2);

        assertThat(delivered).containsExactly("a", "b");
        assertThat(storage.stored(first).state()).isEqualTo(State.SENT);
        assertThat(storage.stored(first).sentAt()).isEqualTo(START);
        assertThat(storage.stored(second).state()).isEqualTo(State.SENT);
        assertThat(storage.stored(later).state()).isEqualTo(State.WAITING);
        assertThat(courier.numbers()).isEqualTo(new Courier.Numbers(2, 0, 0));
        assertThat(courier.deliverDue()).isZero();
    }

    @Test
    void pauses_grow_and_the_last_one_repeats() {
        long id = storage.queue("a", "ines@example.org", START);
        answer = message -> new Outcome.FailedForNow("no answer");
        List<Duration> pauses = new ArrayList<>();

        for (int attempt = 1; attempt <= 5; attempt++) {
            assertThat(courier.deliverDue()).isEqualTo(1);
            pauses.add(Duration.between(now, storage.stored(id).nextAttemptAt()));
            now = storage.stored(id).nextAttemptAt().minusMillis(1);
            assertThat(courier.deliverDue()).as("a moment too early").isZero();
            now = now.plusMillis(1);
        }

        assertThat(pauses)
                .containsExactly(
                        Duration.ofSeconds(10),
                        Duration.ofSeconds(30),
                        Duration.ofMinutes(2),
                        Duration.ofMinutes(2),
                        Duration.ofMinutes(2));
        assertThat(storage.stored(id).attempts()).isEqualTo(5);
        assertThat(storage.stored(id).lastError()).isEqualTo("no answer");
        assertThat(courier.numbers()).isEqualTo(new Courier.Numbers(0, 5, 0));
    }

    @Test
    void a_pause_is_up_to_a_tenth_longer_by_chance() {
        long id = storage.queue("a", "ines@example.org", START);
        answer = message -> new Outcome.FailedForNow("no answer");

        courier("node-a", PLAN, 1).deliverDue();

        assertThat(storage.stored(id).nextAttemptAt()).isEqualTo(START.plusSeconds(11));
    }

    @Test
    void gives_up_a_message_that_has_failed_for_too_long_and_says_so_in_the_journal() {
        long id = storage.queue("a", "ines@example.org", START);
        answer = message -> new Outcome.FailedForNow("no answer");
        now = START.plus(Duration.ofHours(1)).minusMillis(1);
        courier.deliverDue();
        assertThat(storage.stored(id).state()).isEqualTo(State.WAITING);

        now = START.plus(Duration.ofHours(2));
        courier.deliverDue();

        assertThat(storage.stored(id).state()).isEqualTo(State.GIVEN_UP);
        assertThat(storage.stored(id).lastError()).isEqualTo("no answer");
        assertThat(storage.journalEntries())
                .containsExactly(new JournalBook.Entry(
                        now,
                        1L,
                        "hingeline",
                        "message-given-up",
                        "Inés Vale",
                        "\"HIGH: Larval 3, Ω 1.62 under 1.80 - Fennick Bay\": no answer"));
        assertThat(courier.numbers()).isEqualTo(new Courier.Numbers(0, 1, 1));
        now = now.plus(Duration.ofDays(1));
        assertThat(courier.deliverDue()).isZero();
    }

    @Test
    void gives_up_at_once_what_is_refused_for_good_and_goes_on_with_the_others() {
        long wrong = storage.queue("a", "nobody@example.org", START);
        long right = storage.queue("b", "ines@example.org", START);
        answer = message -> message.recipient().startsWith("nobody")
                ? new Outcome.Refused("550 no such user")
                : new Outcome.Accepted();

        courier.deliverDue();

        assertThat(storage.stored(wrong).state()).isEqualTo(State.GIVEN_UP);
        assertThat(storage.stored(wrong).lastError()).isEqualTo("550 no such user");
        assertThat(storage.stored(right).state()).isEqualTo(State.SENT);
        assertThat(storage.journalEntries()).hasSize(1);
    }

    @Test
    void a_crash_between_sending_and_marking_sends_again_with_the_same_key() {
        long id = storage.queue("alert-5-raised-1", "ines@example.org", START);
        storage.breakOnMark(true);
        courier.deliverDue();
        assertThat(delivered).containsExactly("alert-5-raised-1");
        assertThat(storage.stored(id).state()).isEqualTo(State.WAITING);

        storage.breakOnMark(false);
        Courier other = courier("node-b", PLAN, 0);
        now = START.plus(Duration.ofMinutes(2)).plusSeconds(29);
        assertThat(other.deliverDue())
                .as("the claim of the first node still holds")
                .isZero();
        now = START.plus(Duration.ofMinutes(2)).plusSeconds(30);
        assertThat(other.deliverDue()).isEqualTo(1);

        assertThat(delivered).containsExactly("alert-5-raised-1", "alert-5-raised-1");
        assertThat(storage.stored(id).state()).isEqualTo(State.SENT);
    }

    @Test
    void a_claim_keeps_a_second_node_away_while_the_first_is_sending() throws Exception {
        storage.queue("a", "ines@example.org", START);
        CountDownLatch sending = new CountDownLatch(1);
        CountDownLatch maySend = new CountDownLatch(1);
        answer = message -> {
            sending.countDown();
            await(maySend);
            return new Outcome.Accepted();
        };
        ExecutorService thread = Executors.newSingleThreadExecutor();
        try {
            Future<Integer> first = thread.submit(courier::deliverDue);
            await(sending);

            assertThat(courier("node-b", PLAN, 0).deliverDue()).isZero();

            maySend.countDown();
            assertThat(first.get(10, TimeUnit.SECONDS)).isEqualTo(1);
        } finally {
            thread.shutdownNow();
        }
        assertThat(delivered).containsExactly("a");
    }

    @Test
    void overlapping_runs_send_each_message_once() throws Exception {
        List<String> keys = new ArrayList<>();
        for (int i = 0; i < 200; i++) {
            keys.add("m" + i);
            storage.queue("m" + i, "ines@example.org", START);
        }
        ExecutorService threads = Executors.newFixedThreadPool(4);
        try {
            List<Future<Integer>> runs = new ArrayList<>();
            for (int i = 0; i < 4; i++) {
                Courier one = courier("node-" + i, new RetryPlan(PLAN.pauses(), PLAN.giveUpAfter(), 1000), 0);
                runs.add(threads.submit(one::deliverDue));
            }
            int tried = 0;
            for (Future<Integer> run : runs) {
                tried += run.get(20, TimeUnit.SECONDS);
            }
            assertThat(tried).isEqualTo(200);
        } finally {
            threads.shutdownNow();
        }
        assertThat(delivered).containsExactlyInAnyOrderElementsOf(keys);
    }

    @Test
    void one_run_tries_no_more_than_it_may() {
        for (int i = 0; i < 5; i++) {
            storage.queue("m" + i, "ines@example.org", START);
        }
        Courier small = courier("node-a", new RetryPlan(PLAN.pauses(), PLAN.giveUpAfter(), 3), 0);

        assertThat(small.deliverDue()).isEqualTo(3);
        assertThat(small.deliverDue()).isEqualTo(2);
    }

    @Test
    void an_interrupted_run_stops_before_the_next_message() {
        storage.queue("a", "ines@example.org", START);
        storage.queue("b", "ines@example.org", START);
        answer = message -> {
            Thread.currentThread().interrupt();
            return new Outcome.Accepted();
        };

        int tried = courier.deliverDue();

        assertThat(Thread.interrupted()).isTrue();
        assertThat(tried).isEqualTo(1);
        assertThat(storage.stored(1).state()).isEqualTo(State.SENT);
        assertThat(storage.stored(2).state()).isEqualTo(State.WAITING);
    }

    @Test
    void an_error_in_a_channel_is_a_failure_for_now_and_its_words_stay_in_the_log() {
        long id = storage.queue("a", "ines@example.org", START);
        answer = message -> {
            throw new IllegalStateException("something internal");
        };

        courier.deliverDue();

        assertThat(storage.stored(id).state()).isEqualTo(State.WAITING);
        assertThat(storage.stored(id).lastError())
                .isEqualTo("an error in this program (IllegalStateException); the log has more");
    }

    @Test
    void a_message_for_a_channel_that_is_not_set_up_waits() {
        long id = storage.queue("a", "ines@example.org", START);

        new Courier(storage, List.of(), PLAN, "node-a", () -> now, () -> 0).deliverDue();

        assertThat(storage.stored(id).state()).isEqualTo(State.WAITING);
        assertThat(storage.stored(id).lastError()).isEqualTo("no channel \"email\" is set up");
    }

    @Test
    void a_plan_without_pauses_is_no_plan() {
        assertThatThrownBy(() -> new RetryPlan(List.of(), Duration.ofHours(1), 1))
                .hasMessage("pauses [] must be one or more, each above 0");
        assertThatThrownBy(() -> new RetryPlan(List.of(Duration.ZERO), Duration.ofHours(1), 1))
                .hasMessageContaining("each above 0");
    }

    private Courier courier(String node, RetryPlan plan, double chance) {
        return new Courier(storage, List.of(new Scripted()), plan, node, () -> now, () -> chance);
    }

    private static void await(CountDownLatch latch) {
        try {
            assertThat(latch.await(10, TimeUnit.SECONDS)).isTrue();
        } catch (InterruptedException interrupted) {
            throw new IllegalStateException(interrupted);
        }
    }

    private final class Scripted implements Channel {
        @Override
        public String code() {
            return "email";
        }

        @Override
        public Duration longestAttempt() {
            return Duration.ofMinutes(2);
        }

        @Override
        public Outcome deliver(Message message) {
            delivered.add(message.key());
            return answer.apply(message);
        }
    }
}
