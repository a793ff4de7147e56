package org.hingeline.hatchery;

import java.time.Instant;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * What was put into a tank: a record that stays. A mistake is undone or corrected, never deleted.
 *
 * @param key given by whoever records it; the same key records once
 * @param at when it was put in
 * @param by who recorded it
 * @param followedPlan whether a dose plan was followed
 * @param foretold what it was to make of the water; null when the water or the volume was not known
 * @param corrects the entry that this one takes the place of, if any
 * @param correctedBy the entry that took the place of this one, if any
 * @param secondPerson whether it counts as given only once somebody else has confirmed it
 * @param confirmed who confirmed it
 * @param undone who undid it
 */
public record Dose(
        long id,
        long siteId,
        long pointId,
        String key,
        Instant at,
        Instant recordedAt,
        String by,
        Given given,
        boolean followedPlan,
        @Nullable Foretold foretold,
        @Nullable Long corrects,
        @Nullable Long correctedBy,
        boolean secondPerson,
        @Nullable Signed confirmed,
        @Nullable Signed undone) {

    /** A name and a time. */
    public record Signed(String by, Instant at) {}

    /**
     * What was weighed.
     *
     * @param agent code of the chemical
     * @param hydration code of its form
     * @param assayPercent g of that form in 100 g of what was weighed, 1 to 100
     * @param lot as printed on the bag, 1 to 80 characters
     * @param massG as weighed, g; 0 when a correction says that nothing was put in
     * @param note may be empty
     */
    public record Given(String agent, String hydration, double assayPercent, String lot, double massG, String note) {
        public Given {
            if (!(assayPercent >= 1 && assayPercent <= 100)) {
                throw new IllegalArgumentException("assayPercent " + assayPercent + " must be 1 to 100");
            }
            if (!(massG >= 0 && massG <= MAX_MASS_G)) {
                throw new IllegalArgumentException("massG " + massG + " must be 0 to " + MAX_MASS_G);
            }
            if (lot.isBlank() || lot.length() > 80) {
                throw new IllegalArgumentException("lot \"" + lot + "\" must have 1 to 80 characters");
            }
            if (note.length() > 500) {
                throw new IllegalArgumentException("note has " + note.length() + " characters; at most 500 are kept");
            }
        }
    }

    /**
     * What the dose was to make of the water, closed to the air, reckoned by the service from the water before it and the
     * mass given.
     *
     * @param stateAt time of the water state it was reckoned from
     * @param volumeL water in the tank, L
     * @param mixingMin minutes until the tank counts as mixed
     * @param before the water before; its alkalinity has those doses added that were given since it was measured
     * @param after the water foretold
     * @param phChangeUncertainty standard uncertainty of the foretold change of pH, without the constants' share
     * @param omegaChangeUncertainty standard uncertainty of the foretold change of Ω aragonite, without that share
     * @param alkalinityUncertaintyUmolKg standard uncertainty of a measured alkalinity, µmol/kg
     */
    public record Foretold(
            Instant stateAt,
            double volumeL,
            double temperatureC,
            double salinity,
            int mixingMin,
            Water before,
            Water after,
            double phChangeUncertainty,
            double omegaChangeUncertainty,
            double alkalinityUncertaintyUmolKg) {

        /** Alkalinity that the dose was to add, µmol/kg. */
        public double addedAlkalinityUmolKg() {
            return after.totalAlkalinityUmolKg() - before.totalAlkalinityUmolKg();
        }
    }

    /** A water in four numbers; pH on the total scale. */
    public record Water(double phTotal, double omegaAragonite, double totalAlkalinityUmolKg, double dicUmolKg) {}

    /** Where a record stands. */
    public enum Standing {
        /** Waits for a second person; nothing should be put in yet. */
        PENDING("pending"),
        /** Counts as given. */
        RECORDED("recorded"),
        UNDONE("undone"),
        /** Another entry took its place. */
        CORRECTED("corrected");

        private final String code;

        Standing(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    /** Most that one record can hold, g. */
    public static final double MAX_MASS_G = 1_000_000;

    public Dose {
        Objects.requireNonNull(given, "given");
        if (key.length() < 8 || key.length() > 80) {
            throw new IllegalArgumentException("key \"" + key + "\" must have 8 to 80 characters");
        }
    }

    public Standing standing() {
        if (undone != null) {
            return Standing.UNDONE;
        }
        if (correctedBy != null) {
            return Standing.CORRECTED;
        }
        return secondPerson && confirmed == null ? Standing.PENDING : Standing.RECORDED;
    }

    /** Whether it is, or may soon be, in the water: neither undone nor corrected. */
    public boolean counts() {
        return standing() == Standing.RECORDED || standing() == Standing.PENDING;
    }
}
