package org.hingeline.demo;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.function.Predicate;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** Turns moments into posts: what every instrument shows at each of them, as many moments as fit. */
final class Readings {
    /** Rows in one post at most. */
    static final int MOST_ROWS = 1000;

    /** Readings of the past are this far apart. */
    static final Duration HISTORY_STEP = Duration.ofMinutes(5);

    /** Alkalinity is titrated this often. */
    static final Duration TITRATION_STEP = Duration.ofHours(6);

    private static final JsonMapper JSON = JsonMapper.builder().build();

    /** @param moments how many of those given are in it */
    record Post(String body, int rows, int moments) {}

    private final Instruments instruments;
    private final HatcheryWater water;

    Readings(long seed, HatcheryWater water) {
        this.instruments = new Instruments(seed);
        this.water = water;
    }

    /**
     * The first of the moments, as many as fit into one post.
     *
     * @param titrated whether alkalinity is there for a moment
     */
    Post post(Collection<Instant> moments, Predicate<Instant> titrated) {
        ObjectNode body = JSON.createObjectNode();
        ArrayNode rows = body.putArray("readings");
        int taken = 0;
        for (Instant at : moments) {
            List<ObjectNode> more = rows(at, titrated.test(at));
            if (rows.size() + more.size() > MOST_ROWS) {
                break;
            }
            rows.addAll(more);
            taken++;
        }
        return new Post(JSON.writeValueAsString(body), rows.size(), taken);
    }

    private List<ObjectNode> rows(Instant at, boolean titrated) {
        List<ObjectNode> rows = new ArrayList<>();
        for (String point : water.points()) {
            instruments
                    .read(water, point, at, titrated)
                    .forEach((quantity, value) -> rows.add(JSON.createObjectNode()
                            .put("point", point)
                            .put("quantity", quantity.code())
                            .put("value", value)
                            .put("at", at.toString())
                            .put("unit", quantity.unit().ucum())));
        }
        return rows;
    }

    /** The moments of the past that lie inside a gap. */
    static List<Instant> marks(GatewayMemory.Gap gap) {
        long step = HISTORY_STEP.toSeconds();
        List<Instant> marks = new ArrayList<>();
        Instant mark = Instant.ofEpochSecond((Math.floorDiv(gap.from().getEpochSecond(), step) + 1) * step);
        for (; mark.isBefore(gap.to()); mark = mark.plus(HISTORY_STEP)) {
            marks.add(mark);
        }
        return marks;
    }

    /** Whether somebody titrates at this mark of the past. */
    static boolean titrated(Instant mark) {
        return titrated(mark, HISTORY_STEP);
    }

    /** Whether a titration fell due in the step that ends at this moment. */
    static boolean titrated(Instant moment, Duration step) {
        long every = TITRATION_STEP.toMillis();
        return Math.floorDiv(moment.toEpochMilli(), every)
                != Math.floorDiv(moment.minus(step).toEpochMilli(), every);
    }
}
