package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.OutboxBook.Backlog;
import org.hingeline.monitor.OutboxBook.Message;
import org.hingeline.monitor.OutboxBook.State;
import org.junit.jupiter.api.Test;

interface OutboxContract extends StoreUnderTest {
    Duration CLAIM = Duration.ofMinutes(2);

    @Test
    default void a_message_comes_back_waiting_whatever_its_record_said() {
        Samples.Place north = Samples.place(store(), "north");
        Limit omega = done().limits().saveLimit(LimitContract.limit(north.tank(), "omega", 1), T0);
        long alert = done().alerts().open(AlertContract.alert(north, omega, T0));
        Message given = new Message(
                99,
                north.site().id(),
                alert,
                "key-1",
                "email",
                "Night",
                "night@hatchery.example",
                "\u03a9 low",
                "Close the valve.\nDraw from storage.",
                State.SENT,
                7,
                T0,
                T0.plusSeconds(1),
                T0,
                "error");

        done().outbox().add(given);

        Message found = all(north.site()).get(0);
        assertThat(found)
                .isEqualTo(new Message(
                        found.id(),
                        north.site().id(),
                        alert,
                        "key-1",
                        "email",
                        "Night",
                        "night@hatchery.example",
                        "\u03a9 low",
                        "Close the valve.\nDraw from storage.",
                        State.WAITING,
                        0,
                        T0,
                        T0.plusSeconds(1),
                        null,
                        null));
        assertThat(seen().outbox().messagesOf(alert)).containsExactly(found);
        assertThat(seen().outbox().messagesOf(alert + 1)).isEmpty();
    }

    @Test
    default void a_message_key_is_used_once() {
        Site north = Samples.site(store(), "north");
        add(north, "key-1", T0);

        assertThatThrownBy(() -> add(north, "key-1", T0)).isInstanceOf(RuntimeException.class);

        assertThat(all(north)).hasSize(1);
    }

    @Test
    default void messages_are_shown_to_their_site_alone_newest_first() {
        Site north = Samples.site(store(), "north");
        Site south = Samples.site(store(), "south");
        add(north, "a", T0);
        add(north, "b", T0.plusSeconds(1));
        add(north, "c", T0.plusSeconds(1));
        add(south, "d", T0);

        assertThat(all(north)).extracting(Message::key).containsExactly("c", "b", "a");
        assertThat(seen().outbox().messages(north.id(), 2))
                .extracting(Message::key)
                .containsExactly("c", "b");
        long id = all(south).get(0).id();
        assertThat(seen().outbox().message(north.id(), id)).isEmpty();
        assertThat(seen().outbox().message(south.id(), id)).isPresent();
    }

    @Test
    default void due_messages_are_claimed_in_the_order_they_are_due_up_to_a_number() {
        Site north = Samples.site(store(), "north");
        add(north, "third", T0.plusSeconds(2));
        add(north, "first", T0);
        add(north, "second", T0.plusSeconds(1));
        add(north, "not yet", T0.plusSeconds(2).plusMillis(1));

        assertThat(claim(T0.plusSeconds(2), 2)).containsExactly("first", "second");
        assertThat(claim(T0.plusSeconds(2), 9)).containsExactly("third");
        assertThat(claim(T0.plusSeconds(2), 9)).isEmpty();
    }

    @Test
    default void a_claimed_message_is_free_again_when_the_claim_ends() {
        Site north = Samples.site(store(), "north");
        add(north, "a", T0);
        assertThat(claim(T0, 9)).containsExactly("a");

        assertThat(claim(T0.plus(CLAIM).minusMillis(1), 9)).isEmpty();
        assertThat(claim(T0.plus(CLAIM), 9)).containsExactly("a");
    }

    @Test
    default void a_sent_message_is_never_claimed_again() {
        Site north = Samples.site(store(), "north");
        add(north, "a", T0);
        long id = all(north).get(0).id();
        done().outbox().failed(id, "no route", T0);
        claim(T0, 9);

        done().outbox().sent(id, T0.plusSeconds(3));

        Message sent = all(north).get(0);
        assertThat(sent.state()).isEqualTo(State.SENT);
        assertThat(sent.attempts()).isEqualTo(2);
        assertThat(sent.sentAt()).isEqualTo(T0.plusSeconds(3));
        assertThat(sent.lastError()).isNull();
        assertThat(claim(T0.plus(Duration.ofDays(9)), 9)).isEmpty();
        assertThatThrownBy(() -> done().outbox().failed(id, "late", T0)).isInstanceOf(StoreException.class);
        assertThatThrownBy(() -> done().outbox().givenUp(id, "late")).isInstanceOf(StoreException.class);
    }

