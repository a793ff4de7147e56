package org.hingeline.bench;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A place of 12 points with 4 sensors and 2 limits each, set up with the service's own commands.
 *
 * @param program the service, as arguments of {@code java}
 */
record BenchPlace(List<String> program, Path data, Path settings, String gatewayKey) {
    static final int POINTS = 12;
    static final List<String> QUANTITIES = List.of("ph", "temperature", "salinity", "totalAlkalinity");
    private static final List<String> UNITS = List.of("\"[pH]\", phScale: total", "Cel", "\"1\"", "umol/kg");
    private static final List<Double> UNCERTAINTIES = List.of(0.02, 0.1, 0.1, 10.0);
    private static final Pattern KEY = Pattern.compile("gateway key: (\\S+)");

    static BenchPlace setUp(List<String> program, Path data) throws IOException, InterruptedException {
        Files.createDirectories(data);
        Path settings = data.resolve("hingeline.yaml");
        Files.writeString(settings, "dataFolder: " + data + "\nserver:\n  port: 0\n");
        Path place = data.resolve("place.yaml");
        Files.writeString(place, yaml());
        run(program, "load-place", place.toString(), "--config", settings.toString());
        String said = run(
                program, "add-gateway-key", "--site", "bench", "--gateway", "bench", "--config", settings.toString());
        Matcher key = KEY.matcher(said);
        if (!key.find()) {
            throw new IllegalStateException("no gateway key: " + said);
        }
        return new BenchPlace(program, data, settings, key.group(1));
    }

    static String point(int number) {
        return "tank-" + number;
    }

    private static String yaml() {
        StringBuilder points = new StringBuilder("points:\n");
        StringBuilder sensors = new StringBuilder("sensors:\n");
        StringBuilder limits = new StringBuilder("limits:\n");
        for (int p = 0; p < POINTS; p++) {
            points.append("  - {code: %s, name: Tank %d, kind: larval, volumeL: 4000, maxGapMin: 15}\n"
                    .formatted(point(p), p));
            for (int q = 0; q < QUANTITIES.size(); q++) {
                sensors.append("  - {point: %s, code: s-%d-%d, quantity: %s, unit: %s, standardUncertainty: %s}\n"
                        .formatted(point(p), p, q, QUANTITIES.get(q), UNITS.get(q), UNCERTAINTIES.get(q)));
            }
            String rest = "priority: high, action: Look at the water.}\n";
            limits.append("  - {point: %s, name: omega-low, quantity: omegaAragonite, below: 1.7, ".formatted(point(p)))
                    .append(rest);
            limits.append("  - {point: %s, name: ph-low, quantity: ph, below: 7.7, ".formatted(point(p)))
                    .append(rest);
        }
        return "site: {code: bench, name: Bench, zone: UTC}\n" + points + sensors + limits
                + "subscribers:\n  - {code: night, name: Night shift, email: night@bench.example.org, minPriority: low}\n";
    }

    private static String run(List<String> program, String... arguments) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.addAll(program);
        command.addAll(List.of(arguments));
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        if (process.waitFor() != 0) {
            throw new IllegalStateException(String.join(" ", arguments) + ": " + said);
        }
        return said;
    }
}
