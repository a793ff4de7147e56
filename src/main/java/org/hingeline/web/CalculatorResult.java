package org.hingeline.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.monitor.CalculatedWater.UnionisedAmmonia;
import org.hingeline.seawater.Ammonia;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.PhScale;
import org.hingeline.seawater.StandardUncertainty;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.web.view.CalculatorFields;
import org.hingeline.web.view.CalculatorView.Line;
import org.hingeline.web.view.CalculatorView.Method;
import org.hingeline.web.view.CalculatorView.Worked;
import org.hingeline.web.view.OmegaPicture;
import org.hingeline.web.view.OmegaPicture.Reading;
import org.hingeline.web.view.Standing;
import org.jspecify.annotations.Nullable;

/** A calculated water as it is read on the page. */
final class CalculatorResult {
    static final String UMOL_KG = "\u00b5mol/kg";
    static final String UATM = "\u00b5atm";

    /**
     * A quantity of a state with its uncertainty.
     *
     * @param unit as read
     * @param scale from the core's unit to {@code unit}
     * @param digits where it is exact
     */
    record Part(
            String name,
            String code,
            String unit,
            double scale,
            int digits,
            ToDoubleFunction<CarbonateState> value,
            Function<StateUncertainty, StandardUncertainty> uncertainty) {
        Rounded rounded(CarbonateState state, StateUncertainty u) {
            return Rounded.of(
                    value.applyAsDouble(state) * scale, uncertainty.apply(u).total() * scale, digits);
        }
    }

    static final Part OMEGA = new Part(
            "\u03a9 aragonite",
            "omegaAragonite",
            "",
            1,
            2,
            CarbonateState::omegaAragonite,
            StateUncertainty::omegaAragonite);
    static final Part PH =
            new Part("pH, total scale", "phTotal", "", 1, 3, CarbonateState::phTotal, StateUncertainty::phTotal);
    static final Part DIC = amount("inorganic carbon, DIC", "dicUmolKg", CarbonateState::dic, StateUncertainty::dic);
    static final Part TA = amount(
            "total alkalinity",
            "totalAlkalinityUmolKg",
            CarbonateState::totalAlkalinity,
            StateUncertainty::totalAlkalinity);
    static final Part PCO2 =
            new Part("pCO\u2082", "pco2Uatm", UATM, 1e6, 0, CarbonateState::pco2Atm, StateUncertainty::pco2Atm);

    private static final List<Part> PARTS = List.of(
            OMEGA,
            new Part(
                    "\u03a9 calcite",
                    "omegaCalcite",
                    "",
                    1,
                    2,
                    CarbonateState::omegaCalcite,
                    StateUncertainty::omegaCalcite),
            PH,
            TA,
            DIC,
            PCO2,
            new Part("fCO\u2082", "fco2Uatm", UATM, 1e6, 0, CarbonateState::fco2Atm, StateUncertainty::fco2Atm),
            amount("dissolved CO\u2082", "co2UmolKg", CarbonateState::co2, StateUncertainty::co2),
            amount(
                    "bicarbonate, HCO\u2083\u207b",
                    "bicarbonateUmolKg",
                    CarbonateState::bicarbonate,
                    StateUncertainty::bicarbonate),
            amount(
                    "carbonate, CO\u2083\u00b2\u207b",
                    "carbonateUmolKg",
                    CarbonateState::carbonate,
                    StateUncertainty::carbonate));

    private final CalculatorForm form;
    private final CalculatedWater water;
    private final CarbonateState state;
    private final StateUncertainty uncertainty;
    private final @Nullable Double limit;

    private CalculatorResult(CalculatorForm form, CalculatedWater water) {
        this.form = form;
        this.water = water;
        this.state = water.state();
        this.uncertainty = Objects.requireNonNull(water.uncertainty(), "uncertainty");
        this.limit = form.limit();
    }

    private static Part amount(
            String name,
            String code,
            ToDoubleFunction<CarbonateState> value,
            Function<StateUncertainty, StandardUncertainty> uncertainty) {
        return new Part(name, code, UMOL_KG, 1e6, 0, value, uncertainty);
    }

    /** @param water calculated with its uncertainty */
    static Worked of(CalculatorForm form, CalculatedWater water) {
        return new CalculatorResult(form, water).worked();
    }

    private Worked worked() {
        Rounded omega = OMEGA.rounded(state, uncertainty);
        return new Worked(
                omega.value(),
                omega.plusMinus(),
                limit == null ? Standing.UNKNOWN : state.omegaAragonite() < limit ? Standing.SHORT : Standing.FIT,
                sentence(),
                against(),
                water.cautions().stream()
                        .map(Caution::detail)
                        .map(CalculatorResult::whole)
                        .distinct()
                        .toList(),
                lines(),
                scales(),
                ammonia(),
                CalculatorShares.ofOmega(water),
                PARTS.stream()
                        .map(part -> CalculatorShares.of(part, uncertainty))
                        .toList(),
                CalculatorBecomes.of(form, water, uncertainty),
                picture(),
                methods(),
                CalculatorDigits.of(water, uncertainty, PARTS));
    }

    static String whole(String detail) {
        String sentence = Words.sentence(detail);
        return sentence.endsWith(".") ? sentence : sentence + ".";
    }

