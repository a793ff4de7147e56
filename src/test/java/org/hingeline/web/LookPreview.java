package org.hingeline.web;

import com.sun.net.httpserver.HttpExchange;
import com.sun.net.httpserver.HttpServer;
import java.io.IOException;
import java.io.InputStream;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.concurrent.Executors;
import java.util.function.Function;
import org.hingeline.web.view.DoseView;
import org.hingeline.web.view.ErrorView;
import org.hingeline.web.view.LayoutView;
import org.hingeline.web.view.LayoutView.Role;
import org.hingeline.web.view.SignInView;

/**
 * Shows every page on invented water, to be looked at in a browser: run it from the test class path with an optional port (8099).
 * {@code /} is an ordinary night, {@code /look} lists the rest.
 */
public final class LookPreview {
    private static final String CSP = "default-src 'self'";
    private final Pages pages = new Pages();
    private final InstantSource clock = InstantSource.system();
    private final Map<String, Function<LookSamples, String>> looks = new LinkedHashMap<>();

    private LookPreview() {
        look("/", s -> page("status", s.layout("water"), s.ordinary()));
        look("/all-fit", s -> page("status", s.twoSites("water"), s.allFit()));
        look("/bad-night", s -> page("status", s.layout("water"), s.badNight()));
        look("/nothing-known", s -> page("status", s.layout("water"), s.nothingKnown()));
        look("/points/larval-3", s -> page("point", s.layout("water"), s.point(false)));
        look("/points/larval-3/refused", s -> page("point", s.layout("water"), s.point(true)));
        look("/points/larval-3/dose", s -> page("dose", s.layout("water"), s.dose(DoseView.Outcome.PLAN)));
        look("/dose-refused", s -> page("dose", s.layout("water"), s.dose(DoseView.Outcome.REFUSED)));
        look("/calculator", s -> page("calculator", s.layout("calculator"), CalculatorSamples.worked()));
        look("/alerts", s -> page("alerts", s.layout("alerts"), s.alerts()));
        look("/messages", s -> page("messages", s.layout("messages"), s.messages()));
        look("/setup", s -> page("setup", s.layout("setup"), s.setup(true)));
        look(
                "/sign-in",
                s -> page(
                        "sign-in",
                        LayoutView.signedOut("t"),
                        new SignInView("ana", "Name or password do not match.", "", "/")));
        look("/error", s -> page("error", s.layout("", Role.VIEWER, java.util.List.of()), ErrorView.of(404)));
    }

    private void look(String path, Function<LookSamples, String> html) {
        looks.put(path, html);
    }

    private String page(String template, LayoutView layout, Object view) {
        return pages.render(template, Map.of("layout", layout, "page", view));
    }

    public static void main(String[] arguments) throws IOException {
        int port = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 8099;
        LookPreview preview = new LookPreview();
        HttpServer server = HttpServer.create(new InetSocketAddress(InetAddress.getLoopbackAddress(), port), 0);
        server.setExecutor(Executors.newCachedThreadPool());
        server.createContext("/", preview::answer);
        server.start();
        System.out.println("address: http://localhost:" + port + "/look");
    }

    private void answer(HttpExchange exchange) throws IOException {
        String path = exchange.getRequestURI().getPath();
        String from = exchange.getRequestHeaders().getFirst("Referer");
        if (path.equals("/fragments/status") && from != null) {
            path = URI.create(from).getPath();
        }
        try (exchange) {
            Function<LookSamples, String> html = looks.get(path);
            if (html != null) {
                send(exchange, "text/html; charset=utf-8", bytes(html.apply(new LookSamples(clock.instant()))));
            } else if (path.equals("/look")) {
                StringBuilder list = new StringBuilder("<!doctype html><title>Looks</title><ul>");
                looks.keySet()
                        .forEach(p -> list.append("<li><a href=\"")
                                .append(p)
                                .append("\">")
                                .append(p)
                                .append("</a>"));
                send(exchange, "text/html; charset=utf-8", bytes(list.toString()));
            } else if (path.equals("/events")) {
                events(exchange);
            } else if (path.startsWith("/api/")) {
                send(exchange, "application/json", bytes(history()));
            } else if (path.startsWith("/web/")) {
                file(exchange, path);
            } else if (path.startsWith("/webjars/")) {
                file(exchange, "/META-INF/resources" + path);
            } else {
                exchange.sendResponseHeaders(404, -1);
            }
        }
    }

    private void file(HttpExchange exchange, String resource) throws IOException {
        try (InputStream in = LookPreview.class.getResourceAsStream(resource)) {
            if (in == null) {
                exchange.sendResponseHeaders(404, -1);
                return;
            }
            String type = resource.endsWith(".css")
                    ? "text/css; charset=utf-8"
                    : resource.endsWith(".svg") ? "image/svg+xml" : "text/javascript; charset=utf-8";
            send(exchange, type, in.readAllBytes());
        }
    }

    private static void send(HttpExchange exchange, String type, byte[] body) throws IOException {
        exchange.getResponseHeaders().set("Content-Type", type);
        exchange.getResponseHeaders().set("Content-Security-Policy", CSP);
        exchange.sendResponseHeaders(200, body.length);
        exchange.getResponseBody().write(body);
    }

    private static void events(HttpExchange exchange) throws IOException {
        exchange.getResponseHeaders().set("Content-Type", "text/event-stream");
        exchange.sendResponseHeaders(200, 0);
        try {
            while (true) {
                exchange.getResponseBody().write(bytes("event: changed\ndata: {}\n\n"));
                exchange.getResponseBody().flush();
                Thread.sleep(5_000);
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    private String history() {
        StringBuilder json = new StringBuilder("{\"states\":[");
        Instant now = clock.instant();
        for (int minute = 48 * 60; minute >= 0; minute -= 10) {
            if (minute > 1500 && minute < 1740) {
                continue;
            }
            double hours = minute / 60.0;
            double omega = 2.1 + 0.35 * Math.cos(hours / 12.42 * 2 * Math.PI + 2) - 0.25 * Math.exp(-hours / 6);
            json.append(String.format(
                    Locale.ROOT,
                    "%s{\"at\":\"%s\",\"omegaAragonite\":%.3f,\"phTotal\":%.3f,\"temperatureC\":%.2f,\"salinity\":%.2f,"
                            + "\"standardUncertainty\":{\"omegaAragonite\":{\"total\":0.11}}}",
                    json.charAt(json.length() - 1) == '[' ? "" : ",",
                    now.minus(Duration.ofMinutes(minute)),
                    omega,
                    7.3 + omega / 4,
                    21.5 + 0.6 * Math.sin(hours / 24 * 2 * Math.PI),
                    30.1 + 0.2 * Math.sin(hours / 12)));
        }
        return json.append("]}").toString();
    }

    private static byte[] bytes(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }
}
