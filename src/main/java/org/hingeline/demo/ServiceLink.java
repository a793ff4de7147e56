package org.hingeline.demo;

import java.io.IOException;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.format.DateTimeParseException;
import java.util.Optional;
import java.util.Set;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import tools.jackson.core.JacksonException;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The service as the gateway sees it: two addresses, a key and a token. Loopback only. */
final class ServiceLink {
    /** The service could not take what was sent; the same may be sent again later. */
    static final class NotTakenException extends Exception {
        private static final long serialVersionUID = 1L;

        NotTakenException(String why) {
            super(why);
        }
    }

    /** What became of a post that was answered for good. */
    record Answer(int stored, int duplicates, int refused) {}

    private static final Logger LOG = LoggerFactory.getLogger(ServiceLink.class);
    private static final JsonMapper JSON = JsonMapper.builder().build();
    private static final Duration CONNECT = Duration.ofSeconds(5);
    private static final Duration ANSWER = Duration.ofSeconds(60);

    /** Judged row by row; to send it again would change nothing. */
    private static final Set<Integer> JUDGED = Set.of(200, 207, 422);

    /** Refused as a whole, and would be again. */
    private static final Set<Integer> HOPELESS = Set.of(400, 413, 415);

    private final URI base;
    private final String key;
    private final String token;
    private final HttpClient client;

    ServiceLink(URI base, String key, String token) {
        if (!"http".equals(base.getScheme()) || !isLoopback(base.getHost())) {
            throw new IllegalArgumentException(
                    "base \"" + base + "\" must be an http address of this machine, such as http://127.0.0.1:8080");
        }
        this.base = base;
        this.key = key;
        this.token = token;
        this.client = HttpClient.newBuilder()
                .version(HttpClient.Version.HTTP_1_1)
                .followRedirects(HttpClient.Redirect.NEVER)
                .proxy(HttpClient.Builder.NO_PROXY)
                .connectTimeout(CONNECT)
                .build();
    }

    /** By its text: a name is not looked up. */
    private static boolean isLoopback(String host) {
        return host != null
                && (host.equals("localhost")
                        || host.equals("[::1]")
                        || host.matches("127\\.\\d{1,3}\\.\\d{1,3}\\.\\d{1,3}"));
    }

    /**
     * Posts readings.
     *
     * @param body of {@code POST /api/v1/readings}
     * @throws NotTakenException when the service was not there, was not well, or did not know the key
     */
    Answer post(String body) throws NotTakenException, InterruptedException {
        HttpRequest request = HttpRequest.newBuilder(base.resolve("/api/v1/readings"))
                .timeout(ANSWER)
                .header("Content-Type", "application/json")
                .header("Authorization", "Bearer " + key)
                .POST(HttpRequest.BodyPublishers.ofString(body))
                .build();
        HttpResponse<String> response = exchange(request);
        if (JUDGED.contains(response.statusCode())) {
            return judged(response);
        }
        if (HOPELESS.contains(response.statusCode())) {
            LOG.error("the service does not accept this post and it is dropped: {}", said(response));
            return new Answer(0, 0, 0);
        }
        throw new NotTakenException(said(response));
    }

    /**
     * Up to when the service knows the water of a point.
     *
     * @return nothing when it knows of none; the end of time when it may not be asked
     * @throws NotTakenException when it did not say
     */
    Optional<Instant> waterKnownUntil(String point) throws NotTakenException, InterruptedException {
        HttpRequest request = HttpRequest.newBuilder(base.resolve("/api/v1/points/" + point + "/water"))
                .timeout(ANSWER)
                .header("Accept", "application/json")
                .header("Authorization", "Bearer " + token)
                .GET()
                .build();
        HttpResponse<String> response = exchange(request);
        if (response.statusCode() == 404) {
            return Optional.empty();
        }
        if (response.statusCode() == 401 || response.statusCode() == 403) {
            LOG.warn("the token may not ask what is known, so the gateway's own note stands: {}", said(response));
            return Optional.of(Instant.MAX);
        }
        if (response.statusCode() != 200) {
            throw new NotTakenException(said(response));
        }
        try {
            String at = parsed(response).path("at").asString("");
            return at.isEmpty()
                    ? Optional.empty()
                    : Optional.of(OffsetDateTime.parse(at).toInstant());
        } catch (DateTimeParseException e) {
            throw new NotTakenException("the water of " + point + " has no time that can be read: " + e.getMessage());
        }
    }

    private HttpResponse<String> exchange(HttpRequest request) throws NotTakenException, InterruptedException {
        try {
            return client.send(request, HttpResponse.BodyHandlers.ofString());
        } catch (IOException e) {
            throw new NotTakenException("no answer from " + base + ": " + e);
        }
    }

    private static Answer judged(HttpResponse<String> response) throws NotTakenException {
        JsonNode answer = parsed(response);
        JsonNode refused = answer.path("refused");
        if (!refused.isEmpty()) {
            LOG.warn(
                    "{} rows were refused; the first: {}",
                    refused.size(),
                    refused.get(0).path("detail").asString(""));
        }
        return new Answer(
                answer.path("stored").asInt(0), answer.path("duplicates").asInt(0), refused.size());
    }

    private static JsonNode parsed(HttpResponse<String> response) throws NotTakenException {
        try {
            return JSON.readTree(response.body());
        } catch (JacksonException e) {
            throw new NotTakenException("status " + response.statusCode() + " with a body that is not JSON");
        }
    }

    private static String said(HttpResponse<String> response) {
        String body = response.body().strip();
        return "status " + response.statusCode()
                + (body.isEmpty() ? "" : ", " + body.substring(0, Math.min(300, body.length())));
    }
}
