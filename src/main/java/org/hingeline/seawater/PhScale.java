package org.hingeline.seawater;

/** The scales pH is calibrated on. */
public enum PhScale {
    TOTAL,
    SEAWATER,
    FREE,
    NBS
}
