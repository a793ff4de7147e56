package org.hingeline.config;

import java.util.List;

/** Settings that cannot be used; says everything that is wrong with them at once. */
public final class BadSettings extends RuntimeException {
    private final transient List<String> problems;

    BadSettings(String source, List<String> problems) {
        super(source + " cannot be used:\n  " + String.join("\n  ", problems));
        this.problems = List.copyOf(problems);
    }

    /** One sentence each: the key's path, the value and what would be accepted. */
    public List<String> problems() {
        return problems;
    }
}
