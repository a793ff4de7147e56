package org.hingeline.web.view;

/** Where on the water's way a point lies; tanks branch off the line, all others lie on it. */
public enum Place {
    INTAKE("Intake"),
    STORAGE("Storage"),
    HEADER("Header"),
    TANK("Larval tank"),
    DISCHARGE("Discharge");

    private final String word;

    Place(String word) {
        this.word = word;
    }

    /** The word for it. */
    public String word() {
        return word;
    }

    /** Whether the water only passes here on its way on. */
    public boolean onTheLine() {
        return this != TANK;
    }
}
