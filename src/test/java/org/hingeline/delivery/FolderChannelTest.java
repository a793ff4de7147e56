package org.hingeline.delivery;

import static org.assertj.core.api.Assertions.assertThat;

import jakarta.mail.Session;
import jakarta.mail.internet.MimeMessage;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Properties;
import java.util.stream.Stream;
import org.hingeline.delivery.Channel.Outcome;
import org.hingeline.monitor.OutboxBook.Message;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FolderChannelTest {
    private static final Instant CREATED = Instant.parse("2026-05-14T10:24:00Z");
    private static final Sender SENDER = new Sender("water@example.org", "Fennick Bay water");

    @TempDir
    Path folder;

    @Test
    void a_message_becomes_a_file_that_a_mail_program_opens() throws Exception {
        Path mail = folder.resolve("a/b");

        assertThat(new FolderChannel(mail, SENDER).deliver(message("alert-5-raised-1")))
                .isEqualTo(new Outcome.Accepted());

        assertThat(files(mail)).containsExactly("20260514T102400Z-alert-5-raised-1.eml");
        assertThat(Files.readString(mail.resolve("20260514T102400Z-alert-5-raised-1.eml")))
                .as("readable without a mail program too")
                .contains("Larval 3 (20 m3): Ω 1.62 ±0.11, under your 1.80 for 12 min.");
        try (InputStream in = Files.newInputStream(mail.resolve("20260514T102400Z-alert-5-raised-1.eml"))) {
            MimeMessage letter = new MimeMessage(Session.getInstance(new Properties()), in);
            assertThat(letter.getMessageID()).isEqualTo("<hingeline.alert-5-raised-1@example.org>");
            assertThat(letter.getHeader("Auto-Submitted")).containsExactly("auto-generated");
            assertThat(letter.getSubject()).isEqualTo("HIGH: Larval 3, Ω 1.62 under 1.80 - Fennick Bay");
            assertThat(((String) letter.getContent()).replace("\r\n", "\n"))
                    .isEqualTo(message("x").body());
        }
    }

    @Test
    void a_repeat_takes_the_place_of_the_first() throws Exception {
        FolderChannel channel = new FolderChannel(folder, SENDER);

        channel.deliver(message("a"));
        channel.deliver(message("a"));
        channel.deliver(message("b"));

        assertThat(files(folder)).containsExactly("20260514T102400Z-a.eml", "20260514T102400Z-b.eml");
    }

    @Test
    void a_key_cannot_lead_out_of_the_folder() throws Exception {
        Path mail = folder.resolve("mail");

        new FolderChannel(mail, SENDER).deliver(message("../../etc/x"));

        assertThat(files(mail)).containsExactly("20260514T102400Z-.._.._etc_x.eml");
        assertThat(files(folder)).containsExactly("mail");
    }

    @Test
    void a_folder_that_cannot_be_written_to_fails_for_now() throws Exception {
        Path notAFolder = Files.writeString(folder.resolve("file"), "x");

        assertThat(new FolderChannel(notAFolder, SENDER).deliver(message("a")))
                .isEqualTo(new Outcome.FailedForNow(
                        "the folder " + notAFolder + " cannot be written to (FileAlreadyExistsException)"));
    }

    private static Message message(String key) {
        return FakeStorage.message(1, key, "ines@example.org", CREATED);
    }

    private static List<String> files(Path folder) throws Exception {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(file -> file.getFileName().toString()).sorted().toList();
        }
    }
}
