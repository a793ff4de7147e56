package org.hingeline.seawater;

/**
 * Standard uncertainties of what was measured. Those of quantities that a water was not solved from are not used.
 *
 * <p>Inputs are taken as independent. An alkalinity from a salinity line is best given the line's own residual error,
 * which holds the salinity's share already.
 *
 * @param ph pH, on the scale it was read on
 * @param totalAlkalinity mol/kg-seawater
 * @param dic mol/kg-seawater
 * @param pco2Atm atm
 * @param temperatureC °C
 * @param salinity practical salinity; where it was computed from conductivity, the conductivity's part alone
 * @param calcium measured calcium, mol/kg-seawater
 * @param salinityPerDegree how far the salinity moves with the temperature, 1/°C: where it was computed from conductivity,
 *     the same thermometer is in both; 0 where it was measured by itself
 */
public record InputUncertainty(
        double ph,
        double totalAlkalinity,
        double dic,
        double pco2Atm,
        double temperatureC,
        double salinity,
        double calcium,
        double salinityPerDegree) {
    /**
     * pH 0.02, TA and DIC 10 µmol/kg, pCO2 10 µatm, 0.1 °C, salinity 0.1; calcium 0.1 mmol/kg (about one per cent, common
     * practice, no source).
     */
    public static final InputUncertainty DEFAULTS = new InputUncertainty(0.02, 10e-6, 10e-6, 10e-6, 0.1, 0.1, 0.1e-3);

    /** What a glass electrode on NBS buffers carries at least. */
    public static final double PH_ON_NBS_BUFFERS = 0.05;

    public InputUncertainty {
        require("ph", ph);
        require("totalAlkalinity", totalAlkalinity);
        require("dic", dic);
        require("pco2Atm", pco2Atm);
        require("temperatureC", temperatureC);
        require("salinity", salinity);
        require("calcium", calcium);
        if (!Double.isFinite(salinityPerDegree)) {
            throw new IllegalArgumentException("salinityPerDegree must be a finite number, got " + salinityPerDegree);
        }
    }

    /** With a salinity that was measured by itself. */
    public InputUncertainty(
            double ph,
            double totalAlkalinity,
            double dic,
            double pco2Atm,
            double temperatureC,
            double salinity,
            double calcium) {
        this(ph, totalAlkalinity, dic, pco2Atm, temperatureC, salinity, calcium, 0);
    }

    /** Of the salinity, that which the thermometer brings to it included. */
    public double salinityInAll() {
        return Math.hypot(salinity, salinityPerDegree * temperatureC);
    }

    /**
     * The same with a salinity computed from conductivity.
     *
     * @param conductivity standard uncertainty of the conductivity, mS/cm
     * @param slopes how that salinity moves
     */
    public InputUncertainty withSalinityFrom(double conductivity, ConductivitySalinity.Slopes slopes) {
        return new InputUncertainty(
                ph,
                totalAlkalinity,
                dic,
                pco2Atm,
                temperatureC,
                Math.abs(slopes.perConductivity()) * conductivity,
                calcium,
                slopes.perDegree());
    }

    /** For waters solved from pH and alkalinity. */
    public static InputUncertainty ofPhAndAlkalinity(
            double ph, double totalAlkalinity, double temperatureC, double salinity) {
        return new InputUncertainty(
                ph, totalAlkalinity, DEFAULTS.dic, DEFAULTS.pco2Atm, temperatureC, salinity, DEFAULTS.calcium);
    }

    /** The same with that of a measured calcium, mol/kg-seawater. */
    public InputUncertainty withCalcium(double newCalcium) {
        return new InputUncertainty(
                ph, totalAlkalinity, dic, pco2Atm, temperatureC, salinity, newCalcium, salinityPerDegree);
    }

    /** For waters solved from alkalinity and inorganic carbon. */
    public static InputUncertainty ofAlkalinityAndDic(
            double totalAlkalinity, double dic, double temperatureC, double salinity) {
        return new InputUncertainty(
                DEFAULTS.ph, totalAlkalinity, dic, DEFAULTS.pco2Atm, temperatureC, salinity, DEFAULTS.calcium);
    }

    private static void require(String name, double value) {
        if (!(value >= 0 && Double.isFinite(value))) {
            throw new IllegalArgumentException(
                    "the uncertainty of " + name + " must be a number of at least 0, got " + value);
        }
    }
}
