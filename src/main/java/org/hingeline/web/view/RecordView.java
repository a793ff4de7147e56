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
 * @param form fields massG, lot, note; and key, agent, hydration, assayPercent, volumeL, followedPlan as they were
 */
public record RecordView(String pointCode, String pointName, String corrects, String what, String hint, Form form) {
    /** Fields that nobody has to type. */
    public static final List<String> KEPT =
            List.of("key", "agent", "hydration", "assayPercent", "volumeL", "followedPlan");
}
