package org.hingeline.demo;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import tools.jackson.core.JacksonException;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/**
 * What the gateway has brought home: the spans of the past it still owes, and up to when the present is stored. Kept in
 * a small file that is replaced whole after every answer, so that a restart sends what is missing and no more.
 */
final class GatewayMemory {
    /** A span of the past that is owed; both ends are not part of it. */
    record Gap(Instant from, Instant to) {}

    private static final Logger LOG = LoggerFactory.getLogger(GatewayMemory.class);
    private static final JsonMapper JSON = JsonMapper.builder().build();

    private final Path file;
    private final Instant origin;
    private final List<Gap> gaps;
    private Instant liveUntil;

    private GatewayMemory(Path file, Instant origin, List<Gap> gaps, Instant liveUntil) {
        this.file = file;
        this.origin = origin;
        this.gaps = gaps;
        this.liveUntil = liveUntil;
    }

    /**
     * What is remembered, with the time since then owed.
     *
     * @param start of this run; everything before it is the past
     * @param span how much of the past is worth sending
     * @param known up to when the service says it knows the water; nothing when it knows of none, and then all is owed
     */
    static GatewayMemory open(Path file, Instant start, Duration span, @Nullable Instant known) {
        Instant earliest = start.minus(span);
        GatewayMemory kept = known == null ? null : read(file);
        if (kept == null || known == null) {
            List<Gap> all = new ArrayList<>(List.of(new Gap(earliest, start)));
            return new GatewayMemory(file, start, all, start);
        }
        List<Gap> gaps = new ArrayList<>(kept.gaps);
        // a service brought back from a backup knows less than it once acknowledged
        Instant stored = known.isBefore(kept.liveUntil) ? known : kept.liveUntil;
        if (stored.isBefore(start)) {
            gaps.add(new Gap(stored, start));
        }
        List<Gap> worth = new ArrayList<>();
        for (Gap gap : gaps) {
            if (gap.to.isAfter(earliest)) {
                worth.add(gap.from.isBefore(earliest) ? new Gap(earliest, gap.to) : gap);
            }
        }
        return new GatewayMemory(file, kept.origin, worth, start);
    }

    /** Whether there is a file to go by at all. */
    static boolean exists(Path file) {
        return Files.exists(file);
    }

    /** When the first run began. */
    Instant origin() {
        return origin;
    }

    synchronized @Nullable Gap oldestGap() {
        return gaps.isEmpty() ? null : gaps.get(0);
    }

    synchronized List<Gap> gaps() {
        return List.copyOf(gaps);
    }

    /** The oldest gap is filled up to and with this moment. */
    synchronized void filledTo(Instant moment) {
        gaps.set(0, new Gap(moment, gaps.get(0).to));
        save();
    }

    synchronized void oldestGapFilled() {
        gaps.remove(0);
        save();
    }

    synchronized void liveUntil(Instant moment) {
        liveUntil = moment;
        save();
    }

    private void save() {
        ObjectNode document = JSON.createObjectNode();
        document.put("origin", origin.toString());
        document.put("liveUntil", liveUntil.toString());
        ArrayNode owed = document.putArray("owed");
        gaps.forEach(gap -> owed.addObject().put("from", gap.from.toString()).put("to", gap.to.toString()));
        Path fresh = file.resolveSibling(file.getFileName() + ".new");
        try {
            Files.writeString(fresh, JSON.writeValueAsString(document));
            Files.move(fresh, file, StandardCopyOption.REPLACE_EXISTING, StandardCopyOption.ATOMIC_MOVE);
        } catch (IOException e) {
            LOG.warn("cannot remember in {} what was sent: {}", file, e.toString());
        }
    }

    private static @Nullable GatewayMemory read(Path file) {
        try {
            JsonNode document = JSON.readTree(Files.readString(file));
            List<Gap> gaps = new ArrayList<>();
            for (JsonNode owed : document.path("owed")) {
                gaps.add(new Gap(time(owed, "from"), time(owed, "to")));
            }
            return new GatewayMemory(file, time(document, "origin"), gaps, time(document, "liveUntil"));
        } catch (IOException | JacksonException | DateTimeException e) {
            LOG.warn("what was sent before cannot be read from {}; it is sent again: {}", file, e.toString());
            return null;
        }
    }

    private static Instant time(JsonNode node, String key) {
        return Instant.parse(node.path(key).asString(""));
    }
}
