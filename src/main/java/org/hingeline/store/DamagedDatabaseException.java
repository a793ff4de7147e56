package org.hingeline.store;

import java.util.List;

/** Tables and indexes of the embedded database disagree, so that nothing read from it could be trusted. */
public final class DamagedDatabaseException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    DamagedDatabaseException(List<String> faults) {
        super("the database is damaged: " + String.join("; ", faults));
    }
}
