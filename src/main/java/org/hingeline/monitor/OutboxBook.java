package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/** Messages to people: written with the alert, in its transaction; delivered afterwards, at least once. */
public interface OutboxBook {

    /** Where a message stands. */
    enum State {
        WAITING,
        SENT,
        GIVEN_UP
    }

    /**
     * A message.
     *
     * @param key stable over retries and unique, so that a receiver can tell a repeat; also the e-mail's Message-ID
     * @param channel how it goes: {@code email}
     * @param attempts how often it was tried
     * @param nextAttemptAt when it is due, while waiting
     */
    record Message(
            long id,
            long siteId,
            @Nullable Long alertId,
            String key,
            String channel,
            String recipientName,
            String recipient,
            String subject,
            String body,
            State state,
            int attempts,
            Instant createdAt,
            Instant nextAttemptAt,
            @Nullable Instant sentAt,
            @Nullable String lastError) {}

    /** How much is waiting, for the health check and the metrics. */
    record Backlog(int waiting, @Nullable Instant oldest) {}

    /** Queues a message; ids and state in the record are ignored. */
    void add(Message message);

    /** Whether a message waits that nobody has taken. */
    boolean anyDue(Instant now);

    /**
     * Takes due messages for this node: nobody else gets them until the claim ends.
     *
     * @param claim how long the taker may work on them
     */
    List<Message> claimDue(Instant now, Duration claim, String node, int most);

    void sent(long id, Instant at);

    /** Notes a failed attempt; the message is due again at {@code nextAttemptAt}. */
    void failed(long id, String error, Instant nextAttemptAt);

    /** Notes a failed attempt after which no other follows. */
    void givenUp(long id, String error);

    Backlog backlog();

    Optional<Message> message(long siteId, long id);

    /** Newest first. */
    List<Message> messages(long siteId, int most);

    List<Message> messagesOf(long alertId);
}
