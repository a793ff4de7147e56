package org.hingeline.kill;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.hingeline.kill.Promises.Key;

/**
 * Opens a copy of the file that a killed service left, by itself and not through the service, and holds what it finds
 * against what was promised. Faults are in words.
 */
final class Inspection implements AutoCloseable {

    /** What was found to be wrong, sorted by what it would mean. */
    record Findings(List<String> lost, List<String> doubled, List<String> indexes, List<String> halves) {
        boolean sound() {
            return lost.isEmpty() && doubled.isEmpty() && indexes.isEmpty() && halves.isEmpty();
        }

        String words() {
            return Stream.of(lost, doubled, indexes, halves)
                    .flatMap(List::stream)
                    .limit(20)
                    .collect(Collectors.joining("\n  ", "\n  ", ""));
        }
    }

    private final Connection connection;
    private final Path mail;
    private final Findings findings =
            new Findings(new ArrayList<>(), new ArrayList<>(), new ArrayList<>(), new ArrayList<>());

    /** @param copy a database file that nothing else has open; it is changed */
    Inspection(Path copy, Path mail) throws SQLException {
        String url = "jdbc:h2:file:" + copy.toString().replace(".mv.db", "")
                + ";IFEXISTS=TRUE;MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH";
        this.connection = DriverManager.getConnection(url, "sa", "");
        this.mail = mail;
    }

    /**
     * @param since readings received before this have been looked at before, so their water states are not again
     */
    Findings compare(Promises promises, Instant since) throws SQLException {
        tables();
        readings(promises);
        waterStates(since);
        limits(promises);
        acknowledgements(promises);
        alerts();
        messages();
        refused(promises);
        return findings;
    }

