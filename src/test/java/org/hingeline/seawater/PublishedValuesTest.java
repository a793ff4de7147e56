package org.hingeline.seawater;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** All values from elsewhere in one place: each agrees, and {@code docs/published-values.md} lists them as they are. */
class PublishedValuesTest {
    private static final Path LISTED = Path.of("docs", "published-values.md");
    private static final Path GENERATED = Path.of("target", "published-values.md");

    static Stream<PublishedValue> all() {
        return PublishedValues.all().stream();
    }

    @ParameterizedTest
    @MethodSource("all")
    void agrees_within_what_its_digits_say(PublishedValue value) {
        assertThat(Math.abs(value.difference()))
                .as("%s: published %s, ours %s (%s)", value.what(), value.published(), value.ours(), value.source())
                .isLessThanOrEqualTo(value.tolerance());
    }

    @Test
    void the_list_in_the_documents_is_the_one_computed_now() throws IOException {
        String now = document(PublishedValues.all());
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
            assertThat(PublishedValues.all().stream()
                            .map(PublishedValue::table)
                            .distinct()
                            .sorted()
                            .toList())
                    .isEqualTo(tables);
        }
    }

    /** For whoever runs the tests: how much of what was held against whom. */
    @Test
    void says_how_many_values_of_each_source_were_checked() {
        List<PublishedValue> all = PublishedValues.all();
        assertThat(all).allMatch(PublishedValue::agrees);
        StringBuilder text = new StringBuilder("Published values checked, by source:\n");
        counts(all).forEach((source, n) -> text.append(String.format("%7d  %s%n", n, source)));
        text.append(String.format("%7d  in all%n", all.size()));
        System.out.print(text);
    }

    private static Map<String, Long> counts(List<PublishedValue> all) {
        return all.stream().collect(Collectors.groupingBy(PublishedValue::source, TreeMap::new, Collectors.counting()));
    }

    private static String document(List<PublishedValue> all) {
        StringBuilder text = new StringBuilder("""
                # Published values and ours

                Every value from elsewhere that the chemistry is held against, computed anew by the tests, which fail when
                this page no longer says what they find. The values stand in `src/test/resources/reference`, each table
                with its sources and the reason for its tolerances. Amounts are in µmol/kg and pressures in µatm unless the
                name says otherwise.

                | source | values |
                |---|---|
                """);
        counts(all)
                .forEach((source, n) ->
                        text.append("| ").append(source).append(" | ").append(n).append(" |\n"));
        String table = "";
        for (PublishedValue value : all) {
            if (!value.table().equals(table)) {
                table = value.table();
                text.append("\n## ").append(table).append(".csv\n\n");
                text.append(
                        "| value | published | ours | difference | tolerance | source |\n|---|---|---|---|---|---|\n");
            }
            text.append(value.row()).append('\n');
        }
        return text.toString();
    }
}
