package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.monitor.OutboxBook;
import org.jdbi.v3.core.Handle;

final class OutboxTables implements OutboxBook {
    private final Handle handle;

    OutboxTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public void add(Message message) {
        handle.createUpdate("""
                        INSERT INTO outbox
                            (site_id, alert_id, message_key, channel, recipient_name, recipient, subject, body,
                             state, attempts, created_at, next_attempt_at)
                        VALUES (:site, :alert, :key, :channel, :name, :recipient, :subject, :body,
                                :state, 0, :created, :next)
                        """)
                .bind("site", message.siteId())
                .bind("alert", message.alertId())
                .bind("key", message.key())
                .bind("channel", message.channel())
                .bind("name", message.recipientName())
                .bind("recipient", message.recipient())
                .bind("subject", Sql.fit(message.subject(), 300))
                .bind("body", Sql.fit(message.body(), 8000))
                .bind("state", State.WAITING.name())
                .bind("created", message.createdAt())
                .bind("next", message.nextAttemptAt())
                .execute();
    }

    @Override
    public boolean anyDue(Instant now) {
        return handle.createQuery("""
                        SELECT id FROM outbox
                        WHERE state = 'WAITING' AND next_attempt_at <= :now
                          AND (claimed_until IS NULL OR claimed_until <= :now)
                        LIMIT 1
                        """)
                .bind("now", now)
                .mapTo(Long.class)
                .findOne()
                .isPresent();
    }

    @Override
    public List<Message> claimDue(Instant now, Duration claim, String node, int most) {
        List<Long> due = handle.createQuery("""
                        SELECT id FROM outbox
                        WHERE state = 'WAITING' AND next_attempt_at <= :now
                          AND (claimed_until IS NULL OR claimed_until <= :now)
                        ORDER BY next_attempt_at, id LIMIT :most
                        FOR UPDATE SKIP LOCKED
                        """)
                .bind("now", now)
                .bind("most", most)
                .mapTo(Long.class)
                .list();
        if (due.isEmpty()) {
            return List.of();
        }
        handle.createUpdate("UPDATE outbox SET claimed_by = :node, claimed_until = :until WHERE id IN (<ids>)")
                .define("ids", Sql.ids(due))
                .bind("node", node)
                .bind("until", now.plus(claim))
                .execute();
        return handle.createQuery("SELECT * FROM outbox WHERE id IN (<ids>) ORDER BY next_attempt_at, id")
                .define("ids", Sql.ids(due))
                .map((row, context) -> message(row))
                .list();
    }

    @Override
    public void sent(long id, Instant at) {
        Sql.one(handle.createUpdate("""
                                UPDATE outbox
                                SET state = 'SENT', attempts = attempts + 1, sent_at = :at, claimed_until = NULL,
                                    last_error = NULL
                                WHERE id = :id
                                """).bind("at", at).bind("id", id).execute(), "marking message " + id + " as sent");
    }

    @Override
    public void failed(long id, String error, Instant nextAttemptAt) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE outbox
                                SET attempts = attempts + 1, next_attempt_at = :next, claimed_until = NULL,
                                    last_error = :error
                                WHERE id = :id AND state = 'WAITING'
                                """)
                        .bind("next", nextAttemptAt)
                        .bind("error", Sql.fit(error, 1000))
                        .bind("id", id)
                        .execute(),
                "noting the failure of message " + id);
    }

    @Override
    public void givenUp(long id, String error) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE outbox
                                SET state = 'GIVEN_UP', attempts = attempts + 1, claimed_until = NULL,
                                    last_error = :error
                                WHERE id = :id AND state = 'WAITING'
                                """)
                        .bind("error", Sql.fit(error, 1000))
                        .bind("id", id)
                        .execute(),
                "giving up message " + id);
    }

    @Override
    public Backlog backlog() {
        return handle.createQuery(
                        "SELECT count(*) AS waiting, min(created_at) AS oldest FROM outbox WHERE state = 'WAITING'")
                .map((row, context) -> new Backlog(row.getInt("waiting"), Sql.instantOrNull(row, "oldest")))
                .one();
    }

    @Override
    public Optional<Message> message(long siteId, long id) {
        return handle.createQuery("SELECT * FROM outbox WHERE site_id = :site AND id = :id")
                .bind("site", siteId)
                .bind("id", id)
                .map((row, context) -> message(row))
                .findOne();
    }

    @Override
    public List<Message> messages(long siteId, int most) {
        return handle.createQuery(
                        "SELECT * FROM outbox WHERE site_id = :site ORDER BY created_at DESC, id DESC LIMIT :most")
                .bind("site", siteId)
                .bind("most", most)
                .map((row, context) -> message(row))
                .list();
    }

    @Override
    public List<Message> messagesOf(long alertId) {
        return handle.createQuery("SELECT * FROM outbox WHERE alert_id = :alert ORDER BY id")
                .bind("alert", alertId)
                .map((row, context) -> message(row))
                .list();
    }

    private static Message message(ResultSet row) throws SQLException {
        return new Message(
                row.getLong("id"),
                row.getLong("site_id"),
                Sql.longOrNull(row, "alert_id"),
                row.getString("message_key"),
                row.getString("channel"),
                row.getString("recipient_name"),
                row.getString("recipient"),
                row.getString("subject"),
                row.getString("body"),
                State.valueOf(row.getString("state")),
                row.getInt("attempts"),
                Sql.instant(row, "created_at"),
                Sql.instant(row, "next_attempt_at"),
                Sql.instantOrNull(row, "sent_at"),
                row.getString("last_error"));
    }
}
