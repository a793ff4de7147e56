package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import org.hingeline.seawater.KnownPair.AlkalinityAndDic;
import org.hingeline.seawater.KnownPair.AlkalinityAndPco2;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.EnumSource;

/** First-order propagation against published shares and against stepping. */
class UncertaintyValidationTest {
    private static final Conditions WATER = Conditions.of(22, 30);
    private static final InputUncertainty NOTHING = only(0, 0, 0, 0, 0, 0);
    private static final PhAndAlkalinity PAIR = new PhAndAlkalinity(7.9, 2078e-6);

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/uncertainty.csv", useHeadersInDisplayName = true)
    void agrees_with_the_shares_computed_elsewhere(
            double ph,
            double totalAlkalinity,
            double temperatureC,
            double salinity,
            String share,
            double percent,
            double stepTolerance,
            double firstOrderTolerance) {
        InputUncertainty inputs =
                InputUncertainty.ofPhAndAlkalinity(ph, totalAlkalinity * 1e-6, temperatureC, salinity);
        CarbonateState state = CarbonateSystem.solve(WATER, PAIR).orElseThrow();
        StandardUncertainty firstOrder = Uncertainty.of(state, inputs).omegaAragonite();
        StandardUncertainty stepped = stepped(state, inputs);
        assertThat(percent(stepped, share, state)).as("stepped").isCloseTo(percent, within(stepTolerance));
        assertThat(percent(firstOrder, share, state)).as("first order").isCloseTo(percent, within(firstOrderTolerance));
    }

    private static double percent(StandardUncertainty u, String share, CarbonateState state) {
        double part = switch (share) {
            case "constants" -> u.fromConstants();
            case "inputs" -> u.fromInputs();
            case "total" -> u.total();
            default -> throw new IllegalArgumentException("no such share: " + share);
        };
        return 100 * part / state.omegaAragonite();
    }

    private static StandardUncertainty stepped(CarbonateState state, InputUncertainty u) {
        double omega = state.omegaAragonite();
        double constants = 0;
        for (int i = 0; i < Perturbed.CONSTANTS; i++) {
            double[] off = new double[Perturbed.CONSTANTS];
            // down in pK is up in K; Ksp goes down so that each step raises Ω, as the others do
            off[i] = i == Perturbed.KSP ? -1 : 1;
            constants = Math.hypot(
                    constants, Perturbed.omegaAragonite(WATER, PAIR.ph().value(), 2078e-6, off) - omega);
        }
        double inputs = 0;
        inputs = Math.hypot(inputs, omega(22, 30, 7.9 + u.ph(), 2078e-6) - omega);
        inputs = Math.hypot(inputs, omega(22, 30, 7.9, 2078e-6 + u.totalAlkalinity()) - omega);
        inputs = Math.hypot(inputs, omega(22 + u.temperatureC(), 30, 7.9, 2078e-6) - omega);
        inputs = Math.hypot(inputs, omega(22, 30 + u.salinity(), 7.9, 2078e-6) - omega);
        return StandardUncertainty.ofShares(constants, inputs);
    }

    private static double omega(double t, double s, double ph, double ta) {
        return CarbonateSystem.solve(Conditions.of(t, s), new PhAndAlkalinity(ph, ta))
                .orElseThrow()
                .omegaAragonite();
    }

    @ParameterizedTest
    @EnumSource(PhScale.class)
    void every_scale_moves_as_the_solver_does(PhScale scale) {
        double ph = scale.fromTotal(7.9, 22, 30);
        slopesAreThoseOfTheSolver(WATER, (a, b) -> new PhAndAlkalinity(ph + a, scale, 2078e-6 + b * 1e-4));
    }

    @Test
    void each_origin_has_the_share_computed_elsewhere() {
        CarbonateState state = CarbonateSystem.solve(WATER, PAIR).orElseThrow();
        Map<Origin, Double> shares = Uncertainty.ofMeasured(
                        state, InputUncertainty.ofPhAndAlkalinity(0.02, 17e-6, 0.1, 0.1), ConstantUncertainty.ORR_2018)
                .ofOmegaAragoniteByOrigin();
        // percent of 1.9454, to the printed digit; first order for the constants and pH, as in uncertainty.csv
        assertThat(100 * shares.get(Origin.CONSTANTS) / state.omegaAragonite()).isCloseTo(5.5, within(0.05));
        assertThat(100 * shares.get(Origin.PH) / state.omegaAragonite()).isCloseTo(3.9, within(0.05));
        assertThat(100 * shares.get(Origin.TOTAL_ALKALINITY) / state.omegaAragonite())
                .isCloseTo(0.84, within(0.005));
        assertThat(100 * shares.get(Origin.TEMPERATURE) / state.omegaAragonite())
                .isCloseTo(0.37, within(0.005));
        assertThat(100 * shares.get(Origin.SALINITY) / state.omegaAragonite()).isCloseTo(0.17, within(0.005));
    }

