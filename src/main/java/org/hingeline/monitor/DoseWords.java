package org.hingeline.monitor;

import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Dose.Standing;

/** Doses in words. */
final class DoseWords {
    private DoseWords() {}

    /** A dose in one line, for the journal. */
    static String of(Dose dose) {
        Dose.Given given = dose.given();
        return given.massG() + " g " + given.agent() + " " + given.hydration() + ", assay " + given.assayPercent()
                + " %, lot " + given.lot() + ", put in " + dose.at()
                + (dose.standing() == Standing.PENDING ? ", waits for a second person" : "")
                + (given.note().isEmpty() ? "" : ", note: " + given.note());
    }
}
