package org.hingeline.delivery;

import java.util.Date;
import org.hingeline.monitor.OutboxBook.Message;
import org.simplejavamail.api.email.ContentTransferEncoding;
import org.simplejavamail.api.email.Email;
import org.simplejavamail.email.EmailBuilder;

/**
 * Who e-mail comes from.
 *
 * @param address an e-mail address
 * @param name as people see it
 */
public record Sender(String address, String name) {
    public Sender {
        if (address.indexOf('@') < 1 || address.endsWith("@")) {
            throw new IllegalArgumentException("sender's address \"" + address + "\" must be an e-mail address");
        }
    }

    /**
     * The message as an e-mail. Every time the same, date and Message-ID too, so that a repeat is known as one.
     *
     * <p>{@code Auto-Submitted} (RFC 3834) keeps out-of-office programs from answering.
     *
     * @param encoding how the text is written down (RFC 2045)
     */
    Email letter(Message message, ContentTransferEncoding encoding) {
        return EmailBuilder.startingBlank()
                .fixingMessageId(messageId(message.key()))
                .fixingSentDate(Date.from(message.createdAt()))
                .from(name, address)
                .to(message.recipientName(), message.recipient())
                .withSubject(message.subject())
                .withPlainText(message.body())
                .withContentTransferEncoding(encoding)
                .withHeader("Auto-Submitted", "auto-generated")
                .buildEmail();
    }

    /** RFC 5322: what is left of the at sign may hold letters, digits and a few marks; others become their number. */
    String messageId(String key) {
        StringBuilder left = new StringBuilder("hingeline.");
        key.codePoints().forEach(c -> {
            if (c < 128 && (Character.isLetterOrDigit(c) || c == '-')) {
                left.appendCodePoint(c);
            } else {
                left.append('_').append(Integer.toHexString(c)).append('_');
            }
        });
        return "<" + left + "@" + address.substring(address.lastIndexOf('@') + 1) + ">";
    }
}
