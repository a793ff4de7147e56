package org.hingeline.monitor;

import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hingeline.alert.AlertMachine;
import org.hingeline.alert.AlertState;
import org.hingeline.alert.Event;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Observation;
import org.hingeline.alert.Phase;
import org.hingeline.alert.Transition;
import org.hingeline.alert.Transition.Effect;
import org.hingeline.hatchery.Point;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.AlertBook.Watched;
import org.jspecify.annotations.Nullable;

/** Carries out what the alert machine decides: opens and closes alerts, tells people; and takes acknowledgements. */
public final class AlertDesk {
    private static final int NOTE_MOST = 500;

    private final Storage storage;
    private final InstantSource clock;
    private final MessageDesk messages;
    private final Signals signals;

    public AlertDesk(Storage storage, InstantSource clock, MessageDesk messages, Signals signals) {
        this.storage = storage;
        this.clock = clock;
        this.messages = messages;
        this.signals = signals;
    }

    /**
     * @param tell whether people are to hear of it
     * @return the alert now open for the limit, if any
     */
    @Nullable
    Long carryOut(
            Books books,
            long siteId,
            Point point,
            Limit limit,
            Transition transition,
            @Nullable Long alertId,
            boolean tell,
            Instant now) {
        AlertState state = transition.state();
        Observation latest = state.latest();
        Instant valueAt = latest == null ? now : latest.at();
        return switch (transition.effect()) {
            case NOTHING, ACKNOWLEDGE -> alertId;
            case RAISE -> {
                long id = books.alerts().open(newAlert(siteId, point, limit, state, now));
                tell(tell, books, siteId, id, limit, MessageDesk.Kind.RAISED, valueAt, now);
                yield id;
            }
            case RAISE_AGAIN -> {
                long id = Objects.requireNonNull(alertId);
                Observation out = latest(state);
                books.alerts().reopen(id, since(limit, state), now, out.value(), out.standardUncertainty());
                tell(tell, books, siteId, id, limit, MessageDesk.Kind.RAISED_AGAIN, valueAt, now);
                yield id;
            }
            case RETURN -> {
                long id = Objects.requireNonNull(alertId);
                books.alerts().returned(id, now);
                tell(tell, books, siteId, id, limit, MessageDesk.Kind.BACK_TO_NORMAL, valueAt, now);
                yield id;
            }
            case CLOSE -> {
                long id = Objects.requireNonNull(alertId);
                books.alerts().close(id, now);
                tell(tell, books, siteId, id, limit, MessageDesk.Kind.BACK_TO_NORMAL, valueAt, now);
                yield null;
            }
        };
    }

    private void tell(
            boolean tell,
            Books books,
            long siteId,
            long id,
            Limit limit,
            MessageDesk.Kind kind,
            Instant valueAt,
            Instant now) {
        if (tell) {
            messages.alert(books, siteId, id, limit, kind, valueAt, now);
        }
    }

    private static Alert newAlert(long siteId, Point point, Limit limit, AlertState state, Instant now) {
        Observation latest = latest(state);
        return new Alert(
                0,
                siteId,
                point.id(),
                limit.id(),
                limit.name(),
                limit.quantity(),
                limit.side(),
                limit.threshold(),
                limit.priority(),
                limit.action(),
                Phase.UNACKNOWLEDGED,
                since(limit, state),
                now,
                latest.value(),
                latest.standardUncertainty(),
                null,
                null,
                null,
                null,
                null);
    }

    private static Observation latest(AlertState state) {
        return Objects.requireNonNull(state.latest(), "an alert is raised by a value");
    }

    /** When it began: the first value out of the limit; for silence, the last value heard. */
    private static Instant since(Limit limit, AlertState state) {
        Observation latest = latest(state);
        if (limit.onSilence()) {
            return latest.at().minusMillis(Math.round(latest.value() * 60_000));
        }
        Instant since = state.outSince();
        return since == null ? latest.at() : since;
    }

    /** What came of an acknowledgement. */
    public enum Acknowledged {
        DONE,
        /** Somebody was faster, or the alert is over. */
        NOTHING_TO_DO,
        NO_SUCH_ALERT
    }

    /**
     * A person says that they have seen it.
     *
     * @param note at most 500 characters
     * @throws FieldFaultsException when the note cannot be kept
     */
    public Acknowledged acknowledge(long siteId, long alertId, String who, @Nullable String note) {
        if (note != null && note.length() > NOTE_MOST) {
            throw new FieldFaultsException(
                    "note", "note has " + note.length() + " characters; at most " + NOTE_MOST + " are kept");
        }
        if (note != null && Texts.hasControls(note)) {
            throw new FieldFaultsException("note", "note has a control character; accepted: text and line breaks");
        }
        String kept = note == null || note.isBlank() ? null : note.strip();
        Instant now = clock.instant();
        Acknowledged result = storage.write(books -> acknowledge(books, siteId, alertId, who, kept, now));
        signals.siteChanged(siteId);
        return result;
    }

    private Acknowledged acknowledge(
            Books books, long siteId, long alertId, String who, @Nullable String note, Instant now) {
        Optional<Alert> alert = books.alerts().alert(siteId, alertId);
        if (alert.isEmpty()) {
            return Acknowledged.NO_SUCH_ALERT;
        }
        Optional<Watched> watched = books.alerts().watchedByAlertForUpdate(alertId);
        if (watched.isEmpty()) {
            return Acknowledged.NOTHING_TO_DO;
        }
        Limit limit = watched.get().limit();
        Point point = books.place().pointById(limit.pointId()).orElseThrow();
        Transition transition =
                AlertMachine.next(limit, point.maxGap(), watched.get().state(), new Event.Acknowledged(), now);
        if (transition.effect() == Effect.NOTHING) {
            return Acknowledged.NOTHING_TO_DO;
        }
        books.alerts().acknowledge(alertId, now, who, note);
        boolean over = transition.effect() == Effect.CLOSE;
        if (over) {
            books.alerts().close(alertId, now);
        }
        books.alerts().saveState(limit.id(), transition.state(), over ? null : (Long) alertId);
        books.journal()
                .add(new JournalBook.Entry(
                        now,
                        siteId,
                        who,
                        "alert-acknowledged",
                        point.code() + "/" + limit.name(),
                        note == null ? "" : note));
        return Acknowledged.DONE;
    }

    /** Open alerts, newest first. */
    public List<Alert> open(long siteId) {
        return storage.read(books -> books.alerts().openAlerts(siteId));
    }
}
