package org.hingeline.bench;

import java.io.IOException;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.hingeline.kill.ServiceProcess;

/**
 * Readings stored per second through HTTP with full assessment, against plain inserts of the same rows, round by round
 * in turn; and how fast the service starts and how much memory it holds when idle.
 */
public final class IntakeBench {
    private static final int ROWS_PER_POST = 500;
    private static final int STARTS = 5;
    private static final long IDLE_MS = 5000;

    private final BenchPlace place;
    private final Path folder;
    private final int clients;
    private final int posts;

    private IntakeBench(BenchPlace place, Path folder, int clients, int posts) {
        this.place = place;
        this.folder = folder;
        this.clients = clients;
        this.posts = posts;
    }

    /** {@code ROUNDS CLIENTS POSTS PROGRAM…}: rounds after the warm-up, posting clients, posts of each in a round. */
    public static void main(String[] args) throws Exception {
        Path folder = Files.createTempDirectory("hingeline-bench-");
        List<String> program = List.of(args).subList(3, args.length);
        try {
            BenchPlace place = BenchPlace.setUp(program, folder.resolve("data"));
            new IntakeBench(place, folder, Integer.parseInt(args[1]), Integer.parseInt(args[2]))
                    .run(Integer.parseInt(args[0]));
        } finally {
            try (Stream<Path> content = Files.walk(folder)) {
                for (Path path : content.sorted(Comparator.reverseOrder()).toList()) {
                    Files.delete(path);
                }
            }
        }
    }

    private void run(int rounds) throws Exception {
        List<Double> starts = new ArrayList<>();
        List<Double> memory = new ArrayList<>();
        for (int i = 0; i < STARTS; i++) {
            ServiceProcess service = start();
            starts.add(service.startTime().toMillis() / 1000.0);
            if (i == STARTS - 1) {
                Thread.sleep(IDLE_MS);
                memory.add(residentMb(service.pid()));
            }
            service.stop();
        }
        rates(rounds);
        System.out.printf(Locale.ROOT, "start to ready: %s s%n", spread(starts, "%.2f"));
        System.out.printf(Locale.ROOT, "resident when idle: %.0f MB%n", memory.get(0));
    }

    private ServiceProcess start() {
        ServiceProcess service = ServiceProcess.start(place.program(), place.settings(), folder.resolve("service.log"));
        service.address();
        return service;
    }

    private void rates(int rounds) throws Exception {
        int warmUp = 4;
        Instant begin = Instant.now().minusSeconds(2 * 3600);
        List<Double> through = new ArrayList<>();
        List<Double> plain = new ArrayList<>();
        List<Double> ratios = new ArrayList<>();
        List<Double> cpuRatios = new ArrayList<>();
        ServiceProcess service = start();
        try (PlainInserts inserts = new PlainInserts(folder)) {
            for (int round = 0; round < warmUp + rounds; round++) {
                List<List<List<Row>>> batches = batches(begin, round);
                double cpu0 = cpuSeconds(service.pid());
                double a = perSecond(batches, () -> post(service.address(), batches));
                double cpu1 = cpuSeconds(service.pid());
                double own0 = cpuSeconds(ProcessHandle.current().pid());
                double b = perSecond(batches, () -> {
                    for (List<List<Row>> ofClient : batches) {
                        for (List<Row> batch : ofClient) {
                            inserts.insert(batch);
                        }
                    }
                });
                double own1 = cpuSeconds(ProcessHandle.current().pid());
                if (round >= warmUp) {
                    cpuRatios.add((own1 - own0) / (cpu1 - cpu0));
                    through.add(a);
                    plain.add(b);
                    ratios.add(a / b);
                }
            }
        } finally {
            service.stop();
        }
        System.out.printf(
                Locale.ROOT,
                "%d points, %d clients, %d rows a post, %d rows a round, %d rounds%n",
                BenchPlace.POINTS,
                clients,
                ROWS_PER_POST,
                clients * posts * ROWS_PER_POST,
                rounds);
        System.out.println("through HTTP, assessed: " + spread(through, "%.0f") + " readings/s");
        System.out.println("plain batch inserts:    " + spread(plain, "%.0f") + " rows/s");
        System.out.println("ratio:                  " + spread(ratios, "%.3f"));
        System.out.println("by processor time:      " + spread(cpuRatios, "%.3f"));
    }

