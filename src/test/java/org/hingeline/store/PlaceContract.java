package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hingeline.store.Samples.T0;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Sensor;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.PhScale;
import org.junit.jupiter.api.Test;

interface PlaceContract extends StoreUnderTest {

    @Test
    default void a_site_is_found_by_its_code_and_its_id() {
        Site saved = done().place().saveSite(new Site(0, "north", "North bay", ZoneId.of("Europe/Paris")));

        assertThat(saved.id()).isPositive();
        assertThat(saved).isEqualTo(new Site(saved.id(), "north", "North bay", ZoneId.of("Europe/Paris")));
        assertThat(seen().place().siteByCode("north")).contains(saved);
        assertThat(seen().place().site(saved.id())).contains(saved);
    }

    @Test
    default void no_site_is_found_by_an_unknown_code_or_id() {
        assertThat(seen().place().siteByCode("nowhere")).isEmpty();
        assertThat(seen().place().site(4711)).isEmpty();
        assertThat(seen().place().sites()).isEmpty();
    }

    @Test
    default void a_site_saved_again_changes_and_keeps_its_id() {
        Site first = Samples.site(store(), "north");

        Site again = done().place().saveSite(new Site(0, "north", "New", ZoneId.of("UTC")));

        assertThat(again).isEqualTo(new Site(first.id(), "north", "New", ZoneId.of("UTC")));
        assertThat(seen().place().sites()).containsExactly(again);
    }

    @Test
    default void sites_are_listed_by_name() {
        for (String name : List.of("Mussel", "Abalone", "Oyster")) {
            done().place().saveSite(new Site(0, name.toLowerCase(java.util.Locale.ROOT), name, ZoneId.of("UTC")));
        }

        assertThat(seen().place().sites()).extracting(Site::name).containsExactly("Abalone", "Mussel", "Oyster");
    }

    @Test
    default void a_point_comes_back_as_it_was_saved() {
        Site site = Samples.site(store(), "north");

        Point saved = Samples.tank(store(), site, "larval-3");

        assertThat(saved)
                .isEqualTo(new Point(
                        saved.id(),
                        site.id(),
                        "larval-3",
                        "Tank larval-3",
                        PointKind.LARVAL,
                        3,
                        "header",
                        4000.0,
                        Duration.ofMinutes(45)));
        assertThat(seen().place().point(site.id(), "larval-3")).contains(saved);
        assertThat(seen().place().pointById(saved.id())).contains(saved);
    }

    @Test
    default void a_point_saved_again_without_volume_and_source_loses_them_and_keeps_its_id() {
        Site site = Samples.site(store(), "north");
        Point first = Samples.tank(store(), site, "sea");

        Point again = done().place()
                .savePoint(new Point(0, site.id(), "sea", "Sea", PointKind.INTAKE, 0, null, null, Duration.ofHours(2)));

        assertThat(again)
                .isEqualTo(new Point(
                        first.id(), site.id(), "sea", "Sea", PointKind.INTAKE, 0, null, null, Duration.ofHours(2)));
        assertThat(seen().place().points(site.id())).containsExactly(again);
    }

    @Test
    default void points_are_listed_along_the_path_of_the_water() {
        Site site = Samples.site(store(), "north");
        List<String> codes = List.of("tank-b", "tank-a", "intake", "header");
        List<Integer> positions = List.of(3, 3, 1, 2);
        for (int i = 0; i < codes.size(); i++) {
            int n = i;
            done().place()
                    .savePoint(new Point(
                            0,
                            site.id(),
                            codes.get(n),
                            "x",
                            PointKind.HEADER,
                            positions.get(n),
                            null,
                            null,
                            Duration.ofHours(1)));
        }

        assertThat(seen().place().points(site.id()))
                .extracting(Point::code)
                .containsExactly("intake", "header", "tank-a", "tank-b");
    }

    @Test
    default void two_sites_with_the_same_codes_do_not_see_each_other() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");

