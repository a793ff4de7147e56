package org.hingeline.seawater;

import java.util.Arrays;
import java.util.Optional;

/** The scale a pH is given on. They differ by up to 0.15: reading one as another moves pCO2 by several per cent. */
public enum PhScale {
    /** Total hydrogen ion scale: free plus bisulfate. What this package computes with. */
    TOTAL("total"),
    /** Seawater scale: free plus bisulfate plus hydrogen fluoride. */
    SEAWATER("seawater"),
    /** Free hydrogen ion scale. */
    FREE("free"),
    /** A glass electrode on NBS (NIST) buffers; the conversion carries at least 0.05 pH. */
    NBS("nbs");

    private final String wireName;

    PhScale(String wireName) {
        this.wireName = wireName;
    }

    /** The name in the wire contract. */
    public String wireName() {
        return wireName;
    }

    /**
     * A pH of this scale on the total scale.
     *
     * @param ph pH on this scale
     * @param temperatureC temperature at which it was read, °C, −2 to 45
     * @param salinity practical salinity, 0 to 50
     * @return pH, total scale
     * @throws IllegalArgumentException when no fit covers the temperature or salinity
     */
    public double toTotal(double ph, double temperatureC, double salinity) {
        return ph + offset(temperatureC, salinity);
    }

    /**
     * A pH of the total scale on this scale; the arguments are those of {@link #toTotal}.
     *
     * @return pH on this scale
     * @throws IllegalArgumentException when no fit covers the temperature or salinity
     */
    public double fromTotal(double phTotal, double temperatureC, double salinity) {
        return phTotal - offset(temperatureC, salinity);
    }

    private double offset(double temperatureC, double salinity) {
        if (this == TOTAL) {
            return 0;
        }
        SolvableWater.require(temperatureC, salinity);
        double t = Kelvin.of(temperatureC);
        double ks = Math.exp(Bisulfate.lnK(t, salinity));
        double kf = Math.exp(HydrogenFluoride.lnK(t, salinity));
        return ScaleFactors.of(t, salinity, ks, kf).offsetToTotal(this);
    }

    /** The scale of that wire name, if there is one. */
    public static Optional<PhScale> fromWireName(String name) {
        return Arrays.stream(values()).filter(s -> s.wireName.equals(name)).findFirst();
    }
}
