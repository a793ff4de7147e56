package org.hingeline.delivery;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.time.Duration;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import java.util.UUID;
import org.hingeline.monitor.OutboxBook.Message;
import org.simplejavamail.MailException;
import org.simplejavamail.api.email.ContentTransferEncoding;
import org.simplejavamail.converter.EmailConverter;

/**
 * E-mail that goes no further than a folder: one RFC 5322 file a message, which any mail program opens. For trying the
 * service without a mail server.
 *
 * <p>A file is named by the message's time (UTC) and key, appears whole or not at all, and a repeat takes its place.
 */
public final class FolderChannel implements Channel {
    private static final DateTimeFormatter NAME =
            DateTimeFormatter.ofPattern("yyyyMMdd'T'HHmmss'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);

    private final Path folder;
    private final Sender sender;

    /** @param folder made when it is not there */
    public FolderChannel(Path folder, Sender sender) {
        this.folder = folder;
        this.sender = sender;
    }

    @Override
    public String code() {
        return "email";
    }

    @Override
    public Duration longestAttempt() {
        return Duration.ofMinutes(1);
    }

    @Override
    public Outcome deliver(Message message) {
        String letter;
        try {
            // eight bits, so that the text can also be read as it is
            letter = EmailConverter.emailToEML(sender.letter(message, ContentTransferEncoding.BIT8));
        } catch (MailException | IllegalArgumentException unfit) {
            return new Outcome.Refused("\"" + message.recipient() + "\" or the text is not fit for e-mail ("
                    + unfit.getClass().getSimpleName() + ")");
        }
        try {
            write(folder.resolve(fileName(message)), letter);
            return new Outcome.Accepted();
        } catch (IOException failure) {
            return new Outcome.FailedForNow("the folder " + folder + " cannot be written to ("
                    + failure.getClass().getSimpleName() + ")");
        }
    }

    static String fileName(Message message) {
        return NAME.format(message.createdAt()) + "-" + message.key().replaceAll("[^A-Za-z0-9._-]", "_") + ".eml";
    }

    private void write(Path file, String letter) throws IOException {
        Files.createDirectories(folder);
        Path unfinished = folder.resolve("." + UUID.randomUUID() + ".part");
        try {
            Files.writeString(
                    unfinished,
                    letter,
                    StandardCharsets.UTF_8,
                    StandardOpenOption.CREATE_NEW,
                    StandardOpenOption.WRITE,
                    StandardOpenOption.DSYNC);
            Files.move(unfinished, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(unfinished);
        }
    }
}
