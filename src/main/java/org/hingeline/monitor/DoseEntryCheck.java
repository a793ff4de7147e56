package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.format.DateTimeParseException;
import java.util.Objects;
import java.util.Optional;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.DoseEffect;
import org.hingeline.dosing.Product;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.jspecify.annotations.Nullable;

/** From what a person says was given to what can be recorded; every fault is told at once. */
final class DoseEntryCheck {
    /** How far back a dose may be recorded. */
    static final Duration OLDEST = Duration.ofDays(7);

    /** Two clocks that disagree by less than this do not make a dose of the future. */
    private static final Duration CLOCKS = Duration.ofMinutes(2);

    /** More alkalinity at once than any tank is meant to get, mol/kg: the mass is probably not in grams. */
    private static final double IMPLAUSIBLE = 5000e-6;

    /** Sea water, kg/m³, near enough to judge a slip of the pen by. */
    private static final double SEAWATER_KG_M3 = 1025;

    /** An entry that can be recorded. */
    record Sound(
            String key, Point point, Instant at, Dose.Given given, DoseEffect.@Nullable Given effect, boolean plan) {}

    private final FieldFaults faults = new FieldFaults();
    private final Instant now;

    private DoseEntryCheck(Instant now) {
        this.now = now;
    }

    /**
     * @param corrected the entry to be corrected, whose point and time hold where the new one names none; its mass may be 0
     * @throws FieldFaultsException when it cannot be recorded
     */
    static Sound check(Books books, Site site, DoseEntry entry, @Nullable Dose corrected, Instant now) {
        return new DoseEntryCheck(now).sound(books, site, entry, corrected);
    }

    private Sound sound(Books books, Site site, DoseEntry entry, @Nullable Dose corrected) {
        String key = key(entry.key());
        Point point = corrected == null
                ? point(books, site, entry.point())
                : books.place().pointById(corrected.pointId()).orElseThrow();
        Instant at = at(entry.at(), corrected);
        Agent agent = agent(entry.agent());
        Agent.Form form = form(entry.agent(), agent);
        double assay = assay(entry.agent());
        String lot = text("lot", entry.lot(), 80, true);
        String note = text("note", entry.note(), 500, corrected != null);
        double massG = mass(entry.massG(), corrected != null);
        Double volumeL = volume(entry.volumeL(), point);
        DoseEffect.Given effect = agent == null || form == null || volumeL == null
                ? null
                : new DoseEffect.Given(new Product(agent, form, assay), massG, volumeL);
        if (effect != null && effect.alkalinity(SEAWATER_KG_M3) > IMPLAUSIBLE) {
            faults.add(
                    "massG",
                    "massG " + massG + " in " + volumeL + " L would add more than 5000 \u00b5mol/kg of alkalinity;"
                            + " give grams, as weighed");
        }
        faults.throwIfAny();
        return new Sound(
                key,
                Objects.requireNonNull(point),
                at,
                new Dose.Given(
                        Objects.requireNonNull(agent).code(),
                        Objects.requireNonNull(form).code(),
                        assay,
                        lot,
                        massG,
                        note),
                effect,
                Boolean.TRUE.equals(entry.followedPlan()));
    }

    private String key(@Nullable String key) {
        if (key == null || key.length() < 8 || key.length() > 80 || !key.matches("[A-Za-z0-9._:-]+")) {
            faults.add(
                    "key",
                    (key == null ? "key is missing" : "key " + Texts.quoted(key) + " is not accepted")
                            + "; give 8 to 80 letters, digits and . _ : - of your own making, the same again when a"
                            + " request is repeated");
        }
        return key == null ? "" : key;
    }

    private @Nullable Point point(Books books, Site site, @Nullable String code) {
        if (code == null) {
            faults.add("point", "point is missing; give the code of the tank");
            return null;
        }
        Optional<Point> point = books.place().point(site.id(), code);
        if (point.isEmpty()) {
            faults.add("point", "point " + Texts.quoted(code) + " is not known at this site");
        } else if (point.get().kind() == PointKind.INTAKE || point.get().kind() == PointKind.DISCHARGE) {
            faults.add(
                    "point",
                    "point \"" + code + "\" is of kind " + point.get().kind().code()
                            + ", which receives no dose; name a tank");
        }
        return point.orElse(null);
    }

