package org.hingeline.web.view;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.CarbonateSystem;
import org.hingeline.seawater.Conditions;
import org.hingeline.seawater.KnownPair;
import org.hingeline.seawater.KnownPh;
import org.hingeline.seawater.PhScale;
import org.hingeline.web.view.Contours.Spot;
import org.hingeline.web.view.OmegaField.Range;
import org.hingeline.web.view.OmegaPicture.Reading;
import org.hingeline.web.view.OmegaPicture.Ring;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class OmegaPictureTest {
    private static final Conditions WATER = Conditions.of(22, 30);

    static Stream<KnownPair> every_pair() {
        CarbonateState s = solved(new KnownPair.PhAndAlkalinity(7.8, 2080e-6));
        return Stream.of(
                s.known(),
                new KnownPair.PhAndAlkalinity(KnownPh.on(PhScale.NBS, 7.9).readAt(15), 2080e-6),
                new KnownPair.PhAndDic(7.8, s.dic()),
                new KnownPair.PhAndPco2(7.8, s.pco2Atm()),
                new KnownPair.AlkalinityAndDic(2080e-6, s.dic()),
                new KnownPair.AlkalinityAndPco2(2080e-6, s.pco2Atm()),
                new KnownPair.DicAndPco2(s.dic(), s.pco2Atm()));
    }

    @ParameterizedTest
    @MethodSource("every_pair")
    void the_solver_finds_on_every_line_the_omega_that_the_line_stands_for(KnownPair pair) {
        OmegaField field = new OmegaField(solved(pair));
        Range across = around(field.firstValue());
        Range up = around(field.secondValue());
        double[][] grid = field.grid(across, up, 61, 41);
        int spots = 0;
        for (double level : new double[] {1, 1.5, 1.8, 2.5}) {
            for (List<Spot> line : Contours.at(level, grid)) {
                for (Spot spot : line) {
                    spots++;
                    assertThat(field.at(across.at(spot.column() / 60), up.at(spot.row() / 40)))
                            .as("%s at %s", level, spot)
                            .isCloseTo(level, within(0.003 * level));
                }
            }
        }
        assertThat(spots).isGreaterThan(50);
    }

    @ParameterizedTest
    @MethodSource("every_pair")
    void the_water_itself_lies_in_the_middle_with_its_own_omega(KnownPair pair) {
        CarbonateState state = solved(pair);
        OmegaField field = new OmegaField(state);

        assertThat(field.at(field.firstValue(), field.secondValue())).isCloseTo(state.omegaAragonite(), within(1e-9));
        OmegaPicture picture = draw(state, 1.8);
        assertThat(picture.x()).isEqualTo("50.00%");
        assertThat(picture.y()).isEqualTo("50.00%");
        assertThat(picture.limit()).isEqualTo("1.80");
        assertThat(picture.rings()).anySatisfy(ring -> assertThat(ring.css()).isEqualTo("limit"));
    }

    @Test
    void what_it_says_of_the_limit_is_what_the_solver_finds() {
        CarbonateState state = solved(new KnownPair.PhAndAlkalinity(7.8, 2080e-6));

        OmegaPicture picture = draw(state, 1.65);

        Matcher said = Pattern.compile("Ω 1\\.65, your limit, lies at pH (\\d\\.\\d+) with this alkalinity, or at"
                        + " alkalinity ([\\d\u00a0]+)\u00a0µmol/kg with this pH\\.")
                .matcher(picture.reach());
        assertThat(said.matches()).as(picture.reach()).isTrue();
        double ph = Double.parseDouble(said.group(1));
        double alkalinity = Double.parseDouble(said.group(2).replace("\u00a0", ""));
        assertThat(solved(new KnownPair.PhAndAlkalinity(ph, 2080e-6)).omegaAragonite())
                .isCloseTo(1.65, within(0.02));
        assertThat(solved(new KnownPair.PhAndAlkalinity(7.8, alkalinity * 1e-6)).omegaAragonite())
                .isCloseTo(1.65, within(0.005));
        assertThat(picture.summary()).contains("pH 7.40 to 8.20", "Ω rises with pH and with alkalinity.");
    }

    @Test
    void without_a_limit_it_says_where_aragonite_begins_to_dissolve_and_hatches_nothing() {
        OmegaPicture picture = draw(solved(new KnownPair.AlkalinityAndDic(2080e-6, 1950e-6)), null);

        assertThat(picture.reach()).startsWith("Ω 1, below which aragonite dissolves, lies at alkalinity ");
        assertThat(picture.shortOf()).isEmpty();
        assertThat(picture.rings().stream().map(Ring::css)).contains("one").doesNotContain("limit");
        assertThat(picture.summary()).contains("Ω rises with alkalinity and falls with DIC.");
    }

    @Test
    void it_reaches_further_out_for_a_limit_that_lies_far_and_says_so_when_that_is_not_enough() {
        CarbonateState state = solved(new KnownPair.AlkalinityAndPco2(2080e-6, 900e-6));

        assertThat(draw(state, 2.5).limit()).isEqualTo("2.50");
        OmegaPicture sour = draw(solved(new KnownPair.PhAndAlkalinity(6.8, 2080e-6)), 8.0);
        assertThat(sour.limit()).isEmpty();
        assertThat(sour.reach()).isEqualTo("Ω 8.00, your limit, lies outside the picture.");
    }

    @Test
    void the_axes_carry_round_values_in_the_readers_unit() {
        UnitChoice meq = Units.find(Quantity.TOTAL_ALKALINITY, "meq/L").orElseThrow();
        CarbonateState state = solved(new KnownPair.PhAndAlkalinity(7.8, 2080e-6));

        OmegaPicture picture = OmegaPicture.draw(
                state, reading(Quantity.PH), new Reading("alkalinity", "meq/L", meq.conversion(1020.5), 10), 1.8);

        assertThat(picture.second().name()).isEqualTo("alkalinity, meq/L");
        assertThat(picture.second().ticks().stream().map(OmegaPicture.Tick::label))
                .contains("2.0", "2.1");
        assertThat(picture.first().ticks().stream().map(OmegaPicture.Tick::label))
                .contains("7.6", "8.0");
        double share = Double.parseDouble(picture.second().ticks().stream()
                        .filter(tick -> tick.label().equals("2.1"))
                        .findFirst()
                        .orElseThrow()
                        .at()
                        .replace("%", ""))
                / 100;
        double low = 2080 - 0.12 * 2080;
        assertThat(low + (1 - share) * 2 * 0.12 * 2080).isCloseTo(2100 / 1.0205, within(0.1));
    }

    @Test
    void the_box_is_as_wide_as_the_plus_minus_both_ways() {
        OmegaPicture picture = draw(solved(new KnownPair.PhAndAlkalinity(7.8, 2080e-6)), null);

        assertThat(picture.box().width()).isEqualTo("5.00%"); // 2 x 0.02 of 0.8
        assertThat(picture.box().x()).isEqualTo("47.50%");
    }

    private static Range around(double value) {
        return value < 14 ? new Range(value - 0.4, value + 0.4) : new Range(0.8 * value, 1.2 * value);
    }

    private static OmegaPicture draw(CarbonateState state, Double limit) {
        OmegaField field = new OmegaField(state);
        return OmegaPicture.draw(state, reading(field.first()), reading(field.second()), limit);
    }

    private static Reading reading(Quantity quantity) {
        UnitChoice unit = Units.of(quantity).get(0);
        return switch (quantity) {
            case PH -> new Reading("pH", "total scale", unit.conversion(), 0.02);
            case TOTAL_ALKALINITY -> new Reading("alkalinity", unit.label(), unit.conversion(), 10);
            case DIC -> new Reading("DIC", unit.label(), unit.conversion(), 10);
            default -> new Reading("pCO₂", unit.label(), unit.conversion(), 10);
        };
    }

    private static CarbonateState solved(KnownPair pair) {
        return CarbonateSystem.solve(WATER, pair).orElseThrow();
    }
}
