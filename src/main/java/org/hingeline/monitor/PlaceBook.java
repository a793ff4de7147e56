package org.hingeline.monitor;

import java.time.Instant;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;

/** Sites, points, sensors and batches. In a record to be saved, an id of 0 stands for a new one. */
public interface PlaceBook {
    List<Site> sites();

    Optional<Site> site(long siteId);

    Optional<Site> siteByCode(String code);

    /** Saves by code; answers the record with its id. */
    Site saveSite(Site site);

    /** In the order of the water's path. */
    List<Point> points(long siteId);

    Optional<Point> point(long siteId, String code);

    Optional<Point> pointById(long pointId);

    /** Saves by code within the site; answers the record with its id. */
    Point savePoint(Point point);

    /** Keeps other nodes from working on these points until the transaction ends. */
    void lockPoints(Collection<Long> pointIds);

    /** Every sensor in use at the site. */
    List<Sensor> sensors(long siteId);

    /** Every sensor in use at the point. */
    List<Sensor> sensorsOf(long pointId);

    /** Saves by code within the site; answers the record with its id. */
    Sensor saveSensor(long siteId, Sensor sensor);

    /** Batches in the tanks of the site now. */
    List<Batch> batchesNow(long siteId, Instant now);

    /** Saves by code within the point; answers the record with its id. */
    Batch saveBatch(Batch batch);
}
