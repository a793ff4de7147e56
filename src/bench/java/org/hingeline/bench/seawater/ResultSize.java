package org.hingeline.bench.seawater;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.SeawaterConstants;
import org.hingeline.seawater.Uncertainty;
import org.openjdk.jol.info.GraphLayout;

/**
 * How many bytes the objects of a result take on the heap: what is reachable from it and neither from its inputs nor
 * from the result of the water before, so that shared constants do not count. On average over the waters.
 */
final class ResultSize {
    private static final int WATERS = 64;

    private ResultSize() {}

    static double ofConstants(Waters waters) {
        Conditions[] conditions = waters.conditions();
        List<Object> results = new ArrayList<>();
        for (int i = 0; i <= WATERS; i++) {
            results.add(SeawaterConstants.of(conditions[i]));
        }
        return average(conditions, conditions, results);
    }

    static double ofState(Waters waters, Pair pair) {
        return average(waters, pair, false);
    }

    static double ofStateWithUncertainty(Waters waters, Pair pair) {
        return average(waters, pair, true);
    }

    private static double average(Waters waters, Pair pair, boolean withUncertainty) {
        Conditions[] conditions = waters.conditions();
        KnownPair[] known = waters.known(conditions, pair);
        List<Object> results = new ArrayList<>();
        for (int i = 0; i <= WATERS; i++) {
            CarbonateResult result = CarbonateSystem.solve(conditions[i], known[i]);
            results.add(
                    withUncertainty
                            ? Arrays.asList(
                                    result.orElseThrow(),
                                    Uncertainty.of(result.orElseThrow(), InputUncertainty.DEFAULTS))
                            : result);
        }
        return average(conditions, known, results) - (withUncertainty ? listOfTwo() : 0);
    }

    private static double listOfTwo() {
        Object a = new Object();
        Object b = new Object();
        return GraphLayout.parseInstance(Arrays.asList(a, b))
                .subtract(GraphLayout.parseInstance(a, b))
                .totalSize();
    }

    private static double average(Object[] first, Object[] second, List<Object> results) {
        long bytes = 0;
        // objects are told apart by where they lie: nothing must move them meanwhile
        System.gc();
        for (int i = 1; i <= WATERS; i++) {
            GraphLayout shared = GraphLayout.parseInstance(first[i], second[i], results.get(i - 1));
            bytes += GraphLayout.parseInstance(results.get(i)).subtract(shared).totalSize();
        }
        return (double) bytes / WATERS;
    }
}
