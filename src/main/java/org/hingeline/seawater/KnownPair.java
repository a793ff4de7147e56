package org.hingeline.seawater;

import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * The two carbonate quantities that are known: any two of pH, total alkalinity, dissolved inorganic carbon and pCO2.
 * Values are judged by {@link CarbonateSystem}, not here.
 *
 * <p>Everywhere total alkalinity is in mol/kg-seawater (−0.01 to 0.1), dissolved inorganic carbon in mol/kg-seawater (0
 * to 0.1), and pCO2 is the partial pressure of CO2 in air at equilibrium with the water at its own temperature, in atm
 * (not µatm; above 0, at most 1).
 */
public sealed interface KnownPair {
    /** The pH, when it is one of the two. */
    default @Nullable KnownPh ph() {
        return null;
    }

    /** pH and total alkalinity. */
    record PhAndAlkalinity(@Override KnownPh ph, double totalAlkalinity) implements KnownPair {
        public PhAndAlkalinity {
            Objects.requireNonNull(ph, "ph");
        }

        /** With pH on the total scale, at the water's temperature. */
        public PhAndAlkalinity(double phTotal, double totalAlkalinity) {
            this(KnownPh.total(phTotal), totalAlkalinity);
        }

        /** With pH on that scale, at the water's temperature. */
        public PhAndAlkalinity(double ph, PhScale scale, double totalAlkalinity) {
            this(KnownPh.on(scale, ph), totalAlkalinity);
        }
    }

    /** pH and dissolved inorganic carbon. */
    record PhAndDic(@Override KnownPh ph, double dic) implements KnownPair {
        public PhAndDic {
            Objects.requireNonNull(ph, "ph");
        }

        /** With pH on the total scale, at the water's temperature. */
        public PhAndDic(double phTotal, double dic) {
            this(KnownPh.total(phTotal), dic);
        }
    }

    /** pH and partial pressure of CO2. */
    record PhAndPco2(@Override KnownPh ph, double pco2Atm) implements KnownPair {
        public PhAndPco2 {
            Objects.requireNonNull(ph, "ph");
        }

        /** With pH on the total scale, at the water's temperature. */
        public PhAndPco2(double phTotal, double pco2Atm) {
            this(KnownPh.total(phTotal), pco2Atm);
        }
    }

    /** Total alkalinity and dissolved inorganic carbon. */
    record AlkalinityAndDic(double totalAlkalinity, double dic) implements KnownPair {}

    /** Total alkalinity and partial pressure of CO2. */
    record AlkalinityAndPco2(double totalAlkalinity, double pco2Atm) implements KnownPair {}

    /** Dissolved inorganic carbon and partial pressure of CO2. */
    record DicAndPco2(double dic, double pco2Atm) implements KnownPair {}
}
