package org.hingeline.delivery;

import jakarta.mail.AuthenticationFailedException;
import jakarta.mail.MessagingException;
import java.net.SocketTimeoutException;
import java.nio.charset.StandardCharsets;
import java.security.cert.CertificateException;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;
import javax.net.ssl.SSLException;
import org.eclipse.angus.mail.smtp.SMTPAddressFailedException;
import org.eclipse.angus.mail.smtp.SMTPSendFailedException;
import org.eclipse.angus.mail.util.MailConnectException;
import org.hingeline.delivery.Channel.Outcome;
import org.jspecify.annotations.Nullable;

/**
 * What a failed conversation with a mail server means. Only a permanent answer (5yz, RFC 5321) about the recipient or
 * the message itself is final; what a person can put right without the message (sign-in, sender, certificate,
 * connection) is for now.
 */
final class MailFailure {
    private static final int WORDS_MOST = 200;
    private static final Pattern ENHANCED = Pattern.compile("\\b5\\.\\d{1,3}\\.\\d{1,3}\\b");

    private MailFailure() {}

    static Outcome outcome(Throwable failure, MailServer server, @Nullable String password) {
        List<Throwable> chain = chain(failure);
        Optional<SMTPAddressFailedException> address = find(chain, SMTPAddressFailedException.class);
        if (address.isPresent()) {
            String reason =
                    "the mail server does not take mail for this recipient: " + words(address.get(), server, password);
            return permanent(address.get().getReturnCode())
                            && !aboutPolicy(address.get().getReturnCode(), reason)
                    ? new Outcome.Refused(reason)
                    : new Outcome.FailedForNow(reason);
        }
        Optional<SMTPSendFailedException> send = find(chain, SMTPSendFailedException.class);
        if (send.isPresent()) {
            boolean aboutSender = String.valueOf(send.get().getCommand()).startsWith("MAIL");
            String reason = "the mail server does not take " + (aboutSender ? "mail from this sender" : "the message")
                    + ": " + words(send.get(), server, password);
            return permanent(send.get().getReturnCode()) && !aboutSender
                    ? new Outcome.Refused(reason)
                    : new Outcome.FailedForNow(reason);
        }
        return new Outcome.FailedForNow(connection(chain, server, password));
    }

    private static String connection(List<Throwable> chain, MailServer server, @Nullable String password) {
        Optional<AuthenticationFailedException> signIn = find(chain, AuthenticationFailedException.class);
        if (signIn.isPresent()) {
            return "mail server " + server.where() + " refused the sign-in of \"" + server.user() + "\": "
                    + words(signIn.get(), server, password);
        }
        if (find(chain, CertificateException.class).isPresent()) {
            return "the certificate of mail server " + server.where()
                    + " is not trusted or not for that name; nothing was sent";
        }
        if (find(chain, SocketTimeoutException.class).isPresent()) {
            return "mail server " + server.where() + " did not answer within "
                    + server.timeout().toSeconds() + " s";
        }
        if (find(chain, MailConnectException.class).isPresent()) {
            return "mail server " + server.where() + " cannot be reached";
        }
        Throwable telling = find(chain, SSLException.class)
                .<Throwable>map(e -> e)
                .or(() -> find(chain, MessagingException.class))
                .orElse(chain.get(0));
        return "the conversation with mail server " + server.where() + " failed: " + words(telling, server, password);
    }

    /**
     * Whether the server refuses because of who sends and not because of who receives: "relaying denied", "authentication
     * required" (enhanced codes 5.7.x of RFC 3463; 530, 535 and 554 where the server gives none). A person puts that
     * right, and then the message is still wanted.
     */
    private static boolean aboutPolicy(int code, String words) {
        boolean enhanced = ENHANCED.matcher(words).find();
        return words.contains("5.7.") || !enhanced && (code == 530 || code == 535 || code == 554);
    }

    private static boolean permanent(int code) {
        return code >= 500 && code < 600;
    }

    /** The other side's words on one line, without the secret in case they repeat it. */
    private static String words(Throwable failure, MailServer server, @Nullable String password) {
        String words = String.valueOf(failure.getMessage())
                .replaceAll("[\\p{Cntrl}\\s]+", " ")
                .strip();
        if (password != null) {
            for (String secret : List.of(password, base64(password), base64("\0" + server.user() + "\0" + password))) {
                words = words.replace(secret, "[not shown]");
            }
        }
        return words.length() > WORDS_MOST ? words.substring(0, WORDS_MOST) + "…" : words;
    }

    private static String base64(String text) {
        return Base64.getEncoder().encodeToString(text.getBytes(StandardCharsets.UTF_8));
    }

    private static <T extends Throwable> Optional<T> find(List<Throwable> chain, Class<T> kind) {
        return chain.stream().filter(kind::isInstance).map(kind::cast).findFirst();
    }

    /** Mail exceptions hang together in two ways: by cause, and side by side. */
    private static List<Throwable> chain(Throwable failure) {
        List<Throwable> chain = new ArrayList<>();
        collect(failure, chain);
        return chain;
    }

    private static void collect(@Nullable Throwable failure, List<Throwable> chain) {
        if (failure == null || chain.size() > 50 || chain.stream().anyMatch(known -> known == failure)) {
            return;
        }
        chain.add(failure);
        collect(failure.getCause(), chain);
        if (failure instanceof MessagingException mail) {
            collect(mail.getNextException(), chain);
        }
    }
}
