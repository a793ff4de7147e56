package org.hingeline.web.view;

import java.util.Arrays;
import java.util.List;
import org.hingeline.measure.VolumeUnit;
import org.jspecify.annotations.Nullable;

/**
 * The dose page of a tank.
 *
 * @param pointCode the tank
 * @param pointName its name
 * @param waterNow its water in a sentence: "Ω 1.62 ±0.11, pH 7.71, 21.9 °C, 2 min ago"
 * @param waterAt the moment of that water, ISO 8601; empty when nothing was ever measured
 * @param form fields targetOmega, volume, volumeUnit (UCUM), hydration (anhydrous, monohydrate, decahydrate), assayPercent, stockGramsPerLitre,
 *     phTotalMax, omegaAragoniteMax, phPerHourMax
 * @param result what was worked out; null before the form is sent
 * @param record the form that records what was put in; null without a plan
 */
public record DoseView(
        String pointCode,
        String pointName,
        String waterNow,
        String waterAt,
        Form form,
        @Nullable Result result,
        @Nullable RecordView record) {

    /** With nothing to record. */
    public DoseView(
            String pointCode, String pointName, String waterNow, String waterAt, Form form, @Nullable Result result) {
        this(pointCode, pointName, waterNow, waterAt, form, result, null);
    }

    /** How the planning came out. */
    public enum Outcome {
        PLAN,
        NOT_NEEDED,
        REFUSED
    }

    /**
     * A suggestion or the reasons why there is none. All amounts are words ready to show.
     *
     * @param outcome how it came out
     * @param sentence the outcome in a sentence: "160 g of anhydrous sodium carbonate in 3 steps would bring Ω to 2.50."
     * @param mass "160 g"; empty without a plan
     * @param massLow "142 g"
     * @param massHigh "179 g"
     * @param steps what to put in and when
     * @param waters before, after, and after aeration, one line per quantity
     * @param remedies what helps without a chemical, first choice first
     * @param cautions what to mind, gravest first
     * @param reasons why it was refused
     */
    public record Result(
            Outcome outcome,
            String sentence,
            String mass,
            String massLow,
            String massHigh,
            List<Step> steps,
            List<WaterLine> waters,
            List<String> remedies,
            List<String> cautions,
            List<Reason> reasons) {
        public Result {
            steps = List.copyOf(steps);
            waters = List.copyOf(waters);
            remedies = List.copyOf(remedies);
            cautions = List.copyOf(cautions);
            reasons = List.copyOf(reasons);
        }
    }

    /** One step: when ("at once", "after 30 min"), grams ("54 g"), stock ("1 080 mL"), and what pH and Ω to expect after it. */
    public record Step(String when, String mass, String stock, String ph, String omega) {}

    /** One quantity of the water before, after, and after aeration; a state that is not foreseen is empty. */
    public record WaterLine(String quantity, String before, String after, String afterAeration) {}

    /** Why a plan was refused, and what would lift that. */
    public record Reason(String why, String lift) {}

    /** The units a tank's volume may be given in. */
    public static List<Choice> volumeUnits() {
        return Arrays.stream(VolumeUnit.values())
                .map(unit -> new Choice(unit.ucum(), unit.label()))
                .toList();
    }

    /** The forms of sodium carbonate sold, with what sets them apart. */
    public static List<Choice> hydrations() {
        return List.of(
                new Choice("anhydrous", "anhydrous, Na₂CO₃ (dense or light soda ash)"),
                new Choice("monohydrate", "monohydrate, Na₂CO₃·H₂O"),
                new Choice("decahydrate", "decahydrate, Na₂CO₃·10H₂O (washing soda, clear crystals)"));
    }
}
