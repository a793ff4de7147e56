package org.hingeline.delivery;

import static org.assertj.core.api.Assertions.assertThat;

import jakarta.mail.Session;
import jakarta.mail.internet.MimeMessage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.net.InetAddress;
import java.net.ServerSocket;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Date;
import java.util.List;
import java.util.Properties;
import java.util.function.UnaryOperator;
import org.hingeline.delivery.Channel.Outcome;
import org.hingeline.monitor.OutboxBook.Message;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.subethamail.smtp.DropConnectionException;
import org.subethamail.smtp.MessageHandler;
import org.subethamail.smtp.RejectException;
import org.subethamail.smtp.auth.EasyAuthenticationHandlerFactory;
import org.subethamail.smtp.auth.LoginFailedException;
import org.subethamail.smtp.server.SMTPServer;

/** Against a real SMTP server in this process, on a free port of the loopback address. */
class EmailChannelTest {
    private static final Instant CREATED = Instant.parse("2026-05-14T10:24:00Z");
    private static final String USER = "hatchery";
    private static final String PASSWORD = "tide-table-4711";
    private static final Sender SENDER = new Sender("water@example.org", "Fennick Bay water");

    @TempDir
    static Path folder;

    private static TestCertificate certificate;

    private final List<byte[]> arrived = Collections.synchronizedList(new ArrayList<>());
    private final List<String> envelopes = Collections.synchronizedList(new ArrayList<>());
    private final List<RejectException> answersToRecipient = Collections.synchronizedList(new ArrayList<>());
    private final List<RejectException> answersToData = Collections.synchronizedList(new ArrayList<>());
    private final List<RejectException> answersToSender = Collections.synchronizedList(new ArrayList<>());
    private SMTPServer server;

    @BeforeAll
    static void makeCertificate() throws Exception {
        certificate = TestCertificate.madeFor("ip:127.0.0.1", folder);
    }

    @AfterEach
    void stop() {
        if (server != null) {
            server.stop();
        }
    }

    @Test
    void a_letter_arrives_encrypted_signed_in_and_intact() throws Exception {
        startSecure();

        assertThat(channel(PASSWORD).deliver(message("ines@example.org"))).isEqualTo(new Outcome.Accepted());

        assertThat(envelopes).containsExactly("water@example.org -> ines@example.org over TLS");
        MimeMessage letter = onlyLetter();
        assertThat(letter.getMessageID()).isEqualTo("<hingeline.alert-5-raised-1@example.org>");
        assertThat(letter.getHeader("Auto-Submitted")).containsExactly("auto-generated");
        assertThat(letter.getHeader("Precedence")).isNull();
        assertThat(letter.getSubject()).isEqualTo("HIGH: Larval 3, Ω 1.62 under 1.80 - Fennick Bay");
        assertThat(letter.getFrom()[0]).hasToString("Fennick Bay water <water@example.org>");
        assertThat(letter.getAllRecipients()).hasSize(1);
        assertThat(((jakarta.mail.internet.InternetAddress) letter.getAllRecipients()[0]).getPersonal())
                .isEqualTo("Inés Vale");
        assertThat(letter.getSentDate()).isEqualTo(Date.from(CREATED));
        assertThat(letter.getContentType().toLowerCase(java.util.Locale.ROOT))
                .startsWith("text/plain")
                .contains("utf-8");
        assertThat(((String) letter.getContent()).replace("\r\n", "\n"))
                .isEqualTo(message("x").body());
        assertThat(new String(arrived.get(0), StandardCharsets.ISO_8859_1))
                .as("fit for a server that knows nothing but ASCII")
                .matches("\\p{ASCII}*");
    }

    @Test
    void a_repeat_carries_the_same_message_id_and_date() throws Exception {
        startSecure();
        EmailChannel channel = channel(PASSWORD);

        channel.deliver(message("ines@example.org"));
        channel.deliver(message("ines@example.org"));

        assertThat(arrived).hasSize(2);
        assertThat(letter(1).getMessageID()).isEqualTo(letter(0).getMessageID());
        assertThat(letter(1).getSentDate()).isEqualTo(letter(0).getSentDate());
    }

    @Test
    void a_wrong_password_fails_for_now_and_is_not_repeated_in_the_reason() throws Exception {
        startSecure();

        Outcome outcome = channel("not-the-tide-table").deliver(message("ines@example.org"));

        assertThat(reason(outcome))
                .startsWith("mail server 127.0.0.1:" + server.getPortAllocated()
                        + " refused the sign-in of \"hatchery\": 535")
                .doesNotContain("not-the-tide-table")
                .doesNotContain(base64("not-the-tide-table"));
        assertThat(arrived).isEmpty();
    }

