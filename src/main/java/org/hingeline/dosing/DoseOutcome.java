package org.hingeline.dosing;

import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * How a dose came out, held against what was foretold of it.
 *
 * @param detail a sentence for people, with what to check
 * @param seen the numbers; null when none could be had
 */
public record DoseOutcome(
        Verdict verdict, String detail, @Nullable Seen seen) {

    /** In one word. */
    public enum Verdict {
        /** The tank is not mixed yet, or its readings are still to come. */
        NOT_YET("not-yet"),
        AS_FORETOLD("as-foretold"),
        LESS("less-than-foretold"),
        MORE("more-than-foretold"),
        CANNOT_TELL("cannot-tell");

        private final String code;

        Verdict(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    /** What the arrival of the dose was read from. */
    public enum Basis {
        /** pH, with the alkalinity and carbon of before and the agent's shares of both. */
        PH("ph"),
        /** An alkalinity measured after the dose, which no exchange of CO2 with the air can move. */
        TOTAL_ALKALINITY("totalAlkalinity");

        private final String code;

        Basis(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    /**
     * What was seen once all was mixed.
     *
     * @param states how many water states it rests on
     * @param phTotal median pH, total scale
     * @param omegaAragonite Ω of the water with the alkalinity that arrived
     * @param arrivedAlkalinity alkalinity that the readings say arrived, mol/kg-seawater
     * @param expectedAlkalinity alkalinity that was to arrive, mol/kg-seawater
     * @param standardUncertainty of the difference of these two, mol/kg-seawater, without the constants' share
     */
    public record Seen(
            Basis basis,
            int states,
            double phTotal,
            double omegaAragonite,
            double arrivedAlkalinity,
            double expectedAlkalinity,
            double standardUncertainty) {
        /** The share of the dose that arrived, 1 when all of it did. */
        public double share() {
            return arrivedAlkalinity / expectedAlkalinity;
        }
    }

    public DoseOutcome {
        Objects.requireNonNull(verdict, "verdict");
    }

    static DoseOutcome notYet(String detail) {
        return new DoseOutcome(Verdict.NOT_YET, detail, null);
    }

    static DoseOutcome cannotTell(String detail) {
        return new DoseOutcome(Verdict.CANNOT_TELL, detail, null);
    }
}
