package org.hingeline.store;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.ReadingBook.StoredReading;
import org.hingeline.monitor.Storage;
import org.hingeline.quality.Flag;
import org.hingeline.seawater.PhScale;

/** An invented place to keep records of. */
final class Samples {
    static final Instant T0 = Instant.parse("2026-05-14T03:20:00.123Z");

    /** A site with one tank and one pH sensor in it. */
    record Place(Site site, Point tank, Sensor ph) {}

    private Samples() {}

    static Site site(Storage store, String code) {
        return store.write(
                books -> books.place().saveSite(new Site(0, code, "Site " + code, ZoneId.of("Pacific/Auckland"))));
    }

    static Point tank(Storage store, Site site, String code) {
        return store.write(books -> books.place().savePoint(tank(site, code)));
    }

    static Point tank(Site site, String code) {
        return new Point(
                0, site.id(), code, "Tank " + code, PointKind.LARVAL, 3, "header", 4000.0, Duration.ofMinutes(45));
    }

    static Sensor phSensor(Storage store, Point point, String code) {
        return store.write(books -> books.place().saveSensor(point.siteId(), phSensor(point, code)));
    }

    static Sensor phSensor(Point point, String code) {
        return new Sensor(0, point.id(), code, Quantity.PH, "[pH]", PhScale.NBS, 0.02, "SN-1");
    }

    static Place place(Storage store, String siteCode) {
        Site site = site(store, siteCode);
        Point tank = tank(store, site, "tank");
        return new Place(site, tank, phSensor(store, tank, "ph"));
    }

    static StoredReading reading(Sensor sensor, Instant at, double value) {
        return new StoredReading(sensor.id(), at, value, Flag.PASS);
    }
}
