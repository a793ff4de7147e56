package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.dosing.TankVolume;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Point;
import org.hingeline.monitor.DoseEntry;
import org.hingeline.monitor.DoseHistory;
import org.hingeline.monitor.DoseRecords;
import org.hingeline.monitor.DoseRefusedException;
import org.hingeline.monitor.StatusBoard;
import org.jspecify.annotations.Nullable;

/** {@code /api/v1/doses} and {@code /api/v1/points/{code}/doses}: what was put in, and how it came out. */
final class DoseRecordRoutes {
    private static final Duration HISTORY = Duration.ofDays(7);
    private static final Duration LONGEST = Duration.ofDays(366);

    private final StatusBoard board;
    private final DoseRecords records;
    private final DoseHistory history;
    private final InstantSource clock;

    DoseRecordRoutes(StatusBoard board, DoseRecords records, DoseHistory history, InstantSource clock) {
        this.board = board;
        this.records = records;
        this.history = history;
        this.clock = clock;
    }

    void addTo(RoutesConfig routes) {
        routes.post("/api/v1/doses", this::record, Gate.OPERATOR);
        routes.get("/api/v1/points/{code}/doses", this::list, Gate.VIEWER);
        routes.post("/api/v1/doses/{id}/undo", this::undo, Gate.OPERATOR);
        routes.post("/api/v1/doses/{id}/confirmation", this::confirm, Gate.OPERATOR);
        routes.post("/api/v1/doses/{id}/correction", this::correct, Gate.OPERATOR);
    }

    private void record(Context ctx) {
        DoseEntry entry = Json.body(ctx, DoseEntry.class);
        Visit visit = Visit.of(ctx);
        answer(ctx, records.record(visit.site(), visit.caller(), entry));
    }

    private void correct(Context ctx) {
        DoseEntry entry = Json.body(ctx, DoseEntry.class);
        Visit visit = Visit.of(ctx);
        try {
            answer(ctx, records.correct(visit.site(), visit.caller(), id(ctx), entry));
        } catch (DoseRefusedException e) {
            throw refused(e);
        }
    }

    private void undo(Context ctx) {
        Visit visit = Visit.of(ctx);
        try {
            answer(ctx, 200, records.undo(visit.site(), visit.caller(), id(ctx)));
        } catch (DoseRefusedException e) {
            throw refused(e);
        }
    }

    private void confirm(Context ctx) {
        Visit visit = Visit.of(ctx);
        try {
            answer(ctx, 200, records.confirm(visit.site(), visit.caller(), id(ctx)));
        } catch (DoseRefusedException e) {
            throw refused(e);
        }
    }

    private void answer(Context ctx, DoseRecords.Recorded recorded) {
        answer(ctx, recorded.fresh() ? 201 : 200, recorded.dose());
    }

    private void answer(Context ctx, int status, Dose dose) {
        DoseHistory.Entry entry = history.one(dose.siteId(), dose.id()).orElseThrow();
        Point point = AlertRoutes.points(board, Visit.of(ctx).site()).get(dose.pointId());
        Json.answer(ctx, status, DoseJson.of(entry, point == null ? "" : point.code()));
    }

    private void list(Context ctx) {
        Point point = PointRoutes.found(board, ctx).point();
        Instant to = Times.query(ctx, "to", clock.instant());
        Instant from = Times.query(ctx, "from", to.minus(HISTORY));
        Times.requireOrder(from, to);
        if (Duration.between(from, to).compareTo(LONGEST) > 0) {
            throw new ProblemException(Problem.ofFields(
                    400,
                    "Wrong query",
                    "from " + from + " is more than 366 days before to; ask for a shorter span",
                    List.of(new Problem.FieldError("/query/from", "at most 366 days before to"))));
        }
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put(
                "doses",
                history.of(point, from, to).stream()
                        .map(entry -> DoseJson.of(entry, point.code()))
                        .toList());
        json.put("volume", history.volume(point).map(DoseRecordRoutes::volume).orElse(null));
        Json.answer(ctx, 200, json);
    }

    private static Map<String, Object> volume(TankVolume volume) {
        Map<String, Object> json = new LinkedHashMap<>();
        json.put("seemsL", volume.volumeL());
        json.put("lowL", volume.lowL());
        json.put("highL", volume.highL());
        json.put("doses", volume.doses());
        return json;
    }

    static long id(Context ctx) {
        try {
            return Long.parseLong(ctx.pathParam("id"));
        } catch (NumberFormatException e) {
            throw new ProblemException(
                    404, "No such dose", "there is no dose " + JsonFaults.cut(ctx.pathParam("id")) + " at this site");
        }
    }

    static ProblemException refused(DoseRefusedException e) {
        return switch (e.kind()) {
            case NO_SUCH_DOSE -> new ProblemException(404, "No such dose", e.detail());
            case NOT_YOURS -> new ProblemException(403, "Not allowed", e.detail());
            case TOO_LATE -> new ProblemException(409, "Too late", e.detail());
        };
    }
}
