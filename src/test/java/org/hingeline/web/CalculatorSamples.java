package org.hingeline.web;

import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Map;
import org.hingeline.monitor.WaterCalculator;
import org.hingeline.web.view.CalculatorView;
import org.hingeline.web.view.CalculatorView.Origin;
import org.hingeline.web.view.CalculatorView.Source;
import org.hingeline.web.view.ElectrodeView;
import org.hingeline.web.view.ElectrodeView.Finding;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.Standing;

/** The calculator on invented water, to try its pages on. */
final class CalculatorSamples {
    private CalculatorSamples() {}

    static CalculatorView empty() {
        return new CalculatorView(Form.of(CalculatorForm.defaults()), null, null);
    }

    static CalculatorView refused() {
        return new CalculatorView(
                new Form(
                        CalculatorForm.defaults(),
                        Map.of("temp", "a", "phPm", "b", "pair", "c", "calcium", "d", "blendTa", "e")),
                null,
                null);
    }

    static CalculatorView worked() {
        CalculatorForm form = new CalculatorForm(Map.of(
                "temp", "15", "salt", "12", "ph", "7,8", "ta", "2,1", "taUnit", "meq/L", "warmTo", "25", "airTo", "420",
                "ammonia", "0,5", "limit", "1,8"));
        return new CalculatorView(
                Form.of(form.shown()),
                null,
                CalculatorResult.of(form, new WaterCalculator().calculate(form.wish(), true)));
    }

    /** With names that try to be more than words. */
    static CalculatorView ofPoint(String name, Instant now) {
        Moment at = Moment.of(now, now, ZoneId.of("Europe/Lisbon"));
        Source source = new Source(
                name,
                name,
                at,
                List.of(new Origin("pH", "7.71", "0.02", "total scale", "sensor " + name, at, "2 min old then", name)),
                List.of(name),
                List.of(name),
                "You changed pH.",
                "1.62 ±0.11");
        CalculatorView worked = worked();
        return new CalculatorView(worked.form(), source, worked.worked());
    }

    static ElectrodeView electrode() {
        return new ElectrodeView(
                Form.empty(),
                new Finding(
                        "The electrode reads 0.031 too low.",
                        Standing.UNKNOWN,
                        "pH 8.094, total scale",
                        "8.094",
                        "−0.031",
                        List.of("Rinse."),
                        List.of("A caution.")));
    }
}
