package org.hingeline.dosing;

import java.util.Set;

/**
 * A hazard statement of the Globally Harmonized System (GHS).
 *
 * @param code for example H319
 * @param words the statement
 */
public record Hazard(String code, String words) {
    private static final Set<String> CORROSIVE = Set.of("H290", "H314", "H318");

    /** Whether it puts the corrosion sign (GHS05) on the label. */
    boolean corrosive() {
        return CORROSIVE.contains(code);
    }
}
