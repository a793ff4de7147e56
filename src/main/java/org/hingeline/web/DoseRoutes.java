package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import org.hingeline.monitor.DoseDesk;
import org.hingeline.monitor.DoseWish;

/** {@code POST /api/v1/dose-plans}: suggests, stores nothing. */
final class DoseRoutes {
    private final DoseDesk doses;

    DoseRoutes(DoseDesk doses) {
        this.doses = doses;
    }

    void addTo(RoutesConfig routes) {
        routes.post("/api/v1/dose-plans", this::plan, Gate.VIEWER);
    }

    private void plan(Context ctx) {
        DoseWish wish = Json.body(ctx, DoseWish.class);
        Json.answer(ctx, 200, DosePlanJson.of(doses.plan(Visit.of(ctx).site(), wish)));
    }
}
