package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;

/**
 * Something to do that needs no chemical.
 *
 * @param code a stable name for programs
 * @param detail a sentence for people
 * @param reaches the water it leads to
 * @param reachesTarget whether that water is at the target or better
 */
public record Remedy(String code, String detail, CarbonateState reaches, boolean reachesTarget) {}
