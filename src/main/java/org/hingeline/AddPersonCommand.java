package org.hingeline;

import java.io.Console;
import java.nio.file.Path;
import java.security.SecureRandom;
import java.util.Arrays;
import org.hingeline.config.PasswordFile;
import org.hingeline.config.Settings;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.Role;
import org.hingeline.store.Database;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

@Command(
        name = "add-person",
        description =
                "Adds a person to a site, or gives a known one a new password and role. The service must be stopped.",
        mixinStandardHelpOptions = true)
final class AddPersonCommand implements Runnable {
    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Option(names = "--site", required = true, description = "code of the site")
    private String site = "";

    @Option(names = "--name", required = true, description = "name to sign in with")
    private String name = "";

    @Option(names = "--display-name", description = "name as shown (default: the name)")
    private @Nullable String displayName;

    @Option(names = "--role", required = true, description = "${COMPLETION-CANDIDATES}")
    private Role role = Role.VIEWER;

    @Option(
            names = "--password-file",
            paramLabel = "FILE",
            description = "a file that holds only the password (default: asks for it)")
    private @Nullable Path passwordFile;

    @Option(
            names = "--known",
            description =
                    "somebody who signs in already gets a role at this site too; asks for no password, and sets one"
                            + " only if --password-file is given")
    private boolean known;

    @Override
    public void run() {
        Settings settings = config.read();
        String password = passwordFile != null ? PasswordFile.read(passwordFile) : known ? "" : ask();
        try (Database database = Databases.open(settings)) {
            Site found = site(database, site);
            Accounts accounts = Service.accounts(settings, Hingeline.CLOCK, database, new SecureRandom());
            if (known) {
                accounts.addToSite(found, name, role, "command line");
                if (passwordFile != null) {
                    accounts.setPassword(found, name, password, "command line");
                }
            } else {
                accounts.savePerson(
                        found, name, displayName == null ? name : displayName, password, role, "command line");
            }
        }
        spec.commandLine().getOut().println(name + " can sign in at " + site + " as " + role.code() + ".");
    }

    private static String ask() {
        Console console = System.console();
        if (console == null) {
            throw new CommandFailure("there is no terminal to ask for the password; give --password-file");
        }
        char[] first = console.readPassword("Password: ");
        char[] second = console.readPassword("Again: ");
        if (first == null || !Arrays.equals(first, second)) {
            throw new CommandFailure("the two do not match; nothing was changed");
        }
        return new String(first);
    }

    static Site site(Database database, String code) {
        return database.read(books -> books.place().siteByCode(code))
                .orElseThrow(() -> new CommandFailure("there is no site \"" + code + "\"; known: "
                        + database.read(books ->
                                books.place().sites().stream().map(Site::code).toList()) + ". add-site makes one"));
    }
}
