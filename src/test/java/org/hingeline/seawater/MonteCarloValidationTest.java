package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.function.BinaryOperator;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.DicAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.KnownPair.PhAndDic;
import org.hingeline.seawater.KnownPair.PhAndPco2;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * First-order propagation against chance (JCGM 101:2008): 200,000 draws of every input, of every constant, and of both, each
 * solved from the beginning. All outputs must spread as was propagated, within 3 %, with the default uncertainties.
 *
 * <p>So many draws know a standard deviation to 0.16 %. The rest is for the curvature that first order leaves out, which
 * for a quantity that moves by a fraction s of itself is about s² of its spread.
 */
class MonteCarloValidationTest {
    private static final int DRAWS = 200_000;
    private static final int PARTS = 16;
    private static final double WITHIN = 0.03;
    /** mol/kg and atm: rounding, where a quantity is given or stays. */
    private static final double NOTHING = 1e-15;

    /** Water of a hatchery in spring. */
    private static final Conditions C = Conditions.of(14, 30);
    /** pH 7.8 and TA 2078 µmol/kg, and what goes with them. */
    private static final CarbonateState W =
            CarbonateSystem.solve(C, new PhAndAlkalinity(7.8, 2078e-6)).orElseThrow();

    private static final double PH = W.phTotal();
    private static final double TA = W.totalAlkalinity();
    private static final double DIC = W.dic();
    private static final double PCO2 = W.pco2Atm();

    /** What is drawn, and what was propagated for it. */
    record Case(String name, int inputs, Drawing drawing, StateUncertainty propagated) {
        @Override
        public String toString() {
            return name;
        }
    }

    interface Drawing {
        double[] outputs(double[] inputsOff, double[] constantsOff);
    }

    static Stream<Case> measuredWaters() {
        Map<String, KnownPair> pairs = new TreeMap<>();
        pairs.put("pH and alkalinity", new PhAndAlkalinity(PH, TA));
        pairs.put("pH and carbon", new PhAndDic(PH, DIC));
        pairs.put("pH and pCO2", new PhAndPco2(PH, PCO2));
        pairs.put("alkalinity and carbon", new AlkalinityAndDic(TA, DIC));
        pairs.put("alkalinity and pCO2", new AlkalinityAndPco2(TA, PCO2));
        pairs.put("carbon and pCO2", new DicAndPco2(DIC, PCO2));
        double free = PhScale.FREE.fromTotal(PH, C.temperatureC(), C.salinity());
        pairs.put("pH on the free scale and alkalinity", new PhAndAlkalinity(free, PhScale.FREE, TA));
        double nbs = PhScale.NBS.fromTotal(PH, C.temperatureC(), C.salinity());
        pairs.put("pH on NBS buffers and alkalinity", new PhAndAlkalinity(nbs, PhScale.NBS, TA));
        double at25 = Treatment.atTemperature(W, 25).orElseThrow().phTotal();
        KnownPh inLaboratory = KnownPh.total(at25).readAt(25);
        pairs.put("pH read at 25 °C and alkalinity", new PhAndAlkalinity(inLaboratory, TA));
        pairs.put("pH read at 25 °C and carbon", new PhAndDic(inLaboratory, DIC));
        pairs.put("pH read at 25 °C and pCO2", new PhAndPco2(inLaboratory, PCO2));
        KnownPh nbsInLaboratory = KnownPh.on(PhScale.NBS, PhScale.NBS.fromTotal(at25, 25, C.salinity()))
                .readAt(25);
        pairs.put("pH on NBS buffers read at 25 °C and alkalinity", new PhAndAlkalinity(nbsInLaboratory, TA));
        Stream<Case> plain = pairs.entrySet().stream()
                .map(e -> measured(e.getKey(), new DrawnWater(C, e.getValue(), InputUncertainty.DEFAULTS)));
        Conditions estuary = Conditions.of(14, 22)
                .with(CarbonicAcidFit.MILLERO_2006, BoronRatio.LEE_2010)
                .withNutrients(2e-6, 60e-6)
                .withCalcium(7.1e-3);
        return Stream.concat(
                plain,
                Stream.of(measured(
                        "an estuary with its own calcium",
                        new DrawnWater(estuary, new PhAndAlkalinity(7.7, 1700e-6), InputUncertainty.DEFAULTS))));
    }

