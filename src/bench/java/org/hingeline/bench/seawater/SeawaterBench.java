package org.hingeline.bench.seawater;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.TimeUnit;
import java.util.function.DoubleSupplier;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.profile.GCProfiler;
import org.openjdk.jmh.results.BenchmarkResult;
import org.openjdk.jmh.results.IterationResult;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;

/**
 * Runs the benchmarks in rounds and prints ratios: each round gives every benchmark a fresh JVM once, and divides its
 * time by that of the constants of the same round, so that a machine that slows down between rounds slows both. Within
 * a JVM the quickest iteration counts: what else runs on the machine only ever adds.
 */
public final class SeawaterBench {
    private SeawaterBench() {}

    /** Arguments: rounds, then milliseconds per iteration. */
    public static void main(String[] args) throws RunnerException {
        int rounds = Integer.parseInt(args[0]);
        int millis = Integer.parseInt(args[1]);
        List<Line> lines = lines();
        for (int round = 1; round <= rounds; round++) {
            System.out.printf(Locale.ROOT, "round %d of %d%n", round, rounds);
            for (Line line : lines) {
                line.run(millis);
            }
        }
        print(lines);
    }

    private static List<Line> lines() {
        List<Line> lines = new ArrayList<>();
        Line ordinary = Line.constants(Waters.ORDINARY);
        lines.add(ordinary);
        for (Pair pair : Pair.values()) {
            lines.add(Line.state(ordinary, Waters.ORDINARY, pair, pair.aim));
        }
        for (Pair pair : Pair.values()) {
            lines.add(Line.withUncertainty(ordinary, Waters.ORDINARY, pair));
        }
        Line varied = Line.constants(Waters.VARIED);
        lines.add(varied);
        lines.add(Line.state(varied, Waters.VARIED, Pair.MIXED, Double.NaN));
        lines.add(Line.withUncertainty(varied, Waters.VARIED, Pair.MIXED));
        Line outside = Line.constants(Waters.OUTSIDE);
        lines.add(outside);
        lines.add(Line.state(outside, Waters.OUTSIDE, Pair.PH_TA, Double.NaN));
        lines.add(Line.state(outside, Waters.OUTSIDE, Pair.TA_DIC, Double.NaN));
        return lines;
    }

    private static void print(List<Line> lines) {
        System.out.println();
        System.out.println("Time as a ratio to the constants alone of the same round: median, least and most of the"
                + " rounds; and quickest of all rounds over quickest, which a busy machine disturbs least.");
        System.out.println("ns: median of the rounds. B/op: allocated; B kept: size of what is handed back.");
        System.out.printf(
                "%-62s %7s %7s %7s %9s %5s %8s %8s %8s%n",
                "", "median", "least", "most", "quickest", "aim", "ns", "B/op", "B kept");
        for (Line line : lines) {
            System.out.println(line.row());
        }
    }

    /** One benchmark with its rounds so far. */
    private static final class Line {
        private final String title;
        private final Line baseline;
        private final double aim;
        private final String method;
        private final Waters waters;
        private final Pair pair;
        private final DoubleSupplier size;
        private final List<Double> nanos = new ArrayList<>();
        private double bytes;

        private Line(
                String title, Line baseline, double aim, String method, Waters waters, Pair pair, DoubleSupplier size) {
            this.title = title;
            this.baseline = baseline == null ? this : baseline;
            this.aim = aim;
            this.method = method;
            this.waters = waters;
            this.pair = pair;
            this.size = size;
        }

        static Line constants(Waters waters) {
            return new Line(
                    words(waters) + "constants alone",
                    null,
                    1,
                    "ConstantsBenchmark.evaluate",
                    waters,
                    null,
                    () -> ResultSize.ofConstants(waters));
        }

        static Line state(Line baseline, Waters waters, Pair pair, double aim) {
            return new Line(
                    words(waters) + pair.title,
                    baseline,
                    aim,
                    "StateBenchmark.solve",
                    waters,
                    pair,
                    () -> ResultSize.ofState(waters, pair));
        }

        static Line withUncertainty(Line baseline, Waters waters, Pair pair) {
            return new Line(
                    words(waters) + pair.title + " with uncertainty",
                    baseline,
                    12,
                    "StateBenchmark.solveWithUncertainty",
                    waters,
                    pair,
                    () -> ResultSize.ofStateWithUncertainty(waters, pair));
        }

        private static String words(Waters waters) {
            return switch (waters) {
                case ORDINARY -> "";
                case VARIED -> "all fits, nutrients: ";
                case OUTSIDE -> "outside the fits: ";
            };
        }

        void run(int millis) throws RunnerException {
            OptionsBuilder options = new OptionsBuilder();
            options.include("\\." + method.replace(".", "\\.") + "$")
                    .param("waters", waters.name())
                    .mode(Mode.AverageTime)
                    .timeUnit(TimeUnit.NANOSECONDS)
                    .forks(1)
                    .warmupIterations(4)
                    .warmupTime(TimeValue.milliseconds(millis))
                    .measurementIterations(5)
                    .measurementTime(TimeValue.milliseconds(millis))
                    .jvmArgs("-Xms256m", "-Xmx256m", "-XX:+UseSerialGC")
                    .addProfiler(GCProfiler.class)
                    .verbosity(VerboseMode.SILENT)
                    .shouldFailOnError(true);
            if (pair != null) {
                options.param("pair", pair.name());
            }
            RunResult result = new Runner(options.build()).runSingle();
            double quickest = Double.POSITIVE_INFINITY;
            for (BenchmarkResult fork : result.getBenchmarkResults()) {
                for (IterationResult iteration : fork.getIterationResults()) {
                    quickest = Math.min(quickest, iteration.getPrimaryResult().getScore());
                }
            }
            nanos.add(quickest);
            bytes = result.getSecondaryResults().get("gc.alloc.rate.norm").getScore();
        }

        String row() {
            double[] ratios = new double[nanos.size()];
            for (int i = 0; i < ratios.length; i++) {
                ratios[i] = nanos.get(i) / baseline.nanos.get(i);
            }
            Arrays.sort(ratios);
            double[] sortedNanos =
                    nanos.stream().mapToDouble(Double::doubleValue).sorted().toArray();
            return String.format(
                    Locale.ROOT,
                    "%-62s %7.2f %7.2f %7.2f %9.2f %5s %8.0f %8.0f %8.0f",
                    title,
                    median(ratios),
                    ratios[0],
                    ratios[ratios.length - 1],
                    sortedNanos[0] / Collections.min(baseline.nanos),
                    Double.isNaN(aim) ? "" : String.valueOf(aim),
                    median(sortedNanos),
                    bytes,
                    size.getAsDouble());
        }

        private static double median(double[] sorted) {
            int n = sorted.length;
            return (sorted[(n - 1) / 2] + sorted[n / 2]) / 2;
        }
    }
}
