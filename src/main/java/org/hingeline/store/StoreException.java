package org.hingeline.store;

/** A database failure in words of this program; the cause says it in the driver's. */
public sealed class StoreException extends RuntimeException
        permits DatabaseInUseException, UnreadableDatabaseException {
    private static final long serialVersionUID = 1L;

    StoreException(String message, Throwable cause) {
        super(message, cause);
    }

    StoreException(String message) {
        super(message);
    }
}
