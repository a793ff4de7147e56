package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.LimitDesk;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.hingeline.quality.Flag;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.LimitRow;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.PointView;
import org.hingeline.web.view.PointView.InputLine;
import org.hingeline.web.view.PointView.StateLine;
import org.jspecify.annotations.Nullable;

/** The page of one point: its water, where it came from, its course, its limits. */
final class PointPages {
    private static final Duration COURSE = Duration.ofHours(48);

    private final StatusBoard board;
    private final LimitDesk limits;
    private final DoseRows doses;
    private final PageMaker pages;

    PointPages(StatusBoard board, LimitDesk limits, DoseRows doses, PageMaker pages) {
        this.board = board;
        this.limits = limits;
        this.doses = doses;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/points/{code}", this::show, Gate.VIEWER);
        routes.post("/points/{code}/limits", this::add, Gate.OPERATOR);
        routes.post("/points/{code}/limits/{name}", this::change, Gate.OPERATOR);
        routes.post("/points/{code}/limits/{name}/removal", this::remove, Gate.OPERATOR);
    }

    private void show(Context ctx) {
        Flash flash = Flash.take(ctx);
        page(ctx, 200, PointRoutes.found(board, ctx), flash, Form.empty(), "");
    }

    /** @param refusedLimit name of the limit whose form is shown again; empty for the form that adds one */
    private void page(Context ctx, int status, PointStatus point, Flash flash, Form refused, String refusedLimit) {
        ZoneId zone = PageMaker.zone(ctx);
        WaterState state = point.newest();
        Optional<WaterState> lowest = lowest(point);
        PointView view = new PointView(
                PathPoints.of(point, zone),
                point.numbers().map(PointPages::lines).orElse(List.of()),
                state == null ? List.of() : inputs(point, state, zone),
                List.of(),
                lowest.map(l -> words(l, point, zone)).orElse(""),
                lowest.map(l -> l.at().toString()).orElse(""),
                point.limits().stream()
                        .map(limit -> row(limit, limit.name().equals(refusedLimit) ? refused : Form.of(values(limit))))
                        .toList(),
                refusedLimit.isEmpty() ? refused : Form.empty(),
                flash.undo(),
                doses.of(ctx, point),
                doses.volume(point.point()));
        pages.show(ctx, status, "point", "water", view, flash.notice());
    }

    private void add(Context ctx) {
        String name = Optional.ofNullable(ctx.formParam("name")).orElse("").strip();
        save(ctx, name, "");
    }

    private void change(Context ctx) {
        save(ctx, ctx.pathParam("name"), ctx.pathParam("name"));
    }

    private void save(Context ctx, String name, String shownIn) {
        PointStatus point = PointRoutes.found(board, ctx);
        Optional<Limit> before = point.limits().stream()
                .filter(limit -> limit.name().equals(name))
                .findFirst();
        try {
            if (shownIn.isEmpty() && before.isPresent()) {
                throw new FieldFaultsException("name", "there is a limit \"" + name + "\" already; change that one");
            }
            limits.save(point.point(), name, wish(ctx), Visit.of(ctx).caller().name());
        } catch (FieldFaultsException e) {
            page(ctx, 422, point, Flash.NONE, Forms.refused(ctx, e), shownIn);
            return;
        }
        Flash.Undone undone = before.map(
                        limit -> new Flash.Undone("Limit \u201c" + name + "\u201d was changed.", name, values(limit)))
                .orElse(null);
        new Flash("Limit \u201c" + name + "\u201d saved.", undone).leave(ctx);
        ctx.redirect(pages.link(ctx, "/points/" + point.point().code() + "#limits"));
    }

    private void remove(Context ctx) {
        PointStatus point = PointRoutes.found(board, ctx);
        String name = ctx.pathParam("name");
        Optional<Limit> before = point.limits().stream()
                .filter(limit -> limit.name().equals(name))
                .findFirst();
        if (before.isPresent()
                && limits.retire(point.point(), name, Visit.of(ctx).caller().name())) {
            String sentence = "Limit \u201c" + name + "\u201d was removed.";
            new Flash(sentence, new Flash.Undone(sentence, name, values(before.get()))).leave(ctx);
        }
        ctx.redirect(pages.link(ctx, "/points/" + point.point().code() + "#limits"));
    }

