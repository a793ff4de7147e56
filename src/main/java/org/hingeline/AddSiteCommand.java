package org.hingeline;

import java.time.ZoneId;
import java.util.List;
import org.hingeline.config.Settings;
import org.hingeline.monitor.LimitDesk;
import org.hingeline.monitor.PlaceDesk;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.PlacePlan.SitePlan;
import org.hingeline.monitor.Signals;
import org.hingeline.store.Database;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

@Command(
        name = "add-site",
        description = "Adds a site, or changes the name and zone of a known one. The service must be stopped.",
        mixinStandardHelpOptions = true)
final class AddSiteCommand implements Runnable {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Option(names = "--code", required = true, description = "short name in addresses, for example bay")
    private String code = "";

    @Option(names = "--name", required = true, description = "name as shown")
    private String name = "";

    @Option(names = "--zone", required = true, description = "time zone of its people, for example Europe/Lisbon")
    private ZoneId zone = ZoneId.of("UTC");

    @Override
    public void run() {
        Settings settings = config.read();
        PlacePlan plan =
                new PlacePlan(new SitePlan(code, name, zone), List.of(), List.of(), List.of(), List.of(), List.of());
        try (Database database = Databases.open(settings)) {
            placeDesk(database).apply(plan, "command line");
        }
        spec.commandLine().getOut().println("Site " + code + " is there.");
    }

    static PlaceDesk placeDesk(Database database) {
        Signals nobody = siteId -> {};
        return new PlaceDesk(database, Hingeline.CLOCK, new LimitDesk(database, Hingeline.CLOCK, nobody), nobody);
    }
}
