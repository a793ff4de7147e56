package org.hingeline.monitor;

import java.util.List;
import java.util.stream.Collectors;

/** Fields that cannot be taken, with what would be accepted. */
public final class FieldFaultsException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final transient List<FieldFaults.Fault> faults;

    public FieldFaultsException(List<FieldFaults.Fault> faults) {
        super(faults.stream().map(FieldFaults.Fault::detail).collect(Collectors.joining("; ")));
        this.faults = List.copyOf(faults);
    }

    public FieldFaultsException(String field, String detail) {
        this(List.of(new FieldFaults.Fault(field, detail)));
    }

    public List<FieldFaults.Fault> faults() {
        return faults;
    }
}