    @Test
    default void a_failed_message_is_due_again_at_its_next_time() {
        Site north = Samples.site(store(), "north");
        add(north, "a", T0);
        claim(T0, 9);
        long id = all(north).get(0).id();

        done().outbox().failed(id, "x".repeat(3000), T0.plusSeconds(30));

        Message failed = all(north).get(0);
        assertThat(failed.state()).isEqualTo(State.WAITING);
        assertThat(failed.attempts()).isEqualTo(1);
        assertThat(failed.nextAttemptAt()).isEqualTo(T0.plusSeconds(30));
        assertThat(failed.lastError()).hasSize(1000);
        assertThat(claim(T0.plusSeconds(30).minusMillis(1), 9)).isEmpty();
        assertThat(claim(T0.plusSeconds(30), 9)).containsExactly("a");
    }

    @Test
    default void a_message_given_up_stays_with_its_reason() {
        Site north = Samples.site(store(), "north");
        add(north, "a", T0);
        long id = all(north).get(0).id();

        done().outbox().givenUp(id, "no such mailbox");

        assertThat(all(north).get(0).state()).isEqualTo(State.GIVEN_UP);
        assertThat(all(north).get(0).attempts()).isEqualTo(1);
        assertThat(all(north).get(0).lastError()).isEqualTo("no such mailbox");
        assertThat(claim(T0.plus(Duration.ofDays(9)), 9)).isEmpty();
    }

    @Test
    default void the_backlog_counts_what_waits_and_since_when() {
        Site north = Samples.site(store(), "north");
        assertThat(seen().outbox().backlog()).isEqualTo(new Backlog(0, null));
        add(north, "b", T0.plusSeconds(1));
        add(north, "a", T0);
        add(north, "c", T0.plusSeconds(2));
        assertThat(seen().outbox().backlog()).isEqualTo(new Backlog(3, T0));

        long oldest = all(north).get(2).id();
        done().outbox().sent(oldest, T0);

        assertThat(seen().outbox().backlog()).isEqualTo(new Backlog(2, T0.plusSeconds(1)));
    }

    @Test
    default void a_message_is_due_from_its_time_until_somebody_takes_it_and_again_when_the_claim_ends() {
        Site north = Samples.site(store(), "north");
        add(north, "a", T0);

        assertThat(seen().outbox().anyDue(T0.minusMillis(1))).isFalse();
        assertThat(seen().outbox().anyDue(T0)).isTrue();

        claim(T0, 9);
        assertThat(seen().outbox().anyDue(T0.plus(CLAIM).minusMillis(1))).isFalse();
        assertThat(seen().outbox().anyDue(T0.plus(CLAIM))).isTrue();

        done().outbox().sent(all(north).get(0).id(), T0);
        assertThat(seen().outbox().anyDue(T0.plus(CLAIM))).isFalse();
    }

    @Test
    default void claimers_at_the_same_time_share_the_messages_and_never_get_the_same() throws Exception {
        Site north = Samples.site(store(), "north");
        List<String> keys = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            keys.add("key-" + i);
            add(north, "key-" + i, T0);
        }
        Callable<List<String>> claimer = () -> {
            List<String> mine = new ArrayList<>();
            for (int empty = 0; empty < 20; ) {
                List<String> taken = claim(T0, 3);
                mine.addAll(taken);
                empty = taken.isEmpty() ? empty + 1 : 0;
            }
            return mine;
        };
        ExecutorService nodes = Executors.newFixedThreadPool(4);
        List<String> claimed = new ArrayList<>();
        try {
            for (Future<List<String>> node : nodes.invokeAll(List.of(claimer, claimer, claimer, claimer))) {
                claimed.addAll(node.get());
            }
        } finally {
            nodes.shutdown();
        }

        assertThat(claimed).containsExactlyInAnyOrderElementsOf(keys);
    }

    private List<Message> all(Site site) {
        return seen().outbox().messages(site.id(), 100);
    }

    private List<String> claim(Instant now, int most) {
        return done().outbox().claimDue(now, CLAIM, "node", most).stream()
                .map(Message::key)
                .toList();
    }

    private void add(Site site, String key, Instant due) {
        done().outbox().add(message(site, key, due));
    }

    static Message message(Site site, String key, Instant due) {
        return new Message(
                0,
                site.id(),
                null,
                key,
                "email",
                "Night",
                "night@hatchery.example",
                "subject",
                "body",
                State.WAITING,
                0,
                due,
                due,
                null,
                null);
    }
}
