package org.hingeline.kill;

import java.io.IOException;
import java.io.InputStream;
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.FileTime;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import java.util.Set;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Consumer;
import java.util.stream.Stream;
import java.util.zip.ZipFile;

/**
 * Loads the real service from every kind of writer at once, kills it at random moments, starts it again on the same
 * data, and holds what is there against what was promised.
 *
 * <p>The seed fixes the moments and what is sent; how far the service got in the meantime no seed can fix.
 */
public final class KillRun {
    /** After so many kills the service is stopped in order, and a backup made due for the next start. */
    private static final int ORDERLY_EVERY = 8;

    /** After so many kills everything is looked at again, also what was found right before. */
    private static final int ALL_EVERY = 10;

    private static final int SHORTEST_MS = 50;
    private static final int SPREAD_MS = 6000;
    private static final int GATEWAYS = 4;

    /** What came of it. */
    public record Figures(
            int kills,
            int orderlyStops,
            int readings,
            int edits,
            int acknowledgements,
            long alerts,
            long messages,
            int backups,
            List<String> lost,
            List<String> doubled,
            List<String> indexFaults,
            List<String> halves,
            List<String> surprises,
            List<Duration> starts) {

        public String words() {
            List<Long> ms = starts.stream().map(Duration::toMillis).sorted().toList();
            return String.format(
                    Locale.ROOT,
                    """
                    kills %d, orderly stops %d
                    acknowledged: %d readings, %d limit edits, %d acknowledgements
                    written beside them: %d alerts, %d messages, %d backups
                    lost %d, doubled %d, index faults %d, half transactions %d, surprises %d
                    starts after a kill: median %d ms, longest %d ms""",
                    kills,
                    orderlyStops,
                    readings,
                    edits,
                    acknowledgements,
                    alerts,
                    messages,
                    backups,
                    lost.size(),
                    doubled.size(),
                    indexFaults.size(),
                    halves.size(),
                    surprises.size(),
                    ms.isEmpty() ? 0 : ms.get(ms.size() / 2),
                    ms.isEmpty() ? 0 : ms.get(ms.size() - 1));
        }

        public List<String> faults() {
            return Stream.of(lost, doubled, indexFaults, halves, surprises)
                    .flatMap(List::stream)
                    .toList();
        }
    }

    private final int kills;
    private final List<String> program;
    private final Path folder;
    private final Random random;
    private final Consumer<String> tell;
    private final Promises promises = new Promises();
    private final Inspection.Findings all =
            new Inspection.Findings(new ArrayList<>(), new ArrayList<>(), new ArrayList<>(), new ArrayList<>());
    private final List<Duration> starts = new ArrayList<>();
    private final Set<Path> backupsSeen = new HashSet<>();
    private long alerts;
    private long messages;
    private int orderlyStops;

    /**
     * @param program the service, as arguments of {@code java}
     * @param folder an empty one; a damaged database is left there as {@code fault-N.mv.db}
     * @param tell is told what happens, a line at a time
     */
    public KillRun(int kills, long seed, List<String> program, Path folder, Consumer<String> tell) {
        this.kills = kills;
        this.program = program;
        this.folder = folder;
        this.random = new Random(seed);
        this.tell = tell;
    }

    /** {@code KILLS SEED PROGRAM…}, the last being arguments of {@code java}. */
    public static void main(String[] args) throws Exception {
        int kills = Integer.parseInt(args[0]);
        long seed = Long.parseLong(args[1]);
        List<String> program = List.of(args).subList(2, args.length);
        Path folder = Files.createTempDirectory("hingeline-kill-");
        System.out.println("kills " + kills + ", seed " + seed + ", data and log in " + folder);
        Figures figures = new KillRun(kills, seed, program, folder, System.out::println).run();
        System.out.println(figures.words());
        figures.faults().stream().limit(50).forEach(System.out::println);
        if (figures.faults().isEmpty()) {
            delete(folder);
        }
        System.exit(figures.faults().isEmpty() ? 0 : 1);
    }

    public Figures run() throws IOException, SQLException, InterruptedException {
        Place place = Place.setUp(folder.resolve("data"), GATEWAYS);
        Path log = folder.resolve("service.log");
        ServiceProcess service = ServiceProcess.start(program, place.settings(), log);
        try {
            for (int kill = 1; kill <= kills; kill++) {
                Instant roundBegan = Instant.now();
                long loadMs = loadUntilKilled(place, service);
                service.troubles().forEach(line -> promises.surprise("log: " + line));
                Path copy = copy(place);
                if (kill % ORDERLY_EVERY == 0) {
                    service = ServiceProcess.start(program, place.settings(), log);
                    stopInOrder(place, service);
                }
                service = ServiceProcess.start(program, place.settings(), log);
                boolean everything = kill % ALL_EVERY == 0 || kill == kills;
                Inspection.Findings found =
                        inspect(copy, place, everything ? Instant.EPOCH : roundBegan.minusSeconds(5), kill);
                inspectNewBackups(place);
                if (kill % ORDERLY_EVERY != 0) {
                    starts.add(service.startTime());
                }
                tell.accept("kill " + kill + " after " + loadMs + " ms of load, "
                        + promises.readings().size()
                        + " readings acknowledged, ready again in "
                        + service.startTime().toMillis() + " ms" + (found.sound() ? "" : found.words()));
            }
        } finally {
            service.kill();
        }
        return figures();
    }

