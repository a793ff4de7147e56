package org.hingeline.web.view;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The calculator: what was measured, the whole water, and where each number came from.
 *
 * @param form the fields that {@link CalculatorFields} names
 * @param source the point's water that the numbers came from; null when a person brought their own
 * @param worked the water; null before the form is sent, and when it was refused
 */
public record CalculatorView(
        Form form, @Nullable Source source, @Nullable Worked worked) {

    /**
     * The water state of a point.
     *
     * @param pointCode the point
     * @param pointName its name
     * @param at the moment of the state
     * @param origins where each input came from
     * @param missing what was missing, one sentence each
     * @param notes what to know about the state, one sentence each
     * @param changed what the person has changed since, in a sentence: "You changed pH"; empty when nothing
     * @param was the point's own Ω: "1.62 ±0.11"; empty when it was not known
     */
    public record Source(
            String pointCode,
            String pointName,
            Moment at,
            List<Origin> origins,
            List<String> missing,
            List<String> notes,
            String changed,
            String was) {
        public Source {
            origins = List.copyOf(origins);
            missing = List.copyOf(missing);
            notes = List.copyOf(notes);
        }
    }

    /**
     * Where an input came from.
     *
     * @param quantity "pH"
     * @param value "7.71"
     * @param plusMinus its registered standard uncertainty; empty when the sensor is not registered any more
     * @param unit its unit, or the scale of a pH
     * @param from "sensor ph-3"
     * @param read when
     * @param age how old it was when it was used: "2 min old"
     * @param flag what quality control thought of it
     */
    public record Origin(
            String quantity,
            String value,
            String plusMinus,
            String unit,
            String from,
            Moment read,
            String age,
            String flag) {}

    /**
     * A solved water.
     *
     * @param omega Ω aragonite
     * @param plusMinus its standard uncertainty
     * @param standing picks the mark: fit or short against the limit, not known without one
     * @param sentence what that Ω means
     * @param against how it compares with the limit; empty without one
     * @param cautions what to know before relying on it
     * @param state the whole state
     * @param scales the pH on every scale
     * @param ammonia un-ionised ammonia; empty when not asked for
     * @param origins what the ± of Ω comes from, the largest first: "pH ±0.06"
     * @param shares where the ± of each quantity comes from
     * @param becomes what the water would become; null when not asked for
     * @param picture Ω against the two inputs
     * @param methods what was computed by whose work
     * @param digits all numbers with all digits, to be copied
     */
    public record Worked(
            String omega,
            String plusMinus,
            Standing standing,
            String sentence,
            String against,
            List<String> cautions,
            List<Line> state,
            List<Line> scales,
            List<Line> ammonia,
            List<String> origins,
            List<Share> shares,
            @Nullable Becomes becomes,
            OmegaPicture picture,
            List<Method> methods,
            String digits) {
        public Worked {
            cautions = List.copyOf(cautions);
            state = List.copyOf(state);
            scales = List.copyOf(scales);
            ammonia = List.copyOf(ammonia);
            origins = List.copyOf(origins);
            shares = List.copyOf(shares);
            methods = List.copyOf(methods);
        }
    }

    /** A quantity: its value, its standard uncertainty and unit (either may be empty), and the same in another unit (may be empty). */
    public record Line(String name, String value, String plusMinus, String unit, String also) {}

    /** A quantity's standard uncertainty, and its shares from the constants and from what was measured. */
    public record Share(String name, String total, String fromConstants, String fromInputs) {}

    /** What a quantity is computed with: "carbonic acid, K1 and K2", "Lueker, Dickson and Keeling 2000". */
    public record Method(String what, String by) {}

    /**
     * The water beside what it would become.
     *
     * @param heads what was done: "now", "at 25 °C, closed"
     * @param rows a quantity in each of them
     */
    public record Becomes(List<String> heads, List<Row> rows, List<String> cautions) {
        public Becomes {
            heads = List.copyOf(heads);
            rows = List.copyOf(rows);
            cautions = List.copyOf(cautions);
        }
    }

    /** One quantity, now and after each treatment. */
    public record Row(String name, List<Cell> cells) {
        public Row {
            cells = List.copyOf(cells);
        }
    }

    /** A value with its standard uncertainty (may be empty). */
    public record Cell(String value, String plusMinus) {}
}
