package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.util.LinkedHashMap;
import java.util.Map;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.StateWishes;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.monitor.WaterCalculator;
import org.hingeline.monitor.WaterState;
import org.hingeline.monitor.WaterWish;
import org.hingeline.web.view.CalculatorView;
import org.hingeline.web.view.CalculatorView.Source;
import org.hingeline.web.view.CalculatorView.Worked;
import org.hingeline.web.view.Form;
import org.jspecify.annotations.Nullable;

/**
 * The calculator. Stores nothing: all that was typed stands in the address, so that a result can be kept and passed on.
 * With {@code ?point=CODE} it takes up the water state of a point, with {@code &at=} one of the past.
 */
final class CalculatorPages {
    /** Whoever sends the form sends this field, filled in or not. */
    private static final String ALWAYS_SENT = "temp";

    private static final int LONGEST_FIELD = 60;

    private final StatusBoard board;
    private final StateWishes states;
    private final WaterCalculator calculator;
    private final PageMaker pages;

    CalculatorPages(StatusBoard board, StateWishes states, WaterCalculator calculator, PageMaker pages) {
        this.board = board;
        this.states = states;
        this.calculator = calculator;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/calculator", this::show, Gate.VIEWER);
    }

    private void show(Context ctx) {
        Map<String, String> typed = typed(ctx);
        boolean sent = typed.containsKey(ALWAYS_SENT);
        String point = ctx.queryParam("point");
        CalculatorSource source = point == null || point.isBlank() ? null : source(ctx, point);
        Map<String, String> values = new LinkedHashMap<>();
        values.put("constants", states.rules().constants().wireName());
        values.put("boron", states.rules().boron().wireName());
        if (source != null) {
            values.putAll(source.form());
        }
        values.putAll(typed);
        CalculatorForm form = new CalculatorForm(values);
        if (!sent && (source == null || !source.complete())) {
            answer(ctx, 200, Form.of(form.shown()), shown(ctx, source, null, null), null);
            return;
        }
        CalculatedWater water = null;
        FieldFaultsException refusal = null;
        WaterWish wish = form.wish();
        try {
            water = calculator.calculate(wish, true);
        } catch (FieldFaultsException e) {
            refusal = e;
        }
        Map<String, String> errors = form.errors(refusal);
        Double omega = water == null ? null : (Double) water.state().omegaAragonite();
        Source shown = shown(ctx, source, sent ? typed : null, omega);
        if (water == null || !errors.isEmpty()) {
            answer(ctx, sent ? 422 : 200, new Form(form.shown(), errors), shown, null);
        } else {
            answer(ctx, 200, Form.of(form.shown()), shown, CalculatorResult.of(form, water));
        }
    }

    private static @Nullable Source shown(
            Context ctx,
            @Nullable CalculatorSource source,
            @Nullable Map<String, String> typed,
            @Nullable Double omega) {
        return source == null ? null : source.shown(typed, omega, PageMaker.zone(ctx));
    }

    private void answer(Context ctx, int status, Form form, @Nullable Source source, @Nullable Worked worked) {
        pages.show(ctx, status, "calculator", "calculator", new CalculatorView(form, source, worked), "");
    }

    /** The fields sent, each once. */
    static Map<String, String> typed(Context ctx) {
        Map<String, String> typed = new LinkedHashMap<>();
        ctx.queryParamMap().forEach((field, values) -> {
            if (!values.isEmpty()) {
                String value = values.get(0);
                typed.put(field, value.length() > LONGEST_FIELD ? value.substring(0, LONGEST_FIELD) : value);
            }
        });
        return typed;
    }

    private CalculatorSource source(Context ctx, String code) {
        PointStatus point = board.point(Visit.of(ctx).site(), code)
                .orElseThrow(() ->
                        new ProblemException(404, "No such point", "point \"" + code + "\" is not known at this site"));
        WaterState newest = point.newest();
        WaterState state = ctx.queryParam("at") == null
                ? newest
                : board.stateAt(point.point(), Times.query(ctx, "at", point.now()))
                        .orElse(null);
        if (state == null) {
            throw new ProblemException(
                    404,
                    "No such water state",
                    "no water was known at " + point.point().name() + " then");
        }
        return new CalculatorSource(point, state, states.of(state), states.orphans(state));
    }
}
