package org.hingeline.hatchery;

import java.util.Arrays;
import java.util.Optional;

/** What a monitoring point is, in the order the water passes. */
public enum PointKind {
    INTAKE("intake", "Intake"),
    STORAGE("storage", "Storage"),
    HEADER("header", "Header tank"),
    LARVAL("larval", "Larval tank"),
    DISCHARGE("discharge", "Discharge");

    private final String code;
    private final String words;

    PointKind(String code, String words) {
        this.code = code;
        this.words = words;
    }

    public String code() {
        return code;
    }

    public String words() {
        return words;
    }

    public static Optional<PointKind> ofCode(String code) {
        return Arrays.stream(values()).filter(k -> k.code.equals(code)).findFirst();
    }

    public static String codes() {
        return String.join(", ", Arrays.stream(values()).map(PointKind::code).toList());
    }
}
