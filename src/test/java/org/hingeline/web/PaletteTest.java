package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Contrast as WCAG 2.2 defines it: at least 4.5 for words, 3 for the edges of things to press and for marks. */
class PaletteTest {
    private static final Pattern COLOUR = Pattern.compile("--([a-z-]+): #([0-9a-f]{6});");

    @ParameterizedTest
    @CsvSource({
        "ink, nacre, 4.5",
        "slate, nacre, 4.5",
        "kelp, nacre, 4.5",
        "bill, nacre, 4.5",
        "ink, sand, 4.5",
        "ink, shell, 4.5",
        "on-bill, bill, 4.5",
        "on-alarm, alarm, 4.5",
        "nacre, ink, 4.5",
        "nacre, slate, 4.5",
        "slate, shell, 3",
        "bill, bill-wash, 3",
        "kelp, kelp-wash, 3",
        "slate, fog, 3",
    })
    void words_and_marks_stand_out_by_day_and_by_night(String front, String back, double least) throws IOException {
        String css = css();
        int night = css.indexOf("prefers-color-scheme: dark");
        Map<String, Integer> day = colours(css.substring(0, night));
        Map<String, Integer> dark = new HashMap<>(day);
        dark.putAll(colours(css.substring(night)));
        assertThat(contrast(day, front, back)).as("by day").isGreaterThanOrEqualTo(least);
        assertThat(contrast(dark, front, back)).as("by night").isGreaterThanOrEqualTo(least);
    }

    private static String css() throws IOException {
        try (InputStream in = PaletteTest.class.getResourceAsStream("/web/hingeline.css")) {
            return new String(Objects.requireNonNull(in).readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    private static Map<String, Integer> colours(String css) {
        Map<String, Integer> colours = new HashMap<>();
        Matcher matcher = COLOUR.matcher(css);
        while (matcher.find()) {
            colours.put(matcher.group(1), Integer.parseInt(matcher.group(2), 16));
        }
        return colours;
    }

    private static double contrast(Map<String, Integer> colours, String front, String back) {
        double one = luminance(Objects.requireNonNull(colours.get(front), front));
        double other = luminance(Objects.requireNonNull(colours.get(back), back));
        return (Math.max(one, other) + 0.05) / (Math.min(one, other) + 0.05);
    }

    private static double luminance(int rgb) {
        return 0.2126 * linear(rgb >> 16 & 255) + 0.7152 * linear(rgb >> 8 & 255) + 0.0722 * linear(rgb & 255);
    }

    private static double linear(int channel) {
        double share = channel / 255.0;
        return share <= 0.04045 ? share / 12.92 : Math.pow((share + 0.055) / 1.055, 2.4);
    }
}
