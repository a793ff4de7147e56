package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.PeopleBook;
import org.hingeline.monitor.Role;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.statement.Update;
import org.jspecify.annotations.Nullable;

final class PeopleTables implements PeopleBook {
    private final Handle handle;

    PeopleTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public int countPeople() {
        return handle.createQuery("SELECT count(*) FROM person")
                .mapTo(Integer.class)
                .one();
    }

    @Override
    public Optional<Person> personByName(String name) {
        return handle.createQuery("SELECT * FROM person WHERE name = :name")
                .bind("name", name)
                .map((row, context) -> person(row))
                .findOne();
    }

    @Override
    public Optional<Person> person(long personId) {
        return handle.createQuery("SELECT * FROM person WHERE id = :id")
                .bind("id", personId)
                .map((row, context) -> person(row))
                .findOne();
    }

    @Override
    public Optional<Person> lockPerson(long personId) {
        return handle.createQuery("SELECT * FROM person WHERE id = :id FOR UPDATE")
                .bind("id", personId)
                .map((row, context) -> person(row))
                .findOne();
    }

    @Override
    public List<PersonAtSite> peopleOf(long siteId) {
        return handle.createQuery("""
                        SELECT p.*, m.role FROM person p JOIN membership m ON m.person_id = p.id
                        WHERE m.site_id = :site ORDER BY p.name
                        """)
                .bind("site", siteId)
                .map((row, context) -> new PersonAtSite(person(row), Columns.role(row)))
                .list();
    }

    @Override
    public long savePerson(String name, String displayName, String passwordHash, Instant now) {
        Optional<Person> known = personByName(name);
        if (known.isPresent()) {
            Sql.one(
                    handle.createUpdate("""
                                    UPDATE person
                                    SET display_name = :display, password_hash = :hash, failures = 0, locked_until = NULL
                                    WHERE id = :id
                                    """)
                            .bind("display", displayName)
                            .bind("hash", passwordHash)
                            .bind("id", known.get().id())
                            .execute(),
                    "saving person " + name);
            return known.get().id();
        }
        return Sql.insertedId(handle.createUpdate("""
                                INSERT INTO person (name, display_name, password_hash, failures, created_at)
                                VALUES (:name, :display, :hash, 0, :now)
                                """)
                .bind("name", name)
                .bind("display", displayName)
                .bind("hash", passwordHash)
                .bind("now", now));
    }

    @Override
    public void saveMembership(long personId, long siteId, Role role) {
        int updated = handle.createUpdate(
                        "UPDATE membership SET role = :role WHERE person_id = :person AND site_id = :site")
                .bind("role", role.code())
                .bind("person", personId)
                .bind("site", siteId)
                .execute();
        if (updated == 0) {
            handle.createUpdate("INSERT INTO membership (person_id, site_id, role) VALUES (:person, :site, :role)")
                    .bind("role", role.code())
                    .bind("person", personId)
                    .bind("site", siteId)
                    .execute();
        }
    }

    @Override
    public List<Membership> memberships(long personId) {
        return handle.createQuery("""
                        SELECT s.*, m.role FROM membership m JOIN site s ON s.id = m.site_id
                        WHERE m.person_id = :person ORDER BY s.name
                        """)
                .bind("person", personId)
                .map((row, context) -> new Membership(
                        new Site(
                                row.getLong("id"),
                                row.getString("code"),
                                row.getString("name"),
                                ZoneId.of(row.getString("zone"))),
                        Columns.role(row)))
                .list();
    }

    @Override
    public void saveSignInFailures(long personId, int failures, @Nullable Instant lockedUntil) {
        handle.createUpdate("UPDATE person SET failures = :failures, locked_until = :until WHERE id = :id")
                .bind("failures", failures)
                .bindByType("until", lockedUntil, Instant.class)
                .bind("id", personId)
                .execute();
    }

    @Override
    public void addSession(String tokenHash, long personId, String csrf, Instant now, Instant expiresAt) {
        handle.createUpdate("""
                        INSERT INTO browser_session (token_hash, person_id, csrf, created_at, expires_at)
                        VALUES (:hash, :person, :csrf, :now, :expires)
                        """)
                .bind("hash", tokenHash)
                .bind("person", personId)
                .bind("csrf", csrf)
                .bind("now", now)
                .bind("expires", expiresAt)
                .execute();
    }

    @Override
    public Optional<Session> session(String tokenHash) {
        return handle.createQuery("SELECT * FROM browser_session WHERE token_hash = :hash")
                .bind("hash", tokenHash)
                .map((row, context) ->
                        new Session(row.getLong("person_id"), row.getString("csrf"), Sql.instant(row, "expires_at")))
                .findOne();
    }

    @Override
    public void removeSession(String tokenHash) {
        handle.createUpdate("DELETE FROM browser_session WHERE token_hash = :hash")
                .bind("hash", tokenHash)
                .execute();
    }

    @Override
    public void removeSessionsExpiredBy(Instant time) {
        handle.createUpdate("DELETE FROM browser_session WHERE expires_at <= :time")
                .bind("time", time)
                .execute();
    }

    @Override
    public void removeSessionsOf(long personId) {
        handle.createUpdate("DELETE FROM browser_session WHERE person_id = :person")
                .bind("person", personId)
                .execute();
    }

    @Override
    public List<Subscriber> subscribers(long siteId) {
        return handle.createQuery("SELECT * FROM subscriber WHERE site_id = :site ORDER BY name")
                .bind("site", siteId)
                .map((row, context) -> subscriber(row))
                .list();
    }

    @Override
    public Subscriber saveSubscriber(Subscriber subscriber) {
        int updated = bound(subscriber, """
                        UPDATE subscriber SET name = :name, email = :email, min_priority = :priority, active = :active
                        WHERE site_id = :site AND code = :code
                        """).execute();
        if (updated == 0) {
            bound(subscriber, """
                            INSERT INTO subscriber (site_id, code, name, email, min_priority, active)
                            VALUES (:site, :code, :name, :email, :priority, :active)
                            """).execute();
        }
        return handle.createQuery("SELECT * FROM subscriber WHERE site_id = :site AND code = :code")
                .bind("site", subscriber.siteId())
                .bind("code", subscriber.code())
                .map((row, context) -> subscriber(row))
                .one();
    }

    private Update bound(Subscriber subscriber, String sql) {
        return handle.createUpdate(sql)
                .bind("site", subscriber.siteId())
                .bind("code", subscriber.code())
                .bind("name", subscriber.name())
                .bind("email", subscriber.email())
                .bind("priority", subscriber.minPriority().code())
                .bind("active", subscriber.active());
    }

    private static Person person(ResultSet row) throws SQLException {
        return new Person(
                row.getLong("id"),
                row.getString("name"),
                row.getString("display_name"),
                row.getString("password_hash"),
                row.getInt("failures"),
                Sql.instantOrNull(row, "locked_until"));
    }

    private static Subscriber subscriber(ResultSet row) throws SQLException {
        return new Subscriber(
                row.getLong("id"),
                row.getLong("site_id"),
                row.getString("code"),
                row.getString("name"),
                row.getString("email"),
                Priority.ofCode(row.getString("min_priority")).orElseThrow(),
                row.getBoolean("active"));
    }
}
