package org.hingeline.seawater;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.hingeline.dosing.Agent;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.UnitConversion;
import org.hingeline.measure.Units;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;

/** Every value from elsewhere that this package is held against, table by table. */
final class PublishedValues {
    private static final Map<String, Source> SOURCES = sources();

    private PublishedValues() {}

    static List<PublishedValue> all() {
        List<PublishedValue> all = new ArrayList<>();
        read(all, "single-constants", PublishedValues::singleConstant);
        read(all, "whole-systems", PublishedValues::wholeSystem);
        read(all, "default-fits", PublishedValues::defaultFits);
        read(all, "scale-confusion", PublishedValues::scaleConfusion);
        read(all, "orr-2018", PublishedValues::orr2018);
        read(all, "uncertainty", PublishedValues::uncertainty);
        read(all, "dosing", PublishedValues::dosedWater);
        read(all, "dosing-agents", PublishedValues::dosingAgent);
        read(all, "salinity-check-values", PublishedValues::salinity);
        read(all, "unit-relations", PublishedValues::unitRelation);
        read(all, "units", PublishedValues::unit);
        read(all, "teos10-density", PublishedValues::teos10Density);
        read(all, "teos10-density", PublishedValues::teos10HeatCapacity);
        read(all, "teos10-salinity", PublishedValues::teos10Salinity);
        read(all, "teos10-conductivity", PublishedValues::teos10Conductivity);
        return all;
    }

    private interface Reading {
        Value of(Map<String, String> row);
    }

    /** What a row says and what we have instead. */
    private record Value(String what, String published, double tolerance, double ours) {}

    private static void read(List<PublishedValue> all, String table, Reading reading) {
        for (Map<String, String> row : ReferenceTable.read(table).rows()) {
            Value v = reading.of(row);
            Source source = SOURCES.get(table + "," + row.getOrDefault("source", "R"));
            if (source == null) {
                throw new IllegalArgumentException("no source for " + row + " in table " + table);
            }
            all.add(new PublishedValue(table, source.name, source.words, v.what, v.published, v.tolerance, v.ours));
        }
    }

    private record Source(String name, String words) {}

    private static Map<String, Source> sources() {
        Map<String, Source> sources = new TreeMap<>();
        for (Map<String, String> row : ReferenceTable.read("sources").rows()) {
            sources.put(row.get("file") + "," + row.get("code"), new Source(row.get("name"), row.get("source")));
        }
        return sources;
    }

    private static double number(Map<String, String> row, String name) {
        return Double.parseDouble(row.get(name));
    }

    private static Value value(Map<String, String> row, String what, double ours) {
        return new Value(what, row.get("value"), number(row, "tolerance"), ours);
    }

    private static Value singleConstant(Map<String, String> row) {
        String quantity = row.get("quantity");
        return value(
                row,
                quantity + ", " + row.get("temperatureC") + " °C, S " + row.get("salinity"),
                SingleConstantsValidationTest.evaluate(quantity, number(row, "temperatureC"), number(row, "salinity")));
    }

    private static Value wholeSystem(Map<String, String> row) {
        Conditions conditions = Conditions.of(number(row, "temperatureC"), number(row, "salinity"))
                .with(
                        CarbonicAcidFit.LUEKER_2000,
                        BoronRatio.fromWireName(row.get("boron")).orElseThrow());
        CarbonateState state = CarbonateSystem.solve(
                        conditions,
                        new AlkalinityAndPco2(number(row, "totalAlkalinity") * 1e-6, number(row, "pco2") * 1e-6))
                .orElseThrow();
        return value(
                row,
                row.get("quantity") + ", " + row.get("temperatureC") + " °C, S " + row.get("salinity") + ", TA "
                        + row.get("totalAlkalinity") + ", pCO2 " + row.get("pco2"),
                Quantities.of(state, row.get("quantity")));
    }

