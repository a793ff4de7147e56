package org.hingeline.store;

/** Another running process has the embedded database open: nothing is wrong with it, it is only taken. */
public final class DatabaseInUseException extends StoreException {
    private static final long serialVersionUID = 1L;

    DatabaseInUseException(String message, Throwable cause) {
        super(message, cause);
    }
}
