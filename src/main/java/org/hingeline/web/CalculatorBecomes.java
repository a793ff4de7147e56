package org.hingeline.web;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.monitor.CalculatedWater.Treated;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.web.CalculatorResult.Part;
import org.hingeline.web.view.CalculatorView.Becomes;
import org.hingeline.web.view.CalculatorView.Cell;
import org.hingeline.web.view.CalculatorView.Row;
import org.jspecify.annotations.Nullable;

/** The water beside what it would become: warmed or cooled, aerated, blended. */
final class CalculatorBecomes {
    private CalculatorBecomes() {}

    private record Water(CarbonateState state, @Nullable StateUncertainty uncertainty) {}

    static @Nullable Becomes of(CalculatorForm form, CalculatedWater water, StateUncertainty uncertainty) {
        Map<String, Water> waters = new LinkedHashMap<>();
        waters.put("now", new Water(water.state(), uncertainty));
        add(waters, "closed, at " + form.wanted("warmTo") + "\u00a0" + form.temperatureUnit(), water.warmed());
        add(waters, "aerated to " + form.wanted("airTo") + "\u00a0\u00b5atm", water.equilibrated());
        add(waters, "with " + form.wanted("blendShare") + "\u00a0% of the other", water.blended());
        if (waters.size() == 1) {
            return null;
        }
        List<Row> rows = new ArrayList<>();
        for (Part part : List.of(
                CalculatorResult.OMEGA,
                CalculatorResult.PH,
                CalculatorResult.PCO2,
                CalculatorResult.TA,
                CalculatorResult.DIC)) {
            rows.add(new Row(
                    part.unit().isEmpty() ? part.name() : part.name() + ", " + part.unit(),
                    waters.values().stream().map(each -> cell(part, each)).toList()));
        }
        rows.add(new Row(
                "temperature, \u00b0C",
                waters.values().stream()
                        .map(each ->
                                new Cell(Words.number(each.state().conditions().temperatureC(), 1), ""))
                        .toList()));
        if (water.blended() != null) {
            rows.add(new Row(
                    "salinity",
                    waters.values().stream()
                            .map(each -> new Cell(
                                    Words.number(each.state().conditions().salinity(), 1), ""))
                            .toList()));
        }
        return new Becomes(List.copyOf(waters.keySet()), rows, cautions(water));
    }

    private static void add(Map<String, Water> waters, String head, @Nullable Treated treated) {
        if (treated != null) {
            waters.put(head, new Water(treated.state(), treated.uncertainty()));
        }
    }

    private static Cell cell(Part part, Water water) {
        StateUncertainty u = water.uncertainty();
        if (u == null) {
            return new Cell(Words.number(part.value().applyAsDouble(water.state()) * part.scale(), part.digits()), "");
        }
        Rounded rounded = part.rounded(water.state(), u);
        return new Cell(rounded.value(), rounded.plusMinus());
    }

    /** Those that the water itself does not carry already. */
    private static List<String> cautions(CalculatedWater water) {
        return Stream.of(water.warmed(), water.equilibrated(), water.blended())
                .filter(treated -> treated != null)
                .flatMap(treated -> treated.cautions().stream())
                .filter(caution -> !water.cautions().contains(caution))
                .map(Caution::detail)
                .map(CalculatorResult::whole)
                .distinct()
                .toList();
    }
}
