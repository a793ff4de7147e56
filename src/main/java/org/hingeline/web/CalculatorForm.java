package org.hingeline.web;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.WaterWish;
import org.hingeline.monitor.WaterWishBuilder;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.PhScale;
import org.hingeline.web.view.CalculatorFields;
import org.jspecify.annotations.Nullable;

/** The calculator's form: what is typed, in the person's units, made into a wish in the units of the core. */
final class CalculatorForm {
    private static final Map<String, Quantity> QUANTITIES = quantities();

    private final Map<String, String> values;
    private final FieldFaults faults = new FieldFaults();
    private final Typed typed;
    private final CalculatorUnits units;

    /** @param values of the fields by name; what is absent stands for the default */
    CalculatorForm(Map<String, String> values) {
        this.values = new LinkedHashMap<>(defaults());
        this.values.putAll(values);
        typed = new Typed(this.values, faults);
        units = new CalculatorUnits(typed);
    }

    private static Map<String, Quantity> quantities() {
        Map<String, Quantity> quantities = new LinkedHashMap<>();
        quantities.put("temp", Quantity.TEMPERATURE);
        quantities.put("ta", Quantity.TOTAL_ALKALINITY);
        quantities.put("dic", Quantity.DIC);
        quantities.put("pco2", Quantity.PCO2);
        quantities.put("calcium", Quantity.CALCIUM);
        quantities.put("ammonia", Quantity.AMMONIA);
        return quantities;
    }

    /** What stands in the form before anything is typed: the usual units and uncertainties. */
    static Map<String, String> defaults() {
        InputUncertainty usual = InputUncertainty.DEFAULTS;
        Map<String, String> defaults = new LinkedHashMap<>();
        defaults.put("pair", "ph-ta");
        defaults.put("tempPm", Rounded.typed(usual.temperatureC()));
        defaults.put("saltPm", Rounded.typed(usual.salinity()));
        defaults.put("saltUnit", "1");
        defaults.put("phUnit", PhScale.TOTAL.wireName());
        defaults.put("phPm", Rounded.typed(usual.ph()));
        defaults.put("taPm", Rounded.typed(usual.totalAlkalinity() * 1e6));
        defaults.put("dicPm", Rounded.typed(usual.dic() * 1e6));
        defaults.put("pco2Pm", Rounded.typed(usual.pco2Atm() * 1e6));
        defaults.put("calciumPm", Rounded.typed(usual.calcium() * 1e3));
        QUANTITIES.forEach((field, quantity) -> {
            defaults.put(field + "Unit", quantity.unit().ucum());
            defaults.put(field + "PmIn", quantity.unit().ucum());
        });
        defaults.put("saltPmIn", "1");
        defaults.put("constants", "lueker2000");
        defaults.put("boron", "lee2010");
        return defaults;
    }

    CalculatorUnits units() {
        return units;
    }

    /** The quantities of the pair chosen, in the order of the picture's axes. */
    List<String> pair() {
        String chosen = typed.text("pair");
        boolean offered =
                CalculatorFields.pairs().stream().anyMatch(pair -> pair.value().equals(chosen));
        return offered ? List.of(chosen.split("-")) : List.of();
    }

    /** What a treatment was asked with, as it was typed. */
    String wanted(String field) {
        return typed.text(field);
    }

    String temperatureUnit() {
        return units.choice("temp", Quantity.TEMPERATURE).label();
    }

    /**
     * All that is wrong, beside the fields of the form.
     *
     * @param ofWish what the wish was refused for; null when it was not
     */
    Map<String, String> errors(@Nullable FieldFaultsException ofWish) {
        Map<String, String> errors = new LinkedHashMap<>();
        try {
            faults.throwIfAny();
        } catch (FieldFaultsException own) {
            own.faults().forEach(fault -> errors.merge(fault.field(), fault.detail(), (a, b) -> a + "; " + b));
        }
        boolean ownFaults = !errors.isEmpty();
        if (ofWish != null) {
            CalculatorFaults.beside(ofWish, typed).forEach((field, detail) -> {
                if (!ownFaults || !field.isEmpty()) {
                    errors.putIfAbsent(field, detail);
                }
            });
        }
        return errors;
    }

    PhScale scale() {
        return PhScale.fromWireName(typed.text("phUnit")).orElse(PhScale.TOTAL);
    }

    /** The least Ω wanted; absent when none is. */
    @Nullable
    Double limit() {
        Double limit = typed.number("limit", "1.8");
        if (limit != null && !(limit > 0 && limit <= 20)) {
            typed.fault("limit", Rounded.typed(limit) + " cannot be: above 0 to 20 is accepted");
            return null;
        }
        return limit;
    }

