package org.hingeline.web;

import java.util.LinkedHashMap;
import java.util.Map;
import org.hingeline.dosing.DoseOutcome;
import org.hingeline.hatchery.Dose;
import org.hingeline.monitor.DoseHistory;
import org.hingeline.monitor.DoseRecords;
import org.jspecify.annotations.Nullable;

/** A dose on the wire. */
final class DoseJson {
    private DoseJson() {}

    static Map<String, @Nullable Object> of(DoseHistory.Entry entry, String point) {
        Dose dose = entry.dose();
        Dose.Given given = dose.given();
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("id", dose.id());
        json.put("key", dose.key());
        json.put("point", point);
        json.put("state", dose.standing().code());
        json.put("at", dose.at());
        json.put("recordedAt", dose.recordedAt());
        json.put("by", dose.by());
        Map<String, Object> agent = new LinkedHashMap<>();
        agent.put("code", given.agent());
        agent.put("hydration", given.hydration());
        agent.put("assayPercent", given.assayPercent());
        json.put("agent", agent);
        json.put("massG", given.massG());
        json.put("lot", given.lot());
        json.put("note", given.note());
        json.put("followedPlan", dose.followedPlan());
        json.put("corrects", dose.corrects());
        json.put("correctedBy", dose.correctedBy());
        json.put("secondPerson", dose.secondPerson());
        json.put("confirmed", signed(dose.confirmed()));
        json.put("undone", signed(dose.undone()));
        json.put("undoUntil", DoseRecords.undoUntil(dose));
        json.put("foretold", foretold(dose.foretold()));
        json.put("outcome", outcome(entry.outcome()));
        return json;
    }

    private static @Nullable Map<String, Object> signed(Dose.@Nullable Signed signed) {
        if (signed == null) {
            return null;
        }
        Map<String, Object> json = new LinkedHashMap<>();
        json.put("by", signed.by());
        json.put("at", signed.at());
        return json;
    }

    private static @Nullable Map<String, Object> foretold(Dose.@Nullable Foretold foretold) {
        if (foretold == null) {
            return null;
        }
        Map<String, Object> json = new LinkedHashMap<>();
        json.put("stateAt", foretold.stateAt());
        json.put("volumeL", foretold.volumeL());
        json.put("temperatureC", foretold.temperatureC());
        json.put("salinity", foretold.salinity());
        json.put("mixingMin", foretold.mixingMin());
        json.put("before", water(foretold.before()));
        json.put("after", water(foretold.after()));
        json.put("phChangeUncertainty", foretold.phChangeUncertainty());
        json.put("omegaChangeUncertainty", foretold.omegaChangeUncertainty());
        return json;
    }

    private static Map<String, Object> water(Dose.Water water) {
        Map<String, Object> json = new LinkedHashMap<>();
        json.put("phTotal", water.phTotal());
        json.put("omegaAragonite", water.omegaAragonite());
        json.put("totalAlkalinityUmolKg", water.totalAlkalinityUmolKg());
        json.put("dicUmolKg", water.dicUmolKg());
        return json;
    }

    private static @Nullable Map<String, @Nullable Object> outcome(@Nullable DoseOutcome outcome) {
        if (outcome == null) {
            return null;
        }
        Map<String, @Nullable Object> json = new LinkedHashMap<>();
        json.put("verdict", outcome.verdict().code());
        json.put("detail", outcome.detail());
        DoseOutcome.Seen seen = outcome.seen();
        if (seen == null) {
            json.put("seen", null);
            return json;
        }
        Map<String, Object> numbers = new LinkedHashMap<>();
        numbers.put("basis", seen.basis().code());
        numbers.put("states", seen.states());
        numbers.put("phTotal", seen.phTotal());
        numbers.put("omegaAragonite", seen.omegaAragonite());
        numbers.put("arrivedUmolKg", seen.arrivedAlkalinity() * 1e6);
        numbers.put("expectedUmolKg", seen.expectedAlkalinity() * 1e6);
        numbers.put("standardUncertaintyUmolKg", seen.standardUncertainty() * 1e6);
        json.put("seen", numbers);
        return json;
    }
}
