package org.hingeline.delivery;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Map;
import java.util.concurrent.atomic.LongAdder;
import java.util.function.Consumer;
import java.util.function.DoubleSupplier;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.hingeline.delivery.Channel.Outcome;
import org.hingeline.monitor.Books;
import org.hingeline.monitor.JournalBook;
import org.hingeline.monitor.OutboxBook.Message;
import org.hingeline.monitor.Storage;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * Empties the outbox. Runs may overlap, on threads and on nodes: each message is claimed just before it is sent, for
 * longer than sending can take, so a node that dies holds up one message for that long and no other.
 */
public final class Courier {
    private static final Logger LOG = LoggerFactory.getLogger(Courier.class);
    private static final int REASON_MOST = 1000;

    private final Storage storage;
    private final Map<String, Channel> channels;
    private final RetryPlan plan;
    private final String node;
    private final InstantSource clock;
    private final DoubleSupplier chance;
    private final Duration claim;
    private final LongAdder sent = new LongAdder();
    private final LongAdder failed = new LongAdder();
    private final LongAdder givenUp = new LongAdder();

    /** Attempts since the start that were accepted, failed for now, and were the last of a message given up. */
    public record Numbers(long sent, long failed, long givenUp) {}

    /**
     * @param node name of this node among those that share the database
     * @param chance 0 to 1, drawn for each pause
     */
    public Courier(
            Storage storage,
            List<Channel> channels,
            RetryPlan plan,
            String node,
            InstantSource clock,
            DoubleSupplier chance) {
        this.storage = storage;
        this.channels = channels.stream().collect(Collectors.toUnmodifiableMap(Channel::code, Function.identity()));
        this.plan = plan;
        this.node = node;
        this.clock = clock;
        this.chance = chance;
        this.claim = channels.stream()
                .map(Channel::longestAttempt)
                .max(Duration::compareTo)
                .orElse(Duration.ZERO)
                .plusSeconds(30);
    }

    /**
     * Tries what is due, up to the most for one run. Stops early when its thread is interrupted.
     *
     * @return how many messages were tried
     */
    public int deliverDue() {
        int tried = 0;
        while (tried < plan.perRunMost() && !Thread.currentThread().isInterrupted()) {
            Message message = claimOne();
            if (message == null) {
                break;
            }
            settle(message, attempt(message));
            tried++;
        }
        return tried;
    }

    public Numbers numbers() {
        return new Numbers(sent.sum(), failed.sum(), givenUp.sum());
    }

    private @Nullable Message claimOne() {
        Instant now = clock.instant();
        List<Message> claimed = storage.write(books -> books.outbox().claimDue(now, claim, node, 1));
        return claimed.isEmpty() ? null : claimed.get(0);
    }

    private Outcome attempt(Message message) {
        Channel channel = channels.get(message.channel());
        if (channel == null) {
            return new Outcome.FailedForNow("no channel \"" + message.channel() + "\" is set up");
        }
        try {
            return channel.deliver(message);
        } catch (RuntimeException bug) {
            LOG.error("Message {} could not be tried", message.id(), bug);
            return new Outcome.FailedForNow(
                    "an error in this program (" + bug.getClass().getSimpleName() + "); the log has more");
        }
    }

    private void settle(Message message, Outcome outcome) {
        Instant now = clock.instant();
        if (outcome instanceof Outcome.Accepted) {
            sent.increment();
            mark(message, books -> books.outbox().sent(message.id(), now));
        } else if (outcome instanceof Outcome.Refused refused) {
            giveUp(message, refused.reason(), now);
        } else if (outcome instanceof Outcome.FailedForNow failure) {
            if (plan.isOver(message, now)) {
                giveUp(message, failure.reason(), now);
                return;
            }
            failed.increment();
            String reason = cut(failure.reason());
            Instant next = plan.nextAttempt(message, now, chance.getAsDouble());
            LOG.warn(
                    "Message {} failed at attempt {}, next at {}: {}",
                    message.id(),
                    message.attempts() + 1,
                    next,
                    reason);
            mark(message, books -> books.outbox().failed(message.id(), reason, next));
        }
    }

    private void giveUp(Message message, String reason, Instant now) {
        givenUp.increment();
        LOG.error("Message {} is given up after attempt {}: {}", message.id(), message.attempts() + 1, reason);
        mark(message, books -> {
            books.outbox().givenUp(message.id(), cut(reason));
            books.journal()
                    .add(new JournalBook.Entry(
                            now,
                            message.siteId(),
                            "hingeline",
                            "message-given-up",
                            message.recipientName(),
                            cut("\"" + message.subject() + "\": " + reason)));
        });
    }

    /** What cannot be marked comes again when its claim ends: rather twice than never. */
    private void mark(Message message, Consumer<Books> how) {
        try {
            storage.writeOnly(how);
        } catch (RuntimeException unmarked) {
            LOG.error("What became of message {} could not be written; it will be tried again", message.id(), unmarked);
        }
    }

    private static String cut(String reason) {
        return reason.length() > REASON_MOST ? reason.substring(0, REASON_MOST) : reason;
    }
}