    private Instant at(@Nullable String text, @Nullable Dose corrected) {
        if (text == null) {
            return corrected == null ? now : corrected.at();
        }
        try {
            Instant at = OffsetDateTime.parse(text).toInstant();
            if (at.isAfter(now.plus(CLOCKS))) {
                faults.add("at", "at \"" + text + "\" is in the future; give when it was put in");
            } else if (at.isBefore(now.minus(OLDEST)) && (corrected == null || !at.equals(corrected.at()))) {
                faults.add("at", "at \"" + text + "\" is more than 7 days ago; a dose is recorded within a week");
            }
            return at.isAfter(now) ? now : at;
        } catch (DateTimeParseException e) {
            faults.add(
                    "at",
                    "at " + Texts.quoted(text) + " is not an ISO 8601 time with offset such as 2026-05-14T03:20:00Z");
            return now;
        }
    }

    private @Nullable Agent agent(DoseWish.@Nullable Agent wish) {
        String accepted =
                String.join(", ", Agent.all().stream().map(Agent::code).toList());
        if (wish == null || wish.code() == null) {
            faults.add("agent/code", "the agent's code is missing; accepted: " + accepted);
            return null;
        }
        Optional<Agent> agent = Agent.ofCode(wish.code());
        if (agent.isEmpty()) {
            faults.add("agent/code", "agent " + Texts.quoted(wish.code()) + " is not known; accepted: " + accepted);
        }
        return agent.orElse(null);
    }

    private Agent.@Nullable Form form(DoseWish.@Nullable Agent wish, @Nullable Agent agent) {
        if (wish == null || agent == null) {
            return null;
        }
        String accepted =
                String.join(", ", agent.forms().stream().map(Agent.Form::code).toList());
        if (wish.hydration() == null) {
            faults.add("agent/hydration", "hydration is missing; read the label; accepted: " + accepted);
            return null;
        }
        Optional<Agent.Form> form = agent.form(wish.hydration());
        if (form.isEmpty()) {
            faults.add(
                    "agent/hydration",
                    "hydration " + Texts.quoted(wish.hydration()) + " is not known; accepted: " + accepted);
        }
        return form.orElse(null);
    }

    private double assay(DoseWish.@Nullable Agent wish) {
        Double assay = wish == null ? null : wish.assayPercent();
        if (assay != null && !(assay >= 1 && assay <= 100)) {
            faults.add("agent/assayPercent", "assayPercent " + assay + " must be 1 to 100");
            return 100;
        }
        return assay == null ? 100 : assay;
    }

    private double mass(@Nullable Double massG, boolean correcting) {
        boolean good = massG != null && (correcting ? massG >= 0 : massG > 0) && massG <= Dose.MAX_MASS_G;
        if (!good) {
            faults.add(
                    "massG",
                    massG == null
                            ? "massG is missing; give what was weighed, in grams"
                            : "massG " + massG + " must be " + (correcting ? "0 or more" : "above 0")
                                    + " and at most 1000000 g");
        }
        return good && massG != null ? massG : 0;
    }

    private @Nullable Double volume(@Nullable Double volumeL, @Nullable Point point) {
        if (volumeL != null && !(volumeL > 0 && volumeL <= Point.MAX_VOLUME_L)) {
            faults.add("volumeL", "volumeL " + volumeL + " must be above 0 and at most 10000000");
            return null;
        }
        return volumeL != null ? volumeL : point == null ? null : point.volumeL();
    }

    private String text(String field, @Nullable String given, int most, boolean needed) {
        String text = given == null ? "" : given.strip();
        if (text.length() > most || needed && text.isEmpty()) {
            faults.add(
                    field,
                    field
                            + (text.isEmpty() ? " is missing; " : " has " + text.length() + " characters; ")
                            + (needed ? "1 to " + most + " are needed" : "at most " + most + " are kept"));
        }
        if (Texts.hasControls(text)) {
            faults.add(field, field + " has a control character; accepted: text and line breaks");
        }
        return text;
    }
}
