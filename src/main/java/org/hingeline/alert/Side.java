package org.hingeline.alert;

/** On which side of the threshold the water is out of its limit. */
public enum Side {
    BELOW,
    ABOVE;

    /** The word on the wire and in sentences. */
    public String code() {
        return this == BELOW ? "below" : "above";
    }

    /** "under" or "over", as a person says it. */
    public String word() {
        return this == BELOW ? "under" : "over";
    }

    boolean out(double value, double threshold) {
        return this == BELOW ? value < threshold : value > threshold;
    }

    boolean back(double value, double threshold, double deadband) {
        return this == BELOW ? value >= threshold + deadband : value <= threshold - deadband;
    }
}
