package org.hingeline.demo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.awaitility.Awaitility.await;

import java.io.IOException;
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DemoGatewayTest {
    private static final DemoGateway.Pace QUICK =
            new DemoGateway.Pace(Duration.ofMillis(100), Duration.ofHours(30), Duration.ofMillis(20));

    /** Marks every five minutes, both ends not counted. */
    private static final int MARKS = 30 * 12;

    @TempDir
    Path folder;

    private FakeService service;

    @BeforeEach
    void open() throws Exception {
        service = new FakeService(0);
    }

    @AfterEach
    void close() {
        service.close();
    }

    @Test
    void the_present_comes_first_and_the_past_after_it_in_posts_of_a_thousand_rows_at_most() {
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
            await().until(() -> service.rowsOf("intake", "ph") > MARKS + 5);
        }
        FakeService.Taken first = service.posts.get(0);
        assertThat(service.posts).allSatisfy(post -> assertThat(post.rows()).isBetween(1, 1000));
        assertThat((first.rows() - 6) % 19)
                .as("19 rows a moment and 6 titrations, of " + first.rows())
                .isZero();
        assertThat(service.posts)
                .filteredOn(post -> post.last().isBefore(first.first()))
                .as("posts of the past, all after the first of the present")
                .hasSizeBetween(7, 9)
                .isSortedAccordingTo((a, b) -> a.first().compareTo(b.first()));
        assertThat(service.rowsOf("larval-3", "totalAlkalinity"))
                .as("at the start, where history begins, and every six hours")
                .isBetween(6, 8);
        assertThat(service.contradictions).hasValue(0);
    }

    @Test
    void what_was_not_taken_is_sent_again_and_arrives_once() {
        service.unwell.set(6);
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
            service.unwell.set(3);
            int before = service.rowsOf("intake", "ph");
            await().until(() -> service.unwell.get() == 0 && service.rowsOf("intake", "ph") > before + 5);
        }
        List<Instant> moments = liveMoments();
        for (int i = 1; i < moments.size(); i++) {
            assertThat(Duration.between(moments.get(i - 1), moments.get(i)))
                    .as("no moment of the outage is missing")
                    .isEqualTo(QUICK.live());
        }
        assertThat(service.duplicates).hasValue(0);
    }

    @Test
    void a_service_that_is_not_there_yet_is_waited_for() throws Exception {
        URI base = service.base();
        service.close();
        try (DemoGateway gateway =
                new DemoGateway(base, FakeService.KEY, FakeService.TOKEN, 7, InstantSource.system(), memory(), QUICK)) {
            gateway.start();
            Thread.sleep(150);
            service = new FakeService(base.getPort());
            await().until(() -> service.rowsOf("intake", "ph") > 3);
        }
        assertThat(service.posts.get(0).rows())
                .as("what had waited goes together")
                .isGreaterThan(25);
    }

    @Test
    void a_wrong_key_is_never_taken_for_success() {
        try (DemoGateway gateway = new DemoGateway(
                service.base(), "wrong", FakeService.TOKEN, 7, InstantSource.system(), memory(), QUICK)) {
            gateway.start();
            await().until(() -> service.badKeys.get() >= 3);
        }
        assertThat(service.posts).isEmpty();
        assertThat(memory()).doesNotExist();
    }

    @Test
    void after_a_restart_only_what_is_missing_is_sent() {
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
        }
        int before = service.posts.size();
        Duration away = Duration.ofMinutes(62);
        try (DemoGateway gateway = gateway(InstantSource.offset(InstantSource.system(), away))) {
            gateway.start();
            await().until(() -> marks() >= MARKS - 1 + 12 && complete());
        }
        int rows = service.posts.subList(before, service.posts.size()).stream()
                .filter(post -> post.last().isBefore(service.posts.get(before).first()))
                .mapToInt(FakeService.Taken::rows)
                .sum();
        assertThat(rows)
                .as("twelve or thirteen marks, nineteen rows each, one titration")
                .isBetween(12 * 19, 13 * 19 + 12);
        assertThat(service.duplicates).hasValue(0);
        assertThat(service.contradictions).hasValue(0);
    }

    @Test
    void without_a_good_token_it_goes_by_its_own_note() {
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
        }
        int before = service.rowsOf("intake", "ph");
        try (DemoGateway gateway =
                new DemoGateway(service.base(), FakeService.KEY, "wrong", 7, InstantSource.system(), memory(), QUICK)) {
            gateway.start();
            await().until(() -> service.rowsOf("intake", "ph") > before + 5);
        }
        // the moment it was stopped in may come twice
        assertThat(service.duplicates.get()).isLessThanOrEqualTo(25);
    }

    @Test
    void a_service_that_has_forgotten_everything_is_told_everything() throws Exception {
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
        }
        service.close();
        service = new FakeService(0);
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
        }
        assertThat(service.rowsOf("storage", "salinity")).isGreaterThanOrEqualTo(MARKS - 1);
    }

    @Test
    void a_memory_that_cannot_be_read_costs_a_second_sending_and_no_more() throws Exception {
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            awaitHistory();
        }
        Files.writeString(memory(), "{\"origin\":\"nev");
        try (DemoGateway gateway = gateway(InstantSource.system())) {
            gateway.start();
            await().until(this::complete);
        }
        assertThat(service.rowsOf("storage", "salinity")).isGreaterThanOrEqualTo(MARKS - 1);
    }

    @Test
    void it_stops_promptly_also_while_nobody_answers() {
        service.unwell.set(1_000_000);
        DemoGateway gateway = gateway(InstantSource.system());
        gateway.start();
        await().until(() -> service.unwell.get() < 999_995);
        long before = System.nanoTime();
        gateway.close();
        assertThat(Duration.ofNanos(System.nanoTime() - before)).isLessThan(Duration.ofSeconds(2));
        int left = service.unwell.get();
        assertThat(Thread.getAllStackTraces().keySet())
                .extracting(Thread::getName)
                .noneMatch(name -> name.startsWith("demo-gateway"));
        assertThat(service.unwell).hasValue(left);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "http://192.0.2.1:8080",
                "http://water.example.org",
                "https://127.0.0.1:8080",
                "http://127.0.0.1.example.org",
                "file:///tmp"
            })
    void another_machine_is_refused(String base) {
        assertThatIllegalArgumentException()
                .isThrownBy(
                        () -> new DemoGateway(URI.create(base), "k", "t", 7, InstantSource.system(), memory(), QUICK))
                .withMessageContaining(base);
    }

    @Test
    void it_measures_what_is_registered_at_the_demo_hatchery_and_no_more_noisily() {
        PlacePlan plan = PlaceFileReader.read(Path.of("demo-hatchery/hatchery.yaml"));
        Instant at = Instant.parse("2026-05-14T00:00:00Z");
        HatcheryWater water = new HatcheryWater(7, at, at);

        assertThat(water.points())
                .containsExactlyInAnyOrderElementsOf(
                        plan.points().stream().map(PlacePlan.PointPlan::code).toList());
        for (String point : water.points()) {
            Set<Quantity> registered = plan.sensors().stream()
                    .filter(sensor -> sensor.point().equals(point))
                    .map(PlacePlan.SensorPlan::quantity)
                    .collect(Collectors.toSet());
            assertThat(new Instruments(7).read(water, point, at, true).keySet())
                    .as(point)
                    .isEqualTo(registered);
        }
        assertThat(plan.sensors())
                .allSatisfy(sensor -> assertThat(
                                Instruments.DISPLAYS.get(sensor.quantity()).noise())
                        .isLessThan(sensor.standardUncertainty()));
    }

    private DemoGateway gateway(InstantSource clock) {
        return new DemoGateway(service.base(), FakeService.KEY, FakeService.TOKEN, 7, clock, memory(), QUICK);
    }

    private Path memory() {
        return folder.resolve("gateway.json");
    }

    private void awaitHistory() {
        await().until(() -> marks() >= MARKS - 1 && complete());
    }

    /** Five-minute marks the service has. */
    private long marks() {
        synchronized (service.rows) {
            return service.rows.keySet().stream()
                    .filter(key -> key.startsWith("intake ph "))
                    .map(key -> Instant.parse(key.substring("intake ph ".length())))
                    .filter(at -> at.toEpochMilli() % 300_000 == 0)
                    .count();
        }
    }

    private boolean complete() throws IOException {
        return Files.exists(memory()) && Files.readString(memory()).contains("\"owed\":[]");
    }

    private List<Instant> liveMoments() {
        synchronized (service.rows) {
            Instant first = service.posts.get(0).first();
            return service.rows.keySet().stream()
                    .filter(key -> key.startsWith("larval-2 ph "))
                    .map(key -> Instant.parse(key.substring("larval-2 ph ".length())))
                    .filter(at -> !at.isBefore(first))
                    .sorted()
                    .toList();
        }
    }
}
