package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;

/** The masses of a dose in whole units of a balance, so that additions sum to them exactly. */
final class Weighing {
    /** One product in such units. */
    private record Part(Balance balance, long units) {}

    private final List<Part> parts;
    private final long parcels;

    private Weighing(List<Part> parts) {
        this.parts = List.copyOf(parts);
        this.parcels = parts.stream().mapToLong(Part::units).max().orElse(0);
    }

    /**
     * The masses nearest to what is needed that are acceptable, or else the next ones below (of a second product, above:
     * it may be there to hold pH down); empty when there is nothing to weigh, or nothing acceptable.
     */
    static Optional<Weighing> nearest(double[] massesG, Predicate<double[]> acceptable) {
        List<Part> first = candidates(massesG[0], 0, -1);
        List<Part> second = massesG.length > 1 ? candidates(massesG[1], 1, 0) : List.of();
        List<Weighing> all = new ArrayList<>();
        for (Part one : first) {
            if (second.isEmpty()) {
                all.add(new Weighing(List.of(one)));
            }
            second.forEach(other -> all.add(new Weighing(List.of(one, other))));
        }
        return all.stream()
                .filter(w -> w.parcels > 0 && acceptable.test(w.grams(w.parcels)))
                .findFirst();
    }

    private static List<Part> candidates(double massG, int... beyondFloor) {
        Balance balance = Balance.forLoad(massG);
        long floor = balance.notAbove(massG);
        List<Part> parts = new ArrayList<>();
        parts.add(new Part(balance, balance.nearest(massG)));
        for (int beyond : beyondFloor) {
            if (floor + beyond >= 0) {
                parts.add(new Part(balance, floor + beyond));
            }
        }
        return parts;
    }

    /** Into how many equal parcels the dose can be thought of. */
    long parcels() {
        return parcels;
    }

    int products() {
        return parts.size();
    }

    /** The masses of so many parcels, g. */
    double[] grams(long some) {
        double[] grams = new double[parts.size()];
        for (int i = 0; i < grams.length; i++) {
            grams[i] = parts.get(i).balance().grams(units(i, some));
        }
        return grams;
    }

    /** The mass of a product between two sums of parcels, g. */
    double grams(int product, long from, long to) {
        return parts.get(product).balance().grams(units(product, to) - units(product, from));
    }

    private long units(int product, long some) {
        long whole = parts.get(product).units();
        return whole == parcels ? some : Math.round((double) some / parcels * whole);
    }
}
