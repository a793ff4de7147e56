package org.hingeline.seawater;

/**
 * Dissociation of bisulfate: Dickson, A. G. (1990), Standard potential of the reaction AgCl(s) + ½H2(g) = Ag(s) +
 * HCl(aq), and the standard acidity constant of the ion HSO4⁻ in synthetic sea water from 273.15 to 318.15 K, Journal
 * of Chemical Thermodynamics 22, 113–127, eq. 22 and 23. Free scale, mol/kg-seawater.
 */
final class Bisulfate {
    static final FitRange RANGE = new FitRange("KS of Dickson 1990", 5, 45, 0, 45);

    private Bisulfate() {}

    /** ln KS, free scale; t in K, s practical salinity. */
    static double lnK(double t, double s) {
        double i = SeaSalt.ionicStrength(s);
        double root = Math.sqrt(i);
        double lnT = Math.log(t);
        return -4276.1 / t
                + 141.328
                - 23.093 * lnT
                + (-13856 / t + 324.57 - 47.986 * lnT) * root
                + (35474 / t - 771.54 + 114.723 * lnT) * i
                - 2698 / t * i * root
                + 1776 / t * i * i
                + Math.log(SeaSalt.waterShare(s));
    }
}
