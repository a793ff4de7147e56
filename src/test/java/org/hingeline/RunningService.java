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
import java.security.SecureRandom;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.config.Settings;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.Passwords;
import org.hingeline.monitor.PeopleBook;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.ReadingBook.RefusedRow;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.monitor.Role;
import org.hingeline.monitor.Storage;

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

    /** The store itself, for what cannot be seen through HTTP. */
    public Storage storage() {
        return service.storage();
    }

    /** Rows that were not taken, newest first. */
    public List<RefusedRow> refusedRows(Site at) {
        return storage().read(books -> books.readings().refused(at.id(), 1000));
    }

    /** Every reading of the site, whatever its flag. */
    public List<StoredReading> allReadings(Site at) {
        return storage()
                .read(books -> books.place().sensors(at.id()).stream()
                        .flatMap(sensor -> books
                                .readings()
                                .between(
                                        sensor.id(),
                                        Instant.parse("1900-01-01T00:00:00Z"),
                                        Instant.parse("9000-01-01T00:00:00Z"))
                                .stream())
                        .toList());
    }

    /** Every route the service serves, as {@code GET /api/v1/points}. */
    public Set<String> routes() {
        return service.web().routes();
    }

    /** Sets up another place beside the first. */
    public Site addPlace(PlacePlan plan) {
        return service.place().apply(plan, "test");
    }

    public String gatewayKey(Site at) {
        return service.accounts().makeGatewayKey(at, "another gateway", "test");
    }

    public String token(Site at, Role role) {
        return service.accounts().makeAccessToken(at, "test " + role.code(), role, "test");
    }

    /** Signs in a person who belongs to the sites, and answers the token of their session cookie. */
    public String signIn(String name, List<Site> sites, Role role) {
        for (Site at : sites) {
            storage().writeOnly(books -> {
                long id = books.people()
                        .personByName(name)
                        .map(PeopleBook.Person::id)
                        .orElseGet(() -> books.people()
                                .savePerson(
                                        name, name, new Passwords(new SecureRandom()).hash(PASSWORD), Instant.EPOCH));
                books.people().saveMembership(id, at.id(), role);
            });
        }
        return ((Accounts.SignIn.Welcome) service.accounts().signIn(name, PASSWORD)).token();
    }

    /** What the pages of a signed-in person carry, so that their changes are taken. */
    public String csrf(String session) {
        return service.accounts().bySession(session).orElseThrow().csrf();
    }

    Service service() {
        return service;
    }

    public Site site() {
        return site;
    }

    public String gatewayKey() {
        return gatewayKey;
    }

    /** Adds somebody who signs in with {@link #PASSWORD}. */
    public void addPerson(Site at, String name, String displayName, Role role) {
        service.accounts().savePerson(at, name, displayName, PASSWORD, role, "test");
    }

    /** Gives somebody who signs in already a role at another site. */
    public void addToSite(Site at, String name, Role role) {
        service.accounts().addToSite(at, name, role, "test");
    }

    /** Sets up another site from a place file's text. */
    public Site addPlace(String yaml) {
        return service.place().apply(PlaceFileReader.readText("test", yaml), "test");
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
