package org.hingeline.monitor;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.hingeline.monitor.WaterFaults.Range;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.hingeline.seawater.Caution;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.hingeline.seawater.KnownPh;
import org.hingeline.seawater.PhScale;
import org.hingeline.seawater.UnsolvableReason;
import org.jspecify.annotations.Nullable;

/** Reads a wished water into the core's units and finds everything that cannot be taken. */
final class WishReader {
    static final Range TEMPERATURE_C = Range.of(-2, 45, " °C");
    static final Range PCO2_UATM = Range.above(0, 1_000_000, " µatm");

    private static final Range SALINITY = Range.of(0, 50, "");
    private static final Range CONDUCTIVITY_MS_CM = Range.of(0, 200, " mS/cm");
    private static final Range PH = Range.of(2, 13, "");
    private static final Range ALKALINITY_UMOL_KG = Range.of(-10_000, 100_000, " µmol/kg");
    private static final Range DIC_UMOL_KG = Range.of(0, 100_000, " µmol/kg");
    private static final Range PHOSPHATE_UMOL_KG = Range.of(0, 1000, " µmol/kg");
    private static final Range SILICATE_UMOL_KG = Range.of(0, 10_000, " µmol/kg");
    private static final Range CALCIUM_MMOL_KG = Range.of(0, 100, " mmol/kg");
    private static final String PAIR = "ph, totalAlkalinityUmolKg, dicUmolKg, pco2Uatm";

    /** A salinity with what is known of it. */
    private record Salinity(
            double value, ConductivitySalinity.@Nullable Slopes ofConductivity, List<Caution> cautions) {
        static final Salinity NONE = given(Double.NaN);

        static Salinity given(double value) {
            return new Salinity(value, null, List.of());
        }

        InputUncertainty in(InputUncertainty inputs, double ofConductivityMsCm) {
            return ofConductivity == null ? inputs : inputs.withSalinityFrom(ofConductivityMsCm, ofConductivity);
        }
    }

    private final WaterWish wish;
    private final WaterFaults faults;
    private final WishUncertainty uncertainty;

    WishReader(WaterWish wish, WaterFaults faults) {
        this.wish = wish;
        this.faults = faults;
        this.uncertainty = new WishUncertainty(wish.uncertainty(), faults);
    }

    /**
     * The water, or null when the faults say why not.
     *
     * @param usual the fits where the wish names none
     */
    @Nullable
    WishedWater read(Conditions usual) {
        double temperatureC = required("temperatureC", wish.temperatureC());
        PhScale scale = scale();
        Double readAtC = readAtC();
        InputUncertainty inputs = uncertainty.inputs(scale);
        double ofConductivityMsCm = uncertainty.ofConductivityMsCm();
        Salinity salinity = salinity(temperatureC);
        Conditions conditions = new Conditions(
                temperatureC,
                salinity.value(),
                amount("phosphateUmolKg", wish.phosphateUmolKg(), PHOSPHATE_UMOL_KG) / 1e6,
                amount("silicateUmolKg", wish.silicateUmolKg(), SILICATE_UMOL_KG) / 1e6,
                calcium(),
                fit(usual.fit()),
                boron(usual.boron()));
        KnownPair known = pair(scale, readAtC);
        return known == null || faults.any()
                ? null
                : new WishedWater(
                        wish,
                        conditions,
                        known,
                        salinity.in(inputs, ofConductivityMsCm),
                        salinity.ofConductivity() != null,
                        salinity.cautions());
    }

    /** Tells of every wish about what the water becomes; where it is only an ingredient, it has none. */
    void refuseTreatments(String why) {
        treatment("warmToC", wish.warmToC() != null, why);
        treatment("equilibrateToUatm", wish.equilibrateToUatm() != null, why);
        treatment("blendWith", wish.blendWith() != null, why);
        treatment("ammoniaMgL", wish.ammoniaMgL() != null, why);
    }

    private void treatment(String name, boolean given, String why) {
        if (given) {
            faults.add(name, faults.at(name) + " is not taken here: " + why);
        }
    }

    private double required(String name, @Nullable Double value) {
        if (value == null) {
            faults.add(name, faults.at(name) + " is missing; " + TEMPERATURE_C.words() + " is accepted");
            return Double.NaN;
        }
        return faults.number(name, value, TEMPERATURE_C, UnsolvableReason.TEMPERATURE_NOT_COVERED);
    }

    private Salinity salinity(double temperatureC) {
        Double given = wish.salinity();
        Double conductivity = wish.conductivityMsCm();
        if (given != null && conductivity != null) {
            faults.add(
                    "conductivityMsCm",
                    "only one of " + faults.at("salinity") + " and conductivityMsCm is accepted, got "
                            + WaterFaults.plain(given) + " and " + WaterFaults.plain(conductivity));
            return Salinity.NONE;
        }
        if (conductivity != null) {
            uncertainty.refuseThatOfSalinity();
            double value = faults.number(
                    "conductivityMsCm", conductivity, CONDUCTIVITY_MS_CM, UnsolvableReason.SALINITY_NOT_COVERED);
            return Double.isNaN(value) || Double.isNaN(temperatureC)
                    ? Salinity.NONE
                    : ofConductivity(value, temperatureC);
        }
        uncertainty.refuseThatOfConductivity();
        if (given == null) {
            faults.add(
                    "salinity",
                    faults.at("salinity") + " is missing; " + SALINITY.words()
                            + " is accepted, or conductivityMsCm in its place");
        }
        return Salinity.given(faults.number("salinity", given, SALINITY, UnsolvableReason.SALINITY_NOT_COVERED));
    }

