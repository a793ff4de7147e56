package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.Locale;
import java.util.stream.Collectors;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.jspecify.annotations.Nullable;

/**
 * What a message about an alert says: composed from what is known, without looking anything up.
 *
 * <p>It is read by somebody who was asleep: what is wrong comes first, what to do second, everything else after that.
 *
 * @param subject at most 100 characters, on one line
 * @param body plain text, at most 8000 characters
 */
public record AlertText(String subject, String body) {
    private static final int SUBJECT_MOST = 100;
    private static final int BODY_MOST = 8000;
    private static final Duration SAME_TIME = Duration.ofMinutes(1);

    public AlertText {
        subject = Wording.cut(Wording.oneLine(subject), SUBJECT_MOST);
        body = Wording.cut(body, BODY_MOST);
    }

    /** The water went out of its limit. */
    public static AlertText raised(AlertNews news) {
        return outOfLimit(news, false);
    }

    /** It had come back, nobody had acknowledged, and it is out again. */
    public static AlertText raisedAgain(AlertNews news) {
        return outOfLimit(news, true);
    }

    /** The water is back inside limit and deadband, or a silent point is heard again. */
    public static AlertText backToNormal(AlertNews news) {
        AlertBook.Alert alert = news.alert();
        boolean silence = alert.quantity() == Quantity.SILENCE;
        Instant from = silence ? lastHeard(news) : alert.since();
        Instant until = alert.returnedAt() != null ? alert.returnedAt() : news.now();
        String valueNow = silence ? null : valueNow(news);
        String what = alert.quantity().words();

        AlertBody body = new AlertBody(news);
        if (silence) {
            body.line(name(news) + ": heard again.");
        } else if (valueNow == null) {
            body.line(name(news) + ": " + what + " is back within your " + threshold(news) + ".");
        } else {
            body.line(name(news) + ": " + what + " " + valueNow + ", back within your " + threshold(news) + ".");
        }
        body.gap();
        body.line("It was " + (silence ? "silent" : alert.side().word() + " it") + " for "
                + Wording.length(Duration.between(from, until)) + ", from "
                + Wording.dayAndTime(from, news.site().zone()) + " to "
                + Wording.time(until, from, news.site().zone()) + ".");
        if (alert.acknowledgedAt() == null) {
            body.line("Nobody has acknowledged the alert yet; it stays on the list until somebody does.");
        } else if (alert.acknowledgedBy() != null) {
            body.line("Acknowledged by " + Wording.oneLine(alert.acknowledgedBy()) + ". Nothing is left to do.");
        }
        body.batch();
        body.water();
        body.links();
        body.footer();
        String state = silence ? "heard again" : valueNow == null ? what : what + " " + number(news, valueNow);
        return new AlertText(subject(news, "Back to normal", state), body.text());
    }

    /** The point gave nothing that its limits could be watched with. */
    public static AlertText silence(AlertNews news) {
        Instant since = lastHeard(news);
        String sinceWords = Wording.time(since, news.now(), news.site().zone());
        WaterState water = news.water();
        String lost = "nothing heard";
        String why = "";
        // a state without Ω that is younger than the silence: something is heard, only not enough
        if (water != null && water.numbers() == null && water.at().isAfter(since.plus(SAME_TIME))) {
            lost = "no Ω";
            why = whyNoNumbers(water, news);
        }

        AlertBody body = new AlertBody(news);
        body.line(name(news) + ": " + lost + " since " + sinceWords + ", for "
                + Wording.length(Duration.between(since, news.now())) + (why.isEmpty() ? "." : ": " + why + "."));
        body.gap();
        body.whatToDo();
        body.line("While it is silent no limit of this point can be watched: the water may be out of them unseen.");
        body.batch();
        body.lastKnownWater();
        body.links();
        body.footer();
        return new AlertText(subject(news, priority(news), lost + " since " + sinceWords), body.text());
    }

