package org.hingeline.seawater;

import java.util.Objects;

/** The two carbonate quantities that are known. Values are judged by {@link CarbonateSystem}, not here. */
public sealed interface KnownPair {
    /**
     * pH and total alkalinity.
     *
     * @param ph pH at the water's temperature, on {@code scale}, 2 to 12
     * @param scale the scale of {@code ph}
     * @param totalAlkalinity mol/kg-seawater, −0.01 to 0.1
     */
    record PhAndAlkalinity(double ph, PhScale scale, double totalAlkalinity) implements KnownPair {
        public PhAndAlkalinity {
            Objects.requireNonNull(scale, "scale");
        }

        /** With pH on the total scale. */
        public PhAndAlkalinity(double phTotal, double totalAlkalinity) {
            this(phTotal, PhScale.TOTAL, totalAlkalinity);
        }
    }

    /**
     * Total alkalinity and dissolved inorganic carbon.
     *
     * @param totalAlkalinity mol/kg-seawater, −0.01 to 0.1
     * @param dic mol/kg-seawater, 0 to 0.1
     */
    record AlkalinityAndDic(double totalAlkalinity, double dic) implements KnownPair {}

    /**
     * Total alkalinity and partial pressure of CO2.
     *
     * @param totalAlkalinity mol/kg-seawater, −0.01 to 0.1
     * @param pco2Atm partial pressure of CO2 in air at equilibrium, atm (not µatm), above 0 to 1
     */
    record AlkalinityAndPco2(double totalAlkalinity, double pco2Atm) implements KnownPair {}
}
