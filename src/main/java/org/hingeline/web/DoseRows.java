package org.hingeline.web;

import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.DoseOutcome;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Standing;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.VolumeUnit;
import org.hingeline.monitor.DoseHistory;
import org.hingeline.monitor.DoseRecords;
import org.hingeline.monitor.PointStatus;
import org.hingeline.monitor.Role;
import org.hingeline.web.view.DoseRow;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.Moment;
import org.jspecify.annotations.Nullable;

/** The doses of a tank as its page lists them, with what this person may do about each. */
final class DoseRows {
    private static final Duration LISTED = Duration.ofDays(7);
    private static final DoseAmounts AMOUNTS = new DoseAmounts(VolumeUnit.LITRE);

    private final DoseHistory history;

    DoseRows(DoseHistory history) {
        this.history = history;
    }

    List<DoseRow> of(Context ctx, PointStatus point) {
        Visit visit = Visit.of(ctx);
        ZoneId zone = PageMaker.zone(ctx);
        Instant now = point.now();
        return history.of(point.point(), now.minus(LISTED), now).stream()
                .map(entry -> row(entry, visit, now, zone))
                .toList();
    }

    /** What the doses say of the tank's volume, in a sentence; empty when they say nothing. */
    String volume(Point point) {
        return history.volume(point)
                .map(volume -> "Of the last " + volume.doses() + " doses that could be judged several came out short: "
                        + point.name() + " seems to hold " + AMOUNTS.volume(volume.volumeL()) + ", between "
                        + AMOUNTS.volume(volume.lowL()) + " and " + AMOUNTS.volume(volume.highL())
                        + ". Measure it before the volume is changed: weak chemical or poor mixing looks the same.")
                .orElse("");
    }

    private static DoseRow row(DoseHistory.Entry entry, Visit visit, Instant now, ZoneId zone) {
        Dose dose = entry.dose();
        DoseOutcome outcome = entry.outcome();
        boolean operator = visit.role().atLeast(Role.OPERATOR);
        boolean theirs = dose.by().equals(visit.caller().name());
        return new DoseRow(
                String.valueOf(dose.id()),
                Moment.of(dose.at(), now, zone),
                AMOUNTS.mass(dose.given().massG()),
                Words.sentence(what(dose.given())) + ", lot " + dose.given().lot(),
                who(dose),
                standing(dose, now, zone),
                !dose.counts(),
                dose.counts() ? foretold(dose.foretold()) : "",
                outcome == null ? "" : outcome.detail(),
                operator ? undo(dose, theirs || visit.role() == Role.MANAGER, now, zone) : "",
                operator && !theirs && dose.standing() == Standing.PENDING,
                operator && dose.standing() == Standing.RECORDED ? correction(dose) : null);
    }

    /** "anhydrous sodium carbonate, 99 %". */
    static String what(Dose.Given given) {
        return what(given.agent(), given.hydration(), Words.plain(given.assayPercent()));
    }

    static String what(String agent, String hydration, String assayPercent) {
        String words = Agent.ofCode(agent).map(Agent::words).orElse(agent);
        return hydration + " " + words + (assayPercent.isEmpty() ? "" : ", " + assayPercent + "\u00a0%");
    }

    private static String who(Dose dose) {
        Dose.Signed confirmed = dose.confirmed();
        return "Recorded by " + dose.by() + (confirmed == null ? "" : ", confirmed by " + confirmed.by())
                + (dose.followedPlan() ? ", after a plan" : "") + "."
                + (dose.given().note().isEmpty() ? "" : " \u201c" + dose.given().note() + "\u201d");
    }

    private static String standing(Dose dose, Instant now, ZoneId zone) {
        Dose.Signed undone = dose.undone();
        return switch (dose.standing()) {
            case PENDING -> "waits for a second person; put nothing in yet";
            case UNDONE ->
                undone == null
                        ? ""
                        : "undone by " + undone.by() + ", "
                                + Moment.of(undone.at(), now, zone).clock();
            case CORRECTED -> "corrected by another entry";
            case RECORDED -> dose.corrects() == null ? "" : "takes the place of an entry that was wrong";
        };
    }

    private static String foretold(Dose.@Nullable Foretold foretold) {
        if (foretold == null) {
            return "";
        }
        return "Foretold: pH " + Words.number(foretold.before().phTotal(), 2) + " to "
                + Words.number(foretold.after().phTotal(), 2) + " (change \u00b1"
                + Words.number(foretold.phChangeUncertainty(), 3) + "), \u03a9 "
                + Words.number(foretold.before().omegaAragonite(), 2) + " to "
                + Words.number(foretold.after().omegaAragonite(), 2) + " (change \u00b1"
                + Words.number(foretold.omegaChangeUncertainty(), 3) + "), mixed after "
                + Moment.span(Duration.ofMinutes(foretold.mixingMin())) + ".";
    }

    private static String undo(Dose dose, boolean may, Instant now, ZoneId zone) {
        Instant until = DoseRecords.undoUntil(dose);
        if (!may || !dose.counts()) {
            return "";
        }
        if (dose.standing() == Standing.PENDING) {
            return "nothing was put in";
        }
        return now.isAfter(until) ? "" : "until " + Moment.of(until, now, zone).clock();
    }

    /** As it was recorded, under a key of its own. */
    private static Form correction(Dose dose) {
        Dose.Given given = dose.given();
        Map<String, String> values = new LinkedHashMap<>();
        values.put("key", UUID.randomUUID().toString());
        values.put("agent", given.agent());
        values.put("hydration", given.hydration());
        values.put("assayPercent", Words.plain(given.assayPercent()));
        Dose.Foretold foretold = dose.foretold();
        values.put("volumeL", foretold == null ? "" : Words.plain(foretold.volumeL()));
        values.put("followedPlan", dose.followedPlan() ? "true" : "");
        values.put("massG", Words.plain(given.massG()));
        values.put("lot", given.lot());
        return Form.of(values);
    }
}
