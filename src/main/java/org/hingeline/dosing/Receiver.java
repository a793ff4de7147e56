package org.hingeline.dosing;

/** What receives the dose. */
public sealed interface Receiver {
    /** The water that a mass is counted for, L: what a tank holds, or what flows past in an hour. */
    double litresDosed();

    /** Whether a mass is put in at once, a step at a time. */
    boolean charged();

    /** What must be injected in an hour, once a mass for {@link #litresDosed} has done its work, as a share of it. */
    double injectedPerHour();

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

        @Override
        public boolean charged() {
            return true;
        }

        @Override
        public double injectedPerHour() {
            return 0;
        }
    }

    /**
     * A line that stock is injected into as long as it flows.
     *
     * @param flowLMin L/min, above 0 to 1,000,000
     */
    record Flow(double flowLMin) implements Receiver {
        @Override
        public double litresDosed() {
            return flowLMin * 60;
        }

        @Override
        public boolean charged() {
            return false;
        }

        @Override
        public double injectedPerHour() {
            return 1;
        }
    }

    /**
     * A mixed tank that water flows through: a first charge, and make-up for what is washed out, of which exp(−Q t/V) is
     * left after a time t. What flows in counts as like the water that is dosed.
     *
     * @param volumeL the water in it, V, L
     * @param flowLMin what flows through, Q, L/min
     */
    record FlowThrough(double volumeL, double flowLMin) implements Receiver {
        @Override
        public double litresDosed() {
            return volumeL;
        }

        @Override
        public boolean charged() {
            return true;
        }

        @Override
        public double injectedPerHour() {
            return flowLMin * 60 / volumeL;
        }

        /** The share of a dose that is left after so many minutes without make-up. */
        public double leftAfter(double minutes) {
            return Math.exp(-flowLMin * minutes / volumeL);
        }

        /** How long until half of a dose is washed out, min. */
        public double halfLifeMinutes() {
            return Math.log(2) * volumeL / flowLMin;
        }
    }
}
