package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import io.micrometer.prometheusmetrics.PrometheusMeterRegistry;
import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import java.util.Map;
import org.hingeline.monitor.Check;

/** Health, metrics and the description of the API. */
final class OperationRoutes {
    private final List<Check> checks;
    private final PrometheusMeterRegistry registry;
    private final byte[] description;

    OperationRoutes(List<Check> checks, PrometheusMeterRegistry registry) {
        this.checks = checks;
        this.registry = registry;
        this.description = resource("/openapi/hingeline-v1.yaml");
    }

    void addTo(RoutesConfig routes) {
        routes.get("/health/live", ctx -> Json.answer(ctx, 200, Map.of("status", "up")), Gate.OPEN);
        routes.get("/health/ready", this::ready, Gate.OPEN);
        routes.get(
                "/metrics",
                ctx -> ctx.contentType("text/plain; version=0.0.4; charset=utf-8")
                        .result(registry.scrape()),
                Gate.VIEWER);
        routes.get(
                "/api/v1/openapi.yaml",
                ctx -> ctx.contentType("application/yaml").result(description),
                Gate.VIEWER);
    }

    private void ready(Context ctx) {
        List<Check.Result> results = checks.stream().map(Check::check).toList();
        boolean well = results.stream().allMatch(Check.Result::well);
        Json.answer(ctx, well ? 200 : 503, Map.of("status", well ? "ready" : "not ready", "parts", results));
    }

    private static byte[] resource(String path) {
        try (InputStream in = OperationRoutes.class.getResourceAsStream(path)) {
            if (in == null) {
                throw new IllegalStateException(path + " is missing from the program");
            }
            return in.readAllBytes();
        } catch (IOException e) {
            throw new IllegalStateException(path + " cannot be read", e);
        }
    }
}
