package org.hingeline.monitor;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Function;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.hingeline.alert.Limit;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Codes;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.PhScale;
import org.jspecify.annotations.Nullable;

/**
 * A place to be set up: one site with its points, what measures there, its limits, whom to tell, and what is in the
 * tanks. Things refer to a point by its code; every reference is good once the plan is there.
 */
public record PlacePlan(
        SitePlan site,
        List<PointPlan> points,
        List<SensorPlan> sensors,
        List<LimitPlan> limits,
        List<SubscriberPlan> subscribers,
        List<BatchPlan> batches) {

    /** The site; its code says which one, so that a plan applied again changes what is there. */
    public record SitePlan(String code, String name, ZoneId zone) {
        public SitePlan {
            new Site(0, code, name, zone);
        }

        public Site toSite() {
            return new Site(0, code, name, zone);
        }
    }

    /** A point; the fields are those of {@link Point}. */
    public record PointPlan(
            String code,
            String name,
            PointKind kind,
            int position,
            @Nullable String feedsFrom,
            @Nullable Double volumeL,
            Duration maxGap) {
        public PointPlan {
            new Point(0, 0, code, name, kind, position, feedsFrom, volumeL, maxGap);
        }

        public Point toPoint(long siteId) {
            return new Point(0, siteId, code, name, kind, position, feedsFrom, volumeL, maxGap);
        }
    }

    /** A sensor at the point of that code; the other fields are those of {@link Sensor}. */
    public record SensorPlan(
            String point,
            String code,
            Quantity quantity,
            String unit,
            @Nullable PhScale phScale,
            double standardUncertainty,
            @Nullable String serial) {
        public SensorPlan {
            new Sensor(0, 0, code, quantity, unit, phScale, standardUncertainty, serial);
        }

        public Sensor toSensor(long pointId) {
            return new Sensor(0, pointId, code, quantity, unit, phScale, standardUncertainty, serial);
        }
    }

    /**
     * A limit at the point of that code.
     *
     * @param name of the limit, unique at the point
     */
    public record LimitPlan(String point, String name, LimitDesk.Wish wish) {
        /** @throws FieldFaultsException with everything that keeps the wish from being a limit */
        public LimitPlan {
            LimitDesk.limitOf(0, name, wish);
        }

        public Limit toLimit(long pointId) {
            return LimitDesk.limitOf(pointId, name, wish);
        }
    }

    /**
     * Someone to tell.
     *
     * @param minPriority alerts of a lower one are not sent
     */
    public record SubscriberPlan(String code, String name, String email, Priority minPriority) {
        private static final Pattern ADDRESS = Pattern.compile("[^\\s@<>,;\"()]+@[^\\s@<>,;\"()]+");

        public SubscriberPlan {
            Codes.check("subscriber code", code);
            Codes.checkName("subscriber name", name);
            if (!isAddress(email)) {
                throw new IllegalArgumentException("email \"" + email + "\" is not an address such as ana@example.org");
            }
        }

        /** Whether the text can be an e-mail address, of at most 254 characters. */
        public static boolean isAddress(String text) {
            return text.length() <= 254 && ADDRESS.matcher(text).matches();
        }

        public PeopleBook.Subscriber toSubscriber(long siteId) {
            return new PeopleBook.Subscriber(0, siteId, code, name, email, minPriority, true);
        }
    }

    /**
     * A batch in the tank of that code, its spawn given as a time or as hours before the plan is applied; exactly one of
     * the two.
     *
     * @param hoursSinceSpawn 0 to 8784 (a leap year)
     */
    public record BatchPlan(
            String point,
            String code,
            String species,
            @Nullable Instant spawnedAt,
            @Nullable Double hoursSinceSpawn) {
        public static final double MAX_HOURS = 8784;

        public BatchPlan {
            Codes.check("batch code", code);
            Codes.checkName("species", species);
            if ((spawnedAt == null) == (hoursSinceSpawn == null)) {
                throw new IllegalArgumentException("exactly one of spawnedAt and hoursSinceSpawn is needed, got "
                        + (spawnedAt == null ? "neither" : "both"));
            }
            if (hoursSinceSpawn != null && !(hoursSinceSpawn >= 0 && hoursSinceSpawn <= MAX_HOURS)) {
                throw new IllegalArgumentException(
                        "hoursSinceSpawn " + hoursSinceSpawn + " must be 0 to " + (long) MAX_HOURS);
            }
        }

        public Batch toBatch(long pointId, Instant now) {
            Instant spawned = spawnedAt;
            if (spawned == null) {
                double hours = hoursSinceSpawn == null ? 0 : hoursSinceSpawn;
                spawned = now.minusSeconds(Math.round(hours * 3600));
            }
            return new Batch(0, pointId, code, species, spawned, null);
        }
    }

    /** @throws IllegalArgumentException for a code given twice, or one that names no point of the plan */
    public PlacePlan {
        points = List.copyOf(points);
        sensors = List.copyOf(sensors);
        limits = List.copyOf(limits);
        subscribers = List.copyOf(subscribers);
        batches = List.copyOf(batches);
        Set<String> known = points.stream().map(PointPlan::code).collect(Collectors.toSet());
        distinct("point", points, PointPlan::code);
        distinct("sensor", sensors, SensorPlan::code);
        distinct("limit", limits, limit -> limit.point() + "/" + limit.name());
        distinct("subscriber", subscribers, SubscriberPlan::code);
        distinct("batch", batches, batch -> batch.point() + "/" + batch.code());
        points.forEach(point -> feedsFromAnother(point, known));
        sensors.forEach(sensor -> standsAt("sensor " + sensor.code(), sensor.point(), known));
        limits.forEach(limit -> standsAt("limit " + limit.name(), limit.point(), known));
        batches.forEach(batch -> standsAt("batch " + batch.code(), batch.point(), known));
    }

    private static <T> void distinct(String what, List<T> all, Function<T, String> keyOf) {
        Set<String> seen = new HashSet<>();
        for (T one : all) {
            String key = keyOf.apply(one);
            if (!seen.add(key)) {
                throw new IllegalArgumentException(what + " \"" + key + "\" is there twice");
            }
        }
    }

    private static void feedsFromAnother(PointPlan point, Set<String> known) {
        String from = point.feedsFrom();
        if (from != null && (from.equals(point.code()) || !known.contains(from))) {
            throw new IllegalArgumentException(
                    "feedsFrom \"" + from + "\" of point " + point.code() + " must name another point of the plan");
        }
    }

    private static void standsAt(String what, String point, Set<String> known) {
        if (!known.contains(point)) {
            throw new IllegalArgumentException("point \"" + point + "\" of " + what + " must name a point of the plan");
        }
    }
}
