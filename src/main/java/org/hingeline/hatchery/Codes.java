package org.hingeline.hatchery;

import java.util.regex.Pattern;

/** What a code (short name in addresses and on the wire) and a display name may look like. */
public final class Codes {
    /** In words, for error texts. */
    public static final String SHAPE = "1 to 40 small letters, digits and hyphens, starting with a letter or digit";

    private static final Pattern CODE = Pattern.compile("[a-z0-9][a-z0-9-]{0,39}");

    private Codes() {}

    public static boolean isCode(String text) {
        return CODE.matcher(text).matches();
    }

    /** @throws IllegalArgumentException naming the field, the value and what would be accepted */
    public static String check(String field, String code) {
        if (!isCode(code)) {
            throw new IllegalArgumentException(field + " \"" + code + "\" is not " + SHAPE);
        }
        return code;
    }

    /** @throws IllegalArgumentException naming the field and what would be accepted */
    public static String checkName(String field, String name) {
        if (name.isBlank() || name.length() > 80) {
            throw new IllegalArgumentException(field + " \"" + name + "\" must have 1 to 80 characters");
        }
        return name;
    }
}
