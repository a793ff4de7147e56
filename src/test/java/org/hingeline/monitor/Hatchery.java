package org.hingeline.monitor;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.security.SecureRandom;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hingeline.SettableClock;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.AlertBook.Alert;
import org.hingeline.monitor.KeyBook.GatewayKey;
import org.hingeline.monitor.PlacePlan.PointPlan;
import org.hingeline.monitor.PlacePlan.SensorPlan;
import org.hingeline.monitor.PlacePlan.SitePlan;
import org.hingeline.monitor.PlacePlan.SubscriberPlan;
import org.hingeline.monitor.ReadingIntake.Answer;
import org.hingeline.seawater.PhScale;
import org.hingeline.store.EmbeddedDatabase;

/**
 * A hatchery of one tank with its use cases over the real embedded database and a clock that the test moves. The tank
 * has sensors ph-1 (total scale), t-1, s-1, ta-1 and o2-1, and a longest gap of 15 minutes; Ana is told of everything.
 */
final class Hatchery {
    static final Instant T0 = Instant.parse("2026-05-14T03:00:00Z");
    static final Duration MAX_GAP = Duration.ofMinutes(15);
    static final AgeLimits AGE_LIMITS = new AgeLimits(Map.of(
            Quantity.PH,
            Duration.ofMinutes(15),
            Quantity.TEMPERATURE,
            Duration.ofMinutes(60),
            Quantity.SALINITY,
            Duration.ofHours(6),
            Quantity.TOTAL_ALKALINITY,
            Duration.ofDays(3)));
    static final WaterRules WATER = WaterRules.of(AGE_LIMITS);
    static final int ROWS_PER_TRANSACTION = 1000;

    final SettableClock clock = new SettableClock(T0);
    final EmbeddedDatabase database;
    private final Storage storage;

    PlaceDesk place;
    LimitDesk limits;
    AlertDesk alerts;
    Accounts accounts;
    StatusBoard board;
    DoseDesk doses;
    DoseRecords doseRecords;
    DoseHistory doseHistory;
    ReadingIntake intake;
    Housekeeping housekeeping;
    Site site;
    GatewayKey gateway;

    private Hatchery(EmbeddedDatabase database, Storage storage) {
        this.database = database;
        this.storage = storage;
    }

    static Hatchery empty() {
        EmbeddedDatabase database = Shared.emptied();
        Hatchery hatchery = new Hatchery(database, database);
        hatchery.start(database, ROWS_PER_TRANSACTION);
        hatchery.site = hatchery.place.apply(plan("cove"), "test");
        hatchery.gateway = hatchery.makeGateway(hatchery.site);
        return hatchery;
    }

    /** The service ends and starts again: what was in memory only is gone. */
    void restart() {
        start(storage, ROWS_PER_TRANSACTION);
    }

    /** The service starts again, over another storage or with other rules. */
    void start(Storage over, int rowsPerTransaction) {
        start(over, rowsPerTransaction, WATER);
    }

    void start(Storage over, int rowsPerTransaction, WaterRules water) {
        Signals silent = siteId -> {};
        alerts = new AlertDesk(over, clock, new MessageDesk("https://cove.example.org", "0123456789ab"), silent);
        AlertWatch watch = new AlertWatch(alerts);
        limits = new LimitDesk(over, clock, silent);
        place = new PlaceDesk(over, clock, limits, silent);
        board = new StatusBoard(over, clock);
        doses = new DoseDesk(board, new DoseWaters(over, water), new DoseDesk.Defaults(8.4, 4.5, 0.15, 420, 50));
        doseRecords =
                new DoseRecords(over, clock, new DoseRecords.Rules(2000, 500, Duration.ofMinutes(30)), water, silent);
        doseHistory = new DoseHistory(over, clock, water);
        SecureRandom random = new SecureRandom();
        accounts = new Accounts(
                over,
                clock,
                new Accounts.Rules(Duration.ofHours(12), 3, Duration.ofMinutes(15), 10),
                new Secrets(random),
                new Passwords(random));
        intake = new ReadingIntake(
                over, clock, new ReadingIntake.Rules(Duration.ofMinutes(2), rowsPerTransaction), water, watch, silent);
        housekeeping = new Housekeeping(over, clock, watch, water);
    }

    /** A second site, with nothing in it. */
    Site otherSite() {
        return place.apply(
                new PlacePlan(
                        new SitePlan("other", "Other", ZoneOffset.UTC),
                        List.of(),
                        List.of(),
                        List.of(),
                        List.of(),
                        List.of()),
                "test");
    }

    GatewayKey makeGateway(Site at) {
        return accounts.byGatewayKey(accounts.makeGatewayKey(at, "pier", "test"))
                .orElseThrow();
    }

    static PlacePlan plan(String code) {
        return new PlacePlan(
                new SitePlan(code, "Cove", ZoneOffset.UTC),
                List.of(tankPlan(MAX_GAP)),
                List.of(
                        sensorPlan("ph-1", Quantity.PH, 0.02),
                        sensorPlan("t-1", Quantity.TEMPERATURE, 0.1),
                        sensorPlan("s-1", Quantity.SALINITY, 0.1),
                        sensorPlan("ta-1", Quantity.TOTAL_ALKALINITY, 10),
                        sensorPlan("o2-1", Quantity.DISSOLVED_OXYGEN, 0.2)),
                List.of(),
                List.of(new SubscriberPlan("ana", "Ana", "ana@example.org", Priority.LOW)),
                List.of());
    }

