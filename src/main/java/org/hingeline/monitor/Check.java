package org.hingeline.monitor;

/** A part of the service that can say whether it is well. The health check and the status page ask the same ones. */
public interface Check {

    /**
     * What a part says of itself.
     *
     * @param detail in words, safe to show to anybody
     */
    record Result(String part, boolean well, String detail) {}

    Result check();
}
