package org.hingeline.alert;

import java.util.Arrays;

/** The states of ISA-18.2 / IEC 62682 that an alert passes through. */
public enum Phase {
    NORMAL("normal"),
    UNACKNOWLEDGED("unacknowledged"),
    ACKNOWLEDGED("acknowledged"),
    RETURNED_UNACKNOWLEDGED("returned-unacknowledged");

    private final String code;

    Phase(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }

    /** Whether an alert exists that somebody still has to see to or that still stands. */
    public boolean open() {
        return this != NORMAL;
    }

    public static Phase ofCode(String code) {
        return Arrays.stream(values())
                .filter(p -> p.code.equals(code))
                .findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no alert state is called " + code));
    }
}
