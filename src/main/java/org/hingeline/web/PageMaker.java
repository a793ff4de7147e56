package org.hingeline.web;

import io.javalin.http.Context;
import java.time.Instant;
import java.time.InstantSource;
import java.time.ZoneId;
import java.util.List;
import java.util.Map;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.hingeline.web.view.ErrorView;
import org.hingeline.web.view.LayoutView;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.SiteChoice;

/** Puts a view into the page around it and sends it. */
final class PageMaker {
    private final Pages pages = new Pages();
    private final InstantSource clock;

    PageMaker(InstantSource clock) {
        this.clock = clock;
    }

    Instant now() {
        return clock.instant();
    }

    static ZoneId zone(Context ctx) {
        return Visit.of(ctx).site().zone();
    }

    void show(Context ctx, String template, String current, Object page) {
        show(ctx, 200, template, current, page, "");
    }

    void show(Context ctx, int status, String template, String current, Object page, String notice) {
        html(ctx, status, template, layout(Visit.of(ctx), current, notice), page);
    }

    void showSignedOut(Context ctx, int status, String template, String csrf, Object page) {
        html(ctx, status, template, LayoutView.signedOut(csrf), page);
    }

    void error(Context ctx, int status) {
        error(ctx, ErrorView.of(status));
    }

    void error(Context ctx, ErrorView view) {
        Visit visit = Visit.orNull(ctx);
        LayoutView layout = visit == null ? LayoutView.signedOut("") : layout(visit, "", "");
        html(ctx, view.status(), "error", layout, view);
    }

    private void html(Context ctx, int status, String template, LayoutView layout, Object page) {
        ctx.status(status)
                .header("Cache-Control", "no-store")
                .contentType("text/html; charset=utf-8")
                .result(pages.render(template, Map.of("layout", layout, "page", page)));
    }

    private LayoutView layout(Visit visit, String current, String notice) {
        Site site = visit.site();
        List<SiteChoice> sites = visit.caller().memberships().stream()
                .map(m -> new SiteChoice(
                        m.site().code(), m.site().name(), m.site().id() == site.id()))
                .toList();
        Instant now = clock.instant();
        return new LayoutView(
                site.name(),
                site.code(),
                sites,
                visit.caller().name(),
                role(visit.role()),
                visit.caller().csrf(),
                site.zone().getId(),
                Moment.of(now, now, site.zone()),
                current,
                notice);
    }

    private static LayoutView.Role role(Role role) {
        return switch (role) {
            case VIEWER -> LayoutView.Role.VIEWER;
            case OPERATOR -> LayoutView.Role.OPERATOR;
            case MANAGER -> LayoutView.Role.MANAGER;
        };
    }

    /** A path of ours with the site of the visit, for a redirect. */
    String link(Context ctx, String path) {
        return layout(Visit.of(ctx), "", "").link(path);
    }
}