    /** Only whether the tables are there and agree with their indexes. */
    Findings tables() throws SQLException {
        findings.indexes().addAll(IndexComparison.faults(connection));
        long made =
                count("SELECT count(*) FROM \"flyway_schema_history\" WHERE \"success\" AND \"version\" IS NOT NULL");
        try (Stream<Path> files = Files.list(Path.of("migrations"))) {
            long wanted = files.filter(file -> file.toString().endsWith(".sql")).count();
            if (made != wanted || count("SELECT count(*) FROM \"flyway_schema_history\" WHERE NOT \"success\"") != 0) {
                findings.halves().add(made + " migrations are on record where there are " + wanted);
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return findings;
    }

    private void readings(Promises promises) throws SQLException {
        Map<Key, Double> found = new HashMap<>();
        each("""
                SELECT s.code, r.at, r.reading_value FROM reading r USE INDEX () JOIN sensor s ON s.id = r.sensor_id
                """, row -> {
            Key key = new Key(row.getString(1), millis(row, 2));
            if (found.put(key, row.getDouble(3)) != null) {
                findings.doubled().add("reading " + key + " is there twice");
            }
        });
        promises.readings().forEach((key, value) -> {
            if (!value.equals(found.get(key))) {
                findings.lost().add("reading " + key + " = " + value + " was acknowledged, found " + found.get(key));
            }
        });
        for (List<ReadingRow> batch : promises.unanswered()) {
            List<ReadingRow> fresh = batch.stream().filter(row -> !row.repeat()).toList();
            long there =
                    fresh.stream().filter(row -> found.containsKey(row.key())).count();
            if (there != 0 && there != fresh.size()) {
                findings.halves().add("of a batch of " + fresh.size() + " readings " + there + " are there");
            }
        }
        byKey(promises.ofThisRound());
    }

    private void byKey(Set<Key> keys) throws SQLException {
        Map<String, Long> sensors = new HashMap<>();
        each("SELECT code, id FROM sensor", row -> sensors.put(row.getString(1), row.getLong(2)));
        try (PreparedStatement query =
                connection.prepareStatement("SELECT reading_value FROM reading WHERE sensor_id = ? AND at = ?")) {
            for (Key key : keys) {
                query.setLong(1, sensors.get(key.sensor()));
                query.setObject(2, Instant.ofEpochMilli(key.atMillis()).atOffset(ZoneOffset.UTC));
                try (ResultSet row = query.executeQuery()) {
                    if (!row.next()) {
                        findings.lost().add("reading " + key + " was acknowledged and is not found by its key");
                    }
                }
            }
        }
    }

    /** A batch is whole only with its water states. */
    private void waterStates(Instant since) throws SQLException {
        try (PreparedStatement query = connection.prepareStatement("""
                SELECT count(*) FROM reading r JOIN sensor s ON s.id = r.sensor_id
                WHERE r.received_at >= ? AND s.quantity IN ('ph', 'temperature', 'salinity', 'totalAlkalinity')
                  AND NOT EXISTS (SELECT 1 FROM water_state w WHERE w.point_id = s.point_id AND w.at = r.at)
                """)) {
            query.setObject(1, since.atOffset(ZoneOffset.UTC));
            try (ResultSet row = query.executeQuery()) {
                row.next();
                if (row.getLong(1) != 0) {
                    findings.halves().add(row.getLong(1) + " readings have no water state of their time");
                }
            }
        }
    }

    private void limits(Promises promises) throws SQLException {
        Map<String, Integer> standing = new HashMap<>();
        each("""
                SELECT p.code || '/' || l.name, l.action FROM limit_rule l JOIN point p ON p.id = l.point_id
                """, row -> standing.put(row.getString(1), number("edit ", row.getString(2))));
        Map<String, List<Integer>> journaled = new HashMap<>();
        each("SELECT subject, detail FROM journal WHERE what = 'limit-saved' ORDER BY id", row -> {
            String after = row.getString(2).substring(row.getString(2).indexOf("; after: "));
            journaled.computeIfAbsent(row.getString(1), s -> new ArrayList<>()).add(number("edit ", after));
        });
        promises.asked().forEach((subject, asked) -> {
            if (!subject.equals(People.Acknowledger.SUBJECT)) {
                List<Integer> edits = journaled.getOrDefault(subject, List.of()).stream()
                        .filter(edit -> edit != 0)
                        .toList();
                numbered(subject, edits, asked, promises.done().getOrDefault(subject, Set.of()));
                int newest = edits.isEmpty() ? 0 : edits.get(edits.size() - 1);
                int stands = standing.getOrDefault(subject, 0);
                if (stands != newest) {
                    findings.halves().add("limit " + subject + " is at edit " + stands + ", its journal at " + newest);
                }
            }
        });
    }

    private void acknowledgements(Promises promises) throws SQLException {
        String subject = People.Acknowledger.SUBJECT;
        List<Integer> journaled = new ArrayList<>();
        each(
                "SELECT detail FROM journal WHERE what = 'alert-acknowledged' ORDER BY id",
                row -> journaled.add(number("seen ", row.getString(1))));
        numbered(
                subject,
                journaled,
                promises.asked().getOrDefault(subject, Set.of()),
                promises.done().getOrDefault(subject, Set.of()));
        // an alert that is raised again can be acknowledged again, and then shows the later note
        Set<Integer> shown = new HashSet<>();
        each(
                "SELECT acknowledgement_note FROM alert WHERE acknowledged_at IS NOT NULL",
                row -> shown.add(number("seen ", row.getString(1))));
        if (!new HashSet<>(journaled).containsAll(shown)) {
            findings.halves().add("an alert is acknowledged that the journal does not know of");
        }
        if (!journaled.isEmpty() && !shown.contains(journaled.get(journaled.size() - 1))) {
            findings.lost().add("the last acknowledgement of the journal stands on no alert");
        }
    }

    private void numbered(String subject, List<Integer> found, Set<Integer> asked, Set<Integer> done) {
        Set<Integer> once = new HashSet<>();
        for (Integer number : found) {
            if (!once.add(number)) {
                findings.doubled().add(subject + ": " + number + " was done twice");
            }
            if (!asked.contains(number)) {
                findings.halves().add(subject + ": " + number + " was done and never asked for");
            }
        }
        done.stream()
                .filter(number -> !once.contains(number))
                .forEach(number -> findings.lost().add(subject + ": " + number + " was acknowledged and is gone"));
    }

    private void alerts() throws SQLException {
        each("""
                SELECT limit_id, count(*) FROM alert WHERE closed_at IS NULL GROUP BY limit_id HAVING count(*) > 1
                """, row -> findings.doubled().add("limit " + row.getLong(1) + " has " + row.getLong(2) + " open alerts"));
        each("""
                SELECT a.id FROM alert a LEFT JOIN alert_state s ON s.alert_id = a.id
                WHERE a.closed_at IS NULL AND (s.limit_id IS NULL OR s.limit_id <> a.limit_id OR s.phase <> a.phase)
                """, row -> findings.halves().add("alert " + row.getLong(1) + " is open, its limit does not say so"));
        each("""
                SELECT s.limit_id FROM alert_state s JOIN alert a ON a.id = s.alert_id WHERE a.closed_at IS NOT NULL
                """, row -> findings.halves().add("limit " + row.getLong(1) + " points at a closed alert"));
        each("""
                SELECT limit_id FROM alert_state WHERE (alert_id IS NULL) <> (phase = 'normal')
                """, row -> findings.halves().add("limit " + row.getLong(1) + " stands in a phase without its alert"));
    }

    /** Each alert was told of to each subscriber, in its own transaction; what was sent is in the folder. */
    private void messages() throws SQLException {
        each(
                """
                SELECT a.id, count(o.id), (SELECT count(*) FROM subscriber WHERE active AND site_id = a.site_id
                                             AND (min_priority <> 'high' OR a.priority = 'high'))
                FROM alert a LEFT JOIN outbox o ON o.alert_id = a.id AND o.message_key LIKE '%-raised-%'
                WHERE a.priority = 'high'
                GROUP BY a.id, a.site_id, a.priority
                """,
                row -> {
                    if (row.getLong(2) != row.getLong(3)) {
                        findings.halves()
                                .add("alert " + row.getLong(1) + " has " + row.getLong(2) + " messages for "
                                        + row.getLong(3) + " subscribers");
                    }
                });
        Set<String> files = new HashSet<>();
        if (Files.isDirectory(mail)) {
            try (Stream<Path> all = Files.list(mail)) {
                all.forEach(file -> files.add(file.getFileName().toString().replaceFirst("^[0-9TZ]+-", "")));
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }
        each("SELECT message_key, state FROM outbox WHERE state = 'sent'", row -> {
            if (!files.contains(row.getString(1) + ".eml")) {
                findings.lost().add("message " + row.getString(1) + " is marked as sent and nowhere");
            }
        });
    }

    private void refused(Promises promises) throws SQLException {
        long kept = count("SELECT count(*) FROM refused_row");
        if (kept < promises.refusedRows()) {
            findings.lost().add(kept + " refused rows are kept of " + promises.refusedRows());
        }
    }

    /** The number after a word, 0 where there is none. */
    private static int number(String word, String text) {
        int at = text.indexOf(word);
        if (at < 0) {
            return 0;
        }
        int from = at + word.length();
        int to = from;
        while (to < text.length() && Character.isDigit(text.charAt(to))) {
            to++;
        }
        return to == from ? 0 : Integer.parseInt(text.substring(from, to));
    }

    private static long millis(ResultSet row, int column) throws SQLException {
        return row.getObject(column, OffsetDateTime.class).toInstant().toEpochMilli();
    }

    private interface RowWork {
        void on(ResultSet row) throws SQLException;
    }

    long count(String sql) throws SQLException {
        long[] count = {0};
        each(sql, row -> count[0] = row.getLong(1));
        return count[0];
    }

    private void each(String sql, RowWork work) throws SQLException {
        try (Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery(sql)) {
            while (rows.next()) {
                work.on(rows);
            }
        }
    }

    @Override
    public void close() throws SQLException {
        try (connection;
                Statement statement = connection.createStatement()) {
            statement.execute("SHUTDOWN IMMEDIATELY");
        }
    }
}
