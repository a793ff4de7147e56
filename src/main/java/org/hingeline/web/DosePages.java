package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.dosing.Amount;
import org.hingeline.dosing.DosePlan;
import org.hingeline.dosing.DoseStep;
import org.hingeline.dosing.Remedy;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.VolumeUnit;
import org.hingeline.monitor.DoseDesk;
import org.hingeline.monitor.DoseRecords;
import org.hingeline.monitor.DoseWish;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.monitor.WaterState;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.web.view.DoseView;
import org.hingeline.web.view.DoseView.Outcome;
import org.hingeline.web.view.DoseView.Result;
import org.hingeline.web.view.DoseView.Step;
import org.hingeline.web.view.DoseView.WaterLine;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.RecordView;
import org.jspecify.annotations.Nullable;

/** Working out a dose for a tank. Stores nothing: a person confirms, a person doses. */
final class DosePages {
    /** A target a little above the limit, so that the tank does not ring again at once. */
    private static final double ABOVE_LIMIT = 0.2;

    private static final double TARGET_WITHOUT_LIMIT = 2.0;

    private final StatusBoard board;
    private final DoseDesk doses;
    private final DoseRecords records;
    private final PageMaker pages;

    DosePages(StatusBoard board, DoseDesk doses, DoseRecords records, PageMaker pages) {
        this.board = board;
        this.doses = doses;
        this.records = records;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/points/{code}/dose", this::ask, Gate.VIEWER);
        routes.post("/points/{code}/dose", this::plan, Gate.VIEWER);
    }

    private void ask(Context ctx) {
        PointStatus point = PointRoutes.found(board, ctx);
        show(ctx, 200, point, blank(point), null, null);
    }

    private void plan(Context ctx) {
        PointStatus point = PointRoutes.found(board, ctx);
        try {
            DoseWish wish = wish(ctx, point);
            DosePlan plan = doses.plan(Visit.of(ctx).site(), wish);
            Map<String, String> values = new LinkedHashMap<>();
            ctx.formParamMap().forEach((field, sent) -> values.put(field, sent.isEmpty() ? "" : sent.get(0)));
            values.remove(Gatekeeper.CSRF_FIELD);
            show(
                    ctx,
                    200,
                    point,
                    Form.of(values),
                    result(plan, wish, new DoseAmounts(volumeUnit(ctx))),
                    DoseRecordPages.ofPlan(point.point(), wish, plan, records.rules()));
        } catch (FieldFaultsException e) {
            show(ctx, 422, point, Forms.refused(ctx, withFormNames(e)), null, null);
        }
    }

    /** The use case names the fields of its own request; the form has them under shorter names. */
    private static FieldFaultsException withFormNames(FieldFaultsException e) {
        return new FieldFaultsException(e.faults().stream()
                .map(fault -> new FieldFaults.Fault(formName(fault.field()), fault.detail()))
                .toList());
    }

    private static String formName(String field) {
        if (field.startsWith("target")) {
            return "targetOmega";
        }
        String last = field.substring(field.lastIndexOf('/') + 1);
        return last.equals("volumeL") ? "volume" : last;
    }

    /** Litres where the form says nothing. */
    private static VolumeUnit volumeUnit(Context ctx) {
        String ucum = Forms.text(ctx, "volumeUnit");
        return VolumeUnit.ofUcum(ucum.isEmpty() ? VolumeUnit.LITRE.ucum() : ucum)
                .orElseThrow(() -> new FieldFaultsException("volumeUnit", "choose L, m\u00b3 or US gal"));
    }

    private void show(
            Context ctx,
            int status,
            PointStatus point,
            Form form,
            @Nullable Result result,
            @Nullable RecordView record) {
        ZoneId zone = PageMaker.zone(ctx);
        pages.show(
                ctx,
                status,
                "dose",
                "water",
                new DoseView(
                        point.point().code(),
                        point.point().name(),
                        waterNow(point, zone),
                        waterAt(point),
                        form,
                        result,
                        record),
                "");
    }

    private static DoseWish wish(Context ctx, PointStatus point) {
        FieldFaults faults = new FieldFaults();
        Double volume = Forms.number(ctx, "volume", faults);
        DoseWish wish = new DoseWish(
                point.point().code(),
                null,
                volume == null ? null : volumeUnit(ctx).toLitres(volume),
                new DoseWish.Target(Forms.number(ctx, "targetOmega", faults), null, null),
                new DoseWish.Agent(
                        null,
                        Forms.text(ctx, "hydration").isEmpty() ? null : Forms.text(ctx, "hydration"),
                        Forms.number(ctx, "assayPercent", faults)),
                new DoseWish.Bounds(
                        Forms.number(ctx, "phTotalMax", faults),
                        Forms.number(ctx, "omegaAragoniteMax", faults),
                        Forms.number(ctx, "phPerHourMax", faults)),
                Forms.number(ctx, "stockGramsPerLitre", faults),
                null);
        faults.throwIfAny();
        return wish;
    }

    /** The form with the point's volume and the site's defaults; what is in the bag is for the person to say. */
    private Form blank(PointStatus point) {
        Optional<Limit> limit = point.watching().stream()
                .filter(l -> l.quantity() == Quantity.OMEGA_ARAGONITE)
                .findFirst();
        Double volumeL = point.point().volumeL();
        DoseDesk.Defaults defaults = doses.defaults();
        return Form.of(Map.of(
                "targetOmega",
                Words.plain(Math.round(
                                limit.map(l -> l.threshold() + ABOVE_LIMIT).orElse(TARGET_WITHOUT_LIMIT) * 100)
                        / 100.0),
                "volume",
                volumeL == null ? "" : Words.plain(volumeL),
                "volumeUnit",
                VolumeUnit.LITRE.ucum(),
                "assayPercent",
                "99",
                "stockGramsPerLitre",
                Words.plain(defaults.stockGramsPerLitre()),
                "phTotalMax",
                Words.plain(defaults.phTotalMax()),
                "omegaAragoniteMax",
                Words.plain(defaults.omegaAragoniteMax()),
                "phPerHourMax",
                Words.plain(defaults.phPerHourMax())));
    }

