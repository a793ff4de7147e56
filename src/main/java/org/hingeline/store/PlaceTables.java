package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlaceBook;
import org.hingeline.seawater.PhScale;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.statement.Update;

final class PlaceTables implements PlaceBook {
    private final Handle handle;

    PlaceTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public List<Site> sites() {
        return handle.createQuery("SELECT * FROM site ORDER BY name")
                .map((row, context) -> site(row))
                .list();
    }

    @Override
    public Optional<Site> site(long siteId) {
        return handle.createQuery("SELECT * FROM site WHERE id = :id")
                .bind("id", siteId)
                .map((row, context) -> site(row))
                .findOne();
    }

    @Override
    public Optional<Site> siteByCode(String code) {
        return handle.createQuery("SELECT * FROM site WHERE code = :code")
                .bind("code", code)
                .map((row, context) -> site(row))
                .findOne();
    }

    @Override
    public Site saveSite(Site site) {
        int updated = handle.createUpdate("UPDATE site SET name = :name, zone = :zone WHERE code = :code")
                .bind("name", site.name())
                .bind("zone", site.zone().getId())
                .bind("code", site.code())
                .execute();
        if (updated == 0) {
            handle.createUpdate("INSERT INTO site (code, name, zone) VALUES (:code, :name, :zone)")
                    .bind("code", site.code())
                    .bind("name", site.name())
                    .bind("zone", site.zone().getId())
                    .execute();
        }
        return siteByCode(site.code()).orElseThrow();
    }

    @Override
    public List<Point> points(long siteId) {
        return handle.createQuery("SELECT * FROM point WHERE site_id = :site ORDER BY position, code")
                .bind("site", siteId)
                .map((row, context) -> point(row))
                .list();
    }

    @Override
    public Optional<Point> point(long siteId, String code) {
        return handle.createQuery("SELECT * FROM point WHERE site_id = :site AND code = :code")
                .bind("site", siteId)
                .bind("code", code)
                .map((row, context) -> point(row))
                .findOne();
    }

    @Override
    public Optional<Point> pointById(long pointId) {
        return handle.createQuery("SELECT * FROM point WHERE id = :id")
                .bind("id", pointId)
                .map((row, context) -> point(row))
                .findOne();
    }

    @Override
    public Point savePoint(Point point) {
        int updated = bound(point, """
                        UPDATE point
                        SET name = :name, kind = :kind, position = :position, feeds_from = :feedsFrom,
                            volume_l = :volumeL, max_gap_s = :maxGapS
                        WHERE site_id = :site AND code = :code
                        """).execute();
        if (updated == 0) {
            bound(point, """
                            INSERT INTO point (site_id, code, name, kind, position, feeds_from, volume_l, max_gap_s)
                            VALUES (:site, :code, :name, :kind, :position, :feedsFrom, :volumeL, :maxGapS)
                            """).execute();
        }
        return point(point.siteId(), point.code()).orElseThrow();
    }

    private Update bound(Point point, String sql) {
        return handle.createUpdate(sql)
                .bind("site", point.siteId())
                .bind("code", point.code())
                .bind("name", point.name())
                .bind("kind", point.kind().code())
                .bind("position", point.position())
                .bind("feedsFrom", point.feedsFrom())
                .bind("volumeL", point.volumeL())
                .bind("maxGapS", point.maxGap().toSeconds());
    }

    @Override
    public void lockPoints(Collection<Long> pointIds) {
        if (pointIds.isEmpty()) {
            return;
        }
        handle.createQuery("SELECT id FROM point WHERE id IN (<ids>) ORDER BY id FOR UPDATE")
                .define("ids", Sql.ids(pointIds))
                .mapTo(Long.class)
                .list();
    }

    @Override
    public List<Sensor> sensors(long siteId) {
        return handle.createQuery("SELECT * FROM sensor WHERE site_id = :site ORDER BY code")
                .bind("site", siteId)
                .map((row, context) -> sensor(row))
                .list();
    }

    @Override
    public List<Sensor> sensorsOf(long pointId) {
        return handle.createQuery("SELECT * FROM sensor WHERE point_id = :point ORDER BY code")
                .bind("point", pointId)
                .map((row, context) -> sensor(row))
                .list();
    }

