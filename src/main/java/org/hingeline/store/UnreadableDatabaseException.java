package org.hingeline.store;

/** The file of the embedded database is gone, or its content is such that the engine cannot open it. */
public final class UnreadableDatabaseException extends StoreException {
    private static final long serialVersionUID = 1L;

    UnreadableDatabaseException(String message, Throwable cause) {
        super(message, cause);
    }

    UnreadableDatabaseException(String message) {
        super(message);
    }
}