    /** What is to be worked out; what cannot be read is absent from it, and told by {@link #errors}. */
    WaterWish wish() {
        List<String> pair = pair();
        if (pair.isEmpty()) {
            typed.fault("pair", "choose which two are known");
        }
        required("temp", "fill in the temperature of the water, for instance 18,5");
        required("salt", "fill in the salinity, for instance 33, or a conductivity with its unit");
        pair.forEach(field -> required(field, "it is empty. Fill it in, or choose another two above"));
        boolean ph = pair.contains("ph");
        Double salt = units.conductivity
                ? units.canonical("salt", Quantity.CONDUCTIVITY, "42,9")
                : units.canonical("salt", Quantity.SALINITY, "33,1");
        Double phTemperature = ph ? typed.number("phTemp", "25") : null;
        Double warmTo = typed.number("warmTo", "25");
        WaterWish wish = WaterWish.builder()
                .temperatureC(units.canonical("temp", Quantity.TEMPERATURE, "18,5"))
                .salinity(units.conductivity ? null : salt)
                .conductivityMsCm(units.conductivity ? salt : null)
                .ph(ph ? typed.number("ph", "8,02") : null)
                .phScale(ph ? typed.text("phUnit") : null)
                .phTemperatureC(phTemperature == null ? null : (Double) units.temperature.toCanonical(phTemperature))
                .totalAlkalinityUmolKg(of(pair, "ta", "2350"))
                .dicUmolKg(of(pair, "dic", "2050"))
                .pco2Uatm(of(pair, "pco2", "420"))
                .phosphateUmolKg(typed.number("phosphate", "1"))
                .silicateUmolKg(typed.number("silicate", "10"))
                .calciumMmolKg(units.canonical("calcium", Quantity.CALCIUM, "9,6"))
                .constants(typed.text("constants"))
                .boron(typed.text("boron"))
                .uncertainty(uncertainty(pair))
                .warmToC(warmTo == null ? null : (Double) units.temperature.toCanonical(warmTo))
                .equilibrateToUatm(typed.number("airTo", "420"))
                .blendWith(blend())
                .ammoniaMgL(units.canonical("ammonia", Quantity.AMMONIA, "0,5"))
                .build();
        limit();
        return wish;
    }

    private void required(String field, String sentence) {
        if (typed.empty(field)) {
            typed.fault(field, sentence);
        }
    }

    private @Nullable Double of(List<String> pair, String field, String example) {
        Quantity quantity = QUANTITIES.get(field);
        return quantity == null || !pair.contains(field) ? null : units.canonical(field, quantity, example);
    }

    private WaterWish.Uncertainty uncertainty(List<String> pair) {
        Double salt = units.salinityPlusMinus();
        return new WaterWish.Uncertainty(
                pair.contains("ph") ? typed.number("phPm", "0,02") : null,
                pair.contains("ta") ? units.plusMinus("ta", Quantity.TOTAL_ALKALINITY) : null,
                pair.contains("dic") ? units.plusMinus("dic", Quantity.DIC) : null,
                pair.contains("pco2") ? units.plusMinus("pco2", Quantity.PCO2) : null,
                units.plusMinus("temp", Quantity.TEMPERATURE),
                units.conductivity ? null : salt,
                units.conductivity ? salt : null,
                typed.empty("calcium") ? null : units.plusMinus("calcium", Quantity.CALCIUM));
    }

    /** The other water, in the units and on the scale of the first; none when nothing of it is filled in. */
    private WaterWish.@Nullable Blend blend() {
        List<String> fields = List.of("blendShare", "blendTemp", "blendSalt", "blendPh", "blendTa");
        if (fields.stream().allMatch(typed::empty)) {
            return null;
        }
        fields.forEach(field -> required(field, "it is empty; a blend needs all five, or none"));
        Double share = typed.number("blendShare", "30");
        Double temperature = typed.number("blendTemp", "12");
        Double salt = typed.number("blendSalt", "28");
        Double alkalinity = typed.number("blendTa", "1900");
        Double salinity = salt == null ? null : (Double) units.salinity.toCanonical(salt);
        WaterWishBuilder other = WaterWish.builder()
                .temperatureC(temperature == null ? null : (Double) units.temperature.toCanonical(temperature))
                .salinity(units.conductivity ? null : salinity)
                .conductivityMsCm(units.conductivity ? salinity : null)
                .ph(typed.number("blendPh", "7,8"))
                .phScale(typed.text("phUnit"))
                .totalAlkalinityUmolKg(
                        alkalinity == null
                                ? null
                                : (Double) units.of("ta", Quantity.TOTAL_ALKALINITY)
                                        .toCanonical(alkalinity));
        return new WaterWish.Blend(other.build(), share == null ? null : (Double) (share / 100));
    }

    /** The form's values as they are shown again: every ± told in the unit chosen beside it. */
    Map<String, String> shown() {
        Map<String, String> shown = new LinkedHashMap<>(values);
        QUANTITIES.forEach((field, quantity) -> {
            UnitChoice chosen = units.choice(field, quantity);
            Units.find(quantity, typed.text(field + "PmIn")).ifPresent(was -> moveTo(shown, field, was, chosen));
            shown.put(field + "PmIn", chosen.ucum());
        });
        salinityUnit(typed.text("saltPmIn"))
                .ifPresent(was -> salinityUnit(typed.text("saltUnit")).ifPresent(chosen -> {
                    moveTo(shown, "salt", was, chosen);
                    shown.put("saltPmIn", chosen.ucum());
                }));
        return shown;
    }

    private static Optional<UnitChoice> salinityUnit(String ucum) {
        return Units.find(Quantity.SALINITY, ucum).or(() -> Units.find(Quantity.CONDUCTIVITY, ucum));
    }

    private void moveTo(Map<String, String> shown, String field, UnitChoice was, UnitChoice chosen) {
        Double plusMinus = Typed.parsed(typed.text(field + "Pm"));
        if (plusMinus != null && !was.ucum().equals(chosen.ucum())) {
            double density = UnitChoice.TYPICAL_DENSITY_KG_M3;
            shown.put(
                    field + "Pm",
                    Rounded.typedShort(chosen.conversion(density)
                            .uncertaintyFromCanonical(was.conversion(density).uncertaintyToCanonical(plusMinus))));
        }
    }
}
