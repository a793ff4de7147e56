package org.hingeline.seawater;

import java.util.Arrays;
import java.util.Optional;

/** Which published ratio gives total boron from salinity. */
public enum BoronRatio {
    /**
     * Lee, K. and co-workers (2010), The universal ratio of boron to chlorinity for the North Pacific and North
     * Atlantic oceans, Geochimica et Cosmochimica Acta 74, 1801–1811: 0.2414 mg/kg per unit of chlorinity.
     */
    LEE_2010("lee2010", "Lee et al. 2010", 2.414e-4),
    /** Uppström, L. R. (1974), Deep-Sea Research 21, 161–162: 0.232 mg/kg per unit of chlorinity. */
    UPPSTROM_1974("uppstrom1974", "Uppström 1974", 2.32e-4);

    private static final double BORON_G_PER_MOL = 10.811;

    private final String wireName;
    private final String title;
    private final double gramsPerChlorinity;

    BoronRatio(String wireName, String title, double gramsPerChlorinity) {
        this.wireName = wireName;
        this.title = title;
        this.gramsPerChlorinity = gramsPerChlorinity;
    }

    /** The name in the wire contract. */
    public String wireName() {
        return wireName;
    }

    /** Authors and year. */
    public String title() {
        return title;
    }

    /** Total boron, mol/kg-seawater, at a practical salinity. */
    public double totalBoron(double salinity) {
        return gramsPerChlorinity / BORON_G_PER_MOL * SeaSalt.chlorinity(salinity);
    }

    /** The ratio of that wire name, if there is one. */
    public static Optional<BoronRatio> fromWireName(String name) {
        return Arrays.stream(values()).filter(r -> r.wireName.equals(name)).findFirst();
    }
}
