package org.hingeline.kill;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Twenty kills; {@code ops/kill-test} makes as many as one likes. */
@Tag("kill")
class KillTest {
    private static final int KILLS = 20;
    private static final long SEED = 20_260_514;

    @Test
    void what_was_acknowledged_is_there_once_after_every_kill(@TempDir Path folder) throws Exception {
        System.out.println("seed " + SEED);

        KillRun.Figures figures =
                new KillRun(KILLS, SEED, ServiceProcess.theseClasses(), folder, System.out::println).run();

        System.out.println(figures.words());
        assertThat(figures.faults()).as(figures.words()).isEmpty();
        assertThat(figures.readings()).as("readings acknowledged").isGreaterThan(1000);
        assertThat(figures.edits()).as("edits acknowledged").isGreaterThan(20);
        assertThat(figures.acknowledgements()).as("acknowledgements").isGreaterThan(5);
        assertThat(figures.alerts()).as("alerts raised").isGreaterThan(5);
    }
}
