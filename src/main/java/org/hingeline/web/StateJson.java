package org.hingeline.web;

import java.util.List;
import java.util.Map;
import org.hingeline.monitor.CalculatedWater;
import org.hingeline.monitor.CalculatedWater.Treated;
import org.hingeline.monitor.CalculatedWater.UnionisedAmmonia;
import org.hingeline.monitor.WaterMethod;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.StandardUncertainty;
import org.hingeline.seawater.StateUncertainty;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JsonGenerator;
import tools.jackson.core.SerializableString;
import tools.jackson.core.io.SerializedString;

/** Writes calculated waters as JSON as it goes, without a tree in between. */
final class StateJson {
    /** Far more than any of the methods is good for, and few enough to leave the dust of binary arithmetic out. */
    private static final int DIGITS = 10;

    private static final int DIGITS_OF_UNCERTAINTY = 4;
    private static final double MICRO = 1e6;

    /** A share of the value that is nothing but the rounding of the arithmetic. */
    private static final double DUST = 1e-14;

    private static final SerializableString TEMPERATURE = name("temperatureC");
    private static final SerializableString SALINITY = name("salinity");
    private static final SerializableString PH = name("phTotal");
    private static final SerializableString ALKALINITY = name("totalAlkalinityUmolKg");
    private static final SerializableString DIC = name("dicUmolKg");
    private static final SerializableString PCO2 = name("pco2Uatm");
    private static final SerializableString FCO2 = name("fco2Uatm");
    private static final SerializableString CO2 = name("co2UmolKg");
    private static final SerializableString BICARBONATE = name("bicarbonateUmolKg");
    private static final SerializableString CARBONATE = name("carbonateUmolKg");
    private static final SerializableString ARAGONITE = name("omegaAragonite");
    private static final SerializableString CALCITE = name("omegaCalcite");
    private static final SerializableString DENSITY = name("densityKgM3");
    private static final SerializableString UNCERTAINTY = name("standardUncertainty");
    private static final SerializableString TOTAL = name("total");
    private static final SerializableString FROM_CONSTANTS = name("fromConstants");
    private static final SerializableString FROM_INPUTS = name("fromInputs");
    private static final SerializableString CAUTIONS = name("cautions");

    private final JsonGenerator json;

    StateJson(JsonGenerator json) {
        this.json = json;
    }

    private static SerializableString name(String name) {
        return new SerializedString(name);
    }

    /** The water with its method in words. */
    void whole(CalculatedWater water) {
        json.writeStartObject();
        fields(water);
        json.writeName("method");
        method(water.method());
        json.writeEndObject();
    }

    /** The water with the place of its method in the list of methods. */
    void withMethodIndex(CalculatedWater water, int index) {
        json.writeStartObject();
        fields(water);
        json.writeNumberProperty("methodIndex", index);
        json.writeEndObject();
    }

    void method(WaterMethod method) {
        json.writeStartObject();
        for (Map.Entry<String, String> each : method.words().entrySet()) {
            json.writeStringProperty(each.getKey(), each.getValue());
        }
        json.writeEndObject();
    }

    private void fields(CalculatedWater water) {
        quantities(water.state());
        uncertainty(water.state(), water.uncertainty());
        treated("warmed", water.warmed());
        treated("equilibrated", water.equilibrated());
        treated("blended", water.blended());
        ammonia(water.ammonia());
        cautions(water.cautions());
    }

    private void treated(String name, @Nullable Treated treated) {
        if (treated != null) {
            json.writeObjectPropertyStart(name);
            quantities(treated.state());
            uncertainty(treated.state(), treated.uncertainty());
            cautions(treated.cautions());
            json.writeEndObject();
        }
    }

    private void quantities(CarbonateState state) {
        number(TEMPERATURE, state.conditions().temperatureC());
        number(SALINITY, state.conditions().salinity());
        number(PH, state.phTotal());
        number(ALKALINITY, state.totalAlkalinity() * MICRO);
        number(DIC, state.dic() * MICRO);
        number(PCO2, state.pco2Atm() * MICRO);
        number(FCO2, state.fco2Atm() * MICRO);
        number(CO2, state.co2() * MICRO);
        number(BICARBONATE, state.bicarbonate() * MICRO);
        number(CARBONATE, state.carbonate() * MICRO);
        number(ARAGONITE, state.omegaAragonite());
        number(CALCITE, state.omegaCalcite());
        number(DENSITY, state.densityKgM3());
    }

    private void number(SerializableString name, double value) {
        json.writeName(name);
        json.writeNumber(Rounding.to(value, DIGITS));
    }

    private void uncertainty(CarbonateState state, @Nullable StateUncertainty u) {
        if (u != null) {
            json.writeName(UNCERTAINTY);
            json.writeStartObject();
            each(PH, state.phTotal(), u.phTotal(), 1);
            each(ALKALINITY, state.totalAlkalinity(), u.totalAlkalinity(), MICRO);
            each(DIC, state.dic(), u.dic(), MICRO);
            each(PCO2, state.pco2Atm(), u.pco2Atm(), MICRO);
            each(FCO2, state.fco2Atm(), u.fco2Atm(), MICRO);
            each(CO2, state.co2(), u.co2(), MICRO);
            each(BICARBONATE, state.bicarbonate(), u.bicarbonate(), MICRO);
            each(CARBONATE, state.carbonate(), u.carbonate(), MICRO);
            each(ARAGONITE, state.omegaAragonite(), u.omegaAragonite(), 1);
            each(CALCITE, state.omegaCalcite(), u.omegaCalcite(), 1);
            each(DENSITY, state.densityKgM3(), u.densityKgM3(), 1);
            json.writeEndObject();
        }
    }

    private void each(SerializableString name, double value, StandardUncertainty u, double factor) {
        double dust = Math.abs(value) * DUST;
        json.writeName(name);
        json.writeStartObject();
        share(TOTAL, u.total(), dust, factor);
        share(FROM_CONSTANTS, u.fromConstants(), dust, factor);
        share(FROM_INPUTS, u.fromInputs(), dust, factor);
        json.writeEndObject();
    }

    private void share(SerializableString name, double value, double dust, double factor) {
        json.writeName(name);
        json.writeNumber(value <= dust ? 0 : Rounding.to(value * factor, DIGITS_OF_UNCERTAINTY));
    }

    private void ammonia(@Nullable UnionisedAmmonia ammonia) {
        if (ammonia != null) {
            json.writeObjectPropertyStart("ammonia");
            json.writeNumberProperty("unionisedShare", Rounding.to(ammonia.share(), DIGITS));
            json.writeNumberProperty("unionisedMgL", Rounding.to(ammonia.nitrogenMgL(), DIGITS));
            json.writeNumberProperty("unionisedNh3MgL", Rounding.to(ammonia.nh3MgL(), DIGITS));
            json.writeEndObject();
        }
    }

    private void cautions(List<Caution> cautions) {
        json.writeName(CAUTIONS);
        json.writeStartArray();
        for (Caution caution : cautions) {
            json.writeStartObject();
            json.writeStringProperty("code", caution.code());
            json.writeStringProperty("detail", caution.detail());
            json.writeEndObject();
        }
        json.writeEndArray();
    }
}
