package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.hingeline.web.view.PathPoint;
import org.hingeline.web.view.Standing;
import org.hingeline.web.view.StatusView;
import org.hingeline.web.view.TideStrip;
import org.hingeline.web.view.TideStrip.Level;
import org.hingeline.web.view.TideStrip.Stretch;
import org.jspecify.annotations.Nullable;

/** The water's way: the first page. */
final class StatusPages {
    private static final Duration STRIP = Duration.ofHours(24);
    private static final Duration STRIP_STEP = Duration.ofMinutes(10);

    private final StatusBoard board;
    private final PageMaker pages;

    StatusPages(StatusBoard board, PageMaker pages) {
        this.board = board;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get(
                "/",
                ctx -> pages.show(
                        ctx, 200, "status", "water", view(ctx), Flash.take(ctx).notice()),
                Gate.VIEWER);
        routes.get("/fragments/status", ctx -> pages.show(ctx, "fragments/status", "water", view(ctx)), Gate.VIEWER);
    }

    private StatusView view(Context ctx) {
        Site site = Visit.of(ctx).site();
        List<PointStatus> points = board.points(site);
        return new StatusView(
                points.stream()
                        .filter(status -> status.point().kind() == PointKind.INTAKE)
                        .findFirst()
                        .map(intake -> strip(intake, site.zone()))
                        .orElse(null),
                path(points, site.zone()));
    }

    /** The points in order; one that is not fed by the line it hangs on says what feeds it. */
    private static List<PathPoint> path(List<PointStatus> points, ZoneId zone) {
        List<PathPoint> path = new ArrayList<>();
        String line = "";
        for (PointStatus status : points) {
            PathPoint point = PathPoints.of(status, zone);
            String feed = status.point().feedsFrom();
            path.add(
                    feed == null || feed.equals(line) ? point : point.withNote("Fed from " + name(points, feed) + "."));
            if (point.place().onTheLine()) {
                line = point.code();
            }
        }
        return path;
    }

    private static String name(List<PointStatus> points, String code) {
        return points.stream()
                .map(status -> status.point())
                .filter(point -> point.code().equals(code))
                .map(point -> point.name())
                .findFirst()
                .orElse(code);
    }

    private TideStrip strip(PointStatus intake, ZoneId zone) {
        Instant now = intake.now();
        Instant from = now.minus(STRIP);
        List<WaterState> states = board.history(intake.point(), from, now, STRIP_STEP);
        return TideStrip.draw(
                intake.point().name() + ", last 24 h",
                from,
                now,
                zone,
                stretches(intake, states),
                levels(intake, from, now));
    }

    /** From each state to the next, as long as a state speaks for. */
    private static List<Stretch> stretches(PointStatus intake, List<WaterState> states) {
        Duration most = intake.point().maxGap().compareTo(STRIP_STEP) < 0
                ? STRIP_STEP.multipliedBy(2)
                : intake.point().maxGap();
        List<Stretch> stretches = new ArrayList<>();
        for (int i = 0; i < states.size(); i++) {
            WaterState state = states.get(i);
            Instant end = state.at().plus(most);
            if (i + 1 < states.size() && states.get(i + 1).at().isBefore(end)) {
                end = states.get(i + 1).at();
            }
            stretches.add(new Stretch(state.at(), end, standing(intake, state.numbers())));
        }
        return stretches;
    }

    private static Standing standing(PointStatus intake, @Nullable WaterNumbers numbers) {
        Optional<Limit> limit = intake.watching().stream()
                .filter(l -> l.quantity() == Quantity.OMEGA_ARAGONITE && l.side() == Side.BELOW)
                .findFirst();
        if (numbers == null || limit.isEmpty()) {
            return Standing.UNKNOWN;
        }
        return numbers.omegaAragonite() < limit.get().threshold() ? Standing.SHORT : Standing.FIT;
    }

    private List<Level> levels(PointStatus intake, Instant from, Instant now) {
        return board.readings(intake.point(), Quantity.LEVEL, from, now, STRIP_STEP).stream()
                .findFirst()
                .map(ofSensor -> ofSensor.readings().stream()
                        .map(reading -> new Level(reading.at(), reading.value()))
                        .toList())
                .orElse(List.of());
    }
}
