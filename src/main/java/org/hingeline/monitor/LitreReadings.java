package org.hingeline.monitor;

import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.seawater.Figure;
import org.hingeline.seawater.VolumeAmount;

/**
 * Turns values per litre into values per kilogram with the density of the water they were taken from: that of the point's
 * freshest temperature and salinity at the time of the reading, those of the same batch included. A sample whose volume
 * was taken in a laboratory 10 °C warmer comes out about 0.2 % too low.
 */
final class LitreReadings {
    private static final double LITRES_PER_M3 = 1000;

    /** A value in a unit per litre, waiting for the density. */
    record PerLitre(IncomingReading incoming, Point point, Sensor sensor, Instant at, double value, UnitChoice unit) {}

    private final AgeLimits ageLimits;
    private final InputLoader loader;
    private final InputChoice choice;

    LitreReadings(AgeLimits ageLimits) {
        this.ageLimits = ageLimits;
        this.loader = new InputLoader(ageLimits);
        this.choice = new InputChoice(ageLimits);
    }

    /**
     * The rows in canonical units.
     *
     * @param others the other rows of the batch, already in canonical units
     * @param refused takes the reason for each row whose density is not known
     */
    List<ReadingCheck.Row> convert(
            Books books, List<PerLitre> rows, List<StoredReading> others, Map<Integer, String> refused) {
        List<ReadingCheck.Row> converted = new ArrayList<>(rows.size());
        Map<Point, List<PerLitre>> byPoint = rows.stream().collect(Collectors.groupingBy(PerLitre::point));
        byPoint.forEach((point, ofPoint) -> {
            List<Sensor> sensors = books.place().sensorsOf(point.id());
            NavigableSet<Instant> times = new TreeSet<>();
            ofPoint.forEach(row -> times.add(row.at()));
            Map<Instant, PointInputs> inputs = new HashMap<>();
            for (NavigableSet<Instant> spell : Spells.of(times)) {
                PointInputs ofSpell = loader.load(books, sensors, spell.first(), spell.last());
                add(ofSpell, sensors, others);
                spell.forEach(at -> inputs.put(at, ofSpell));
            }
            for (PerLitre row : ofPoint) {
                try {
                    converted.add(convert(row, inputs.getOrDefault(row.at(), new PointInputs())));
                } catch (RowRefusedException e) {
                    refused.put(row.incoming().index(), e.getMessage());
                }
            }
        });
        return converted;
    }

    private static void add(PointInputs inputs, List<Sensor> sensors, List<StoredReading> batch) {
        Map<Long, Sensor> byId = sensors.stream().collect(Collectors.toMap(Sensor::id, sensor -> sensor));
        for (StoredReading reading : batch) {
            Sensor sensor = byId.get(reading.sensorId());
            if (sensor != null && AgeLimits.ENTERING.contains(sensor.quantity())) {
                inputs.add(sensor, reading);
            }
        }
    }

    private ReadingCheck.Row convert(PerLitre row, PointInputs inputs) throws RowRefusedException {
        WaterState.InputUsed temperature =
                choice.pick(Quantity.TEMPERATURE, row.at(), inputs).used();
        WaterState.InputUsed salinity =
                choice.pick(Quantity.SALINITY, row.at(), inputs).used();
        if (temperature == null || salinity == null) {
            throw new RowRefusedException(
                    needsDensity(row) + lacking(temperature == null, salinity == null, row) + "; " + instead(row));
        }
        Figure kilogramsPerLitre = VolumeAmount.perLitre(1, temperature.value(), salinity.value());
        if (kilogramsPerLitre instanceof Figure.Refused noDensity) {
            throw new RowRefusedException(needsDensity(row) + noDensity.detail() + "; " + instead(row));
        }
        double canonical = row.unit()
                .conversion(LITRES_PER_M3 * kilogramsPerLitre.orElseThrow())
                .toCanonical(row.value());
        return ReadingCheck.row(row.incoming(), row.sensor(), row.at(), canonical, row.unit());
    }

    private static String needsDensity(PerLitre row) {
        return "value " + row.value() + " " + row.unit().ucum() + " is per litre and needs the density of the water: ";
    }

    private String lacking(boolean noTemperature, boolean noSalinity, PerLitre row) {
        List<String> lacking = new ArrayList<>();
        if (noTemperature) {
            lacking.add("temperature of the last "
                    + ageLimits.of(Quantity.TEMPERATURE).toMinutes() + " min");
        }
        if (noSalinity) {
            lacking.add("salinity or conductivity of the last "
                    + ageLimits.of(Quantity.SALINITY).toMinutes() + " min");
        }
        return row.point().code() + " has no " + String.join(" and no ", lacking) + " at " + row.at();
    }

    private static String instead(PerLitre row) {
        return "send these first or in the same batch, or send "
                + row.sensor().quantity().code() + " in "
                + Units.codesWithoutDensity(row.sensor().quantity());
    }
}
