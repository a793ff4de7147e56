package org.hingeline.monitor;

import java.time.Instant;
import java.util.Arrays;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.PeopleBook.Subscriber;

/** Writes messages about alerts into the outbox, one for each subscriber they concern, in the alert's transaction. */
public final class MessageDesk {

    /** What a message tells of. */
    enum Kind {
        RAISED("raised", "raised"),
        RAISED_AGAIN("again", "raised again"),
        BACK_TO_NORMAL("back", "back to normal");

        private final String code;
        private final String words;

        Kind(String code, String words) {
            this.code = code;
            this.words = words;
        }
    }

    private final String publicUrl;
    private final String installation;

    /**
     * @param publicUrl where people reach the service, without a slash at the end
     * @param installation a name no other installation has, so that message keys are unique in the world
     */
    public MessageDesk(String publicUrl, String installation) {
        this.publicUrl = publicUrl;
        this.installation = installation;
    }

    /** What a message told of, in a word or three: "raised", "back to normal". */
    public static String news(OutboxBook.Message message) {
        return Arrays.stream(Kind.values())
                .filter(kind -> message.key().contains("-" + kind.code + "-"))
                .findFirst()
                .map(kind -> kind.words)
                .orElse(message.subject());
    }

    /** @param valueAt time of the value that this tells of; one batch may bring several turns of one alert */
    void alert(Books books, long siteId, long alertId, Limit limit, Kind kind, Instant valueAt, Instant now) {
        Alert alert = books.alerts().alert(siteId, alertId).orElseThrow();
        AlertNews news = news(books, siteId, alert, limit, now);
        AlertText text = text(news, kind);
        for (Subscriber subscriber : books.people().subscribers(siteId)) {
            if (subscriber.active() && alert.priority().atLeast(subscriber.minPriority())) {
                books.outbox().add(message(siteId, alert, kind, text, subscriber, valueAt, now));
            }
        }
    }

    private static AlertText text(AlertNews news, Kind kind) {
        return switch (kind) {
            case RAISED -> news.limit().onSilence() ? AlertText.silence(news) : AlertText.raised(news);
            case RAISED_AGAIN -> news.limit().onSilence() ? AlertText.silence(news) : AlertText.raisedAgain(news);
            case BACK_TO_NORMAL -> AlertText.backToNormal(news);
        };
    }

    private AlertNews news(Books books, long siteId, Alert alert, Limit limit, Instant now) {
        Site site = books.place().site(siteId).orElseThrow();
        Point point = books.place().pointById(alert.pointId()).orElseThrow();
        Batch batch = books.place().batchesNow(siteId, now).stream()
                .filter(b -> b.pointId() == point.id())
                .reduce((earlier, later) -> later)
                .orElse(null);
        WaterState water = books.water().newest(point.id()).orElse(null);
        return new AlertNews(site, point, alert, limit, water, batch, publicUrl, now);
    }

    private OutboxBook.Message message(
            long siteId, Alert alert, Kind kind, AlertText text, Subscriber subscriber, Instant valueAt, Instant now) {
        String key = "alert-" + alert.id() + "-" + kind.code + "-" + now.toEpochMilli() + "-" + valueAt.toEpochMilli()
                + "-" + subscriber.id() + "-" + installation;
        return new OutboxBook.Message(
                0,
                siteId,
                alert.id(),
                key,
                "email",
                subscriber.name(),
                subscriber.email(),
                text.subject(),
                text.body(),
                OutboxBook.State.WAITING,
                0,
                now,
                now,
                null,
                null);
    }
}
