package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.util.List;
import java.util.Map;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.AlertDesk;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.StatusBoard;
import org.jspecify.annotations.Nullable;

/** {@code /api/v1/alerts}: open and ended alerts, and acknowledging them. */
final class AlertRoutes {
    private static final int MOST = 500;

    /** The body of an acknowledgement. */
    record Acknowledgement(@Nullable String note) {}

    private final StatusBoard board;
    private final AlertDesk alerts;

    AlertRoutes(StatusBoard board, AlertDesk alerts) {
        this.board = board;
        this.alerts = alerts;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/api/v1/alerts", this::list, Gate.VIEWER);
        routes.post("/api/v1/alerts/{id}/acknowledgement", this::acknowledge, Gate.OPERATOR);
    }

    private void list(Context ctx) {
        Site site = Visit.of(ctx).site();
        String state = ctx.queryParam("state") == null ? "open" : ctx.queryParam("state");
        List<Alert> found = switch (String.valueOf(state)) {
            case "open" -> alerts.open(site.id());
            case "closed" -> board.closedAlerts(site, MOST);
            default ->
                throw new ProblemException(
                        400, "Wrong query", "state \"" + state + "\" is not known; accepted: open, closed");
        };
        Map<Long, Point> points = points(board, site);
        Json.answer(
                ctx,
                200,
                Map.of(
                        "alerts",
                        found.stream()
                                .map(alert -> PointJson.alert(alert, pointOf(points, alert)))
                                .toList()));
    }

    private void acknowledge(Context ctx) {
        Acknowledgement body =
                ctx.bodyAsBytes().length == 0 ? new Acknowledgement(null) : Json.body(ctx, Acknowledgement.class);
        Visit visit = Visit.of(ctx);
        long id = id(ctx);
        AlertDesk.Acknowledged result =
                alerts.acknowledge(visit.site().id(), id, visit.caller().name(), body.note());
        if (result == AlertDesk.Acknowledged.NO_SUCH_ALERT) {
            throw noSuchAlert(ctx.pathParam("id"));
        }
        Alert alert = board.alert(visit.site(), id).orElseThrow();
        Json.answer(ctx, 200, PointJson.alert(alert, pointOf(points(board, visit.site()), alert)));
    }

    static long id(Context ctx) {
        try {
            return Long.parseLong(ctx.pathParam("id"));
        } catch (NumberFormatException e) {
            throw noSuchAlert(ctx.pathParam("id"));
        }
    }

    static ProblemException noSuchAlert(String id) {
        return new ProblemException(404, "No such alert", "there is no alert " + id + " at this site");
    }

    static Map<Long, Point> points(StatusBoard board, Site site) {
        return board.points(site).stream()
                .map(PointStatus::point)
                .collect(Collectors.toMap(Point::id, Function.identity()));
    }

    static Point pointOf(Map<Long, Point> points, Alert alert) {
        Point point = points.get(alert.pointId());
        if (point == null) {
            throw new IllegalStateException("alert " + alert.id() + " belongs to no point of its site");
        }
        return point;
    }
}
