package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** The calculator's pages as a person reads them, and its form as a browser sends it. */
final class CalculatorReader {
    private CalculatorReader() {}

    static Map<String, String> fields(String... namesAndValues) {
        Map<String, String> fields = new LinkedHashMap<>();
        for (int i = 0; i < namesAndValues.length; i += 2) {
            fields.put(namesAndValues[i], namesAndValues[i + 1]);
        }
        return fields;
    }

    static String form(String... namesAndValues) {
        return query(fields(namesAndValues));
    }

    static String query(Map<String, String> fields) {
        return "/calculator?"
                + fields.entrySet().stream()
                        .map(field ->
                                field.getKey() + "=" + URLEncoder.encode(field.getValue(), StandardCharsets.UTF_8))
                        .collect(Collectors.joining("&"));
    }

    /** What a browser would send of the form as it came. */
    static Map<String, String> sent(String page) {
        String form = page.substring(page.indexOf("<form class=\"calc\""), page.indexOf("Work it out"));
        Map<String, String> sent = new LinkedHashMap<>();
        Matcher input = Pattern.compile("<input ([^>]*)>").matcher(form);
        while (input.find()) {
            String tag = input.group(1);
            if (!tag.contains("type=\"radio\"") || tag.contains(" checked")) {
                sent.put(attribute(tag, "name"), attribute(tag, "value"));
            }
        }
        Matcher select = Pattern.compile("(?s)<select ([^>]*)>(.*?)</select>").matcher(form);
        while (select.find()) {
            Matcher option =
                    Pattern.compile("<option value=\"([^\"]*)\"[^>]* selected").matcher(select.group(2));
            sent.put(attribute(select.group(1), "name"), option.find() ? option.group(1) : "");
        }
        return sent;
    }

    private static String attribute(String tag, String name) {
        Matcher matcher = Pattern.compile("\\b" + name + "=\"([^\"]*)\"").matcher(tag);
        return matcher.find() ? matcher.group(1) : "";
    }

    static String value(String page, String field) {
        Matcher matcher =
                Pattern.compile("<input [^>]*name=\"" + field + "\"[^>]*>").matcher(page);
        assertThat(matcher.find()).as(field).isTrue();
        return attribute(matcher.group(), "value");
    }

    static String words(String html) {
        return html.replaceAll("<[^>]*>", " ")
                .replaceAll("[ \\n\u00a0]+", " ")
                .replace("&lt;", "<")
                .replace("&amp;", "&");
    }

    /** The value of a quantity among all the digits. */
    static double digits(String words, String name) {
        return column(words, name, 1);
    }

    static double plusMinus(String words, String name) {
        return column(words, name, 2);
    }

    private static double column(String words, String name, int column) {
        Matcher row = Pattern.compile(" " + name + " ([\\d.]+)(?: ([\\d.]+))?")
                .matcher(words.substring(words.indexOf("All digits, to copy")));
        assertThat(row.find()).as(name + " in " + words).isTrue();
        return Double.parseDouble(row.group(column));
    }
}