    /** A form as it was sent, with what is wrong with it; what is not a number is told like any other fault. */
    private static LimitDesk.Wish wish(Context ctx) {
        FieldFaults faults = new FieldFaults();
        LimitDesk.Wish wish = new LimitDesk.Wish(
                text(ctx, "quantity"),
                Forms.number(ctx, "below", faults),
                Forms.number(ctx, "above", faults),
                Forms.number(ctx, "deadband", faults),
                Forms.number(ctx, "onDelayMin", faults),
                Forms.number(ctx, "offDelayMin", faults),
                text(ctx, "priority"),
                text(ctx, "action"));
        faults.throwIfAny();
        return wish;
    }

    private static @Nullable String text(Context ctx, String field) {
        String text = ctx.formParam(field);
        return text == null || text.isBlank() ? null : text.strip();
    }

    private static Map<String, String> values(Limit limit) {
        Map<String, String> values = new LinkedHashMap<>();
        values.put("name", limit.name());
        values.put("quantity", limit.quantity().code());
        values.put("below", limit.side() == Side.BELOW ? Words.plain(limit.threshold()) : "");
        values.put("above", limit.side() == Side.ABOVE ? Words.plain(limit.threshold()) : "");
        values.put("deadband", Words.plain(limit.deadband()));
        values.put("onDelayMin", Words.plain(limit.onDelay().toSeconds() / 60.0));
        values.put("offDelayMin", Words.plain(limit.offDelay().toSeconds() / 60.0));
        values.put("priority", limit.priority().code());
        values.put("action", limit.action());
        return values;
    }

    private static LimitRow row(Limit limit, Form form) {
        return new LimitRow(
                limit.name(),
                Words.rule(limit),
                limit.priority().code(),
                limit.action(),
                limit.quantity().code(),
                limit.side() == Side.BELOW ? Words.plain(limit.threshold()) : "",
                limit.side() == Side.ABOVE ? Words.plain(limit.threshold()) : "",
                form);
    }

    private static List<StateLine> lines(WaterNumbers n) {
        List<StateLine> lines = new ArrayList<>();
        lines.add(new StateLine(
                "\u03a9 aragonite",
                Words.number(n.omegaAragonite(), 2),
                Words.number(n.omegaAragoniteUncertainty(), 2),
                ""));
        lines.add(new StateLine("\u03a9 calcite", Words.number(n.omegaCalcite(), 2), "", ""));
        lines.add(new StateLine(
                "pH, total scale", Words.number(n.phTotal(), 3), Words.number(n.phTotalUncertainty(), 3), ""));
        lines.add(new StateLine("pCO\u2082", Words.number(n.pco2Uatm(), 0), "", "\u00b5atm"));
        lines.add(new StateLine("total alkalinity", Words.number(n.totalAlkalinityUmolKg(), 0), "", "\u00b5mol/kg"));
        lines.add(new StateLine("dissolved inorganic carbon", Words.number(n.dicUmolKg(), 0), "", "\u00b5mol/kg"));
        lines.add(new StateLine("carbonate", Words.number(n.carbonateUmolKg(), 0), "", "\u00b5mol/kg"));
        lines.add(new StateLine("temperature", Words.number(n.temperatureC(), 1), "", "\u00b0C"));
        lines.add(new StateLine("salinity", Words.number(n.salinity(), 1), "", ""));
        return lines;
    }

    private static List<InputLine> inputs(PointStatus point, WaterState state, ZoneId zone) {
        return state.inputs().stream()
                .map(input -> new InputLine(
                        input.quantity().words(),
                        Words.withUnit(input.quantity(), input.value()),
                        input.source(),
                        Moment.of(input.at(), point.now(), zone),
                        flag(input.flag())))
                .toList();
    }

    static String flag(Flag flag) {
        return switch (flag) {
            case PASS -> "passed the range test";
            case NOT_EVALUATED -> "not tested";
            case SUSPECT -> "suspect";
            case FAIL -> "failed";
            case MISSING -> "missing";
        };
    }

    private Optional<WaterState> lowest(PointStatus point) {
        return board.history(point.point(), point.now().minus(COURSE), point.now(), Duration.ofMinutes(2)).stream()
                .filter(state -> state.numbers() != null)
                .min(Comparator.comparingDouble(
                        state -> Objects.requireNonNull(state.numbers()).omegaAragonite()));
    }

    private static String words(WaterState lowest, PointStatus point, ZoneId zone) {
        return "Lowest \u03a9 in the last 48 h: "
                + Words.number(
                        Quantity.OMEGA_ARAGONITE,
                        Objects.requireNonNull(lowest.numbers()).omegaAragonite())
                + " at " + Moment.of(lowest.at(), point.now(), zone).clock() + ".";
    }
}
