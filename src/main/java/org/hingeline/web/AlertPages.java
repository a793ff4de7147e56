package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Instant;
import java.time.ZoneId;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.AlertDesk;
import org.hingeline.monitor.MessageDesk;
import org.hingeline.monitor.OutboxBook.Message;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.web.view.AlertsView;
import org.hingeline.web.view.AlertsView.Entry;
import org.hingeline.web.view.AlertsView.Told;
import org.hingeline.web.view.Moment;

/** The alerts, and taking them on. */
final class AlertPages {
    private static final int ENDED = 50;

    private final StatusBoard board;
    private final AlertDesk alerts;
    private final PageMaker pages;

    AlertPages(StatusBoard board, AlertDesk alerts, PageMaker pages) {
        this.board = board;
        this.alerts = alerts;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/alerts", this::show, Gate.VIEWER);
        routes.post("/alerts/{id}/acknowledgement", this::acknowledge, Gate.OPERATOR);
    }

    private void show(Context ctx) {
        Site site = Visit.of(ctx).site();
        Instant now = pages.now();
        Map<Long, Point> points = AlertRoutes.points(board, site);
        List<Entry> open = alerts.open(site.id()).stream()
                .sorted(Comparator.comparing(Alert::priority).reversed())
                .map(alert -> entry(alert, AlertRoutes.pointOf(points, alert), now, site.zone()))
                .toList();
        List<Entry> ended = board.closedAlerts(site, ENDED).stream()
                .map(alert -> entry(alert, AlertRoutes.pointOf(points, alert), now, site.zone()))
                .toList();
        pages.show(
                ctx,
                200,
                "alerts",
                "alerts",
                new AlertsView(open, ended),
                Flash.take(ctx).notice());
    }

    private Entry entry(Alert alert, Point point, Instant now, ZoneId zone) {
        Instant closed = alert.closedAt();
        return new Entry(
                String.valueOf(alert.id()),
                point.code(),
                point.name(),
                Words.alert(alert, now, zone)
                        + (alert.returnedAt() != null && closed == null
                                ? "; back within the limit, listed until somebody acknowledges it"
                                : ""),
                alert.priority().code(),
                Moment.of(alert.raisedAt(), now, zone),
                PathPoints.acknowledged(alert, now, zone),
                closed == null ? Moment.never() : Moment.of(closed, now, zone),
                alert.returnedAt() == null ? alert.action() : "",
                !alert.quantity().measured() && alert.quantity() != Quantity.SILENCE,
                board.messagesOf(alert).stream()
                        .map(message -> told(message, now, zone))
                        .toList());
    }

    private static Told told(Message message, Instant now, ZoneId zone) {
        return new Told(
                message.recipientName(),
                MessagePages.channel(message),
                MessageDesk.news(message),
                MessagePages.state(message).words() + MessagePages.detail(message, now, zone));
    }

    private void acknowledge(Context ctx) {
        Visit visit = Visit.of(ctx);
        long id = AlertRoutes.id(ctx);
        AlertDesk.Acknowledged result =
                alerts.acknowledge(visit.site().id(), id, visit.caller().name(), Forms.text(ctx, "note"));
        if (result == AlertDesk.Acknowledged.NO_SUCH_ALERT) {
            throw AlertRoutes.noSuchAlert(ctx.pathParam("id"));
        }
        new Flash(
                        result == AlertDesk.Acknowledged.DONE
                                ? "You have taken the alert on."
                                : "Somebody was faster, or the alert is over already.",
                        null)
                .leave(ctx);
        String next = SignInPages.next(Forms.text(ctx, "next"));
        ctx.redirect(pages.link(ctx, next.contains("?") ? "/" : next));
    }
}
