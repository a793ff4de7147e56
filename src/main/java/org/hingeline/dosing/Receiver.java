package org.hingeline.dosing;

/** What receives the dose. */
public sealed interface Receiver {
    /** The water that a mass is counted for, L. */
    double litresDosed();

    /**
     * A tank that is mixed and has no flow through it while it is dosed.
     *
     * @param volumeL the water in it, L, above 0 to 10,000,000
     */
    record Tank(double volumeL) implements Receiver {
        @Override
        public double litresDosed() {
            return volumeL;
        }
    }
}
