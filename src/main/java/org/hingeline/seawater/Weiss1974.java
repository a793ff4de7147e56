package org.hingeline.seawater;

/**
 * Solubility and non-ideality of CO2: Weiss, R. F. (1974), Carbon dioxide in water and seawater: the solubility of a
 * non-ideal gas, Marine Chemistry 2, 203–215.
 */
final class Weiss1974 {
    static final FitRange RANGE = new FitRange("K0 of Weiss 1974", 0, 45, -1, 45);

    /** cm³ atm/(mol K). */
    private static final double GAS_CONSTANT = 82.05736;

    private static final double A1 = -60.2409;
    private static final double A2 = 93.4517;
    private static final double A3 = 23.3585;
    private static final double B1 = 0.023517;
    private static final double B2 = -0.023656;
    private static final double B3 = 0.0047036;

    private Weiss1974() {}

    /**
     * Henry's constant of CO2, eq. 12 with the constants of table 1 for mol/(kg atm).
     *
     * @param t temperature, K
     * @param s practical salinity
     * @return ln of K0 in mol/(kg atm)
     */
    static double lnK0(double t, double s) {
        double hundreds = t / 100;
        return A1 + A2 / hundreds + A3 * Math.log(hundreds) + s * (B1 + B2 * hundreds + B3 * hundreds * hundreds);
    }

    /**
     * Fugacity over partial pressure of a little CO2 in air at 1 atm, eq. 9 with the virial coefficients of eq. 6 and
     * 11.
     *
     * @param t temperature, K
     * @return ln of fCO2/pCO2
     */
    static double lnFugacityFactor(double t) {
        double b = -1636.75 + t * (12.0408 + t * (-0.0327957 + t * 3.16528e-5)); // cm³/mol, eq. 6
        double delta = 57.7 - 0.118 * t; // cm³/mol, eq. 11
        return (b + 2 * delta) / (GAS_CONSTANT * t);
    }
}