    private Salinity ofConductivity(double conductivity, double temperatureC) {
        Figure salinity = ConductivitySalinity.salinity(conductivity, temperatureC);
        if (!(salinity instanceof Figure.Known known)) {
            faults.addImpossible(
                    UnsolvableReason.SALINITY_NOT_COVERED,
                    "conductivityMsCm",
                    faults.at("conductivityMsCm") + " " + WaterFaults.plain(conductivity) + " at "
                            + WaterFaults.plain(temperatureC)
                            + " °C is beyond a salinity of 50; up to that of 50 is accepted");
            return Salinity.NONE;
        }
        return new Salinity(known.value(), ConductivitySalinity.slopes(conductivity, temperatureC), known.cautions());
    }

    private PhScale scale() {
        String name = wish.phScale();
        if (name == null) {
            return PhScale.TOTAL;
        }
        withoutPh("phScale", "\"" + name + "\"");
        Optional<PhScale> scale = PhScale.fromWireName(name);
        if (scale.isEmpty()) {
            unknown("phScale", name, Arrays.stream(PhScale.values()).map(PhScale::wireName));
        }
        return scale.orElse(PhScale.TOTAL);
    }

    private @Nullable Double readAtC() {
        Double readAtC = wish.phTemperatureC();
        if (readAtC == null) {
            return null;
        }
        withoutPh("phTemperatureC", WaterFaults.plain(readAtC));
        return faults.number("phTemperatureC", readAtC, TEMPERATURE_C, UnsolvableReason.TEMPERATURE_NOT_COVERED);
    }

    private void withoutPh(String name, String value) {
        if (wish.ph() == null) {
            faults.add(name, faults.at(name) + " " + value + " says how ph was read, and there is no ph");
        }
    }

    private CarbonicAcidFit fit(CarbonicAcidFit usual) {
        String name = wish.constants();
        if (name == null) {
            return usual;
        }
        Optional<CarbonicAcidFit> fit = CarbonicAcidFit.fromWireName(name);
        if (fit.isEmpty()) {
            unknown("constants", name, Arrays.stream(CarbonicAcidFit.values()).map(CarbonicAcidFit::wireName));
        }
        return fit.orElse(usual);
    }

    private BoronRatio boron(BoronRatio usual) {
        String name = wish.boron();
        if (name == null) {
            return usual;
        }
        Optional<BoronRatio> ratio = BoronRatio.fromWireName(name);
        if (ratio.isEmpty()) {
            unknown("boron", name, Arrays.stream(BoronRatio.values()).map(BoronRatio::wireName));
        }
        return ratio.orElse(usual);
    }

    private void unknown(String name, String value, Stream<String> accepted) {
        String shown = value.length() > 60 ? value.substring(0, 60) + "…" : value;
        faults.add(
                name,
                faults.at(name) + " \"" + shown + "\" is not known; accepted: "
                        + accepted.collect(Collectors.joining(", ")));
    }

    private double amount(String name, @Nullable Double value, Range range) {
        return value == null ? 0 : faults.number(name, value, range, UnsolvableReason.COMPOSITION_OUT_OF_RANGE);
    }

    private @Nullable Double calcium() {
        Double given = wish.calciumMmolKg();
        return given == null ? null : (Double) (amount("calciumMmolKg", given, CALCIUM_MMOL_KG) / 1e3);
    }

    private @Nullable KnownPair pair(PhScale scale, @Nullable Double readAtC) {
        Double givenPh = wish.ph();
        Double givenAlkalinity = wish.totalAlkalinityUmolKg();
        Double givenDic = wish.dicUmolKg();
        Double givenPco2 = wish.pco2Uatm();
        double ph = faults.number("ph", givenPh, PH, UnsolvableReason.PH_OUT_OF_RANGE);
        double alkalinity = faults.number(
                        "totalAlkalinityUmolKg",
                        givenAlkalinity,
                        ALKALINITY_UMOL_KG,
                        UnsolvableReason.ALKALINITY_OUT_OF_RANGE)
                / 1e6;
        double dic = faults.number("dicUmolKg", givenDic, DIC_UMOL_KG, UnsolvableReason.DIC_OUT_OF_RANGE) / 1e6;
        double pco2Atm = faults.number("pco2Uatm", givenPco2, PCO2_UATM, UnsolvableReason.PCO2_OUT_OF_RANGE) / 1e6;
        int given = (givenPh == null ? 0 : 1)
                + (givenAlkalinity == null ? 0 : 1)
                + (givenDic == null ? 0 : 1)
                + (givenPco2 == null ? 0 : 1);
        if (given != 2) {
            faults.add("", "exactly two of " + PAIR + " are needed, got " + (given == 0 ? "none" : namesGiven()));
            return null;
        }
        if (givenPh != null) {
            KnownPh known = new KnownPh(ph, scale, readAtC);
            return givenAlkalinity != null
                    ? new PhAndAlkalinity(known, alkalinity)
                    : givenDic != null ? new PhAndDic(known, dic) : new PhAndPco2(known, pco2Atm);
        }
        if (givenAlkalinity != null) {
            return givenDic != null
                    ? new AlkalinityAndDic(alkalinity, dic)
                    : new AlkalinityAndPco2(alkalinity, pco2Atm);
        }
        return new DicAndPco2(dic, pco2Atm);
    }

    private String namesGiven() {
        return Stream.of(
                        named("ph", wish.ph()),
                        named("totalAlkalinityUmolKg", wish.totalAlkalinityUmolKg()),
                        named("dicUmolKg", wish.dicUmolKg()),
                        named("pco2Uatm", wish.pco2Uatm()))
                .filter(name -> !name.isEmpty())
                .collect(Collectors.joining(", "));
    }

    private static String named(String name, @Nullable Double value) {
        return value == null ? "" : name + " " + WaterFaults.plain(value);
    }
}
