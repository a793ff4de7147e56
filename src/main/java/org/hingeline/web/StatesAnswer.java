package org.hingeline.web;

import io.javalin.http.Context;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.WaterCalculator;
import org.hingeline.monitor.WaterMethod;
import org.hingeline.monitor.WaterWish;
import tools.jackson.core.JsonGenerator;

/**
 * The answer to a list of waters: computed and written a few hundred at a time, so that a long list with everything asked
 * for needs little memory.
 */
final class StatesAnswer {
    private static final int AT_A_TIME = 500;

    private final WaterCalculator calculator;
    private final boolean withUncertainty;
    private final Map<WaterMethod, Integer> methods = new LinkedHashMap<>();
    private long computeNs;
    private long writeNs;

    StatesAnswer(WaterCalculator calculator, boolean withUncertainty) {
        this.calculator = calculator;
        this.withUncertainty = withUncertainty;
    }

    /** @param each a {@link WaterWish} or the {@link Problem} of one that is none */
    void send(List<Object> each, Context ctx) {
        long began = System.nanoTime();
        ctx.contentType("application/json");
        try (JsonGenerator json = Json.MAPPER.createGenerator(ctx.outputStream())) {
            StateJson state = new StateJson(json);
            json.writeStartObject();
            json.writeArrayPropertyStart("states");
            for (int from = 0; from < each.size(); from += AT_A_TIME) {
                List<Object> some = each.subList(from, Math.min(each.size(), from + AT_A_TIME));
                long computing = System.nanoTime();
                List<Object> computed = some.stream().map(this::answer).toList();
                computeNs += System.nanoTime() - computing;
                for (Object one : computed) {
                    write(one, json, state);
                }
            }
            json.writeEndArray();
            json.writeArrayPropertyStart("methods");
            methods.keySet().forEach(state::method);
            json.writeEndArray();
            json.writeEndObject();
        }
        writeNs = System.nanoTime() - began - computeNs;
    }

    private Object answer(Object one) {
        if (!(one instanceof WaterWish wish)) {
            return one;
        }
        try {
            return calculator.calculate(wish, withUncertainty);
        } catch (FieldFaultsException e) {
            return Problem.of(e);
        }
    }

    private void write(Object one, JsonGenerator json, StateJson state) {
        if (one instanceof CalculatedWater water) {
            Integer index = methods.putIfAbsent(water.method(), methods.size());
            state.withMethodIndex(water, index == null ? methods.size() - 1 : index);
        } else {
            json.writePOJO(one);
        }
    }

    long computeNs() {
        return computeNs;
    }

    /** Carrying it to the caller included. */
    long writeNs() {
        return writeNs;
    }
}
