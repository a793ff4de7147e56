package org.hingeline.dosing;

import java.util.Objects;

/**
 * Something wrong with an input of the water that a dose would stand on: any note refuses the plan.
 *
 * @param quantity what was measured, as it should read in a sentence
 * @param problem what is wrong with it
 * @param detail a sentence for people: since when, which sensor
 */
public record InputNote(String quantity, Problem problem, String detail) {
    /** What can be wrong. */
    public enum Problem {
        STALE("stale", "Measure it again within its age limit."),
        FAILED("failed", "Repair or replace the sensor, then measure again."),
        MISSING("missing", "Measure it."),
        SUSPECT("suspect", "Check it against a bottle sample or a second instrument, then measure again.");

        private final String word;
        private final String lift;

        Problem(String word, String lift) {
            this.word = word;
            this.lift = lift;
        }

        /** The word in codes and sentences. */
        public String word() {
            return word;
        }

        String lift() {
            return lift;
        }
    }

    public InputNote {
        Objects.requireNonNull(quantity, "quantity");
        Objects.requireNonNull(problem, "problem");
        Objects.requireNonNull(detail, "detail");
    }
}