    private String sentence() {
        double omega = state.omegaAragonite();
        double u = uncertainty.omegaAragonite().total();
        if (Math.abs(omega - 1) < u) {
            return "So near 1 that the \u00b1 does not tell whether aragonite, the first shell, dissolves in this water.";
        }
        return omega < 1
                ? "Aragonite, the stuff of the first shell, dissolves in this water."
                : "Aragonite, the stuff of the first shell, can form in this water: it dissolves only under 1.";
    }

    private String against() {
        if (limit == null) {
            return "";
        }
        double above = state.omegaAragonite() - limit;
        String side = above < 0 ? "Under" : "Above";
        return side + " the limit of " + Words.number(limit, 2)
                + (Math.abs(above) < uncertainty.omegaAragonite().total()
                        ? ", but by less than its \u00b1."
                        : ", by more than its \u00b1.");
    }

    private List<Line> lines() {
        List<Line> lines = new ArrayList<>();
        for (Part part : PARTS) {
            Rounded rounded = part.rounded(state, uncertainty);
            lines.add(new Line(part.name(), rounded.value(), rounded.plusMinus(), part.unit(), also(part)));
        }
        InputUncertainty inputs = water.inputs();
        Rounded t = Rounded.of(state.conditions().temperatureC(), inputs.temperatureC(), 1);
        lines.add(new Line("temperature", t.value(), t.plusMinus(), "\u00b0C", ""));
        Rounded s = Rounded.of(state.conditions().salinity(), inputs.salinity(), 2);
        lines.add(new Line(
                "salinity", s.value(), s.plusMinus(), "", form.units().conductivity ? "from the conductivity" : ""));
        lines.add(new Line("density", Words.number(state.densityKgM3(), 2), "", "kg/m\u00b3", ""));
        return lines;
    }

    /** The same in the unit that the person chose. */
    private String also(Part part) {
        return switch (part.code()) {
            case "totalAlkalinityUmolKg" -> also(part, "ta", Quantity.TOTAL_ALKALINITY);
            case "dicUmolKg" -> also(part, "dic", Quantity.DIC);
            case "pco2Uatm" -> also(part, "pco2", Quantity.PCO2);
            default -> "";
        };
    }

    private String also(Part part, String field, Quantity quantity) {
        UnitChoice unit = form.units().choice(field, quantity);
        if (unit.ucum().equals(quantity.unit().ucum()) || !form.pair().contains(field)) {
            return "";
        }
        var conversion = unit.conversion(state.densityKgM3());
        Rounded rounded = Rounded.of(
                conversion.fromCanonical(part.value().applyAsDouble(state) * part.scale()),
                conversion.uncertaintyFromCanonical(
                        part.uncertainty().apply(uncertainty).total() * part.scale()),
                2);
        return "= " + rounded.value() + (rounded.plusMinus().isEmpty() ? "" : " \u00b1" + rounded.plusMinus())
                + "\u00a0" + unit.label();
    }

    private List<Line> scales() {
        List<Line> lines = new ArrayList<>();
        for (PhScale scale : PhScale.values()) {
            double ph = scale.fromTotal(
                    state.phTotal(),
                    state.conditions().temperatureC(),
                    state.conditions().salinity());
            lines.add(new Line(
                    CalculatorFields.scaleLabel(scale),
                    Rounded.of(ph, uncertainty.phTotal().total(), 3).value(),
                    "",
                    "",
                    ""));
        }
        return lines;
    }

    private List<Line> ammonia() {
        UnionisedAmmonia ammonia = water.ammonia();
        return ammonia == null
                ? List.of()
                : List.of(
                        new Line("as NH\u2083", Rounded.small(ammonia.nh3MgL()), "", "mg/L", ""),
                        new Line("as nitrogen", Rounded.small(ammonia.nitrogenMgL()), "", "mg/L", ""),
                        new Line("share of the total", Rounded.small(ammonia.share() * 100), "", "%", ""),
                        new Line(
                                "for comparison: US EPA 1989, salt water, as NH\u2083",
                                Ammonia.EPA_1989_CHRONIC_MG_L + "\u00a0mg/L over days, " + Ammonia.EPA_1989_ACUTE_MG_L
                                        + "\u00a0mg/L within the hour",
                                "",
                                "",
                                ""));
    }

    private OmegaPicture picture() {
        List<String> pair = form.pair();
        return OmegaPicture.draw(state, reading(pair.get(0)), reading(pair.get(1)), limit);
    }

    private Reading reading(String field) {
        InputUncertainty u = water.inputs();
        return switch (field) {
            case "ph" ->
                new Reading(
                        "pH",
                        CalculatorFields.scaleLabel(form.scale()),
                        Units.of(Quantity.PH).get(0).conversion(),
                        form.scale() == PhScale.NBS ? Math.max(u.ph(), InputUncertainty.PH_ON_NBS_BUFFERS) : u.ph());
            case "ta" -> reading("alkalinity", field, Quantity.TOTAL_ALKALINITY, u.totalAlkalinity() * 1e6);
            case "dic" -> reading("DIC", field, Quantity.DIC, u.dic() * 1e6);
            default -> reading("pCO\u2082", field, Quantity.PCO2, u.pco2Atm() * 1e6);
        };
    }

    private Reading reading(String name, String field, Quantity quantity, double plusMinus) {
        UnitChoice unit = form.units().choice(field, quantity);
        return new Reading(name, unit.label(), unit.conversion(state.densityKgM3()), plusMinus);
    }

    private List<Method> methods() {
        return water.method().words().entrySet().stream()
                .map(entry -> new Method(CalculatorDigits.methodName(entry.getKey()), entry.getValue()))
                .toList();
    }
}
