package org.hingeline.monitor;

/** A row cannot be taken; the message names the field, the value and what would be accepted. */
final class RowRefusedException extends Exception {
    private static final long serialVersionUID = 1L;

    RowRefusedException(String detail) {
        super(detail, null, false, false);
    }
}
