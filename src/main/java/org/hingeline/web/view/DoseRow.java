package org.hingeline.web.view;

import org.jspecify.annotations.Nullable;

/**
 * A dose in the list of its tank, in words.
 *
 * @param id the record's
 * @param at when it was put in
 * @param amount "54 g"
 * @param what "anhydrous sodium carbonate, 99 %, lot SA-2291"
 * @param who "Recorded by Lin Sato, confirmed by Ben Ray." with the note
 * @param standing "waits for a second person", "undone by Lin Sato", "corrected by the entry of 14:02"; empty when it stands
 * @param struck whether it counts no more
 * @param foretold "Foretold: pH 7.71 to 7.85, Ω 1.62 to 2.10, once mixed, 30 min after."; empty when nothing was
 * @param verdict how it came out; empty when it cannot have yet
 * @param undo whether the person may take it back now, and until when: "until 14:12"; empty when not
 * @param confirm whether the person can be the second one
 * @param correction the form that corrects it; null when nothing is to be corrected
 */
public record DoseRow(
        String id,
        Moment at,
        String amount,
        String what,
        String who,
        String standing,
        boolean struck,
        String foretold,
        String verdict,
        String undo,
        boolean confirm,
        @Nullable Form correction) {}
