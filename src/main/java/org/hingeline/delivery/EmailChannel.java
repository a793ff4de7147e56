package org.hingeline.delivery;

import java.time.Duration;
import java.util.Objects;
import java.util.concurrent.CompletionException;
import javax.net.ssl.SSLSocketFactory;
import org.hingeline.monitor.OutboxBook.Message;
import org.jspecify.annotations.Nullable;
import org.simplejavamail.MailException;
import org.simplejavamail.api.email.ContentTransferEncoding;
import org.simplejavamail.api.email.Email;
import org.simplejavamail.api.mailer.Mailer;
import org.simplejavamail.api.mailer.config.TransportStrategy;
import org.simplejavamail.mailer.MailerBuilder;

/** E-mail by SMTP (RFC 5321, 6409), encrypted by STARTTLS (RFC 3207) unless told otherwise. */
public final class EmailChannel implements Channel {
    /** Greeting, hello, encryption, hello, sign-in in two, sender, recipient, data, text, and some to spare. */
    private static final int STEPS = 12;

    private final MailServer server;
    private final Sender sender;
    private final @Nullable SSLSocketFactory trust;
    private volatile @Nullable SignedIn last;

    private record SignedIn(@Nullable String password, Mailer mailer) {}

    /** Trusts the certificates this machine's Java trusts. */
    public EmailChannel(MailServer server, Sender sender) {
        this(server, sender, null);
    }

    EmailChannel(MailServer server, Sender sender, @Nullable SSLSocketFactory trust) {
        this.server = server;
        this.sender = sender;
        this.trust = trust;
    }

    @Override
    public String code() {
        return "email";
    }

    @Override
    public Duration longestAttempt() {
        return server.timeout().multipliedBy(STEPS);
    }

    @Override
    public Outcome deliver(Message message) {
        String password;
        try {
            password = server.password() == null ? null : server.password().get();
        } catch (RuntimeException unreadable) {
            return new Outcome.FailedForNow("the password for the mail server cannot be read");
        }
        Mailer mailer = mailer(password);
        Email letter;
        try {
            letter = sender.letter(message, ContentTransferEncoding.QUOTED_PRINTABLE);
            mailer.validate(letter);
        } catch (MailException | IllegalArgumentException unfit) {
            return new Outcome.Refused("\"" + message.recipient() + "\" or the text is not fit for e-mail ("
                    + unfit.getClass().getSimpleName() + ")");
        }
        try {
            mailer.sendMail(letter, false).join();
            return new Outcome.Accepted();
        } catch (MailException | CompletionException failure) {
            return MailFailure.outcome(failure, server, password);
        }
    }

    private Mailer mailer(@Nullable String password) {
        SignedIn known = last;
        if (known != null && Objects.equals(known.password(), password)) {
            return known.mailer();
        }
        Mailer mailer = build(password);
        last = new SignedIn(password, mailer);
        return mailer;
    }

    private Mailer build(@Nullable String password) {
        var builder = MailerBuilder.withSMTPServer(server.host(), server.port(), server.user(), password)
                .withTransportStrategy(server.startTls() ? TransportStrategy.SMTP_TLS : TransportStrategy.SMTP)
                .withSessionTimeout(Math.toIntExact(server.timeout().toMillis()))
                .trustingAllHosts(false)
                .verifyingServerIdentity(true);
        if (!server.startTls()) {
            builder = builder.withProperty("mail.smtp.starttls.enable", "false");
        }
        if (trust != null) {
            builder = builder.withCustomSSLFactoryInstance(trust);
        }
        return builder.buildMailer();
    }
}
