package org.hingeline.kill;

import java.io.IOException;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.time.Duration;
import java.util.Random;
import java.util.concurrent.atomic.AtomicBoolean;
import org.jspecify.annotations.Nullable;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** Somebody who writes through HTTP until told to stop or until the service is gone. */
abstract class Writer implements Runnable {
    private static final Duration PATIENCE = Duration.ofSeconds(30);
    private static final JsonMapper JSON = new JsonMapper();

    final Promises promises;
    final Random random;
    private final URI address;
    private final String bearer;
    private final AtomicBoolean stop;
    private final HttpClient client =
            HttpClient.newBuilder().version(HttpClient.Version.HTTP_1_1).build();

    /** An answer. */
    record Answer(int status, JsonNode body) {}

    /** The service is gone; what was asked last may have been done or not. */
    static final class Gone extends Exception {
        private static final long serialVersionUID = 1L;
    }

    Writer(URI address, String bearer, Promises promises, Random random, AtomicBoolean stop) {
        this.address = address;
        this.bearer = bearer;
        this.promises = promises;
        this.random = random;
        this.stop = stop;
    }

    /** One piece of work. */
    abstract void write() throws Gone, InterruptedException;

    /** How long to rest at most between two pieces. */
    abstract int restMillis();

    @Override
    public final void run() {
        try {
            while (!stop.get()) {
                write();
                Thread.sleep(random.nextInt(restMillis() + 1));
            }
        } catch (Gone | InterruptedException e) {
            // the kill that this is all about
        } catch (RuntimeException e) {
            promises.surprise(getClass().getSimpleName() + ": " + e);
        }
    }

    Answer send(String method, String path, @Nullable String json) throws Gone, InterruptedException {
        HttpRequest request = HttpRequest.newBuilder(address.resolve(path))
                .timeout(PATIENCE)
                .header("Authorization", "Bearer " + bearer)
                .header("Content-Type", "application/json")
                .method(method, json == null ? BodyPublishers.noBody() : BodyPublishers.ofString(json))
                .build();
        try {
            HttpResponse<String> response = client.send(request, BodyHandlers.ofString());
            if (response.statusCode() >= 500) {
                promises.surprise(method + " " + path + " was answered with " + response.statusCode());
            }
            return new Answer(response.statusCode(), JSON.readTree(response.body()));
        } catch (IOException e) {
            throw new Gone();
        }
    }
}
