package org.hingeline;

import org.hingeline.config.Settings;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

@Command(
        name = "check-config",
        description = "Reads the settings and says what is wrong with them.",
        mixinStandardHelpOptions = true)
final class CheckConfigCommand implements Runnable {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Override
    public void run() {
        Settings settings = config.read();
        spec.commandLine()
                .getOut()
                .println("The settings are good. Links in messages will begin with "
                        + settings.server().publicUrl() + ".");
    }
}
