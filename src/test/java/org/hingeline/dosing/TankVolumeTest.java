package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.hingeline.dosing.TankVolume.Sample;
import org.junit.jupiter.api.Test;

class TankVolumeTest {
    private static final double U = 10e-6;

    @Test
    void three_shortfalls_tell_the_volume_that_would_explain_them() {
        TankVolume volume = TankVolume.of(samples(3, 4000, 0.8), 4000).orElseThrow();

        assertThat(volume.volumeL()).isCloseTo(5000, within(1e-6));
        assertThat(volume.lowL()).isLessThan(5000).isGreaterThan(4000);
        assertThat(volume.highL()).isGreaterThan(5000);
        assertThat(volume.doses()).isEqualTo(3);
    }

    @Test
    void two_are_no_pattern() {
        assertThat(TankVolume.of(samples(2, 4000, 0.8), 4000)).isEmpty();
    }

    @Test
    void doses_reckoned_for_an_older_volume_count_for_what_they_were() {
        // short when 4000 L was set, and explained since 5000 L is
        assertThat(TankVolume.of(samples(4, 4000, 0.8), 5000)).isEmpty();
    }

    @Test
    void a_set_volume_within_the_range_is_left_alone() {
        List<Sample> barely = IntStream.range(0, 3)
                .mapToObj(i -> new Sample(4000, 300e-6, 295e-6, U, true))
                .toList();

        assertThat(TankVolume.of(barely, 4000)).isEmpty();
    }

    @Test
    void the_range_holds_the_truth_about_nineteen_times_in_twenty() {
        Random random = new Random(7);
        int held = 0;
        int told = 0;
        for (int run = 0; run < 1000; run++) {
            List<Sample> samples = IntStream.range(0, 6)
                    .mapToObj(i -> new Sample(4000, 300e-6, 0.75 * 300e-6 + U * random.nextGaussian(), U, true))
                    .toList();
            var volume = TankVolume.of(samples, 4000);
            if (volume.isPresent()) {
                told++;
                double truth = 4000 / 0.75;
                held += volume.get().lowL() <= truth && truth <= volume.get().highL() ? 1 : 0;
            }
        }
        assertThat(told).isEqualTo(1000);
        assertThat(held).isBetween(930, 990);
    }

    private static List<Sample> samples(int count, double volumeL, double share) {
        return IntStream.range(0, count)
                .mapToObj(i -> new Sample(volumeL, (200 + 50 * i) * 1e-6, share * (200 + 50 * i) * 1e-6, U, true))
                .toList();
    }
}
