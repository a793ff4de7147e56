package org.hingeline.bench;

import java.io.IOException;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.hingeline.RunningService;
import org.hingeline.config.SettingsReader;
import org.hingeline.kill.ServiceProcess;
import org.hingeline.monitor.Role;

/** Waters a second that {@code /seawater/states} computes inside its handler, and what the wire costs beside it. */
public final class StatesBench {
    private static final int WATERS = 10_000;
    private static final int WARM_UP = 12;

    /** What one call took, ms; the rest of the whole is taking in the body. */
    private record Call(double parse, double compute, double write, double whole, int sent, int received) {}

    private final HttpClient http =
            HttpClient.newBuilder().version(HttpClient.Version.HTTP_1_1).build();
    private final URI address;
    private final String token;

    private StatesBench(URI address, String token) {
        this.address = address;
        this.token = token;
    }

    /** {@code CALLS PROGRAM…} */
    public static void main(String[] args) throws Exception {
        Path folder = Files.createTempDirectory("hingeline-bench-");
        List<String> program = List.of(args).subList(1, args.length);
        try {
            Path settings = folder.resolve("hingeline.yaml");
            Files.writeString(settings, "dataFolder: " + folder.resolve("data") + "\nserver:\n  port: 0\n");
            String token = token(settings);
            ServiceProcess service = ServiceProcess.start(program, settings, folder.resolve("service.log"));
            try {
                new StatesBench(service.address(), token).run(Integer.parseInt(args[0]));
            } finally {
                service.stop();
            }
        } finally {
            try (Stream<Path> content = Files.walk(folder)) {
                for (Path path : content.sorted(Comparator.reverseOrder()).toList()) {
                    Files.delete(path);
                }
            }
        }
    }

    private static String token(Path settings) {
        try (RunningService service = RunningService.start(SettingsReader.read(settings), Clock.systemUTC())) {
            return service.token(Role.VIEWER);
        }
    }

    private void run(int calls) throws IOException, InterruptedException {
        List<String> kinds = List.of("ph+totalAlkalinity", "totalAlkalinity+dic", "all six pairs in turn");
        System.out.printf(Locale.ROOT, "%d waters a call, %d calls of each kind, medians%n", WATERS, calls);
        for (String kind : kinds) {
            for (boolean withUncertainty : new boolean[] {false, true}) {
                byte[] body = body(kind, withUncertainty);
                List<Call> done = new ArrayList<>();
                for (int i = 0; i < WARM_UP + calls; i++) {
                    Call call = call(body);
                    if (i >= WARM_UP) {
                        done.add(call);
                    }
                }
                tell(kind + (withUncertainty ? ", with uncertainty" : ""), done);
            }
        }
    }

    private static void tell(String kind, List<Call> done) {
        double compute = median(done.stream().map(Call::compute).toList());
        double parse = median(done.stream().map(Call::parse).toList());
        double write = median(done.stream().map(Call::write).toList());
        double whole = median(done.stream().map(Call::whole).toList());
        System.out.printf(
                Locale.ROOT,
                "%s: compute %.0f waters/s (%.0f to %.0f)%n    ms a call: take in the body %.1f, parse %.1f, compute %.1f, write"
                        + " and carry back %.1f; whole %.1f = %.0f waters/s; %d kB there, %d kB back%n",
                kind,
                WATERS / compute * 1e3,
                WATERS / done.stream().mapToDouble(Call::compute).max().orElseThrow() * 1e3,
                WATERS / done.stream().mapToDouble(Call::compute).min().orElseThrow() * 1e3,
                whole - parse - compute - write,
                parse,
                compute,
                write,
                whole,
                WATERS / whole * 1e3,
                done.get(0).sent() / 1000,
                done.get(0).received() / 1000);
    }

    private static double median(List<Double> values) {
        return values.stream().sorted().toList().get(values.size() / 2);
    }

