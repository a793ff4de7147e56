package org.hingeline.monitor;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.hingeline.seawater.PhScale;
import org.jspecify.annotations.Nullable;

/**
 * How a water was computed: what may differ from one to the next. {@link #words} tells the whole.
 *
 * @param phScale of the pH given; null when none was
 * @param phReadElsewhere whether it was read at another temperature than the water's
 */
public record WaterMethod(
        CarbonicAcidFit constants,
        BoronRatio boron,
        @Nullable PhScale phScale,
        boolean phReadElsewhere,
        boolean salinityFromConductivity,
        boolean calciumMeasured,
        boolean withUncertainty,
        boolean ammonia) {
    public WaterMethod {
        Objects.requireNonNull(constants, "constants");
        Objects.requireNonNull(boron, "boron");
    }

    /** What was used for what, with authors and year; the keys are names of the wire. */
    public Map<String, String> words() {
        Map<String, String> words = new LinkedHashMap<>();
        words.put("constants", "K1 and K2 of carbonic acid: " + authors(constants));
        words.put("boron", "Total boron from salinity: " + authors(boron));
        words.put("borate", "KB: Dickson 1990");
        words.put("bisulfate", "KS: Dickson 1990; total sulfate from salinity: Morris & Riley 1966");
        words.put("fluoride", "KF: Perez & Fraga 1987; total fluoride from salinity: Riley 1965");
        words.put("water", "KW: Millero 1995, as given in Dickson, Sabine & Christian 2007");
        words.put(
                "nutrients",
                "KP1, KP2, KP3 and KSi: Millero 1995, as given in Dickson, Sabine & Christian 2007; phosphate and"
                        + " silicate as given, 0 where not");
        words.put("co2Solubility", "K0 and fugacity of CO2: Weiss 1974");
        words.put("ksp", "Ksp of aragonite and calcite: Mucci 1983");
        words.put("calcium", calciumMeasured ? "As given" : "From salinity: Riley & Tongudai 1967");
        words.put("density", "Millero & Poisson 1981");
        words.put(
                "salinity",
                salinityFromConductivity
                        ? "From conductivity: PSS-78, Perkin & Lewis 1980; below 2 Hill, Dauphinee & Woods 1986"
                        : "As given");
        words.put("alkalinity", "Total alkalinity as defined by Dickson 1981");
        words.put("pressure", "1 atm");
        words.put("phScale", "total");
        String conversion = conversion();
        if (conversion != null) {
            words.put("phConversion", conversion);
        }
        if (withUncertainty) {
            words.put(
                    "uncertainty",
                    "First order, inputs taken as independent (JCGM 100:2008); of the constants: Orr, Epitalon, Dickson &"
                            + " Gattuso 2018");
        }
        if (ammonia) {
            words.put("ammonia", "Dissociation of ammonium: Clegg & Whitfield 1995");
        }
        return words;
    }

    private @Nullable String conversion() {
        if (phScale == null || phScale == PhScale.TOTAL && !phReadElsewhere) {
            return null;
        }
        String scale = phScale == PhScale.TOTAL ? "" : "The pH given, " + onScale(phScale);
        String elsewhere =
                "The pH was read at phTemperatureC: the closed sample was solved there, and its alkalinity and"
                        + " inorganic carbon were carried over to temperatureC.";
        return phReadElsewhere ? (scale.isEmpty() ? elsewhere : scale + " " + elsewhere) : scale;
    }

    private static String onScale(PhScale scale) {
        return switch (scale) {
            case TOTAL -> "on the total scale, was taken as it is.";
            case SEAWATER -> "on the seawater scale, was converted with KF of Perez & Fraga 1987.";
            case FREE -> "on the free scale, was converted with KS of Dickson 1990.";
            case NBS ->
                "on NBS buffers, was converted with f_H of Takahashi et al. 1982 to the seawater scale and on with KF of"
                        + " Perez & Fraga 1987; it counts with an uncertainty of at least 0.05.";
        };
    }

    private static String authors(CarbonicAcidFit fit) {
        return switch (fit) {
            case LUEKER_2000 -> "Lueker, Dickson & Keeling 2000";
            case MILLERO_2006 -> "Millero et al. 2006, from the seawater scale";
            case WATERS_2014 -> "Waters, Millero & Woosley 2014, from the seawater scale";
        };
    }

    private static String authors(BoronRatio ratio) {
        return ratio.title();
    }
}
