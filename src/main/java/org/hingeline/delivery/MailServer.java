package org.hingeline.delivery;

import java.time.Duration;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;

/**
 * A server that takes mail for delivery.
 *
 * @param startTls whether nothing is sent unless the connection is encrypted and the certificate good; otherwise the
 *     connection is plain
 * @param user to sign in as, or absent for a server that asks for nobody
 * @param password read anew for each message, so that a changed one needs no restart; given when a user is
 * @param timeout for each step of the conversation
 */
public record MailServer(
        String host,
        int port,
        boolean startTls,
        @Nullable String user,
        @Nullable Supplier<String> password,
        Duration timeout) {

    public MailServer {
        if ((user == null) != (password == null)) {
            throw new IllegalArgumentException("user and password of a mail server are given together, or neither");
        }
    }

    /** As a reason names it. */
    String where() {
        return host + ":" + port;
    }

    @Override
    public String toString() {
        return "MailServer[" + where() + ", startTls=" + startTls + ", user=" + user + "]";
    }
}
