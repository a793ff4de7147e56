package org.hingeline.web;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.dosing.Addition;
import org.hingeline.dosing.AmmoniaShift;
import org.hingeline.dosing.Amount;
import org.hingeline.dosing.DosePlan;
import org.hingeline.dosing.DoseStep;
import org.hingeline.dosing.PlannedProduct;
import org.hingeline.dosing.Remedy;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.StateUncertainty;
import org.jspecify.annotations.Nullable;

/** A dose plan on the wire. */
final class DosePlanJson {
    private DosePlanJson() {}

    static Map<String, @Nullable Object> of(DosePlan plan) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("outcome", plan.outcome().wireName());
        json.put("reasons", plan.reasons());
        product(json, plan.products(), 0);
        json.put("omegaAragoniteGain", plan.omegaAragoniteGain());
        json.put("steps", plan.steps().stream().map(DosePlanJson::step).toList());
        Map<String, @Nullable Object> second = null;
        if (plan.products().size() > 1) {
            second = new LinkedHashMap<>();
            second.put("agent", plan.products().get(1).product().agent().code());
            product(second, plan.products(), 1);
        }
        json.put("second", second);
        json.put("before", state(plan.before()));
        json.put("after", state(plan.after()));
        json.put("afterAeration", state(plan.afterAeration()));
        json.put("ammonia", ammonia(plan.ammonia()));
        json.put("remedies", plan.remedies().stream().map(DosePlanJson::remedy).toList());
        json.put("cautions", plan.cautions());
        return json;
    }

    /** What to weigh or inject of a product; nothing of it unless there is a plan. */
    private static void product(Map<String, @Nullable Object> json, List<PlannedProduct> products, int index) {
        PlannedProduct product = products.isEmpty() ? null : products.get(index);
        Amount mass = product == null ? null : product.massG();
        json.put("massG", mass == null ? null : mass.value());
        json.put("massLowG", mass == null ? null : mass.low());
        json.put("massHighG", mass == null ? null : mass.high());
        Amount perHour = product == null ? null : product.gramsPerHour();
        json.put("gramsPerHour", perHour == null ? null : perHour.value());
        json.put("gramsPerHourLow", perHour == null ? null : perHour.low());
        json.put("gramsPerHourHigh", perHour == null ? null : perHour.high());
        json.put("stockMlPerMinute", product == null ? null : product.stockMlPerMinute());
        json.put("stock", product == null ? null : product.stock());
    }

    private static void addition(Map<String, @Nullable Object> json, Addition addition) {
        json.put("massG", addition.massG());
        json.put("stockMl", addition.stockMl());
        json.put("gramsPerHour", addition.gramsPerHour());
        json.put("stockMlPerMinute", addition.stockMlPerMinute());
    }

    private static @Nullable Map<String, Object> ammonia(@Nullable AmmoniaShift shift) {
        return shift == null
                ? null
                : Map.of(
                        "totalMgL", shift.totalMgL(),
                        "unionisedBeforeMgL", shift.unionisedBeforeMgL(),
                        "unionisedAfterMgL", shift.unionisedAfterMgL(),
                        "chronicCriterionMgL", AmmoniaShift.CHRONIC_MG_L,
                        "acuteCriterionMgL", AmmoniaShift.ACUTE_MG_L);
    }

    private static Map<String, @Nullable Object> remedy(Remedy remedy) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("code", remedy.code());
        json.put("detail", remedy.detail());
        json.put("needs", remedy.needs());
        json.put("fromPoint", remedy.fromPoint());
        json.put("massShare", remedy.massShare());
        json.put("reachesTarget", remedy.reachesTarget());
        json.put("whyNot", remedy.whyNot());
        json.put("reaches", state(remedy.reaches()));
        StateUncertainty u = remedy.uncertainty();
        json.put(
                "standardUncertainty",
                u == null
                        ? null
                        : Map.of(
                                "omegaAragonite", u.omegaAragonite().total(),
                                "phTotal", u.phTotal().total(),
                                "pco2Uatm", u.pco2Atm().total() * 1e6));
        return json;
    }

    private static Map<String, @Nullable Object> step(DoseStep step) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("atMinutes", step.atMinutes());
        addition(json, step.additions().get(0));
        Map<String, @Nullable Object> second = null;
        if (step.additions().size() > 1) {
            second = new LinkedHashMap<>();
            addition(second, step.additions().get(1));
        }
        json.put("second", second);
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
