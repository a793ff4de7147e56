package org.hingeline.seawater;

/** Standard deviations of the outputs of many draws. */
final class Spread {
    private final double[] mean = new double[Outputs.NAMES.size()];
    private final double[] squares = new double[Outputs.NAMES.size()];
    private long n;

    void add(double[] outputs) {
        n++;
        for (int q = 0; q < mean.length; q++) {
            double off = outputs[q] - mean[q];
            mean[q] += off / n;
            squares[q] += off * (outputs[q] - mean[q]);
        }
    }

    /** Both together (Chan, Golub & LeVeque 1983). */
    Spread with(Spread other) {
        Spread both = new Spread();
        both.n = n + other.n;
        for (int q = 0; q < mean.length; q++) {
            double apart = other.mean[q] - mean[q];
            both.mean[q] = mean[q] + apart * other.n / both.n;
            both.squares[q] = squares[q] + other.squares[q] + apart * apart * n * other.n / both.n;
        }
        return both;
    }

    double standardDeviation(int q) {
        return Math.sqrt(squares[q] / (n - 1));
    }
}