    @ParameterizedTest
    @MethodSource("measuredWaters")
    void a_measured_water_spreads_as_propagated(Case drawn) {
        spreadsAsPropagated(drawn);
    }

    static Stream<Case> treatedWaters() {
        DrawnWater intake = new DrawnWater(C, new PhAndAlkalinity(PH, TA), InputUncertainty.DEFAULTS);
        DrawnWater river = new DrawnWater(
                Conditions.of(17, 21).withCalcium(6.4e-3), new PhAndDic(7.7, 1500e-6), InputUncertainty.DEFAULTS);
        Uncertainty ofIntake = propagated(intake);
        BinaryOperator<double[]> none = (before, after) -> after;
        BinaryOperator<double[]> change = (before, after) -> minus(after, before);
        CarbonateState warm = Treatment.atTemperature(W, 24).orElseThrow();
        CarbonateState aerated = Treatment.equilibrated(W, 420e-6).orElseThrow();
        double share = 0.3;
        CarbonateState blend = Treatment.blended(W, river.measured(), share).orElseThrow();
        return Stream.of(
                treated(
                        "warmed",
                        intake,
                        MonteCarloValidationTest::warmed,
                        none,
                        ofIntake.carriedTo(warm).ofState()),
                treated(
                        "the change by warming",
                        intake,
                        MonteCarloValidationTest::warmed,
                        change,
                        ofIntake.ofChangeTo(ofIntake.carriedTo(warm))),
                treated(
                        "aerated",
                        intake,
                        MonteCarloValidationTest::aerated,
                        none,
                        ofIntake.carriedTo(aerated).ofState()),
                treated(
                        "the change by aeration",
                        intake,
                        MonteCarloValidationTest::aerated,
                        change,
                        ofIntake.ofChangeTo(ofIntake.carriedTo(aerated))),
                new Case(
                        "blended",
                        2 * DrawnWater.INPUTS,
                        (in, k) -> Outputs.of(blended(intake, river, share, in, k)),
                        ofIntake.blendedWith(propagated(river), share, blend).ofState()));
    }

    @ParameterizedTest
    @MethodSource("treatedWaters")
    void what_a_water_becomes_spreads_as_propagated(Case drawn) {
        spreadsAsPropagated(drawn);
    }

    /** What the default uncertainties are too wide for: said here, so that nobody takes first order for more than it is. */
    static Stream<Arguments> beyondFirstOrder() {
        double nbs = PhScale.NBS.fromTotal(PH, C.temperatureC(), C.salinity());
        Case onNbs = measured(
                "0.05 pH and pCO2, carbonate going with [H] squared",
                new DrawnWater(C, new PhAndPco2(KnownPh.on(PhScale.NBS, nbs), PCO2), InputUncertainty.DEFAULTS));
        Case dilute = measured(
                "little alkalinity and nearly as much carbon, 10 µmol/kg being one per cent of each",
                new DrawnWater(C, new AlkalinityAndDic(1000e-6, 940e-6), InputUncertainty.DEFAULTS));
        return Stream.of(
                Arguments.of(onNbs, "carbonate", 1.03, 1.08),
                Arguments.of(onNbs, "omegaAragonite", 1.03, 1.08),
                Arguments.of(dilute, "co2", 1.03, 1.08),
                Arguments.of(dilute, "pco2Atm", 1.03, 1.08));
    }

    @ParameterizedTest
    @MethodSource("beyondFirstOrder")
    void first_order_tells_a_little_too_little_where_uncertainty_is_wide(
            Case drawn, String quantity, double least, double most) {
        int q = Outputs.NAMES.indexOf(quantity);
        double propagated = Outputs.of(drawn.propagated)[q].fromInputs();
        assertThat(spread(drawn, true, false).standardDeviation(q) / propagated).isBetween(least, most);
    }

    private static Case measured(String name, DrawnWater water) {
        return new Case(
                name,
                DrawnWater.INPUTS,
                (in, k) -> Outputs.of(water.drawn(in, k)),
                propagated(water).ofState());
    }

