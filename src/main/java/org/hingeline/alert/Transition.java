package org.hingeline.alert;

/** The state after an event, and what is to be done about it. */
public record Transition(AlertState state, Effect effect) {

    /** What the shell has to do. */
    public enum Effect {
        NOTHING,
        /** Open an alert and tell people. */
        RAISE,
        /** The open, returned alert stands again: tell people again, open no second one. */
        RAISE_AGAIN,
        /** The water is back, nobody has acknowledged yet. */
        RETURN,
        /** A person has seen it; the alert stands on. */
        ACKNOWLEDGE,
        /** The alert is over. */
        CLOSE
    }
}
