package org.hingeline.dosing;

/** What a water is at a site, as far as a remedy asks. */
public enum WaterKind {
    /** Comes in from outside. */
    INTAKE,
    /** Kept to be drawn from: storage or a header tank. */
    STORE,
    /** Holds animals: no source for other tanks, since what ails them would spread. */
    TANK
}
