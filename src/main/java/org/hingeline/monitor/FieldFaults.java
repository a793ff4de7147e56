package org.hingeline.monitor;

import java.util.ArrayList;
import java.util.List;

/** Collects what is wrong with a form or a request body, so that everything is told at once. */
public final class FieldFaults {

    /**
     * A field that cannot be taken.
     *
     * @param field its name
     * @param detail names the value and what would be accepted
     */
    public record Fault(String field, String detail) {}

    private final List<Fault> faults = new ArrayList<>();

    public void add(String field, String detail) {
        faults.add(new Fault(field, detail));
    }

    public void throwIfAny() {
        if (!faults.isEmpty()) {
            throw new FieldFaultsException(faults);
        }
    }
}
