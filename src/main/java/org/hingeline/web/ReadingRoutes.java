package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.util.List;
import org.hingeline.monitor.IncomingReading;
import org.hingeline.monitor.ReadingIntake;
import org.hingeline.monitor.ReadingIntake.Answer;

/** {@code POST /api/v1/readings}: what gateways send. */
final class ReadingRoutes {
    private final ReadingIntake intake;
    private final Meters meters;
    private final int mostRows;

    ReadingRoutes(ReadingIntake intake, Meters meters, int mostRows) {
        this.intake = intake;
        this.meters = meters;
        this.mostRows = mostRows;
    }

    void addTo(RoutesConfig routes) {
        routes.post("/api/v1/readings", this::post, Gate.GATEWAY);
    }

    private void post(Context ctx) {
        Json.requireType(ctx);
        List<IncomingReading> rows = ReadingsJson.parse(ctx.bodyAsBytes(), mostRows);
        if (rows.isEmpty()) {
            throw new ProblemException(422, "No readings", "readings is empty; at least one is needed");
        }
        Answer answer = intake.take(Visit.gateway(ctx), rows);
        meters.readings(answer);
        int refused = answer.refused().size();
        Json.answer(ctx, refused == 0 ? 200 : refused == rows.size() ? 422 : 207, answer);
    }
}
