package org.hingeline.config;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import org.hingeline.hatchery.PointKind;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan;
import org.junit.jupiter.api.Test;

class PlaceFileReaderTest {
    private static final Path EXAMPLE = Path.of("config/place-example.yaml");
    private static final Path DEMO = Path.of("demo-hatchery/hatchery.yaml");

    private static final String SMALL = """
            site: {code: a, name: A, zone: UTC}
            points: [{code: intake, name: Intake, kind: intake}]
            """;

    @Test
    void the_example_is_a_plan_that_shows_every_part() {
        PlacePlan plan = PlaceFileReader.read(EXAMPLE);

        assertThat(plan.site().zone()).isEqualTo(ZoneId.of("America/Vancouver"));
        assertThat(plan.points()).extracting(PlacePlan.PointPlan::code).containsExactly("intake", "larval-1");
        assertThat(plan.sensors()).hasSize(8);
        assertThat(plan.limits()).hasSize(1);
        assertThat(plan.subscribers()).hasSize(1);
        assertThat(plan.batches().get(0).spawnedAt()).isEqualTo(Instant.parse("2026-05-14T03:20:00Z"));
    }

    @Test
    void the_demo_hatchery_has_its_points_a_young_batch_and_three_people_to_tell() {
        PlacePlan plan = PlaceFileReader.read(DEMO);
        Instant now = Instant.parse("2026-05-14T03:20:00Z");

        assertThat(plan.points()).filteredOn(p -> p.kind() == PointKind.LARVAL).hasSize(4);
        assertThat(plan.points()).extracting(PlacePlan.PointPlan::kind).contains(PointKind.INTAKE, PointKind.STORAGE);
        assertThat(plan.batches())
                .filteredOn(b -> b.toBatch(1, now).buildsFirstShell(now))
                .extracting(PlacePlan.BatchPlan::point)
                .containsExactly("larval-3");
        assertThat(plan.subscribers())
                .extracting(PlacePlan.SubscriberPlan::minPriority)
                .doesNotHaveDuplicates()
                .hasSize(3);
        assertThat(plan.subscribers()).allSatisfy(s -> assertThat(s.email()).matches(".*\\.(example\\.org|invalid)"));
        for (PlacePlan.PointPlan point : plan.points()) {
            assertThat(plan.sensors())
                    .filteredOn(s -> s.point().equals(point.code()))
                    .as(point.code())
                    .extracting(PlacePlan.SensorPlan::quantity)
                    .doesNotHaveDuplicates()
                    .contains(Quantity.PH, Quantity.TEMPERATURE, Quantity.SALINITY, Quantity.TOTAL_ALKALINITY);
        }
    }

    @Test
    void what_may_be_left_out_has_a_default() {
        PlacePlan plan = PlaceFileReader.readText("x", SMALL);

        PlacePlan.PointPlan point = plan.points().get(0);
        assertThat(point.position()).isEqualTo(1);
        assertThat(point.maxGap()).isEqualTo(Duration.ofMinutes(15));
        assertThat(point.feedsFrom()).isNull();
        assertThat(point.volumeL()).isNull();
        assertThat(plan.limits()).isEmpty();
    }

