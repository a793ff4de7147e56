package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.DosePlan;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Standing;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.VolumeUnit;
import org.hingeline.monitor.DoseEntry;
import org.hingeline.monitor.DoseHistory;
import org.hingeline.monitor.DoseRecords;
import org.hingeline.monitor.DoseRefusedException;
import org.hingeline.monitor.DoseWish;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.web.view.Choice;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.RecordView;
import org.jspecify.annotations.Nullable;

/** Recording what was put in, taking it back, standing for it as the second person, and correcting it. */
final class DoseRecordPages {
    private static final DoseAmounts AMOUNTS = new DoseAmounts(VolumeUnit.LITRE);

    private static final Duration LAST_BAG = Duration.ofDays(60);

    private static final double WEEK_MIN = 7 * 24 * 60;

    /** What a person types; a fault of anything else is told of the form as a whole. */
    private static final List<String> TYPED = List.of("massG", "lot", "note", "bag", "assayPercent");

    private final StatusBoard board;
    private final DoseRecords records;
    private final DoseHistory history;
    private final PageMaker pages;

    DoseRecordPages(StatusBoard board, DoseRecords records, DoseHistory history, PageMaker pages) {
        this.board = board;
        this.records = records;
        this.history = history;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/points/{code}/doses", this::ask, Gate.OPERATOR);
        routes.post("/points/{code}/doses", this::record, Gate.OPERATOR);
        routes.post("/points/{code}/doses/{id}/undo", this::undo, Gate.OPERATOR);
        routes.post("/points/{code}/doses/{id}/confirmation", this::confirm, Gate.OPERATOR);
        routes.post("/points/{code}/doses/{id}/correction", this::correct, Gate.OPERATOR);
    }

    /** The form below a plan: the first step's mass stands in it, and only the lot is to be typed; null without a plan. */
    static @Nullable RecordView ofPlan(Point point, DoseWish wish, DosePlan plan, DoseRecords.Rules rules) {
        DoseWish.Agent agent = wish.agent();
        if (plan.steps().isEmpty() || agent == null) {
            return null;
        }
        String code = agent.code() == null ? Agent.SODIUM_CARBONATE.code() : agent.code();
        String hydration = agent.hydration() == null ? "" : agent.hydration();
        Double assay = agent.assayPercent();
        Double volumeL = wish.volumeL();
        double massG = plan.steps().get(0).massG();
        Map<String, String> values = new LinkedHashMap<>();
        values.put("key", UUID.randomUUID().toString());
        values.put("agent", code);
        values.put("hydration", hydration);
        values.put("assayPercent", assay == null ? "" : Words.plain(assay));
        values.put("volumeL", volumeL == null ? "" : Words.plain(volumeL));
        values.put("followedPlan", "true");
        values.put("massG", Words.plain(massG));
        String hint = plan.steps().size() == 1
                ? ""
                : "This is the first step. Record each step when it is put in: read pH, then work out the next one.";
        if (massG > rules.secondPersonAboveG() && rules.secondPersonAboveG() < DoseRecords.Rules.OFF) {
            hint = (hint + " Above " + AMOUNTS.mass(rules.secondPersonAboveG())
                            + " a second person has to confirm it before it is put in.")
                    .strip();
        }
        return new RecordView(
                point.code(),
                point.name(),
                "",
                Words.sentence(DoseRows.what(code, hydration, assay == null ? "" : Words.plain(assay))),
                hint,
                List.of(),
                Form.of(values));
    }

    /** A dose that no plan stood for; what was in the bag last time stands in the form. */
    private void ask(Context ctx) {
        Point point = PointRoutes.found(board, ctx).point();
        Map<String, String> values = new LinkedHashMap<>();
        values.put("key", UUID.randomUUID().toString());
        values.put("assayPercent", "99");
        values.put("minutesAgo", "0");
        Instant now = pages.now();
        history.of(point, now.minus(LAST_BAG), now).stream()
                .map(DoseHistory.Entry::dose)
                .filter(Dose::counts)
                .findFirst()
                .ifPresent(last -> {
                    values.put("bag", last.given().agent() + "/" + last.given().hydration());
                    values.put("assayPercent", Words.plain(last.given().assayPercent()));
                    values.put("lot", last.given().lot());
                });
        show(ctx, 200, new RecordView(point.code(), point.name(), "", "", "", bags(), Form.of(values)));
    }

    private static List<Choice> bags() {
        return Agent.all().stream()
                .flatMap(agent -> agent.forms().stream()
                        .map(form -> new Choice(
                                agent.code() + "/" + form.code(),
                                Words.sentence(DoseRows.what(agent.code(), form.code(), "")))))
                .toList();
    }

    private void show(Context ctx, int status, RecordView view) {
        pages.show(ctx, status, "record", "water", view, "");
    }

