package org.hingeline.web.view;

import java.util.List;
import java.util.stream.Stream;

/**
 * One point on the water's way, in words.
 *
 * @param code as in links
 * @param name as people call it
 * @param place where on the way it lies
 * @param standing picks mark and hatch
 * @param verdict the standing in words, completing "Larval 3 is …": "fit", "short of carbonate", "too warm", "not known"
 * @param omega Ω aragonite to two decimals, "1.62"; empty when not known
 * @param plusMinus its standard uncertainty, "0.11"; empty when not known
 * @param against how that compares with the limit: "under your 1.80 for 12 min", "your limit is 1.80"; may be empty
 * @param measured when the newest input of this state was read
 * @param notes what was missing or needs caution, one sentence each: "alkalinity 80 h old, older than the 72 h allowed"
 * @param action what to do now: "Close the intake valve; draw from storage."; empty when nothing
 * @param batch who lives there: "C. gigas, 31 h after spawn: first shell"; empty when nobody
 * @param alerts open alerts of this point, most urgent first
 * @param dosable whether a dose can be planned here
 * @param judged whether any limit is set, so that somebody is told
 * @param urgency of what is to be done: 0 for nothing, 1 for low priority to 3 for high
 */
public record PathPoint(
        String code,
        String name,
        Place place,
        Standing standing,
        String verdict,
        String omega,
        String plusMinus,
        String against,
        Moment measured,
        List<String> notes,
        String action,
        String batch,
        List<OpenAlert> alerts,
        boolean dosable,
        boolean judged,
        int urgency) {
    public PathPoint {
        notes = List.copyOf(notes);
        alerts = List.copyOf(alerts);
    }

    /** The same with one more note behind the others. */
    public PathPoint withNote(String note) {
        return new PathPoint(
                code,
                name,
                place,
                standing,
                verdict,
                omega,
                plusMinus,
                against,
                measured,
                Stream.concat(notes.stream(), Stream.of(note)).toList(),
                action,
                batch,
                alerts,
                dosable,
                judged,
                urgency);
    }
}
