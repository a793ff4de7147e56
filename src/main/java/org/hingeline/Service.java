package org.hingeline;

import io.micrometer.core.instrument.binder.jvm.JvmGcMetrics;
import io.micrometer.core.instrument.binder.jvm.JvmMemoryMetrics;
import io.micrometer.core.instrument.binder.system.ProcessorMetrics;
import io.micrometer.prometheusmetrics.PrometheusConfig;
import io.micrometer.prometheusmetrics.PrometheusMeterRegistry;
import java.security.SecureRandom;
import java.time.Clock;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import org.hingeline.config.PasswordFile;
import org.hingeline.config.Settings;
import org.hingeline.delivery.Channel;
import org.hingeline.delivery.Courier;
import org.hingeline.delivery.EmailChannel;
import org.hingeline.delivery.FolderChannel;
import org.hingeline.delivery.MailServer;
import org.hingeline.delivery.RetryPlan;
import org.hingeline.delivery.Sender;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.AgeLimits;
import org.hingeline.monitor.AlertDesk;
import org.hingeline.monitor.AlertWatch;
import org.hingeline.monitor.Check;
import org.hingeline.monitor.DoseDesk;
import org.hingeline.monitor.DoseHistory;
import org.hingeline.monitor.DoseRecords;
import org.hingeline.monitor.DoseWaters;
import org.hingeline.monitor.Housekeeping;
import org.hingeline.monitor.JournalBook;
import org.hingeline.monitor.LimitDesk;
import org.hingeline.monitor.MessageDesk;
import org.hingeline.monitor.Passwords;
import org.hingeline.monitor.PlaceDesk;
import org.hingeline.monitor.ReadingIntake;
import org.hingeline.monitor.Secrets;
import org.hingeline.monitor.Signals;
import org.hingeline.monitor.StateWishes;
import org.hingeline.monitor.StatusBoard;
import org.hingeline.monitor.Storage;
import org.hingeline.monitor.WaterRules;
import org.hingeline.store.Database;
import org.hingeline.store.EmbeddedDatabase;
import org.hingeline.web.LiveEvents;
import org.hingeline.web.Services;
import org.hingeline.web.WebServer;

/** The running service, put together from its parts. */
final class Service implements AutoCloseable {
    /** Pages of a node that shares its database look again this often, for what another node has taken in. */
    private static final Duration LOOK_FOR_OTHER_NODES = Duration.ofSeconds(20);

    private final Database database;
    private final Accounts accounts;
    private final PlaceDesk place;
    private final TimedWork timedWork;
    private final WebServer web;

    private Service(Database database, Accounts accounts, PlaceDesk place, TimedWork timedWork, WebServer web) {
        this.database = database;
        this.accounts = accounts;
        this.place = place;
        this.timedWork = timedWork;
        this.web = web;
    }

    static Service start(Settings settings, Clock clock) {
        Databases.Opened opened = Databases.openToServe(settings, clock);
        Database database = opened.database();
        try {
            String report = opened.report();
            if (report != null) {
                tell(database, report, clock);
            }
            return start(settings, clock, database);
        } catch (RuntimeException e) {
            database.close();
            throw e;
        }
    }

    /** A fall back to a backup is written into every site's journal; the log has said it loudly. */
    private static void tell(Database database, String report, Clock clock) {
        database.writeOnly(books -> books.place()
                .sites()
                .forEach(site -> books.journal()
                        .add(new JournalBook.Entry(
                                clock.instant(), site.id(), "hingeline", "backup-put-back", "database", report))));
    }

