package org.hingeline;

/** A command cannot do what it was asked; the message says why and what would help. */
final class CommandFailure extends RuntimeException {
    private static final long serialVersionUID = 1L;

    CommandFailure(String message) {
        super(message);
    }
}
