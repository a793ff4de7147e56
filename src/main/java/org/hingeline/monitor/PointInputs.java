package org.hingeline.monitor;

import java.time.Instant;
import java.util.EnumMap;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.TreeMap;
import org.hingeline.hatchery.Sensor;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.ReadingBook.StoredReading;

/** The usable readings of one point around some span of time, to find the freshest of each quantity at any moment. */
final class PointInputs {

    /** A reading with the sensor it came from. */
    record Candidate(Sensor sensor, StoredReading reading) {}

    private final Map<Quantity, NavigableMap<Instant, Candidate>> byQuantity = new EnumMap<>(Quantity.class);

    void add(Sensor sensor, StoredReading reading) {
        if (reading.flag().usable()) {
            byQuantity
                    .computeIfAbsent(sensor.quantity(), quantity -> new TreeMap<>())
                    .merge(reading.at(), new Candidate(sensor, reading), PointInputs::moreCertain);
        }
    }

    /** Of two sensors read at the same moment, the one registered as the more certain; of equals always the same one. */
    private static Candidate moreCertain(Candidate a, Candidate b) {
        int byUncertainty =
                Double.compare(a.sensor().standardUncertainty(), b.sensor().standardUncertainty());
        int order = byUncertainty != 0
                ? byUncertainty
                : a.sensor().code().compareTo(b.sensor().code());
        return order <= 0 ? a : b;
    }

    /** The newest usable value at or before a moment. */
    Optional<Candidate> freshest(Quantity quantity, Instant at) {
        NavigableMap<Instant, Candidate> candidates = byQuantity.get(quantity);
        return candidates == null
                ? Optional.empty()
                : Optional.ofNullable(candidates.floorEntry(at)).map(Map.Entry::getValue);
    }
}
