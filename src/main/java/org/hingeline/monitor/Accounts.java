package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Codes;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.KeyBook.AccessToken;
import org.hingeline.monitor.KeyBook.GatewayKey;
import org.hingeline.monitor.PeopleBook.Membership;
import org.hingeline.monitor.PeopleBook.Person;
import org.hingeline.monitor.PeopleBook.Session;

/** Who may come in: sign-in with lockout, sessions, access tokens, gateway keys, and the making of each. */
public final class Accounts {

    /** How sign-in is guarded. */
    public record Rules(Duration session, int lockAfterFailures, Duration lock, int minPasswordLength) {}

    /** What came of an attempt to sign in. */
    public sealed interface SignIn {
        /** Come in; the token goes into the cookie. */
        record Welcome(String token, Duration session) implements SignIn {}

        /** Name or password do not match. */
        record Wrong() implements SignIn {}

        /** Too many attempts at once; this one was not looked at. */
        record Busy() implements SignIn {}

        /** Too many failures; no attempt is looked at before this time. */
        record Locked(Instant until) implements SignIn {}
    }

    private static final int MAX_PASSWORD = 200;

    private final Storage storage;
    private final InstantSource clock;
    private final Rules rules;
    private final Secrets secrets;
    private final Passwords passwords;
    private final String nobodysHash;

    public Accounts(Storage storage, InstantSource clock, Rules rules, Secrets secrets, Passwords passwords) {
        this.storage = storage;
        this.clock = clock;
        this.rules = rules;
        this.secrets = secrets;
        this.passwords = passwords;
        this.nobodysHash = passwords.hash(secrets.make(""));
    }

    public SignIn signIn(String name, String password) {
        Instant now = clock.instant();
        Optional<Person> found = storage.read(books -> books.people().personByName(name));
        if (found.isPresent()) {
            Instant until = found.get().lockedUntil();
            if (until != null && until.isAfter(now)) {
                return new SignIn.Locked(until);
            }
        }
        // an unknown name takes as long as a wrong password, so that nobody can find out which names exist
        Optional<Boolean> right = password.length() > MAX_PASSWORD
                ? Optional.of(false)
                : passwords.matchesSoon(
                        password, found.map(Person::passwordHash).orElse(nobodysHash));
        if (right.isEmpty()) {
            return new SignIn.Busy();
        }
        if (found.isEmpty()) {
            return new SignIn.Wrong();
        }
        return right.get() ? welcome(found.get().id(), now) : refuse(found.get().id(), now);
    }

    private SignIn welcome(long personId, Instant now) {
        String token = secrets.make("");
        String csrf = secrets.make("");
        return storage.write(books -> {
            Person person = books.people().lockPerson(personId).orElseThrow();
            Instant until = person.lockedUntil();
            if (until != null && until.isAfter(now)) {
                return new SignIn.Locked(until);
            }
            books.people().saveSignInFailures(personId, 0, null);
            books.people().addSession(Secrets.hash(token), personId, csrf, now, now.plus(rules.session()));
            return new SignIn.Welcome(token, rules.session());
        });
    }

    private SignIn refuse(long personId, Instant now) {
        return storage.write(books -> {
            // looked at again behind the hashing: attempts made at the same time must not undo a lock
            Person person = books.people().lockPerson(personId).orElseThrow();
            Instant standing = person.lockedUntil();
            if (standing != null && standing.isAfter(now)) {
                return new SignIn.Locked(standing);
            }
            int failures = person.failures() + 1;
            boolean lock = failures >= rules.lockAfterFailures();
            Instant until = lock ? now.plus(rules.lock()) : null;
            books.people().saveSignInFailures(personId, lock ? 0 : failures, until);
            return until == null ? new SignIn.Wrong() : new SignIn.Locked(until);
        });
    }

    public void signOut(String token) {
        storage.writeOnly(books -> books.people().removeSession(Secrets.hash(token)));
    }

    /** The person behind a session cookie. */
    public Optional<Caller> bySession(String token) {
        Instant now = clock.instant();
        return storage.read(books -> {
            Optional<Session> session = books.people()
                    .session(Secrets.hash(token))
                    .filter(s -> s.expiresAt().isAfter(now));
            return session.flatMap(s -> books.people()
                    .person(s.personId())
                    .map(person -> new Caller(
                            person.displayName(), s.csrf(), books.people().memberships(person.id()))));
        });
    }

    /** The script behind an access token. */
    public Optional<Caller> byToken(String token) {
        return storage.read(books -> books.keys()
                .accessToken(Secrets.hash(token))
                .map(found -> {
                    Site site = books.place().site(found.siteId()).orElseThrow();
                    return new Caller("token " + found.name(), "", List.of(new Membership(site, found.role())));
                }));
    }

    /** The gateway behind a key. */
    public Optional<GatewayKey> byGatewayKey(String key) {
        return storage.read(books -> books.keys().gatewayKey(Secrets.hash(key)));
    }

    /** Whether nobody can sign in yet. */
    public boolean nobodyYet() {
        return storage.read(books -> books.people().countPeople()) == 0;
    }

