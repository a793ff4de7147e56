package org.hingeline.kill;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeSet;

/** What the writers asked for and what the service told them it has done. Shared by all writers. */
final class Promises {

    /** What makes a reading one and the same. */
    record Key(String sensor, long atMillis) {}

    private final Map<Key, Double> readings = new HashMap<>();
    private final Set<Key> ofThisRound = new HashSet<>();
    private final Map<String, List<ReadingRow>> unanswered = new HashMap<>();
    private final Map<String, TreeSet<Integer>> asked = new HashMap<>();
    private final Map<String, TreeSet<Integer>> done = new HashMap<>();
    private final Map<String, Long> latest = new HashMap<>();
    private final List<String> surprises = new ArrayList<>();
    private long refusedRows;

    /** Begins a round; what it will be promised is looked up by key as well as by scan. */
    synchronized void newRound() {
        ofThisRound.clear();
    }

    /** The gateway is about to send these for the first time. */
    synchronized void sending(String gateway, List<ReadingRow> rows) {
        unanswered.put(gateway, List.copyOf(rows));
    }

    /** The service says that it has them. */
    synchronized void stored(String gateway, List<ReadingRow> rows, int refused) {
        unanswered.remove(gateway);
        refusedRows += refused;
        for (ReadingRow row : rows) {
            if (row.refusal() == null) {
                readings.put(row.key(), row.value());
                ofThisRound.add(row.key());
            }
        }
    }

    /** What the gateway was left in doubt about. */
    synchronized List<ReadingRow> unanswered(String gateway) {
        return unanswered.getOrDefault(gateway, List.of());
    }

    /** The batches of which nothing is known. */
    synchronized List<List<ReadingRow>> unanswered() {
        return List.copyOf(unanswered.values());
    }

    synchronized boolean knows(Key key) {
        return readings.containsKey(key);
    }

    /** The newest time that the gateway has used. */
    synchronized OptionalLong latest(String gateway) {
        Long known = latest.get(gateway);
        return known == null ? OptionalLong.empty() : OptionalLong.of(known);
    }

    synchronized void latest(String gateway, long atMillis) {
        latest.put(gateway, atMillis);
    }

    synchronized int ask(String subject) {
        TreeSet<Integer> numbers = asked.computeIfAbsent(subject, s -> new TreeSet<>());
        int next = numbers.isEmpty() ? 1 : numbers.last() + 1;
        numbers.add(next);
        return next;
    }

    synchronized void done(String subject, int number) {
        done.computeIfAbsent(subject, s -> new TreeSet<>()).add(number);
    }

    synchronized void surprise(String what) {
        surprises.add(what);
    }

    synchronized Map<Key, Double> readings() {
        return new HashMap<>(readings);
    }

    synchronized Set<Key> ofThisRound() {
        return Set.copyOf(ofThisRound);
    }

    synchronized Map<String, Set<Integer>> asked() {
        return copy(asked);
    }

    synchronized Map<String, Set<Integer>> done() {
        return copy(done);
    }

    private static Map<String, Set<Integer>> copy(Map<String, TreeSet<Integer>> numbers) {
        Map<String, Set<Integer>> copy = new HashMap<>();
        numbers.forEach((subject, all) -> copy.put(subject, new TreeSet<>(all)));
        return copy;
    }

    /** Rows that the service said it refused and kept for review. */
    synchronized long refusedRows() {
        return refusedRows;
    }

    synchronized List<String> surprises() {
        return List.copyOf(surprises);
    }
}
