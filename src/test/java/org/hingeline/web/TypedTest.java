package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class TypedTest {
    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "2350; 2350",
                "2 350; 2350",
                "2\u00a0350,5; 2350.5",
                "2.350; 2.35",
                "8,1; 8.1",
                "8,0212; 8.0212",
                "0,025; 0.025",
                "−1,5; -1.5",
                "2,1e3; 2100",
                ".5; 0.5",
                "2350,125; 2350.125"
            })
    void a_number_is_taken_as_people_type_it(String typed, double value) {
        assertThat(Typed.parsed(typed)).isEqualTo(value);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "2,350; write 2350 or 2.350",
                "4,000; write 4000 or 4.000",
                "−1,500; write -1500 or -1.500",
                "100,000; write 100000 or 100.000",
                "2,350,000; write 2350000",
            })
    void a_comma_that_may_set_thousands_apart_is_asked_about(String typed, String hint) {
        assertThat(Typed.parsed(typed)).isNull();
        assertThat(Typed.refusal(typed)).isEqualTo("“" + typed + "” can be read in two ways; " + hint);
    }

    @ParameterizedTest
    @ValueSource(strings = {"warm", "1,234.5", "1.234.567", "NaN", "Infinity", "1e999", "0x1p3", "1d", "--1", ","})
    void what_is_no_number_is_refused_as_none(String typed) {
        assertThat(Typed.parsed(typed)).isNull();
        assertThat(Typed.refusal(typed)).isEqualTo("“" + typed + "” is not a number");
    }
}
