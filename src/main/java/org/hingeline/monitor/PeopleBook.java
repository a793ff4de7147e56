package org.hingeline.monitor;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Site;
import org.jspecify.annotations.Nullable;

/** People, sessions, keys, tokens and subscribers. Secrets are here as hashes only. */
public interface PeopleBook {

    /** A person who can sign in. */
    record Person(
            long id,
            String name,
            String displayName,
            String passwordHash,
            int failures,
            @Nullable Instant lockedUntil) {}

    /** What a person may do at one site. */
    record Membership(Site site, Role role) {}

    /** A person and what they may do at the site asked for. */
    record PersonAtSite(Person person, Role role) {}

    /** A signed-in browser. */
    record Session(long personId, String csrf, Instant expiresAt) {}

    /** Someone who is told about alerts. */
    record Subscriber(
            long id, long siteId, String code, String name, String email, Priority minPriority, boolean active) {}

    int countPeople();

    Optional<Person> personByName(String name);

    Optional<Person> person(long personId);

    /** The same, kept from other nodes until the transaction ends. */
    Optional<Person> lockPerson(long personId);

    List<PersonAtSite> peopleOf(long siteId);

    /** Adds a person or gives an existing one of that name the new display name and password. */
    long savePerson(String name, String displayName, String passwordHash, Instant now);

    void saveMembership(long personId, long siteId, Role role);

    List<Membership> memberships(long personId);

    void saveSignInFailures(long personId, int failures, @Nullable Instant lockedUntil);

    void addSession(String tokenHash, long personId, String csrf, Instant now, Instant expiresAt);

    Optional<Session> session(String tokenHash);

    void removeSession(String tokenHash);

    void removeSessionsExpiredBy(Instant time);

    void removeSessionsOf(long personId);

    List<Subscriber> subscribers(long siteId);

    /** Saves by code within the site. */
    Subscriber saveSubscriber(Subscriber subscriber);
}
