package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import io.javalin.http.Cookie;
import io.javalin.http.SameSite;
import java.time.Duration;
import java.time.ZoneId;
import java.util.Optional;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.Accounts.SignIn;
import org.hingeline.monitor.Secrets;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.SignInView;
import org.jspecify.annotations.Nullable;

/** Signing in and out. */
final class SignInPages {
    private static final String FORM_COOKIE = "hingeline_sign_in";
    private static final Duration FORM_OPEN = Duration.ofHours(1);
    private static final int MOST_BYTES = 16_384;

    private final Accounts accounts;
    private final PageMaker pages;
    private final Secrets secrets;
    private final boolean tlsOnly;

    SignInPages(Accounts accounts, PageMaker pages, Secrets secrets, boolean tlsOnly) {
        this.accounts = accounts;
        this.pages = pages;
        this.secrets = secrets;
        this.tlsOnly = tlsOnly;
    }

    void addTo(RoutesConfig routes) {
        routes.get(
                "/sign-in", ctx -> form(ctx, 200, new SignInView("", "", "", next(ctx.queryParam("next")))), Gate.OPEN);
        routes.post("/sign-in", this::signIn, Gate.OPEN);
        routes.post("/sign-out", this::signOut, Gate.VIEWER);
    }

    private void form(Context ctx, int status, SignInView view) {
        String csrf = secrets.make("");
        ctx.cookie(cookie(FORM_COOKIE, csrf, FORM_OPEN, SameSite.STRICT));
        pages.showSignedOut(ctx, status, "sign-in", csrf, view);
    }

    private void signIn(Context ctx) {
        requireSmall(ctx);
        String name = Optional.ofNullable(ctx.formParam("name")).orElse("").strip();
        String password = Optional.ofNullable(ctx.formParam("password")).orElse("");
        String next = next(ctx.formParam("next"));
        String sent = ctx.formParam(Gatekeeper.CSRF_FIELD);
        String kept = ctx.cookie(FORM_COOKIE);
        if (sent == null || kept == null || kept.isBlank() || !Gatekeeper.same(sent, kept)) {
            form(ctx, 403, new SignInView(name, "This form was open too long. Please try again.", "", next));
            return;
        }
        SignIn result = accounts.signIn(name, password);
        if (result instanceof SignIn.Welcome welcome) {
            ctx.cookie(cookie(Gatekeeper.SESSION_COOKIE, welcome.token(), welcome.session(), SameSite.LAX));
            ctx.cookie(cookie(FORM_COOKIE, "", Duration.ZERO, SameSite.STRICT));
            ctx.redirect(next);
        } else if (result instanceof SignIn.Locked locked) {
            String until =
                    Moment.of(locked.until(), pages.now(), ZoneId.of("UTC")).clock();
            long minutes =
                    Math.max(1, Duration.between(pages.now(), locked.until()).toMinutes() + 1);
            form(
                    ctx,
                    429,
                    new SignInView(
                            name,
                            "",
                            "Too many failed attempts. Try again in " + minutes + " min (" + until + " UTC).",
                            next));
        } else if (result instanceof SignIn.Busy) {
            form(ctx, 503, new SignInView(name, "Too many people sign in just now. Try again in a moment.", "", next));
        } else {
            form(ctx, 401, new SignInView(name, "Name and password do not match.", "", next));
        }
    }

    /** Anybody may send this form, so nobody's may be large. */
    private static void requireSmall(Context ctx) {
        long length = ctx.req().getContentLengthLong();
        if (length < 0 || length > MOST_BYTES) {
            throw new ProblemException(
                    413, "Too large", "the sign-in form must say its length and have at most " + MOST_BYTES + " bytes");
        }
    }

    private void signOut(Context ctx) {
        String token = ctx.cookie(Gatekeeper.SESSION_COOKIE);
        if (token != null) {
            accounts.signOut(token);
        }
        ctx.cookie(cookie(Gatekeeper.SESSION_COOKIE, "", Duration.ZERO, SameSite.LAX));
        ctx.redirect("/sign-in");
    }

    /** Only paths of our own, so that a crafted link cannot send a person elsewhere after signing in. */
    static String next(@Nullable String asked) {
        if (asked == null || !asked.startsWith("/") || asked.startsWith("//") || asked.startsWith("/sign-")) {
            return "/";
        }
        return asked.chars().allMatch(c -> c > ' ' && c < 127 && c != '\\') ? asked : "/";
    }

    private Cookie cookie(String name, String value, Duration life, SameSite sameSite) {
        Cookie cookie = new Cookie(name, value);
        cookie.setPath("/");
        cookie.setMaxAge((int) life.toSeconds());
        cookie.setHttpOnly(true);
        cookie.setSecure(tlsOnly);
        cookie.setSameSite(sameSite);
        return cookie;
    }
}