    private static Value defaultFits(Map<String, String> row) {
        CarbonateState state = CarbonateSystem.solve(Conditions.of(25, 35), new PhAndAlkalinity(8.1, 2300e-6))
                .orElseThrow();
        return value(
                row, row.get("quantity") + ", 25 °C, S 35, TA 2300, pH 8.1", Quantities.of(state, row.get("quantity")));
    }

    private static Value scaleConfusion(Map<String, String> row) {
        Conditions conditions = Conditions.of(number(row, "temperatureC"), number(row, "salinity"));
        double ta = number(row, "totalAlkalinity") * 1e-6;
        double total = CarbonateSystem.solve(conditions, new PhAndAlkalinity(number(row, "ph"), PhScale.TOTAL, ta))
                .orElseThrow()
                .pco2Atm();
        double seawater = CarbonateSystem.solve(
                        conditions, new PhAndAlkalinity(number(row, "ph"), PhScale.SEAWATER, ta))
                .orElseThrow()
                .pco2Atm();
        return new Value(
                "pCO2 off by the wrong scale, %, pH " + row.get("ph"),
                row.get("percent"),
                number(row, "tolerance"),
                100 * (total / seawater - 1));
    }

    private static Value orr2018(Map<String, String> row) {
        ConstantUncertainty u = ConstantUncertainty.ORR_2018;
        double ours = switch (row.get("quantity")) {
            case "pK0" -> u.pK0();
            case "pK1" -> u.pK1();
            case "pK2" -> u.pK2();
            case "pKB" -> u.pKB();
            case "pKW" -> u.pKW();
            case "pKspAragonite" -> u.pKspAragonite();
            case "pKspCalcite" -> u.pKspCalcite();
            case "totalBoron" -> u.boronRelative();
            default -> throw new IllegalArgumentException("no such constant: " + row);
        };
        return value(row, "u(" + row.get("quantity") + ")", ours);
    }

    /** By first order, which is what the product tells; stepping is held more tightly in its own test. */
    private static Value uncertainty(Map<String, String> row) {
        InputUncertainty inputs = InputUncertainty.ofPhAndAlkalinity(
                number(row, "ph"),
                number(row, "totalAlkalinity") * 1e-6,
                number(row, "temperatureC"),
                number(row, "salinity"));
        CarbonateState state = CarbonateSystem.solve(Conditions.of(22, 30), new PhAndAlkalinity(7.9, 2078e-6))
                .orElseThrow();
        StandardUncertainty omega = Uncertainty.of(state, inputs).omegaAragonite();
        double part = switch (row.get("share")) {
            case "constants" -> omega.fromConstants();
            case "inputs" -> omega.fromInputs();
            case "total" -> omega.total();
            default -> throw new IllegalArgumentException("no such share: " + row);
        };
        return new Value(
                "u(omegaAragonite), %, " + row.get("share") + ": pH " + row.get("ph") + ", TA "
                        + row.get("totalAlkalinity") + ", t " + row.get("temperatureC") + ", S "
                        + row.get("salinity"),
                row.get("percent"),
                number(row, "firstOrderTolerance"),
                100 * part / state.omegaAragonite());
    }

    private static Value dosedWater(Map<String, String> row) {
        String agent = row.get("agent");
        return value(
                row,
                row.get("quantity") + ", " + agent + ", TA +" + row.get("addedAlkalinity"),
                Quantities.of(DosedChemistry.with(agent, number(row, "addedAlkalinity")), row.get("quantity")));
    }

    private static Value dosingAgent(Map<String, String> row) {
        Agent agent = Agent.SODIUM_CARBONATE;
        String at = row.get("at");
        double ours = switch (row.get("quantity")) {
            case "gramsPerMol" -> grams(agent, at);
            case "solubility" -> agent.solubility().gramsPer100GWater(Double.parseDouble(at));
            case "gramsPerCubicMetre" ->
                grams(agent, at) / agent.alkalinityPerMol() * 100e-6 * MilleroPoisson1981.densityKgM3(25, 35);
            case "decahydrateTakenForAnhydrous" -> grams(agent, "decahydrate") / grams(agent, "anhydrous");
            default -> throw new IllegalArgumentException("no such quantity: " + row);
        };
        return value(row, row.get("quantity") + " of sodium carbonate" + (at.isEmpty() ? "" : ", " + at), ours);
    }

