package org.hingeline.alert;

import java.util.Arrays;
import java.util.Optional;

/** How soon a person must act. */
public enum Priority {
    LOW("low"),
    MEDIUM("medium"),
    HIGH("high");

    private final String code;

    Priority(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }

    public boolean atLeast(Priority other) {
        return compareTo(other) >= 0;
    }

    public static Optional<Priority> ofCode(String code) {
        return Arrays.stream(values()).filter(p -> p.code.equals(code)).findFirst();
    }

    public static String codes() {
        return String.join(", ", Arrays.stream(values()).map(Priority::code).toList());
    }
}