    /** Processor time that a process has used: on a busy machine the steadier measure. */
    private static double cpuSeconds(long pid) {
        return ProcessHandle.of(pid)
                        .flatMap(process -> process.info().totalCpuDuration())
                        .orElseThrow()
                        .toNanos()
                / 1e9;
    }

    private interface Work {
        void run() throws Exception;
    }

    private static double perSecond(List<List<List<Row>>> batches, Work work) throws Exception {
        long rows = batches.stream().flatMap(List::stream).mapToLong(List::size).sum();
        long began = System.nanoTime();
        work.run();
        return rows / ((System.nanoTime() - began) / 1e9);
    }

    /** For each client its batches; each has points of its own. */
    private List<List<List<Row>>> batches(Instant begin, int round) {
        int share = BenchPlace.POINTS / clients;
        List<List<List<Row>>> all = new ArrayList<>();
        for (int client = 0; client < clients; client++) {
            List<List<Row>> mine = new ArrayList<>();
            for (int i = 0; i < posts; i++) {
                int first = (round * posts + i) * ROWS_PER_POST;
                mine.add(Row.rows(begin, first, ROWS_PER_POST, client * share, (client + 1) * share));
            }
            all.add(mine);
        }
        return all;
    }

    private final HttpClient http =
            HttpClient.newBuilder().version(HttpClient.Version.HTTP_1_1).build();

    private void post(URI address, List<List<List<Row>>> batches) throws InterruptedException {
        List<String> faults = new ArrayList<>();
        List<Thread> threads = batches.stream()
                .map(mine -> new Thread(() -> {
                    try {
                        for (List<Row> batch : mine) {
                            post(address, Row.json(batch));
                        }
                    } catch (IOException | InterruptedException | IllegalStateException e) {
                        synchronized (faults) {
                            faults.add(e.toString());
                        }
                    }
                }))
                .toList();
        threads.forEach(Thread::start);
        for (Thread thread : threads) {
            thread.join();
        }
        if (!faults.isEmpty()) {
            throw new IllegalStateException(faults.toString());
        }
    }

    private void post(URI address, String json) throws IOException, InterruptedException {
        HttpResponse<String> answer = http.send(
                HttpRequest.newBuilder(address.resolve("/api/v1/readings"))
                        .header("Authorization", "Bearer " + place.gatewayKey())
                        .header("Content-Type", "application/json")
                        .POST(BodyPublishers.ofString(json))
                        .build(),
                BodyHandlers.ofString());
        if (answer.statusCode() != 200 || !answer.body().contains("\"stored\":" + ROWS_PER_POST + ",")) {
            throw new IllegalStateException(answer.statusCode() + " " + answer.body());
        }
    }

    private static double residentMb(long pid) throws IOException {
        return Files.readAllLines(Path.of("/proc", String.valueOf(pid), "status")).stream()
                .filter(line -> line.startsWith("VmRSS:"))
                .mapToDouble(line -> Double.parseDouble(line.replaceAll("[^0-9]", "")) / 1024)
                .findFirst()
                .orElseThrow();
    }

    private static String spread(List<Double> values, String format) {
        List<Double> sorted = values.stream().sorted().toList();
        return String.format(
                Locale.ROOT,
                "median " + format + " (" + format + " to " + format + ")",
                sorted.get(sorted.size() / 2),
                sorted.get(0),
                sorted.get(sorted.size() - 1));
    }
}
