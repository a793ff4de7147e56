package org.hingeline.web;

import io.javalin.http.Context;
import io.javalin.http.HandlerType;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.Optional;
import java.util.Set;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.Caller;
import org.hingeline.monitor.PeopleBook.Membership;
import org.jspecify.annotations.Nullable;

/**
 * Stands before every route: finds out who is asking, for which site, and whether they may; and that a browser's change
 * comes from one of our own pages.
 */
final class Gatekeeper {
    static final String SESSION_COOKIE = "hingeline_session";
    static final String CSRF_FIELD = "csrf";
    static final String CSRF_HEADER = "X-Hingeline-Csrf";
    private static final String BEARER = "Bearer ";
    private static final Set<HandlerType> SAFE = Set.of(HandlerType.GET, HandlerType.HEAD, HandlerType.OPTIONS);

    private final Accounts accounts;

    Gatekeeper(Accounts accounts) {
        this.accounts = accounts;
    }

    /** Lets the request through or ends it. */
    void check(Context ctx) {
        Gate gate = gateOf(ctx);
        if (gate == Gate.OPEN) {
            return;
        }
        if (gate == Gate.GATEWAY) {
            admitGateway(ctx);
            return;
        }
        Optional<Caller> caller = caller(ctx);
        if (caller.isEmpty()) {
            turnAway(ctx);
            return;
        }
        if (caller.get().browser() && !SAFE.contains(ctx.method())) {
            requireOwnPage(ctx, caller.get());
        }
        Membership membership = siteAsked(ctx, caller.get());
        if (!membership.role().atLeast(gate.role())) {
            throw new ProblemException(
                    403,
                    "Not allowed",
                    "this needs the role " + gate.role().code() + " at "
                            + membership.site().code() + "; yours is "
                            + membership.role().code());
        }
        new Visit(caller.get(), membership.site(), membership.role()).attachTo(ctx);
    }

    /** A route without a gate is closed to everybody: forgetting one must not open it. */
    private static Gate gateOf(Context ctx) {
        return ctx.routeRoles().stream()
                .filter(Gate.class::isInstance)
                .map(Gate.class::cast)
                .findFirst()
                .orElseThrow(() -> new ProblemException(404, "No such address", "there is nothing at " + ctx.path()));
    }

    private void admitGateway(Context ctx) {
        String key = bearer(ctx);
        if (key == null) {
            throw unauthorized(
                    ctx, "a gateway key is missing; send the header Authorization: Bearer followed by the key");
        }
        Visit.attach(
                ctx,
                accounts.byGatewayKey(key)
                        .orElseThrow(() -> unauthorized(ctx, "this gateway key is not known here or was withdrawn")));
    }

    private Optional<Caller> caller(Context ctx) {
        String token = bearer(ctx);
        if (token != null) {
            return Optional.of(accounts.byToken(token)
                    .orElseThrow(() -> unauthorized(ctx, "this access token is not known here or was withdrawn")));
        }
        String session = ctx.cookie(SESSION_COOKIE);
        return session == null || session.isBlank() ? Optional.empty() : accounts.bySession(session);
    }

    private static void turnAway(Context ctx) {
        if (forProgram(ctx)) {
            throw unauthorized(ctx, "sign in, or send an access token in the header Authorization: Bearer");
        }
        String asked = ctx.queryString() == null ? ctx.path() : ctx.path() + "?" + ctx.queryString();
        String next = SAFE.contains(ctx.method()) ? asked : "/";
        ctx.redirect("/sign-in?next=" + URLEncoder.encode(next, StandardCharsets.UTF_8));
        ctx.skipRemainingHandlers();
    }

    private static void requireOwnPage(Context ctx, Caller caller) {
        String from = ctx.header("Sec-Fetch-Site");
        boolean elsewhere = from != null && !from.equals("same-origin") && !from.equals("none");
        String header = ctx.header(CSRF_HEADER);
        String sent = header != null ? header : ctx.formParam(CSRF_FIELD);
        if (elsewhere || sent == null || !same(sent, caller.csrf())) {
            throw new ProblemException(
                    403,
                    "Form not accepted",
                    "the change did not come from one of this service's own pages, or the page was open since an earlier"
                            + " sign-in. Load it again and retry");
        }
    }

    private static Membership siteAsked(Context ctx, Caller caller) {
        String code = ctx.queryParam("site");
        if (caller.memberships().isEmpty()) {
            throw new ProblemException(403, "No site", "you belong to no site; ask a manager to add you");
        }
        if (code != null && !code.isBlank()) {
            return caller.at(code)
                    .orElseThrow(() -> new ProblemException(
                            404,
                            "No such site",
                            "site \"" + code + "\" is not one of yours; yours: " + caller.siteCodes()));
        }
        if (caller.memberships().size() > 1 && forProgram(ctx)) {
            throw new ProblemException(
                    400, "Which site?", "you have several sites; add ?site= with one of " + caller.siteCodes());
        }
        return caller.memberships().get(0);
    }

    static boolean forProgram(Context ctx) {
        return ctx.path().startsWith("/api/")
                || ctx.path().equals("/metrics")
                || ctx.path().equals("/events")
                || ctx.path().startsWith("/fragments/");
    }

    static boolean same(String a, String b) {
        return MessageDigest.isEqual(a.getBytes(StandardCharsets.UTF_8), b.getBytes(StandardCharsets.UTF_8));
    }

    private static @Nullable String bearer(Context ctx) {
        String header = ctx.header("Authorization");
        return header != null && header.regionMatches(true, 0, BEARER, 0, BEARER.length())
                ? header.substring(BEARER.length()).strip()
                : null;
    }

    private static ProblemException unauthorized(Context ctx, String detail) {
        ctx.header("WWW-Authenticate", "Bearer");
        return new ProblemException(401, "Not signed in", detail);
    }
}
