package org.hingeline.bench.seawater;

import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.Uncertainty;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.infra.Blackhole;

/** The whole state of a water with its constants, without and with its uncertainty. */
@State(Scope.Benchmark)
public class StateBenchmark {
    @Param
    Waters waters;

    @Param
    Pair pair;

    private Conditions[] conditions;
    private KnownPair[] known;
    private int next;

    @Setup
    public void draw() {
        conditions = waters.conditions();
        known = waters.known(conditions, pair);
    }

    @Benchmark
    public CarbonateResult solve() {
        int i = next++ & (Waters.COUNT - 1);
        return CarbonateSystem.solve(conditions[i], known[i]);
    }

    @Benchmark
    public void solveWithUncertainty(Blackhole sink) {
        int i = next++ & (Waters.COUNT - 1);
        CarbonateState state = CarbonateSystem.solve(conditions[i], known[i]).orElseThrow();
        sink.consume(state);
        sink.consume(Uncertainty.of(state, InputUncertainty.DEFAULTS));
    }
}
