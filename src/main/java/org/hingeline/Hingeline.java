package org.hingeline;

import java.time.Clock;
import org.hingeline.config.BadSettings;
import org.hingeline.store.DamagedDatabaseException;
import org.hingeline.store.StoreException;
import picocli.CommandLine;
import picocli.CommandLine.Command;

/** Main: the commands, each a class beside this one. */
@Command(
        name = "hingeline",
        mixinStandardHelpOptions = true,
        versionProvider = Version.class,
        description = "Intake-water advisory service for shellfish hatcheries.",
        subcommands = {
            ServeCommand.class,
            CheckConfigCommand.class,
            MigrateCommand.class,
            CheckDatabaseCommand.class,
            AddSiteCommand.class,
            AddPersonCommand.class,
            AddKeyCommand.class,
            LoadPlaceCommand.class,
            DemoCommand.class
        })
public final class Hingeline {
    /** The one clock; everything else is handed it. */
    static final Clock CLOCK = Clock.systemUTC();

    private Hingeline() {}

    public static void main(String[] args) {
        System.exit(commandLine().execute(args));
    }

    static CommandLine commandLine() {
        return new CommandLine(new Hingeline())
                .setCaseInsensitiveEnumValuesAllowed(true)
                .setExecutionExceptionHandler((failure, line, parsed) -> {
                    if (failure instanceof BadSettings
                            || failure instanceof StoreException
                            || failure instanceof DamagedDatabaseException
                            || failure instanceof IllegalArgumentException
                            || failure instanceof CommandFailure) {
                        line.getErr().println(line.getCommandName() + ": " + failure.getMessage());
                        return 1;
                    }
                    throw failure;
                });
    }
}
