package org.hingeline.seawater;

/**
 * What turns one pH scale into another in a given water: pH(total) = pH(scale) + offset.
 *
 * <p>[H]total = [H]free (1 + ST/KS); [H]seawater = [H]free (1 + ST/KS + FT/KF), with KF on the free scale (Dickson
 * 1984, Geochimica et Cosmochimica Acta 48, 2299–2308); a(H) on NBS = f_H [H]seawater.
 *
 * @param totalOverFree [H]total/[H]free
 * @param seawaterOverTotal [H]seawater/[H]total
 * @param nbsOverSeawater f_H
 */
record ScaleFactors(double totalOverFree, double seawaterOverTotal, double nbsOverSeawater) {
    /**
     * @param t temperature, K
     * @param s practical salinity
     * @param ks dissociation constant of bisulfate, free scale
     * @param kf dissociation constant of hydrogen fluoride, total scale
     */
    static ScaleFactors of(double t, double s, double ks, double kf) {
        double totalOverFree = 1 + SeaSalt.sulfate(s) / ks;
        // FT/KF(free) over totalOverFree is FT/KF(total)
        double seawaterOverTotal = 1 + SeaSalt.fluoride(s) / kf;
        return new ScaleFactors(totalOverFree, seawaterOverTotal, Takahashi1982.activityCoefficient(t, s));
    }

    /** What must be added to a pH on the scale to have it on the total scale. */
    double offsetToTotal(PhScale scale) {
        return switch (scale) {
            case TOTAL -> 0;
            case SEAWATER -> Math.log10(seawaterOverTotal);
            case FREE -> -Math.log10(totalOverFree);
            case NBS -> Math.log10(seawaterOverTotal * nbsOverSeawater);
        };
    }
}
