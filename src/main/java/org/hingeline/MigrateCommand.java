package org.hingeline;

import org.hingeline.store.Database;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

@Command(
        name = "migrate",
        description = "Brings the database's tables up to date and ends; serve does the same when it starts.",
        mixinStandardHelpOptions = true)
final class MigrateCommand implements Runnable {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Override
    public void run() {
        try (Database database = Databases.open(config.read())) {
            database.checkAlive();
            spec.commandLine().getOut().println("The tables are up to date.");
        }
    }
}
