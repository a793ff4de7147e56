package org.hingeline.dosing;

import java.util.Optional;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.ConstantUncertainty;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair.PhAndAlkalinity;
import org.hingeline.seawater.StateUncertainty;
import org.hingeline.seawater.Uncertainty;

/**
 * What a mass that was weighed makes of a water, closed to the air: alkalinity and inorganic carbon add up, all else
 * follows.
 *
 * @param before the water the dose went into
 * @param after the same water with the dose mixed in
 * @param ofChange standard uncertainty of after less before: what both share cancels
 */
public record DoseEffect(CarbonateState before, CarbonateState after, StateUncertainty ofChange) {

    /**
     * A mass given.
     *
     * @param product what was weighed
     * @param massG as weighed, g
     * @param volumeL water that it went into, L
     */
    public record Given(Product product, double massG, double volumeL) {
        /** Alkalinity it adds to a water of that density in kg/m³, mol/kg-seawater. */
        public double alkalinity(double densityKgM3) {
            return added(densityKgM3).alkalinity();
        }

        private AddedMatter added(double densityKgM3) {
            double mol = massG * product.molPerGram() / (volumeL / 1000 * densityKgM3);
            return AddedMatter.of(product.agent(), mol);
        }
    }

    /**
     * What the mass makes of a water solved from pH and alkalinity.
     *
     * @param measured the water as its sensors tell it
     * @param inputs standard uncertainties of what was measured
     * @param addedSince alkalinity of doses given after the alkalinity was measured, mol/kg-seawater: pH tells of them, a
     *     titration from before does not
     * @return nothing when the dosed water cannot be solved, or the water was solved from another pair
     */
    public static Optional<DoseEffect> of(
            CarbonateState measured, InputUncertainty inputs, double addedSince, Given given) {
        if (!(measured.known() instanceof PhAndAlkalinity known)) {
            return Optional.empty();
        }
        Optional<CarbonateState> before = addedSince == 0
                ? Optional.of(measured)
                : solved(CarbonateSystem.solve(
                        measured.constants(),
                        measured.conditions(),
                        new PhAndAlkalinity(known.ph(), known.totalAlkalinity() + addedSince)));
        return before.flatMap(water -> solved(given.added(water.densityKgM3()).to(water))
                .map(after -> {
                    Uncertainty ofBefore = Uncertainty.ofMeasured(water, inputs, ConstantUncertainty.ORR_2018);
                    return new DoseEffect(water, after, ofBefore.ofChangeTo(ofBefore.carriedTo(after)));
                }));
    }

    private static Optional<CarbonateState> solved(CarbonateResult result) {
        return result instanceof CarbonateResult.Solved solved ? Optional.of(solved.state()) : Optional.empty();
    }
}
