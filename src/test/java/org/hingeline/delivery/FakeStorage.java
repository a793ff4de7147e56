package org.hingeline.delivery;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.hingeline.monitor.AlertBook;
import org.hingeline.monitor.Books;
import org.hingeline.monitor.DoseBook;
import org.hingeline.monitor.JournalBook;
import org.hingeline.monitor.KeyBook;
import org.hingeline.monitor.LimitBook;
import org.hingeline.monitor.OutboxBook;
import org.hingeline.monitor.PeopleBook;
import org.hingeline.monitor.PlaceBook;
import org.hingeline.monitor.ReadingBook;
import org.hingeline.monitor.Storage;
import org.hingeline.monitor.WaterBook;

/** Outbox and journal in memory, one transaction at a time; one that fails leaves nothing behind. */
final class FakeStorage implements Storage, Books, OutboxBook, JournalBook {
    private record Row(Message message, Instant claimedUntil) {}

    private Map<Long, Row> rows = new LinkedHashMap<>();
    private List<Entry> entries = new ArrayList<>();
    private boolean breaksOnMark;

    /** From now on marking fails, as after a crash between sending and marking. */
    void breakOnMark(boolean breaks) {
        breaksOnMark = breaks;
    }

    long queue(String key, String recipient, Instant createdAt) {
        long id = rows.size() + 1L;
        writeOnly(books -> books.outbox().add(message(id, key, recipient, createdAt)));
        return id;
    }

    static Message message(long id, String key, String recipient, Instant createdAt) {
        return new Message(
                id,
                1,
                5L,
                key,
                "email",
                "Inés Vale",
                recipient,
                "HIGH: Larval 3, Ω 1.62 under 1.80 - Fennick Bay",
                "Larval 3 (20 m3): Ω 1.62 ±0.11, under your 1.80 for 12 min.\n\nWhat to do: Close the intake valve.\n",
                State.WAITING,
                0,
                createdAt,
                createdAt,
                null,
                null);
    }

    synchronized Message stored(long id) {
        return rows.get(id).message();
    }

    synchronized List<Entry> journalEntries() {
        return List.copyOf(entries);
    }

    @Override
    public synchronized <T> T write(Function<Books, T> work) {
        Map<Long, Row> rowsBefore = new LinkedHashMap<>(rows);
        List<Entry> entriesBefore = new ArrayList<>(entries);
        try {
            return work.apply(this);
        } catch (RuntimeException failure) {
            rows = rowsBefore;
            entries = entriesBefore;
            throw failure;
        }
    }

    @Override
    public synchronized <T> T read(Function<Books, T> work) {
        return work.apply(this);
    }

    @Override
    public OutboxBook outbox() {
        return this;
    }

    @Override
    public JournalBook journal() {
        return this;
    }

    @Override
    public void add(Message message) {
        rows.put(message.id(), new Row(message, Instant.MIN));
    }

    @Override
    public boolean anyDue(Instant now) {
        return rows.values().stream()
                .anyMatch(row -> row.message().state() == State.WAITING
                        && !row.message().nextAttemptAt().isAfter(now)
                        && !row.claimedUntil().isAfter(now));
    }

    @Override
    public List<Message> claimDue(Instant now, Duration claim, String node, int most) {
        List<Message> due = rows.values().stream()
                .filter(row -> row.message().state() == State.WAITING
                        && !row.message().nextAttemptAt().isAfter(now)
                        && !row.claimedUntil().isAfter(now))
                .map(Row::message)
                .sorted(Comparator.comparing(Message::nextAttemptAt).thenComparing(Message::id))
                .limit(most)
                .toList();
        due.forEach(message -> rows.put(message.id(), new Row(message, now.plus(claim))));
        return due;
    }

    @Override
    public void sent(long id, Instant at) {
        mark(id, State.SENT, stored(id).nextAttemptAt(), at, null);
    }

    @Override
    public void failed(long id, String error, Instant nextAttemptAt) {
        mark(id, State.WAITING, nextAttemptAt, null, error);
    }

    @Override
    public void givenUp(long id, String error) {
        mark(id, State.GIVEN_UP, stored(id).nextAttemptAt(), null, error);
    }

    private void mark(long id, State state, Instant next, Instant sentAt, String error) {
        if (breaksOnMark) {
            throw new IllegalStateException("the database is gone");
        }
        Message m = stored(id);
        rows.put(
                id,
                new Row(
                        new Message(
                                id,
                                m.siteId(),
                                m.alertId(),
                                m.key(),
                                m.channel(),
                                m.recipientName(),
                                m.recipient(),
                                m.subject(),
                                m.body(),
                                state,
                                m.attempts() + 1,
                                m.createdAt(),
                                next,
                                sentAt,
                                error),
                        Instant.MIN));
    }

    @Override
    public void add(Entry entry) {
        entries.add(entry);
    }

    @Override
    public List<Entry> entries(long siteId, int most) {
        return entries;
    }

    @Override
    public Backlog backlog() {
        throw new UnsupportedOperationException();
    }

    @Override
    public Optional<Message> message(long siteId, long id) {
        throw new UnsupportedOperationException();
    }

    @Override
    public List<Message> messages(long siteId, int most) {
        throw new UnsupportedOperationException();
    }

    @Override
    public List<Message> messagesOf(long alertId) {
        throw new UnsupportedOperationException();
    }

    @Override
    public PlaceBook place() {
        throw new UnsupportedOperationException();
    }

    @Override
    public PeopleBook people() {
        throw new UnsupportedOperationException();
    }

    @Override
    public ReadingBook readings() {
        throw new UnsupportedOperationException();
    }

    @Override
    public WaterBook water() {
        throw new UnsupportedOperationException();
    }

    @Override
    public DoseBook doses() {
        throw new UnsupportedOperationException();
    }

    @Override
    public AlertBook alerts() {
        throw new UnsupportedOperationException();
    }

    @Override
    public LimitBook limits() {
        throw new UnsupportedOperationException();
    }

    @Override
    public KeyBook keys() {
        throw new UnsupportedOperationException();
    }
}
