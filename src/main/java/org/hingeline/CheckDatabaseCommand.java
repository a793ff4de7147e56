package org.hingeline;

import java.util.List;
import java.util.concurrent.Callable;
import org.hingeline.store.Database;
import org.hingeline.store.EmbeddedDatabase;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

@Command(
        name = "check-database",
        description = "Compares every table of the embedded database with its indexes. The service must be stopped.",
        mixinStandardHelpOptions = true)
final class CheckDatabaseCommand implements Callable<Integer> {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Override
    public Integer call() {
        try (Database database = Databases.open(config.read())) {
            if (!(database instanceof EmbeddedDatabase embedded)) {
                throw new CommandFailure("this is for the embedded database; PostgreSQL has its own tools (amcheck)");
            }
            List<String> faults = embedded.integrityFaults();
            faults.forEach(spec.commandLine().getErr()::println);
            spec.commandLine()
                    .getOut()
                    .println(faults.isEmpty() ? "Every table agrees with its indexes." : faults.size() + " faults.");
            return faults.isEmpty() ? 0 : 1;
        }
    }
}
