package org.hingeline.monitor;

import java.util.Arrays;
import java.util.Optional;

/** What a person or an access token may do at a site; each may do what the ones before it may. */
public enum Role {
    /** Sees. */
    VIEWER("viewer"),
    /** Acknowledges, plans and records doses, edits limits. */
    OPERATOR("operator"),
    /** Sets up points, sensors, people, subscribers and keys. */
    MANAGER("manager");

    private final String code;

    Role(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }

    public boolean atLeast(Role other) {
        return compareTo(other) >= 0;
    }

    public static Optional<Role> ofCode(String code) {
        return Arrays.stream(values()).filter(r -> r.code.equals(code)).findFirst();
    }

    public static String codes() {
        return String.join(", ", Arrays.stream(values()).map(Role::code).toList());
    }
}
