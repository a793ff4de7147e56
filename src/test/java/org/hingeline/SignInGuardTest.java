package org.hingeline;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.stream.IntStream;
import org.hingeline.monitor.Accounts.SignIn;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What anybody can send without being known. */
class SignInGuardTest {
    @TempDir
    static Path data;

    private static RunningService service;

    @BeforeAll
    static void start() {
        service = RunningService.start(data, Clock.systemUTC());
    }

    @AfterAll
    static void stop() {
        service.close();
    }

    @Test
    void a_large_sign_in_form_is_refused_before_it_is_read() {
        assertThat(post("application/x-www-form-urlencoded", "name=" + "a".repeat(100_000))
                        .statusCode())
                .isEqualTo(413);
    }

    @Test
    void a_multipart_body_is_refused_everywhere() {
        String body = "--x\r\nContent-Disposition: form-data; name=\"f\"; filename=\"f\"\r\n\r\nhello\r\n--x--\r\n";
        assertThat(post("multipart/form-data; boundary=x", body).statusCode()).isEqualTo(415);
    }

    @Test
    void guesses_made_at_the_same_time_do_not_undo_the_lock() throws Exception {
        service.addPerson(service.site(), "guessed", "Guessed", Role.VIEWER);
        ExecutorService guessers = Executors.newFixedThreadPool(8);
        try {
            List<Callable<Object>> guesses = IntStream.range(0, 16)
                    .<Callable<Object>>mapToObj(
                            i -> () -> service.service().accounts().signIn("guessed", "wrong " + i))
                    .toList();
            for (Future<Object> guess : guessers.invokeAll(guesses)) {
                guess.get();
            }
        } finally {
            guessers.shutdownNow();
        }
        assertThat(service.service().accounts().signIn("guessed", RunningService.PASSWORD))
                .as("locked even with the right password")
                .isInstanceOf(SignIn.Locked.class);
    }

    private static HttpResponse<String> post(String type, String body) {
        return service.send(HttpRequest.newBuilder(service.address().resolve("/sign-in"))
                .header("Content-Type", type)
                .POST(BodyPublishers.ofString(body, StandardCharsets.UTF_8))
                .build());
    }
}