    @Test
    void a_ph_on_nbs_buffers_carries_what_such_buffers_carry_however_little_is_claimed() {
        CarbonateState nbs = CarbonateSystem.solve(WATER, new PhAndAlkalinity(8.03, PhScale.NBS, 2078e-6))
                .orElseThrow();
        assertThat(fromInputs(Uncertainty.of(nbs, only(0.01, 0, 0, 0, 0, 0)), "phTotal"))
                .isCloseTo(0.05, within(1e-12));
        assertThat(fromInputs(Uncertainty.of(nbs, only(0.08, 0, 0, 0, 0, 0)), "phTotal"))
                .isCloseTo(0.08, within(1e-12));
    }

    @Test
    void the_other_pairs_move_as_the_solver_does() {
        slopesAreThoseOfTheSolver(WATER, (a, b) -> new AlkalinityAndPco2(2078e-6 + a * 1e-4, 600e-6 + b * 1e-4));
        slopesAreThoseOfTheSolver(
                WATER.withNutrients(2e-6, 50e-6),
                (a, b) -> new AlkalinityAndDic(2078e-6 + a * 1e-4, 1900e-6 + b * 1e-4));
    }

    interface PairOff {
        KnownPair by(double first, double second);
    }

    /** One input at a time: the propagated share over a small uncertainty is the solver's own slope. */
    private static void slopesAreThoseOfTheSolver(Conditions c, PairOff pair) {
        CarbonateState state = CarbonateSystem.solve(c, pair.by(0, 0)).orElseThrow();
        double e = 1e-4;
        boolean ph = pair.by(0, 0) instanceof PhAndAlkalinity;
        double first = ph ? 1 : 1e-4;
        InputUncertainty ofFirst = ph ? only(1, 0, 0, 0, 0, 0) : only(0, first, 0, 0, 0, 0);
        InputUncertainty ofSecond = ph
                ? only(0, 1e-4, 0, 0, 0, 0)
                : pair.by(0, 0) instanceof AlkalinityAndDic ? only(0, 0, 1e-4, 0, 0, 0) : only(0, 0, 0, 1e-4, 0, 0);
        for (String q : new String[] {"phTotal", "dic", "co2", "bicarbonate", "carbonate", "pco2", "omegaAragonite"}) {
            same(q, state, ofFirst, slope(c, pair.by(e, 0), c, pair.by(-e, 0), q) / (2 * e));
            same(q, state, ofSecond, slope(c, pair.by(0, e), c, pair.by(0, -e), q) / (2 * e));
            Conditions warm = c.withTemperatureC(22 + e);
            Conditions cold = c.withTemperatureC(22 - e);
            same(q, state, only(0, 0, 0, 0, 1, 0), slope(warm, pair.by(0, 0), cold, pair.by(0, 0), q) / (2 * e));
            Conditions salt = salinity(c, 30 + e);
            Conditions fresh = salinity(c, 30 - e);
            same(q, state, only(0, 0, 0, 0, 0, 1), slope(salt, pair.by(0, 0), fresh, pair.by(0, 0), q) / (2 * e));
        }
    }

    private static Conditions salinity(Conditions c, double s) {
        return new Conditions(c.temperatureC(), s, c.phosphate(), c.silicate(), c.calcium(), c.fit(), c.boron());
    }

    private static void same(String q, CarbonateState state, InputUncertainty u, double slope) {
        // what a pH on NBS buffers carries at least is there whatever else moves
        double carried = u.ph() == 0 ? fromInputs(Uncertainty.of(state, NOTHING), q) : 0;
        double expected = Math.hypot(slope, carried);
        assertThat(fromInputs(Uncertainty.of(state, u), q))
                .as("%s of %s with %s", q, state.known(), u)
                .isCloseTo(expected, within(1e-5 * expected + 1e-7));
    }

    private static double slope(Conditions up, KnownPair pairUp, Conditions down, KnownPair pairDown, String q) {
        return quantity(up, pairUp, q) - quantity(down, pairDown, q);
    }

    private static InputUncertainty only(double ph, double ta, double dic, double pco2, double t, double s) {
        return new InputUncertainty(ph, ta, dic, pco2, t, s, 0);
    }

    private static double quantity(Conditions c, KnownPair pair, String name) {
        return Quantities.of(CarbonateSystem.solve(c, pair).orElseThrow(), name);
    }

    private static double fromInputs(StateUncertainty u, String name) {
        return switch (name) {
            case "phTotal" -> u.phTotal().fromInputs();
            case "dic" -> u.dic().fromInputs() * 1e6;
            case "co2" -> u.co2().fromInputs() * 1e6;
            case "bicarbonate" -> u.bicarbonate().fromInputs() * 1e6;
            case "carbonate" -> u.carbonate().fromInputs() * 1e6;
            case "pco2" -> u.pco2Atm().fromInputs() * 1e6;
            case "omegaAragonite" -> u.omegaAragonite().fromInputs();
            default -> throw new IllegalArgumentException("no such quantity: " + name);
        };
    }
}
