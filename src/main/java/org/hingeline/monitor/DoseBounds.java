package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import org.hingeline.hatchery.Dose;
import org.hingeline.hatchery.Point;
import org.hingeline.monitor.DoseRecords.Rules;
import org.jspecify.annotations.Nullable;

/** What the site allows to be put into a tank. */
final class DoseBounds {
    private static final Duration DAY = Duration.ofHours(24);

    private DoseBounds() {}

    static boolean needsSecondPerson(Rules rules, double massG) {
        return rules.secondPersonAboveG() < Rules.OFF && massG > rules.secondPersonAboveG();
    }

    /**
     * Within 24 hours before or after it: a calendar day would allow twice as much around midnight. What is in the water
     * already has to go on record all the same, so a manager may record it past the bound.
     *
     * @param without a record that this one takes the place of
     * @throws FieldFaultsException when it is too much
     */
    static void requireWithinDay(
            Books books, Rules rules, Point point, Instant at, double massG, @Nullable Long without, boolean allowed) {
        if (rules.maxGramsPerTankAndDay() >= Rules.OFF || allowed || massG == 0) {
            return;
        }
        double given = books.doses().between(point.id(), at.minus(DAY), at.plus(DAY)).stream()
                .filter(Dose::counts)
                .filter(dose -> without == null || dose.id() != without)
                .mapToDouble(dose -> dose.given().massG())
                .sum();
        if (given + massG > rules.maxGramsPerTankAndDay()) {
            throw new FieldFaultsException(
                    "massG",
                    "massG " + massG + " is too much: " + point.name() + " has " + given
                            + " g within 24 hours, and at most " + rules.maxGramsPerTankAndDay()
                            + " g are allowed; what was put in already, more than ten minutes ago, a manager can record");
        }
    }
}
