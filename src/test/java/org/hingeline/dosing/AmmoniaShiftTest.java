package org.hingeline.dosing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.hingeline.seawater.Caution;
import org.junit.jupiter.api.Test;

class AmmoniaShiftTest {
    private static final DoseRequest REQUEST = Waters.towards(new Target.OmegaAragonite(3.0));

    private static DosePlan with(Double totalMgL) {
        return DosePlanner.plan(REQUEST.but().ammoniaMgL(totalMgL).build());
    }

    @Test
    void the_un_ionised_share_before_and_after_is_held_against_the_criteria() {
        DosePlan plan = with(1.0);
        AmmoniaShift shift = plan.ammonia();
        // 2.4 % and 5.0 % un-ionised, 17.031/14.007 g of NH3 per g of N
        assertThat(shift.unionisedBeforeMgL()).isCloseTo(0.024 * 1.216, within(0.001));
        assertThat(shift.unionisedAfterMgL()).isCloseTo(0.050 * 1.216, within(0.002));
        assertThat(plan.cautions())
                .filteredOn(c -> c.code().equals("ammonia-above-criterion"))
                .singleElement()
                .satisfies(c -> assertThat(c.detail()).contains("chronic"));
        assertThat(with(5.0).cautions())
                .filteredOn(c -> c.code().equals("ammonia-above-criterion"))
                .singleElement()
                .satisfies(c -> assertThat(c.detail()).contains("acute"));
        assertThat(with(0.1).cautions()).extracting(Caution::code).doesNotContain("ammonia-above-criterion");
    }

    @Test
    void unknown_ammonia_of_a_still_tank_is_asked_for() {
        assertThat(with(null).cautions()).extracting(Caution::code).contains("ammonia", "ammonia-unknown");
        assertThat(with(0.1).cautions()).extracting(Caution::code).doesNotContain("ammonia-unknown");
        assertThat(DosePlanner.plan(REQUEST.but()
                                .receiver(new Receiver.FlowThrough(4000, 40))
                                .build())
                        .cautions())
                .extracting(Caution::code)
                .doesNotContain("ammonia-unknown");
    }

    @Test
    void ammonia_that_cannot_be_is_refused() {
        assertThat(with(-1.0).reasons()).extracting(Reason::code).containsExactly("ammonia-implausible");
        assertThat(with(Double.NaN).reasons()).extracting(Reason::code).containsExactly("ammonia-implausible");
    }
}
