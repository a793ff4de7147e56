package org.hingeline.config;

import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Map;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.jspecify.annotations.Nullable;

/**
 * Every setting, checked and frozen. Units, defaults and reasons are told in {@code config/hingeline.yaml}, ranges in
 * {@link SettingsReader}.
 *
 * @param dataFolder what the service writes lies in here; relative to the folder the command is started in
 */
public record Settings(
        Path dataFolder,
        Server server,
        Database database,
        Backups backups,
        Mail mail,
        Delivery delivery,
        AgeLimits ageLimits,
        Water water,
        Intake intake,
        Dosing dosing,
        Accounts accounts) {

    public enum SecureCookies {
        AUTO,
        ALWAYS,
        NEVER
    }

    public enum DatabaseKind {
        EMBEDDED,
        POSTGRESQL
    }

    public enum MailMode {
        SMTP,
        FOLDER
    }

    public enum StartTls {
        REQUIRED,
        OFF
    }

    /**
     * @param port 0 takes any free one
     * @param publicUrlSet the address people use, if one was set, without a slash at the end
     */
    public record Server(
            String host, int port, @Nullable String publicUrlSet, int maxBodyBytes, SecureCookies secureCookies) {

        /** The address for links in messages, without a slash at the end. */
        public String publicUrl() {
            if (publicUrlSet != null) {
                return publicUrlSet;
            }
            boolean anywhere = host.equals("0.0.0.0") || host.equals("::");
            String name = anywhere ? "localhost" : host.contains(":") ? "[" + host + "]" : host;
            return "http://" + name + ":" + port;
        }

        /** Whether browsers may send the session cookie over TLS only. */
        public boolean cookiesOverTlsOnly() {
            return switch (secureCookies) {
                case ALWAYS -> true;
                case NEVER -> false;
                case AUTO -> publicUrl().startsWith("https:");
            };
        }
    }

    /**
     * @param folder of the embedded database, relative to the data folder
     * @param url of PostgreSQL, required for it
     */
    public record Database(
            DatabaseKind kind,
            Path folder,
            @Nullable String url,
            @Nullable String user,
            @Nullable Path passwordFile) {}

    /** @param folder relative to the data folder */
    public record Backups(Duration every, int keep, Path folder) {}

    /**
     * @param host of the mail server, required when mail goes by SMTP
     * @param folder relative to the data folder
     */
    public record Mail(
            MailMode mode,
            @Nullable String host,
            int port,
            StartTls startTls,
            @Nullable String user,
            @Nullable Path passwordFile,
            String from,
            String fromName,
            Duration timeout,
            Path folder) {}

    /** @param retryPauses one after the other; the last one repeats */
    public record Delivery(List<Duration> retryPauses, Duration giveUpAfter, int perRunMost) {
        public Delivery {
            retryPauses = List.copyOf(retryPauses);
        }
    }

    /** How old an input of a water state may be. */
    public record AgeLimits(Duration ph, Duration temperature, Duration salinity, Duration totalAlkalinity) {
        public Map<Quantity, Duration> byQuantity() {
            return Map.of(
                    Quantity.PH, ph,
                    Quantity.TEMPERATURE, temperature,
                    Quantity.SALINITY, salinity,
                    Quantity.TOTAL_ALKALINITY, totalAlkalinity);
        }
    }

    /** The published fits that water states are computed with. */
    public record Water(CarbonicAcidFit constants, BoronRatio boron) {}

    public record Intake(Duration futureTolerance, int maxRowsPerPost, int rowsPerTransaction) {}

    /**
     * Bounds a dose plan keeps to when the request names none.
     *
     * @param phTotalMax total scale
     * @param aerateToUatm partial pressure of CO2 in the air that the water is aerated with
     * @param maxGramsPerTankAndDay most that one tank gets within 24 hours, all agents together; 1,000,000 sets no bound
     * @param secondPersonAboveG a dose above this waits for a second person; 1,000,000 asks for none
     * @param mixing time after which a tank counts as mixed
     */
    public record Dosing(
            double phTotalMax,
            double omegaAragoniteMax,
            double phPerHourMax,
            double aerateToUatm,
            double stockGramsPerLitre,
            double maxGramsPerTankAndDay,
            double secondPersonAboveG,
            Duration mixing) {}

    public record Accounts(Duration session, int lockAfterFailures, Duration lock, int minPasswordLength) {}

    /** What holds when nothing is set. */
    public static Settings defaults() {
        return SettingsReader.readText("defaults", "{}");
    }

    public Path databaseFolder() {
        return dataFolder.resolve(database.folder());
    }

    public Path backupsFolder() {
        return dataFolder.resolve(backups.folder());
    }

    public Path mailFolder() {
        return dataFolder.resolve(mail.folder());
    }

    /** The same on another port and with its data elsewhere. */
    public Settings withPortAndData(int port, Path dataFolder) {
        Server moved =
                new Server(server.host(), port, server.publicUrlSet(), server.maxBodyBytes(), server.secureCookies());
        return new Settings(
                dataFolder, moved, database, backups, mail, delivery, ageLimits, water, intake, dosing, accounts);
    }
}
