package org.hingeline;

import org.hingeline.config.Settings;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

@Command(name = "serve", description = "Runs the service until it is stopped.", mixinStandardHelpOptions = true)
final class ServeCommand implements Runnable {
    private static final Logger LOG = LoggerFactory.getLogger(ServeCommand.class);

    @Mixin
    private ConfigOption config = new ConfigOption();

    @Override
    public void run() {
        Settings settings = config.read();
        try (OrderlyEnd end = new OrderlyEnd()) {
            Service service = end.closes(Service.start(settings, Hingeline.CLOCK));
            LOG.info("listening on {} port {}", settings.server().host(), service.port());
            if (service.accounts().nobodyYet()) {
                LOG.warn("Nobody can sign in yet. Stop the service and make a site and its first manager:\n"
                        + "  java -jar hingeline.jar add-site --code bay --name \"Bay hatchery\" --zone Europe/Lisbon\n"
                        + "  java -jar hingeline.jar add-person --site bay --name ana --role manager\n"
                        + "then start it again. add-person asks for the password.");
            }
            end.await();
        }
    }
}
