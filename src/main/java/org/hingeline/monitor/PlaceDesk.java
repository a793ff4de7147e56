package org.hingeline.monitor;

import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Optional;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.PeopleBook.Subscriber;

/** Sets up the place: sites, points, sensors, subscribers; every change is journaled. */
public final class PlaceDesk {
    private final Storage storage;
    private final InstantSource clock;
    private final LimitDesk limits;
    private final Signals signals;

    public PlaceDesk(Storage storage, InstantSource clock, LimitDesk limits, Signals signals) {
        this.storage = storage;
        this.clock = clock;
        this.limits = limits;
        this.signals = signals;
    }

    /**
     * Sets up everything of a plan in one go: what is new is added, what is known is changed, nothing is removed.
     *
     * @return the site
     */
    public Site apply(PlacePlan plan, String who) {
        Instant now = clock.instant();
        Site site = storage.write(books -> apply(books, plan, who, now));
        signals.siteChanged(site.id());
        return site;
    }

    private Site apply(Books books, PlacePlan plan, String who, Instant now) {
        Site site = books.place().saveSite(plan.site().toSite());
        plan.points().forEach(point -> savePoint(books, point.toPoint(site.id()), now));
        plan.sensors().forEach(sensor -> saveSensor(books, site, sensor));
        plan.limits().forEach(wanted -> {
            Point point = books.place().point(site.id(), wanted.point()).orElseThrow();
            limits.save(books, point, wanted.toLimit(point.id()), who, now);
        });
        plan.subscribers().forEach(subscriber -> books.people().saveSubscriber(subscriber.toSubscriber(site.id())));
        plan.batches().forEach(batch -> saveBatch(books, site, batch, now));
        journal(
                books,
                now,
                site,
                who,
                "place-loaded",
                site.code(),
                plan.points().size() + " points, " + plan.sensors().size() + " sensors, "
                        + plan.limits().size() + " limits, "
                        + plan.subscribers().size() + " subscribers, "
                        + plan.batches().size() + " batches");
        return site;
    }

    private static long pointId(Books books, Site site, String code) {
        return books.place().point(site.id(), code).orElseThrow().id();
    }

    /** Adds a point, or changes the known one of that code; its watch over silence follows its longest gap. */
    public void savePoint(Site site, PlacePlan.PointPlan plan, String who) {
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            savePoint(books, plan.toPoint(site.id()), now);
            journal(books, now, site, who, "point-saved", plan.code(), plan.toString());
        });
        signals.siteChanged(site.id());
    }

    private static void savePoint(Books books, Point point, Instant now) {
        Point saved = books.place().savePoint(point);
        Limit silence = LimitDesk.silenceOf(saved);
        books.limits().saveLimit(silence, now);
    }

    /**
     * Adds a sensor, or changes the known one of that code.
     *
     * @throws FieldFaultsException when a known sensor would become one of another quantity or point: its readings would
     *     change their meaning
     */
    public void saveSensor(Site site, PlacePlan.SensorPlan plan, String who) {
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            saveSensor(books, site, plan);
            journal(books, now, site, who, "sensor-saved", plan.code(), plan.toString());
        });
        signals.siteChanged(site.id());
    }

    private static void saveSensor(Books books, Site site, PlacePlan.SensorPlan plan) {
        Point point = books.place()
                .point(site.id(), plan.point())
                .orElseThrow(() ->
                        new FieldFaultsException("point", "point \"" + plan.point() + "\" is not known at this site"));
        Optional<Sensor> known = books.place().sensors(site.id()).stream()
                .filter(sensor -> sensor.code().equals(plan.code()))
                .findFirst();
        if (known.isPresent()
                && (known.get().quantity() != plan.quantity() || known.get().pointId() != point.id())) {
            throw new FieldFaultsException(
                    "code",
                    "sensor \"" + plan.code() + "\" is registered already for "
                            + known.get().quantity().code()
                            + " and keeps its point and quantity, because its readings belong there; take another code");
        }
        books.place().saveSensor(site.id(), plan.toSensor(point.id()));
    }

    /** A spawn given in hours before now is that of a new batch; one that is in the tank already keeps its own. */
    private static void saveBatch(Books books, Site site, PlacePlan.BatchPlan plan, Instant now) {
        Batch wanted = plan.toBatch(pointId(books, site, plan.point()), now);
        Instant spawnedAt = plan.hoursSinceSpawn() == null
                ? wanted.spawnedAt()
                : books.place().batchesNow(site.id(), now).stream()
                        .filter(b -> b.pointId() == wanted.pointId() && b.code().equals(wanted.code()))
                        .findFirst()
                        .map(Batch::spawnedAt)
                        .orElse(wanted.spawnedAt());
        books.place().saveBatch(new Batch(0, wanted.pointId(), wanted.code(), wanted.species(), spawnedAt, null));
    }

    public void saveSubscriber(Site site, PlacePlan.SubscriberPlan plan, boolean active, String who) {
        Instant now = clock.instant();
        storage.writeOnly(books -> {
            Subscriber wanted = plan.toSubscriber(site.id());
            books.people()
                    .saveSubscriber(new Subscriber(
                            0, site.id(), wanted.code(), wanted.name(), wanted.email(), wanted.minPriority(), active));
            journal(
                    books,
                    now,
                    site,
                    who,
                    active ? "subscriber-saved" : "subscriber-stopped",
                    plan.code(),
                    plan.email() + ", from priority " + plan.minPriority().code());
        });
    }

    public Optional<Site> site(String code) {
        return storage.read(books -> books.place().siteByCode(code));
    }

    public List<Site> sites() {
        return storage.read(books -> books.place().sites());
    }

    public List<Point> points(Site site) {
        return storage.read(books -> books.place().points(site.id()));
    }

    public List<Sensor> sensors(Site site) {
        return storage.read(books -> books.place().sensors(site.id()));
    }

    public List<Subscriber> subscribers(Site site) {
        return storage.read(books -> books.people().subscribers(site.id()));
    }

    private static void journal(
            Books books, Instant now, Site site, String who, String what, String subject, String detail) {
        books.journal().add(new JournalBook.Entry(now, site.id(), who, what, subject, detail));
    }
}
