package org.hingeline;

import java.net.URI;
import java.nio.file.Path;
import org.hingeline.config.Settings;
import org.hingeline.demo.DemoGateway;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

@Command(
        name = "demo",
        description = "Runs an invented hatchery: the service on a folder of its own, and a gateway that posts to it.",
        mixinStandardHelpOptions = true)
final class DemoCommand implements Runnable {
    /** The same water every time. */
    private static final long SEED = 20260514;

    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Option(names = "--port", description = "TCP port on the loopback address (default ${DEFAULT-VALUE})")
    private int port = 8080;

    @Option(names = "--data", description = "where the database and the mail are kept (default ${DEFAULT-VALUE})")
    private Path data = Path.of("demo-hatchery", "data");

    @Override
    public void run() {
        Settings settings = Settings.defaults().withPortAndData(port, data);
        try (OrderlyEnd end = new OrderlyEnd()) {
            Service service = end.closes(Service.start(settings, Hingeline.CLOCK));
            DemoAccess access = DemoAccess.of(service, data.resolve("demo-access.properties"));
            URI address = URI.create("http://127.0.0.1:" + service.port());
            DemoGateway gateway = new DemoGateway(
                    address,
                    access.gatewayKey(),
                    access.accessToken(),
                    SEED,
                    Hingeline.CLOCK,
                    data.resolve("gateway-memory"));
            end.closes(gateway);
            gateway.start();
            spec.commandLine()
                    .getOut()
                    .printf(
                            """
                    The invented hatchery is running. Its water falls below a limit within a minute; then look at
                    Alerts and Messages. What is sent is also in %s.
                    address: %s
                    sign in: %s / %s
                    gateway key: %s
                    access token: %s
                    Stop with Ctrl-C.
                    """,
                            settings.mailFolder(),
                            address,
                            DemoAccess.NAME,
                            access.password(),
                            access.gatewayKey(),
                            access.accessToken());
            spec.commandLine().getOut().flush();
            end.await();
        }
    }
}
