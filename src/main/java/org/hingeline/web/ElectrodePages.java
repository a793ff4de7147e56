package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.PhScale;
import org.hingeline.seawater.TrisStandard;
import org.hingeline.web.view.CalculatorFields;
import org.hingeline.web.view.ElectrodeView;
import org.hingeline.web.view.ElectrodeView.Finding;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.Standing;
import org.jspecify.annotations.Nullable;

/** A pH electrode held against the tris standard. Stores nothing. */
final class ElectrodePages {
    /** As good as a glass electrode gets in routine use; within it nothing is to be gained by calibrating. */
    private static final double GOOD = 0.02;

    private static final double POOR = 0.05;

    /** How far NBS buffers lie from the total scale, give or take. */
    private static final double NBS_FROM = 0.09;

    private static final double NBS_TO = 0.18;

    private final PageMaker pages;

    ElectrodePages(PageMaker pages) {
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get("/calculator/electrode", this::show, Gate.VIEWER);
    }

    private void show(Context ctx) {
        Map<String, String> values =
                new LinkedHashMap<>(Map.of("tempUnit", "Cel", "salt", "35", "phUnit", PhScale.TOTAL.wireName()));
        Map<String, String> sent = CalculatorPages.typed(ctx);
        values.putAll(sent);
        if (!sent.containsKey("temp")) {
            answer(ctx, 200, Form.of(values), null);
            return;
        }
        try {
            answer(ctx, 200, Form.of(values), compared(values));
        } catch (FieldFaultsException e) {
            Map<String, String> errors = new LinkedHashMap<>();
            e.faults().forEach(fault -> errors.merge(fault.field(), fault.detail(), (a, b) -> a + "; " + b));
            answer(ctx, 422, new Form(values, errors), null);
        }
    }

    private void answer(Context ctx, int status, Form form, @Nullable Finding finding) {
        pages.show(ctx, status, "electrode", "calculator", new ElectrodeView(form, finding), "");
    }

    private static Finding compared(Map<String, String> values) {
        FieldFaults faults = new FieldFaults();
        Typed typed = new Typed(values, faults);
        UnitChoice unit = Units.find(Quantity.TEMPERATURE, typed.text("tempUnit"))
                .orElse(Units.of(Quantity.TEMPERATURE).get(0));
        Double temperature = required(typed, "temp", "21,5");
        Double salinity = required(typed, "salt", "35");
        Double reading = required(typed, "ph", "8,12");
        PhScale scale = PhScale.fromWireName(typed.text("phUnit")).orElse(PhScale.TOTAL);
        faults.throwIfAny();
        if (temperature == null || salinity == null || reading == null) {
            throw new IllegalStateException("a fault was not told");
        }
        double temperatureC = unit.conversion().toCanonical(temperature);
        Figure standard = TrisStandard.ph(temperatureC, salinity);
        if (standard instanceof Figure.Refused refused) {
            throw new FieldFaultsException(
                    refused.code().startsWith("salinity") ? "salt" : "temp", Words.sentence(refused.detail()));
        }
        Figure deviation = TrisStandard.deviation(reading, scale, temperatureC, salinity);
        if (deviation instanceof Figure.Refused refused) {
            throw new FieldFaultsException("ph", refused.detail());
        }
        return finding(standard.orElseThrow(), (Figure.Known) deviation, scale, temperatureC, salinity);
    }

    private static @Nullable Double required(Typed typed, String field, String example) {
        if (typed.empty(field)) {
            typed.fault(field, "it is empty; " + example + " would be a value");
        }
        return typed.number(field, example);
    }

    private static Finding finding(
            double total, Figure.Known deviation, PhScale scale, double temperatureC, double salinity) {
        double off = Math.rint(deviation.value() * 1000) / 1000;
        double size = Math.abs(off);
        return new Finding(
                size == 0
                        ? "The electrode reads as it should."
                        : "The electrode reads " + Words.number(size, 3) + (off > 0 ? " too high." : " too low."),
                size <= GOOD ? Standing.FIT : size <= POOR ? Standing.UNKNOWN : Standing.SHORT,
                "pH " + Words.number(scale.fromTotal(total, temperatureC, salinity), 3) + ", "
                        + CalculatorFields.scaleLabel(scale),
                Words.number(total, 3),
                (off > 0 ? "+" : "") + Words.number(off, 3),
                advice(off, scale),
                deviation.cautions().stream()
                        .map(Caution::detail)
                        .map(CalculatorResult::whole)
                        .toList());
    }

    private static List<String> advice(double off, PhScale scale) {
        double size = Math.abs(off);
        if (size <= GOOD) {
            return List.of("Within 0.02, about as good as a glass electrode gets. Use it as it is, and write this down:"
                    + " a drift shows only against the last check.");
        }
        List<String> advice = new ArrayList<>();
        if (size <= POOR) {
            advice.add("More than 0.02. Rinse, wait until bottle and electrode are at one temperature, and read again."
                    + " If it stays, calibrate the electrode in tris, or count the difference out of its readings and"
                    + " register 0.05 as its \u00b1.");
        } else {
            advice.add("More than 0.05. Do not trust its readings: clean the electrode and its junction, let it soak,"
                    + " calibrate it, and check again. If it still is off with fresh tris, replace it.");
        }
        if (scale != PhScale.NBS && off > NBS_FROM && off < NBS_TO) {
            advice.add("About 0.13 too high is how an electrode reads that was calibrated in NBS buffers (pH 4, 7, 10)."
                    + " If this one was, choose the NBS scale below, and register the sensor with it.");
        }
        advice.add("Check the thermometer too: 1 \u00b0C moves the pH of tris by about 0.03.");
        return advice;
    }
}
