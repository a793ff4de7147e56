package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import org.hingeline.seawater.Caution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class WaterCalculatorTest {
    private final WaterCalculator calculator = new WaterCalculator();

    private static WaterWishBuilder water() {
        return WaterWish.builder().temperatureC(22.0).salinity(30.0);
    }

    private static WaterWishBuilder measured() {
        return water().ph(7.9).totalAlkalinityUmolKg(2078.0);
    }

    private static WaterWish.Uncertainty uncertainty(Double ph, Double salinity, Double conductivity) {
        return new WaterWish.Uncertainty(ph, null, null, null, null, salinity, conductivity, null);
    }

    private CalculatedWater calculated(WaterWishBuilder wish) {
        return calculator.calculate(wish.build(), true);
    }

    private List<FieldFaults.Fault> faults(WaterWishBuilder wish) {
        FieldFaultsException e =
                catchThrowableOfType(FieldFaultsException.class, () -> calculator.calculate(wish.build(), true));
        assertThat(e).as("nothing was refused").isNotNull();
        assertThat(e.faults())
                .allSatisfy(fault -> assertThat(fault.detail()).doesNotContain("mol/kg-", " mol/kg", " atm"));
        return e.faults();
    }

    private void refuses(WaterWishBuilder wish, String field, String... words) {
        assertThat(faults(wish)).anySatisfy(fault -> {
            assertThat(fault.field()).isEqualTo(field);
            assertThat(fault.detail()).contains(words);
        });
    }

    @Test
    void every_pair_gives_the_same_water() {
        CalculatedWater first = calculated(measured());
        double ph = first.state().phTotal();
        double alkalinity = first.state().totalAlkalinity() * 1e6;
        double dic = first.state().dic() * 1e6;
        double pco2 = first.state().pco2Atm() * 1e6;
        Stream<UnaryOperator<WaterWishBuilder>> pairs = Stream.of(
                w -> w.ph(ph).totalAlkalinityUmolKg(alkalinity),
                w -> w.ph(ph).dicUmolKg(dic),
                w -> w.ph(ph).pco2Uatm(pco2),
                w -> w.totalAlkalinityUmolKg(alkalinity).dicUmolKg(dic),
                w -> w.totalAlkalinityUmolKg(alkalinity).pco2Uatm(pco2),
                w -> w.dicUmolKg(dic).pco2Uatm(pco2));
        pairs.forEach(pair -> assertThat(calculated(pair.apply(water())).state().omegaAragonite())
                .isCloseTo(first.state().omegaAragonite(), within(1e-9)));
    }

    @Test
    void uncertainties_that_were_not_given_are_the_usual_ones() {
        CalculatedWater usual = calculated(measured());
        assertThat(usual.inputs().ph()).isEqualTo(0.02);
        assertThat(usual.inputs().totalAlkalinity()).isEqualTo(10e-6);
        assertThat(calculated(measured().phScale("nbs")).inputs().ph()).isEqualTo(0.05);
        assertThat(calculator.calculate(measured().build(), false).uncertainty())
                .isNull();
    }

    @Test
    void a_salinity_from_conductivity_brings_its_own_uncertainty_and_cautions() {
        WaterWishBuilder fresh = measured().salinity(null).conductivityMsCm(43.6);
        CalculatedWater usual = calculated(fresh);
        assertThat(usual.state().conditions().salinity()).isCloseTo(30, within(0.2));
        assertThat(usual.inputs().salinity()).isCloseTo(0.1, within(0.02));
        assertThat(usual.method().salinityFromConductivity()).isTrue();
        assertThat(calculated(fresh.uncertainty(uncertainty(null, null, 1.0)))
                        .inputs()
                        .salinity())
                .isCloseTo(0.75, within(0.1));
        assertThat(calculated(measured().temperatureC(40.0).salinity(null).conductivityMsCm(60.0))
                        .cautions())
                .extracting(Caution::detail)
                .anySatisfy(detail -> assertThat(detail).contains("Practical Salinity Scale"));
    }

    @Test
    void what_the_water_becomes_is_told_when_asked_for() {
        CalculatedWater water = calculated(measured()
                .warmToC(25.0)
                .equilibrateToUatm(420.0)
                .blendWith(new WaterWish.Blend(
                        WaterWish.builder()
                                .temperatureC(12.0)
                                .salinity(34.0)
                                .phScale("nbs")
                                .ph(8.2)
                                .totalAlkalinityUmolKg(2250.0)
                                .build(),
                        0.25))
                .ammoniaMgL(0.5));
        assertThat(water.warmed().state().conditions().temperatureC()).isEqualTo(25);
        assertThat(water.warmed().state().dic()).isEqualTo(water.state().dic());
        assertThat(water.equilibrated().state().pco2Atm()).isCloseTo(420e-6, within(1e-15));
        assertThat(water.blended().state().conditions().salinity()).isCloseTo(31, within(1e-12));
        assertThat(water.blended().state().totalAlkalinity()).isCloseTo(2121e-6, within(1e-15));
        assertThat(water.blended().cautions())
                .extracting(Caution::code, Caution::detail)
                .anySatisfy(each -> assertThat(each.toString()).contains("nbs-scale", "Of the water mixed in"));
        assertThat(water.ammonia().nitrogenMgL())
                .isCloseTo(0.5 * water.ammonia().share(), within(1e-15));
        assertThat(water.ammonia().nh3MgL()).isGreaterThan(water.ammonia().nitrogenMgL());
        assertThat(water.equilibrated().uncertainty().pco2Atm().total()).isCloseTo(0, within(1e-12));

        CalculatedWater plain = calculated(measured());
        assertThat(plain.warmed()).isNull();
        assertThat(plain.equilibrated()).isNull();
        assertThat(plain.blended()).isNull();
        assertThat(plain.ammonia()).isNull();
    }

    @Test
    void the_other_water_of_a_blend_has_the_fits_of_the_first_where_it_names_none() {
        WaterWish same = measured().build();
        CalculatedWater blend = calculated(
                measured().constants("millero2006").boron("uppstrom1974").blendWith(new WaterWish.Blend(same, 0.5)));
        assertThat(blend.blended().state().phTotal()).isCloseTo(7.9, within(1e-9));
    }

    @ParameterizedTest
    @CsvSource({
        "temperatureC, -2, 45, -2.001, 45.001",
        "salinity, 0, 50, -0.001, 50.001",
        "ph, 2, 13, 1.999, 13.001",
        "totalAlkalinityUmolKg, -10000, 100000, -10000.1, 100000.1",
        "dicUmolKg, 0, 100000, -0.1, 100000.1",
        "pco2Uatm, 1e-9, 1000000, 0, 1000000.1",
        "phosphateUmolKg, 0, 1000, -0.1, 1000.1",
        "silicateUmolKg, 0, 10000, -0.1, 10000.1",
        "calciumMmolKg, 0, 100, -0.1, 100.1"
    })
    void the_ranges_told_are_those_that_are_computed(
            String field, double low, double high, double below, double above) {
        for (double good : new double[] {low, high}) {
            assertThat(calculated(with(field, good)).state().omegaAragonite()).isFinite();
        }
        for (double bad : new double[] {below, above, Double.NaN, Double.POSITIVE_INFINITY}) {
            refuses(with(field, bad), field, field + " " + WaterFaults.plain(bad), "is accepted");
        }
    }

    private static WaterWishBuilder with(String field, double value) {
        WaterWishBuilder any = water();
        return switch (field) {
            case "temperatureC" -> measured().temperatureC(value);
            case "salinity" -> measured().salinity(value).ph(7.0);
            case "ph" -> any.ph(value).dicUmolKg(2000.0);
            case "totalAlkalinityUmolKg" -> any.totalAlkalinityUmolKg(value).dicUmolKg(2000.0);
            case "dicUmolKg" -> any.ph(8.0).dicUmolKg(value);
            case "pco2Uatm" -> any.totalAlkalinityUmolKg(2000.0).pco2Uatm(value);
            case "phosphateUmolKg" -> measured().phosphateUmolKg(value);
            case "silicateUmolKg" -> measured().silicateUmolKg(value);
            case "calciumMmolKg" -> measured().calciumMmolKg(value);
            default -> throw new IllegalArgumentException(field);
        };
    }

    @Test
    void refuses_what_contradicts_itself_in_the_units_it_was_given_in() {
        refuses(water().ph(9.5).totalAlkalinityUmolKg(100.0), "ph", "ph 9.5 and totalAlkalinityUmolKg 100", "lower ph");
        refuses(water().ph(9.5).totalAlkalinityUmolKg(100.0), "totalAlkalinityUmolKg", "a higher one is accepted");
        refuses(water().dicUmolKg(2.0).pco2Uatm(5000.0), "dicUmolKg", "dicUmolKg 2 and pco2Uatm 5000");
        refuses(water().dicUmolKg(2.0).pco2Uatm(5000.0), "pco2Uatm", "a lower one is accepted");
    }

    @Test
    void needs_exactly_two_of_the_four() {
        refuses(water(), "", "exactly two of ph, totalAlkalinityUmolKg, dicUmolKg, pco2Uatm", "got none");
        refuses(water().ph(8.0), "", "got ph 8");
        refuses(measured().dicUmolKg(1900.0), "", "got ph 7.9, totalAlkalinityUmolKg 2078, dicUmolKg 1900");
    }

    @Test
    void needs_one_of_salinity_and_conductivity() {
        refuses(measured().salinity(null), "salinity", "salinity is missing", "conductivityMsCm");
        refuses(measured().conductivityMsCm(44.0), "conductivityMsCm", "only one of", "30 and 44");
        refuses(measured().salinity(null).conductivityMsCm(-1.0), "conductivityMsCm", "-1", "0 to 200 mS/cm");
        refuses(measured().salinity(null).conductivityMsCm(150.0), "conductivityMsCm", "150", "salinity of 50");
        refuses(measured().uncertainty(uncertainty(null, null, 1.0)), "uncertainty/conductivityMsCm", "not used");
        refuses(
                measured().salinity(null).conductivityMsCm(44.0).uncertainty(uncertainty(null, 1.0, null)),
                "uncertainty/salinity",
                "uncertainty/conductivityMsCm is accepted");
    }

    @Test
    void how_a_ph_was_read_needs_a_ph() {
        WaterWishBuilder without = water().totalAlkalinityUmolKg(2078.0).dicUmolKg(1900.0);
        refuses(without.phTemperatureC(25.0), "phTemperatureC", "phTemperatureC 25", "no ph");
        refuses(without.phTemperatureC(null).phScale("nbs"), "phScale", "\"nbs\"", "no ph");
        refuses(measured().phTemperatureC(60.0), "phTemperatureC", "60", "-2 to 45 °C");
        refuses(measured().phScale("NBS"), "phScale", "\"NBS\"", "total, seawater, free, nbs");
    }

    @Test
    void names_what_would_be_known() {
        refuses(measured().constants("lueker"), "constants", "\"lueker\"", "lueker2000, millero2006, waters2014");
        refuses(measured().boron("x".repeat(500)), "boron", "…\" is not known", "lee2010, uppstrom1974");
    }

    @Test
    void refuses_a_treatment_that_cannot_be() {
        refuses(measured().warmToC(60.0), "warmToC", "warmToC 60", "-2 to 45 °C");
        refuses(measured().warmToC(Double.NaN), "warmToC", "NaN");
        refuses(measured().equilibrateToUatm(0.0), "equilibrateToUatm", "0", "above 0 to 1000000 µatm");
        refuses(measured().ammoniaMgL(-1.0), "ammoniaMgL", "-1", "0 to 1000 mg/L");
        refuses(
                water().temperatureC(0.0)
                        .totalAlkalinityUmolKg(100_000.0)
                        .dicUmolKg(0.0)
                        .ammoniaMgL(1.0),
                "ammoniaMgL",
                "phTotal 13.",
                "2 to 13");
        refuses(measured().blendWith(new WaterWish.Blend(null, null)), "blendWith/water", "missing");
        refuses(measured().blendWith(new WaterWish.Blend(null, null)), "blendWith/massShare", "missing", "0 to 1");
        refuses(measured().blendWith(new WaterWish.Blend(measured().build(), 1.2)), "blendWith/massShare", "1.2");
        refuses(
                measured().blendWith(new WaterWish.Blend(measured().ph(80.0).build(), 0.5)),
                "blendWith/water/ph",
                "blendWith/water/ph 80");
        refuses(
                measured()
                        .blendWith(new WaterWish.Blend(measured().warmToC(25.0).build(), 0.5)),
                "blendWith/water/warmToC",
                "not taken here");
    }

    @Test
    void refuses_an_uncertainty_that_is_none() {
        refuses(measured().uncertainty(uncertainty(-0.1, null, null)), "uncertainty/ph", "-0.1", "0 to 1");
        refuses(measured().uncertainty(uncertainty(null, 1e300, null)), "uncertainty/salinity", "1.0E300", "0 to 10");
    }

    @Test
    void tells_everything_at_once() {
        assertThat(faults(WaterWish.builder()
                        .temperatureC(60.0)
                        .ph(80.0)
                        .dicUmolKg(-1.0)
                        .phScale("sws")
                        .constants("best")
                        .warmToC(70.0)
                        .blendWith(new WaterWish.Blend(WaterWish.builder().build(), 2.0))))
                .extracting(FieldFaults.Fault::field)
                .containsExactlyInAnyOrder(
                        "temperatureC",
                        "salinity",
                        "ph",
                        "dicUmolKg",
                        "phScale",
                        "constants",
                        "warmToC",
                        "blendWith/massShare",
                        "blendWith/water",
                        "blendWith/water/temperatureC",
                        "blendWith/water/salinity");
    }
}
