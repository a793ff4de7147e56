package org.hingeline.monitor;

/** Texts that came from outside and go into a message or a table. */
final class Texts {
    private static final int SHOWN = 60;

    private Texts() {}

    /** In quotes, cut to what a message can carry, with a mark in place of what cannot be shown or stored. */
    static String quoted(String text) {
        String cut = text.length() > SHOWN ? text.substring(0, SHOWN) + "…" : text;
        return "\"" + cut.replaceAll("[\\p{Cntrl}\\p{Cs}]", "\ufffd") + "\"";
    }

    /** Whether the text has control characters other than line breaks and tabs; PostgreSQL cannot store all of them. */
    static boolean hasControls(String text) {
        return text.chars().anyMatch(c -> Character.isISOControl(c) && c != '\n' && c != '\r' && c != '\t');
    }
}
