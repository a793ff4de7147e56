package org.hingeline.bench;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;

/** A reading of the invented water; rows with growing numbers are in the order of time. */
record Row(int point, int quantity, Instant at, double value) {
    private static final int STEP_MS = 250;

    /**
     * @param first number of the first row
     * @param points the points it is about, from and to
     */
    static List<Row> rows(Instant start, int first, int count, int fromPoint, int toPoint) {
        int sensors = (toPoint - fromPoint) * BenchPlace.QUANTITIES.size();
        List<Row> rows = new ArrayList<>(count);
        for (int i = first; i < first + count; i++) {
            int sensor = i % sensors;
            int step = i / sensors;
            int quantity = sensor % BenchPlace.QUANTITIES.size();
            rows.add(new Row(
                    fromPoint + sensor / BenchPlace.QUANTITIES.size(),
                    quantity,
                    start.plusMillis((long) step * STEP_MS),
                    value(quantity, step)));
        }
        return rows;
    }

    private static double value(int quantity, int step) {
        double wave = Math.sin(step / 400.0);
        double value = switch (quantity) {
            case 0 -> 7.9 + 0.1 * wave;
            case 1 -> 18 + wave;
            case 2 -> 30 + 0.5 * wave;
            default -> 2080 + 20 * wave;
        };
        return Math.round(value * 1000) / 1000.0;
    }

    /** A number for each sensor. */
    long sensor() {
        return 1 + (long) point * BenchPlace.QUANTITIES.size() + quantity;
    }

    static String json(List<Row> rows) {
        StringBuilder json = new StringBuilder("{\"readings\":[");
        for (Row row : rows) {
            json.append(json.length() > 13 ? "," : "")
                    .append("{\"point\":\"")
                    .append(BenchPlace.point(row.point()))
                    .append("\",\"quantity\":\"")
                    .append(BenchPlace.QUANTITIES.get(row.quantity()))
                    .append("\",\"value\":")
                    .append(row.value())
                    .append(",\"at\":\"")
                    .append(row.at())
                    .append("\"}");
        }
        return json.append("]}").toString();
    }
}