    private static String waterAt(PointStatus point) {
        WaterState state = point.newest();
        return state == null ? "" : state.at().toString();
    }

    private static String waterNow(PointStatus point, ZoneId zone) {
        return point.numbers()
                .map(n -> "\u03a9 " + Words.number(n.omegaAragonite(), 2) + " \u00b1"
                        + Words.number(n.omegaAragoniteUncertainty(), 2) + ", pH " + Words.number(n.phTotal(), 2)
                        + ", " + Words.withUnit(Quantity.TEMPERATURE, n.temperatureC()) + ", salinity "
                        + Words.number(n.salinity(), 1) + ", alkalinity "
                        + Words.withUnit(Quantity.TOTAL_ALKALINITY, n.totalAlkalinityUmolKg()) + ", "
                        + (point.newest() == null
                                ? ""
                                : Moment.of(point.newest().at(), point.now(), zone)
                                        .age()) + ".")
                .orElse("the water is not known well enough.");
    }

    private static Result result(DosePlan plan, DoseWish wish, DoseAmounts amounts) {
        Amount mass = plan.massG();
        return new Result(
                Outcome.valueOf(plan.outcome().name()),
                sentence(plan, wish, amounts),
                mass == null ? "" : amounts.mass(mass.value()),
                mass == null ? "" : amounts.mass(mass.low()),
                mass == null ? "" : amounts.mass(mass.high()),
                plan.steps().stream().map(step -> step(step, amounts)).toList(),
                waters(plan),
                plan.remedies().stream()
                        .filter(remedy -> remedy.reaches() != null)
                        .map(Remedy::detail)
                        .toList(),
                plan.cautions().stream().map(caution -> caution.detail()).toList(),
                plan.reasons().stream()
                        .map(reason -> new DoseView.Reason(why(reason.detail()), reason.lift()))
                        .toList());
    }

    private static String sentence(DosePlan plan, DoseWish wish, DoseAmounts amounts) {
        DoseWish.Agent agent = wish.agent();
        Double volumeL = wish.volumeL();
        Amount mass = plan.massG();
        CarbonateState after = plan.after();
        return switch (plan.outcome()) {
            case NOT_NEEDED -> "No dose is needed.";
            case REFUSED -> "No dose can be suggested.";
            case PLAN ->
                mass == null || after == null
                        ? ""
                        : (plan.remedies().stream().anyMatch(Remedy::reachesTarget)
                                        ? "First what needs no chemical, below. If that cannot be: "
                                        : "")
                                + amounts.mass(mass.value()) + " of " + (agent == null ? "" : agent.hydration())
                                + " sodium carbonate in "
                                + (plan.steps().size() == 1
                                        ? "one step"
                                        : plan.steps().size() + " steps")
                                + " would bring \u03a9 to " + Words.number(after.omegaAragonite(), 2)
                                + (volumeL == null ? "" : " in " + amounts.volume(volumeL)) + ".";
        };
    }

    /** Without the name a program knows it by, as a sentence with its full stop. */
    private static String why(String detail) {
        String words = Words.sentence(detail.replaceFirst("^[a-zA-Z0-9]+ is missing: ", ""));
        return words.endsWith(".") ? words : words + ".";
    }

    private static Step step(DoseStep step, DoseAmounts amounts) {
        Double stock = step.stockMl();
        return new Step(
                step.atMinutes() == 0 ? "At once" : "After " + Moment.span(Duration.ofMinutes(step.atMinutes())),
                amounts.mass(step.massG()),
                stock == null ? "" : Words.number(stock, 0) + "\u00a0mL",
                Words.number(step.phTotal(), 2),
                Words.number(step.omegaAragonite(), 2));
    }

    private static List<WaterLine> waters(DosePlan plan) {
        CarbonateState before = plan.before();
        CarbonateState after = plan.after();
        CarbonateState aerated = plan.afterAeration();
        if (before == null) {
            return List.of();
        }
        List<WaterLine> lines = new ArrayList<>();
        lines.add(line("\u03a9 aragonite", 2, before.omegaAragonite(), omega(after), omega(aerated)));
        lines.add(line(
                "pH, total scale",
                2,
                before.phTotal(),
                after == null ? null : after.phTotal(),
                aerated == null ? null : aerated.phTotal()));
        lines.add(line(
                "pCO\u2082, \u00b5atm",
                0,
                before.pco2Atm() * 1e6,
                after == null ? null : after.pco2Atm() * 1e6,
                aerated == null ? null : aerated.pco2Atm() * 1e6));
        lines.add(line(
                "total alkalinity, \u00b5mol/kg",
                0,
                before.totalAlkalinity() * 1e6,
                after == null ? null : after.totalAlkalinity() * 1e6,
                aerated == null ? null : aerated.totalAlkalinity() * 1e6));
        return lines;
    }

    private static @Nullable Double omega(@Nullable CarbonateState state) {
        return state == null ? null : state.omegaAragonite();
    }

    private static WaterLine line(
            String name, int digits, double before, @Nullable Double after, @Nullable Double aerated) {
        return new WaterLine(
                name,
                Words.number(before, digits),
                after == null ? "" : Words.number(after, digits),
                aerated == null ? "" : Words.number(aerated, digits));
    }
}