    static PointPlan tankPlan(Duration maxGap) {
        return new PointPlan("tank", "Larval tank 1", PointKind.LARVAL, 1, null, 4000.0, maxGap);
    }

    static SensorPlan sensorPlan(String code, Quantity quantity, double standardUncertainty) {
        PhScale scale = quantity == Quantity.PH ? PhScale.TOTAL : null;
        return new SensorPlan("tank", code, quantity, quantity.unit().ucum(), scale, standardUncertainty, null);
    }

    void sensor(String code, Quantity quantity, double standardUncertainty) {
        place.saveSensor(site, sensorPlan(code, quantity, standardUncertainty), "test");
    }

    Point tank() {
        return database.read(books -> books.place().point(site.id(), "tank").orElseThrow());
    }

    /** A limit below a value, with deadband 0 and no off-delay. */
    void limit(String name, String quantity, double below, double onDelayMin) {
        limits.save(
                tank(), name, new LimitDesk.Wish(quantity, below, null, 0.0, onDelayMin, 0.0, "high", "Act."), "bo");
    }

    /** A reading of the tank's sensor as it is posted. */
    static IncomingReading row(int index, String sensor, double value, Instant at) {
        return new IncomingReading(
                index, "tank", quantityOf(sensor), value, at.toString(), null, sensor, null, "row " + index);
    }

    private static String quantityOf(String sensor) {
        return switch (sensor.substring(0, sensor.indexOf('-'))) {
            case "ph" -> "ph";
            case "t" -> "temperature";
            case "s" -> "salinity";
            case "ta" -> "totalAlkalinity";
            case "c" -> "conductivity";
            case "ca" -> "calcium";
            case "o2" -> "dissolvedOxygen";
            case "nh" -> "ammonia";
            default -> throw new IllegalArgumentException(sensor);
        };
    }

    Answer take(IncomingReading... rows) {
        return intake.take(gateway, List.of(rows));
    }

    /** One reading, posted now. */
    Answer read(String sensor, double value, Instant at) {
        return take(row(0, sensor, value, at));
    }

    /** Temperature 22 °C, salinity 30, alkalinity 2078 µmol/kg, all of one moment. */
    void readAllButPh(Instant at) {
        take(row(0, "t-1", 22, at), row(1, "s-1", 30, at), row(2, "ta-1", 2078, at));
    }

    /** The clock goes on to a time; the limits are watched every minute on the way. */
    void watchUntil(Instant time) {
        while (clock.instant().isBefore(time)) {
            Instant next = clock.instant().plusSeconds(60);
            clock.set(next.isAfter(time) ? time : next);
            housekeeping.watchLimits();
        }
    }

    /** The clock goes on, the limits are watched, and the sensor is read once a minute. */
    void readUntil(Instant time, String sensor, double value) {
        while (clock.instant().isBefore(time)) {
            watchUntil(clock.instant().plusSeconds(60));
            read(sensor, value, clock.instant());
        }
    }

    List<WaterState> states() {
        return database.read(
                books -> books.water().between(tank().id(), Instant.EPOCH, T0.plus(Duration.ofDays(400)), 100_000));
    }

    WaterState newestState() {
        return database.read(books -> books.water().newest(tank().id()).orElseThrow());
    }

    List<Alert> open() {
        return alerts.open(site.id());
    }

    List<String> subjects() {
        List<String> subjects = new ArrayList<>();
        database.read(books -> books.outbox().messages(site.id(), 1000)).forEach(m -> subjects.add(0, m.subject()));
        return subjects;
    }

    List<JournalBook.Entry> journal() {
        return database.read(books -> books.journal().entries(site.id(), 1000));
    }

    /** One database in a temporary folder for all tests, emptied for each. */
    private static final class Shared {
        private static final EmbeddedDatabase DATABASE = make();

        private static EmbeddedDatabase make() {
            try {
                return EmbeddedDatabase.open(Files.createTempDirectory("hatchery"));
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
        }

        static EmbeddedDatabase emptied() {
            try (Connection connection = DATABASE.schedulerDataSource().getConnection();
                    Statement statement = connection.createStatement()) {
                statement.execute("SET REFERENTIAL_INTEGRITY FALSE");
                for (String table : tables(connection)) {
                    statement.execute("TRUNCATE TABLE " + table + " RESTART IDENTITY");
                }
                statement.execute("SET REFERENTIAL_INTEGRITY TRUE");
                return DATABASE;
            } catch (SQLException e) {
                throw new IllegalStateException(e);
            }
        }
    }

    /** The program's tables. */
    static List<String> tables(Connection connection) throws SQLException {
        List<String> tables = new ArrayList<>();
        try (Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery("""
                        SELECT table_name FROM information_schema.tables
                        WHERE table_schema = 'public' AND table_name <> 'flyway_schema_history'
                        """)) {
            while (rows.next()) {
                tables.add(rows.getString(1));
            }
        }
        return tables;
    }
}
