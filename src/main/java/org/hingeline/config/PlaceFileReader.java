package org.hingeline.config;

import java.nio.file.Path;
import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Codes;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.LimitDesk;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.PlacePlan.BatchPlan;
import org.hingeline.monitor.PlacePlan.LimitPlan;
import org.hingeline.monitor.PlacePlan.PointPlan;
import org.hingeline.monitor.PlacePlan.SensorPlan;
import org.hingeline.monitor.PlacePlan.SitePlan;
import org.hingeline.monitor.PlacePlan.SubscriberPlan;
import org.hingeline.seawater.PhScale;
import org.jspecify.annotations.Nullable;

/**
 * Reads the description of a place as strictly as the settings: an unknown key, a wrong type, a value out of its range
 * or a reference to nothing is an error, and all are told at once. The format is explained in
 * {@code config/place-example.yaml}.
 */
public final class PlaceFileReader {
    private static final double MAX_GAP_MIN = Duration.ofDays(31).toMinutes();
    private static final int DEFAULT_MAX_GAP_MIN = 15;

    private final List<String> problems = new ArrayList<>();
    private final Set<String> points = new LinkedHashSet<>();

    private PlaceFileReader() {}

    /** @throws BadSettings naming every problem, also when there is no such file or it is no YAML */
    public static PlacePlan read(Path file) {
        return readText(file.toString(), YamlFile.text(file));
    }

    /**
     * The place told by a text.
     *
     * @param source what problems call the text
     * @throws BadSettings with every problem
     */
    public static PlacePlan readText(String source, String yaml) {
        return new PlaceFileReader().plan(source, yaml);
    }

    private PlacePlan plan(String source, String yaml) {
        Section root = Section.root(YamlFile.parse(source, yaml), problems);
        SitePlan site = site(root);
        List<PointPlan> pointPlans = points(root.entries("points"));
        List<SensorPlan> sensors = sensors(root.entries("sensors"));
        List<LimitPlan> limits = limits(root.entries("limits"));
        List<SubscriberPlan> subscribers = subscribers(root.entries("subscribers"));
        List<BatchPlan> batches = batches(root.entries("batches"));
        root.refuseOthers();
        if (points.isEmpty() && problems.isEmpty()) {
            root.missing("points", "at least one");
        }
        if (site == null || !problems.isEmpty()) {
            throw new BadSettings(source, problems);
        }
        return new PlacePlan(site, pointPlans, sensors, limits, subscribers, batches);
    }

    private @Nullable SitePlan site(Section root) {
        if (!root.has("site")) {
            root.missing("site", "code, name and zone of the site");
            return null;
        }
        Section in = root.section("site");
        String code = code(in, "code");
        String name = name(in, "name");
        ZoneId zone = in.needed("zone", PlaceFileReader::zone, "a zone such as America/Los_Angeles");
        in.refuseOthers();
        return code == null || name == null || zone == null ? null : new SitePlan(code, name, zone);
    }

    private List<PointPlan> points(List<Section> entries) {
        List<PointPlan> plans = new ArrayList<>();
        Map<Section, String> feeds = new LinkedHashMap<>();
        for (int i = 0; i < entries.size(); i++) {
            Section in = entries.get(i);
            int before = problems.size();
            String code = code(in, "code");
            String name = name(in, "name");
            PointKind kind = in.needed("kind", PointKind::ofCode, "one of " + PointKind.codes());
            // in the order of the file, if the file does not say otherwise
            int position = in.whole("position", i + 1, 0, 10_000);
            String feedsFrom = in.text("feedsFrom");
            Double volumeL = in.numberAbove("volumeL", 0, Point.MAX_VOLUME_L);
            Double maxGapMin = in.numberAbove("maxGapMin", 0, MAX_GAP_MIN);
            in.refuseOthers();
            unique(in, "code", code, points);
            if (feedsFrom != null) {
                feeds.put(in, feedsFrom);
            }
            if (code != null && name != null && kind != null) {
                double gap = maxGapMin == null ? DEFAULT_MAX_GAP_MIN : maxGapMin;
                Duration maxGap = Duration.ofMillis(Math.max(1, Math.round(gap * 60_000)));
                add(plans, before, () -> new PointPlan(code, name, kind, position, feedsFrom, volumeL, maxGap));
            }
        }
        feeds.forEach((in, from) -> {
            if (!points.contains(from) || in.holds("code", from)) {
                in.problem(
                        "feedsFrom", "\"" + from + "\" is not accepted; give the code of another point of this file");
            }
        });
        return plans;
    }

    private List<SensorPlan> sensors(List<Section> entries) {
        List<SensorPlan> plans = new ArrayList<>();
        Set<String> codes = new HashSet<>();
        for (Section in : entries) {
            int before = problems.size();
            String point = point(in);
            String code = code(in, "code");
            Quantity quantity = in.needed(
                    "quantity",
                    text -> Quantity.ofCode(text).filter(Quantity::measured),
                    "one of " + Quantity.measuredCodes());
            String unit = quantity == null
                    ? in.text("unit")
                    : in.needed(
                            "unit",
                            text -> Units.find(quantity, text).map(UnitChoice::ucum),
                            "one of " + Units.codes(quantity));
            PhScale phScale = phScale(in, quantity);
            Double uncertainty = in.numberAbove("standardUncertainty", 0, 1e6);
            if (!in.has("standardUncertainty")) {
                in.missing("standardUncertainty", "that of one value, in " + unitWords(quantity));
            }
            String serial = in.text("serial");
            in.refuseOthers();
            unique(in, "code", code, codes);
            if (point != null && code != null && quantity != null && unit != null && uncertainty != null) {
                add(plans, before, () -> new SensorPlan(point, code, quantity, unit, phScale, uncertainty, serial));
            }
        }
        return plans;
    }

