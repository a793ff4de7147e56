package org.hingeline.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.assertThatIllegalStateException;
import static org.assertj.core.api.Assertions.within;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class UnitsTest {
    @ParameterizedTest
    @CsvFileSource(resources = "/reference/units.csv", useHeadersInDisplayName = true)
    void a_value_goes_to_the_canonical_unit_and_back(
            String quantity,
            String unit,
            Double densityKgM3,
            double value,
            double canonical,
            double tolerance,
            String source) {
        UnitConversion conversion = conversion(quantity, unit, densityKgM3);
        assertThat(conversion.toCanonical(value))
                .as("source %s", source)
                .isCloseTo(canonical, within(tolerance * Math.max(1, Math.abs(canonical))));
        assertThat(conversion.fromCanonical(canonical))
                .as("source %s", source)
                .isCloseTo(value, within(tolerance * Math.max(1, Math.abs(value))));
        assertThat(conversion.fromCanonical(conversion.toCanonical(value)))
                .isCloseTo(value, within(1e-12 * Math.max(1, Math.abs(value))));
    }

    @ParameterizedTest
    @CsvFileSource(resources = "/reference/units.csv", useHeadersInDisplayName = true)
    void an_uncertainty_is_the_difference_of_two_values(
            String quantity, String unit, Double densityKgM3, double value) {
        UnitConversion conversion = conversion(quantity, unit, densityKgM3);
        double difference = conversion.toCanonical(value + 1) - conversion.toCanonical(value);
        assertThat(conversion.uncertaintyToCanonical(1)).isCloseTo(difference, within(1e-6 * difference));
        assertThat(conversion.uncertaintyFromCanonical(conversion.uncertaintyToCanonical(0.3)))
                .isCloseTo(0.3, within(1e-15));
    }

    @Test
    void every_unit_of_every_quantity_stands_in_the_table() {
        List<String> rows = rows();
        for (Quantity quantity : Quantity.values()) {
            for (UnitChoice choice : Units.of(quantity)) {
                assertThat(rows)
                        .as("%s in %s", quantity.code(), choice.ucum())
                        .anyMatch(row -> Units.find(quantity, row.split(",", -1)[1])
                                        .filter(choice::equals)
                                        .isPresent()
                                && row.startsWith(quantity.code() + ","));
            }
        }
    }

    @ParameterizedTest
    @EnumSource
    void a_quantity_has_units_with_codes_and_labels_of_their_own(Quantity quantity) {
        List<UnitChoice> choices = Units.of(quantity);
        assertThat(choices).isNotEmpty();
        assertThat(choices.get(0).ucum()).isEqualTo(quantity.unit().ucum());
        assertThat(choices).extracting(UnitChoice::ucum).doesNotHaveDuplicates();
        assertThat(choices).extracting(UnitChoice::label).doesNotHaveDuplicates();
        assertThat(Units.codes(quantity)).startsWith(quantity.unit().ucum());
    }

    @Test
    void people_read_labels_and_not_codes() {
        assertThat(Units.of(Quantity.TOTAL_ALKALINITY))
                .extracting(UnitChoice::label)
                .containsExactly(
                        "\u00b5mol/kg",
                        "mmol/kg",
                        "mol/kg",
                        "meq/L",
                        "mmol/L",
                        "\u00b5mol/L",
                        "mg/L as CaCO\u2083",
                        "dKH");
        assertThat(Units.find(Quantity.TEMPERATURE, "[degF]").orElseThrow().label())
                .isEqualTo("\u00b0F");
    }

    @Test
    void a_unit_per_litre_does_not_convert_without_a_density() {
        UnitChoice dkh = Units.find(Quantity.TOTAL_ALKALINITY, "dKH").orElseThrow();
        assertThat(dkh.perLitre()).isTrue();
        assertThatIllegalStateException().isThrownBy(dkh::conversion).withMessageContaining("{dKH}");
        assertThatIllegalArgumentException().isThrownBy(() -> dkh.conversion(0)).withMessageContaining("0.0");
        assertThatIllegalArgumentException().isThrownBy(() -> dkh.conversion(Double.NaN));
        assertThat(Units.codesWithoutDensity(Quantity.TOTAL_ALKALINITY)).isEqualTo("umol/kg, mmol/kg, mol/kg");
    }

    @Test
    void a_unit_written_otherwise_is_not_found() {
        assertThat(Stream.of("meq/l", "DKH", "\u00b5mol/kg", "UMOL/KG", "", " umol/kg"))
                .allSatisfy(text ->
                        assertThat(Units.find(Quantity.TOTAL_ALKALINITY, text)).isEmpty());
        assertThat(Units.find(Quantity.TEMPERATURE, "\u00b0C")).isEmpty();
        assertThat(Units.find(Quantity.PH, "Cel")).isEmpty();
    }

    @Test
    void a_degree_of_carbonate_hardness_is_nearly_18_milligrams_of_calcium_carbonate() {
        assertThat(Units.MG_CACO3_PER_MEQ).isCloseTo(50.04, within(0.005));
        assertThat(Units.DKH_PER_MEQ).isCloseTo(2.804, within(0.0005));
        assertThat(Units.MG_CACO3_PER_MEQ / Units.DKH_PER_MEQ).isCloseTo(17.85, within(0.005));
    }

    @ParameterizedTest
    @CsvSource({"L, 250, 250", "m3, 1.2, 1200", "[gal_us], 100, 378.5411784"})
    void a_volume_goes_to_litres_and_back(String ucum, double volume, double litres) {
        VolumeUnit unit = VolumeUnit.ofUcum(ucum).orElseThrow();
        assertThat(unit.toLitres(volume)).isCloseTo(litres, within(1e-10));
        assertThat(unit.fromLitres(litres)).isCloseTo(volume, within(1e-10));
    }

    @ParameterizedTest
    @CsvSource({"g, 54, 54", "kg, 1.5, 1500", "[lb_av], 2, 907.18474"})
    void a_mass_goes_to_grams_and_back(String ucum, double mass, double grams) {
        MassUnit unit = MassUnit.ofUcum(ucum).orElseThrow();
        assertThat(unit.toGrams(mass)).isCloseTo(grams, within(1e-10));
        assertThat(unit.fromGrams(grams)).isCloseTo(mass, within(1e-10));
    }

    @Test
    void an_unknown_unit_of_volume_or_mass_is_not_found() {
        assertThat(VolumeUnit.ofUcum("gal")).isEmpty();
        assertThat(MassUnit.ofUcum("lb")).isEmpty();
        assertThat(Arrays.stream(VolumeUnit.values()).map(VolumeUnit::label)).containsExactly("L", "m\u00b3", "US gal");
        assertThat(Arrays.stream(MassUnit.values()).map(MassUnit::label)).containsExactly("g", "kg", "lb");
    }

    private static UnitConversion conversion(String quantity, String unit, Double densityKgM3) {
        UnitChoice choice =
                Units.find(Quantity.ofCode(quantity).orElseThrow(), unit).orElseThrow();
        assertThat(choice.perLitre()).as("%s needs a density", unit).isEqualTo(densityKgM3 != null);
        return densityKgM3 == null ? choice.conversion() : choice.conversion(densityKgM3);
    }

    private static List<String> rows() {
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(
                UnitsTest.class.getResourceAsStream("/reference/units.csv"), StandardCharsets.UTF_8))) {
            return reader.lines().filter(line -> !line.startsWith("#")).skip(1).toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
