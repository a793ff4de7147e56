package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Point;
import org.hingeline.monitor.LimitDesk;
import org.hingeline.monitor.StatusBoard;

/** {@code /api/v1/points/{code}/limits/{name}}: setting and taking away limits. */
final class LimitRoutes {
    private final StatusBoard board;
    private final LimitDesk limits;

    LimitRoutes(StatusBoard board, LimitDesk limits) {
        this.board = board;
        this.limits = limits;
    }

    void addTo(RoutesConfig routes) {
        routes.put("/api/v1/points/{code}/limits/{name}", this::put, Gate.OPERATOR);
        routes.delete("/api/v1/points/{code}/limits/{name}", this::delete, Gate.OPERATOR);
    }

    private void put(Context ctx) {
        Point point = PointRoutes.found(board, ctx).point();
        LimitDesk.Wish wish = Json.body(ctx, LimitDesk.Wish.class);
        Limit saved = limits.save(
                point, ctx.pathParam("name"), wish, Visit.of(ctx).caller().name());
        Json.answer(ctx, 200, PointJson.limit(saved));
    }

    private void delete(Context ctx) {
        Point point = PointRoutes.found(board, ctx).point();
        String name = ctx.pathParam("name");
        if (!limits.retire(point, name, Visit.of(ctx).caller().name())) {
            throw new ProblemException(404, "No such limit", "there is no limit \"" + name + "\" at " + point.code());
        }
        ctx.status(204);
    }
}
