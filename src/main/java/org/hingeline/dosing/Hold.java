package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;

/** What a plan of two agents holds while it brings Ω to its target. */
public sealed interface Hold {
    /** Whether a water keeps it. */
    boolean keptBy(CarbonateState state);

    String words();

    /** A ceiling of pH, total scale, above 6 to 9: the second agent comes in only as far as the ceiling asks for it. */
    record PhAtMost(double phTotalMax) implements Hold {
        @Override
        public boolean keptBy(CarbonateState state) {
            return state.phTotal() <= phTotalMax;
        }

        @Override
        public String words() {
            return "pH at most " + phTotalMax + " (total scale)";
        }
    }

    /** A partial pressure of CO2 that the water, closed to the air, is to have, atm, 100e-6 to 10,000e-6. */
    record Pco2(double pco2Atm) implements Hold {
        @Override
        public boolean keptBy(CarbonateState state) {
            return true;
        }

        @Override
        public String words() {
            return "pCO2 " + Words.number(pco2Atm * 1e6, 0) + " µatm";
        }
    }
}
