package org.hingeline;

import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import org.hingeline.monitor.Check;
import org.hingeline.monitor.Check.Result;
import org.hingeline.monitor.OutboxBook.Backlog;
import org.hingeline.store.Database;
import org.hingeline.store.StoreException;

/** The parts of the service and what each says of itself. */
final class Checks {
    private static final Duration OVERDUE = Duration.ofMinutes(10);

    private Checks() {}

    static List<Check> of(Database database, Backups backups, InstantSource clock) {
        return backups.possible()
                ? List.of(() -> database(database), () -> outbox(database, clock), () -> backups(backups))
                : List.of(() -> database(database), () -> outbox(database, clock));
    }

    private static Result database(Database database) {
        try {
            database.checkAlive();
            return new Result("database", true, "answers");
        } catch (StoreException e) {
            return new Result("database", false, "does not answer");
        }
    }

    /** A waiting message is worth a warning but no reason to take the service out of use. */
    private static Result outbox(Database database, InstantSource clock) {
        try {
            Backlog backlog = database.read(books -> books.outbox().backlog());
            Instant oldest = backlog.oldest();
            boolean overdue = oldest != null && oldest.plus(OVERDUE).isBefore(clock.instant());
            return new Result(
                    "messages",
                    true,
                    backlog.waiting() + " waiting" + (overdue ? ", the oldest for more than 10 min" : ""));
        } catch (RuntimeException e) {
            return new Result("messages", false, "not known");
        }
    }

    private static Result backups(Backups backups) {
        return new Result(
                "backups",
                true,
                backups.age()
                        .map(age -> "newest is " + age.toHours() + " h old")
                        .orElse("none yet"));
    }
}
