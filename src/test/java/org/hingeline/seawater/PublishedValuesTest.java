package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** All values from elsewhere in one place: each agrees, and {@code docs/published-values.md} lists them as they are. */
class PublishedValuesTest {
    private static final Path LISTED = Path.of("docs", "published-values.md");
    private static final Path GENERATED = Path.of("target", "published-values.md");

    private static final int SHOWN_ROW_BY_ROW = 100;

    private final List<PublishedValue> all = PublishedValues.all();

    @Test
    void each_agrees_within_what_its_digits_say() {
        assertThat(all)
                .allSatisfy(v -> assertThat(Math.abs(v.difference()))
                        .as("%s of %s.csv: published %s, ours %s", v.what(), v.table(), v.published(), v.ours())
                        .isLessThanOrEqualTo(v.tolerance()));
    }

    @Test
    void the_list_in_the_documents_is_the_one_computed_now() throws IOException {
        String now = document();
        Files.createDirectories(GENERATED.getParent());
        Files.writeString(GENERATED, now);
        assertThat(Files.readString(LISTED))
                .as(
                        "%s is not what the values are now: look at the difference to %s, and copy that over it when it is"
                                + " meant",
                        LISTED, GENERATED)
                .isEqualTo(now);
    }

    @Test
    void every_table_of_reference_is_read_here() throws IOException {
        try (Stream<Path> files = Files.list(Path.of("src", "test", "resources", "reference"))) {
            List<String> tables = files.map(f -> f.getFileName().toString().replace(".csv", ""))
                    .filter(name -> !name.equals("sources"))
                    .sorted()
                    .toList();
            assertThat(all.stream()
                            .map(PublishedValue::table)
                            .distinct()
                            .sorted()
                            .toList())
                    .isEqualTo(tables);
        }
    }

    /** For whoever runs the tests: how much was held against whom. */
    @Test
    void says_how_many_values_of_each_source_were_checked() {
        assertThat(all).allMatch(PublishedValue::agrees);
        StringBuilder text = new StringBuilder("Published values checked, by source:\n");
        counts().forEach((source, n) -> text.append(String.format("%7d  %s%n", n, source)));
        text.append(String.format("%7d  in all%n", all.size()));
        System.out.print(text);
    }

    private Map<String, Long> counts() {
        return all.stream()
                .collect(Collectors.groupingBy(
                        v -> v.source() + " | " + v.sourceWords(), TreeMap::new, Collectors.counting()));
    }

    private String document() {
        StringBuilder text = new StringBuilder("""
                # Published values and ours

                Every value from elsewhere that the chemistry is held against, computed anew by the tests, which fail when
                this page no longer says what they find. The values stand in `src/test/resources/reference`, each table
                with its sources and the reason for its tolerances. Amounts are in µmol/kg and pressures in µatm unless the
                name says otherwise.

                | source | in full | values |
                |---|---|---|
                """);
        counts().forEach((source, n) -> text.append(row(source, n)));
        all.stream()
                .collect(Collectors.groupingBy(PublishedValue::table, LinkedHashMap::new, Collectors.toList()))
                .forEach((table, values) -> {
                    text.append("\n## ").append(table).append(".csv\n\n");
                    text.append(values.size() > SHOWN_ROW_BY_ROW ? largestDifferences(values) : rowByRow(values));
                });
        return text.toString();
    }

    private static String rowByRow(List<PublishedValue> values) {
        StringBuilder text = new StringBuilder(
                row("value", "published", "ours", "difference", "tolerance", "source") + "|---|---|---|---|---|---|\n");
        for (PublishedValue v : values) {
            text.append(row(
                    v.what(),
                    v.published(),
                    v.shown(),
                    v.shownDifference(),
                    PublishedValue.twoDigits(v.tolerance()),
                    v.source()));
        }
        return text.toString();
    }

    /** Of long tables the value that fits worst. */
    private static String largestDifferences(List<PublishedValue> values) {
        StringBuilder text =
                new StringBuilder(row("quantity", "values", "largest difference", "at", "tolerance there", "source")
                        + "|---|---|---|---|---|---|\n");
        values.stream()
                .collect(Collectors.groupingBy(v -> v.what().split(",")[0], LinkedHashMap::new, Collectors.toList()))
                .forEach((quantity, some) -> {
                    PublishedValue worst = some.stream()
                            .max(Comparator.comparingDouble(v -> Math.abs(v.difference()) / v.tolerance()))
                            .orElseThrow();
                    text.append(row(
                            quantity,
                            some.size(),
                            PublishedValue.twoDigits(worst.difference()),
                            worst.what().substring(quantity.length() + 2),
                            PublishedValue.twoDigits(worst.tolerance()),
                            worst.source()));
                });
        return text.toString();
    }

    private static String row(Object... cells) {
        return Stream.of(cells).map(String::valueOf).collect(Collectors.joining(" | ", "| ", " |\n"));
    }
}
