package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.DoseEffect;
import org.hingeline.dosing.Product;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Standing;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.DoseRefusedException.Kind;
import org.jspecify.annotations.Nullable;

/**
 * Records what was put into the tanks. Nothing is ever deleted: for ten minutes a record can be undone, later another one
 * corrects it. Every step is journaled.
 */
public final class DoseRecords {
    /** How long a record can be undone; and how long ago a dose still counts as put in now. */
    public static final Duration UNDO = Duration.ofMinutes(10);

    /**
     * What the site allows.
     *
     * @param maxGramsPerTankAndDay most that one tank gets within 24 hours, all agents together, g
     * @param secondPersonAboveG a dose above this waits for a second person, g
     * @param mixing time after which a tank counts as mixed
     */
    public record Rules(double maxGramsPerTankAndDay, double secondPersonAboveG, Duration mixing) {
        /** From this on a bound is no bound. */
        public static final double OFF = Dose.MAX_MASS_G;
    }

    /** @param fresh false when that key was recorded before */
    public record Recorded(Dose dose, boolean fresh) {}

    private final Storage storage;
    private final InstantSource clock;
    private final Rules rules;
    private final DoseForetelling foretelling;
    private final Signals signals;

    public DoseRecords(Storage storage, InstantSource clock, Rules rules, WaterRules water, Signals signals) {
        this.storage = storage;
        this.clock = clock;
        this.rules = rules;
        this.foretelling = new DoseForetelling(water, rules.mixing());
        this.signals = signals;
    }

    public Rules rules() {
        return rules;
    }

    /**
     * Records a dose, once for each key.
     *
     * @throws FieldFaultsException when it cannot be recorded
     */
    public Recorded record(Site site, Caller caller, DoseEntry entry) {
        return save(site, caller, entry, null);
    }

    /**
     * Records what takes the place of an entry that was wrong.
     *
     * @throws FieldFaultsException when it cannot be recorded
     * @throws DoseRefusedException when the entry is not there or was undone or corrected already
     */
    public Recorded correct(Site site, Caller caller, long id, DoseEntry entry) {
        return save(site, caller, entry, id);
    }

    private Recorded save(Site site, Caller caller, DoseEntry entry, @Nullable Long corrects) {
        Instant now = clock.instant();
        Recorded recorded = storage.write(books -> save(books, site, caller, entry, corrects, now));
        signals.siteChanged(site.id());
        return recorded;
    }

    private Recorded save(
            Books books, Site site, Caller caller, DoseEntry entry, @Nullable Long corrects, Instant now) {
        Dose corrected = corrects == null ? null : found(books, site, corrects);
        DoseEntryCheck.Sound sound = DoseEntryCheck.check(books, site, entry, corrected, now);
        Point point = sound.point();
        books.place().lockPoints(List.of(point.id()));
        Optional<Dose> known = books.doses().byKey(site.id(), sound.key());
        if (known.isPresent()) {
            return new Recorded(same(known.get(), sound, caller, corrects), false);
        }
        if (corrected != null) {
            requireOpen(found(books, site, corrected.id()));
        }
        double massG = sound.given().massG();
        boolean past = corrected != null || past(sound.at(), now);
        DoseBounds.requireWithinDay(books, rules, point, sound.at(), massG, corrects, past && manager(caller, site));
        boolean secondPerson = DoseBounds.needsSecondPerson(rules, massG);
        if (secondPerson && !caller.browser()) {
            throw new FieldFaultsException(
                    "massG",
                    "massG " + massG + " is above " + rules.secondPersonAboveG()
                            + " g and needs two people: record it signed in, not with an access token");
        }
        DoseEffect.Given effect = sound.effect();
        Dose dose = new Dose(
                0,
                site.id(),
                point.id(),
                sound.key(),
                sound.at(),
                now,
                caller.name(),
                sound.given(),
                sound.plan(),
                effect == null ? null : foretelling.of(books, point, sound.at(), effect, corrects),
                corrects,
                null,
                secondPerson,
                null,
                null);
        long id = books.doses().add(dose);
        Dose added = found(books, site, id);
        String words = DoseWords.of(added);
        journal(
                books,
                added,
                point,
                caller,
                corrected == null ? "dose-recorded" : "dose-corrected",
                corrected == null
                        ? words
                        : "before: dose " + corrects + ", " + DoseWords.of(corrected) + "; after: " + words,
                now);
        return new Recorded(added, true);
    }

    /** A doubled tap or a repeated request is the same again; anything else under the key is a mistake. */
    private static Dose same(Dose known, DoseEntryCheck.Sound sound, Caller caller, @Nullable Long corrects) {
        boolean same = known.pointId() == sound.point().id()
                && known.given().equals(sound.given())
                && known.by().equals(caller.name())
                && Objects.equals(known.corrects(), corrects);
        if (!same) {
            throw new FieldFaultsException(
                    "key", "key \"" + sound.key() + "\" was used for another dose; make a new one for each dose");
        }
        return known;
    }

    private static boolean past(Instant at, Instant now) {
        return Duration.between(at, now).compareTo(UNDO) > 0;
    }

