package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.StatusBoard;

/** {@code /api/v1/points}: the points, their water now, its history, their readings. */
final class PointRoutes {
    private static final Duration HISTORY = Duration.ofHours(48);

    private final StatusBoard board;
    private final InstantSource clock;

    PointRoutes(StatusBoard board, InstantSource clock) {
        this.board = board;
        this.clock = clock;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/api/v1/points", this::all, Gate.VIEWER);
        routes.get("/api/v1/points/{code}", this::one, Gate.VIEWER);
        routes.get("/api/v1/points/{code}/water", this::water, Gate.VIEWER);
        routes.get("/api/v1/points/{code}/readings", this::readings, Gate.VIEWER);
    }

    private void all(Context ctx) {
        Json.answer(
                ctx,
                200,
                Map.of(
                        "points",
                        board.points(Visit.of(ctx).site()).stream()
                                .map(PointJson::point)
                                .toList()));
    }

    private void one(Context ctx) {
        Json.answer(ctx, 200, PointJson.point(found(board, ctx)));
    }

    private void water(Context ctx) {
        PointStatus status = found(board, ctx);
        if (ctx.queryParam("from") == null && ctx.queryParam("to") == null && ctx.queryParam("step") == null) {
            Json.answer(ctx, 200, PointJson.water(status));
            return;
        }
        Instant to = Times.query(ctx, "to", clock.instant());
        Instant from = Times.query(ctx, "from", to.minus(HISTORY));
        Times.requireOrder(from, to);
        Json.answer(
                ctx,
                200,
                Map.of(
                        "states",
                        board.history(status.point(), from, to, Times.step(ctx)).stream()
                                .map(PointJson::state)
                                .toList()));
    }

    private void readings(Context ctx) {
        PointStatus status = found(board, ctx);
        String code = ctx.queryParam("quantity");
        Quantity quantity = Quantity.ofCode(code == null ? "" : code)
                .filter(Quantity::measured)
                .orElseThrow(() -> new ProblemException(
                        400,
                        "Wrong query",
                        (code == null ? "quantity is missing" : "quantity \"" + code + "\" is not measured")
                                + "; ask with ?quantity= and one of "
                                + Quantity.measuredCodes()));
        Instant to = Times.query(ctx, "to", clock.instant());
        Instant from = Times.query(ctx, "from", to.minus(HISTORY));
        Times.requireOrder(from, to);
        List<Map<String, Object>> rows = board.readings(status.point(), quantity, from, to, Times.step(ctx)).stream()
                .flatMap(ofSensor -> ofSensor.readings().stream().map(reading -> {
                    Map<String, Object> json = new LinkedHashMap<>();
                    json.put("sensor", ofSensor.sensor().code());
                    json.put("quantity", quantity.code());
                    json.put("value", reading.value());
                    json.put("unit", quantity.unit().ucum());
                    json.put("at", reading.at());
                    json.put("flag", reading.flag().code());
                    return json;
                }))
                .toList();
        Json.answer(ctx, 200, Map.of("readings", rows));
    }

    /** The point named in the path, or 404. */
    static PointStatus found(StatusBoard board, Context ctx) {
        String code = ctx.pathParam("code");
        return board.point(Visit.of(ctx).site(), code)
                .orElseThrow(() ->
                        new ProblemException(404, "No such point", "point \"" + code + "\" is not known at this site"));
    }
}
