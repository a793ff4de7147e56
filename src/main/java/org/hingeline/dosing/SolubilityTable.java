package org.hingeline.dosing;

import java.util.List;

/**
 * Solubility in water by temperature, straight lines between the rows; beyond the ends the end row holds.
 *
 * @param rows by rising temperature
 */
public record SolubilityTable(List<Row> rows) {
    /**
     * @param temperatureC °C
     * @param gramsPer100GWater g of the anhydrous substance in 100 g of water
     */
    public record Row(double temperatureC, double gramsPer100GWater) {}

    public SolubilityTable {
        rows = List.copyOf(rows);
        if (rows.isEmpty()) {
            throw new IllegalArgumentException("a solubility table needs a row");
        }
        for (int i = 1; i < rows.size(); i++) {
            if (!(rows.get(i).temperatureC > rows.get(i - 1).temperatureC)) {
                throw new IllegalArgumentException("rows must rise in temperature: " + rows);
            }
        }
    }

    /** g of the anhydrous substance in 100 g of water at a temperature in °C. */
    public double gramsPer100GWater(double temperatureC) {
        Row before = rows.get(0);
        if (temperatureC <= before.temperatureC) {
            return before.gramsPer100GWater;
        }
        for (Row row : rows) {
            if (temperatureC <= row.temperatureC) {
                double share = row == before
                        ? 0
                        : (temperatureC - before.temperatureC) / (row.temperatureC - before.temperatureC);
                return before.gramsPer100GWater + share * (row.gramsPer100GWater - before.gramsPer100GWater);
            }
            before = row;
        }
        return before.gramsPer100GWater;
    }
}
