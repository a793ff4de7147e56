package org.hingeline.bench.seawater;

import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.SeawaterConstants;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;

/** What everything else is measured by: the constants of a water, and nothing more. */
@State(Scope.Benchmark)
public class ConstantsBenchmark {
    @Param
    Waters waters;

    private Conditions[] conditions;
    private int next;

    @Setup
    public void draw() {
        conditions = waters.conditions();
    }

    @Benchmark
    public SeawaterConstants evaluate() {
        return SeawaterConstants.of(conditions[next++ & (Waters.COUNT - 1)]);
    }
}
