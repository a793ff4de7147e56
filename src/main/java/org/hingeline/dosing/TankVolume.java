package org.hingeline.dosing;

import java.util.List;
import java.util.Optional;

/**
 * The volume that a tank seems to hold, told by doses that came out short or over again and again.
 *
 * @param volumeL L
 * @param lowL lower end of its range, two standard uncertainties down, L
 * @param highL upper end, L
 * @param doses how many doses it rests on
 */
public record TankVolume(double volumeL, double lowL, double highL, int doses) {
    /** Fewer shortfalls than this are no pattern. */
    public static final int LEAST = 3;

    /**
     * A dose whose arrival was seen.
     *
     * @param volumeL volume it was reckoned for, L
     * @param expectedAlkalinity that was to arrive, mol/kg-seawater
     * @param arrivedAlkalinity that did, mol/kg-seawater
     * @param standardUncertainty of the difference, mol/kg-seawater
     */
    public record Sample(
            double volumeL,
            double expectedAlkalinity,
            double arrivedAlkalinity,
            double standardUncertainty,
            boolean less) {}

    /**
     * By least squares, each dose weighted by its uncertainty: what arrives is what went in, spread over 1/V. The range
     * takes the larger of what the uncertainties say and what the scatter says.
     *
     * @param samples the latest doses of one tank, those as foretold among them
     * @param volumeL the volume set for the tank, L
     * @return nothing with fewer than {@link #LEAST} shortfalls, or when the set volume is within the range
     */
    public static Optional<TankVolume> of(List<Sample> samples, double volumeL) {
        if (samples.stream().filter(Sample::less).count() < LEAST) {
            return Optional.empty();
        }
        double expectedSquared = 0;
        double expectedArrived = 0;
        for (Sample sample : samples) {
            double weight = 1 / (sample.standardUncertainty() * sample.standardUncertainty());
            double expected = expected(sample, volumeL);
            expectedSquared += weight * expected * expected;
            expectedArrived += weight * expected * sample.arrivedAlkalinity();
        }
        double share = expectedArrived / expectedSquared;
        double residuals = 0;
        for (Sample sample : samples) {
            double off =
                    (sample.arrivedAlkalinity() - share * expected(sample, volumeL)) / sample.standardUncertainty();
            residuals += off * off;
        }
        double scatter = Math.max(1, residuals / (samples.size() - 1));
        double uncertainty = Math.sqrt(scatter / expectedSquared);
        double least = share - 2 * uncertainty;
        double most = share + 2 * uncertainty;
        if (!(least > 0) || most >= 1) {
            return Optional.empty();
        }
        return Optional.of(new TankVolume(volumeL / share, volumeL / most, volumeL / least, samples.size()));
    }

    /** The alkalinity the dose would add to the volume set now. */
    private static double expected(Sample sample, double volumeL) {
        return sample.expectedAlkalinity() * sample.volumeL() / volumeL;
    }
}
