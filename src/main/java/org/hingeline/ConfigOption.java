package org.hingeline;

import java.nio.file.Files;
import java.nio.file.Path;
import org.hingeline.config.Settings;
import org.hingeline.config.SettingsReader;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Option;

/** The option every command on a real installation takes. */
final class ConfigOption {
    @Option(
            names = "--config",
            paramLabel = "FILE",
            description =
                    "settings; config/hingeline.yaml explains each (default: config/hingeline.yaml if it is there,"
                            + " else the defaults)")
    private @Nullable Path file;

    /** The option as it was given, to be repeated in advice; empty when it was not. */
    String given() {
        return file == null ? "" : " --config " + file;
    }

    Settings read() {
        Path usual = Path.of("config", "hingeline.yaml");
        if (file != null) {
            return SettingsReader.read(file);
        }
        return Files.exists(usual) ? SettingsReader.read(usual) : Settings.defaults();
    }
}
