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
                LOG.warn("""
                        Nobody can sign in yet. Stop the service, make a site and its first manager, and start it again:
                          java -jar hingeline.jar add-site{} --code bay --name "Bay hatchery" --zone Europe/Lisbon
                          java -jar hingeline.jar add-person{} --site bay --name ana --role manager
                        add-person asks for the password. (Where there is bin/hingeline, it stands for java -jar hingeline.jar.)\
                        """, config.given(), config.given());
            }
            end.await();
        }
    }
}
