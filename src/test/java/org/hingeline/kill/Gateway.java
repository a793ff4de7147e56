package org.hingeline.kill;

import java.net.URI;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.concurrent.atomic.AtomicBoolean;
import tools.jackson.databind.JsonNode;

/**
 * Posts readings; what it was left in doubt about it sends again. Each has times of its own, so that a row has one owner.
 */
final class Gateway extends Writer {
    private static final int CLASSES = 4;
    private static final long HOUR_MS = 3_600_000;

    /** How one sends. */
    enum Manner {
        /** All sensors, up to 500 rows. */
        BULK,
        /** One row at a time. */
        SINGLE,
        /** Some hours late and out of order, with repeats and contradictions. */
        LATE
    }

    private final String name;
    private final Manner manner;
    private final int timeClass;
    private final List<Place.Sensor> sensors;
    private final List<ReadingRow> stored = new ArrayList<>();
    private long latest;

    Gateway(int number, Manner manner, Place place, URI address, Promises promises, Random random, AtomicBoolean stop) {
        super(address, place.gatewayKeys().get(number), promises, random, stop);
        this.name = "gateway " + number;
        this.manner = manner;
        this.timeClass = number;
        this.sensors = place.sensors();
        this.latest = promises.latest(name).orElse(System.currentTimeMillis() - 2000);
    }

    @Override
    int restMillis() {
        return manner == Manner.BULK ? 150 : manner == Manner.SINGLE ? 20 : 250;
    }

    @Override
    void write() throws Gone, InterruptedException {
        List<ReadingRow> doubtful = promises.unanswered(name);
        if (!doubtful.isEmpty()) {
            post(doubtful, true);
            return;
        }
        List<ReadingRow> rows = switch (manner) {
            case BULK -> bulk();
            case SINGLE -> single();
            case LATE -> late();
        };
        if (!rows.isEmpty()) {
            promises.sending(name, rows);
            post(rows, false);
        }
    }

    private List<ReadingRow> bulk() {
        long now = System.currentTimeMillis();
        int times = Math.max(1, (50 + random.nextInt(451)) / sensors.size());
        List<ReadingRow> rows = new ArrayList<>();
        for (long at : timesUpTo(now, times)) {
            sensors.forEach(sensor -> rows.add(ReadingRow.of(sensor, at)));
        }
        return rows;
    }

    private List<ReadingRow> single() {
        Place.Sensor sensor = sensors.get(random.nextInt(sensors.size()));
        return timesUpTo(System.currentTimeMillis(), 1).stream()
                .map(at -> ReadingRow.of(sensor, at))
                .toList();
    }

    /** Times of this gateway's class, spread from the last one to now. */
    private List<Long> timesUpTo(long now, int most) {
        List<Long> times = new ArrayList<>();
        long step = Math.max(CLASSES, (now - latest) / most);
        for (long at = latest + step; at <= now; at += step) {
            long mine = at - at % CLASSES + timeClass;
            if (mine > latest && mine <= now) {
                times.add(mine);
                latest = mine;
                promises.latest(name, mine);
            }
        }
        return times;
    }

    private List<ReadingRow> late() {
        List<ReadingRow> rows = new ArrayList<>();
        long around = System.currentTimeMillis() - (long) (random.nextDouble() * 20 * HOUR_MS);
        int most = 1 + random.nextInt(40);
        for (int i = 0; i < most; i++) {
            long at = around + random.nextInt(60_000);
            ReadingRow row = ReadingRow.of(
                    sensors.get(random.nextInt(sensors.size())),
                    Math.min(at, System.currentTimeMillis()) / CLASSES * CLASSES + timeClass - CLASSES);
            if (!promises.knows(row.key())
                    && rows.stream().noneMatch(other -> other.key().equals(row.key()))) {
                rows.add(row);
            }
        }
        if (!stored.isEmpty() && random.nextInt(3) == 0) {
            rows.add(stored.get(random.nextInt(stored.size())).again());
        }
        if (!stored.isEmpty() && random.nextInt(5) == 0) {
            rows.add(stored.get(random.nextInt(stored.size())).contradicted());
        }
        return rows;
    }

    private void post(List<ReadingRow> rows, boolean again) throws Gone, InterruptedException {
        Answer answer = send("POST", "/api/v1/readings", ReadingRow.json(rows));
        if (answer.status() >= 500) {
            return;
        }
        int refusals = (int) rows.stream().filter(row -> row.refusal() != null).count();
        int repeats = (int) rows.stream()
                .filter(row -> row.repeat() && row.refusal() == null)
                .count();
        int stored = answer.body().path("stored").asInt(-1);
        int duplicates = answer.body().path("duplicates").asInt(-1);
        JsonNode refused = answer.body().path("refused");
        boolean asExpected = stored + duplicates == rows.size() - refusals
                && refused.size() == refusals
                && (again || duplicates == repeats);
        for (JsonNode refusal : refused) {
            asExpected &= rows.get(refusal.path("index").asInt()).refusal() != null;
        }
        if (!asExpected) {
            promises.surprise(name + " sent " + rows.size() + " rows (" + repeats + " repeats, " + refusals
                    + " to be refused" + (again ? ", again" : "") + "), was answered " + answer.status() + " "
                    + cut(answer.body().toString()));
            return;
        }
        promises.stored(name, rows, refusals);
        if (manner == Manner.LATE) {
            rows.stream().filter(row -> !row.repeat()).forEach(this.stored::add);
        }
    }

    private static String cut(String text) {
        return text.length() > 400 ? text.substring(0, 400) + "…" : text;
    }
}
