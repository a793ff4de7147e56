package org.hingeline.monitor;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import org.hingeline.seawater.CarbonateResult.Unsolvable;
import org.hingeline.seawater.UnsolvableReason;
import org.jspecify.annotations.Nullable;

/**
 * What is wrong with the fields of a wished water: faults of the request itself, and beside them numbers that no water
 * has, which a dose plan answers rather than refuses.
 */
final class WaterFaults {
    /** What a number must be; the unit stands after it with a space before, and is empty where there is none. */
    record Range(double min, boolean minExcluded, double max, String unit) {
        static Range of(double min, double max, String unit) {
            return new Range(min, false, max, unit);
        }

        static Range above(double min, double max, String unit) {
            return new Range(min, true, max, unit);
        }

        boolean holds(double value) {
            return (minExcluded ? value > min : value >= min) && value <= max;
        }

        String words() {
            return (minExcluded ? "above " : "") + plain(min) + " to " + plain(max) + unit;
        }
    }

    private record Impossible(UnsolvableReason reason, FieldFaults.Fault fault) {}

    private final String path;
    private final FieldFaults faults;
    private final List<Impossible> impossible = new ArrayList<>(0);
    private boolean any;

    /** @param path where the water stands in the request, empty when it is the whole of it */
    WaterFaults(String path, FieldFaults faults) {
        this.path = path;
        this.faults = faults;
    }

    /** The path of one of the water's fields; of the water itself when the name is empty. */
    String at(String name) {
        return path.isEmpty() ? name : name.isEmpty() ? path : path + "/" + name;
    }

    void add(String name, String detail) {
        any = true;
        faults.add(at(name), detail);
    }

    /** A number that can be read, but that no water has. */
    void addImpossible(UnsolvableReason reason, String name, String detail) {
        any = true;
        impossible.add(new Impossible(reason, new FieldFaults.Fault(at(name), detail)));
    }

    /** The number when it is one and in the range; otherwise not-a-number, and told unless it is absent. */
    double number(String name, @Nullable Double value, Range range) {
        return number(name, value, range, null);
    }

    /** The same; a finite number outside the range is told as impossible where a reason is given. */
    double number(String name, @Nullable Double value, Range range, @Nullable UnsolvableReason reason) {
        if (value == null) {
            return Double.NaN;
        }
        if (range.holds(value)) {
            return value;
        }
        if (!Double.isFinite(value)) {
            add(name, at(name) + " " + value + " must be a finite number; " + range.words() + " is accepted");
        } else {
            String detail = at(name) + " " + plain(value) + " cannot be: " + range.words() + " is accepted";
            if (reason == null) {
                add(name, detail);
            } else {
                addImpossible(reason, name, detail);
            }
        }
        return Double.NaN;
    }

    /** The impossible becomes faults like the others. */
    void tellImpossible() {
        impossible.forEach(each -> faults.add(each.fault().field(), each.fault().detail()));
        impossible.clear();
    }

    /** The impossible as the core would refuse it, in the caller's units; null when there is none. */
    @Nullable
    Unsolvable asUnsolvable() {
        return impossible.isEmpty()
                ? null
                : new Unsolvable(
                        impossible.get(0).reason(),
                        impossible.stream().map(each -> each.fault().detail()).collect(Collectors.joining("; ")));
    }

    /** Whether anything was told. */
    boolean any() {
        return any;
    }

    /** A number as a person would write it. */
    static String plain(double value) {
        if (!Double.isFinite(value)) {
            return Double.toString(value);
        }
        BigDecimal exact = BigDecimal.valueOf(value).stripTrailingZeros();
        return Math.abs(exact.scale()) + exact.precision() > 20 ? Double.toString(value) : exact.toPlainString();
    }
}