    @Test
    void a_changed_password_is_taken_up_without_a_restart() throws Exception {
        startSecure();
        String[] password = {"old"};
        EmailChannel channel = new EmailChannel(
                new MailServer("127.0.0.1", port(), true, USER, () -> password[0], Duration.ofSeconds(10)),
                SENDER,
                certificate.trust());
        assertThat(channel.deliver(message("ines@example.org"))).isInstanceOf(Outcome.FailedForNow.class);

        password[0] = PASSWORD;

        assertThat(channel.deliver(message("ines@example.org"))).isEqualTo(new Outcome.Accepted());
    }

    @Test
    void a_password_that_cannot_be_read_fails_for_now() throws Exception {
        startSecure();
        EmailChannel channel = new EmailChannel(
                new MailServer(
                        "127.0.0.1",
                        port(),
                        true,
                        USER,
                        () -> {
                            throw new IllegalStateException("no such file");
                        },
                        Duration.ofSeconds(10)),
                SENDER,
                certificate.trust());

        assertThat(channel.deliver(message("ines@example.org")))
                .isEqualTo(new Outcome.FailedForNow("the password for the mail server cannot be read"));
    }

    @Test
    void a_certificate_that_nobody_vouches_for_stops_everything_before_the_sign_in() throws Exception {
        startSecure();
        EmailChannel trustingAsJavaDoes = new EmailChannel(server(PASSWORD), SENDER);

        assertThat(reason(trustingAsJavaDoes.deliver(message("ines@example.org"))))
                .isEqualTo("the certificate of mail server 127.0.0.1:" + port()
                        + " is not trusted or not for that name; nothing was sent");
        assertThat(arrived).isEmpty();
    }

    @Test
    void a_trusted_certificate_for_another_name_is_refused_too() throws Exception {
        TestCertificate other = TestCertificate.madeFor("dns:elsewhere.example.org", folder);
        start(builder -> secure(builder, other));
        EmailChannel channel = new EmailChannel(server(PASSWORD), SENDER, other.trust());

        assertThat(reason(channel.deliver(message("ines@example.org"))))
                .contains("is not trusted or not for that name; nothing was sent");
        assertThat(arrived).isEmpty();
    }

    @Test
    void a_server_without_encryption_gets_nothing_when_encryption_is_required() throws Exception {
        start(builder -> builder);
        EmailChannel channel = new EmailChannel(
                new MailServer("127.0.0.1", port(), true, null, null, Duration.ofSeconds(10)),
                SENDER,
                certificate.trust());

        assertThat(reason(channel.deliver(message("ines@example.org"))))
                .contains("STARTTLS is required but host does not support STARTTLS");
        assertThat(arrived).isEmpty();
        assertThat(envelopes).isEmpty();
    }

    @Test
    void a_plain_server_is_used_when_encryption_is_switched_off() throws Exception {
        start(builder -> builder);
        EmailChannel channel = new EmailChannel(
                new MailServer("127.0.0.1", port(), false, null, null, Duration.ofSeconds(10)), SENDER);

        assertThat(channel.deliver(message("ines@example.org"))).isEqualTo(new Outcome.Accepted());
        assertThat(envelopes).containsExactly("water@example.org -> ines@example.org in the clear");
    }

    @Test
    void a_server_that_is_busy_fails_for_now_and_takes_the_next_attempt() throws Exception {
        startSecure();
        answersToRecipient.add(new RejectException(451, "4.3.2 try later"));
        answersToData.add(new RejectException(452, "4.3.1 disk full"));
        EmailChannel channel = channel(PASSWORD);

        assertThat(reason(channel.deliver(message("ines@example.org")))).contains("451 4.3.2 try later");
        assertThat(reason(channel.deliver(message("ines@example.org")))).contains("452 4.3.1 disk full");
        assertThat(channel.deliver(message("ines@example.org"))).isEqualTo(new Outcome.Accepted());
        assertThat(arrived).hasSize(1);
    }

    @Test
    void a_recipient_that_does_not_exist_is_refused_for_good() throws Exception {
        startSecure();
        answersToRecipient.add(new RejectException(550, "5.1.1 no such user"));

        assertThat(channel(PASSWORD).deliver(message("nobody@example.org")))
                .isEqualTo(new Outcome.Refused(
                        "the mail server does not take mail for this recipient: 550 5.1.1 no such user"));
    }

