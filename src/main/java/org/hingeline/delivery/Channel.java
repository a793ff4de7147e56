package org.hingeline.delivery;

import java.time.Duration;
import org.hingeline.monitor.OutboxBook;

/** A way to people. Safe for several threads. */
public interface Channel {

    /** What became of one attempt. No reason ever holds a secret. */
    sealed interface Outcome {
        /** The next station has taken responsibility for it. */
        record Accepted() implements Outcome {}

        /** It can never arrive; another attempt is useless. */
        record Refused(String reason) implements Outcome {}

        /** It did not work now; it may later. */
        record FailedForNow(String reason) implements Outcome {}
    }

    /** The channel's name in the outbox: {@code email}. */
    String code();

    /** Time in which one attempt has ended, well or badly. */
    Duration longestAttempt();

    Outcome deliver(OutboxBook.Message message);
}
