package org.hingeline.web;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.PointKind;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.OpenAlert;
import org.hingeline.web.view.PathPoint;
import org.hingeline.web.view.Place;
import org.hingeline.web.view.Standing;

/** From how a point stands to the sentence on the page. */
final class PathPoints {
    private PathPoints() {}

    static PathPoint of(PointStatus status, ZoneId zone) {
        WaterState state = status.newest();
        Optional<WaterNumbers> numbers = status.numbers();
        return new PathPoint(
                status.point().code(),
                status.point().name(),
                place(status.point().kind()),
                standing(status),
                verdict(status),
                numbers.map(n -> Words.number(n.omegaAragonite(), 2)).orElse(""),
                numbers.map(n -> Words.number(n.omegaAragoniteUncertainty(), 2)).orElse(""),
                against(status, zone),
                state == null ? Moment.never() : Moment.of(state.at(), status.now(), zone),
                notes(status),
                action(status),
                status.batch().map(batch -> Words.batch(batch, status.now())).orElse(""),
                status.openAlerts().stream()
                        .map(alert -> openAlert(alert, status.now(), zone))
                        .toList(),
                status.point().volumeL() != null,
                !status.watching().isEmpty(),
                urgency(status));
    }

    private static Place place(PointKind kind) {
        return switch (kind) {
            case INTAKE -> Place.INTAKE;
            case STORAGE -> Place.STORAGE;
            case HEADER -> Place.HEADER;
            case LARVAL -> Place.TANK;
            case DISCHARGE -> Place.DISCHARGE;
        };
    }

    static Standing standing(PointStatus status) {
        return switch (status.verdict()) {
            case FIT -> Standing.FIT;
            case OUT -> Standing.SHORT;
            case UNKNOWN, NO_LIMIT -> Standing.UNKNOWN;
        };
    }

    private static String verdict(PointStatus status) {
        return switch (status.verdict()) {
            case FIT -> "fit";
            case UNKNOWN -> "not known";
            case NO_LIMIT -> "not judged: no limit is set";
            case OUT -> passed(gravest(status.passed()));
        };
    }

    private static String passed(Limit limit) {
        boolean below = limit.side() == Side.BELOW;
        return switch (limit.quantity()) {
            case OMEGA_ARAGONITE, OMEGA_CALCITE -> below ? "short of carbonate" : "too rich in carbonate";
            case PH, PH_TOTAL -> below ? "too acid" : "too high in pH";
            case TEMPERATURE -> below ? "too cold" : "too warm";
            case SALINITY, CONDUCTIVITY -> below ? "too fresh" : "too salt";
            default -> (below ? "low in " : "high in ") + limit.quantity().words();
        };
    }

    private static Limit gravest(List<Limit> passed) {
        return passed.stream()
                .max(Comparator.comparing(Limit::priority)
                        .thenComparing(limit -> limit.quantity() == Quantity.OMEGA_ARAGONITE))
                .orElseThrow();
    }

    /** How Ω compares with the point's limit on it. */
    private static String against(PointStatus status, ZoneId zone) {
        if (status.numbers().isEmpty()) {
            return "";
        }
        Optional<Limit> limit = status.watching().stream()
                .filter(l -> l.quantity() == Quantity.OMEGA_ARAGONITE)
                .max(Comparator.comparing(Limit::threshold));
        if (limit.isEmpty()) {
            return "";
        }
        String threshold = Words.number(limit.get().threshold(), 2);
        if (!status.passed().contains(limit.get())) {
            return "your limit is " + threshold;
        }
        return status.openAlerts().stream()
                .filter(alert -> alert.limitId() == limit.get().id())
                .findFirst()
                .map(alert -> limit.get().side().word() + " your " + threshold + " for "
                        + Moment.span(Duration.between(alert.since(), status.now())))
                .orElse(limit.get().side().word() + " your " + threshold);
    }

    private static List<String> notes(PointStatus status) {
        List<String> notes = new ArrayList<>();
        WaterState state = status.newest();
        if (state == null) {
            return notes;
        }
        state.missing().forEach(missing -> notes.add(Words.missing(missing, status.now())));
        if (status.numbers().isEmpty() && state.missing().isEmpty() && state.numbers() != null) {
            notes.add("Last known water is " + Moment.span(Duration.between(state.at(), status.now()))
                    + " old; this point counts as silent after "
                    + Moment.span(status.point().maxGap()));
        }
        state.cautions().forEach(caution -> notes.add(caution.detail()));
        return notes;
    }

    private static Optional<Alert> standing(List<Alert> open) {
        return open.stream().filter(alert -> alert.returnedAt() == null).max(Comparator.comparing(Alert::priority));
    }

    /** 0 when there is nothing to do, else 1 for low priority to 3 for high. */
    private static int urgency(PointStatus status) {
        if (action(status).isEmpty()) {
            return 0;
        }
        return 1
                + standing(status.openAlerts())
                        .map(Alert::priority)
                        .orElseGet(() -> gravest(status.passed()).priority())
                        .ordinal();
    }

    /** What to do: the action of the gravest limit past which an alert stands, else of the gravest limit passed. */
    private static String action(PointStatus status) {
        Optional<Alert> standing = standing(status.openAlerts());
        if (standing.isPresent()) {
            return standing.get().action();
        }
        return status.passed().isEmpty() ? "" : gravest(status.passed()).action();
    }

    private static OpenAlert openAlert(Alert alert, Instant now, ZoneId zone) {
        return new OpenAlert(
                String.valueOf(alert.id()),
                Words.alert(alert, now, zone) + (alert.returnedAt() == null ? "" : "; back within the limit"),
                Moment.of(alert.raisedAt(), now, zone),
                acknowledged(alert, now, zone));
    }

    /** Who has taken an alert on, when, and their note; empty while nobody has. */
    static String acknowledged(Alert alert, Instant now, ZoneId zone) {
        Instant at = alert.acknowledgedAt();
        if (at == null) {
            return "";
        }
        String note = alert.acknowledgementNote();
        return alert.acknowledgedBy() + " at " + Moment.of(at, now, zone).clock()
                + (note == null || note.isBlank() ? "" : ": " + note);
    }
}
