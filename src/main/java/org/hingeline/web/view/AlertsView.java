package org.hingeline.web.view;

import java.util.List;

/** Alerts: those still open, most urgent first, and those ended lately, newest first. */
public record AlertsView(List<Entry> open, List<Entry> ended) {

    /**
     * One alert with its whole course.
     *
     * @param id for {@code POST /alerts/{id}/acknowledgement}
     * @param pointCode the point it belongs to
     * @param pointName its name
     * @param sentence what happened: "Ω 1.62 ±0.11, under your 1.80"
     * @param priority "high", "medium", "low"
     * @param raised when it began
     * @param acknowledged who took it on, when, and their note: "Ana Reis at 03:05: valve closed"; empty while nobody has
     * @param cleared when it ended; {@link Moment#never()} while open
     * @param action what to do; empty once the water is back
     * @param ofWater whether it is about a water state, so that one can be shown
     * @param told who was told what
     */
    public record Entry(
            String id,
            String pointCode,
            String pointName,
            String sentence,
            String priority,
            Moment raised,
            String acknowledged,
            Moment cleared,
            String action,
            boolean ofWater,
            List<Told> told) {
        public Entry {
            told = List.copyOf(told);
        }

        /** Whether it is open and nobody has taken it on. */
        public boolean waiting() {
            return acknowledged.isEmpty() && !cleared.known();
        }
    }

    /** Somebody told: who, by what ("e-mail"), what ("raised: Ω 1.62 in Larval 3"), and how that stands ("sent 03:01"). */
    public record Told(String who, String channel, String what, String state) {}

    public AlertsView {
        open = List.copyOf(open);
        ended = List.copyOf(ended);
    }
}