    private void record(Context ctx) {
        Visit visit = Visit.of(ctx);
        Point point = PointRoutes.found(board, ctx).point();
        try {
            Dose dose = records.record(visit.site(), visit.caller(), entry(ctx, point.code()))
                    .dose();
            back(
                    ctx,
                    dose.standing() == Standing.PENDING
                            ? "Recorded, and waits for a second person. Put nothing in before it is confirmed."
                            : AMOUNTS.mass(dose.given().massG()) + " recorded. For ten minutes you can undo it.");
        } catch (FieldFaultsException e) {
            again(ctx, point, "", e);
        }
    }

    private void correct(Context ctx) {
        Visit visit = Visit.of(ctx);
        Point point = PointRoutes.found(board, ctx).point();
        long id = own(ctx, point);
        try {
            records.correct(visit.site(), visit.caller(), id, entry(ctx, point.code()));
            back(ctx, "The correction is entered; what it corrects stays in the list.");
        } catch (FieldFaultsException e) {
            again(ctx, point, String.valueOf(id), e);
        } catch (DoseRefusedException e) {
            back(ctx, said(e));
        }
    }

    private void undo(Context ctx) {
        Visit visit = Visit.of(ctx);
        long id = own(ctx, PointRoutes.found(board, ctx).point());
        try {
            Dose dose = records.undo(visit.site(), visit.caller(), id);
            back(ctx, AMOUNTS.mass(dose.given().massG()) + " undone. The record stays and says so.");
        } catch (DoseRefusedException e) {
            back(ctx, said(e));
        }
    }

    private void confirm(Context ctx) {
        Visit visit = Visit.of(ctx);
        long id = own(ctx, PointRoutes.found(board, ctx).point());
        try {
            Dose dose = records.confirm(visit.site(), visit.caller(), id);
            back(ctx, AMOUNTS.mass(dose.given().massG()) + " confirmed. It can be put in.");
        } catch (DoseRefusedException e) {
            back(ctx, said(e));
        } catch (FieldFaultsException e) {
            back(ctx, Words.sentence(Forms.plainly(String.valueOf(e.getMessage()))) + ".");
        }
    }

    /** The id in the path, of a dose of that point. */
    private long own(Context ctx, Point point) {
        long id = DoseRecordRoutes.id(ctx);
        return history.one(point.siteId(), id)
                .filter(entry -> entry.dose().pointId() == point.id())
                .map(entry -> entry.dose().id())
                .orElseThrow(() -> new ProblemException(404, "No such dose", "there is no dose " + id + " here"));
    }

    private static String said(DoseRefusedException e) {
        return Words.sentence(e.detail()) + ".";
    }

    private void back(Context ctx, String notice) {
        new Flash(notice, null).leave(ctx);
        ctx.redirect(pages.link(ctx, "/points/" + ctx.pathParam("code") + "#doses"));
    }

    private void again(Context ctx, Point point, String corrects, FieldFaultsException e) {
        List<FieldFaults.Fault> told = e.faults().stream()
                .map(fault -> TYPED.contains(last(fault.field()))
                        ? new FieldFaults.Fault(last(fault.field()), fault.detail())
                        : new FieldFaults.Fault("", fault.detail()))
                .toList();
        Form form = Forms.refused(ctx, new FieldFaultsException(told));
        boolean decided = form.value("bag").isEmpty() && !form.value("agent").isEmpty();
        show(
                ctx,
                422,
                new RecordView(
                        point.code(),
                        point.name(),
                        corrects,
                        decided
                                ? Words.sentence(DoseRows.what(
                                        form.value("agent"), form.value("hydration"), form.value("assayPercent")))
                                : "",
                        "",
                        decided ? List.of() : bags(),
                        form));
    }

    private static String last(String field) {
        return field.substring(field.lastIndexOf('/') + 1);
    }

    private DoseEntry entry(Context ctx, String point) {
        FieldFaults faults = new FieldFaults();
        String[] bag = Forms.text(ctx, "bag").split("/", 2);
        Double minutesAgo = Forms.number(ctx, "minutesAgo", faults);
        if (minutesAgo != null && !(minutesAgo >= 0 && minutesAgo <= WEEK_MIN)) {
            faults.add("minutesAgo", "choose when it was put in, within the last week");
            faults.throwIfAny();
        }
        DoseEntry entry = new DoseEntry(
                given(ctx, "key"),
                point,
                minutesAgo == null || minutesAgo == 0
                        ? null
                        : pages.now().minusSeconds(Math.round(60 * minutesAgo)).toString(),
                new DoseWish.Agent(
                        bag.length == 2 ? bag[0] : given(ctx, "agent"),
                        bag.length == 2 ? bag[1] : given(ctx, "hydration"),
                        Forms.number(ctx, "assayPercent", faults)),
                Forms.number(ctx, "massG", faults),
                given(ctx, "lot"),
                Forms.number(ctx, "volumeL", faults),
                given(ctx, "note"),
                Forms.text(ctx, "followedPlan").equals("true"));
        faults.throwIfAny();
        return entry;
    }

    private static @Nullable String given(Context ctx, String field) {
        String text = Forms.text(ctx, field);
        return text.isEmpty() ? null : text;
    }
}
