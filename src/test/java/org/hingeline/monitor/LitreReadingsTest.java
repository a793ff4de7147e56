package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.hingeline.monitor.Hatchery.T0;
import static org.hingeline.monitor.Hatchery.row;

import java.time.Duration;
import java.time.Instant;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan.SensorPlan;
import org.hingeline.monitor.ReadingIntake.Answer;
import org.hingeline.seawater.ConductivitySalinity;
import org.hingeline.seawater.MilleroPoisson1981;
import org.junit.jupiter.api.Test;

/** Alkalinity as it is titrated: per litre. */
class LitreReadingsTest {
    private static final double DENSITY = MilleroPoisson1981.densityKgM3(25, 35);

    private final Hatchery hatchery = Hatchery.empty();

    @Test
    void a_value_per_litre_becomes_one_per_kilogram_by_the_density_of_the_tank() {
        hatchery.take(row(0, "t-1", 25, T0), row(1, "s-1", 35, T0));

        assertThat(titrated(0, 2.3, "meq/L", T0).stored()).isEqualTo(1);
        assertThat(alkalinity(T0)).isCloseTo(2.3 * 977.19, within(0.02));
    }

    @Test
    void the_units_of_test_kits_agree_with_each_other() {
        hatchery.take(row(0, "t-1", 25, T0), row(1, "s-1", 35, T0));
        String[] units = {"meq/L", "mmol/L", "umol/L", "mg/L", "{dKH}", "dKH"};
        double[] values = {2, 2, 2000, 2 * 50.043, 2 * 2.80385, 2 * 2.80385};
        for (int i = 0; i < units.length; i++) {
            Instant at = T0.plusSeconds(i);
            assertThat(titrated(0, values[i], units[i], at).refused())
                    .as(units[i])
                    .isEmpty();
            assertThat(alkalinity(at)).as(units[i]).isCloseTo(2e6 / DENSITY, within(1e-3));
        }
    }

    @Test
    void temperature_and_salinity_of_the_same_batch_count() {
        Answer answer =
                hatchery.take(litre(0, 2.3, "meq/L", T0), row(1, "s-1", 35, T0.minusSeconds(5)), row(2, "t-1", 25, T0));

        assertThat(answer.stored()).isEqualTo(3);
        assertThat(alkalinity(T0)).isCloseTo(2.3e6 / DENSITY, within(1e-9));
    }

    @Test
    void conductivity_does_where_no_salinity_was_read() {
        hatchery.sensor("c-1", Quantity.CONDUCTIVITY, 0.1);
        hatchery.take(
                row(0, "t-1", 25, T0),
                row(1, "c-1", ConductivitySalinity.conductivity(35, 25).orElseThrow(), T0));

        titrated(0, 2.3, "meq/L", T0);

        assertThat(alkalinity(T0)).isCloseTo(2.3e6 / DENSITY, within(1e-6));
    }

    @Test
    void without_a_density_it_is_refused_with_what_is_lacking_and_what_would_do() {
        Answer nothing = titrated(0, 8.2, "dKH", T0);
        assertThat(nothing.stored()).isZero();
        assertThat(nothing.refused().get(0).detail())
                .isEqualTo("value 8.2 {dKH} is per litre and needs the density of the water: tank has no temperature of"
                        + " the last 60 min and no salinity or conductivity of the last 360 min at"
                        + " 2026-05-14T03:00:00Z; send these first or in the same batch, or send totalAlkalinity in"
                        + " umol/kg, mmol/kg, mol/kg");

        hatchery.read("s-1", 35, T0);
        hatchery.read("t-1", 25, T0.minus(Duration.ofMinutes(61)));
        assertThat(titrated(0, 8.2, "dKH", T0).refused().get(0).detail())
                .contains("tank has no temperature of the last 60 min at")
                .doesNotContain("no salinity");
    }

    @Test
    void what_was_read_after_the_sample_does_not_count() {
        hatchery.take(row(0, "t-1", 25, T0.plusSeconds(1)), row(1, "s-1", 35, T0));

        assertThat(titrated(0, 2.3, "meq/L", T0).refused()).hasSize(1);
    }

    @Test
    void a_batch_sent_again_is_known_again_even_when_the_density_is_known_better_by_then() {
        hatchery.take(row(0, "t-1", 25, T0.minusSeconds(600)), row(1, "s-1", 35, T0));
        titrated(0, 2.3, "meq/L", T0);
        double stored = alkalinity(T0);
        hatchery.read("t-1", 22, T0.minusSeconds(60));

        assertThat(titrated(0, 2.3, "meq/L", T0).duplicates()).isEqualTo(1);
        assertThat(titrated(0, 2.31, "meq/L", T0).refused()).hasSize(1);
        assertThat(alkalinity(T0)).isEqualTo(stored);
    }

    @Test
    void a_sensor_may_report_in_a_unit_per_litre() {
        hatchery.place.saveSensor(
                hatchery.site,
                new SensorPlan("tank", "ta-1", Quantity.TOTAL_ALKALINITY, "{dKH}", null, 10, null),
                "test");
        hatchery.take(row(0, "t-1", 25, T0), row(1, "s-1", 35, T0));

        hatchery.read("ta-1", 8.2, T0);

        assertThat(alkalinity(T0)).isCloseTo(8.2 / 2.80385 * 1e6 / DENSITY, within(1e-6));
    }

    @Test
    void one_in_the_state_is_the_same_as_one_per_kilogram() {
        hatchery.take(
                row(0, "t-1", 25, T0), row(1, "s-1", 35, T0), row(2, "ph-1", 7.9, T0), litre(3, 2.3, "meq/L", T0));

        assertThat(hatchery.newestState().numbers().totalAlkalinityUmolKg()).isCloseTo(2.3e6 / DENSITY, within(1e-9));
    }

    private Answer titrated(int index, double value, String unit, Instant at) {
        return hatchery.take(litre(index, value, unit, at));
    }

    private static IncomingReading litre(int index, double value, String unit, Instant at) {
        return new IncomingReading(
                index, "tank", "totalAlkalinity", value, at.toString(), unit, null, null, "row " + index);
    }

    private double alkalinity(Instant at) {
        long sensor = hatchery.place.sensors(hatchery.site).stream()
                .filter(s -> s.quantity() == Quantity.TOTAL_ALKALINITY)
                .findFirst()
                .orElseThrow()
                .id();
        return hatchery.database
                .read(books -> books.readings().between(sensor, at, at))
                .get(0)
                .value();
    }
}