    @Override
    public Sensor saveSensor(long siteId, Sensor sensor) {
        int updated = bound(siteId, sensor, """
                        UPDATE sensor
                        SET point_id = :point, quantity = :quantity, unit = :unit, ph_scale = :phScale,
                            standard_uncertainty = :uncertainty, serial = :serial
                        WHERE site_id = :site AND code = :code
                        """).execute();
        if (updated == 0) {
            bound(siteId, sensor, """
                            INSERT INTO sensor
                                (site_id, point_id, code, quantity, unit, ph_scale, standard_uncertainty, serial)
                            VALUES (:site, :point, :code, :quantity, :unit, :phScale, :uncertainty, :serial)
                            """).execute();
        }
        return handle.createQuery("SELECT * FROM sensor WHERE site_id = :site AND code = :code")
                .bind("site", siteId)
                .bind("code", sensor.code())
                .map((row, context) -> sensor(row))
                .one();
    }

    private Update bound(long siteId, Sensor sensor, String sql) {
        PhScale scale = sensor.phScale();
        return handle.createUpdate(sql)
                .bind("site", siteId)
                .bind("point", sensor.pointId())
                .bind("code", sensor.code())
                .bind("quantity", sensor.quantity().code())
                .bind("unit", sensor.unit())
                .bind("phScale", scale == null ? null : scale.wireName())
                .bind("uncertainty", sensor.standardUncertainty())
                .bind("serial", sensor.serial());
    }

    @Override
    public List<Batch> batchesNow(long siteId, Instant now) {
        return handle.createQuery("""
                        SELECT b.* FROM batch b JOIN point p ON p.id = b.point_id
                        WHERE p.site_id = :site AND b.spawned_at <= :now AND (b.ended_at IS NULL OR b.ended_at > :now)
                        ORDER BY b.spawned_at
                        """)
                .bind("site", siteId)
                .bind("now", now)
                .map((row, context) -> batch(row))
                .list();
    }

    @Override
    public Batch saveBatch(Batch batch) {
        int updated = bound(batch, """
                        UPDATE batch SET species = :species, spawned_at = :spawnedAt, ended_at = :endedAt
                        WHERE point_id = :point AND code = :code
                        """).execute();
        if (updated == 0) {
            bound(batch, """
                            INSERT INTO batch (point_id, code, species, spawned_at, ended_at)
                            VALUES (:point, :code, :species, :spawnedAt, :endedAt)
                            """).execute();
        }
        return handle.createQuery("SELECT * FROM batch WHERE point_id = :point AND code = :code")
                .bind("point", batch.pointId())
                .bind("code", batch.code())
                .map((row, context) -> batch(row))
                .one();
    }

    private Update bound(Batch batch, String sql) {
        return handle.createUpdate(sql)
                .bind("point", batch.pointId())
                .bind("code", batch.code())
                .bind("species", batch.species())
                .bind("spawnedAt", batch.spawnedAt())
                .bindByType("endedAt", batch.endedAt(), Instant.class);
    }

    private static Site site(ResultSet row) throws SQLException {
        return new Site(
                row.getLong("id"), row.getString("code"), row.getString("name"), ZoneId.of(row.getString("zone")));
    }

    private static Point point(ResultSet row) throws SQLException {
        return new Point(
                row.getLong("id"),
                row.getLong("site_id"),
                row.getString("code"),
                row.getString("name"),
                PointKind.ofCode(row.getString("kind")).orElseThrow(),
                row.getInt("position"),
                row.getString("feeds_from"),
                Sql.doubleOrNull(row, "volume_l"),
                Duration.ofSeconds(row.getLong("max_gap_s")));
    }

    private static Sensor sensor(ResultSet row) throws SQLException {
        String scale = row.getString("ph_scale");
        return new Sensor(
                row.getLong("id"),
                row.getLong("point_id"),
                row.getString("code"),
                Quantity.ofCode(row.getString("quantity")).orElseThrow(),
                row.getString("unit"),
                scale == null ? null : PhScale.fromWireName(scale).orElseThrow(),
                row.getDouble("standard_uncertainty"),
                row.getString("serial"));
    }

    private static Batch batch(ResultSet row) throws SQLException {
        return new Batch(
                row.getLong("id"),
                row.getLong("point_id"),
                row.getString("code"),
                row.getString("species"),
                Sql.instant(row, "spawned_at"),
                Sql.instantOrNull(row, "ended_at"));
    }
}
