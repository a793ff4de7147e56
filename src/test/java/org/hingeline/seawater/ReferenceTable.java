package org.hingeline.seawater;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** A table under {@code src/test/resources/reference}: comments, a line of names, and rows by those names. */
record ReferenceTable(String name, List<Map<String, String>> rows) {
    static ReferenceTable read(String name) {
        String resource = "/reference/" + name + ".csv";
        try (InputStream in = ReferenceTable.class.getResourceAsStream(resource)) {
            if (in == null) {
                throw new IllegalArgumentException("no table " + resource);
            }
            BufferedReader reader = new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8));
            return new ReferenceTable(
                    name,
                    rows(reader.lines().filter(line -> !line.startsWith("#")).toList()));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The last column takes the rest of a line, commas and all. */
    private static List<Map<String, String>> rows(List<String> lines) {
        String[] names = lines.get(0).split(",");
        List<Map<String, String>> rows = new ArrayList<>();
        for (String line : lines.subList(1, lines.size())) {
            String[] cells = line.split(",", names.length);
            if (cells.length != names.length) {
                throw new IllegalArgumentException(cells.length + " cells for " + names.length + " columns: " + line);
            }
            Map<String, String> row = new TreeMap<>();
            for (int i = 0; i < names.length; i++) {
                row.put(names[i], cells[i]);
            }
            rows.add(row);
        }
        return rows;
    }
}
