package org.hingeline.web.view;

/** How the water of a point stands. It picks the mark, the line and the hatch; the words beside them say the same. */
public enum Standing {
    /** Within every limit set for the point. */
    FIT("fit"),
    /** Past at least one limit. */
    SHORT("short"),
    /** Cannot be told: an input is missing or too old, or no limit is set. */
    UNKNOWN("not known");

    private final String word;

    Standing(String word) {
        this.word = word;
    }

    /** The word for it, as in legends. */
    public String word() {
        return word;
    }

    /** The name used in style sheets: {@code fit}, {@code short}, {@code unknown}. */
    public String css() {
        return switch (this) {
            case FIT -> "fit";
            case SHORT -> "short";
            case UNKNOWN -> "unknown";
        };
    }
}
