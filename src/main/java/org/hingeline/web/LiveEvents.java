package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.sse.SseClient;
import java.time.Duration;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.Executors;
import java.util.concurrent.ScheduledExecutorService;
import java.util.concurrent.TimeUnit;

/**
 * Tells open pages that something changed, by server-sent events: {@code changed} at most twice a second, {@code alive}
 * every quarter of a minute so that a silent break of the line is noticed.
 */
public final class LiveEvents implements AutoCloseable {
    private static final Duration GATHER = Duration.ofMillis(500);
    private static final Duration ALIVE = Duration.ofSeconds(15);

    /** A browser throws an event without data away. */
    private static final String DATA = "yes";

    private final Map<Long, Set<SseClient>> clients = new ConcurrentHashMap<>();
    private final Set<Long> changed = ConcurrentHashMap.newKeySet();
    private final ScheduledExecutorService timer = Executors.newSingleThreadScheduledExecutor(work -> {
        Thread thread = new Thread(work, "live-events");
        thread.setDaemon(true);
        return thread;
    });

    /** @param lookEvery how often to tell pages to look by themselves, for changes made by another node; zero for never */
    public LiveEvents(Duration lookEvery) {
        timer.scheduleWithFixedDelay(this::tellChanged, GATHER.toMillis(), GATHER.toMillis(), TimeUnit.MILLISECONDS);
        timer.scheduleWithFixedDelay(() -> tellAll("alive"), ALIVE.toSeconds(), ALIVE.toSeconds(), TimeUnit.SECONDS);
        if (!lookEvery.isZero()) {
            timer.scheduleWithFixedDelay(
                    () -> tellAll("changed"), lookEvery.toSeconds(), lookEvery.toSeconds(), TimeUnit.SECONDS);
        }
    }

    /** Pages of this site will be told soon. */
    public void siteChanged(long siteId) {
        if (clients.containsKey(siteId)) {
            changed.add(siteId);
        }
    }

    void addTo(RoutesConfig routes) {
        routes.sse("/events", this::join, Gate.VIEWER);
    }

    private void join(SseClient client) {
        long siteId = Visit.of(client.ctx()).site().id();
        client.keepAlive();
        Set<SseClient> ofSite = clients.computeIfAbsent(siteId, id -> ConcurrentHashMap.newKeySet());
        client.onClose(() -> ofSite.remove(client));
        ofSite.add(client);
        client.sendEvent("alive", DATA);
    }

    private void tellChanged() {
        for (Long siteId : changed) {
            changed.remove(siteId);
            clients.getOrDefault(siteId, Set.of()).forEach(client -> client.sendEvent("changed", DATA));
        }
    }

    private void tellAll(String event) {
        clients.values().forEach(ofSite -> ofSite.forEach(client -> client.sendEvent(event, DATA)));
    }

    /** Lets every page go; to be called before the server stops, which would wait for them. */
    @Override
    public void close() {
        timer.shutdownNow();
        clients.values().forEach(ofSite -> ofSite.forEach(SseClient::close));
    }
}
