package org.hingeline;

import java.nio.file.Path;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.config.Settings;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.store.Database;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

@Command(
        name = "load-place",
        description =
                "Sets up a site from a file: points, sensors, limits, subscribers. config/place-example.yaml shows how"
                        + " it is written. What is known is changed, nothing is removed. The service must be stopped.",
        mixinStandardHelpOptions = true)
final class LoadPlaceCommand implements Runnable {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Parameters(paramLabel = "FILE", description = "the place")
    private Path file = Path.of("");

    @Override
    public void run() {
        Settings settings = config.read();
        PlacePlan plan = PlaceFileReader.read(file);
        try (Database database = Databases.open(settings)) {
            AddSiteCommand.placeDesk(database).apply(plan, "command line");
        }
        spec.commandLine()
                .getOut()
                .println("Site " + plan.site().code() + ": "
                        + plan.points().size() + " points, " + plan.sensors().size() + " sensors, "
                        + plan.limits().size() + " limits, "
                        + plan.subscribers().size() + " subscribers.");
    }
}
