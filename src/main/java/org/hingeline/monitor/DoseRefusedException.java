package org.hingeline.monitor;

/** A change of a dose record that is not open to this person, or not any more. */
public final class DoseRefusedException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    /** Why. */
    public enum Kind {
        NO_SUCH_DOSE,
        /** Somebody else may. */
        NOT_YOURS,
        /** The record has gone on. */
        TOO_LATE
    }

    private final Kind kind;

    DoseRefusedException(Kind kind, String detail) {
        super(detail);
        this.kind = kind;
    }

    public Kind kind() {
        return kind;
    }

    public String detail() {
        return String.valueOf(getMessage());
    }
}
