package org.hingeline.dosing;

/**
 * Why a plan was refused or is not needed.
 *
 * @param code a stable name for programs
 * @param detail a sentence for people, with the value that was given
 * @param lift what would lift it
 */
public record Reason(String code, String detail, String lift) {}