    private Call call(byte[] body) throws IOException, InterruptedException {
        String before = metrics();
        long began = System.nanoTime();
        HttpResponse<byte[]> answer = http.send(
                request("/api/v1/seawater/states")
                        .header("Content-Type", "application/json")
                        .POST(BodyPublishers.ofByteArray(body))
                        .build(),
                BodyHandlers.ofByteArray());
        double whole = (System.nanoTime() - began) / 1e6;
        if (answer.statusCode() != 200) {
            throw new IllegalStateException(
                    answer.statusCode() + " " + new String(answer.body(), StandardCharsets.UTF_8));
        }
        String after = metrics();
        for (int wait = 0; count(after) == count(before) && wait < 100; wait++) {
            Thread.sleep(2);
            after = metrics();
        }
        return new Call(
                ms("parse", after) - ms("parse", before),
                ms("compute", after) - ms("compute", before),
                ms("write", after) - ms("write", before),
                whole,
                body.length,
                answer.body().length);
    }

    private String metrics() throws IOException, InterruptedException {
        return http.send(request("/metrics").build(), BodyHandlers.ofString()).body();
    }

    private static double count(String metrics) {
        return number("seconds_count{part=\"compute\"}", metrics);
    }

    private static double ms(String part, String metrics) {
        return number("seconds_sum{part=\"" + part + "\"}", metrics) * 1e3;
    }

    private static double number(String series, String metrics) {
        Matcher value = Pattern.compile("hingeline_seawater_states_" + Pattern.quote(series) + " (\\S+)")
                .matcher(metrics);
        if (!value.find()) {
            throw new IllegalStateException("the metrics do not tell " + series);
        }
        return Double.parseDouble(value.group(1));
    }

    private HttpRequest.Builder request(String path) {
        return HttpRequest.newBuilder(address.resolve(path)).header("Authorization", "Bearer " + token);
    }

    private static byte[] body(String kind, boolean withUncertainty) {
        Random random = new Random(3);
        StringBuilder json = new StringBuilder("{\"waters\":[");
        for (int i = 0; i < WATERS; i++) {
            int pair = kind.startsWith("ph") ? 0 : kind.startsWith("total") ? 3 : i % 6;
            double salinity = 24 + 10 * random.nextDouble();
            double alkalinity = 647 + 47.7 * salinity + 20 * random.nextGaussian();
            double dic = alkalinity * (0.86 + 0.08 * random.nextDouble());
            double ph = 7.6 + 0.6 * random.nextDouble();
            double pco2 = 300 + 700 * random.nextDouble();
            json.append(i == 0 ? "" : ",")
                    .append(String.format(
                            Locale.ROOT,
                            "{\"temperatureC\":%.2f,\"salinity\":%.2f,%s}",
                            10 + 15 * random.nextDouble(),
                            salinity,
                            pair(pair, ph, alkalinity, dic, pco2)));
        }
        return json.append("],\"withUncertainty\":")
                .append(withUncertainty)
                .append('}')
                .toString()
                .getBytes(StandardCharsets.UTF_8);
    }

    private static String pair(int pair, double ph, double alkalinity, double dic, double pco2) {
        String ofPh = String.format(Locale.ROOT, "\"ph\":%.3f", ph);
        String ofAlkalinity = String.format(Locale.ROOT, "\"totalAlkalinityUmolKg\":%.1f", alkalinity);
        String ofDic = String.format(Locale.ROOT, "\"dicUmolKg\":%.1f", dic);
        String ofPco2 = String.format(Locale.ROOT, "\"pco2Uatm\":%.1f", pco2);
        return switch (pair) {
            case 0 -> ofPh + "," + ofAlkalinity;
            case 1 -> ofPh + "," + ofDic;
            case 2 -> ofPh + "," + ofPco2;
            case 3 -> ofAlkalinity + "," + ofDic;
            case 4 -> ofAlkalinity + "," + ofPco2;
            default -> ofDic + "," + ofPco2;
        };
    }
}
