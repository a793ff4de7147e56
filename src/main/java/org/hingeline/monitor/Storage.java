package org.hingeline.monitor;

import java.util.function.Consumer;
import java.util.function.Function;

/**
 * The database as the use cases see it.
 *
 * <p>When {@link #write} returns, what was written is on disk: a crash or a power cut after it loses nothing.
 */
public interface Storage {
    /**
     * One transaction, all or nothing. A transaction that loses a race against another node is run again, so the work
     * must have no effect outside the database.
     */
    <T> T write(Function<Books, T> work);

    /** Reads a consistent enough picture; writes nothing. */
    <T> T read(Function<Books, T> work);

    default void writeOnly(Consumer<Books> work) {
        write(books -> {
            work.accept(books);
            return true;
        });
    }
}