    /**
     * Takes a record back within ten minutes; one that waits for a second person, at any time.
     *
     * @throws DoseRefusedException when it is not there, not theirs, or too late
     */
    public Dose undo(Site site, Caller caller, long id) {
        Instant now = clock.instant();
        Dose undone = storage.write(books -> {
            Dose dose = locked(books, site, id);
            if (dose.standing() == Standing.UNDONE) {
                return dose;
            }
            if (dose.standing() == Standing.CORRECTED) {
                throw new DoseRefusedException(
                        Kind.TOO_LATE,
                        "dose " + id + " was corrected by dose " + dose.correctedBy() + "; undo that one");
            }
            if (!dose.by().equals(caller.name()) && !manager(caller, site)) {
                throw new DoseRefusedException(
                        Kind.NOT_YOURS,
                        "dose " + id + " was recorded by " + dose.by() + "; they or a manager can undo it");
            }
            if (dose.standing() != Standing.PENDING && now.isAfter(undoUntil(dose))) {
                throw new DoseRefusedException(
                        Kind.TOO_LATE,
                        "dose " + id + " was recorded more than ten minutes ago and stays; enter a correction instead");
            }
            books.doses().undo(id, new Dose.Signed(caller.name(), now));
            Point point = books.place().pointById(dose.pointId()).orElseThrow();
            journal(books, dose, point, caller, "dose-undone", "before: " + DoseWords.of(dose), now);
            return found(books, site, id);
        });
        signals.siteChanged(site.id());
        return undone;
    }

    /** Until when a record can be undone. */
    public static Instant undoUntil(Dose dose) {
        Dose.Signed confirmed = dose.confirmed();
        return (confirmed == null ? dose.recordedAt() : confirmed.at()).plus(UNDO);
    }

    /**
     * A second person stands for a dose. One recorded as put in now is put in once it is confirmed, so it takes that time,
     * and what it makes of the water is foretold anew.
     *
     * @throws DoseRefusedException when it is not there, or the caller is not a second person, or it was undone
     */
    public Dose confirm(Site site, Caller caller, long id) {
        Instant now = clock.instant();
        Dose confirmed = storage.write(books -> {
            Dose dose = locked(books, site, id);
            if (dose.standing() == Standing.RECORDED) {
                return dose;
            }
            if (dose.standing() != Standing.PENDING) {
                throw new DoseRefusedException(
                        Kind.TOO_LATE, "dose " + id + " was " + dose.standing().code() + " and waits for nobody");
            }
            if (!caller.browser()) {
                throw new DoseRefusedException(
                        Kind.NOT_YOURS,
                        "dose " + id + " is confirmed by a person who signed in, not by an access token");
            }
            if (dose.by().equals(caller.name())) {
                throw new DoseRefusedException(
                        Kind.NOT_YOURS, "dose " + id + " was recorded by you; somebody else has to confirm it");
            }
            Point point = books.place().pointById(dose.pointId()).orElseThrow();
            boolean putInNow = dose.corrects() == null && !past(dose.at(), dose.recordedAt());
            if (putInNow) {
                DoseBounds.requireWithinDay(
                        books, rules, point, now, dose.given().massG(), id, false);
            }
            books.doses()
                    .confirm(
                            id,
                            new Dose.Signed(caller.name(), now),
                            putInNow ? now : dose.at(),
                            putInNow ? foretoldAnew(books, point, dose, now) : dose.foretold());
            Dose after = found(books, site, id);
            journal(books, dose, point, caller, "dose-confirmed", DoseWords.of(after), now);
            return after;
        });
        signals.siteChanged(site.id());
        return confirmed;
    }

    private Dose.@Nullable Foretold foretoldAnew(Books books, Point point, Dose dose, Instant at) {
        Dose.Foretold before = dose.foretold();
        Double volumeL = before == null ? point.volumeL() : (Double) before.volumeL();
        Optional<Agent> agent = Agent.ofCode(dose.given().agent());
        Optional<Agent.Form> form = agent.flatMap(a -> a.form(dose.given().hydration()));
        if (volumeL == null || form.isEmpty()) {
            return null;
        }
        Product product = new Product(agent.get(), form.get(), dose.given().assayPercent());
        DoseEffect.Given given = new DoseEffect.Given(product, dose.given().massG(), volumeL);
        return foretelling.of(books, point, at, given, dose.id());
    }

    private static Dose locked(Books books, Site site, long id) {
        books.place().lockPoints(List.of(found(books, site, id).pointId()));
        return found(books, site, id);
    }

    private static Dose found(Books books, Site site, long id) {
        return books.doses()
                .dose(site.id(), id)
                .orElseThrow(
                        () -> new DoseRefusedException(Kind.NO_SUCH_DOSE, "there is no dose " + id + " at this site"));
    }

    private static void requireOpen(Dose dose) {
        if (!dose.counts()) {
            throw new DoseRefusedException(
                    Kind.TOO_LATE,
                    "dose " + dose.id() + " was " + dose.standing().code()
                            + (dose.correctedBy() == null ? "" : " by dose " + dose.correctedBy())
                            + " already; correct the entry that stands");
        }
    }

    private static boolean manager(Caller caller, Site site) {
        return caller.at(site.code()).filter(m -> m.role() == Role.MANAGER).isPresent();
    }

    private static void journal(
            Books books, Dose dose, Point point, Caller caller, String what, String detail, Instant now) {
        books.journal()
                .add(new JournalBook.Entry(
                        now, dose.siteId(), caller.name(), what, point.code() + "/dose " + dose.id(), detail));
    }
}
