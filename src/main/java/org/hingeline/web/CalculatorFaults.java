package org.hingeline.web;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.monitor.FieldFaults.Fault;
import org.hingeline.monitor.FieldFaultsException;

/** What a calculator's form is refused for, beside the field that a person typed it into and in words of the trade. */
final class CalculatorFaults {
    private static final Map<String, String> FIELDS = fields();
    private static final Map<String, String> WORDS = words();
    private static final Map<String, Quantity> QUANTITIES = Map.of(
            "temp", Quantity.TEMPERATURE,
            "ta", Quantity.TOTAL_ALKALINITY,
            "dic", Quantity.DIC,
            "pco2", Quantity.PCO2,
            "calcium", Quantity.CALCIUM,
            "ammonia", Quantity.AMMONIA);

    private static final Map<String, String> UNIT_OF =
            Map.of("phTemp", "temp", "warmTo", "temp", "blendTemp", "temp", "blendTa", "ta");
    private static final Pattern LONG = Pattern.compile("\\d+\\.\\d{4,}");

    private CalculatorFaults() {}

    private static Map<String, String> fields() {
        Map<String, String> fields = new LinkedHashMap<>();
        fields.put("temperatureC", "temp");
        fields.put("salinity", "salt");
        fields.put("conductivityMsCm", "salt");
        fields.put("ph", "ph");
        fields.put("phScale", "ph");
        fields.put("phTemperatureC", "phTemp");
        fields.put("totalAlkalinityUmolKg", "ta");
        fields.put("dicUmolKg", "dic");
        fields.put("pco2Uatm", "pco2");
        fields.put("phosphateUmolKg", "phosphate");
        fields.put("silicateUmolKg", "silicate");
        fields.put("calciumMmolKg", "calcium");
        fields.put("constants", "constants");
        fields.put("boron", "boron");
        fields.put("warmToC", "warmTo");
        fields.put("equilibrateToUatm", "airTo");
        fields.put("ammoniaMgL", "ammonia");
        return fields;
    }

    private static Map<String, String> words() {
        Map<String, String> words = new LinkedHashMap<>();
        words.put("totalAlkalinityUmolKg", "alkalinity");
        words.put("dicUmolKg", "DIC");
        words.put("pco2Uatm", "pCO\u2082");
        words.put("conductivityMsCm", "conductivity");
        words.put("phTemperatureC", "the temperature at which pH was read");
        words.put("temperatureC", "temperature");
        words.put("ph", "pH");
        return words;
    }

    /** The fields of the form with what is wrong with them; the empty name is for the form as a whole. */
    static Map<String, String> beside(FieldFaultsException e, Typed typed) {
        return e.faults().stream()
                .collect(Collectors.toMap(
                        fault -> field(fault.field()),
                        fault -> detail(fault, typed),
                        (one, other) -> one.equals(other) ? one : one + "; " + other,
                        LinkedHashMap::new));
    }

    private static String field(String ofWish) {
        String last = ofWish.substring(ofWish.lastIndexOf('/') + 1);
        if (ofWish.startsWith("blendWith")) {
            return switch (last) {
                case "massShare" -> "blendShare";
                case "temperatureC" -> "blendTemp";
                case "salinity", "conductivityMsCm" -> "blendSalt";
                case "ph", "phScale" -> "blendPh";
                case "totalAlkalinityUmolKg" -> "blendTa";
                default -> "";
            };
        }
        String known = FIELDS.get(last);
        return known == null ? ofWish : ofWish.startsWith("uncertainty/") ? known + "Pm" : known;
    }

    /** Without the name a program knows the field by; a value that was converted is told as it was typed too. */
    private static String detail(Fault fault, Typed typed) {
        if (field(fault.field()).equals(fault.field())) {
            return fault.detail();
        }
        String detail = Forms.plainly(fault.detail()).replaceAll("(?<![\\w.])-(?=\\d)", "\u2212");
        for (Map.Entry<String, String> word : WORDS.entrySet()) {
            detail = detail.replaceAll("(?<![\\w/])(?:blendWith/water/)?" + word.getKey() + "(?!\\w)", word.getValue());
        }
        detail = LONG.matcher(detail).replaceAll(number -> Rounded.typed(Double.parseDouble(number.group())));
        String field = field(fault.field());
        Quantity quantity = QUANTITIES.get(UNIT_OF.getOrDefault(field, field));
        if (quantity == null || !detail.matches("(?s)[-\u2212]?\\d.*")) {
            return Words.sentence(detail);
        }
        UnitChoice unit = new CalculatorUnits(typed).choice(UNIT_OF.getOrDefault(field, field), quantity);
        String symbol = quantity.unit().symbol();
        return unit.ucum().equals(quantity.unit().ucum())
                ? detail
                : typed.text(field) + "\u00a0" + unit.label() + " would be "
                        + detail.replaceFirst("^(\\S+)", "$1\u00a0" + symbol + ", and that");
    }
}
