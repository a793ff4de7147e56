package org.hingeline.web.view;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The page of one point.
 *
 * @param point the point as on the status page
 * @param state the whole water state, one line per quantity
 * @param inputs what it was worked out from
 * @param cautions sentences about the state as a whole
 * @param lowest for those without the chart: "Lowest Ω in the last 48 h: 1.58 at 03:02."; empty when there is no state
 * @param lowestAt the moment of that state, ISO 8601; empty when there is none
 * @param limits limits of this point
 * @param added the form for another limit
 * @param undo the change just made, if it can be put back
 * @param doses what was put in of late, newest first
 * @param volume what its doses say of its volume: "Three doses came out short: the tank seems to hold ..."; may be empty
 */
public record PointView(
        PathPoint point,
        List<StateLine> state,
        List<InputLine> inputs,
        List<String> cautions,
        String lowest,
        String lowestAt,
        List<LimitRow> limits,
        Form added,
        @Nullable Undo undo,
        List<DoseRow> doses,
        String volume) {

    /** A quantity of the state: name, value, standard uncertainty (may be empty) and unit (may be empty). */
    public record StateLine(String name, String value, String plusMinus, String unit) {}

    /**
     * An input of the state.
     *
     * @param quantity "pH", "alkalinity"
     * @param value with its unit: "7.71", "2 180 µmol/kg"
     * @param origin where it came from: "sensor ph-3", "conductivity sensor c-3", "bottle sample 12 May", "site setting"
     * @param measured when it was read
     * @param flag what quality control thinks of it: "passed", "suspect: flat line"; may be empty
     */
    public record InputLine(String quantity, String value, String origin, Moment measured, String flag) {}

    public PointView {
        state = List.copyOf(state);
        inputs = List.copyOf(inputs);
        cautions = List.copyOf(cautions);
        limits = List.copyOf(limits);
        doses = List.copyOf(doses);
    }

    /** A point where nothing was dosed. */
    public PointView(
            PathPoint point,
            List<StateLine> state,
            List<InputLine> inputs,
            List<String> cautions,
            String lowest,
            String lowestAt,
            List<LimitRow> limits,
            Form added,
            @Nullable Undo undo) {
        this(point, state, inputs, cautions, lowest, lowestAt, limits, added, undo, List.of(), "");
    }
}
