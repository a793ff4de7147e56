package org.hingeline;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.nio.file.Path;
import java.time.Clock;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.config.Settings;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;

/**
 * The real service on a free port with the demo's place set up, for tests that go through HTTP: a manager {@code ana}, a
 * gateway key, and an access token for each role.
 */
public final class RunningService implements AutoCloseable {
    public static final String PASSWORD = "a long enough password";

    private final Service service;
    private final Site site;
    private final String gatewayKey;
    private final HttpClient client =
            HttpClient.newBuilder().followRedirects(HttpClient.Redirect.NEVER).build();

    private RunningService(Service service, Site site, String gatewayKey) {
        this.service = service;
        this.site = site;
        this.gatewayKey = gatewayKey;
    }

    /** @param data a folder for the database and the mail */
    public static RunningService start(Path data, Clock clock) {
        return start(Settings.defaults().withPortAndData(0, data), clock);
    }

    public static RunningService start(Settings settings, Clock clock) {
        Service service = Service.start(settings, clock);
        Site site = service.place().apply(PlaceFileReader.read(Path.of("demo-hatchery", "hatchery.yaml")), "test");
        service.accounts().savePerson(site, "ana", "Ana Reis", PASSWORD, Role.MANAGER, "test");
        return new RunningService(service, site, service.accounts().makeGatewayKey(site, "pump house", "test"));
    }

    public Service service() {
        return service;
    }

    public Site site() {
        return site;
    }

    public String gatewayKey() {
        return gatewayKey;
    }

    /** A key for another gateway. */
    public String makeGatewayKey(String gateway) {
        return service.accounts().makeGatewayKey(site, gateway, "test");
    }

    public URI address() {
        return URI.create("http://127.0.0.1:" + service.port());
    }

    public String token(Role role) {
        return service.accounts().makeAccessToken(site, "test " + role.code(), role, "test");
    }

    public HttpResponse<String> postReadings(String json) {
        return send("POST", "/api/v1/readings", gatewayKey, json);
    }

    public HttpResponse<String> get(String path, String token) {
        return send(HttpRequest.newBuilder(address().resolve(path))
                .header("Authorization", "Bearer " + token)
                .build());
    }

    public HttpResponse<String> send(String method, String path, String bearer, String json) {
        return send(HttpRequest.newBuilder(address().resolve(path))
                .header("Authorization", "Bearer " + bearer)
                .header("Content-Type", "application/json")
                .method(method, BodyPublishers.ofString(json))
                .build());
    }

    public HttpResponse<String> send(HttpRequest request) {
        try {
            return client.send(request, BodyHandlers.ofString());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException(e);
        }
    }

    @Override
    public void close() {
        service.close();
    }
}
