package org.hingeline.store;

import java.util.List;

/** Tables and indexes of the embedded database disagree, so that nothing read from it could be trusted. */
public final class DamagedDatabaseException extends RuntimeException {
    private static final long serialVersionUID = 1L;
    private static final int TOLD = 5;

    DamagedDatabaseException(List<String> faults) {
        super("the database is damaged: " + String.join("; ", faults.subList(0, Math.min(TOLD, faults.size())))
                + (faults.size() > TOLD ? "; and " + (faults.size() - TOLD) + " more" : ""));
    }
}