    @Test
    void a_server_that_does_not_relay_for_us_is_for_somebody_to_put_right_and_fails_for_now() throws Exception {
        startSecure();
        for (RejectException refusal : List.of(
                new RejectException(550, "5.7.1 relaying denied"),
                new RejectException(554, "relay access denied"),
                new RejectException(530, "authentication required"))) {
            answersToRecipient.add(refusal);

            assertThat(channel(PASSWORD).deliver(message("ines@example.org"))).isInstanceOf(Outcome.FailedForNow.class);
        }
    }

    @Test
    void a_message_that_is_not_taken_is_refused_for_good() throws Exception {
        startSecure();
        answersToData.add(new RejectException(554, "5.7.1 looks like bulk mail"));

        assertThat(channel(PASSWORD).deliver(message("ines@example.org")))
                .isInstanceOfSatisfying(
                        Outcome.Refused.class,
                        refused -> assertThat(refused.reason()).contains("554 5.7.1 looks like bulk mail"));
    }

    @Test
    void a_sender_that_is_not_taken_is_for_somebody_to_put_right_and_fails_for_now() throws Exception {
        startSecure();
        answersToSender.add(new RejectException(553, "5.7.1 not your address"));

        assertThat(reason(channel(PASSWORD).deliver(message("ines@example.org"))))
                .contains("mail from this sender")
                .contains("553 5.7.1 not your address");
    }

    @Test
    void a_connection_that_breaks_in_the_middle_fails_for_now() throws Exception {
        startSecure();
        answersToRecipient.add(new DropConnectionException(421, "gone"));
        EmailChannel channel = channel(PASSWORD);

        assertThat(channel.deliver(message("ines@example.org"))).isInstanceOf(Outcome.FailedForNow.class);
        assertThat(channel.deliver(message("ines@example.org"))).isEqualTo(new Outcome.Accepted());
    }

    @Test
    void a_server_that_hangs_up_without_a_word_fails_for_now() throws Exception {
        try (ServerSocket listening = new ServerSocket(0, 5, InetAddress.getLoopbackAddress())) {
            Thread hangsUp = new Thread(() -> {
                try {
                    var socket = listening.accept();
                    socket.getOutputStream().write("220 hello\r\n".getBytes(StandardCharsets.US_ASCII));
                    socket.getInputStream().read(new byte[100]);
                    socket.close();
                } catch (IOException over) {
                    // the test has ended
                }
            });
            hangsUp.start();

            assertThat(reason(plainTo(listening.getLocalPort(), Duration.ofSeconds(10))
                            .deliver(message("ines@example.org"))))
                    .startsWith(
                            "the conversation with mail server 127.0.0.1:" + listening.getLocalPort() + " failed: ");
            hangsUp.join(10_000);
        }
    }

    @Test
    void a_server_that_says_nothing_is_given_up_after_the_timeout() throws Exception {
        try (ServerSocket silent = new ServerSocket(0, 5, InetAddress.getLoopbackAddress())) {
            long begun = System.nanoTime();

            Outcome outcome =
                    plainTo(silent.getLocalPort(), Duration.ofSeconds(1)).deliver(message("ines@example.org"));

            assertThat(reason(outcome))
                    .isEqualTo("mail server 127.0.0.1:" + silent.getLocalPort() + " did not answer within 1 s");
            assertThat(Duration.ofNanos(System.nanoTime() - begun)).isLessThan(Duration.ofSeconds(8));
        }
    }

    @Test
    void a_server_that_is_not_there_fails_for_now() throws Exception {
        int port;
        try (ServerSocket gone = new ServerSocket(0, 5, InetAddress.getLoopbackAddress())) {
            port = gone.getLocalPort();
        }

        assertThat(reason(plainTo(port, Duration.ofSeconds(5)).deliver(message("ines@example.org"))))
                .isEqualTo("mail server 127.0.0.1:" + port + " cannot be reached");
    }

    @Test
    void an_address_that_is_none_is_refused_without_asking_the_server() throws Exception {
        startSecure();

        for (String recipient : List.of("ines", "a@b@c", "ines@example.org\r\nBcc: x@example.org")) {
            assertThat(channel(PASSWORD).deliver(message(recipient)))
                    .as(recipient)
                    .isInstanceOf(Outcome.Refused.class);
        }
        assertThat(envelopes).isEmpty();
    }

