package org.hingeline.web;

import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.PeopleBook.Subscriber;
import org.hingeline.monitor.PlaceDesk;
import org.hingeline.seawater.PhScale;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.SetupView.Row;

/** What is set up already, a line each. */
final class SetupRows {
    private final PlaceDesk place;
    private final Accounts accounts;
    private final PageMaker pages;

    SetupRows(PlaceDesk place, Accounts accounts, PageMaker pages) {
        this.place = place;
        this.accounts = accounts;
        this.pages = pages;
    }

    List<Row> pointRows(List<Point> points) {
        return points.stream()
                .map(p -> {
                    Double volumeL = p.volumeL();
                    return new Row(
                            p.name(),
                            "code " + p.code() + ", " + p.kind().words().toLowerCase(Locale.ROOT)
                                    + (volumeL == null ? "" : ", " + Words.number(volumeL, 0) + "\u00a0L")
                                    + ", silent after " + Moment.span(p.maxGap()),
                            "",
                            "");
                })
                .toList();
    }

    List<Row> sensorRows(Site site, List<Point> points) {
        return place.sensors(site).stream()
                .map(s -> {
                    PhScale scale = s.phScale();
                    String point = points.stream()
                            .filter(p -> p.id() == s.pointId())
                            .map(Point::name)
                            .findFirst()
                            .orElse("");
                    return new Row(
                            s.code(),
                            s.quantity().words() + " at " + point + unit(s.quantity(), s.unit())
                                    + (scale == null ? "" : ", " + scale.wireName() + " scale") + ", \u00b1"
                                    + Words.plain(s.standardUncertainty()),
                            "",
                            "");
                })
                .toList();
    }

    /** Unless it is a bare number, as of pH and salinity. */
    private static String unit(Quantity quantity, String unit) {
        boolean bare = unit.equals("1") || unit.equals("[pH]");
        return bare
                ? ""
                : ", in " + Units.find(quantity, unit).map(UnitChoice::label).orElse(unit);
    }

    List<Row> keyRows(Site site) {
        Instant now = pages.now();
        return accounts.gatewayKeys(site).stream()
                .map(key -> {
                    Instant heard = key.lastHeardAt();
                    boolean revoked = key.revokedAt() != null;
                    return new Row(
                            key.gateway(),
                            revoked
                                    ? "withdrawn"
                                    : heard == null
                                            ? "never heard"
                                            : "heard "
                                                    + Moment.of(heard, now, site.zone())
                                                            .age(),
                            revoked ? "" : String.valueOf(key.id()),
                            revoked ? "" : "Withdraw");
                })
                .toList();
    }

    List<Row> tokenRows(Site site) {
        ZoneId zone = site.zone();
        return accounts.accessTokens(site).stream()
                .map(token -> {
                    boolean revoked = token.revokedAt() != null;
                    return new Row(
                            token.name(),
                            token.role().code() + ", made "
                                    + Moment.of(token.createdAt(), pages.now(), zone)
                                            .clock()
                                    + (revoked ? ", withdrawn" : ""),
                            revoked ? "" : String.valueOf(token.id()),
                            revoked ? "" : "Withdraw");
                })
                .toList();
    }

    List<Row> peopleRows(Site site) {
        return accounts.people(site).stream()
                .map(p -> new Row(
                        p.person().displayName(),
                        p.person().name() + ", " + p.role().code(),
                        "",
                        ""))
                .toList();
    }

    private static String told(Priority least) {
        return switch (least) {
            case HIGH -> "high priority only";
            case MEDIUM -> "high and medium priority";
            case LOW -> "everything";
        };
    }

    List<Row> subscriberRows(Site site) {
        List<Row> rows = new ArrayList<>();
        for (Subscriber s : place.subscribers(site)) {
            rows.add(new Row(
                    s.name(),
                    s.email() + ", " + (s.active() ? "is told about " + told(s.minPriority()) : "not told any more"),
                    s.active() ? s.code() : "",
                    s.active() ? "Stop telling" : ""));
        }
        return rows;
    }
}