    private static AlertText outOfLimit(AlertNews news, boolean again) {
        AlertBook.Alert alert = news.alert();
        int decimals = Wording.decimals(alert.quantity(), alert.value(), alert.threshold());
        String value = Wording.withUncertainty(alert.value(), alert.uncertainty(), decimals);
        String what = alert.quantity().words();

        AlertBody body = new AlertBody(news);
        body.line(name(news) + ": " + what + " "
                + Wording.withUnit(value, alert.quantity().unit()) + ", "
                + alert.side().word() + " your " + threshold(news) + (again ? " again" : "") + " for "
                + Wording.length(Duration.between(alert.since(), news.now())) + ".");
        body.gap();
        body.whatToDo();
        body.line((alert.side() == Side.BELOW ? "Under" : "Over") + " the limit since "
                + Wording.dayAndTime(alert.since(), news.site().zone()) + ".");
        if (again) {
            body.line("It had come back to normal before anybody acknowledged the alert; the same alert stands again.");
        }
        body.whenItCountsAsBack();
        body.batch();
        body.water();
        body.links();
        body.footer();
        return new AlertText(
                subject(
                        news,
                        priority(news) + (again ? " again" : ""),
                        what + " " + Wording.number(alert.value(), decimals) + " "
                                + alert.side().word() + " " + Wording.asSet(alert.quantity(), alert.threshold())),
                body.text());
    }

    private static String subject(AlertNews news, String first, String what) {
        String start = first + ": " + Wording.cut(news.point().name(), 40) + ", " + what;
        return start + " - " + news.site().name();
    }

    private static String name(AlertNews news) {
        Double litres = news.point().volumeL();
        return Wording.oneLine(news.point().name()) + (litres == null ? "" : " (" + Wording.volume(litres) + ")");
    }

    private static String priority(AlertNews news) {
        return news.alert().priority().code().toUpperCase(Locale.ROOT);
    }

    private static String threshold(AlertNews news) {
        Quantity quantity = news.alert().quantity();
        return Wording.withUnit(Wording.asSet(quantity, news.alert().threshold()), quantity.unit());
    }

    /** The value of the alert's quantity in the newest state, with uncertainty and unit. */
    private static @Nullable String valueNow(AlertNews news) {
        WaterState water = news.water();
        if (water == null) {
            return null;
        }
        Quantity quantity = news.alert().quantity();
        WaterNumbers numbers = water.numbers();
        if (numbers != null && quantity == Quantity.OMEGA_ARAGONITE) {
            return now(news, numbers.omegaAragonite(), numbers.omegaAragoniteUncertainty());
        }
        if (numbers != null && quantity == Quantity.OMEGA_CALCITE) {
            return now(news, numbers.omegaCalcite(), 0);
        }
        if (numbers != null && quantity == Quantity.PH_TOTAL) {
            return now(news, numbers.phTotal(), numbers.phTotalUncertainty());
        }
        return water.inputs().stream()
                .filter(input -> input.quantity() == quantity)
                .findFirst()
                .map(input -> now(news, input.value(), 0))
                .orElse(null);
    }

    private static String now(AlertNews news, double value, double uncertainty) {
        Quantity quantity = news.alert().quantity();
        int decimals = Wording.decimals(quantity, value, news.alert().threshold());
        return Wording.withUnit(Wording.withUncertainty(value, uncertainty, decimals), quantity.unit());
    }

    /** The number alone, for the subject. */
    private static String number(AlertNews news, String valueNow) {
        int plusMinus = valueNow.indexOf(" ±");
        return plusMinus < 0
                ? valueNow
                : Wording.withUnit(
                        valueNow.substring(0, plusMinus),
                        news.alert().quantity().unit());
    }

    /** A silence alert's value is how many minutes nothing had been heard when it was raised. */
    private static Instant lastHeard(AlertNews news) {
        AlertBook.Alert alert = news.alert();
        return alert.raisedAt().minusSeconds(Math.round(alert.value() * 60));
    }

    private static String whyNoNumbers(WaterState water, AlertNews news) {
        return water.missing().isEmpty()
                ? water.cautions().stream()
                        .map(note -> Wording.oneLine(note.detail()).replaceAll("\\.$", ""))
                        .collect(Collectors.joining("; "))
                : water.missing().stream()
                        .map(missing -> AlertBody.lastHeardOf(missing, news))
                        .collect(Collectors.joining("; "));
    }
}
