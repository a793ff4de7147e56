package org.hingeline.dosing;

import java.util.OptionalDouble;

/**
 * What the water is like where stock enters it, before it is mixed in. Lime particles showed no loss near Ω aragonite 5;
 * aragonite forms above about 7, and a runaway loses more alkalinity than was added (Moras et al. 2022); it forms by
 * itself near 12.3 (Marion et al. 2009, from memory).
 *
 * @param alkalinityPerLitre what a litre of stock adds to a kilogram of water, mol
 */
record Plume(DosedWater water, double alkalinityPerLitre) {
    static final double OMEGA_ARAGONITE_FORMS = 7;
    static final double OMEGA_SPONTANEOUS = 12.3;

    static Plume of(DosedWater water, Stock stock) {
        Product product = water.products().get(0);
        return new Plume(
                water,
                stock.gramsPerLitre() * product.molPerGram() * product.agent().alkalinityPerMol());
    }

    /** Litres of the water that must surround a litre of stock for Ω to come down to that; empty where it never is above. */
    OptionalDouble litresPerLitreTo(double omegaAragonite) {
        OptionalDouble added =
                DoseSearch.alkalinityFor(water, new Target.OmegaAragonite(omegaAragonite), omegaAragonite);
        if (added.isEmpty() || added.getAsDouble() == 0) {
            return OptionalDouble.empty();
        }
        double litres =
                alkalinityPerLitre / added.getAsDouble() / water.before().densityKgM3() * 1000;
        return litres > 1 ? OptionalDouble.of(litres) : OptionalDouble.empty();
    }
}