    private static Uncertainty propagated(DrawnWater water) {
        return Uncertainty.ofMeasured(water.measured(), water.u(), ConstantUncertainty.ORR_2018);
    }

    private interface Becomes {
        CarbonateState after(CarbonateState before, double[] constantsOff);
    }

    private static Case treated(
            String name,
            DrawnWater water,
            Becomes becomes,
            BinaryOperator<double[]> told,
            StateUncertainty propagated) {
        return new Case(
                name,
                DrawnWater.INPUTS,
                (in, k) -> {
                    CarbonateState before = water.drawn(in, k);
                    return told.apply(Outputs.of(before), Outputs.of(becomes.after(before, k)));
                },
                propagated);
    }

    private static CarbonateState warmed(CarbonateState before, double[] constantsOff) {
        return DrawnWater.solve(
                before.conditions().withTemperatureC(24),
                new AlkalinityAndDic(before.totalAlkalinity(), before.dic()),
                constantsOff);
    }

    private static CarbonateState aerated(CarbonateState before, double[] constantsOff) {
        return DrawnWater.solve(
                before.conditions(), new AlkalinityAndPco2(before.totalAlkalinity(), 420e-6), constantsOff);
    }

    private static CarbonateState blended(
            DrawnWater one, DrawnWater other, double share, double[] off, double[] constantsOff) {
        double[] offOfOther = new double[DrawnWater.INPUTS];
        System.arraycopy(off, DrawnWater.INPUTS, offOfOther, 0, DrawnWater.INPUTS);
        CarbonateState blend = Treatment.blended(
                        one.drawn(off, constantsOff), other.drawn(offOfOther, constantsOff), share)
                .orElseThrow();
        return DrawnWater.solve(blend.conditions(), blend.known(), constantsOff);
    }

    private static double[] minus(double[] a, double[] b) {
        return IntStream.range(0, a.length).mapToDouble(i -> a[i] - b[i]).toArray();
    }

    private static void spreadsAsPropagated(Case drawn) {
        Spread ofInputs = spread(drawn, true, false);
        Spread ofConstants = spread(drawn, false, true);
        Spread ofBoth = spread(drawn, true, true);
        StandardUncertainty[] u = Outputs.of(drawn.propagated);
        for (int q = 0; q < u.length; q++) {
            same(drawn, q, "inputs", ofInputs, u[q].fromInputs());
            same(drawn, q, "constants", ofConstants, u[q].fromConstants());
            same(drawn, q, "all", ofBoth, u[q].total());
        }
    }

    private static void same(Case drawn, int q, String share, Spread spread, double propagated) {
        double drawnDeviation = spread.standardDeviation(q);
        if (propagated <= NOTHING) {
            assertThat(drawnDeviation).isLessThanOrEqualTo(NOTHING);
            return;
        }
        assertThat(drawnDeviation / propagated)
                .as(
                        "%s of %s by %s: drawn %s, propagated %s",
                        Outputs.NAMES.get(q), drawn, share, drawnDeviation, propagated)
                .isBetween(1 - WITHIN, 1 + WITHIN);
    }

    /** Parts with a seed each, so that the draws are the same on any number of processors. */
    private static Spread spread(Case drawn, boolean inputs, boolean constants) {
        List<Spread> parts = IntStream.range(0, PARTS)
                .parallel()
                .mapToObj(part -> {
                    SplittableRandom random = new SplittableRandom(20080101 + part);
                    Spread spread = new Spread();
                    for (int i = 0; i < DRAWS / PARTS; i++) {
                        double[] in = draw(random, drawn.inputs, inputs);
                        spread.add(drawn.drawing.outputs(in, draw(random, PerturbedConstants.COUNT, constants)));
                    }
                    return spread;
                })
                .toList();
        return parts.stream().reduce(Spread::with).orElseThrow();
    }

    private static double[] draw(SplittableRandom random, int n, boolean off) {
        double[] values = new double[n];
        if (off) {
            for (int i = 0; i < n; i++) {
                values[i] = random.nextGaussian();
            }
        }
        return values;
    }
}
