package org.hingeline.quality;

/** Data quality flags with the codes of the QARTOD manuals (US IOOS, manual for real-time quality control of pH, 2019). */
public enum Flag {
    PASS(1),
    NOT_EVALUATED(2),
    SUSPECT(3),
    FAIL(4),
    MISSING(9);

    private final int code;

    Flag(int code) {
        this.code = code;
    }

    public int code() {
        return code;
    }

    /** Whether a value with this flag may enter a water state: a failed or missing one never does. */
    public boolean usable() {
        return this != FAIL && this != MISSING;
    }

    public static Flag ofCode(int code) {
        for (Flag flag : values()) {
            if (flag.code == code) {
                return flag;
            }
        }
        throw new IllegalArgumentException("no quality flag has the code " + code + "; known: 1, 2, 3, 4, 9");
    }
}
