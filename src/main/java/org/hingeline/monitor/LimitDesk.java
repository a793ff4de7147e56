package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Priority;
import org.hingeline.alert.Side;
import org.hingeline.hatchery.Codes;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.LimitBook.Watched;
import org.jspecify.annotations.Nullable;

/** Sets, changes and takes away limits; every change is journaled with what was there before. */
public final class LimitDesk {
    /** The watch over a point's silence; always there, its threshold is the point's longest gap. */
    public static final String SILENCE = "silence";

    /** A limit as a person gives it; exactly one of below and above. */
    public record Wish(
            @Nullable String quantity,
            @Nullable Double below,
            @Nullable Double above,
            @Nullable Double deadband,
            @Nullable Double onDelayMin,
            @Nullable Double offDelayMin,
            @Nullable String priority,
            @Nullable String action) {}

    private final Storage storage;
    private final InstantSource clock;
    private final Signals signals;

    public LimitDesk(Storage storage, InstantSource clock, Signals signals) {
        this.storage = storage;
        this.clock = clock;
        this.signals = signals;
    }

    /**
     * Saves a limit by name, putting a taken-away one of that name back.
     *
     * @throws FieldFaultsException when the wish cannot be a limit
     */
    public Limit save(Point point, String name, Wish wish, String who) {
        Limit limit = limitOf(point, name, wish);
        Instant now = clock.instant();
        Limit saved = storage.write(books -> save(books, point, limit, who, now));
        signals.siteChanged(point.siteId());
        return saved;
    }

    /** As {@link #save}, inside a transaction that is already open. */
    Limit save(Books books, Point point, Limit limit, String who, Instant now) {
        books.place().lockPoints(List.of(point.id()));
        Optional<Watched> known = watched(books, point, limit.name());
        String before = known.map(Watched::limit).map(LimitDesk::words).orElse("none");
        if (before.equals(words(limit))) {
            return known.map(Watched::limit).orElseThrow();
        }
        Limit saved = books.limits().saveLimit(limit, now);
        known.ifPresent(watched -> LimitChange.carryOver(books, watched, saved, now));
        books.journal()
                .add(new JournalBook.Entry(
                        now,
                        point.siteId(),
                        who,
                        "limit-saved",
                        point.code() + "/" + limit.name(),
                        "before: " + before + "; after: " + words(saved)));
        return saved;
    }

    /**
     * Takes a limit away; an alert that stands on it ends.
     *
     * @return whether there was one
     * @throws FieldFaultsException when it is the watch over silence, which stays
     */
    public boolean retire(Point point, String name, String who) {
        if (name.equals(SILENCE)) {
            throw new FieldFaultsException(
                    "name",
                    "the watch over silence stays while a point has limits; raise maxGapMin of the point instead");
        }
        Instant now = clock.instant();
        boolean done = storage.write(books -> retire(books, point, name, who, now));
        signals.siteChanged(point.siteId());
        return done;
    }

    private static boolean retire(Books books, Point point, String name, String who, Instant now) {
        books.place().lockPoints(List.of(point.id()));
        Optional<Watched> found = watched(books, point, name);
        if (found.isEmpty()) {
            return false;
        }
        Watched watched = found.get();
        LimitChange.end(books, watched, now);
        books.limits().retireLimit(watched.limit().id(), now);
        if (books.limits().limits(point.id()).stream().allMatch(Limit::onSilence)) {
            // with nothing left to watch no value is waited for, so none can end this alert
            watched(books, point, SILENCE).ifPresent(silence -> LimitChange.end(books, silence, now));
        }
        books.journal()
                .add(new JournalBook.Entry(
                        now,
                        point.siteId(),
                        who,
                        "limit-removed",
                        point.code() + "/" + name,
                        "before: " + words(watched.limit())));
        return true;
    }

    private static Optional<Watched> watched(Books books, Point point, String name) {
        return books.limits().watchedForUpdate(List.of(point.id())).stream()
                .filter(w -> w.limit().name().equals(name))
                .findFirst();
    }

    /** The watch over silence of a point. */
    static Limit silenceOf(Point point) {
        return new Limit(
                0,
                point.id(),
                SILENCE,
                Quantity.SILENCE,
                Side.ABOVE,
                point.maxGap().toSeconds() / 60.0,
                0,
                Duration.ZERO,
                Duration.ZERO,
                Priority.HIGH,
                "Look at the water yourself; check the sensor, its gateway and the link.");
    }

