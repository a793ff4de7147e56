package org.hingeline.web;

import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Point;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.jspecify.annotations.Nullable;

/** The wire form of points, water states, limits and alerts. Maps keep the order of the contract. */
final class PointJson {
    private PointJson() {}

    static Map<String, @Nullable Object> point(PointStatus status) {
        Point point = status.point();
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("code", point.code());
        json.put("name", point.name());
        json.put("kind", point.kind().code());
        json.put("position", point.position());
        json.put("feedsFrom", point.feedsFrom());
        json.put("volumeL", point.volumeL());
        json.put("maxGapMin", point.maxGap().toSeconds() / 60.0);
        json.put("verdict", status.verdict().code());
        json.put("limits", status.limits().stream().map(PointJson::limit).toList());
        json.put(
                "openAlerts",
                status.openAlerts().stream().map(a -> alert(a, point)).toList());
        json.put(
                "batch",
                status.batch()
                        .map(b -> Map.of(
                                "code", b.code(),
                                "species", b.species(),
                                "spawnedAt", b.spawnedAt()))
                        .orElse(null));
        return json;
    }

    /** The state of now, with what was used and what was missing. */
    static Map<String, @Nullable Object> water(PointStatus status) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        WaterState state = status.newest();
        json.put("point", status.point().code());
        json.put("verdict", status.verdict().code());
        if (state == null) {
            json.put("at", null);
            json.put("inputs", List.of());
            json.put("missing", List.of());
            json.put("cautions", List.of());
            return json;
        }
        json.putAll(state(state));
        // ages are told as of now, not as of the state
        json.put("ageMinutes", minutes(state.at(), status.now()));
        json.put("inputs", inputs(state, status.now()));
        return json;
    }

    static Map<String, @Nullable Object> state(WaterState state) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("at", state.at());
        WaterNumbers n = state.numbers();
        if (n != null) {
            numbers(n, json);
        }
        json.put("inputs", inputs(state, state.at()));
        json.put("missing", missing(state));
        json.put("cautions", state.cautions());
        return json;
    }

    private static void numbers(WaterNumbers n, Map<String, @Nullable Object> json) {
        json.put("temperatureC", n.temperatureC());
        json.put("salinity", n.salinity());
        json.put("phTotal", n.phTotal());
        json.put("totalAlkalinityUmolKg", n.totalAlkalinityUmolKg());
        json.put("dicUmolKg", n.dicUmolKg());
        json.put("pco2Uatm", n.pco2Uatm());
        json.put("fco2Uatm", n.fco2Uatm());
        json.put("co2UmolKg", n.co2UmolKg());
        json.put("bicarbonateUmolKg", n.bicarbonateUmolKg());
        json.put("carbonateUmolKg", n.carbonateUmolKg());
        json.put("omegaAragonite", n.omegaAragonite());
        json.put("omegaCalcite", n.omegaCalcite());
        json.put("densityKgM3", n.densityKgM3());
        json.put(
                "standardUncertainty",
                Map.of(
                        "omegaAragonite",
                        Map.of(
                                "total", n.omegaAragoniteUncertainty(),
                                "fromConstants", n.omegaAragoniteFromConstants(),
                                "fromInputs", n.omegaAragoniteFromInputs()),
                        "phTotal",
                        Map.of("total", n.phTotalUncertainty())));
    }

    private static List<Map<String, @Nullable Object>> inputs(WaterState state, Instant asOf) {
        List<Map<String, @Nullable Object>> all = new ArrayList<>();
        state.inputs().forEach(input -> {
            Map<String, @Nullable Object> json = new LinkedHashMap<>();
            json.put("quantity", input.quantity().code());
            json.put("value", input.value());
            json.put("unit", input.quantity().unit().ucum());
            json.put("at", input.at());
            json.put("ageMinutes", minutes(input.at(), asOf));
            json.put("origin", input.origin());
            json.put("sensor", input.sensor());
            json.put("flag", input.flag().code());
            all.add(json);
        });
        return all;
    }

    private static List<Map<String, @Nullable Object>> missing(WaterState state) {
        List<Map<String, @Nullable Object>> all = new ArrayList<>();
        state.missing().forEach(missing -> {
            Map<String, @Nullable Object> json = new LinkedHashMap<>();
            json.put("quantity", missing.quantity().code());
            json.put("newestAt", missing.newestAt());
            json.put("allowedAgeMinutes", missing.allowedAge().toSeconds() / 60.0);
            all.add(json);
        });
        return all;
    }

    static Map<String, @Nullable Object> limit(Limit limit) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("name", limit.name());
        json.put("quantity", limit.quantity().code());
        json.put(limit.side() == Side.BELOW ? "below" : "above", limit.threshold());
        json.put("deadband", limit.deadband());
        json.put("onDelayMin", limit.onDelay().toSeconds() / 60.0);
        json.put("offDelayMin", limit.offDelay().toSeconds() / 60.0);
        json.put("priority", limit.priority().code());
        json.put("action", limit.action());
        return json;
    }

    static Map<String, @Nullable Object> alert(Alert alert, Point point) {
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("id", alert.id());
        json.put("point", point.code());
        json.put("limit", alert.limitName());
        json.put("quantity", alert.quantity().code());
        json.put(alert.side().code(), alert.threshold());
        json.put("state", alert.closedAt() == null ? alert.phase().code() : "closed");
        json.put("priority", alert.priority().code());
        json.put("action", alert.action());
        json.put("since", alert.since());
        json.put("raisedAt", alert.raisedAt());
        json.put("value", alert.value());
        json.put("uncertainty", alert.uncertainty());
        json.put("acknowledgedAt", alert.acknowledgedAt());
        json.put("acknowledgedBy", alert.acknowledgedBy());
        json.put("note", alert.acknowledgementNote());
        json.put("returnedAt", alert.returnedAt());
        json.put("closedAt", alert.closedAt());
        return json;
    }

    private static double minutes(Instant from, Instant to) {
        return Math.round((to.toEpochMilli() - from.toEpochMilli()) / 600.0) / 100.0;
    }
}
