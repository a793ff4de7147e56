package org.hingeline.seawater;

/**
 * Every constant and salt total of a water, evaluated once for a temperature, salinity, carbonic-acid fit and boron
 * ratio, to be used for as many waters of that kind as there are. Immutable.
 *
 * <p>Dissociation constants are on the total scale (KS on the free scale), mol/kg-seawater, at 1 atm.
 */
public final class SeawaterConstants {
    final double temperatureC;
    final double salinity;
    final CarbonicAcidFit fit;
    final BoronRatio boronRatio;
    final double k0;
    final double fugacityFactor;
    final double k1;
    final double k2;
    final double kb;
    final double kw;
    final double ks;
    final double kf;
    final double kp1;
    final double kp2;
    final double kp3;
    final double ksi;
    final double kspAragonite;
    final double kspCalcite;
    final double boron;
    final double sulfate;
    final double fluoride;
    final double calciumFromSalinity;
    final double densityKgM3;
    final ScaleFactors scales;

    private SeawaterConstants(double temperatureC, double s, CarbonicAcidFit fit, BoronRatio boronRatio) {
        double t = Kelvin.of(temperatureC);
        this.temperatureC = temperatureC;
        this.salinity = s;
        this.fit = fit;
        this.boronRatio = boronRatio;
        k0 = Math.exp(Weiss1974.lnK0(t, s));
        fugacityFactor = Math.exp(Weiss1974.lnFugacityFactor(t));
        kb = Math.exp(BoricAcid.lnK(t, s));
        kw = Math.exp(WaterDissociation.lnK(t, s));
        ks = Math.exp(Bisulfate.lnK(t, s));
        kf = Math.exp(HydrogenFluoride.lnK(t, s));
        kp1 = Math.exp(PhosphoricAcid.lnK1(t, s));
        kp2 = Math.exp(PhosphoricAcid.lnK2(t, s));
        kp3 = Math.exp(PhosphoricAcid.lnK3(t, s));
        ksi = Math.exp(SilicicAcid.lnK(t, s));
        kspAragonite = tenTo(Mucci1983.log10Aragonite(t, s));
        kspCalcite = tenTo(Mucci1983.log10Calcite(t, s));
        boron = boronRatio.totalBoron(s);
        sulfate = SeaSalt.sulfate(s);
        fluoride = SeaSalt.fluoride(s);
        calciumFromSalinity = SeaSalt.calcium(s);
        densityKgM3 = MilleroPoisson1981.densityKgM3(temperatureC, s);
        scales = ScaleFactors.of(t, s, ks, kf);
        double onTotal = fit.scale() == PhScale.SEAWATER ? 1 / scales.seawaterOverTotal() : 1;
        k1 = tenTo(-fit.pK1(t, s)) * onTotal;
        k2 = tenTo(-fit.pK2(t, s)) * onTotal;
    }

    /**
     * The constants of a water.
     *
     * @param temperatureC °C, −2 to 45
     * @param salinity practical, 0 to 50
     * @throws IllegalArgumentException when no fit covers the temperature or salinity
     */
    public static SeawaterConstants of(
            double temperatureC, double salinity, CarbonicAcidFit fit, BoronRatio boronRatio) {
        SolvableWater.require(temperatureC, salinity);
        return new SeawaterConstants(temperatureC, salinity, fit, boronRatio);
    }

    /** The constants of {@link Conditions#of} at the same temperature, salinity and fits. */
    public static SeawaterConstants of(Conditions conditions) {
        return of(conditions.temperatureC(), conditions.salinity(), conditions.fit(), conditions.boron());
    }

    /** A neighbour a little off, for derivatives: it may lie just outside the accepted water. */
    SeawaterConstants near(double otherTemperatureC, double otherSalinity) {
        return new SeawaterConstants(otherTemperatureC, otherSalinity, fit, boronRatio);
    }

    /** Whether these are the constants of such a water. */
    public boolean belongTo(Conditions conditions) {
        return temperatureC == conditions.temperatureC()
                && salinity == conditions.salinity()
                && fit == conditions.fit()
                && boronRatio == conditions.boron();
    }

    /** Density at 1 atm, kg/m³. */
    public double densityKgM3() {
        return densityKgM3;
    }

    double calcium(Conditions conditions) {
        Double measured = conditions.calcium();
        return measured == null ? calciumFromSalinity : measured;
    }

    /** Dissolved CO2, mol/kg-seawater, in equilibrium with a partial pressure, atm. */
    double co2(double pco2Atm) {
        return pco2Atm * fugacityFactor * k0;
    }

    private static double tenTo(double exponent) {
        return Math.exp(exponent * LN_10);
    }

    static final double LN_10 = Math.log(10);
}
