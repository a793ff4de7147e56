package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.jspecify.annotations.Nullable;

/**
 * How one point stands now.
 *
 * @param newest the newest water state, complete or not
 * @param limits in use, the watch over silence among them
 * @param readings the newest usable reading of each measured quantity that has a limit
 * @param now the present this is told for
 */
public record PointStatus(
        Point point,
        @Nullable WaterState newest,
        List<Limit> limits,
        List<Alert> openAlerts,
        Optional<Batch> batch,
        List<Known> readings,
        Instant now) {

    /** A quantity's newest value. */
    public record Known(Quantity quantity, StoredReading reading) {}

    /** Whether the water is fit, in one word. */
    public enum Verdict {
        /** Known, fresh and within every limit. */
        FIT("fit"),
        /** Past at least one limit. */
        OUT("out-of-limit"),
        /** An input, or a quantity that has a limit, is missing or too old, so nobody can say. */
        UNKNOWN("unknown"),
        /** Known, but no limit is set to hold it against. */
        NO_LIMIT("no-limit");

        private final String code;

        Verdict(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    public PointStatus {
        limits = List.copyOf(limits);
        openAlerts = List.copyOf(openAlerts);
        readings = List.copyOf(readings);
    }

    public Verdict verdict() {
        if (!passed().isEmpty()) {
            return Verdict.OUT;
        }
        boolean known = numbers().isPresent()
                && watching().stream().allMatch(limit -> value(limit.quantity()).isPresent());
        if (!known) {
            return Verdict.UNKNOWN;
        }
        return watching().isEmpty() ? Verdict.NO_LIMIT : Verdict.FIT;
    }

    /** The water's numbers, if they are known and young enough to speak of now. */
    public Optional<WaterNumbers> numbers() {
        WaterState state = newest;
        return state == null || state.numbers() == null || !fresh(state.at())
                ? Optional.empty()
                : Optional.of(state.numbers());
    }

    /** Limits on the water, without the watch over silence. */
    public List<Limit> watching() {
        return limits.stream().filter(limit -> !limit.onSilence()).toList();
    }

    /** Limits that the newest values are past. */
    public List<Limit> passed() {
        return watching().stream().filter(this::isPassed).toList();
    }

    private boolean isPassed(Limit limit) {
        return value(limit.quantity()).filter(limit::isPast).isPresent();
    }

    private Optional<Double> value(Quantity quantity) {
        if (quantity.measured()) {
            return readings.stream()
                    .filter(known -> known.quantity() == quantity
                            && within(known.reading().at(), Freshness.of(quantity, point)))
                    .map(known -> known.reading().value())
                    .findFirst();
        }
        return numbers()
                .map(numbers -> AlertWatch.observation(quantity, now, numbers).value());
    }

    private boolean fresh(Instant at) {
        return within(at, point.maxGap());
    }

    private boolean within(Instant at, Duration age) {
        return Duration.between(at, now).compareTo(age) <= 0;
    }
}
