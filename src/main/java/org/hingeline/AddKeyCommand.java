package org.hingeline;

import java.security.SecureRandom;
import org.hingeline.config.Settings;
import org.hingeline.store.Database;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

@Command(
        name = "add-gateway-key",
        description =
                "Makes a key for a gateway and prints it this once. The service must be stopped; while it runs, the"
                        + " setup page does the same.",
        mixinStandardHelpOptions = true)
final class AddKeyCommand implements Runnable {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Option(names = "--site", required = true, description = "code of the site")
    private String site = "";

    @Option(names = "--gateway", required = true, description = "what the gateway is called")
    private String gateway = "";

    @Override
    public void run() {
        Settings settings = config.read();
        try (Database database = Databases.open(settings)) {
            String key = Service.accounts(settings, Hingeline.CLOCK, database, new SecureRandom())
                    .makeGatewayKey(AddPersonCommand.site(database, site), gateway, "command line");
            spec.commandLine().getOut().println("gateway key: " + key);
        }
    }
}
