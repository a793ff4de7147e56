package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.Duration;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Semaphore;
import java.util.regex.Pattern;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.monitor.WaterCalculator;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.TrisStandard;
import org.hingeline.web.Problem.FieldError;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JsonGenerator;

/** {@code /api/v1/seawater}: computes waters out of their numbers, stores nothing. */
final class SeawaterRoutes {
    private static final Pattern NUMBER = Pattern.compile("[+-]?\\d{1,30}(\\.\\d{1,30})?([eE][+-]?\\d{1,3})?");

    private static final int MOST_BODIES = 8;
    private static final long MOST_THAT_PASSES = 32L * 1024 * 1024;

    private final WaterCalculator calculator;
    private final Meters meters;

    /** A long list with everything asked for needs some tens of MB while it is worked on. */
    private final Turns lists = new Turns(2, 6, Duration.ofSeconds(10));

    /** Lists held in memory while they arrive and wait. */
    private final Semaphore bodies = new Semaphore(MOST_BODIES);

    SeawaterRoutes(WaterCalculator calculator, Meters meters) {
        this.calculator = calculator;
        this.meters = meters;
    }

    void addTo(RoutesConfig routes) {
        routes.post("/api/v1/seawater/state", this::state, Gate.VIEWER);
        routes.post("/api/v1/seawater/states", this::states, Gate.VIEWER);
        routes.get("/api/v1/seawater/tris", SeawaterRoutes::tris, Gate.VIEWER);
    }

    private void state(Context ctx) {
        WaterJson.Water asked = WaterJson.one(Json.bytes(ctx));
        CalculatedWater water = calculator.calculate(asked.wish(), asked.withUncertainty());
        ByteArrayOutputStream out = new ByteArrayOutputStream(4096);
        try (JsonGenerator json = Json.MAPPER.createGenerator(out)) {
            new StateJson(json).whole(water);
        }
        ctx.contentType("application/json").result(out.toByteArray());
    }

    private void states(Context ctx) {
        if (!bodies.tryAcquire()) {
            letTheBodyPass(ctx);
            throw busy();
        }
        try {
            states(ctx, Json.bytes(ctx));
        } finally {
            bodies.release();
        }
    }

    /** A place is taken only when the whole body is there: a slow line holds up nobody else. */
    private void states(Context ctx, byte[] body) {
        boolean answered = lists.run(() -> {
            long began = System.nanoTime();
            WaterJson.Waters asked = WaterJson.list(body);
            long parseNs = System.nanoTime() - began;
            StatesAnswer answer = new StatesAnswer(calculator, asked.withUncertainty());
            answer.send(asked.each(), ctx);
            meters.states(asked.each().size(), parseNs, answer.computeNs(), answer.writeNs());
        });
        if (!answered) {
            throw busy();
        }
    }

    private static ProblemException busy() {
        return new ProblemException(503, "Busy", "other lists are being worked on; send it again in a few seconds");
    }

    /** Many clients hear an answer only after they have sent all. */
    private static void letTheBodyPass(Context ctx) {
        try {
            ctx.bodyInputStream().skip(MOST_THAT_PASSES);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static void tris(Context ctx) {
        double temperatureC = number(ctx, "temperatureC", "-2 to 45 °C");
        double salinity = number(ctx, "salinity", "0 to 50");
        Figure ph = TrisStandard.ph(temperatureC, salinity);
        if (!(ph instanceof Figure.Known known)) {
            String detail = ((Figure.Refused) ph).detail();
            throw wrong(detail.startsWith("salinity") ? "salinity" : "temperatureC", detail);
        }
        Map<String, Object> json = new LinkedHashMap<>();
        json.put("temperatureC", temperatureC);
        json.put("salinity", salinity);
        json.put("phTotal", Rounding.to(known.value(), 6));
        json.put("cautions", known.cautions());
        json.put("method", "pH of the tris standard in synthetic seawater, total scale: DelValls & Dickson 1998");
        Json.answer(ctx, 200, json);
    }

    private static double number(Context ctx, String name, String accepted) {
        @Nullable String text = ctx.queryParam(name);
        if (text == null || text.isBlank()) {
            throw wrong(name, name + " is missing; " + accepted + " is accepted");
        }
        if (!NUMBER.matcher(text).matches()) {
            throw wrong(name, name + " " + JsonFaults.quoted(text) + " must be a number; " + accepted + " is accepted");
        }
        return Double.parseDouble(text);
    }

    private static ProblemException wrong(String name, String detail) {
        return new ProblemException(
                Problem.ofFields(400, "Wrong query", detail, List.of(new FieldError("/query/" + name, detail))));
    }
}
