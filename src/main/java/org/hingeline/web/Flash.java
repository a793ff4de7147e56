package org.hingeline.web;

import io.javalin.http.Context;
import io.javalin.http.Cookie;
import io.javalin.http.SameSite;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.Map;
import org.hingeline.web.view.Undo;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;

/**
 * What the next page says about the change just made, and the button that puts it back. It travels in a cookie that the
 * next page takes away; nothing depends on it.
 */
record Flash(String notice, @Nullable Undone undone) {
    private static final String COOKIE = "hingeline_flash";
    private static final int SECONDS = 120;

    /** A change that can be put back: what was done, to which limit, and the old values of the form. */
    record Undone(String sentence, String limitName, Map<String, String> values) {}

    static final Flash NONE = new Flash("", null);

    @Nullable
    Undo undo() {
        return undone == null ? null : new Undo(undone.sentence(), undone.limitName(), undone.values());
    }

    void leave(Context ctx) {
        String text = Base64.getUrlEncoder().withoutPadding().encodeToString(Json.MAPPER.writeValueAsBytes(this));
        ctx.cookie(cookie(text, SECONDS));
    }

    static Flash take(Context ctx) {
        String text = ctx.cookie(COOKIE);
        if (text == null || text.isBlank()) {
            return NONE;
        }
        ctx.cookie(cookie("", 0));
        try {
            byte[] json = Base64.getUrlDecoder().decode(text.getBytes(StandardCharsets.US_ASCII));
            Flash flash = Json.MAPPER.readValue(json, Flash.class);
            return flash == null ? NONE : flash;
        } catch (JacksonException | IllegalArgumentException e) {
            return NONE; // somebody's own cookie; the page does without
        }
    }

    private static Cookie cookie(String text, int seconds) {
        Cookie cookie = new Cookie(COOKIE, text);
        cookie.setPath("/");
        cookie.setMaxAge(seconds);
        cookie.setHttpOnly(true);
        cookie.setSameSite(SameSite.STRICT);
        return cookie;
    }
}