        assertThat(north.tank().id()).isNotEqualTo(south.tank().id());
        assertThat(north.ph().id()).isNotEqualTo(south.ph().id());
        assertThat(seen().place().points(north.site().id())).containsExactly(north.tank());
        assertThat(seen().place().point(south.site().id(), "tank")).contains(south.tank());
        assertThat(seen().place().sensors(south.site().id())).containsExactly(south.ph());
    }

    @Test
    default void a_sensor_comes_back_as_it_was_saved() {
        Point tank = Samples.tank(store(), Samples.site(store(), "north"), "tank");

        Sensor ph = Samples.phSensor(store(), tank, "ph-3");
        Sensor oxygen = done().place()
                .saveSensor(
                        tank.siteId(),
                        new Sensor(0, tank.id(), "do-3", Quantity.DISSOLVED_OXYGEN, "mg/L", null, 0.1, null));

        assertThat(ph)
                .isEqualTo(new Sensor(ph.id(), tank.id(), "ph-3", Quantity.PH, "[pH]", PhScale.NBS, 0.02, "SN-1"));
        assertThat(oxygen)
                .isEqualTo(
                        new Sensor(oxygen.id(), tank.id(), "do-3", Quantity.DISSOLVED_OXYGEN, "mg/L", null, 0.1, null));
        assertThat(seen().place().sensorsOf(tank.id())).containsExactly(oxygen, ph);
        assertThat(seen().place().sensors(tank.siteId())).containsExactly(oxygen, ph);
    }

    @Test
    default void every_ph_scale_comes_back() {
        Point tank = Samples.tank(store(), Samples.site(store(), "north"), "tank");
        for (PhScale scale : PhScale.values()) {
            Sensor saved = done().place()
                    .saveSensor(tank.siteId(), new Sensor(0, tank.id(), "ph", Quantity.PH, "[pH]", scale, 0.02, null));

            assertThat(saved.phScale()).isEqualTo(scale);
        }
    }

    @Test
    default void a_sensor_moved_to_another_point_keeps_its_id() {
        Samples.Place north = Samples.place(store(), "north");
        Point header = Samples.tank(store(), north.site(), "header-1");

        Sensor moved = done().place().saveSensor(north.site().id(), Samples.phSensor(header, "ph"));

        assertThat(moved.id()).isEqualTo(north.ph().id());
        assertThat(seen().place().sensorsOf(header.id())).containsExactly(moved);
        assertThat(seen().place().sensorsOf(north.tank().id())).isEmpty();
    }

    @Test
    default void a_batch_is_in_its_tank_from_its_spawning_until_just_before_its_end() {
        Samples.Place north = Samples.place(store(), "north");
        Samples.Place south = Samples.place(store(), "south");
        Instant end = T0.plus(Duration.ofDays(3));
        Batch staying = saveBatch(north, "b-1", T0, null);
        Batch ending = saveBatch(north, "b-2", T0.plusMillis(1), end);
        Batch elsewhere = saveBatch(south, "b-1", T0, null);

        assertThat(batches(north, T0.minusMillis(1))).isEmpty();
        assertThat(batches(north, T0)).containsExactly(staying);
        assertThat(batches(north, end.minusMillis(1))).containsExactly(staying, ending);
        assertThat(batches(north, end)).containsExactly(staying);
        assertThat(batches(south, end)).containsExactly(elsewhere);
    }

    @Test
    default void a_batch_saved_again_gets_its_end_and_keeps_its_id() {
        Samples.Place north = Samples.place(store(), "north");
        Batch first = saveBatch(north, "b-1", T0, null);

        Batch ended = saveBatch(north, "b-1", T0, T0.plusSeconds(60));

        assertThat(ended)
                .isEqualTo(
                        new Batch(first.id(), north.tank().id(), "b-1", "Crassostrea gigas", T0, T0.plusSeconds(60)));
    }

    @Test
    default void locking_no_point_at_all_is_no_mistake() {
        done().place().lockPoints(List.of());

        assertThat(seen().place().sites()).isEmpty();
    }

    private Batch saveBatch(Samples.Place place, String code, Instant spawned, Instant ended) {
        return done().place().saveBatch(new Batch(0, place.tank().id(), code, "Crassostrea gigas", spawned, ended));
    }

    private List<Batch> batches(Samples.Place place, Instant now) {
        return seen().place().batchesNow(place.site().id(), now);
    }
}
