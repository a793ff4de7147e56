package org.hingeline.web;

import io.javalin.http.Context;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Caller;
import org.hingeline.monitor.KeyBook.GatewayKey;
import org.hingeline.monitor.Role;
import org.jspecify.annotations.Nullable;

/**
 * Who is asking, for which site, and what they may do there; found out once before the route runs.
 *
 * @param role at this site
 */
record Visit(Caller caller, Site site, Role role) {
    private static final String VISIT = "visit";
    private static final String GATEWAY = "gateway";

    static Visit of(Context ctx) {
        Visit visit = ctx.attribute(VISIT);
        if (visit == null) {
            throw new IllegalStateException("route " + ctx.path() + " has no gate");
        }
        return visit;
    }

    static @Nullable Visit orNull(Context ctx) {
        return ctx.attribute(VISIT);
    }

    static GatewayKey gateway(Context ctx) {
        GatewayKey gateway = ctx.attribute(GATEWAY);
        if (gateway == null) {
            throw new IllegalStateException("route " + ctx.path() + " is not for gateways");
        }
        return gateway;
    }

    void attachTo(Context ctx) {
        ctx.attribute(VISIT, this);
    }

    static void attach(Context ctx, GatewayKey gateway) {
        ctx.attribute(GATEWAY, gateway);
    }
}