    static Limit limitOf(Point point, String name, Wish wish) {
        return limitOf(point.id(), name, wish);
    }

    /** @throws FieldFaultsException when the wish cannot be a limit */
    static Limit limitOf(long pointId, String name, Wish wish) {
        FieldFaults faults = new FieldFaults();
        if (!Codes.isCode(name)) {
            faults.add("name", "name \"" + name + "\" is not " + Codes.SHAPE);
        }
        if (name.equals(SILENCE)) {
            faults.add(
                    "name", "name \"silence\" is taken by the watch over silence; set maxGapMin of the point instead");
        }
        Quantity quantity = quantityOf(wish.quantity(), faults);
        Double below = finite("below", wish.below(), faults);
        Double above = finite("above", wish.above(), faults);
        if ((wish.below() == null) == (wish.above() == null)) {
            faults.add(
                    "below",
                    "exactly one of below and above is needed, got " + (wish.below() == null ? "neither" : "both"));
        }
        double deadband = inRange("deadband", wish.deadband(), 0, 1000, standardDeadband(quantity), faults);
        double onDelayMin = inRange("onDelayMin", wish.onDelayMin(), 0, 1440, 10, faults);
        double offDelayMin = inRange("offDelayMin", wish.offDelayMin(), 0, 1440, 10, faults);
        String priorityCode = wish.priority() == null ? Priority.MEDIUM.code() : wish.priority();
        Optional<Priority> priority = Priority.ofCode(priorityCode);
        if (priority.isEmpty()) {
            faults.add("priority", "priority \"" + priorityCode + "\" is not one of " + Priority.codes());
        }
        String action = wish.action() == null ? "" : wish.action().strip();
        if (action.isEmpty() || action.length() > 300) {
            faults.add("action", "action must say what to do, in 1 to 300 characters; it has " + action.length());
        }
        if (Texts.hasControls(action)) {
            faults.add("action", "action has a control character; accepted: text and line breaks");
        }
        faults.throwIfAny();
        return new Limit(
                0,
                pointId,
                name,
                Objects.requireNonNull(quantity),
                below != null ? Side.BELOW : Side.ABOVE,
                below != null ? below : Objects.requireNonNull(above),
                deadband,
                minutes(onDelayMin),
                minutes(offDelayMin),
                priority.orElseThrow(),
                action);
    }

    private static @Nullable Quantity quantityOf(@Nullable String code, FieldFaults faults) {
        Optional<Quantity> quantity =
                code == null ? Optional.empty() : Quantity.ofCode(code).filter(q -> q != Quantity.SILENCE);
        if (quantity.isEmpty()) {
            faults.add(
                    "quantity",
                    code == null
                            ? "quantity is missing; accepted: " + Quantity.limitCodes()
                            : "quantity \"" + code + "\" cannot have a limit; accepted: " + Quantity.limitCodes());
        }
        return quantity.orElse(null);
    }

    /** Starting values, common practice: 0.05 for a saturation state, 0.03 for pH. */
    private static double standardDeadband(@Nullable Quantity quantity) {
        if (quantity == null) {
            return 0;
        }
        return switch (quantity) {
            case OMEGA_ARAGONITE, OMEGA_CALCITE -> 0.05;
            case PH, PH_TOTAL -> 0.03;
            default -> 0;
        };
    }

    private static @Nullable Double finite(String field, @Nullable Double value, FieldFaults faults) {
        if (value != null && !Double.isFinite(value)) {
            faults.add(field, field + " " + value + " must be a finite number");
            return null;
        }
        return value;
    }

    private static double inRange(
            String field, @Nullable Double value, double min, double max, double otherwise, FieldFaults faults) {
        if (value == null) {
            return otherwise;
        }
        if (!(value >= min && value <= max)) {
            faults.add(field, field + " " + value + " must be " + (long) min + " to " + (long) max);
            return otherwise;
        }
        return value;
    }

    private static Duration minutes(double minutes) {
        return Duration.ofSeconds(Math.round(minutes * 60));
    }

    /** A limit in one line, for the journal. */
    static String words(Limit limit) {
        return limit.quantity().code() + " " + limit.side().code() + " " + limit.threshold() + ", deadband "
                + limit.deadband() + ", on-delay " + limit.onDelay().toSeconds() + " s, off-delay "
                + limit.offDelay().toSeconds() + " s, priority "
                + limit.priority().code() + ", action: "
                + limit.action();
    }
}
