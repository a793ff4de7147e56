package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.ReadingBook.StoredReading;

/** Reads from the books what the water of a point is made of over some span of time. */
final class InputLoader {
    private final AgeLimits ageLimits;

    InputLoader(AgeLimits ageLimits) {
        this.ageLimits = ageLimits;
    }

    /** Everything by which the inputs of any moment from first to last can be found; sensors of the point alone. */
    PointInputs load(Books books, Collection<Sensor> sensors, Instant first, Instant last) {
        PointInputs inputs = new PointInputs();
        List<Instant> conductivityBefore = new ArrayList<>();
        for (Sensor sensor : sensors) {
            if (!AgeLimits.ENTERING.contains(sensor.quantity())) {
                continue;
            }
            Duration back = WaterAssessor.remembered(ageLimits.of(sensor.quantity()));
            newestBefore(books, sensor, first.minus(back), first).ifPresent(reading -> {
                inputs.add(sensor, reading);
                if (sensor.quantity() == Quantity.CONDUCTIVITY) {
                    conductivityBefore.add(reading.at());
                }
            });
            books.readings().between(sensor.id(), first, last).forEach(reading -> inputs.add(sensor, reading));
        }
        // a conductivity is worth nothing without the temperature of its own time
        for (Instant at : conductivityBefore) {
            for (Sensor sensor : sensors) {
                if (sensor.quantity() == Quantity.TEMPERATURE) {
                    newestBefore(books, sensor, at.minus(ageLimits.of(Quantity.TEMPERATURE)), at.plusMillis(1))
                            .ifPresent(reading -> inputs.add(sensor, reading));
                }
            }
        }
        return inputs;
    }

    private static Optional<StoredReading> newestBefore(Books books, Sensor sensor, Instant from, Instant before) {
        return books.readings().newestBefore(sensor.id(), from, before);
    }
}