    @Test
    void what_a_server_says_is_told_without_the_secret_it_repeats() throws Exception {
        start(builder -> secure(builder, certificate));
        answersToRecipient.add(new RejectException(
                550,
                "you said " + PASSWORD + " and " + base64("\0" + USER + "\0" + PASSWORD) + " " + base64(PASSWORD)));

        assertThat(((Outcome.Refused) channel(PASSWORD).deliver(message("ines@example.org"))).reason())
                .endsWith("550 you said [not shown] and [not shown] [not shown]");
    }

    @Test
    void a_mail_server_in_print_shows_no_password() {
        assertThat(server(PASSWORD, 25)).hasToString("MailServer[127.0.0.1:25, startTls=true, user=hatchery]");
    }

    @Test
    void a_key_with_other_characters_still_makes_a_message_id() {
        assertThat(SENDER.messageId("a b<ü>@x")).isEqualTo("<hingeline.a_20_b_3c__fc__3e__40_x@example.org>");
    }

    private void startSecure() throws Exception {
        start(builder -> secure(builder, certificate));
    }

    private static SMTPServer.Builder secure(SMTPServer.Builder builder, TestCertificate shown) {
        try {
            return builder.enableTLS()
                    .requireTLS()
                    .startTlsSocketFactory(shown.serverContext())
                    .requireAuth()
                    .authenticationHandlerFactory(new EasyAuthenticationHandlerFactory((user, password, context) -> {
                        if (!user.equals(USER) || !password.equals(PASSWORD)) {
                            throw new LoginFailedException();
                        }
                    }));
        } catch (java.security.GeneralSecurityException broken) {
            throw new IllegalStateException(broken);
        }
    }

    private void start(UnaryOperator<SMTPServer.Builder> how) {
        server = how.apply(SMTPServer.port(0)
                        .bindAddress(InetAddress.getLoopbackAddress())
                        .messageHandlerFactory(
                                context -> new Handler(context.getTlsPeerCertificates() != null || isOverTls(context))))
                .build();
        server.start();
    }

    private static boolean isOverTls(org.subethamail.smtp.MessageContext context) {
        return ((org.subethamail.smtp.server.Session) context).isTLSStarted();
    }

    private int port() {
        return server.getPortAllocated();
    }

    private EmailChannel channel(String password) throws Exception {
        return new EmailChannel(server(password), SENDER, certificate.trust());
    }

    private MailServer server(String password) {
        return server(password, port());
    }

    private static MailServer server(String password, int port) {
        return new MailServer("127.0.0.1", port, true, USER, () -> password, Duration.ofSeconds(10));
    }

    private static EmailChannel plainTo(int port, Duration timeout) {
        return new EmailChannel(new MailServer("127.0.0.1", port, false, null, null, timeout), SENDER);
    }

    private static Message message(String recipient) {
        return FakeStorage.message(1, "alert-5-raised-1", recipient, CREATED);
    }

    private static String reason(Outcome outcome) {
        assertThat(outcome).isInstanceOf(Outcome.FailedForNow.class);
        return ((Outcome.FailedForNow) outcome).reason();
    }

    private static String base64(String text) {
        return java.util.Base64.getEncoder().encodeToString(text.getBytes(StandardCharsets.UTF_8));
    }

    private MimeMessage onlyLetter() throws Exception {
        assertThat(arrived).hasSize(1);
        return letter(0);
    }

    private MimeMessage letter(int index) throws Exception {
        return new MimeMessage(Session.getInstance(new Properties()), new ByteArrayInputStream(arrived.get(index)));
    }

    private final class Handler implements MessageHandler {
        private final boolean overTls;
        private String from = "";

        Handler(boolean overTls) {
            this.overTls = overTls;
        }

        @Override
        public void from(String address) throws RejectException {
            answer(answersToSender);
            from = address;
        }

        @Override
        public void recipient(String address) throws RejectException {
            answer(answersToRecipient);
            envelopes.add(from + " -> " + address + (overTls ? " over TLS" : " in the clear"));
        }

        @Override
        public String data(InputStream text) throws RejectException, IOException {
            byte[] bytes = text.readAllBytes();
            answer(answersToData);
            arrived.add(Arrays.copyOf(bytes, bytes.length));
            return null;
        }

        @Override
        public void done() {
            // nothing is kept between messages
        }

        private void answer(List<RejectException> scripted) throws RejectException {
            if (!scripted.isEmpty()) {
                throw scripted.remove(0);
            }
        }
    }
}
