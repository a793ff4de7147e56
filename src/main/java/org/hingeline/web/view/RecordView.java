package org.hingeline.web.view;

import java.util.List;

/**
 * The short form that records what was put in.
 *
 * @param pointCode the tank
 * @param pointName its name
 * @param corrects id of the entry that is to be corrected; empty for a new one
 * @param what "anhydrous sodium carbonate, 99 %"
 * @param hint what to know before: steps, a second person; may be empty
 * @param bags agents and hydrations to choose from, as {@code agent/hydration}; empty when that is decided
 * @param form fields massG, lot, note; and key, agent, hydration, assayPercent, volumeL, followedPlan as they were
 */
public record RecordView(
        String pointCode, String pointName, String corrects, String what, String hint, List<Choice> bags, Form form) {
    public RecordView {
        bags = List.copyOf(bags);
    }

    /** How long ago it was put in, minutes. */
    public static List<Choice> minutesAgo() {
        return List.of(
                new Choice("0", "just now"),
                new Choice("15", "15 min ago"),
                new Choice("30", "30 min ago"),
                new Choice("60", "1 h ago"),
                new Choice("120", "2 h ago"),
                new Choice("240", "4 h ago"),
                new Choice("480", "8 h ago"),
                new Choice("720", "12 h ago"),
                new Choice("1440", "a day ago"));
    }

    /** Fields that nobody has to type. */
    public static final List<String> KEPT =
            List.of("key", "agent", "hydration", "assayPercent", "volumeL", "followedPlan");
}
