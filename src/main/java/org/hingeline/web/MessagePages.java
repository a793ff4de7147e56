package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Instant;
import java.time.ZoneId;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.OutboxBook;
import org.hingeline.monitor.OutboxBook.Message;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.web.view.MessagesView;
import org.hingeline.web.view.Moment;

/** What was sent to whom, and how it went. */
final class MessagePages {
    private static final int MOST = 200;

    private final StatusBoard board;
    private final PageMaker pages;

    MessagePages(StatusBoard board, PageMaker pages) {
        this.board = board;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/messages", this::show, Gate.VIEWER);
    }

    private void show(Context ctx) {
        Site site = Visit.of(ctx).site();
        Instant now = pages.now();
        pages.show(
                ctx,
                "messages",
                "messages",
                new MessagesView(board.messages(site, MOST).stream()
                        .map(message -> entry(message, now, site.zone()))
                        .toList()));
    }

    private static MessagesView.Entry entry(Message message, Instant now, ZoneId zone) {
        return new MessagesView.Entry(
                message.recipientName() + ", " + message.recipient(),
                channel(message),
                Moment.of(message.createdAt(), now, zone),
                state(message),
                detail(message, now, zone).strip(),
                message.subject(),
                message.body());
    }

    static String channel(Message message) {
        return message.channel().equals("email") ? "e-mail" : message.channel();
    }

    static MessagesView.State state(Message message) {
        return switch (message.state()) {
            case SENT -> MessagesView.State.SENT;
            case GIVEN_UP -> MessagesView.State.GIVEN_UP;
            case WAITING -> message.attempts() == 0 ? MessagesView.State.WAITING : MessagesView.State.RETRYING;
        };
    }

    /** " at 03:01"; ": connection refused after 3 tries; next try 03:20". */
    static String detail(Message message, Instant now, ZoneId zone) {
        Instant sent = message.sentAt();
        if (sent != null) {
            return " at " + Moment.of(sent, now, zone).clock();
        }
        String error = message.lastError();
        if (error == null) {
            return "";
        }
        String tries = message.attempts() == 1 ? " after 1 try" : " after " + message.attempts() + " tries";
        String next = message.state() == OutboxBook.State.WAITING
                ? "; next try at "
                        + Moment.of(message.nextAttemptAt(), now, zone).clock()
                : "";
        return " (" + error + tries + next + ")";
    }
}
