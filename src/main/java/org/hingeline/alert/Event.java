package org.hingeline.alert;

/** What can happen to a limit. */
public sealed interface Event {
    /** A value of its quantity became known. */
    record Observed(Observation observation) implements Event {}

    /** Time passed. */
    record Tick() implements Event {}

    /** A person acknowledged the alert. */
    record Acknowledged() implements Event {}

    /** The limit was taken away. */
    record Retired() implements Event {}
}