    private List<LimitPlan> limits(List<Section> entries) {
        List<LimitPlan> plans = new ArrayList<>();
        Set<String> names = new HashSet<>();
        for (Section in : entries) {
            int before = problems.size();
            String point = point(in);
            String name = code(in, "name");
            LimitDesk.Wish wish = new LimitDesk.Wish(
                    in.text("quantity"),
                    in.number("below"),
                    in.number("above"),
                    in.number("deadband"),
                    in.number("onDelayMin"),
                    in.number("offDelayMin"),
                    in.text("priority"),
                    in.text("action"));
            in.refuseOthers();
            unique(in, "name", point == null || name == null ? null : point + "/" + name, names);
            try {
                LimitPlan plan = new LimitPlan(point == null ? "" : point, name == null ? "unnamed" : name, wish);
                add(plans, before, () -> plan);
            } catch (FieldFaultsException refused) {
                // what could not be read at all was told already
                refused.faults().stream()
                        .filter(fault -> !in.complainedOf(fault.field())
                                && !(fault.field().equals("below") && in.complainedOf("above")))
                        .forEach(fault -> in.problem(fault.field(), fault.detail()));
            }
        }
        return plans;
    }

    private List<SubscriberPlan> subscribers(List<Section> entries) {
        List<SubscriberPlan> plans = new ArrayList<>();
        Set<String> codes = new HashSet<>();
        for (Section in : entries) {
            int before = problems.size();
            String code = code(in, "code");
            String name = name(in, "name");
            String email = in.needed(
                    "email",
                    text -> Optional.of(text).filter(SubscriberPlan::isAddress),
                    "an e-mail address such as ana@example.org");
            Priority priority = in.needed("minPriority", Priority::ofCode, "one of " + Priority.codes());
            in.refuseOthers();
            unique(in, "code", code, codes);
            if (code != null && name != null && email != null && priority != null) {
                add(plans, before, () -> new SubscriberPlan(code, name, email, priority));
            }
        }
        return plans;
    }

    private List<BatchPlan> batches(List<Section> entries) {
        List<BatchPlan> plans = new ArrayList<>();
        Set<String> codes = new HashSet<>();
        for (Section in : entries) {
            int before = problems.size();
            String point = point(in);
            String code = code(in, "code");
            String species = name(in, "species");
            Instant spawnedAt =
                    in.made("spawnedAt", PlaceFileReader::time, "a time with offset such as 2026-05-14T03:20:00Z");
            Double hours = in.numberWithin("hoursSinceSpawn", 0, BatchPlan.MAX_HOURS);
            in.refuseOthers();
            unique(in, "code", point == null || code == null ? null : point + "/" + code, codes);
            if (in.has("spawnedAt") == in.has("hoursSinceSpawn")) {
                in.problem(
                        "spawnedAt",
                        "exactly one of spawnedAt and hoursSinceSpawn is needed, got "
                                + (in.has("spawnedAt") ? "both" : "neither"));
            }
            if (point != null && code != null && species != null) {
                add(plans, before, () -> new BatchPlan(point, code, species, spawnedAt, hours));
            }
        }
        return plans;
    }

    private static @Nullable PhScale phScale(Section in, @Nullable Quantity quantity) {
        String accepted = "total, seawater, free or nbs: the scale the pH sensor is calibrated on";
        if (quantity == Quantity.PH) {
            return in.needed("phScale", PhScale::fromWireName, accepted);
        }
        PhScale scale = in.made("phScale", PhScale::fromWireName, accepted);
        if (quantity != null && scale != null) {
            in.problem(
                    "phScale", "\"" + scale.wireName() + "\" makes no sense for " + quantity.code() + "; leave it out");
        }
        return scale;
    }

    private static String unitWords(@Nullable Quantity quantity) {
        return quantity == null ? "the quantity's unit" : quantity.unit().ucum();
    }

    /** The code of a point that stands in this file. */
    private @Nullable String point(Section in) {
        return in.needed(
                "point",
                text -> Optional.of(text).filter(points::contains),
                points.isEmpty() ? "the code of a point of this file" : "one of " + String.join(", ", points));
    }

    private static @Nullable String code(Section in, String key) {
        return in.needed(key, text -> Optional.of(text).filter(Codes::isCode), Codes.SHAPE);
    }

    private static @Nullable String name(Section in, String key) {
        return in.needed(key, text -> Optional.of(text).filter(t -> t.length() <= 80), "a text of 1 to 80 characters");
    }

    private static void unique(Section in, String key, @Nullable String code, Set<String> seen) {
        if (code != null && !seen.add(code)) {
            in.problem(key, "\"" + code + "\" is there twice; give each its own");
        }
    }

    /** Makes the record of an entry that nothing was found wrong with. */
    private <T> void add(List<T> plans, int problemsBefore, Supplier<T> make) {
        if (problems.size() == problemsBefore) {
            plans.add(make.get());
        }
    }

    private static Optional<ZoneId> zone(String text) {
        try {
            return Optional.of(ZoneId.of(text));
        } catch (DateTimeException notOne) {
            return Optional.empty();
        }
    }

    private static Optional<Instant> time(String text) {
        try {
            return Optional.of(OffsetDateTime.parse(text).toInstant());
        } catch (DateTimeParseException notOne) {
            return Optional.empty();
        }
    }
}
