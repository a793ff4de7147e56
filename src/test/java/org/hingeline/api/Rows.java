package org.hingeline.api;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;

/** Rows of {@code POST /api/v1/readings}. */
final class Rows {
    private Rows() {}

    static String row(String point, String quantity, double value, Instant at) {
        return "{\"point\":\"%s\",\"quantity\":\"%s\",\"value\":%s,\"at\":\"%s\"}"
                .formatted(point, quantity, value, at);
    }

    static String batch(List<String> rows) {
        return "{\"readings\":[" + String.join(",", rows) + "]}";
    }

    static String batch(String... rows) {
        return batch(List.of(rows));
    }

    /** The four inputs of a water state; 22 °C, salinity 30, 2078 µmol/kg. At pH 8.1 Ω is about 2.8, at pH 7.6 about 1.0. */
    static List<String> water(String point, double ph, Instant at) {
        List<String> rows = new ArrayList<>();
        rows.add(row(point, "temperature", 22, at));
        rows.add(row(point, "salinity", 30, at));
        rows.add(row(point, "totalAlkalinity", 2078, at));
        rows.add(row(point, "ph", ph, at));
        return rows;
    }
}
