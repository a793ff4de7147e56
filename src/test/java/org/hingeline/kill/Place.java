package org.hingeline.kill;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.http.HttpResponse;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.hingeline.RunningService;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.Role;

/**
 * The demo's place in a data folder, its limits made to act at once, with keys for the writers.
 *
 * @param sensors those that a water state is computed from
 */
record Place(Path data, Path settings, List<String> gatewayKeys, String token, List<Sensor> sensors) {
    private static final Set<Quantity> NEEDED =
            Set.of(Quantity.PH, Quantity.TEMPERATURE, Quantity.SALINITY, Quantity.TOTAL_ALKALINITY);

    /** A sensor as a gateway knows it. */
    record Sensor(String point, String code, Quantity quantity) {}

    static Place setUp(Path data, int gateways) {
        PlacePlan plan = PlaceFileReader.read(Path.of("demo-hatchery", "hatchery.yaml"));
        List<Sensor> sensors = plan.sensors().stream()
                .filter(sensor -> NEEDED.contains(sensor.quantity()))
                .map(sensor -> new Sensor(sensor.point(), sensor.code(), sensor.quantity()))
                .toList();
        List<String> keys = new ArrayList<>();
        String token;
        try (RunningService service = RunningService.start(data, Clock.systemUTC())) {
            token = service.token(Role.OPERATOR);
            for (int i = 0; i < gateways; i++) {
                keys.add(service.makeGatewayKey("gateway " + i));
            }
            for (PlacePlan.PointPlan point : plan.points()) {
                put(service, token, point.code(), "omega-low", "\"quantity\":\"omegaAragonite\",\"below\":1.8");
                put(service, token, point.code(), "ph-high", "\"quantity\":\"ph\",\"above\":7.95");
                put(service, token, point.code(), "too-warm", "\"quantity\":\"temperature\",\"above\":16.5");
            }
        }
        Path settings = data.resolve("hingeline.yaml");
        try {
            Files.writeString(settings, "dataFolder: " + data + "\nserver:\n  port: 0\n");
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return new Place(data, settings, keys, token, sensors);
    }

    private static void put(RunningService service, String token, String point, String name, String rule) {
        HttpResponse<String> answer = service.send("PUT", limitPath(point, name), token, "{" + rule + AT_ONCE + "}");
        if (answer.statusCode() != 200) {
            throw new IllegalStateException("limit " + name + " of " + point + ": " + answer.body());
        }
    }

    /** The rest of a limit that is acted on at once. */
    static final String AT_ONCE = ",\"deadband\":0.02,\"onDelayMin\":0,\"offDelayMin\":0,\"priority\":\"high\","
            + "\"action\":\"Look at the water.\"";

    static String limitPath(String point, String name) {
        return "/api/v1/points/" + point + "/limits/" + name;
    }

    Path database() {
        return data.resolve("db").resolve("hingeline.mv.db");
    }

    Path mail() {
        return data.resolve("mail");
    }

    Path backups() {
        return data.resolve("backups");
    }
}
