package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.dosing.Amount;
import org.hingeline.dosing.DosePlan;
import org.hingeline.dosing.DoseStep;
import org.hingeline.monitor.DoseDesk;
import org.hingeline.monitor.DoseWish;
import org.hingeline.seawater.CarbonateState;
import org.jspecify.annotations.Nullable;

/** {@code POST /api/v1/dose-plans}: suggests, stores nothing. */
final class DoseRoutes {
    private final DoseDesk doses;

    DoseRoutes(DoseDesk doses) {
        this.doses = doses;
    }

    void addTo(RoutesConfig routes) {
        routes.post("/api/v1/dose-plans", this::plan, Gate.VIEWER);
    }

    private void plan(Context ctx) {
        DoseWish wish = Json.body(ctx, DoseWish.class);
        Json.answer(ctx, 200, json(doses.plan(Visit.of(ctx).site(), wish)));
    }

    private static Map<String, @Nullable Object> json(DosePlan plan) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("outcome", plan.outcome().wireName());
        json.put("reasons", plan.reasons());
        Amount mass = plan.massG();
        json.put("massG", mass == null ? null : mass.value());
        json.put("massLowG", mass == null ? null : mass.low());
        json.put("massHighG", mass == null ? null : mass.high());
        json.put("omegaAragoniteGain", plan.omegaAragoniteGain());
        json.put("steps", plan.steps().stream().map(DoseRoutes::step).toList());
        json.put("stock", plan.stock());
        json.put("before", state(plan.before()));
        json.put("after", state(plan.after()));
        json.put("afterAeration", state(plan.afterAeration()));
        List<Map<String, @Nullable Object>> remedies = new ArrayList<>();
        plan.remedies().forEach(remedy -> {
            Map<String, @Nullable Object> each = new LinkedHashMap<>();
            each.put("code", remedy.code());
            each.put("detail", remedy.detail());
            each.put("reachesTarget", remedy.reachesTarget());
            each.put("reaches", state(remedy.reaches()));
            remedies.add(each);
        });
        json.put("remedies", remedies);
        json.put("cautions", plan.cautions());
        return json;
    }

    private static Map<String, @Nullable Object> step(DoseStep step) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("atMinutes", step.atMinutes());
        json.put("massG", step.massG());
        json.put("stockMl", step.stockMl());
        json.put("phTotal", step.phTotal());
        json.put("omegaAragonite", step.omegaAragonite());
        return json;
    }

    private static @Nullable Map<String, Object> state(@Nullable CarbonateState state) {
        if (state == null) {
            return null;
        }
        Map<String, Object> json = new LinkedHashMap<>();
        json.put("temperatureC", state.conditions().temperatureC());
        json.put("salinity", state.conditions().salinity());
        json.put("phTotal", state.phTotal());
        json.put("totalAlkalinityUmolKg", state.totalAlkalinity() * 1e6);
        json.put("dicUmolKg", state.dic() * 1e6);
        json.put("pco2Uatm", state.pco2Atm() * 1e6);
        json.put("fco2Uatm", state.fco2Atm() * 1e6);
        json.put("co2UmolKg", state.co2() * 1e6);
        json.put("bicarbonateUmolKg", state.bicarbonate() * 1e6);
        json.put("carbonateUmolKg", state.carbonate() * 1e6);
        json.put("omegaAragonite", state.omegaAragonite());
        json.put("omegaCalcite", state.omegaCalcite());
        json.put("densityKgM3", state.densityKgM3());
        json.put("cautions", state.cautions());
        return json;
    }
}