    @Test
    void everything_wrong_is_told_at_once_with_where_what_and_what_would_do() {
        assertThat(problems("""
                site: {code: Big, name: A, zone: Mars/Olympus, colour: red}
                points:
                  - {code: intake, name: Intake, kind: pier, maxGapMin: 0}
                  - {code: tank, name: Tank, kind: larval, feedsFrom: inlet, volumeL: .nan}
                  - {code: tank, name: Tank, kind: larval, feedsFrom: tank}
                sensors:
                  - {point: tonk, code: ph-1, quantity: ph, unit: Cel, standardUncertainty: 0}
                  - {point: tank, code: t-1, quantity: temperature, unit: Cel, phScale: total}
                  - {point: tank, code: o-1, quantity: omegaAragonite, unit: "1", standardUncertainty: 1}
                subscribers:
                  - {code: a, name: A, email: nobody, minPriority: urgent}
                """))
                .containsExactly(
                        "site.code: \"Big\" is not accepted; give 1 to 40 small letters, digits and hyphens, starting with"
                                + " a letter or digit",
                        "site.zone: \"Mars/Olympus\" is not accepted; give a zone such as America/Los_Angeles",
                        "site.colour: no such setting; known here: code, name, zone",
                        "points[0].kind: \"pier\" is not accepted; give one of intake, storage, header, larval, discharge",
                        "points[0].maxGapMin: 0 is not accepted; give a number above 0, at most 44640",
                        "points[1].volumeL: \"NaN\" is not accepted; give a number above 0, at most 10000000",
                        "points[2].code: \"tank\" is there twice; give each its own",
                        "points[1].feedsFrom: \"inlet\" is not accepted; give the code of another point of this file",
                        "points[2].feedsFrom: \"tank\" is not accepted; give the code of another point of this file",
                        "sensors[0].point: \"tonk\" is not accepted; give one of intake, tank",
                        "sensors[0].unit: \"Cel\" is not accepted; give one of [pH]",
                        "sensors[0].phScale: is missing; give total, seawater, free or nbs: the scale the pH sensor is"
                                + " calibrated on",
                        "sensors[0].standardUncertainty: 0 is not accepted; give a number above 0, at most 1000000",
                        "sensors[1].phScale: \"total\" makes no sense for temperature; leave it out",
                        "sensors[1].standardUncertainty: is missing; give that of one value, in Cel",
                        "sensors[2].quantity: \"omegaAragonite\" is not accepted; give one of "
                                + Quantity.measuredCodes(),
                        "subscribers[0].email: \"nobody\" is not accepted; give an e-mail address such as ana@example.org",
                        "subscribers[0].minPriority: \"urgent\" is not accepted; give one of low, medium, high");
    }

    @Test
    void a_limit_is_judged_as_if_a_person_had_typed_it() {
        assertThat(problems(SMALL + """
                limits:
                  - {point: intake, name: silence, quantity: omegaAragonite, below: 1.7, action: Close the valve.}
                  - {point: intake, name: low, quantity: joy, below: 1, above: 2, priority: shrill}
                  - {point: intake, name: odd, quantity: ph, above: high, action: Look.}
                """))
                .containsExactly(
                        "limits[0].name: name \"silence\" is taken by the watch over silence; set maxGapMin of the point"
                                + " instead",
                        "limits[1].quantity: quantity \"joy\" cannot have a limit; accepted: " + Quantity.limitCodes(),
                        "limits[1].below: exactly one of below and above is needed, got both",
                        "limits[1].priority: priority \"shrill\" is not one of low, medium, high",
                        "limits[1].action: action must say what to do, in 1 to 300 characters; it has 0",
                        "limits[2].above: \"high\" is not accepted; give a number");
    }

    @Test
    void a_batch_has_one_spawn_and_no_more() {
        assertThat(problems(SMALL + """
                batches:
                  - {point: intake, code: b-1, species: Ostrea lurida}
                  - {point: intake, code: b-2, species: Ostrea lurida, hoursSinceSpawn: 3, spawnedAt: 2026-05-14T03:20:00Z}
                  - {point: intake, code: b-3, species: Ostrea lurida, hoursSinceSpawn: -1}
                  - {point: intake, code: b-4, species: Ostrea lurida, spawnedAt: yesterday}
                """))
                .containsExactly(
                        "batches[0].spawnedAt: exactly one of spawnedAt and hoursSinceSpawn is needed, got neither",
                        "batches[1].spawnedAt: exactly one of spawnedAt and hoursSinceSpawn is needed, got both",
                        "batches[2].hoursSinceSpawn: -1 is not accepted; give a number from 0 to 8784",
                        "batches[3].spawnedAt: \"yesterday\" is not accepted; give a time with offset such as"
                                + " 2026-05-14T03:20:00Z");
    }

    @Test
    void a_file_of_another_shape_is_refused() {
        assertThat(problems("")).contains("site: is missing; give code, name and zone of the site");
        assertThat(problems("site: {code: a, name: A, zone: UTC}"))
                .containsExactly("points: is missing; give at least one");
        assertThat(problems(SMALL + "sensors: {point: intake}"))
                .containsExactly("sensors: {\"point\":\"intake\"} is not accepted; give a list, one \"- \" an entry");
        assertThat(problems(SMALL + "sensors: [ph]"))
                .containsExactly("sensors[0]: \"ph\" is not accepted; give settings, one \"key: value\" a line");
        assertThatThrownBy(() -> PlaceFileReader.read(Path.of("nowhere.yaml")))
                .isInstanceOf(BadSettings.class)
                .hasMessageContaining("nowhere.yaml cannot be used");
    }

    private static List<String> problems(String yaml) {
        return catchThrowableOfType(BadSettings.class, () -> PlaceFileReader.readText("x", yaml))
                .problems();
    }
}
