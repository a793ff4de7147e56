package org.hingeline.web.view;

/**
 * A limit of a point, in words, with the form that changes it.
 *
 * @param name as in {@code POST /points/{code}/limits/{name}}
 * @param rule "Ω aragonite below 1.80 for 10 min; ends above 1.85 for 10 min"
 * @param priority "high", "medium", "low"
 * @param action what to do when it is passed
 * @param quantity its code, for the chart
 * @param below lower bound as a plain number for the chart, or empty
 * @param above upper bound as a plain number for the chart, or empty
 * @param form fields name, quantity, below, above, deadband, onDelayMin, offDelayMin, priority, action
 */
public record LimitRow(
        String name,
        String rule,
        String priority,
        String action,
        String quantity,
        String below,
        String above,
        Form form) {}
