package org.hingeline.web.view;

/**
 * An alert still open, as shown beside its point.
 *
 * @param id for {@code POST /alerts/{id}/acknowledgement}
 * @param sentence what it is about: "Ω below 1.80 since 03:00"
 * @param raised when
 * @param acknowledged who took it on and when ("Ana Reis took this on at 03:05"); empty while nobody has
 */
public record OpenAlert(String id, String sentence, Moment raised, String acknowledged) {
    /** Whether somebody has to take it on yet. */
    public boolean waiting() {
        return acknowledged.isEmpty();
    }
}
