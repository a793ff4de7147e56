package org.hingeline.seawater;

import java.util.Objects;

/**
 * Something a person should know before relying on a result or acting on it.
 *
 * @param code a stable name in lower-case words joined by hyphens, for programs
 * @param detail a sentence for people
 */
public record Caution(String code, String detail) {
    public Caution {
        Objects.requireNonNull(code, "code");
        Objects.requireNonNull(detail, "detail");
        if (code.isBlank() || detail.isBlank()) {
            throw new IllegalArgumentException(
                    "a caution needs a code and a detail, got '" + code + "', '" + detail + "'");
        }
    }
}