    /**
     * Adds a person to a site, or gives a known one a new password and role there.
     *
     * @throws FieldFaultsException when a field cannot be taken
     */
    public void savePerson(Site site, String name, String displayName, String password, Role role, String who) {
        FieldFaults faults = new FieldFaults();
        if (!Codes.isCode(name)) {
            faults.add("name", "name \"" + name + "\" is not " + Codes.SHAPE);
        }
        if (displayName.isBlank() || displayName.length() > 80) {
            faults.add("displayName", "the name to show must have 1 to 80 characters");
        }
        checkPassword(password, faults);
        faults.throwIfAny();
        String hash = passwords.hash(password);
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            Optional<Person> known = books.people().personByName(name);
            known.ifPresent(person -> checkIsOnlyOf(site, name, books.people().memberships(person.id())));
            long id = books.people().savePerson(name, displayName, hash, now);
            books.people().removeSessionsOf(id);
            books.people().saveMembership(id, site.id(), role);
            journal(books, now, site, who, "person-saved", name, "role " + role.code());
        });
    }

    /** A person of another site too is not for this site to change: their password opens that site as well. */
    private static void checkIsOnlyOf(Site site, String name, List<Membership> memberships) {
        if (memberships.stream().noneMatch(m -> m.site().id() == site.id())) {
            throw new FieldFaultsException("name", "name \"" + name + "\" is taken; choose another");
        }
        if (memberships.size() > 1) {
            throw new FieldFaultsException(
                    "name",
                    "\"" + name
                            + "\" signs in at other sites too; only whoever runs the service can change their password"
                            + " or role, with add-person --known");
        }
    }

    /**
     * Gives somebody who signs in already a role at another site, or another role there; their password stays as it is.
     *
     * @throws FieldFaultsException when nobody has this name
     */
    public void addToSite(Site site, String name, Role role, String who) {
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            Person known = books.people()
                    .personByName(name)
                    .orElseThrow(() -> new FieldFaultsException("name", "nobody signs in as \"" + name + "\""));
            books.people().saveMembership(known.id(), site.id(), role);
            journal(books, now, site, who, "person-saved", name, "role " + role.code());
        });
    }

    /**
     * Gives somebody who signs in already another password, at all their sites; only for whoever runs the service.
     *
     * @throws FieldFaultsException when nobody has this name or the password cannot be taken
     */
    public void setPassword(Site site, String name, String password, String who) {
        FieldFaults faults = new FieldFaults();
        checkPassword(password, faults);
        faults.throwIfAny();
        String hash = passwords.hash(password);
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            Person known = books.people()
                    .personByName(name)
                    .orElseThrow(() -> new FieldFaultsException("name", "nobody signs in as \"" + name + "\""));
            books.people().savePerson(name, known.displayName(), hash, now);
            books.people().removeSessionsOf(known.id());
            journal(books, now, site, who, "password-set", name, "");
        });
    }

    private void checkPassword(String password, FieldFaults faults) {
        if (password.length() < rules.minPasswordLength() || password.length() > MAX_PASSWORD) {
            faults.add(
                    "password",
                    "the password has " + password.length() + " characters; it needs " + rules.minPasswordLength()
                            + " to " + MAX_PASSWORD);
        }
    }

    /** @return the key, to be shown this once */
    public String makeGatewayKey(Site site, String gateway, String who) {
        checkName("gateway", gateway);
        String key = secrets.make("hgk_");
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            books.keys().addGatewayKey(site.id(), gateway.strip(), Secrets.hash(key), now);
            journal(books, now, site, who, "gateway-key-made", gateway, "");
        });
        return key;
    }

    /** @return the token, to be shown this once */
    public String makeAccessToken(Site site, String name, Role role, String who) {
        checkName("name", name);
        String token = secrets.make("hat_");
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            books.keys().addAccessToken(site.id(), name.strip(), role, Secrets.hash(token), now);
            journal(books, now, site, who, "access-token-made", name, "role " + role.code());
        });
        return token;
    }

    /** @return whether there was such a key in use */
    public boolean revokeGatewayKey(Site site, long id, String who) {
        Instant now = clock.instant();
        return storage.write(books -> {
            boolean done = books.keys().revokeGatewayKey(site.id(), id, now);
            if (done) {
                journal(books, now, site, who, "gateway-key-revoked", "key " + id, "");
            }
            return done;
        });
    }

    /** @return whether there was such a token in use */
    public boolean revokeAccessToken(Site site, long id, String who) {
        Instant now = clock.instant();
        return storage.write(books -> {
            boolean done = books.keys().revokeAccessToken(site.id(), id, now);
            if (done) {
                journal(books, now, site, who, "access-token-revoked", "token " + id, "");
            }
            return done;
        });
    }

    public List<GatewayKey> gatewayKeys(Site site) {
        return storage.read(books -> books.keys().gatewayKeys(site.id()));
    }

    public List<AccessToken> accessTokens(Site site) {
        return storage.read(books -> books.keys().accessTokens(site.id()));
    }

    public List<PeopleBook.PersonAtSite> people(Site site) {
        return storage.read(books -> books.people().peopleOf(site.id()));
    }

    private static void checkName(String field, String name) {
        if (name.isBlank() || name.strip().length() > 80) {
            throw new FieldFaultsException(field, field + " must have 1 to 80 characters");
        }
    }

    private static void journal(
            Books books, Instant now, Site site, String who, String what, String subject, String detail) {
        books.journal().add(new JournalBook.Entry(now, site.id(), who, what, subject, detail));
    }
}
