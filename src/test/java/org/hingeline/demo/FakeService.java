package org.hingeline.demo;

import com.sun.net.httpserver.HttpExchange;
import com.sun.net.httpserver.HttpServer;
import java.io.IOException;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.atomic.AtomicInteger;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The service as a gateway meets it: keeps rows by point, quantity and time, and can be unwell. */
final class FakeService implements AutoCloseable {
    static final String KEY = "key-of-the-gateway";
    static final String TOKEN = "token-of-a-script";

    private static final JsonMapper JSON = JsonMapper.builder().build();

    /** What came of one post. */
    record Taken(int rows, Instant first, Instant last) {}

    private final HttpServer server;
    private final ExecutorService threads = Executors.newCachedThreadPool();
    final List<Taken> posts = new CopyOnWriteArrayList<>();
    final Map<String, Double> rows = new TreeMap<>();
    final AtomicInteger duplicates = new AtomicInteger();
    final AtomicInteger contradictions = new AtomicInteger();
    final AtomicInteger unwell = new AtomicInteger();
    final AtomicInteger badKeys = new AtomicInteger();

    FakeService(int port) throws IOException {
        server = HttpServer.create(new InetSocketAddress(InetAddress.getLoopbackAddress(), port), 0);
        server.setExecutor(threads);
        server.createContext("/api/v1/readings", this::readings);
        server.createContext("/api/v1/points/intake/water", this::water);
        server.start();
    }

    URI base() {
        return URI.create("http://127.0.0.1:" + server.getAddress().getPort());
    }

    int rowsOf(String point, String quantity) {
        synchronized (rows) {
            return (int) rows.keySet().stream()
                    .filter(key -> key.startsWith(point + " " + quantity + " "))
                    .count();
        }
    }

    @Override
    public void close() {
        server.stop(0);
        threads.shutdownNow();
    }

    private void readings(HttpExchange exchange) throws IOException {
        if (!("Bearer " + KEY).equals(exchange.getRequestHeaders().getFirst("Authorization"))) {
            badKeys.incrementAndGet();
            answer(exchange, 401, "{\"title\":\"unknown key\"}");
            return;
        }
        if (unwell.getAndUpdate(n -> Math.max(0, n - 1)) > 0) {
            answer(exchange, 503, "{\"title\":\"come back later\"}");
            return;
        }
        JsonNode readings =
                JSON.readTree(exchange.getRequestBody().readAllBytes()).path("readings");
        int stored = 0;
        int again = 0;
        Instant first = Instant.MAX;
        Instant last = Instant.MIN;
        synchronized (rows) {
            for (JsonNode row : readings) {
                Instant at = Instant.parse(row.path("at").asString());
                first = at.isBefore(first) ? at : first;
                last = at.isAfter(last) ? at : last;
                String key = row.path("point").asString() + " "
                        + row.path("quantity").asString() + " " + at;
                Double standing = rows.putIfAbsent(key, row.path("value").asDouble());
                if (standing == null) {
                    stored++;
                } else if (standing == row.path("value").asDouble()) {
                    again++;
                } else {
                    contradictions.incrementAndGet();
                }
            }
        }
        duplicates.addAndGet(again);
        posts.add(new Taken(readings.size(), first, last));
        answer(exchange, 200, "{\"stored\":" + stored + ",\"duplicates\":" + again + ",\"refused\":[]}");
    }

    private void water(HttpExchange exchange) throws IOException {
        if (!("Bearer " + TOKEN).equals(exchange.getRequestHeaders().getFirst("Authorization"))) {
            answer(exchange, 401, "{\"title\":\"unknown token\"}");
            return;
        }
        Instant newest;
        synchronized (rows) {
            newest = rows.keySet().stream()
                    .filter(key -> key.startsWith("intake ph "))
                    .map(key -> Instant.parse(key.substring("intake ph ".length())))
                    .max(Instant::compareTo)
                    .orElse(null);
        }
        if (newest == null) {
            answer(exchange, 200, "{\"point\":\"intake\",\"at\":null}");
        } else {
            answer(exchange, 200, "{\"at\":\"" + newest + "\"}");
        }
    }

    private static void answer(HttpExchange exchange, int status, String body) throws IOException {
        byte[] bytes = body.getBytes(StandardCharsets.UTF_8);
        exchange.getResponseHeaders().set("Content-Type", "application/json");
        exchange.sendResponseHeaders(status, bytes.length);
        exchange.getResponseBody().write(bytes);
        exchange.close();
    }
}