    private static double grams(Agent agent, String form) {
        return agent.form(form).orElseThrow().gramsPerMol();
    }

    private static Value salinity(Map<String, String> row) {
        return new Value(
                "salinity of R " + row.get("ratio") + ", " + row.get("temperature68C") + " °C, "
                        + row.get("pressureDbar") + " dbar",
                row.get("salinity"),
                number(row, "tolerance"),
                PracticalSalinity1978.salinity(
                        number(row, "ratio"), number(row, "temperature68C"), number(row, "pressureDbar")));
    }

    private static Value unitRelation(Map<String, String> row) {
        double density = 1025;
        double canonical = alkalinity(row.get("from")).conversion(density).toCanonical(1);
        return value(
                row,
                "1 " + row.get("from") + " in " + row.get("to"),
                alkalinity(row.get("to")).conversion(density).fromCanonical(canonical));
    }

    private static UnitChoice alkalinity(String unit) {
        return Units.find(Quantity.TOTAL_ALKALINITY, unit).orElseThrow();
    }

    private static Value unit(Map<String, String> row) {
        Quantity quantity = Quantity.ofCode(row.get("quantity")).orElseThrow();
        UnitChoice choice = Units.find(quantity, row.get("unit")).orElseThrow();
        String density = row.get("densityKgM3");
        UnitConversion conversion =
                density.isEmpty() ? choice.conversion() : choice.conversion(Double.parseDouble(density));
        double canonical = number(row, "canonical");
        return new Value(
                row.get("quantity") + ", " + row.get("value") + " " + row.get("unit") + " in "
                        + quantity.unit().ucum() + (density.isEmpty() ? "" : " at " + density + " kg/m³"),
                row.get("canonical"),
                number(row, "relativeTolerance") * Math.max(1, Math.abs(canonical)),
                conversion.toCanonical(number(row, "value")));
    }

    private static Value teos10Density(Map<String, String> row) {
        double s = number(row, "salinity");
        return new Value(
                "densityKgM3, S " + row.get("salinity") + ", " + row.get("temperatureC") + " °C",
                row.get("densityKgM3"),
                (s > 40 ? 4 : 3) * Teos10ValidationTest.DENSITY_STANDARD_ERROR,
                MilleroPoisson1981.densityKgM3(number(row, "temperatureC"), s));
    }

    private static Value teos10HeatCapacity(Map<String, String> row) {
        return new Value(
                "heatCapacity, S " + row.get("salinity") + ", " + row.get("temperatureC") + " °C",
                row.get("heatCapacity"),
                Teos10ValidationTest.HEAT_CAPACITY.value,
                MilleroPerronDesnoyers1973.heatCapacity(number(row, "temperatureC"), number(row, "salinity")));
    }

    private static Value teos10Salinity(Map<String, String> row) {
        return new Value(
                "salinity, " + row.get("conductivityMsCm") + " mS/cm, " + row.get("temperatureC") + " °C",
                row.get("salinity"),
                Teos10ValidationTest.SAME_EQUATION.value,
                ConductivitySalinity.salinity(
                                number(row, "conductivityMsCm"),
                                number(row, "temperatureC"),
                                number(row, "pressureDbar"))
                        .orElseThrow());
    }

    private static Value teos10Conductivity(Map<String, String> row) {
        return new Value(
                "conductivity in mS/cm, S " + row.get("salinity") + ", " + row.get("temperatureC") + " °C",
                row.get("conductivityMsCm"),
                Teos10ValidationTest.SAME_EQUATION.value,
                ConductivitySalinity.conductivity(
                                number(row, "salinity"), number(row, "temperatureC"), number(row, "pressureDbar"))
                        .orElseThrow());
    }
}
