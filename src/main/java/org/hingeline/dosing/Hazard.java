package org.hingeline.dosing;

/**
 * A hazard statement of the Globally Harmonized System (GHS).
 *
 * @param code for example H319
 * @param words the statement
 */
public record Hazard(String code, String words) {}