    private long loadUntilKilled(Place place, ServiceProcess service) throws InterruptedException {
        promises.newRound();
        AtomicBoolean stop = new AtomicBoolean();
        List<Thread> writers = writers(place, service.address(), stop).stream()
                .map(writer -> new Thread(writer, writer.getClass().getSimpleName()))
                .toList();
        long began = System.nanoTime();
        writers.forEach(Thread::start);
        double share = random.nextDouble();
        Thread.sleep(SHORTEST_MS + (long) (share * share * SPREAD_MS));
        service.kill();
        stop.set(true);
        for (Thread writer : writers) {
            writer.join();
        }
        return Duration.ofNanos(System.nanoTime() - began).toMillis();
    }

    private List<Writer> writers(Place place, URI address, AtomicBoolean stop) {
        String omega = "\"quantity\":\"omegaAragonite\",\"below\":%s";
        return List.of(
                new Gateway(0, Gateway.Manner.BULK, place, address, promises, fresh(), stop),
                new Gateway(1, Gateway.Manner.BULK, place, address, promises, fresh(), stop),
                new Gateway(2, Gateway.Manner.SINGLE, place, address, promises, fresh(), stop),
                new Gateway(3, Gateway.Manner.LATE, place, address, promises, fresh(), stop),
                new People.Editor("larval-3", "omega-low", omega, place, address, promises, fresh(), stop),
                new People.Editor("intake", "edited", omega, place, address, promises, fresh(), stop),
                new People.Acknowledger(place, address, promises, fresh(), stop));
    }

    private Random fresh() {
        return new Random(random.nextLong());
    }

    private Path copy(Place place) throws IOException {
        Path copy = folder.resolve("copy.mv.db");
        return Files.copy(place.database(), copy, StandardCopyOption.REPLACE_EXISTING);
    }

    private Inspection.Findings inspect(Path copy, Place place, Instant since, int kill)
            throws SQLException, IOException {
        Path kept = folder.resolve("fault-" + kill + ".mv.db");
        Files.copy(copy, kept, StandardCopyOption.REPLACE_EXISTING);
        Inspection.Findings found;
        try (Inspection inspection = new Inspection(copy, place.mail())) {
            found = inspection.compare(promises, since);
            alerts = inspection.count("SELECT count(*) FROM alert");
            messages = inspection.count("SELECT count(*) FROM outbox");
        }
        add(found);
        if (found.sound()) {
            Files.delete(kept);
        }
        return found;
    }

    private void add(Inspection.Findings found) {
        all.lost().addAll(found.lost());
        all.doubled().addAll(found.doubled());
        all.indexes().addAll(found.indexes());
        all.halves().addAll(found.halves());
    }

    private void stopInOrder(Place place, ServiceProcess service) throws SQLException, IOException {
        service.address();
        service.stop();
        service.troubles().forEach(line -> promises.surprise("log: " + line));
        orderlyStops++;
        if (!Files.exists(place.database().resolveSibling("clean-stop"))) {
            promises.surprise("no mark of an orderly end after a stop");
        }
        String url = "jdbc:h2:file:" + place.database().toString().replace(".mv.db", "")
                + ";IFEXISTS=TRUE;MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE";
        try (Connection connection = DriverManager.getConnection(url, "sa", "");
                Statement statement = connection.createStatement()) {
            statement.execute(
                    "UPDATE scheduled_tasks SET execution_time = TIMESTAMP WITH TIME ZONE '2000-01-01 00:00:00Z',"
                            + " picked = FALSE, picked_by = NULL WHERE task_name = 'back-up'");
            statement.execute("SHUTDOWN");
        }
        for (Path zip : backups(place)) {
            Files.setLastModifiedTime(zip, FileTime.from(Instant.now().minus(Duration.ofDays(1))));
        }
    }

    private static List<Path> backups(Place place) throws IOException {
        if (!Files.isDirectory(place.backups())) {
            return List.of();
        }
        try (Stream<Path> files = Files.list(place.backups())) {
            return files.filter(file -> file.toString().endsWith(".zip")).toList();
        }
    }

    private void inspectNewBackups(Place place) throws IOException, SQLException {
        for (Path zip : backups(place)) {
            if (backupsSeen.add(zip)) {
                Path file = folder.resolve("backup.mv.db");
                try (ZipFile content = new ZipFile(zip.toFile());
                        InputStream in = content.getInputStream(content.getEntry("hingeline.mv.db"))) {
                    Files.copy(in, file, StandardCopyOption.REPLACE_EXISTING);
                }
                try (Inspection inspection = new Inspection(file, place.mail())) {
                    Inspection.Findings found = inspection.tables();
                    add(found);
                }
            }
        }
    }

    private Figures figures() {
        int acknowledgements = promises.done()
                .getOrDefault(People.Acknowledger.SUBJECT, Set.of())
                .size();
        int changes = promises.done().values().stream().mapToInt(Set::size).sum();
        return new Figures(
                kills,
                orderlyStops,
                promises.readings().size(),
                changes - acknowledgements,
                acknowledgements,
                alerts,
                messages,
                backupsSeen.size(),
                all.lost(),
                all.doubled(),
                all.indexes(),
                all.halves(),
                promises.surprises(),
                List.copyOf(starts));
    }

    private static void delete(Path folder) throws IOException {
        try (Stream<Path> content = Files.walk(folder)) {
            for (Path path : content.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(path);
            }
        }
    }
}
