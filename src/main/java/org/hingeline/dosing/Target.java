package org.hingeline.dosing;

import org.hingeline.seawater.CarbonateState;

/** What the dose is to reach. */
public sealed interface Target {
    /** The number to reach. */
    double value();

    /** The same quantity of a water. */
    double of(CarbonateState state);

    /** With its number, for a sentence. */
    String words();

    /** Saturation state of aragonite. */
    record OmegaAragonite(double value) implements Target {
        @Override
        public double of(CarbonateState state) {
            return state.omegaAragonite();
        }

        @Override
        public String words() {
            return "Ω aragonite " + value;
        }
    }

    /** pH, total scale. */
    record PhTotal(double value) implements Target {
        @Override
        public double of(CarbonateState state) {
            return state.phTotal();
        }

        @Override
        public String words() {
            return "pH " + value + " (total scale)";
        }
    }

    /** Total alkalinity, mol/kg-seawater. */
    record TotalAlkalinity(double value) implements Target {
        @Override
        public double of(CarbonateState state) {
            return state.totalAlkalinity();
        }

        @Override
        public String words() {
            return "total alkalinity " + Words.number(value * 1e6, 0) + " µmol/kg";
        }
    }
}