    private static Service start(Settings settings, Clock clock, Database database) {
        boolean embedded = database instanceof EmbeddedDatabase;
        SecureRandom random = new SecureRandom();
        Secrets secrets = new Secrets(random);
        String node = Secrets.hash(secrets.make("")).substring(0, 12);
        WaterRules water = new WaterRules(
                new AgeLimits(settings.ageLimits().byQuantity()),
                settings.water().constants(),
                settings.water().boron());
        Courier courier = courier(settings, clock, database, random, node);

        LiveEvents live = new LiveEvents(embedded ? Duration.ZERO : LOOK_FOR_OTHER_NODES);
        Nudge nudge = new Nudge(courier, database, clock);
        Signals signals = siteId -> {
            live.siteChanged(siteId);
            nudge.now();
        };
        MessageDesk messages = new MessageDesk(settings.server().publicUrl(), node);
        AlertDesk alerts = new AlertDesk(database, clock, messages, signals);
        AlertWatch watch = new AlertWatch(alerts);
        LimitDesk limits = new LimitDesk(database, clock, signals);
        StatusBoard board = new StatusBoard(database, clock);
        Accounts accounts = accounts(settings, clock, database, random);
        PlaceDesk place = new PlaceDesk(database, clock, limits, signals);
        Backups backups = Backups.of(database, settings, clock);

        PrometheusMeterRegistry registry = new PrometheusMeterRegistry(PrometheusConfig.DEFAULT);
        new JvmMemoryMetrics().bindTo(registry);
        new JvmGcMetrics().bindTo(registry);
        new ProcessorMetrics().bindTo(registry);
        Gauges.bind(registry, database, backups, clock);

        List<Check> checks = new ArrayList<>(Checks.of(database, backups, clock));
        TimedWork timedWork = TimedWork.start(
                database,
                new Housekeeping(database, clock, watch, water),
                nudge,
                backups,
                settings.backups().every(),
                clock);
        checks.add(timedWork);
        Services services = new Services(
                clock,
                accounts,
                new ReadingIntake(
                        database,
                        clock,
                        new ReadingIntake.Rules(
                                settings.intake().futureTolerance(),
                                settings.intake().rowsPerTransaction()),
                        water,
                        watch,
                        signals),
                board,
                limits,
                alerts,
                doses(settings, database, board, water),
                doseRecords(settings, database, clock, water, signals),
                new DoseHistory(database, clock, water),
                place,
                new StateWishes(database, water),
                checks);
        try {
            WebServer web = WebServer.start(
                    new WebServer.Rules(
                            settings.server().host(),
                            settings.server().port(),
                            settings.server().maxBodyBytes(),
                            settings.intake().maxRowsPerPost(),
                            settings.server().cookiesOverTlsOnly()),
                    services,
                    secrets,
                    live,
                    registry);
            return new Service(database, accounts, place, timedWork, web);
        } catch (RuntimeException e) {
            timedWork.close();
            live.close();
            throw e;
        }
    }

    static Accounts accounts(Settings settings, Clock clock, Database database, SecureRandom random) {
        Settings.Accounts rules = settings.accounts();
        return new Accounts(
                database,
                clock,
                new Accounts.Rules(rules.session(), rules.lockAfterFailures(), rules.lock(), rules.minPasswordLength()),
                new Secrets(random),
                new Passwords(random));
    }

    private static DoseDesk doses(Settings settings, Database database, StatusBoard board, WaterRules water) {
        Settings.Dosing dosing = settings.dosing();
        return new DoseDesk(
                board,
                new DoseWaters(database, water),
                new DoseDesk.Defaults(
                        dosing.phTotalMax(),
                        dosing.omegaAragoniteMax(),
                        dosing.phPerHourMax(),
                        dosing.aerateToUatm(),
                        dosing.stockGramsPerLitre()));
    }

    private static DoseRecords doseRecords(
            Settings settings, Database database, Clock clock, WaterRules water, Signals signals) {
        Settings.Dosing dosing = settings.dosing();
        return new DoseRecords(
                database,
                clock,
                new DoseRecords.Rules(dosing.maxGramsPerTankAndDay(), dosing.secondPersonAboveG(), dosing.mixing()),
                water,
                signals);
    }

    private static Courier courier(
            Settings settings, Clock clock, Database database, SecureRandom random, String node) {
        Settings.Mail mail = settings.mail();
        Sender sender = new Sender(mail.from(), mail.fromName());
        Channel channel = mail.mode() == Settings.MailMode.FOLDER
                ? new FolderChannel(settings.mailFolder(), sender)
                : new EmailChannel(mailServer(mail), sender);
        Settings.Delivery delivery = settings.delivery();
        return new Courier(
                database,
                List.of(channel),
                new RetryPlan(delivery.retryPauses(), delivery.giveUpAfter(), delivery.perRunMost()),
                node,
                clock,
                random::nextDouble);
    }

    private static MailServer mailServer(Settings.Mail mail) {
        String host = mail.host();
        if (host == null) {
            throw new CommandFailure("mail.host is missing in the settings");
        }
        var passwordFile = mail.passwordFile();
        return new MailServer(
                host,
                mail.port(),
                mail.startTls() == Settings.StartTls.REQUIRED,
                mail.user(),
                passwordFile == null ? null : () -> PasswordFile.read(passwordFile),
                mail.timeout());
    }

    int port() {
        return web.port();
    }

    Storage storage() {
        return database;
    }

    WebServer web() {
        return web;
    }

    Accounts accounts() {
        return accounts;
    }

    PlaceDesk place() {
        return place;
    }

    /** In this order: no new requests, no new timed work, then the database. */
    @Override
    public void close() {
        try {
            web.close();
        } finally {
            try {
                timedWork.close();
            } finally {
                database.close();
            }
        }
    }
}
